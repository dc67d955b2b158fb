#pragma once

#include <leat/field/layout.hpp>
#include <leat/mesh/control_volumes.hpp>

#include <array>

namespace leat::balance {

/// The mass flow through the faces of some control volumes, taken from face velocities of the grid.
/// For the cells themselves it is density x area x velocity. For shifted volumes each face takes half of the flow of
/// the two cell faces that it covers, so that mass is balanced on shifted volumes wherever it is on the cells.
template <int D>
class MassFlow {
public:
    /// `cells` are the unshifted volumes and must outlive this object. shift: as ControlVolumes::shift().
    MassFlow(const mesh::ControlVolumes<D>& cells, const field::Layout<D>& layout, double density, int shift)
        : cells_(&cells), layout_(layout), density_(density), shift_(shift)
    {
    }

    /// Face velocities on the layout, one pointer per direction.
    using Velocity = std::array<const double*, D>;

    /// Mass flow (towards rising index) through the lower faces in direction d of the nodes (row, j), begin <= j < end,
    /// into out[j]. `row` gives the indices of all directions but the last. kg/s (per radian, or per metre of depth).
    void row(const Velocity& velocity, int d, const std::array<int, D>& row, int begin, int end, double* out) const;

private:
    /// out[j] = flow through the grid's own faces in direction d.
    void cell_faces(const Velocity& velocity, int d, const std::array<int, D>& row, int begin, int end,
                    double* out) const;
    /// Density x the area factors of a row.
    double row_factor(int d, const std::array<int, D>& row) const noexcept;

    const mesh::ControlVolumes<D>* cells_;
    field::Layout<D> layout_;
    double density_;
    int shift_;
};

extern template class MassFlow<2>;
extern template class MassFlow<3>;

} // namespace leat::balance
