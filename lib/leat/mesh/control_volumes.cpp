#include <leat/mesh/control_volumes.hpp>

namespace leat::mesh {

namespace {

/// Nodes and faces of one direction.
void place(const std::vector<double>& faces, bool shifted, AxisTable& node, AxisTable& face)
{
    const int n = static_cast<int>(faces.size()) - 1;
    node = AxisTable(n);
    face = AxisTable(n);
    const auto centre = [&](int k) { return 0.5 * (faces[k] + faces[k + 1]); };
    if (shifted) {
        face[0] = faces[0];
        for (int k = 0; k <= n; ++k) {
            node[k] = faces[k];
            face[k + 1] = k < n ? centre(k) : faces[n];
        }
        node[-1] = faces[0];
    } else {
        for (int k = 0; k <= n; ++k) {
            face[k] = faces[k];
            node[k] = k < n ? centre(k) : faces[n];
        }
        node[-1] = faces[0];
        node[n + 1] = faces[n];
        face[n + 1] = faces[n];
    }
    face[-1] = faces[0];
}

} // namespace

template <int D>
ControlVolumes<D>::ControlVolumes(const Grid<D>& grid, int shift)
    : shift_(shift), coordinates_(grid.coordinates()), cells_(grid.cells())
{
    const bool cylindrical = coordinates_ == Coordinates::cylindrical;
    for (int e = 0; e < D; ++e) {
        place(grid.faces(e), e == shift_, node[e], face[e]);
        volume_factor[e] = AxisTable(cells_[e]);
        for (int d = 0; d < D; ++d) {
            area_factor[d][e] = AxisTable(cells_[e]);
            conductance_factor[d][e] = AxisTable(cells_[e]);
        }
        const bool radial = cylindrical && e == 1;
        for (int k = 0; k < nodes(e); ++k) {
            const double width = face[e][k + 1] - face[e][k];
            // r dr integrated exactly: r at the middle of the faces times the width
            const double ring = radial ? 0.5 * (face[e][k + 1] + face[e][k]) * width : width;
            volume_factor[e][k] = ring;
            for (int d = 0; d < D; ++d) {
                if (d == e) {
                    continue;
                }
                const bool around = radial && d == 2; // faces of constant angle: dx dr, a distance of r d(angle)
                area_factor[d][e][k] = around ? width : ring;
                conductance_factor[d][e][k] = around ? width / node[e][k] : ring;
            }
        }
        for (int k = 0; k <= nodes(e); ++k) {
            const double scale = radial ? face[e][k] : 1;
            const double distance = node[e][k] - node[e][k - 1];
            area_factor[e][e][k] = scale;
            conductance_factor[e][e][k] = distance > 0 ? scale / distance : 0;
        }
        if (e == shift_) { // the outermost faces pass through nodes that lie on the boundary
            conductance_factor[e][e][0] = 0;
            conductance_factor[e][e][nodes(e)] = 0;
        }
    }
}

template <int D>
double ControlVolumes<D>::volume(const std::array<int, D>& k) const noexcept
{
    double product = 1;
    for (int e = 0; e < D; ++e) {
        product *= volume_factor[e][k[e]];
    }
    return product;
}

template <int D>
double ControlVolumes<D>::area(int d, const std::array<int, D>& k) const noexcept
{
    double product = 1;
    for (int e = 0; e < D; ++e) {
        product *= area_factor[d][e][k[e]];
    }
    return product;
}

template class ControlVolumes<2>;
template class ControlVolumes<3>;

} // namespace leat::mesh
