#include <leat/coupling/lines.hpp>

namespace leat::coupling {

namespace {

/// Part of the net mass outflow that is taken out of the momentum residuals before a correction. It makes the
/// linearisation consistent with mass, which allows hardly damped updates.
constexpr double mass_consistency = 0.9;

} // namespace

LinesCoupling::LinesCoupling(FlowEquations<2>& equations, const Settings& settings)
    : equations_(equations), damping_velocity_(settings.relaxation.velocity),
      damping_pressure_(settings.relaxation.pressure), cells_across_(equations.grid().cells(1))
{
    const auto room = static_cast<std::size_t>(cells_across_) + 4;
    for (field::Values* values :
         {&line_.mass,         &line_.mass_beside, &line_.axial,        &line_.axial_centre, &line_.axial_lower,
          &line_.axial_upper,  &line_.cross,       &line_.cross_centre, &line_.cross_lower,  &line_.cross_upper,
          &line_.axial_mass,   &line_.cross_mass,  &line_.axial_area,   &line_.cross_area,   &line_.along,
          &line_.beyond,       &line_.before,      &line_.constant,     &line_.psi,          &line_.first_upper,
          &line_.second_upper, &line_.pressure}) {
        values->assign(room, 0.0);
    }
}

void LinesCoupling::iterate(FlowState<2>& state, const FlowState<2>* source, bool backwards)
{
    const int stations = equations_.grid().cells(0);
    for (int k = 0; k < stations; ++k) {
        correct_station(state, source, backwards ? stations - 1 - k : k);
    }
}

void LinesCoupling::correct_station(FlowState<2>& state, const FlowState<2>* source, int station)
{
    const field::Box<2>& axial = equations_.momentum(0).solved();
    const bool downstream = station + 1 < axial.end[0];
    const int face = downstream ? station + 1 : station;
    const double sign = downstream ? 1 : -1;
    gather(state, source, station, face);
    solve(station, face, sign);

    const int n = cells_across_;
    const field::Layout<2>& layout = equations_.layout();
    double* __restrict u = state.velocity[0].data() + layout.index({face, 0});
    double* __restrict v = state.velocity[1].data() + layout.index({station, 0});
    double* __restrict p = state.pressure.data() + layout.index({station, 0});
    const double* __restrict psi = line_.psi.data() + 1;
    const double* __restrict mass = line_.mass.data() + 1;
    const double* __restrict inverse_axial = line_.axial_mass.data() + 1;
    const double* __restrict inverse_cross = line_.cross_mass.data() + 1;
    const double* __restrict pressure = line_.pressure.data() + 1;
    for (int j = 0; j < n; ++j) {
        u[j] -= damping_velocity_ * sign * (psi[j + 1] - psi[j] + mass[j]) * inverse_axial[j];
        p[j] += damping_pressure_ * pressure[j];
    }
    for (int j = 1; j < n; ++j) {
        v[j] += damping_velocity_ * psi[j] * inverse_cross[j];
    }
}

/// Residuals and coefficients of one line.
void LinesCoupling::gather(FlowState<2>& state, const FlowState<2>* source, int station, int face)
{
    const int n = cells_across_;
    const int beside = face == station ? station - 1 : station + 1; // the cells on the other side of the axial faces
    double* __restrict mass = line_.mass.data() + 1;
    double* __restrict mass_beside = line_.mass_beside.data() + 1;
    equations_.mass_residual_row(state, source, {station, 0}, mass);
    if (beside < equations_.grid().cells(0)) {
        equations_.mass_residual_row(state, source, {beside, 0}, mass_beside);
    } else {
        for (int j = 0; j < n; ++j) {
            mass_beside[j] = 0;
        }
    }
    const field::Layout<2>& layout = equations_.layout();
    {
        double* __restrict axial = line_.axial.data() + 1;
        const double* __restrict u = state.velocity[0].data() + layout.index({face, 0});
        equations_.momentum_residual_row(0, state, source, {face, 0}, axial);
        equations_.balance(0).line_coefficients({face, 0}, line_.axial_centre.data() + 1, line_.axial_lower.data() + 1,
                                                line_.axial_upper.data() + 1);
        for (int j = 0; j < n; ++j) {
            axial[j] -= mass_consistency * 0.5 * u[j] * (mass[j] + mass_beside[j]);
        }
        line_.axial_lower[1] = 0; // the values beyond the walls are not corrected
        line_.axial_upper[n] = 0;
    }
    {
        double* __restrict cross = line_.cross.data() + 1;
        const double* __restrict v = state.velocity[1].data() + layout.index({station, 0});
        equations_.momentum_residual_row(1, state, source, {station, 0}, cross);
        equations_.balance(1).line_coefficients({station, 0}, line_.cross_centre.data() + 1,
                                                line_.cross_lower.data() + 1, line_.cross_upper.data() + 1);
        for (int j = 1; j < n; ++j) {
            cross[j] -= mass_consistency * 0.5 * v[j] * (mass[j - 1] + mass[j]);
        }
    }
}

/// psi and the pressure corrections of the gathered line. axial_mass and cross_mass are left holding reciprocals.
void LinesCoupling::solve(int station, int face, double sign)
{
    const int n = cells_across_;
    const mesh::ControlVolumes<2>& cells = equations_.cells();
    const double density = equations_.problem().density;
    const double axial_common = cells.area_factor[0][0][face];
    const double cross_common = cells.area_factor[1][0][station];
    const double* __restrict axial_factor = cells.area_factor[0][1].data();
    const double* __restrict cross_factor = cells.area_factor[1][1].data();

    double* __restrict inverse_axial = line_.axial_mass.data() + 1;
    double* __restrict inverse_area = line_.axial_area.data() + 1;
    double* __restrict inverse_cross = line_.cross_mass.data() + 1;
    for (int j = 0; j < n; ++j) {
        inverse_area[j] = 1 / (axial_common * axial_factor[j]);
        inverse_axial[j] = inverse_area[j] / density;
    }
    for (int j = 1; j < n; ++j) {
        inverse_cross[j] = 1 / (density * cross_common * cross_factor[j]);
    }
    const double* __restrict mass = line_.mass.data() + 1;
    const double* __restrict axial = line_.axial.data() + 1;
    const double* __restrict centre = line_.axial_centre.data() + 1;
    const double* __restrict lower = line_.axial_lower.data() + 1;
    const double* __restrict upper = line_.axial_upper.data() + 1;
    double* __restrict al = line_.along.data() + 1;
    double* __restrict be = line_.beyond.data() + 1;
    double* __restrict ga = line_.before.data() + 1;
    double* __restrict constant = line_.constant.data() + 1;
    line_.mass[0] = line_.mass[n + 1] = 0; // factors of zero coefficients
    inverse_axial[-1] = inverse_axial[n] = 0;
    for (int j = 0; j < n; ++j) {
        al[j] = centre[j] * inverse_area[j] * inverse_axial[j];
        be[j] = upper[j] * inverse_area[j] * inverse_axial[j + 1];
        ga[j] = lower[j] * inverse_area[j] * inverse_axial[j - 1];
        constant[j] = sign * axial[j] * inverse_area[j] - al[j] * mass[j] - be[j] * mass[j + 1] - ga[j] * mass[j - 1];
    }

    // The five bands of psi_j, j = 1 .. n - 1, eliminated from below as they are formed.
    const double* __restrict cross = line_.cross.data() + 1;
    const double* __restrict v_centre = line_.cross_centre.data() + 1;
    const double* __restrict v_lower = line_.cross_lower.data() + 1;
    const double* __restrict v_upper = line_.cross_upper.data() + 1;
    double* __restrict psi = line_.psi.data() + 1;
    double* __restrict c1 = line_.first_upper.data() + 1;
    double* __restrict c2 = line_.second_upper.data() + 1;
    c1[-1] = c2[-1] = c1[0] = c2[0] = 0;
    psi[-1] = psi[0] = psi[n] = psi[n + 1] = 0;
    inverse_cross[0] = inverse_cross[n] = 0;
    for (int j = 1; j < n; ++j) {
        const double scale = inverse_cross[j] * density; // 1/(area of the cross face)
        const double b2 = -ga[j - 1];
        const double b1 = ga[j] + ga[j - 1] - al[j - 1] + v_lower[j] * scale * inverse_cross[j - 1];
        const double b0 = al[j] - ga[j] + al[j - 1] - be[j - 1] + v_centre[j] * scale * inverse_cross[j];
        const double a1 = be[j] + be[j - 1] - al[j] + v_upper[j] * scale * inverse_cross[j + 1];
        const double a2 = -be[j];
        const double right = -cross[j] * scale - constant[j] + constant[j - 1];
        const double before = j > 1 ? b2 : 0;
        const double below = b1 - before * c1[j - 2];
        const double pivot = 1 / (b0 - before * c2[j - 2] - below * c1[j - 1]);
        c1[j] = (a1 - below * c2[j - 1]) * pivot;
        c2[j] = a2 * pivot;
        psi[j] = (right - before * psi[j - 2] - below * psi[j - 1]) * pivot;
    }
    c1[n - 1] = c2[n - 1] = 0;
    if (n > 2) {
        c2[n - 2] = 0;
    }
    for (int j = n - 2; j >= 1; --j) {
        psi[j] -= c1[j] * psi[j + 1] + c2[j] * psi[j + 2];
    }
    double* __restrict pressure = line_.pressure.data() + 1;
    for (int j = 0; j < n; ++j) {
        pressure[j] = constant[j] - al[j] * (psi[j + 1] - psi[j]) - be[j] * (psi[j + 2] - psi[j + 1]) -
                      ga[j] * (psi[j] - psi[j - 1]);
    }
}

std::size_t LinesCoupling::bytes() const noexcept
{
    return sizeof(*this) + 22 * line_.psi.size() * sizeof(double);
}

} // namespace leat::coupling
