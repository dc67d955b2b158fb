#pragma once

#include <leat/monitor/outcome.hpp>

#include <array>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace leat {

/// One engineering number with its uncertainty.
struct Number {
    double value = 0;             ///< always finite, SI
    std::optional<double> band{}; ///< half-width, same unit: holds the exact solution of the stated model
    bool usable = true;           ///< false: do not design with it, see reason
    std::string reason{};           ///< why there is no band, or one wider than wanted, or why it is not usable; else empty
};

/// The numbers of design and trade. Definitions follow Shah & London (1978): README, "What the numbers mean".
/// An absent one has a line in `absent` that says why.
struct Numbers {
    Number reynolds_number;                           ///< rho u_m D_h/mu, 1
    Number hydraulic_diameter;                        ///< m
    Number mean_velocity;                             ///< m/s
    Number mass_flow_rate;                            ///< kg/s (channel: kg/(s m))
    Number pressure_drop;                             ///< Pa, core of the inlet plane to section mean at the end
    std::optional<Number> pressure_drop_from_rest{};  ///< Pa, adds rho u_m^2/2; flat inlet only
    Number pumping_power;                             ///< W (channel: W/m), pressure_drop x volume flow
    Number apparent_friction_factor;                  ///< Fanning, 1
    Number apparent_friction_reynolds;                ///< 1
    Number incremental_pressure_number;               ///< K, 1
    std::optional<Number> development_length{};       ///< m
    Number core_velocity_ratio;                       ///< u_core/u_m at the end, 1
    Number peak_velocity_ratio;                       ///< u_max/u_m at the end, 1
    std::optional<Number> wall_shear_outlet{};        ///< Pa, perimeter mean at the end; not at a cut end
    std::optional<Number> wall_shear_outlet_inner{};  ///< Pa, annulus only
    std::optional<Number> wall_shear_outlet_outer{};  ///< Pa, annulus only
    std::optional<Number> friction_reynolds_outlet{}; ///< local Fanning f x Re at the end, 1; not at a cut end
    std::optional<Number> wall_shear_mean{};          ///< Pa, over all wetted walls; developed inlet only

    struct Absent {
        std::string name;
        std::string reason;
    };
    std::vector<Absent> absent{};
};

/// One row of the list of numbers, for printing and storing.
struct NamedNumber {
    std::string_view name{};          ///< as the member of Numbers
    std::string_view unit{};          ///< SI, "1" when dimensionless; per metre of width for a channel ("W/m")
    std::string_view meaning{};       ///< a few words
    std::optional<Number> number{}; ///< empty: `reason` says why
    std::string reason{};
};

/// Values along the passage; all vectors have the length of x. Empty optional: has no limit or is not defined there.
struct Stations {
    using Column = std::vector<std::optional<double>>;
    std::vector<double> x{};           ///< m from the inlet
    std::vector<double> x_plus{};      ///< x/(D_h Re)
    Column core_pressure;              ///< Pa, relative to the section mean at the end
    Column mean_pressure;              ///< Pa, relative to the section mean at the end
    Column apparent_friction_reynolds; ///< [core(0) - core(x)] D_h Re/(4 x rho u_m^2/2)
    Column local_friction_reynolds;    ///< perimeter mean
    Column wall_shear;                 ///< Pa, perimeter mean
    Column wall_shear_inner;           ///< Pa; annulus only, else empty
    Column wall_shear_outer;           ///< Pa; annulus only, else empty
    Column wall_shear_lower;           ///< Pa; channel only, else empty
    Column wall_shear_upper;           ///< Pa; channel only, else empty
    Column core_velocity_ratio;        ///< u_core/u_m
    Column peak_velocity_ratio;        ///< u_max/u_m
};

/// One row of a list of station columns.
struct NamedColumn {
    std::string_view name{}; ///< as the member of Stations
    std::string_view unit{};
    std::string_view meaning{};
    Stations::Column values;
};

/// One of the nested grids that were solved on, coarsest first, each halved in both directions from the next.
struct GridReport {
    std::array<int, 2> cells{}; ///< along (tail included) and across
    int iterations = 0; ///< on this grid; its solve starts from still coarser ones of its own
    double seconds = 0; ///< wall time of the whole solve on it; the only member of an Answer that differs between equal runs
};

/// The solution on the finest grid, SI. Point (i, j) has x = points_x[i], y = points_y[j]; i runs along, j across.
/// Tube: y = radius. Channel: y = distance from the lower wall, lower half. Annulus: y = radius.
struct Fields {
    std::array<int, 2> cells{};                 ///< ni, nj; the tail of a continued duct is included
    std::vector<double> points_x{};             ///< ni + 1
    std::vector<double> points_y{};             ///< nj + 1
    std::vector<double> pressure{};             ///< Pa relative to the mean at the end; [j*ni + i]
    std::vector<double> velocity_along{};       ///< m/s at cell centres, [j*ni + i]
    std::vector<double> velocity_across{};      ///< m/s at cell centres, [j*ni + i]
    std::vector<double> face_velocity_along{};  ///< m/s on the faces crossed, [j*(ni+1) + i], nj rows
    std::vector<double> face_velocity_across{}; ///< m/s on the faces crossed, [j*ni + i], nj+1 rows
};

/// The developed-flow and handbook view of the same passage, to stand beside the computed numbers.
struct HandbookEstimate {
    std::optional<double> pressure_drop{}; ///< Pa; empty where no handbook constants exist
    std::string source{};                    ///< the correlation, by author and year
    std::string remark{};                    ///< "constants interpolated between r* = 0.1 and 0.5"; why none; else empty
};

/// What comes back from a solve.
struct Answer {
    Outcome outcome = Outcome::stalled;
    bool usable = false; ///< the numbers may be used
    std::string message{}; ///< one sentence: which rule fired, with its values
    Numbers numbers;
    Stations stations;
    Imbalances imbalances;
    std::vector<std::string> cautions{};
    HandbookEstimate handbook;
    std::vector<GridReport> grids{};
    std::vector<HistoryRow> history{};
    std::optional<Fields> fields{}; ///< with Options::keep_fields
    bool channel = false;           ///< numbers are per metre of width

    /// Every number of the contract in its fixed order, absent ones with their reason.
    std::vector<NamedNumber> named_numbers() const;
    /// Every station column in its fixed order; those that the shape does not have are left out.
    std::vector<NamedColumn> named_columns() const;
};

} // namespace leat
