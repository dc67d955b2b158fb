#pragma once

#include "smooth_field.hpp"

#include <leat/balance/transport.hpp>

#include <array>
#include <cmath>
#include <cstdlib>

/// A transport problem whose exact solution is a chosen smooth field: the source is the exact net outflow of every
/// control volume, and the mass flow is the exact curl of a potential, so that it balances to round-off.
///
/// All is written in the coordinates q themselves (x, y, z or x, r, angle): with the density of mass flow
/// m_0 = d_1 a_2 - d_2 a_1 and so on in cyclic order, and the metric factor w_d of diffusion along d
/// (1; cylindrical: r, r, 1/r), the outflow through a face is the integral over the other coordinates of
/// m_d phi - diffusivity w_d d_d phi.
template <int D>
struct Manufactured {
    leat::mesh::Coordinates coordinates = leat::mesh::Coordinates::cartesian;
    double diffusivity = 1;
    std::array<SmoothField<D>, 3> potential; ///< covariant components; in two dimensions only [2], the stream function
    SmoothField<D> solution;

    double metric(int d, const Point<D>& q) const
    {
        if (coordinates == leat::mesh::Coordinates::cartesian) {
            return 1;
        }
        return d == 2 ? 1 / q[1] : q[1];
    }
    double mass_density(int d, const Point<D>& q) const
    {
        const int e = (d + 1) % 3;
        const int f = (d + 2) % 3;
        return (e < D ? potential[f].slope(e, q) : 0) - (f < D ? potential[e].slope(f, q) : 0);
    }
    /// Gradient of the solution along d, per unit of length.
    double gradient(int d, const Point<D>& q) const
    {
        const bool around = d == 2 && coordinates == leat::mesh::Coordinates::cylindrical;
        return solution.slope(d, q) / (around ? q[1] : 1);
    }

    /// Integral of f over the face across d (all directions for d = -1) of a volume.
    template <class F>
    double over(const leat::mesh::ControlVolumes<D>& volumes, const std::array<int, D>& k, int d, const F& f) const
    {
        Point<D> q{};
        if (d >= 0) {
            q[d] = volumes.face[d][k[d]];
        }
        return over_direction(volumes, k, d, 0, q, f);
    }

    /// Mass flow through the lower face of a cell: circulation of the potential along the edges of the face.
    double mass_flow(const leat::mesh::ControlVolumes<D>& cells, const std::array<int, D>& k, int d) const
    {
        const int e = (d + 1) % 3;
        const int f = (d + 2) % 3;
        return edges(cells, k, d, e, f) - edges(cells, k, d, f, e);
    }

private:
    template <class F>
    double over_direction(const leat::mesh::ControlVolumes<D>& volumes, const std::array<int, D>& k, int d, int e,
                          Point<D>& q, const F& f) const
    {
        if (e == D) {
            return f(static_cast<const Point<D>&>(q));
        }
        if (e == d) {
            return over_direction(volumes, k, d, e + 1, q, f);
        }
        return integral(volumes.face[e][k[e]], volumes.face[e][k[e] + 1], [&](double s) {
            q[e] = s;
            return over_direction(volumes, k, d, e + 1, q, f);
        });
    }

    /// Difference along `across` of the integrals of potential[along] over the edges of the face in that direction.
    double edges(const leat::mesh::ControlVolumes<D>& cells, const std::array<int, D>& k, int d, int across,
                 int along) const
    {
        if (across >= D) {
            return 0;
        }
        double difference = 0;
        for (int side = 0; side < 2; ++side) {
            Point<D> q{};
            q[d] = cells.face[d][k[d]];
            q[across] = cells.face[across][k[across] + side];
            const auto at = [&](double s) {
                if (along < D) {
                    q[along < D ? along : 0] = s;
                }
                return potential[along].value(q);
            };
            const double whole =
                along < D ? integral(cells.face[along][k[along]], cells.face[along][k[along] + 1], at) : at(0);
            difference += side == 0 ? -whole : whole;
        }
        return difference;
    }
};
