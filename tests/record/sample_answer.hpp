#pragma once

#include <leat/passage/answer.hpp>

namespace leat::test {

/// A tube's answer with plausible, all different values on so many cells; some numbers and station values are absent.
inline Answer sample_answer(int ni = 6, int nj = 4)
{
    Answer answer;
    answer.outcome = Outcome::out_of_budget;
    Numbers& numbers = answer.numbers;
    numbers.reynolds_number.value = 111.2142857142857;
    numbers.hydraulic_diameter.value = 8e-3;
    numbers.mean_velocity.value = 0.45;
    numbers.mass_flow_rate.value = 0.0195658;
    numbers.pressure_drop = {.value = 9623.25, .band = 12.5, .usable = true, .reason = ""};
    numbers.pressure_drop_from_rest = Number{.value = 9710.83, .band = {}, .usable = true, .reason = "one grid only"};
    numbers.pumping_power = {.value = 0.2176, .band = {}, .usable = false, .reason = "iterations were spent"};
    numbers.apparent_friction_reynolds.value = 16.31;
    numbers.core_velocity_ratio.value = 1.9999;
    numbers.development_length = Number{.value = 0.0503, .band = 1e-4, .usable = true, .reason = ""};
    numbers.absent.push_back({"wall_shear_mean", "no limit at a flat inlet"});

    Stations& stations = answer.stations;
    stations.x = {0, 0.75, 1.5};
    stations.x_plus = {0, 0.843, 1.686};
    stations.core_pressure = {9623.25, 4800.5, 0.0};
    stations.mean_pressure = {std::nullopt, 4800.25, 0.0};
    stations.apparent_friction_reynolds = {std::nullopt, 16.6, 16.3};
    stations.local_friction_reynolds = {std::nullopt, 16.001, 16.0};
    stations.wall_shear = {std::nullopt, 12.6001, 12.6};
    stations.core_velocity_ratio = {1, 1.999, 2};
    stations.peak_velocity_ratio = {1, 1.999, 2};

    answer.history = {{0, 0, {1, 0.5}}, {0, 1, {0.1, 0.25}}, {1, 0, {0.01, 0.0625}}};

    Fields fields;
    fields.cells = {ni, nj};
    const auto fill = [](std::vector<double>& values, int length, double start, double step) {
        for (int k = 0; k < length; ++k) {
            values.push_back(start + step * k);
        }
    };
    fill(fields.points_x, ni + 1, 0, 0.25);
    fill(fields.points_y, nj + 1, 0, 0.001);
    fill(fields.pressure, ni * nj, 1000, -0.1);
    fill(fields.velocity_along, ni * nj, 0.9, -0.0013);
    fill(fields.velocity_across, ni * nj, -0.01, 0.0007);
    fill(fields.face_velocity_along, (ni + 1) * nj, 0.8, -0.0011);
    fill(fields.face_velocity_across, ni * (nj + 1), -0.02, 0.0005);
    answer.fields = fields;
    return answer;
}

} // namespace leat::test
