#pragma once

#include <array>
#include <cstddef>
#include <vector>

namespace leat::field {

/// Where the values of a grid stand in memory. One layout serves cells, the faces of every direction and one layer of
/// ghost places: index (i_0, .., i_{D-1}) with -1 <= i_d <= cells[d] + 1, the last direction contiguous.
/// A velocity component stores the face below cell i at index i.
template <int D>
struct Layout {
    std::array<int, D> cells{};
    std::array<std::ptrdiff_t, D> stride{};
    std::ptrdiff_t size = 0;

    Layout() = default;
    explicit Layout(const std::array<int, D>& cell_counts) : cells(cell_counts)
    {
        size = 1;
        for (int d = D - 1; d >= 0; --d) {
            stride[d] = size;
            size *= cells[d] + 3;
        }
    }

    std::ptrdiff_t index(const std::array<int, D>& k) const noexcept
    {
        std::ptrdiff_t at = 0;
        for (int d = 0; d < D; ++d) {
            at += (k[d] + 1) * stride[d];
        }
        return at;
    }
};

/// Values on one layout: a plain contiguous array. (std::vector, so that programs compiled with other vector
/// instructions than the library may hold one.)
using Values = std::vector<double>;

/// An array of zeros for the layout.
template <int D>
Values zeros(const Layout<D>& layout)
{
    return Values(static_cast<std::size_t>(layout.size), 0.0);
}

/// A box of nodes: begin[d] <= k_d < end[d].
template <int D>
struct Box {
    std::array<int, D> begin{};
    std::array<int, D> end{};
};

/// Calls visit(k) for every row of the box: k runs over all directions but the last, whose entry is begin[D-1].
/// The first direction is outermost, so rows are visited in the order in which they stand in memory.
template <int D, class Visit>
void for_each_row(const Box<D>& box, Visit&& visit)
{
    std::array<int, D> k = box.begin;
    for (int d = 0; d < D; ++d) {
        if (box.begin[d] >= box.end[d]) {
            return;
        }
    }
    while (true) {
        visit(static_cast<const std::array<int, D>&>(k));
        int d = D - 2;
        while (d >= 0 && ++k[d] == box.end[d]) {
            k[d] = box.begin[d];
            --d;
        }
        if (d < 0) {
            return;
        }
    }
}

} // namespace leat::field
