#include <leat/scheme/scheme.hpp>

#include <cmath>

namespace leat {

namespace {

constexpr std::array<std::string_view, 7> names = {"upwind", "central",  "power_law", "linear_upwind",
                                                   "quick",  "van_leer", "minmod"};

} // namespace

std::string_view name(Scheme scheme) noexcept
{
    return names[static_cast<std::size_t>(scheme)];
}

std::optional<Scheme> scheme_named(std::string_view text) noexcept
{
    for (std::size_t k = 0; k < names.size(); ++k) {
        if (names[k] == text) {
            return static_cast<Scheme>(k);
        }
    }
    return std::nullopt;
}

const std::vector<Scheme>& all_schemes()
{
    static const std::vector<Scheme> all = {Scheme::upwind, Scheme::central,  Scheme::power_law, Scheme::linear_upwind,
                                            Scheme::quick,  Scheme::van_leer, Scheme::minmod};
    return all;
}

namespace scheme {

FaceWeights face_weights(Scheme scheme, double x_far, double x_up, double x_down, double x_face) noexcept
{
    switch (scheme) {
    case Scheme::central: {
        const double down = (x_face - x_up) / (x_down - x_up);
        return {0, 1 - down, down};
    }
    case Scheme::linear_upwind: {
        const double beyond = (x_face - x_up) / (x_up - x_far);
        return {-beyond, 1 + beyond, 0};
    }
    case Scheme::quick: { // Lagrange's parabola
        const double far = (x_face - x_up) * (x_face - x_down) / ((x_far - x_up) * (x_far - x_down));
        const double up = (x_face - x_far) * (x_face - x_down) / ((x_up - x_far) * (x_up - x_down));
        return {far, up, 1 - far - up};
    }
    case Scheme::upwind:
    case Scheme::power_law:
    case Scheme::van_leer:
    case Scheme::minmod:
        break;
    }
    return {};
}

DirectionalScheme::DirectionalScheme(Scheme scheme, const mesh::AxisTable& node, const mesh::AxisTable& face, int nodes,
                                     std::array<End, 2> ends)
    : scheme_(scheme)
{
    // Node -1 exists where the end has a boundary value; beyond a free end or an end on a node there is nothing.
    const int lowest = ends[0] == End::value ? -1 : 0;
    const int highest = ends[1] == End::value ? nodes : nodes - 1;
    for (int sense = 0; sense < 2; ++sense) {
        for (auto* table : {&far_, &up_, &down_, &ratio_, &reach_}) {
            (*table)[sense] = mesh::AxisTable(nodes);
        }
        for (int f = 0; f <= nodes; ++f) {
            const int up = sense == 0 ? f - 1 : f;
            const int down = sense == 0 ? f : f - 1;
            const int far = sense == 0 ? f - 2 : f + 1;
            FaceWeights weights;
            if (f == 0 || f == nodes) { // a boundary face: the boundary value, or that of the node beside it
                const bool known = ends[f == 0 ? 0 : 1] == End::value;
                const int source = known == (f == 0) ? f - 1 : f;
                weights = {0, source == up ? 1.0 : 0.0, source == up ? 0.0 : 1.0};
            } else if (scheme != Scheme::upwind && scheme != Scheme::power_law && (far < lowest || far > highest)) {
                // psi of a limited scheme is off there: its weights alone carry the central value
                weights = face_weights(Scheme::central, 0, node[up], node[down], face[f]);
            } else {
                const bool far_exists = far >= lowest && far <= highest;
                weights = face_weights(scheme, far_exists ? node[far] : 0, node[up], node[down], face[f]);
                if (!linear()) {
                    ratio_[sense][f] = (node[down] - node[up]) / (node[up] - node[far]);
                    reach_[sense][f] = (face[f] - node[up]) / (node[down] - node[up]);
                }
            }
            far_[sense][f] = weights.far;
            up_[sense][f] = weights.up;
            down_[sense][f] = weights.down;
        }
    }
}

} // namespace scheme
} // namespace leat
