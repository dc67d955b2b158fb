#include "casefile/vocabulary.hpp"

#include <array>

namespace leat::driver {

namespace {

using Word = std::string_view;

constexpr std::array<Word, 5> sections{"passage", "fluid", "inlet", "accuracy", "numerics"};
constexpr std::array<Word, 8> passage_keys{"shape",          "diameter", "gap",    "inner_diameter",
                                           "outer_diameter", "length",   "outlet", "stations"};
constexpr std::array<Word, 3> fluid_keys{"density", "viscosity", "kinematic_viscosity"};
constexpr std::array<Word, 6> inlet_keys{"profile",   "table",          "mean_velocity",
                                         "flow_rate", "mass_flow_rate", "reynolds_number"};
constexpr std::array<Word, 2> accuracy_keys{"band", "band_on"};
constexpr std::array<Word, 8> numerics_keys{"scheme_along", "scheme_across", "coupling",   "cells",
                                            "cell_budget",  "relaxation",    "iterations", "tolerance"};
constexpr std::array<Word, 3> shapes{"tube", "channel", "annulus"};
constexpr std::array<Word, 2> tube_sizes{"diameter", "length"};
constexpr std::array<Word, 2> channel_sizes{"gap", "length"};
constexpr std::array<Word, 3> annulus_sizes{"inner_diameter", "outer_diameter", "length"};
constexpr std::array<Word, 4> flows{"mean_velocity", "flow_rate", "mass_flow_rate", "reynolds_number"};

} // namespace

std::span<const Word> known_sections()
{
    return sections;
}

std::span<const Word> known_keys(Word section)
{
    if (section == "passage") {
        return passage_keys;
    }
    if (section == "fluid") {
        return fluid_keys;
    }
    if (section == "inlet") {
        return inlet_keys;
    }
    if (section == "accuracy") {
        return accuracy_keys;
    }
    if (section == "numerics") {
        return numerics_keys;
    }
    return {};
}

std::span<const Word> known_shapes()
{
    return shapes;
}

std::span<const Word> size_keys(Word shape)
{
    if (shape == "tube") {
        return tube_sizes;
    }
    if (shape == "channel") {
        return channel_sizes;
    }
    if (shape == "annulus") {
        return annulus_sizes;
    }
    return {};
}

std::span<const Word> flow_keys()
{
    return flows;
}

} // namespace leat::driver
