#include "catch.hpp"

#include "random_flow.hpp"

#include <leat/balance/balance.hpp>

#include <algorithm>
#include <cmath>

using namespace leat;
using balance::Side;
using mesh::Coordinates;

namespace {

/// Largest net mass outflow of a volume, over the largest flow through a face.
template <int D>
double imbalance(const RandomFlow<D>& flow, int shift)
{
    const mesh::ControlVolumes<D> volumes(flow.grid, shift);
    const balance::MassFlow<D> mass_flow(flow.cells, flow.layout, flow.density, shift);
    std::vector<double> row(static_cast<std::size_t>(flow.layout.cells[D - 1]) + 3);
    field::Values net = field::zeros(flow.layout);
    field::Box<D> box;
    for (int d = 0; d < D; ++d) {
        box.end[d] = volumes.nodes(d);
    }
    double largest = 0;
    for (int d = 0; d < D; ++d) {
        field::Box<D> faces = box;
        ++faces.end[d];
        field::for_each_row<D>(faces, [&](std::array<int, D> k) {
            mass_flow.row(flow.pointers(), d, k, 0, faces.end[D - 1], row.data());
            for (; k[D - 1] < faces.end[D - 1]; ++k[D - 1]) {
                const double through = row[std::size_t(k[D - 1])];
                largest = std::max(largest, std::abs(through));
                const std::ptrdiff_t at = flow.layout.index(k);
                if (k[d] < box.end[d]) {
                    net[at] -= through;
                }
                if (k[d] > 0) {
                    net[at - flow.layout.stride[d]] += through;
                }
            }
        });
    }
    double worst = 0;
    field::for_each_row<D>(box, [&](std::array<int, D> k) {
        for (; k[D - 1] < box.end[D - 1]; ++k[D - 1]) {
            worst = std::max(worst, std::abs(net[flow.layout.index(k)]));
        }
    });
    return worst / largest;
}

template <int D>
void check_mass(Coordinates coordinates, const std::array<int, D>& cells)
{
    for (const bool closed : {true, false}) {
        RandomFlow<D> flow(coordinates, cells, closed, 17);
        for (int shift = -1; shift < D; ++shift) {
            INFO("shift " << shift << ", closed " << closed);
            CHECK(imbalance(flow, shift) < 1e-14);
        }
        // a flow that does not balance on the cells does not balance on any volumes
        std::array<int, D> middle{};
        middle.fill(2);
        flow.velocity[0][flow.layout.index(middle)] += 0.01;
        for (int shift = -1; shift < D; ++shift) {
            CHECK(imbalance(flow, shift) > 1e-4);
        }
    }
}

/// Sum of all residuals of a random field, and their largest, when nothing passes through the sides.
template <int D>
std::pair<double, double> sums(Coordinates coordinates, const std::array<int, D>& cells, int shift, Scheme scheme,
                               double constant)
{
    RandomFlow<D> flow(coordinates, cells, true, 23);
    typename balance::Transport<D>::Setup setup;
    setup.diffusivity = 0.3;
    setup.schemes.fill(scheme);
    for (int d = 0; d < D; ++d) {
        setup.sides[d].fill({d == shift ? Side::Kind::open : Side::Kind::flux, 0});
    }
    const balance::Transport<D> transport(flow.grid, shift, setup);
    balance::Balance<D> balance(transport, flow.cells, flow.density);
    field::Values value = flow.random_values();
    if (constant != 0) {
        std::fill(value.begin(), value.end(), constant);
    }
    field::Values out = field::zeros(flow.layout);
    balance.residual(flow.pointers(), value, nullptr, nullptr, out);
    double sum = 0;
    double largest = 0;
    for (const double r : out) {
        sum += r;
        largest = std::max(largest, std::abs(r));
    }
    return {sum, largest};
}

template <int D>
void check_budget(Coordinates coordinates, const std::array<int, D>& cells)
{
    for (const Scheme scheme : all_schemes()) {
        for (int shift = -1; shift < D; ++shift) {
            INFO(name(scheme) << ", shift " << shift);
            const auto [sum, largest] = sums<D>(coordinates, cells, shift, scheme, 0);
            CHECK(largest > 0.1);
            CHECK(std::abs(sum) < 1e-13 * largest * double(cells[0] * cells[1]));
            CHECK(sums<D>(coordinates, cells, shift, scheme, 1.7).second < 1e-13);
        }
    }
}

} // namespace

TEST_CASE("Mass balances on volumes shifted along any direction wherever it does on the cells", "[balance]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        check_mass<2>(coordinates, {9, 7});
        check_mass<3>(coordinates, {5, 6, 7});
    }
}

TEST_CASE("What leaves one volume enters the next, with every scheme, and a constant is carried without a residual",
          "[balance]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        check_budget<2>(coordinates, {9, 7});
        if (coordinates == Coordinates::cartesian) {
            check_budget<3>(coordinates, {5, 6, 7});
        }
    }
}
