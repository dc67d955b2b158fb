#pragma once

#include <leat/passage/passage.hpp>

#include <string>
#include <vector>

namespace leat::driver {

/// One size, or what follows from the sizes, in SI.
struct StatedValue {
    std::string name;
    double value = 0;
    std::string unit;
};

/// "tube", "channel" or "annulus".
std::string shape_name(const Shape& shape);
/// "flat", "developed" or "table".
std::string profile_name(InletProfile profile);
/// "continues" or "cut".
std::string outlet_name(Outlet outlet);
/// The sizes of a shape, length included.
std::vector<StatedValue> sizes_of(const Shape& shape);
/// What follows from a passage by arithmetic; per metre of width for a channel.
std::vector<StatedValue> derived_values(const Derived& derived, const Shape& shape);

} // namespace leat::driver
