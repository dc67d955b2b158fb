#pragma once

#include <array>
#include <vector>

namespace leat::mesh {

/// Which orthogonal coordinates a grid uses. Direction 0 is x, the axial one. Cartesian: x, y[, z].
/// Cylindrical: x, r[, angle]; a two-dimensional cylindrical grid spans one radian.
enum class Coordinates { cartesian, cylindrical };

/// An orthogonal tensor-product grid in D = 2 or 3 directions, given by its faces along each direction.
/// Value type; holds one-dimensional arrays only.
template <int D>
class Grid {
public:
    /// faces[d]: at least two, strictly increasing; radii >= 0. Throws InvalidInput.
    Grid(Coordinates coordinates, std::array<std::vector<double>, D> faces);

    Coordinates coordinates() const noexcept { return coordinates_; }
    int cells(int direction) const noexcept { return static_cast<int>(faces_[direction].size()) - 1; }
    std::array<int, D> cells() const noexcept;
    const std::vector<double>& faces(int direction) const noexcept { return faces_[direction]; }
    /// Midpoints of the cells along one direction.
    std::vector<double> centres(int direction) const;

    /// True where every second face along `direction` can be left out.
    bool can_coarsen(int direction) const noexcept { return cells(direction) % 2 == 0; }
    /// The grid whose cells are unions of two cells along each direction with halve[d]. Throws InvalidInput when a
    /// direction to be halved has an odd number of cells.
    Grid coarsened(std::array<bool, D> halve) const;

private:
    Coordinates coordinates_;
    std::array<std::vector<double>, D> faces_;
};

extern template class Grid<2>;
extern template class Grid<3>;

} // namespace leat::mesh
