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
    const int n = cells_across_;
    for (field::Values* values :
         {&line_.mass,          &line_.mass_beside,   &line_.axial,        &line_.axial_centre, &line_.axial_lower,
          &line_.axial_upper,   &line_.cross,         &line_.cross_centre, &line_.cross_lower,  &line_.cross_upper,
          &line_.inverse_axial, &line_.inverse_cross, &line_.along,        &line_.beyond,       &line_.before,
          &line_.constant,      &line_.band_before,   &line_.band_below,   &line_.band_here,    &line_.band_above,
          &line_.band_beyond,   &line_.psi,           &line_.first,        &line_.second}) {
        values->assign(static_cast<std::size_t>(n) + 4, 0.0);
    }
    for (int j = 0; j < n; ++j) {
        line_.inverse_axial[1 + j] = 1 / equations.cells().area_factor[0][1][j];
    }
    for (int j = 1; j < n; ++j) { // walls carry no flow and are left out
        line_.inverse_cross[1 + j] = 1 / equations.cells().area_factor[1][1][j];
    }
}

void LinesCoupling::iterate(FlowState<2>& state, const FlowState<2>* source, bool backwards)
{
    const int stations = equations_.grid().cells(0);
    for (int k = 0; k < stations; ++k) {
        correct_station(state, source, backwards ? stations - 1 - k : k, backwards);
    }
}

