#include <leat/coupling/lines.hpp>

#include <leat/linear/pentadiagonal.hpp>

#include <algorithm>

namespace leat::coupling {

namespace {

/// Part of the net mass outflow that is taken out of the momentum residuals before a correction. It makes the
/// linearisation consistent with mass, which allows hardly damped updates.
constexpr double mass_consistency = 0.9;

} // namespace

LinesCoupling::LinesCoupling(FlowEquations<2>& equations, const Settings& settings)
    : equations_(equations), damping_velocity_(settings.relaxation.velocity),
      damping_pressure_(settings.relaxation.pressure), cells_across_(equations.grid().cells(1)),
      room_(equations.grid().cells(1) + 4)
{
    const int n = cells_across_;
    const int stations = equations.grid().cells(0);
    // At a closed end the pairing of cells and faces depends on the sense of the sweep, and with it the factors.
    const bool can_hold = settings.may_hold && !equations.problem().closed();
    is_held_.assign(can_hold ? static_cast<std::size_t>(stations) : 0, 0);
    factors_.assign(static_cast<std::size_t>(room_) * factor_count * (can_hold ? stations : 1), 0.0);
    for (field::Values* values : {&line_.mass, &line_.mass_beside, &line_.axial, &line_.cross, &line_.centre,
                                  &line_.lower, &line_.upper, &line_.band_below, &line_.band_here, &line_.band_above,
                                  &line_.inverse_axial, &line_.inverse_cross, &line_.constant, &line_.psi}) {
        values->assign(static_cast<std::size_t>(room_), 0.0);
    }
    for (int j = 0; j < n; ++j) {
        line_.inverse_axial[1 + j] = 1 / equations.cells().area_factor[0][1][j];
    }
    for (int j = 1; j < n; ++j) { // walls carry no flow and are left out
        line_.inverse_cross[1 + j] = 1 / equations.cells().area_factor[1][1][j];
    }
}

void LinesCoupling::hold_linearisation() noexcept
{
    hold_ = !is_held_.empty();
    std::fill(is_held_.begin(), is_held_.end(), static_cast<unsigned char>(0));
}

LinesCoupling::Factors LinesCoupling::factors_of(int station) noexcept
{
    double* start = factors_.data() + (hold_ ? station : 0) * factor_count * room_ + 1;
    return {start, start + room_, start + 2 * room_, start + 3 * room_, start + 4 * room_, start + 5 * room_};
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
    const Factors factors = factors_of(station);
    const int n = cells_across_;

    inverse_axial_area_ = 1 / equations_.cells().area_factor[0][0][face];
    inverse_cross_area_ = 1 / equations_.cells().area_factor[1][0][station];
    balances(state, source, station, face);
    if (!hold_ || is_held_[station] == 0) {
        linearise(station, face, factors);
        if (hold_) {
            is_held_[station] = 1;
        }
    }
    right_hand_side(sign, factors);
    linear::solve(n - 1, {factors.before, factors.beyond + 1},
                  {factors.pivot + 1, factors.outward + 1, factors.inward + 1}, line_.psi.data() + 2);
    update(state, station, face, sign, factors);
}

/// Residuals of one line.
void LinesCoupling::balances(const FlowState<2>& state, const FlowState<2>* source, int station, int face)
{
    const int n = cells_across_;
    const int beside = face == station ? station - 1 : station + 1; // the cells on the other side of the axial faces
    double* __restrict mass = line_.mass.data() + 1;
    double* __restrict mass_beside = line_.mass_beside.data() + 1;
    equations_.mass_residual_row(state, source, {station, 0}, mass);
    if (beside < equations_.grid().cells(0)) {
        equations_.mass_residual_row(state, source, {beside, 0}, mass_beside);
    } else {
        std::fill(line_.mass_beside.begin(), line_.mass_beside.end(), 0.0);
    }
    const field::Layout<2>& layout = equations_.layout();
    double* __restrict axial = line_.axial.data() + 1;
    const double* __restrict u = state.velocity[0].data() + layout.index({face, 0});
    equations_.momentum_residual_row(0, state, source, {face, 0}, axial);
    for (int j = 0; j < n; ++j) {
        axial[j] -= mass_consistency * 0.5 * u[j] * (mass[j] + mass_beside[j]);
    }
    double* __restrict cross = line_.cross.data() + 1;
    const double* __restrict v = state.velocity[1].data() + layout.index({station, 0});
    equations_.momentum_residual_row(1, state, source, {station, 0}, cross);
    for (int j = 1; j < n; ++j) {
        cross[j] -= mass_consistency * 0.5 * v[j] * (mass[j - 1] + mass[j]);
    }
}

/// The five bands of psi_j, j = 1 .. n - 1, and their factors, from the mass flows that balances() has left behind.
void LinesCoupling::linearise(int station, int face, const Factors& factors)
{
    const int n = cells_across_;
    const double density = equations_.problem().density;
    double* __restrict centre = line_.centre.data() + 1;
    double* __restrict lower = line_.lower.data() + 1;
    double* __restrict upper = line_.upper.data() + 1;
    const double* __restrict inverse_axial = line_.inverse_axial.data() + 1;
    const double* __restrict inverse_cross = line_.inverse_cross.data() + 1;
    double* __restrict along = factors.along;
    double* __restrict beyond = factors.beyond;
    double* __restrict before = factors.before;

    equations_.balance(0).line_coefficients({face, 0}, centre, lower, upper);
    lower[0] = 0; // the values beyond the walls are not corrected
    upper[n - 1] = 0;
    const double per_mass = inverse_axial_area_ * inverse_axial_area_ / density;
    for (int j = 0; j < n; ++j) {
        const double common = per_mass * inverse_axial[j];
        along[j] = common * centre[j] * inverse_axial[j];
        beyond[j] = -common * upper[j] * inverse_axial[j + 1];
        before[j] = -common * lower[j] * inverse_axial[j - 1];
    }

    equations_.balance(1).line_coefficients({station, 0}, centre, lower, upper);
    double* __restrict below_1 = line_.band_below.data() + 1;
    double* __restrict here = line_.band_here.data() + 1;
    double* __restrict above_1 = line_.band_above.data() + 1;
    const double cross_scale = inverse_cross_area_ * inverse_cross_area_ / density;
    for (int j = 1; j < n; ++j) {
        const double common = cross_scale * inverse_cross[j];
        below_1[j] = common * lower[j] * inverse_cross[j - 1] - before[j] - before[j - 1] - along[j - 1];
        here[j] = common * centre[j] * inverse_cross[j] + along[j] + before[j] + along[j - 1] + beyond[j - 1];
        above_1[j] = common * upper[j] * inverse_cross[j + 1] - beyond[j] - beyond[j - 1] - along[j];
    }
    linear::factorise(n - 1, {factors.before, factors.beyond + 1}, below_1 + 1, here + 1, above_1 + 1,
                      {factors.pivot + 1, factors.outward + 1, factors.inward + 1});
}

/// What a pressure correction is without psi, and the right-hand side of the system for psi.
void LinesCoupling::right_hand_side(double sign, const Factors& factors)
{
    const int n = cells_across_;
    const double* __restrict inverse_axial = line_.inverse_axial.data() + 1;
    const double* __restrict inverse_cross = line_.inverse_cross.data() + 1;
    const double* __restrict axial = line_.axial.data() + 1;
    const double* __restrict cross = line_.cross.data() + 1;
    const double* __restrict mass = line_.mass.data() + 1;
    double* __restrict constant = line_.constant.data() + 1;
    double* __restrict right = line_.psi.data() + 1;
    const double per_area = sign * inverse_axial_area_;
    line_.mass[0] = line_.mass[n + 1] = 0; // factors of zero coefficients
    for (int j = 0; j < n; ++j) {
        constant[j] = per_area * axial[j] * inverse_axial[j] - factors.along[j] * mass[j] +
                      factors.beyond[j] * mass[j + 1] + factors.before[j] * mass[j - 1];
    }
    for (int j = 1; j < n; ++j) {
        right[j] = constant[j - 1] - constant[j] - inverse_cross_area_ * inverse_cross[j] * cross[j];
    }
}

/// Puts the corrections of one line in.
void LinesCoupling::update(FlowState<2>& state, int station, int face, double sign, const Factors& factors) const
{
    const int n = cells_across_;
    const field::Layout<2>& layout = equations_.layout();
    double* __restrict u = state.velocity[0].data() + layout.index({face, 0});
    double* __restrict v = state.velocity[1].data() + layout.index({station, 0});
    double* __restrict p = state.pressure.data() + layout.index({station, 0});
    const double* __restrict psi = line_.psi.data() + 1; // zero on both walls and beyond
    const double* __restrict mass = line_.mass.data() + 1;
    const double* __restrict inverse_axial = line_.inverse_axial.data() + 1;
    const double* __restrict inverse_cross = line_.inverse_cross.data() + 1;
    const double* __restrict constant = line_.constant.data() + 1;
    const double density = equations_.problem().density;
    const double axial_step = damping_velocity_ * sign * inverse_axial_area_ / density;
    const double cross_step = damping_velocity_ * inverse_cross_area_ / density;
    for (int j = 0; j < n; ++j) {
        const double outflow = psi[j + 1] - psi[j];
        u[j] -= axial_step * inverse_axial[j] * (outflow + mass[j]);
        p[j] += damping_pressure_ *
                (constant[j] - factors.along[j] * outflow + factors.beyond[j] * (psi[j + 2] - psi[j + 1]) +
                 factors.before[j] * (psi[j] - psi[j - 1]));
    }
    for (int j = 1; j < n; ++j) {
        v[j] += cross_step * inverse_cross[j] * psi[j];
    }
}

std::size_t LinesCoupling::bytes() const noexcept
{
    const std::size_t line = sizeof(Line) / sizeof(field::Values) * static_cast<std::size_t>(room_);
    return sizeof(*this) + (factors_.size() + line) * sizeof(double) + is_held_.size();
}

} // namespace leat::coupling
