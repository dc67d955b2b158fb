#pragma once

#include <leat/mesh/axis_table.hpp>

#include <array>
#include <optional>
#include <string_view>
#include <vector>

namespace leat {

/// How a convected value is interpolated to a face.
enum class Scheme {
    upwind,        ///< the upstream value; first order
    central,       ///< linear between the two neighbours; second order
    power_law,     ///< Patankar (1980), section 5.2: upstream value, diffusion scaled by max(0, (1 - 0.1 |Pe|)^5)
    linear_upwind, ///< linear from the two upstream values (Warming & Beam 1976); second order
    quick,         ///< parabola through two upstream values and one downstream (Leonard 1979)
    van_leer,      ///< limited, ratio of gradients r: psi = (r + |r|)/(1 + |r|) (van Leer 1974)
    minmod         ///< limited: psi = max(0, min(1, r)) (Roe 1986)
};

/// "upwind", "central", ... as written in a case file.
std::string_view name(Scheme scheme) noexcept;
/// The scheme of that name; empty when there is none.
std::optional<Scheme> scheme_named(std::string_view text) noexcept;
/// All schemes, in the order of the enum.
const std::vector<Scheme>& all_schemes();

namespace scheme {

/// Weights of one face for one sense of the flow: value = far * phi_far + up * phi_up + down * phi_down, where `up`
/// is the neighbour on the upstream side, `far` the one beyond it and `down` the neighbour downstream.
struct FaceWeights {
    double far = 0;
    double up = 1;
    double down = 0;
};

/// Geometry that a limited scheme needs beside its weights, for one sense of the flow:
/// r = ratio * (phi_up - phi_far)/(phi_down - phi_up), value = phi_up + psi(r) * reach * (phi_down - phi_up).
struct FaceReach {
    double ratio = 0;
    double reach = 0;
};

/// A scheme along one direction of some control volumes. Face f stands between nodes f - 1 and f.
/// Stretched-grid weights are exact for linear profiles (QUICK: quadratic).
/// A face whose `far` node does not exist (at an end where no boundary value is known) falls back to central.
class DirectionalScheme {
public:
    /// What is known at one end of the direction.
    enum class End {
        value,   ///< the ghost node holds the value on the boundary face
        free,    ///< nothing is prescribed: the value on the boundary face is that of the node beside it
        on_node, ///< the outermost node itself lies on the boundary (shifted volumes)
    };

    /// node: coordinates with ghosts; face: coordinates of faces 0 .. nodes.
    DirectionalScheme(Scheme scheme, const mesh::AxisTable& node, const mesh::AxisTable& face, int nodes,
                      std::array<End, 2> ends);

    Scheme scheme() const noexcept { return scheme_; }
    /// True where the face value depends on the solution only through fixed weights.
    bool linear() const noexcept { return scheme_ != Scheme::van_leer && scheme_ != Scheme::minmod; }

    /// Pointers to the entry of face 0, for kernels; [0] for flow towards rising index, [1] against it.
    const double* far(int sense) const noexcept { return far_[sense].data(); }
    const double* up(int sense) const noexcept { return up_[sense].data(); }
    const double* down(int sense) const noexcept { return down_[sense].data(); }
    const double* ratio(int sense) const noexcept { return ratio_[sense].data(); }
    const double* reach(int sense) const noexcept { return reach_[sense].data(); }

private:
    Scheme scheme_;
    std::array<mesh::AxisTable, 2> far_, up_, down_, ratio_, reach_;
};

/// The weights of `scheme` for a face at x_face with nodes at x_far, x_up, x_down (in either sense).
/// Limited schemes and the power law give their linear part: the upstream value.
FaceWeights face_weights(Scheme scheme, double x_far, double x_up, double x_down, double x_face) noexcept;

/// The limiter of van_leer or minmod at gradient ratio r.
inline double limiter(Scheme scheme, double r) noexcept
{
    if (scheme == Scheme::van_leer) {
        return r > 0 ? 2 - 2 / (1 + r) : 0.0; // 2 r/(1 + r), finite however small the downstream difference
    }
    return r < 0 ? 0.0 : (r < 1 ? r : 1.0);
}

/// Patankar's factor on the diffusive conductance at |flux|/conductance = peclet.
inline double power_law_factor(double peclet) noexcept
{
    const double base = 1 - 0.1 * peclet;
    return base > 0 ? base * base * base * base * base : 0.0;
}

} // namespace scheme
} // namespace leat
