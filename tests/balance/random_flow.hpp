#pragma once

#include <leat/balance/balance.hpp>
#include <leat/mesh/grid.hpp>

#include <array>
#include <random>
#include <vector>

/// A grid of random cells with a random flow that leaves no mass behind in any cell. The flow is the sum of random
/// circulations around the edges between cells, so it is anything but smooth.
template <int D>
class RandomFlow {
public:
    /// closed: nothing flows through the sides.
    RandomFlow(leat::mesh::Coordinates coordinates, const std::array<int, D>& cell_counts, bool closed, unsigned seed)
        : random(seed), grid(coordinates, random_faces(cell_counts, closed)),
          cells(grid, leat::mesh::ControlVolumes<D>::unshifted), layout(grid.cells())
    {
        for (int d = 0; d < D; ++d) {
            velocity[d] = leat::field::zeros(layout);
        }
        for (int e = 0; e < D; ++e) {
            for (int f = e + 1; f < D; ++f) {
                circulate(e, f, closed);
            }
        }
    }

    leat::field::Values random_values()
    {
        leat::field::Values values = leat::field::zeros(layout);
        for (double& value : values) {
            value = spread(random);
        }
        return values;
    }
    typename leat::balance::MassFlow<D>::Velocity pointers() const
    {
        typename leat::balance::MassFlow<D>::Velocity all;
        for (int d = 0; d < D; ++d) {
            all[d] = velocity[d].data();
        }
        return all;
    }

    static constexpr double density = 1.3;
    std::mt19937 random;
    std::uniform_real_distribution<double> spread{-1, 1};
    leat::mesh::Grid<D> grid;
    leat::mesh::ControlVolumes<D> cells;
    leat::field::Layout<D> layout;
    std::array<leat::field::Values, D> velocity;

private:
    std::array<std::vector<double>, D> random_faces(const std::array<int, D>& cell_counts, bool closed)
    {
        std::uniform_real_distribution<double> width(0.5, 1.5);
        std::array<std::vector<double>, D> faces;
        for (int d = 0; d < D; ++d) {
            faces[d] = {closed ? 0 : 0.4}; // nothing could flow through a side on the axis
            for (int k = 0; k < cell_counts[d]; ++k) {
                faces[d].push_back(faces[d].back() + width(random));
            }
        }
        return faces;
    }

    /// Flow around every edge across e and f.
    void circulate(int e, int f, bool closed)
    {
        leat::field::Box<D> edges;
        edges.end = layout.cells;
        ++edges.end[e];
        ++edges.end[f];
        leat::field::for_each_row<D>(edges, [&](std::array<int, D> k) {
            for (; k[D - 1] < edges.end[D - 1]; ++k[D - 1]) {
                const bool inside = k[e] > 0 && k[e] < layout.cells[e] && k[f] > 0 && k[f] < layout.cells[f];
                const double around = spread(random);
                if (inside || !closed) {
                    pass(e, f, k, around);
                    pass(f, e, k, -around);
                }
            }
        });
    }

    /// `flow` through the face across d above the edge k in direction `beside`, and back through the face below it.
    void pass(int d, int beside, std::array<int, D> k, double flow)
    {
        for (int side = 0; side < 2; ++side, --k[beside]) {
            const double area = k[beside] >= 0 && k[beside] < layout.cells[beside] ? cells.area(d, k) : 0;
            if (area > 0) { // faces that do not exist carry nothing
                velocity[d][layout.index(k)] += (side == 0 ? flow : -flow) / (density * area);
            }
        }
    }
};
