#pragma once

#include <leat/mesh/grading.hpp>

#include <string>
#include <vector>

/// The gradings that a builder may use, at several strengths.
struct NamedGrading {
    std::string name;
    leat::mesh::Grading map;
};

inline std::vector<NamedGrading> gradings()
{
    using namespace leat::mesh;
    std::vector<NamedGrading> all = {{"uniform", uniform()}};
    for (const double strength : {0.0, 0.3, 1.0, 2.5, 5.0}) {
        const std::string at = std::to_string(strength);
        all.push_back({"towards_start " + at, towards_start(strength)});
        all.push_back({"towards_end " + at, towards_end(strength)});
        all.push_back({"towards_both " + at, towards_both(strength)});
    }
    return all;
}
