#include <leat/passage/developed.hpp>
#include <leat/passage/rounded_text.hpp>
#include <leat/passage/shah_correlation.hpp>

#include <array>
#include <cmath>

namespace leat::passage {

namespace {

struct TableRow {
    double ratio;  // inner/outer diameter
    double excess; // K_inf
    double blend;  // C
};

constexpr std::array<TableRow, 4> annulus_table{{{shah_least_ratio, 0.830, 0.000050},
                                                 {0.10, 0.784, 0.000043},
                                                 {0.50, 0.688, 0.000032},
                                                 {shah_largest_ratio, 0.678, 0.000030}}};

std::optional<ShahConstants> constants(const Tube&)
{
    return ShahConstants{1.25, 16, 0.000212, {}};
}
std::optional<ShahConstants> constants(const Channel&)
{
    return ShahConstants{0.674, 24, 0.000029, {}};
}

std::optional<ShahConstants> constants(const Annulus& annulus)
{
    // Diameters typed as decimals give ratios that miss a tabulated one by rounding only.
    constexpr double rounding = 1e-12;
    const double ratio = annulus.inner_diameter / annulus.outer_diameter;
    const double friction = developed_flow(annulus).friction_reynolds;
    for (std::size_t i = 0; i < annulus_table.size(); ++i) {
        const TableRow& row = annulus_table[i];
        if (std::abs(ratio - row.ratio) <= rounding) {
            return ShahConstants{row.excess, friction, row.blend, {}};
        }
        if (i > 0 && ratio > annulus_table[i - 1].ratio && ratio < row.ratio) {
            const TableRow& below = annulus_table[i - 1];
            const double share = (ratio - below.ratio) / (row.ratio - below.ratio);
            return ShahConstants{
                std::lerp(below.excess, row.excess, share), friction, std::lerp(below.blend, row.blend, share),
                "K and C interpolated between r* = " + rounded_text(below.ratio) + " and " + rounded_text(row.ratio)};
        }
    }
    return std::nullopt;
}

} // namespace

double ShahConstants::apparent_friction_reynolds(double x_plus) const
{
    const double start = 3.44 / std::sqrt(x_plus);
    return start + (excess / (4 * x_plus) + friction_reynolds - start) / (1 + blend / (x_plus * x_plus));
}

std::optional<ShahConstants> shah_constants(const Shape& shape)
{
    return std::visit([](const auto& kind) { return constants(kind); }, shape);
}

} // namespace leat::passage
