#include <leat/passage/grid_choice.hpp>

#include <leat/passage/section.hpp>

#include <algorithm>
#include <cmath>

namespace leat::passage {

namespace {

// The error of the scheme falls with the square of the cell size. Measured over tubes and channels at Re 10 to 1e4,
// 160 x 40 cells keep the pressure drop within about 0.1 % of the limit; the wanted band scales the counts from there.
constexpr double reference_band = 0.002;
constexpr double reference_along = 160;

// The finest of the first three grids: it costs a millisecond, and its quarter still holds a boundary layer.
constexpr std::array<int, 2> first_cells = {80, 20}; // between a wall and the middle
constexpr std::size_t least_grids = 3;               // that an error band needs
constexpr std::size_t best_grids = 4;                // that it can use
constexpr int least_coarse_along = 4;
constexpr int least_coarse_across = 2; // of the coupled lines

// The wall cell is about a/sinh(a) of the mean one. Measured against the limit at x+ >= 0.001 and Re up to 1e4: at 2.2
// the near-inlet layers and the developed friction are resolved alike; 1.6 loses a factor of three near the inlet.
constexpr double wall_strength = 2.2;

// An annulus has two walls to resolve. A thin inner cylinder needs more: below this radius ratio the logarithm of the
// ratio adds cells and clustering (developed friction on 160 x 80 cells: 0.04 % at 0.5, 0.06 % at 0.02, 0.08 % at
// 0.001).
constexpr double annulus_strength = 1.2;
constexpr double thin_radius_ratio = 0.02;
constexpr double strength_per_logarithm = 0.15;
constexpr double cells_per_logarithm = 0.1;

// A tail of 1.5 D_h: disturbances from an end die at least like exp(-7.7 x/D) in a tube, exp(-8.4 x/D_h) in a channel.
constexpr double tail_length = 1.5;

/// The flow at a flat inlet turns within a fraction of a diameter, however long the passage: the first cell follows the
/// wall cell, not the length (in D_h). Cells then grow in proportion to x, so that a long passage costs little, and
/// near-square cells at the inlet corner keep multigrid at its best.
double first_cell_along(double length, int cells, double wall_cell)
{
    return std::min(length / cells, 0.5 * wall_cell);
}

/// How much thinner than thin_radius_ratio the inner cylinder is, as a logarithm.
double thinness(const Annulus& annulus)
{
    return std::max(0.0, std::log(thin_radius_ratio * annulus.outer_diameter / annulus.inner_diameter));
}

/// Cells over the whole gap, a multiple of 8, from those between a wall and the middle.
int cells_across_gap(const Annulus& annulus, int per_half)
{
    const double per_gap = (2 + cells_per_logarithm * thinness(annulus)) * per_half;
    return 8 * static_cast<int>(std::lround(per_gap / 8));
}

} // namespace

mesh::Grid<2> DuctGrid::grid() const
{
    return {cylindrical ? mesh::Coordinates::cylindrical : mesh::Coordinates::cartesian, {along, across}};
}

bool DuctGrid::can_coarsen() const noexcept
{
    const std::size_t cells_along = along.size() - 1;
    const std::size_t cells_across = across.size() - 1;
    return cells_along % 2 == 0 && cells_across % 2 == 0 && end % 2 == 0 && end / 2 >= least_coarse_along &&
           cells_across / 2 >= least_coarse_across;
}

double DuctGrid::count() const noexcept
{
    return static_cast<double>(along.size() - 1) * static_cast<double>(across.size() - 1);
}

DuctGrid DuctGrid::coarsened() const
{
    const mesh::Grid<2> coarse = grid().coarsened({true, true});
    return {coarse.faces(0), coarse.faces(1), end / 2, cylindrical};
}

DuctGrid make_grid(const Passage& passage, const Derived& derived, std::array<int, 2> cells)
{
    const auto [along, across] = cells;
    const auto* annulus = std::get_if<Annulus>(&passage.shape);
    const double diameter = derived.hydraulic_diameter;

    DuctGrid result;
    if (const auto* tube = std::get_if<Tube>(&passage.shape)) {
        result.cylindrical = true;
        result.across = mesh::sample(mesh::centre_to_wall(wall_strength), across, 0, 0.5 * tube->diameter / diameter);
    } else if (const auto* channel = std::get_if<Channel>(&passage.shape)) {
        result.across = mesh::sample(mesh::wall_to_centre(wall_strength), across, 0, 0.5 * channel->gap / diameter);
    } else {
        result.cylindrical = true;
        const double ratio = annulus->inner_diameter / annulus->outer_diameter;
        const double strength = annulus_strength + strength_per_logarithm * thinness(*annulus);
        result.across =
            mesh::sample(mesh::wall_to_wall(strength, ratio), across, 0.5 * annulus->inner_diameter / diameter,
                         0.5 * annulus->outer_diameter / diameter);
    }
    const double wall_cell =
        std::min(result.across[1] - result.across[0], result.across[across] - result.across[across - 1]);
    mesh::AlongDuct wish;
    wish.cells = along;
    wish.length = derived.length / diameter;
    wish.first_cell = first_cell_along(wish.length, along, wall_cell);
    wish.tail_length = passage.outlet == Outlet::continues ? tail_length : 0;
    const mesh::DuctFaces faces = mesh::along_duct(wish);
    result.along = faces.faces;
    result.end = faces.end;
    return result;
}

std::vector<DuctGrid> nested_grids(const Passage& passage, const Derived& derived, const Options& options)
{
    std::array<int, 2> cells = options.cells.value_or(first_cells);
    std::size_t least = least_grids;
    if (options.cells) {
        least = best_grids;
    } else {
        if (const auto* annulus = std::get_if<Annulus>(&passage.shape)) {
            cells[1] = cells_across_gap(*annulus, first_cells[1]);
        }
        const DuctGrid first = make_grid(passage, derived, cells); // to count its tail too
        for (double next = 4.0 * first.count(); next <= options.cell_budget; next *= 4) {
            cells = {2 * cells[0], 2 * cells[1]};
            ++least;
        }
    }
    std::vector<DuctGrid> grids = {make_grid(passage, derived, cells)};
    while (grids.size() < least && grids.back().can_coarsen()) {
        grids.push_back(grids.back().coarsened());
    }
    std::reverse(grids.begin(), grids.end());
    return grids;
}

std::size_t grid_for_band(const std::vector<DuctGrid>& grids, const Accuracy& accuracy, const Options& options)
{
    std::size_t chosen = options.cells ? grids.size() - 1 : least_grids - 1;
    while (chosen + 1 < grids.size() &&
           grids[chosen].end < reference_along * std::sqrt(reference_band / accuracy.band)) {
        ++chosen;
    }
    return chosen;
}

} // namespace leat::passage
