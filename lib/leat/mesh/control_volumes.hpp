#pragma once

#include <leat/mesh/axis_table.hpp>
#include <leat/mesh/grid.hpp>

#include <array>

namespace leat::mesh {

/// The control volumes of one kind of unknown on a grid: the cells themselves, or the cells shifted by half a cell
/// along one direction (the volumes of the velocity component that crosses the faces of that direction).
///
/// Along direction d there are nodes(d) volumes. Node k has the lower face k and the upper face k + 1. Shifted
/// volumes have one node more than there are cells; their first and last are half cells whose node lies on the
/// boundary. Ghost nodes -1 and nodes(d) lie on the boundary faces of unshifted directions.
///
/// All metrics are products of one-dimensional factors:
///   volume(k)   = prod_e volume_factor[e][k_e]
///   area_d(k)   = prod_e area_factor[d][e][k_e]        lower face of node k in direction d
///   area/distance between nodes k - 1 and k likewise    conductance_factor[d][e][k_e]
template <int D>
class ControlVolumes {
public:
    static constexpr int unshifted = -1;

    ControlVolumes(const Grid<D>& grid, int shift);

    int shift() const noexcept { return shift_; }
    int nodes(int d) const noexcept { return cells_[d] + (d == shift_ ? 1 : 0); }
    int cells(int d) const noexcept { return cells_[d]; }
    Coordinates coordinates() const noexcept { return coordinates_; }

    std::array<AxisTable, D> node;                              ///< coordinates of nodes, ghosts included
    std::array<AxisTable, D> face;                              ///< coordinates of faces 0 .. nodes
    std::array<AxisTable, D> volume_factor;                     ///< zero at ghosts
    std::array<std::array<AxisTable, D>, D> area_factor;        ///< zero at ghosts of the other directions
    std::array<std::array<AxisTable, D>, D> conductance_factor; ///< zero where node and face coincide

    double volume(const std::array<int, D>& k) const noexcept;
    double area(int d, const std::array<int, D>& k) const noexcept;

private:
    int shift_;
    Coordinates coordinates_;
    std::array<int, D> cells_;
};

extern template class ControlVolumes<2>;
extern template class ControlVolumes<3>;

} // namespace leat::mesh
