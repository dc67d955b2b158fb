#pragma once

#include <leat/passage/answer.hpp>

/// An answer with few numbers, enough to print.
inline leat::Answer sample_answer(leat::Outcome outcome)
{
    leat::Answer answer;
    answer.outcome = outcome;
    answer.usable = outcome == leat::Outcome::converged;
    answer.message = "imbalances below the tolerance";
    answer.numbers.pressure_drop.value = 8435.2345;
    answer.numbers.pressure_drop.reason = "not estimated";
    answer.numbers.reynolds_number.value = 111.2142857;
    answer.numbers.reynolds_number.band = 0.0123;
    answer.numbers.absent.push_back({"development_length", "the passage ends before"});
    answer.stations.x = {0.0, 0.1};
    answer.stations.x_plus = {0.0, 0.11};
    const leat::Stations::Column column{std::nullopt, 2.5};
    answer.stations.core_pressure = column;
    answer.stations.mean_pressure = column;
    answer.stations.apparent_friction_reynolds = column;
    answer.stations.local_friction_reynolds = column;
    answer.stations.wall_shear = column;
    answer.stations.core_velocity_ratio = column;
    answer.stations.peak_velocity_ratio = column;
    answer.imbalances = {3.14e-12, 2.5e-11};
    answer.cautions = {"the flow is fast"};
    answer.handbook = {8400.0, "Shah 1978", "high Reynolds numbers"};
    answer.grids = {{{80, 20}, 12, 0.1}, {{160, 40}, 34, 0.2}};
    return answer;
}
