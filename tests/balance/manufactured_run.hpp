#pragma once

#include "correction_solver.hpp"
#include "manufactured.hpp"

#include <leat/balance/balance.hpp>

#include <algorithm>
#include <cmath>
#include <limits>
#include <vector>

/// What one grid gives.
struct Measured {
    double error = 0;           ///< mean of |computed - exact| over the volumes (L1 norm)
    double iteration_error = 0; ///< what the iteration has left, estimated; same norm
    double reduction = 1;       ///< of the residual
    double smallest_peclet = 0; ///< |mass flow|/conductance over the inner faces
    double largest_peclet = 0;
    double imbalance = 0; ///< largest net mass outflow of a volume over the largest flow through a face
    int iterations = 0;
};

/// Visits every node of a box: visit(k).
template <int D, class Visit>
void for_each_node(const leat::field::Box<D>& box, Visit&& visit)
{
    leat::field::for_each_row<D>(box, [&](std::array<int, D> k) {
        for (; k[D - 1] < box.end[D - 1]; ++k[D - 1]) {
            visit(static_cast<const std::array<int, D>&>(k));
        }
    });
}

/// One manufactured problem on one grid, on cells or shifted volumes.
template <int D>
class ManufacturedRun {
public:
    using Setup = typename leat::balance::Transport<D>::Setup;
    using Kind = leat::balance::Side::Kind;

    ManufacturedRun(const Manufactured<D>& problem, const leat::mesh::Grid<D>& grid, int shift, const Setup& setup)
        : problem_(problem), cells_(grid, leat::mesh::ControlVolumes<D>::unshifted), transport_(grid, shift, setup),
          balance_(transport_, cells_, density), source_(leat::field::zeros(transport_.layout())), value_(source_)
    {
        set_velocity();
        set_source();
        set_sides();
    }

    Measured solve(double tolerance = 1e-11, int most = 400)
    {
        Measured measured;
        CorrectionSolver<D> solver(balance_, pointers(), source_);
        measured.iterations = solver.solve(value_, 100 * tolerance, most);
        const leat::field::Values before = value_;
        measured.iterations += solver.solve(value_, tolerance, most);
        measured.reduction = solver.reduction();
        double volume = 0;
        for_each_node<D>(transport_.solved(), [&](const auto& k) {
            const double part = transport_.volumes().volume(k);
            volume += part;
            measured.error += part * std::abs(value_[at(k)] - problem_.solution.value(node(k)));
            measured.iteration_error += part * std::abs(value_[at(k)] - before[at(k)]);
        });
        measured.error /= volume;
        measured.iteration_error /= 99 * volume; // the last hundredfold fall moved it 99 times as far as is left
        measure_flow(measured);
        return measured;
    }

    const leat::field::Values& value() const { return value_; }
    const leat::balance::Transport<D>& transport() const { return transport_; }
    leat::balance::Balance<D>& balance() { return balance_; }
    const leat::field::Values& source() const { return source_; }
    leat::field::Values& value() { return value_; }
    typename leat::balance::Balance<D>::Velocity pointers() const
    {
        typename leat::balance::Balance<D>::Velocity all;
        for (int d = 0; d < D; ++d) {
            all[d] = velocity_[d].data();
        }
        return all;
    }

private:
    static constexpr double density = 1.3; // must cancel

    std::ptrdiff_t at(const std::array<int, D>& k) const { return transport_.layout().index(k); }
    Point<D> node(const std::array<int, D>& k) const
    {
        Point<D> q;
        for (int d = 0; d < D; ++d) {
            q[d] = transport_.volumes().node[d][k[d]];
        }
        return q;
    }

    void set_velocity()
    {
        for (int d = 0; d < D; ++d) {
            velocity_[d] = leat::field::zeros(transport_.layout());
            leat::field::Box<D> faces;
            faces.end = transport_.layout().cells;
            ++faces.end[d];
            for_each_node<D>(faces, [&](const auto& k) {
                const double area = cells_.area(d, k);
                velocity_[d][at(k)] = area > 0 ? problem_.mass_flow(cells_, k, d) / (density * area) : 0;
            });
        }
    }

