#pragma once

#include <array>
#include <cmath>
#include <vector>

/// constant + linear s + square s^2 + amplitude sin(frequency s + phase): one factor of a smooth field.
struct Factor {
    double constant = 1;
    double linear = 0;
    double square = 0;
    double amplitude = 0;
    double frequency = 0;
    double phase = 0;

    double value(double s) const
    {
        return constant + s * (linear + s * square) + amplitude * std::sin(frequency * s + phase);
    }
    double slope(double s) const
    {
        return linear + 2 * s * square + amplitude * frequency * std::cos(frequency * s + phase);
    }
};

inline Factor wave(double amplitude, double frequency, double phase = 0)
{
    return {.constant = 0, .amplitude = amplitude, .frequency = frequency, .phase = phase};
}
inline Factor ramp(double constant, double linear, double square = 0)
{
    return {.constant = constant, .linear = linear, .square = square};
}

template <int D>
using Point = std::array<double, D>;

/// A sum of products of one-dimensional factors, with its exact slopes.
template <int D>
struct SmoothField {
    std::vector<std::array<Factor, D>> terms;

    double value(const Point<D>& q) const { return sum(q, -1); }
    double slope(int d, const Point<D>& q) const { return sum(q, d); }

private:
    double sum(const Point<D>& q, int derivative) const
    {
        double total = 0;
        for (const auto& factors : terms) {
            double product = 1;
            for (int e = 0; e < D; ++e) {
                product *= e == derivative ? factors[e].slope(q[e]) : factors[e].value(q[e]);
            }
            total += product;
        }
        return total;
    }
};

/// Integral of f over [a, b], exact for polynomials of degree 5 (Gauss & Legendre, three points).
template <class F>
double integral(double a, double b, F&& f)
{
    const double middle = 0.5 * (a + b);
    const double half = 0.5 * (b - a);
    const double reach = half * std::sqrt(0.6);
    return half * (5 * f(middle - reach) + 8 * f(middle) + 5 * f(middle + reach)) / 9;
}
