#include <leat/passage/cell_fields.hpp>

namespace leat::passage {

Fields make_fields(const Derived& derived, const DuctFlow& flow, const Readings& readings)
{
    const field::Layout<2>& layout = flow.equations().layout();
    const coupling::FlowState<2>& state = flow.state();
    const double velocity = derived.mean_velocity;
    const double pressure = derived.density * velocity * velocity;
    const int ni = layout.cells[0];
    const int nj = layout.cells[1];
    Fields fields;
    fields.cells = {ni, nj};
    for (const double x : flow.grid.along) {
        fields.points_x.push_back(x * derived.hydraulic_diameter);
    }
    for (const double y : flow.grid.across) {
        fields.points_y.push_back(y * derived.hydraulic_diameter);
    }
    for (int j = 0; j <= nj; ++j) {
        for (int i = 0; i <= ni; ++i) {
            const auto at = layout.index({i, j});
            const double u = state.velocity[0][at] * velocity;
            const double v = state.velocity[1][at] * velocity;
            if (j < nj) {
                fields.face_velocity_along.push_back(u);
            }
            if (i < ni) {
                fields.face_velocity_across.push_back(v);
            }
            if (j < nj && i < ni) {
                const double u_beyond = state.velocity[0][at + layout.stride[0]] * velocity;
                const double v_beyond = state.velocity[1][at + layout.stride[1]] * velocity;
                fields.velocity_along.push_back(0.5 * (u + u_beyond));
                fields.velocity_across.push_back(0.5 * (v + v_beyond));
                fields.pressure.push_back((state.pressure[at] - readings.mean_pressure_end) * pressure);
            }
        }
    }
    return fields;
}

} // namespace leat::passage
