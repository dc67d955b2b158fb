#pragma once

#include <functional>

namespace leat {

/// What an observer is told after every outer iteration.
struct Progress {
    int grid = 0;          ///< 0 = coarsest
    int grid_count = 0;    ///< grids that are planned
    int iteration = 0;     ///< on this grid
    double mass = 0;       ///< imbalance, see Imbalances
    double momentum = 0;   ///< imbalance, see Imbalances
};

/// Called from the solving thread. An exception thrown by it passes through to the caller of solve().
using Observer = std::function<void(const Progress&)>;

} // namespace leat
