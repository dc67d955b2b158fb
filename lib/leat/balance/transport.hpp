#pragma once

#include <leat/balance/mass_flow.hpp>
#include <leat/field/layout.hpp>
#include <leat/mesh/control_volumes.hpp>
#include <leat/scheme/scheme.hpp>

#include <array>
#include <vector>

namespace leat::balance {

/// What holds for a transported quantity on one side of its control volumes.
struct Side {
    enum class Kind {
        value,    ///< the value on the boundary face is given (in the ghost place of the field)
        flux,     ///< no diffusive flux but what is put into the source (add_side_flux); convected: the node's value
        exchange, ///< diffusive flux = coefficient x (ambient - face value); the ambient stands in the ghost place
        on_node,  ///< shifted volumes: the outermost node lies on the side and its value is given
        open      ///< shifted volumes: the outermost node lies on the side and is solved for; no diffusive flux
    };
    Kind kind = Kind::value;
    double coefficient = 0; ///< exchange only: flux density per unit of difference
};

/// A quantity transported through control volumes by convection and diffusion:
///   net outflow of (mass flow x value - diffusivity x gradient) + sink x value = source.
/// Holds geometry and scheme; the values, the mass flow and the source come with each call.
template <int D>
class Transport {
public:
    struct Setup {
        double diffusivity = 0; ///< of value per (mass flow x value): Pa s for velocity, k/c_p for temperature
        std::array<std::array<Side, 2>, D> sides{};
        std::array<Scheme, D> schemes{};
        bool hoop = false; ///< adds diffusivity x value/r^2 per volume: the hoop term of a radial component
    };

    /// Throws InvalidInput for exchange through a side of constant angle: the distance to it grows with the radius
    /// and the exchange does not, so that their sum in series is no product of one-dimensional factors.
    Transport(const mesh::Grid<D>& grid, int shift, const Setup& setup);

    const mesh::ControlVolumes<D>& volumes() const noexcept { return volumes_; }
    const field::Layout<D>& layout() const noexcept { return layout_; }
    const Setup& setup() const noexcept { return setup_; }
    /// The nodes that are solved for.
    const field::Box<D>& solved() const noexcept { return solved_; }
    const scheme::DirectionalScheme& scheme(int d) const noexcept { return schemes_[d]; }
    /// Diffusive conductance of the lower face of node k in direction d, sides taken into account.
    double conductance(int d, const std::array<int, D>& k) const noexcept;
    /// One-dimensional factors of conductance() (the diffusivity is not in them).
    const mesh::AxisTable& conductance_factor(int d, int e) const noexcept { return conductance_[d][e]; }
    /// Factor of the sink along direction e; product over e times the diffusivity is the sink of a volume.
    const mesh::AxisTable& sink_factor(int e) const noexcept { return sink_[e]; }

    /// Adds the inflow of a given flux density (towards the inside) through the side to the source of the volumes
    /// beside it. `density` is called with the node's index.
    template <class Density>
    void add_side_flux(int d, int end, field::Values& source, Density&& density) const
    {
        field::Box<D> box = solved_;
        const int node = end == 0 ? solved_.begin[d] : solved_.end[d] - 1;
        box.begin[d] = node;
        box.end[d] = node + 1;
        field::for_each_row<D>(box, [&](std::array<int, D> k) {
            for (; k[D - 1] < box.end[D - 1]; ++k[D - 1]) {
                std::array<int, D> face = k;
                face[d] += end;
                source[layout_.index(k)] += density(k) * volumes_.area(d, face);
            }
        });
    }

private:
    mesh::ControlVolumes<D> volumes_;
    field::Layout<D> layout_;
    Setup setup_;
    field::Box<D> solved_;
    std::vector<scheme::DirectionalScheme> schemes_;
    std::array<std::array<mesh::AxisTable, D>, D> conductance_;
    std::array<mesh::AxisTable, D> sink_;
};

extern template class Transport<2>;
extern template class Transport<3>;

} // namespace leat::balance
