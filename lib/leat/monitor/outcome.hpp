#pragma once

#include <string_view>

namespace leat {

/// Which rule ended a solve.
enum class Outcome {
    converged,     ///< every imbalance below the tolerance; numbers may be used
    stalled,       ///< no further progress; numbers marked unusable
    diverged,      ///< imbalances grew without bound; the best state seen is kept, numbers marked unusable
    out_of_budget, ///< iterations spent before the tolerance was met: numbers marked unusable; or cells spent before
                   ///< the wanted band was met: numbers usable within their bands, those too wide with their reason
    cancelled      ///< the caller asked to stop; the best state so far, numbers marked unusable
};

/// "converged", "stalled", "diverged", "out_of_budget", "cancelled".
std::string_view name(Outcome outcome) noexcept;

/// Sums of |residual| over the control volumes, normalised.
struct Imbalances {
    double mass = 0;     ///< / inlet mass flow
    double momentum = 0; ///< / (inlet momentum flux + |pressure drop| x area)

    /// The larger of the two; not finite when one is not.
    double worst() const noexcept { return (mass > momentum ? mass : momentum) + 0 * mass + 0 * momentum; }
};

/// The imbalances after one outer iteration.
struct HistoryRow {
    int grid = 0;      ///< 0 = coarsest
    int iteration = 0; ///< from 0 (the state that the iterations started from)
    Imbalances imbalances;
};

} // namespace leat