    /// The exact net outflow, face by face, and the sink where there is one.
    void set_source()
    {
        const auto& volumes = transport_.volumes();
        const double diffusivity = transport_.setup().diffusivity;
        leat::field::Box<D> box = transport_.solved();
        for (int d = 0; d < D; ++d) {
            leat::field::Box<D> faces = box;
            ++faces.end[d];
            for_each_node<D>(faces, [&](const auto& k) {
                const double flux = problem_.over(volumes, k, d, [&](const Point<D>& q) {
                    return problem_.mass_density(d, q) * problem_.solution.value(q) -
                           diffusivity * problem_.metric(d, q) * problem_.solution.slope(d, q);
                });
                if (k[d] < box.end[d]) {
                    source_[at(k)] -= flux;
                }
                if (k[d] > box.begin[d]) {
                    source_[at(k) - transport_.layout().stride[d]] += flux;
                }
            });
        }
        if (transport_.setup().hoop) {
            for_each_node<D>(box, [&](const auto& k) {
                source_[at(k)] += problem_.over(volumes, k, -1, [&](const Point<D>& q) {
                    return diffusivity * problem_.solution.value(q) / q[1]; // r dr (value/r^2)
                });
            });
        }
    }

    /// Ghost places, given nodes and given fluxes of every side.
    void set_sides()
    {
        const auto& volumes = transport_.volumes();
        for (int d = 0; d < D; ++d) {
            for (int end = 0; end < 2; ++end) {
                const leat::balance::Side& side = transport_.setup().sides[d][end];
                const double outwards = end == 0 ? -1 : 1;
                const double conduction = transport_.setup().diffusivity;
                leat::field::Box<D> box;
                for (int e = 0; e < D; ++e) {
                    box.end[e] = volumes.nodes(e);
                }
                const bool on_node = side.kind == Kind::on_node;
                const int place = end == 0 ? (on_node ? 0 : -1) : volumes.nodes(d) - (on_node ? 1 : 0);
                if (side.kind == Kind::flux) {
                    const double face = volumes.face[d][end == 0 ? 0 : volumes.nodes(d)];
                    transport_.add_side_flux(d, end, source_, [&](const std::array<int, D>& k) {
                        Point<D> q = node(k);
                        q[d] = face;
                        return conduction * outwards * problem_.gradient(d, q);
                    });
                } else if (side.kind != Kind::open) {
                    box.begin[d] = place;
                    box.end[d] = place + 1;
                    for_each_node<D>(box, [&](const auto& k) {
                        const Point<D> q = node(k);
                        value_[at(k)] = problem_.solution.value(q);
                        if (side.kind == Kind::exchange) { // the ambient that drives the exact flux
                            value_[at(k)] += conduction * outwards * problem_.gradient(d, q) / side.coefficient;
                        }
                    });
                }
            }
        }
    }

    void measure_flow(Measured& measured)
    {
        measured.smallest_peclet = std::numeric_limits<double>::infinity();
        const leat::balance::MassFlow<D> mass_flow(cells_, transport_.layout(), density, transport_.volumes().shift());
        const leat::field::Box<D>& box = transport_.solved();
        leat::field::Values net = leat::field::zeros(transport_.layout());
        std::vector<double> row(static_cast<std::size_t>(transport_.layout().cells[D - 1]) + 3);
        double largest = 0;
        for (int d = 0; d < D; ++d) {
            leat::field::Box<D> faces = box;
            ++faces.end[d];
            for_each_node<D>(faces, [&](const auto& k) {
                mass_flow.row(pointers(), d, k, k[D - 1], k[D - 1] + 1, row.data());
                const double flow = row[k[D - 1]];
                largest = std::max(largest, std::abs(flow));
                const bool upper = k[d] < box.end[d];
                const bool lower = k[d] > box.begin[d];
                if (upper) {
                    net[at(k)] -= flow;
                }
                if (lower) {
                    net[at(k) - transport_.layout().stride[d]] += flow;
                }
                if (upper && lower && transport_.conductance(d, k) > 0) {
                    const double peclet = std::abs(flow) / transport_.conductance(d, k);
                    measured.smallest_peclet = std::min(measured.smallest_peclet, peclet);
                    measured.largest_peclet = std::max(measured.largest_peclet, peclet);
                }
            });
        }
        for_each_node<D>(box, [&](const auto& k) {
            measured.imbalance = std::max(measured.imbalance, std::abs(net[at(k)]) / largest);
        });
    }

    Manufactured<D> problem_;
    leat::mesh::ControlVolumes<D> cells_;
    leat::balance::Transport<D> transport_;
    leat::balance::Balance<D> balance_;
    std::array<leat::field::Values, D> velocity_;
    leat::field::Values source_;
    leat::field::Values value_;
};
