#pragma once

#include <leat/passage/duct_flow.hpp>

#include <vector>

namespace leat::passage {

/// What is read off a solved duct at every axial face and cell, in scaled units (D_h, u_m, density u_m^2), tail
/// included. From these, values at any x come by field::interpolate, one order above the scheme.
struct Readings {
    std::vector<double> face;          ///< x of the axial faces
    std::vector<double> core_velocity; ///< at the core: axis, middle of a channel, radius of an annulus' developed peak
    std::vector<double> peak_velocity; ///< the greatest over the section

    std::vector<double> shear_face;  ///< x of the axial faces but the first
    std::vector<double> shear_first; ///< Fanning f x Re of the wall at the lower position (channel, inner wall)
    std::vector<double> shear_last;  ///< of the wall at the higher position (tube, outer wall)
    std::vector<double> shear_mean;  ///< perimeter mean

    std::vector<double> pressure_at; ///< x of the cell centres
    std::vector<double> core_pressure;
    std::vector<double> mean_at;       ///< x of the cell centres; a cut end, where the mean is 0, added
    std::vector<double> mean_pressure; ///< section mean

    double core_pressure_inlet = 0; ///< at x = 0
    double mean_pressure_first = 0; ///< section mean in the first cells; behind a flat inlet it has no limit
    double mean_pressure_end = 0;   ///< at the end of the passage
    bool reverse_flow_end = false;  ///< somewhere in the end section the flow runs back
};

/// The wall shear is the one that the momentum balance uses: the difference between the wall and the node beside it.
/// In a balance scheme that flux converges at second order, while a one-sided formula through the nodes beside the
/// wall inherits their local error divided by a cell and converges at first order only.
Readings read_duct(const Passage& passage, const Derived& derived, const DuctFlow& flow);

} // namespace leat::passage
