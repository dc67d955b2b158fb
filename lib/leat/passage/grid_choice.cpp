#include <leat/passage/grid_choice.hpp>

#include <leat/passage/section.hpp>

#include <algorithm>
#include <cmath>

namespace leat::passage {

namespace {

// The error of the scheme falls with the square of the cell size. Measured over tubes and channels at Re 10 to 1e4,
// 160 x 40 cells keep the pressure drop within about 0.1 % of the limit; the wanted band scales the counts from there.
constexpr double reference_band = 0.002;
constexpr double reference_across = 40;
constexpr int along_per_across = 4;
constexpr int least_across = 16;
constexpr int most_across = 256;

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

/// Number of cells across for the wanted band: a multiple of 8, so that nested grids exist.
int cells_across(double band)
{
    const double wanted = reference_across * std::sqrt(reference_band / band);
    return std::clamp(8 * static_cast<int>(std::lround(wanted / 8)), least_across, most_across);
}

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
    return along.size() % 2 == 1 && across.size() % 2 == 1 && end % 2 == 0;
}

DuctGrid DuctGrid::coarsened() const
{
    const mesh::Grid<2> coarse = grid().coarsened({true, true});
    return {coarse.faces(0), coarse.faces(1), end / 2, cylindrical};
}

DuctGrid choose_grid(const Passage& passage, const Derived& derived, const Accuracy& accuracy, const Options& options)
{
    const int per_half = cells_across(accuracy.band); // from a wall to the middle
    const auto* annulus = std::get_if<Annulus>(&passage.shape);
    const int chosen_across = annulus != nullptr ? cells_across_gap(*annulus, per_half) : per_half;
    const int across = options.cells ? (*options.cells)[1] : chosen_across;
    const int along = options.cells ? (*options.cells)[0] : along_per_across * per_half;
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

} // namespace leat::passage
