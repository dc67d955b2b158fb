#pragma once

#include <leat/balance/balance.hpp>
#include <leat/linear/stencil_system.hpp>

#include <cmath>
#include <deque>

/// Drives the residual of a balance to zero by corrections from line sweeps over its upwind matrix. The corrections
/// are combined so that the residual is least over the last few of them (nonlinear form of the generalised conjugate
/// residuals of Eisenstat, Elman & Schultz 1983), so no relaxation factor is needed for any scheme.
template <int D>
class CorrectionSolver {
public:
    using Velocity = typename leat::balance::Balance<D>::Velocity;

    CorrectionSolver(leat::balance::Balance<D>& balance, const Velocity& velocity, const leat::field::Values& source)
        : balance_(balance), velocity_(velocity), source_(source),
          system_(balance.transport().layout(), balance.transport().solved()),
          residual_(leat::field::zeros(system_.layout)), scratch_(residual_.size())
    {
        balance_.assemble(velocity_, system_);
    }

    /// Until the residual has fallen by `tolerance` since the first call; returns the iterations spent.
    int solve(leat::field::Values& value, double tolerance, int most)
    {
        evaluate(value, residual_);
        if (start_ < 0) {
            start_ = norm(residual_);
        }
        int iteration = 0;
        for (; iteration < most && reduction() > tolerance; ++iteration) {
            Direction next;
            next.correction = leat::field::zeros(system_.layout);
            leat::field::Values right = residual_;
            for (double& r : right) {
                r = -r;
            }
            leat::linear::line_sweep(system_, right, false, next.correction, scratch_);
            leat::linear::line_sweep(system_, right, true, next.correction, scratch_);
            leat::field::Values moved = value;
            add(1, next.correction, moved);
            next.image = leat::field::zeros(system_.layout);
            evaluate(moved, next.image);
            add(-1, residual_, next.image);
            for (const Direction& past : recent_) {
                const double part = dot(next.image, past.image);
                add(-part, past.image, next.image);
                add(-part, past.correction, next.correction);
            }
            const double length = norm(next.image);
            if (!(length > 0)) {
                break;
            }
            scale(1 / length, next.image);
            scale(1 / length, next.correction);
            add(-dot(residual_, next.image), next.correction, value);
            evaluate(value, residual_);
            recent_.push_back(std::move(next));
            if (recent_.size() > kept) {
                recent_.pop_front();
            }
        }
        return iteration;
    }

    /// Norm of the residual over that at the start.
    double reduction() const { return start_ > 0 ? norm(residual_) / start_ : 0; }

private:
    static constexpr std::size_t kept = 12;

    struct Direction {
        leat::field::Values correction;
        leat::field::Values image; ///< change of the residual by the correction, of length one
    };

    void evaluate(const leat::field::Values& value, leat::field::Values& out)
    {
        balance_.residual(velocity_, value, source_.data(), nullptr, out);
    }
    static double dot(const leat::field::Values& a, const leat::field::Values& b)
    {
        double sum = 0;
        for (std::size_t k = 0; k < a.size(); ++k) {
            sum += a[k] * b[k];
        }
        return sum;
    }
    static double norm(const leat::field::Values& a) { return std::sqrt(dot(a, a)); }
    static void add(double factor, const leat::field::Values& from, leat::field::Values& to)
    {
        for (std::size_t k = 0; k < to.size(); ++k) {
            to[k] += factor * from[k];
        }
    }
    static void scale(double factor, leat::field::Values& a)
    {
        for (double& entry : a) {
            entry *= factor;
        }
    }

    leat::balance::Balance<D>& balance_;
    Velocity velocity_;
    const leat::field::Values& source_;
    leat::linear::StencilSystem<D> system_;
    leat::field::Values residual_, scratch_;
    std::deque<Direction> recent_;
    double start_ = -1;
};
