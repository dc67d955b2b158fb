#include "catch.hpp"

#include <leat/mesh/control_volumes.hpp>
#include <leat/scheme/scheme.hpp>

#include <cmath>
#include <random>
#include <vector>

using namespace leat;
using End = scheme::DirectionalScheme::End;

namespace {

constexpr int cells = 7;

mesh::ControlVolumes<2> random_volumes(int shift)
{
    std::mt19937 random(5);
    std::uniform_real_distribution<double> step(0.2, 1);
    std::vector<double> faces = {0.4};
    for (int k = 0; k < cells; ++k) {
        faces.push_back(faces.back() + step(random));
    }
    return {mesh::Grid<2>(mesh::Coordinates::cartesian, {faces, {0, 1}}), shift};
}

double profile(double x, double curvature)
{
    return 2 - 0.7 * x + curvature * x * x;
}

/// What the scheme gives on face f for the profile.
double face_value(const scheme::DirectionalScheme& s, const mesh::AxisTable& node, int f, int sense, double curvature)
{
    const int up = sense == 0 ? f - 1 : f;
    const int down = sense == 0 ? f : f - 1;
    const int far = sense == 0 ? f - 2 : f + 1;
    double sum = s.up(sense)[f] * profile(node[up], curvature) + s.down(sense)[f] * profile(node[down], curvature);
    if (s.linear()) {
        if (s.far(sense)[f] != 0) {
            sum += s.far(sense)[f] * profile(node[far], curvature);
        }
    } else if (s.ratio(sense)[f] != 0) {
        const double step = profile(node[down], curvature) - profile(node[up], curvature);
        const double r = s.ratio(sense)[f] * (profile(node[up], curvature) - profile(node[far], curvature)) / step;
        CHECK(r == Approx(1).epsilon(1e-12)); // asked for linear profiles only
        sum += scheme::limiter(s.scheme(), r) * s.reach(sense)[f] * step;
    }
    return sum;
}

bool second_order(Scheme scheme)
{
    return scheme != Scheme::upwind && scheme != Scheme::power_law;
}

} // namespace

TEST_CASE("Along a stretched direction every inner face of a second-order scheme is exact for linear profiles",
          "[scheme]")
{
    for (const int shift : {-1, 0}) {
        const auto volumes = random_volumes(shift);
        const int nodes = volumes.nodes(0);
        const std::vector<End> ends =
            shift == 0 ? std::vector<End>{End::on_node} : std::vector<End>{End::value, End::free};
        for (const Scheme scheme : all_schemes()) {
            for (const End end : ends) {
                const scheme::DirectionalScheme s(scheme, volumes.node[0], volumes.face[0], nodes, {end, end});
                for (int sense = 0; sense < 2; ++sense) {
                    for (int f = 1; f < nodes; ++f) {
                        INFO(name(scheme) << " shift " << shift << " sense " << sense << " face " << f);
                        const double error =
                            face_value(s, volumes.node[0], f, sense, 0) - profile(volumes.face[0][f], 0);
                        if (second_order(scheme)) {
                            CHECK(std::abs(error) < 1e-12);
                        } else {
                            CHECK(std::abs(error) > 1e-3);
                        }
                    }
                }
            }
        }
    }
}

TEST_CASE("Along a stretched direction quick is exact for quadratic profiles where it reaches", "[scheme]")
{
    const auto volumes = random_volumes(-1);
    const scheme::DirectionalScheme s(Scheme::quick, volumes.node[0], volumes.face[0], cells, {End::value, End::value});
    for (int sense = 0; sense < 2; ++sense) {
        for (int f = 1; f < cells; ++f) {
            CHECK(face_value(s, volumes.node[0], f, sense, 0.3) ==
                  Approx(profile(volumes.face[0][f], 0.3)).epsilon(1e-12));
        }
    }
}

TEST_CASE("On a boundary face both senses name the boundary value or the node beside it", "[scheme]")
{
    const auto volumes = random_volumes(-1);
    for (const Scheme scheme : all_schemes()) {
        for (const bool known : {true, false}) {
            const End end = known ? End::value : End::free;
            const scheme::DirectionalScheme s(scheme, volumes.node[0], volumes.face[0], cells, {end, end});
            for (const int f : {0, cells}) {
                const int node = known ? (f == 0 ? -1 : cells) : (f == 0 ? 0 : cells - 1);
                INFO(name(scheme) << " face " << f << " node " << node);
                for (int sense = 0; sense < 2; ++sense) {
                    CHECK(face_value(s, volumes.node[0], f, sense, 0) == Approx(profile(volumes.node[0][node], 0)));
                    CHECK(s.up(sense)[f] + s.down(sense)[f] == 1);
                    CHECK(s.far(sense)[f] == 0);
                }
            }
        }
    }
}

TEST_CASE("A limited scheme adds nothing at a face whose far node does not exist", "[scheme]")
{
    const auto volumes = random_volumes(-1);
    for (const Scheme scheme : {Scheme::van_leer, Scheme::minmod}) {
        const scheme::DirectionalScheme s(scheme, volumes.node[0], volumes.face[0], cells, {End::free, End::free});
        CHECK(s.reach(0)[1] == 0);
        CHECK(s.reach(1)[cells - 1] == 0);
        CHECK(s.reach(1)[1] > 0);
        CHECK(s.reach(0)[cells - 1] > 0);
    }
}
