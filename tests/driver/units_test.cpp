#include "catch.hpp"

#include "casefile/quantity.hpp"
#include "units/unit_system.hpp"

using namespace leat::driver;

namespace {

double si(const std::string& text, Dimension dimension)
{
    const UnitSystem units;
    const Conversion conversion = read_quantity(text, dimension, units);
    INFO(text << ": " << conversion.fault);
    REQUIRE(conversion.value.has_value());
    return *conversion.value;
}

std::string fault(const std::string& text, Dimension dimension)
{
    const UnitSystem units;
    const Conversion conversion = read_quantity(text, dimension, units);
    INFO(text << " was taken");
    REQUIRE_FALSE(conversion.value.has_value());
    return conversion.fault;
}

} // namespace

TEST_CASE("the units of the trade are read as meant")
{
    CHECK(si("8 mm", Dimension::length) == Approx(8e-3).epsilon(1e-15));
    CHECK(si("8mm", Dimension::length) == Approx(8e-3).epsilon(1e-15));
    CHECK(si("2 in", Dimension::length) == Approx(0.0508).epsilon(1e-15));
    CHECK(si("5 \u00b5m", Dimension::length) == Approx(5e-6).epsilon(1e-15));
    CHECK(si("3 ft/min", Dimension::velocity) == Approx(3 * 0.3048 / 60).epsilon(1e-14));
    CHECK(si("28 mPa.s", Dimension::dynamic_viscosity) == Approx(28e-3).epsilon(1e-15));
    CHECK(si("28 cP", Dimension::dynamic_viscosity) == Approx(28e-3).epsilon(1e-15));
    CHECK(si("2 P", Dimension::dynamic_viscosity) == Approx(0.2).epsilon(1e-15));
    CHECK(si("32 cSt", Dimension::kinematic_viscosity) == Approx(32e-6).epsilon(1e-15));
    CHECK(si("32 mm\u00b2/s", Dimension::kinematic_viscosity) == Approx(32e-6).epsilon(1e-15));
    CHECK(si("12 L/min", Dimension::volume_flow) == Approx(12e-3 / 60).epsilon(1e-14));
    CHECK(si("40 mL/h", Dimension::volume_flow) == Approx(40e-6 / 3600).epsilon(1e-14));
    CHECK(si("1 gpm", Dimension::volume_flow) == Approx(3.785411784e-3 / 60).epsilon(1e-14));
    CHECK(si("12 L/min/m", Dimension::volume_flow_per_width) == Approx(12e-3 / 60).epsilon(1e-14));
    CHECK(si("3 kg/(h.m)", Dimension::mass_flow_per_width) == Approx(3.0 / 3600).epsilon(1e-14));
    CHECK(si("3 lb/min", Dimension::mass_flow) == Approx(3 * 0.45359237 / 60).epsilon(1e-14));
    CHECK(si("0.2 %", Dimension::ratio) == Approx(2e-3).epsilon(1e-15));
    CHECK(si("+.5e1 kg m-3", Dimension::density) == 5.0);
}

TEST_CASE("a bare number names the unit that would be right")
{
    CHECK(fault("8", Dimension::length) == "has no unit; a length is needed, such as 8 mm");
    CHECK(fault("0.2", Dimension::ratio) == "has no unit; a ratio is needed, such as 0.2 %");
}

TEST_CASE("a wrong dimension names both")
{
    CHECK(fault("8 bar", Dimension::length) == "'bar' is a pressure (m-1.kg.s-2); a length is needed, such as mm");
    CHECK(fault("8 L/min", Dimension::volume_flow_per_width) ==
          "'L/min' is a volume flow (m3.s-1); a volume flow per width is needed, such as L/min/m");
    CHECK(fault("8 cSt", Dimension::dynamic_viscosity) ==
          "'cSt' is a kinematic viscosity (m2.s-1); a dynamic viscosity is needed, such as mPa.s");
    CHECK(fault("8 A", Dimension::length) == "'A' has the dimension of A; a length is needed, such as mm");
    // The data base counts a unit and its reciprocal as convertible.
    CHECK(fault("8 1/m", Dimension::length) == "'1/m' has the dimension of m-1; a length is needed, such as mm");
}

TEST_CASE("what only looks like a unit is refused")
{
    CHECK(fault("8 furlongz", Dimension::length) == "'furlongz' is not a known unit; a length is needed, such as mm");
    CHECK(fault("2 gal/min", Dimension::volume_flow) ==
          "'gal/min' is an acceleration (1 Gal = 1 cm/s^2), no volume; write gpm for US gallons per minute, or "
          "US_liquid_gallon or Canadian_liquid_gallon");
    for (const char* text : {"8 mm 3", "8 3 mm", "8 m since 2000", "8 m @ 5", "8 10 mm", "8 mm.2"}) {
        CHECK(fault(text, Dimension::length).find("is no unit: a unit holds no numbers but exponents") !=
              std::string::npos);
    }
    CHECK(fault("8 lg(re 1 m)", Dimension::length).find("no unit") != std::string::npos);
    CHECK(fault("8 " + std::string(100, 'm'), Dimension::length).find("is too long for a unit") != std::string::npos);
}

TEST_CASE("only finite decimal numbers are read")
{
    CHECK(fault("nan mm", Dimension::length) == "nan is not a finite number; a length is needed, such as 8 mm");
    CHECK(fault("-inf mm", Dimension::length) == "-inf is not a finite number; a length is needed, such as 8 mm");
    CHECK(fault("1e400 mm", Dimension::length) ==
          "1e400 is beyond the range of numbers (1e-307 to 1e308); a length is needed, such as 8 mm");
    CHECK(fault("1e-400 mm", Dimension::length).find("is beyond the range") != std::string::npos);
    CHECK(fault("1e307 Ym", Dimension::length) == "is beyond the range of numbers in m");
    CHECK(fault("0,45 m/s", Dimension::velocity) ==
          "has a decimal comma where a point is needed; a velocity is needed, such as 8 m/s");
    CHECK(fault("eight mm", Dimension::length) == "does not begin with a number; a length is needed, such as 8 mm");
}
