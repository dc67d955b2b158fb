#pragma once

#include <leat/mesh/duct.hpp>
#include <leat/mesh/grid.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>

#include <vector>

namespace leat::passage {

/// The grid of a passage in units of the hydraulic diameter. Across: radius of a tube or annulus, distance from the
/// lower wall up to the middle of a channel.
struct DuctGrid {
    std::vector<double> along;  ///< faces from the inlet, tail included
    std::vector<double> across; ///< faces
    int end = 0;                ///< along[end] is the end of the passage
    bool cylindrical = false;

    mesh::Grid<2> grid() const;
    double count() const noexcept; ///< of cells, tail included
    /// True where every second face can be left out in both directions, the end staying a face and enough being left.
    bool can_coarsen() const noexcept;
    /// The grid whose cells are unions of two by two cells of this one; can_coarsen() must hold.
    DuctGrid coarsened() const;
};

/// The grid of a valid passage with so many cells along (tail excluded) and across, by Options::cells' rules.
DuctGrid make_grid(const Passage& passage, const Derived& derived, std::array<int, 2> cells);

/// The grids that a passage is solved on, coarsest first, each made of two by two cells of the next. With
/// Options::cells these and their coarsenings, four grids where possible, three in any case. Otherwise from 20 x 5
/// cells (an annulus has more across) up to the last that Options::cell_budget allows, three in any case.
std::vector<DuctGrid> nested_grids(const Passage& passage, const Derived& derived, const Options& options);

/// Which of the nested grids should do for the wanted band on the pressure drop; an estimate.
std::size_t grid_for_band(const std::vector<DuctGrid>& grids, const Accuracy& accuracy, const Options& options);

} // namespace leat::passage
