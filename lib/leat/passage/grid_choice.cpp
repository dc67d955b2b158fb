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
constexpr double annulus_strength = 1.2;

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

} // namespace

mesh::Grid<2> DuctGrid::grid() const
{
    return {cylindrical ? mesh::Coordinates::cylindrical : mesh::Coordinates::cartesian, {along, across}};
}

DuctGrid choose_grid(const Passage& passage, const Derived& derived, const Accuracy& accuracy, const Options& options)
{
    const int across = options.cells ? (*options.cells)[1] : cells_across(accuracy.band);
    const int along = options.cells ? (*options.cells)[0] : along_per_across * across;
    const double diameter = derived.hydraulic_diameter;

    DuctGrid result;
    if (const auto* tube = std::get_if<Tube>(&passage.shape)) {
        result.cylindrical = true;
        result.across = mesh::sample(mesh::centre_to_wall(wall_strength), across, 0, 0.5 * tube->diameter / diameter);
    } else if (const auto* channel = std::get_if<Channel>(&passage.shape)) {
        result.across = mesh::sample(mesh::wall_to_centre(wall_strength), across, 0, 0.5 * channel->gap / diameter);
    } else {
        const Annulus& annulus = std::get<Annulus>(passage.shape);
        result.cylindrical = true;
        const double ratio = annulus.inner_diameter / annulus.outer_diameter;
        result.across = mesh::sample(mesh::wall_to_wall(annulus_strength, ratio), across,
                                     0.5 * annulus.inner_diameter / diameter, 0.5 * annulus.outer_diameter / diameter);
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
