#include <leat/balance/transport.hpp>

#include <leat/base/error.hpp>

namespace leat::balance {

namespace {

using End = scheme::DirectionalScheme::End;

End end_of(const Side& side)
{
    switch (side.kind) {
    case Side::Kind::value:
        return End::value;
    case Side::Kind::flux:
    case Side::Kind::exchange: // the value on the face is not the ambient's
        return End::free;
    case Side::Kind::on_node:
    case Side::Kind::open:
        break;
    }
    return End::on_node;
}

/// Diffusion and hoop term together are r d/dr[(1/r) d(r v)/dr], which is differenced as it stands: as conductances
/// r_below r_above/(r_face distance) and what is left over, this. Differenced one by one, the two leave an error like
/// (cell size)^2/r, which raises that at the axis to (cell size)^2 ln(cell size).
double hoop_factor(double lower_face, double node, double upper_face)
{
    if (node <= 0) {
        return 0;
    }
    return (lower_face > 0 ? node / lower_face : 2) - node / upper_face; // (1/r) d(r v)/dr = 2 v/r on the axis
}

} // namespace

template <int D>
Transport<D>::Transport(const mesh::Grid<D>& grid, int shift, const Setup& setup)
    : volumes_(grid, shift), layout_(grid.cells()), setup_(setup)
{
    for (int d = 0; d < D; ++d) {
        const int nodes = volumes_.nodes(d);
        solved_.begin[d] = setup.sides[d][0].kind == Side::Kind::on_node ? 1 : 0;
        solved_.end[d] = setup.sides[d][1].kind == Side::Kind::on_node ? nodes - 1 : nodes;
        schemes_.emplace_back(setup.schemes[d], volumes_.node[d], volumes_.face[d], nodes,
                              std::array<End, 2>{end_of(setup.sides[d][0]), end_of(setup.sides[d][1])});
        conductance_[d] = volumes_.conductance_factor[d];
        if (d == 1 && setup.hoop) {
            for (int k = 0; k <= nodes; ++k) {
                const double r = volumes_.face[1][k];
                conductance_[1][1][k] *= r > 0 ? volumes_.node[1][k - 1] * volumes_.node[1][k] / (r * r) : 0;
            }
        }
        for (int end = 0; end < 2; ++end) {
            const Side& side = setup.sides[d][end];
            double& factor = conductance_[d][d][end == 0 ? 0 : nodes];
            if (side.kind == Side::Kind::flux) {
                factor = 0;
            } else if (side.kind == Side::Kind::exchange) {
                if (d == 2 && grid.coordinates() == mesh::Coordinates::cylindrical) {
                    throw InvalidInput({{"sides[2]", "exchange", "must be value or flux where the angle is constant"}});
                }
                // diffusion to the face and exchange beyond it in series, per unit of face area
                const double scale = volumes_.area_factor[d][d][end == 0 ? 0 : nodes];
                const double inner = setup.diffusivity * factor;
                const double outer = side.coefficient * scale;
                factor = inner > 0 ? inner * outer / ((inner + outer) * setup.diffusivity) : 0;
            }
        }
        sink_[d] = volumes_.volume_factor[d];
        if (d == 1) {
            for (int k = 0; k < nodes; ++k) {
                sink_[1][k] =
                    setup.hoop ? hoop_factor(volumes_.face[1][k], volumes_.node[1][k], volumes_.face[1][k + 1]) : 0;
            }
        }
    }
}

template <int D>
double Transport<D>::conductance(int d, const std::array<int, D>& k) const noexcept
{
    double product = setup_.diffusivity;
    for (int e = 0; e < D; ++e) {
        product *= conductance_[d][e][k[e]];
    }
    return product;
}

template class Transport<2>;
template class Transport<3>;

} // namespace leat::balance
