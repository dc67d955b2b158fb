#pragma once

#include <leat/linear/stencil_system.hpp>

#include <Eigen/SparseCore>

#include <array>
#include <cmath>
#include <random>
#include <vector>

/// A symmetric diffusion problem on a box of nodes, with conductances that vary by a random factor from face to face.
template <int D>
struct Poisson {
    leat::linear::StencilSystem<D> system;
    leat::field::Values right;

    /// strength[d]: mean conductance between neighbours along d. fixed: the value beyond the lowest nodes along
    /// direction 0 is known to be zero; otherwise constants are in the null space and `right` sums to zero.
    Poisson(const std::array<int, D>& nodes, const std::array<double, D>& strength, bool fixed, double roughness = 1)
    {
        leat::field::Box<D> box;
        box.end = nodes;
        const leat::field::Layout<D> layout(nodes);
        system = leat::linear::StencilSystem<D>(layout, box);
        right = leat::field::zeros(layout);
        std::mt19937 random(3);
        std::uniform_real_distribution<double> spread(-roughness, roughness);
        double sum = 0;
        double count = 0;
        for_each([&](const std::array<int, D>& k, std::ptrdiff_t at) {
            for (int d = 0; d < D; ++d) {
                const double c = strength[d] * std::exp2(spread(random));
                if (k[d] > 0) {
                    const std::ptrdiff_t below = at - layout.stride[d];
                    system.lower[d][at] = system.upper[d][below] = -c;
                    system.centre[at] += c;
                    system.centre[below] += c;
                } else if (fixed && d == 0) {
                    system.centre[at] += c;
                }
            }
            right[at] = spread(random);
            sum += right[at];
            ++count;
        });
        if (!fixed) {
            for_each([&](const auto&, std::ptrdiff_t at) { right[at] -= sum / count; });
        }
    }

    /// Calls visit(index of the node, its place).
    template <class Visit>
    void for_each(Visit visit) const
    {
        leat::field::for_each_row<D>(system.box, [&](std::array<int, D> k) {
            for (; k[D - 1] < system.box.end[D - 1]; ++k[D - 1]) {
                visit(static_cast<const std::array<int, D>&>(k), system.layout.index(k));
            }
        });
    }

    /// The same system as a sparse matrix over the nodes in the order of for_each.
    Eigen::SparseMatrix<double> matrix() const
    {
        std::vector<int> number(static_cast<std::size_t>(system.layout.size), -1);
        int nodes = 0;
        for_each([&](const auto&, std::ptrdiff_t at) { number[at] = nodes++; });
        std::vector<Eigen::Triplet<double>> entries;
        for_each([&](const auto&, std::ptrdiff_t at) {
            entries.emplace_back(number[at], number[at], system.centre[at]);
            for (int d = 0; d < D; ++d) {
                const std::ptrdiff_t s = system.layout.stride[d];
                if (system.lower[d][at] != 0) {
                    entries.emplace_back(number[at], number[at - s], system.lower[d][at]);
                }
                if (system.upper[d][at] != 0) {
                    entries.emplace_back(number[at], number[at + s], system.upper[d][at]);
                }
            }
        });
        Eigen::SparseMatrix<double> sparse(nodes, nodes);
        sparse.setFromTriplets(entries.begin(), entries.end());
        return sparse;
    }

    Eigen::VectorXd gathered(const leat::field::Values& values) const
    {
        std::vector<double> list;
        for_each([&](const auto&, std::ptrdiff_t at) { list.push_back(values[at]); });
        return Eigen::Map<const Eigen::VectorXd>(list.data(), static_cast<Eigen::Index>(list.size()));
    }
};
