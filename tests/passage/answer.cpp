#include "catch.hpp"

#include <leat/passage/answer.hpp>

using namespace leat;

namespace {

std::vector<std::string> names(const auto& rows)
{
    std::vector<std::string> list;
    for (const auto& row : rows) {
        list.emplace_back(row.name);
    }
    return list;
}

const NamedNumber& named(const std::vector<NamedNumber>& rows, std::string_view name)
{
    for (const NamedNumber& row : rows) {
        if (row.name == name) {
            return row;
        }
    }
    throw std::runtime_error("no number of that name");
}

} // namespace

TEST_CASE("Outcomes have their names", "[answer]")
{
    CHECK(name(Outcome::converged) == "converged");
    CHECK(name(Outcome::stalled) == "stalled");
    CHECK(name(Outcome::diverged) == "diverged");
    CHECK(name(Outcome::out_of_budget) == "out_of_budget");
    CHECK(name(Outcome::cancelled) == "cancelled");
}

TEST_CASE("Numbers are listed all, in their order, absent ones with a reason", "[answer]")
{
    Answer answer;
    answer.numbers.pressure_drop = {.value = 5, .band = 0.5, .usable = true, .reason = {}};
    answer.numbers.wall_shear_outlet_inner = Number{.value = 7, .band = std::nullopt, .usable = false, .reason = "why"};
    answer.numbers.absent = {{"development_length", "ends earlier"}};
    const auto rows = answer.named_numbers();
    CHECK(names(rows) ==
          std::vector<std::string>{"reynolds_number", "hydraulic_diameter", "mean_velocity", "mass_flow_rate",
                                   "pressure_drop", "pressure_drop_from_rest", "pumping_power",
                                   "apparent_friction_factor", "apparent_friction_reynolds",
                                   "incremental_pressure_number", "development_length", "core_velocity_ratio",
                                   "peak_velocity_ratio", "wall_shear_outlet", "wall_shear_outlet_inner",
                                   "wall_shear_outlet_outer", "friction_reynolds_outlet", "wall_shear_mean"});
    CHECK(named(rows, "pressure_drop").number->value == 5);
    CHECK(named(rows, "pressure_drop").number->band == 0.5);
    CHECK(named(rows, "wall_shear_outlet_inner").number->reason == "why");
    CHECK_FALSE(named(rows, "development_length").number.has_value());
    CHECK(named(rows, "development_length").reason == "ends earlier");
    for (const NamedNumber& row : rows) {
        CHECK(row.number.has_value() == row.reason.empty());
        CHECK_FALSE(row.unit.empty());
        CHECK_FALSE(row.meaning.empty());
    }
}

TEST_CASE("A channel's extensive numbers are per metre of width", "[answer]")
{
    Answer answer;
    CHECK(named(answer.named_numbers(), "mass_flow_rate").unit == "kg/s");
    CHECK(named(answer.named_numbers(), "pumping_power").unit == "W");
    answer.channel = true;
    CHECK(named(answer.named_numbers(), "mass_flow_rate").unit == "kg/(s m)");
    CHECK(named(answer.named_numbers(), "pumping_power").unit == "W/m");
}

TEST_CASE("Station columns leave out the walls that a shape does not have", "[answer]")
{
    Answer answer;
    Stations& stations = answer.stations;
    stations.x = {0, 1};
    stations.x_plus = {0, 0.1};
    const Stations::Column column{std::nullopt, 2.0};
    for (const auto member : {&Stations::core_pressure, &Stations::mean_pressure, &Stations::apparent_friction_reynolds,
                              &Stations::local_friction_reynolds, &Stations::wall_shear, &Stations::core_velocity_ratio,
                              &Stations::peak_velocity_ratio}) {
        stations.*member = column;
    }
    const std::vector<std::string> tube{"x",
                                        "x_plus",
                                        "core_pressure",
                                        "mean_pressure",
                                        "apparent_friction_reynolds",
                                        "local_friction_reynolds",
                                        "wall_shear",
                                        "core_velocity_ratio",
                                        "peak_velocity_ratio"};
    CHECK(names(answer.named_columns()) == tube);
    CHECK(answer.named_columns()[0].values == Stations::Column{0.0, 1.0});
    CHECK(answer.named_columns()[2].values == column);

    std::vector<std::string> channel = tube;
    channel.insert(channel.begin() + 7, {"wall_shear_lower", "wall_shear_upper"});
    stations.wall_shear_lower = stations.wall_shear_upper = column;
    CHECK(names(answer.named_columns()) == channel);

    std::vector<std::string> annulus = tube;
    annulus.insert(annulus.begin() + 7, {"wall_shear_inner", "wall_shear_outer"});
    stations.wall_shear_lower = stations.wall_shear_upper = {};
    stations.wall_shear_inner = stations.wall_shear_outer = column;
    CHECK(names(answer.named_columns()) == annulus);
}