void LinesCoupling::correct_station(FlowState<2>& state, const FlowState<2>* source, int station, bool backwards)
{
    const field::Box<2>& axial = equations_.momentum(0).solved();
    // Where an end is closed, the sweep against the flow is the mirror image of the one with it.
    const bool mirrored = backwards && equations_.problem().closed();
    const bool downstream = mirrored ? station < axial.begin[0] : station + 1 < axial.end[0];
    const int face = downstream ? station + 1 : station;
    const double sign = downstream ? 1 : -1;
    gather(state, source, station, face);
    form_bands(station, face, sign);
    solve_bands();

    const int n = cells_across_;
    const field::Layout<2>& layout = equations_.layout();
    double* __restrict u = state.velocity[0].data() + layout.index({face, 0});
    double* __restrict v = state.velocity[1].data() + layout.index({station, 0});
    double* __restrict p = state.pressure.data() + layout.index({station, 0});
    const double* __restrict psi = line_.psi.data() + 1;
    const double* __restrict mass = line_.mass.data() + 1;
    const double* __restrict inverse_axial = line_.inverse_axial.data() + 1;
    const double* __restrict inverse_cross = line_.inverse_cross.data() + 1;
    const double* __restrict constant = line_.constant.data() + 1;
    const double* __restrict al = line_.along.data() + 1;
    const double* __restrict be = line_.beyond.data() + 1;
    const double* __restrict ga = line_.before.data() + 1;
    const double density = equations_.problem().density;
    const double axial_step = damping_velocity_ * sign * inverse_axial_area_ / density;
    const double cross_step = damping_velocity_ * inverse_cross_area_ / density;
    for (int j = 0; j < n; ++j) {
        u[j] -= axial_step * inverse_axial[j] * (psi[j + 1] - psi[j] + mass[j]);
        p[j] += damping_pressure_ * (constant[j] - al[j] * (psi[j + 1] - psi[j]) - be[j] * (psi[j + 2] - psi[j + 1]) -
                                     ga[j] * (psi[j] - psi[j - 1]));
    }
    for (int j = 1; j < n; ++j) {
        v[j] += cross_step * inverse_cross[j] * psi[j];
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

/// The five bands of the gathered line, psi_j for j = 1 .. n - 1, and their right-hand side (in psi).
void LinesCoupling::form_bands(int station, int face, double sign)
{
    const int n = cells_across_;
    const double density = equations_.problem().density;
    inverse_axial_area_ = 1 / equations_.cells().area_factor[0][0][face];
    inverse_cross_area_ = 1 / equations_.cells().area_factor[1][0][station];
    const double* __restrict inverse_axial = line_.inverse_axial.data() + 1;
    const double* __restrict inverse_cross = line_.inverse_cross.data() + 1;
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
    const double per_area = sign * inverse_axial_area_;
    const double per_mass = inverse_axial_area_ * inverse_axial_area_ / density;
    for (int j = 0; j < n; ++j) {
        const double common = per_mass * inverse_axial[j];
        al[j] = common * centre[j] * inverse_axial[j];
        be[j] = common * upper[j] * inverse_axial[j + 1];
        ga[j] = common * lower[j] * inverse_axial[j - 1];
        constant[j] =
            per_area * axial[j] * inverse_axial[j] - al[j] * mass[j] - be[j] * mass[j + 1] - ga[j] * mass[j - 1];
    }
    const double* __restrict cross = line_.cross.data() + 1;
    const double* __restrict v_centre = line_.cross_centre.data() + 1;
    const double* __restrict v_lower = line_.cross_lower.data() + 1;
    const double* __restrict v_upper = line_.cross_upper.data() + 1;
    double* __restrict before = line_.band_before.data() + 1;
    double* __restrict below = line_.band_below.data() + 1;
    double* __restrict here = line_.band_here.data() + 1;
    double* __restrict above = line_.band_above.data() + 1;
    double* __restrict beyond = line_.band_beyond.data() + 1;
    double* __restrict right = line_.psi.data() + 1;
    const double cross_scale = inverse_cross_area_ * inverse_cross_area_ / density;
    for (int j = 1; j < n; ++j) {
        const double common = cross_scale * inverse_cross[j];
        before[j] = -ga[j - 1];
        below[j] = ga[j] + ga[j - 1] - al[j - 1] + common * v_lower[j] * inverse_cross[j - 1];
        here[j] = al[j] - ga[j] + al[j - 1] - be[j - 1] + common * v_centre[j] * inverse_cross[j];
        above[j] = be[j] + be[j - 1] - al[j] + common * v_upper[j] * inverse_cross[j + 1];
        beyond[j] = -be[j];
        right[j] = constant[j - 1] - constant[j] - inverse_cross_area_ * inverse_cross[j] * cross[j];
    }
}

namespace {

/// One elimination through five bands, away from a wall; what the next row needs stays in registers.
struct Elimination {
    double psi_1 = 0, psi_2 = 0;       ///< right-hand sides of the last row and the one before it
    double first_1 = 0, first_2 = 0;   ///< their factors of the next unknown
    double second_1 = 0, second_2 = 0; ///< their factors of the next but one

    /// Takes in the row outer2 psi_{-2} + outer1 psi_{-1} + here psi + inner1 psi_{+1} + inner2 psi_{+2} = right.
    void row(double outer2, double outer1, double here, double inner1, double inner2, double right) noexcept
    {
        const double coupling = outer1 - outer2 * first_2;
        const double pivot = 1 / (here - outer2 * second_2 - coupling * first_1);
        const double psi = (right - outer2 * psi_2 - coupling * psi_1) * pivot;
        const double first = (inner1 - coupling * second_1) * pivot;
        psi_2 = psi_1;
        first_2 = first_1;
        second_2 = second_1;
        psi_1 = psi;
        first_1 = first;
        second_1 = inner2 * pivot;
    }
};

} // namespace

/// Solves the five bands in place: psi holds the right-hand side, then the solution. Rows 1 .. middle are eliminated
/// upwards, leaving psi_j = right_j - first_j psi_{j+1} - second_j psi_{j+2}; rows n - 1 .. middle + 1 downwards
/// likewise with psi_{j-1} and psi_{j-2}; the two meet in two equations for psi_middle and psi_{middle+1}.
void LinesCoupling::solve_bands()
{
    const int n = cells_across_;
    const int middle = (n - 1) / 2;
    const double* __restrict before = line_.band_before.data() + 1;
    const double* __restrict below = line_.band_below.data() + 1;
    const double* __restrict here = line_.band_here.data() + 1;
    const double* __restrict above = line_.band_above.data() + 1;
    const double* __restrict beyond = line_.band_beyond.data() + 1;
    double* __restrict psi = line_.psi.data() + 1;
    double* __restrict first = line_.first.data() + 1;
    double* __restrict second = line_.second.data() + 1;
    psi[-1] = psi[0] = psi[n] = psi[n + 1] = 0;

    Elimination up;
    Elimination down;
    const auto keep = [&](int j, const Elimination& e) {
        psi[j] = e.psi_1;
        first[j] = e.first_1;
        second[j] = e.second_1;
    };
    for (int low = 1, high = n - 1; low <= middle; ++low, --high) { // two independent chains
        up.row(before[low], below[low], here[low], above[low], beyond[low], psi[low]);
        down.row(beyond[high], above[high], here[high], below[high], before[high], psi[high]);
        keep(low, up);
        keep(high, down);
    }
    if (n - 1 - middle > middle) { // one row more than pairs
        const int high = middle + 1;
        down.row(beyond[high], above[high], here[high], below[high], before[high], psi[high]);
        keep(high, down);
    }
    // psi_{middle-1} and psi_{middle+2} put in by their own rows
    const double a00 = 1 - up.second_1 * down.second_2;
    const double a01 = up.first_1 - up.second_1 * down.first_2;
    const double a10 = down.first_1 - down.second_1 * up.first_2;
    const double a11 = 1 - down.second_1 * up.second_2;
    const double r0 = up.psi_1 - up.second_1 * down.psi_2;
    const double r1 = down.psi_1 - down.second_1 * up.psi_2;
    const double inverse = 1 / (a00 * a11 - a01 * a10);
    double low_1 = (r0 * a11 - r1 * a01) * inverse;
    double high_1 = (r1 * a00 - r0 * a10) * inverse;
    if (middle >= 1) {
        psi[middle] = low_1;
    }
    psi[middle + 1] = high_1;
    double low_2 = high_1;
    double high_2 = low_1;
    for (int low = middle - 1, high = middle + 2; high < n; --low, ++high) {
        const double lower = low >= 1 ? psi[low] - first[low] * low_1 - second[low] * low_2 : 0;
        const double upper = psi[high] - first[high] * high_1 - second[high] * high_2;
        low_2 = low_1;
        low_1 = lower;
        high_2 = high_1;
        high_1 = upper;
        if (low >= 1) {
            psi[low] = lower;
        }
        psi[high] = upper;
    }
}

std::size_t LinesCoupling::bytes() const noexcept
{
    return sizeof(*this) + 22 * line_.psi.size() * sizeof(double);
}

} // namespace leat::coupling
