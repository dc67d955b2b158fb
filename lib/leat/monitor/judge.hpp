#pragma once

#include <leat/monitor/outcome.hpp>

#include <optional>
#include <string>

namespace leat::monitor {

/// When to stop.
struct Rules {
    double tolerance = 1e-9; ///< converged when mass <= tolerance and momentum <= tolerance
    int iterations = 20000;  ///< out_of_budget when this many are done without converging
    int patience = 20;       ///< stalled when the worst imbalance has not fallen below `progress` times the best ...
    double progress = 0.9;   ///< ... seen before, for `patience` iterations on end
    double growth = 1e6;     ///< diverged when the worst imbalance exceeds growth x the first one, or is not finite
};

/// Watches the imbalances of one grid and says when to stop. Every run ends within a bounded number of iterations
/// whatever it is fed: progress by the factor `progress` can happen only so often between the first imbalance and 0.
class Judge {
public:
    explicit Judge(const Rules& rules) : rules_(rules) {}

    /// Takes in the state before the first iteration (number 0) and after each one. Empty: go on.
    std::optional<Outcome> judge(const Imbalances& imbalances);
    /// The rule that fired, with its values; valid after an outcome.
    const std::string& message() const noexcept { return message_; }
    int iterations() const noexcept { return count_ - 1; }
    double best() const noexcept { return best_; }

private:
    Rules rules_;
    int count_ = 0;
    int since_progress_ = 0;
    double first_ = 0;
    double best_ = 0;
    std::string message_;
};

} // namespace leat::monitor
