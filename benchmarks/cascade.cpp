// What a solve with the default settings costs, against what is asked of it. Unit: 1 WU = one evaluation of all
// residuals on the finest grid. (a) = error of core pressure drop and of the whole centreline velocity below a tenth of
// the discretisation error; (b) = worst imbalance down to 1e-8 of that of the first guess. Everything from the making
// of the nested grids on is counted. Times are those of this thread, each the least of several.

#include "newton.hpp"
#include "requirement_table.hpp"
#include "single_grid.hpp"

#include <support/allocation_counter.hpp>

#include <cstdio>

using namespace leat;
using namespace leat::benchmark;

namespace {

constexpr int repeats = 5;
constexpr std::array<double, 4> reynolds_numbers = {10, 100, 500, 2000};
constexpr double longest_trial = 8;         // s, of SIMPLEC
constexpr double cells_beyond_caches = 4e6; // of 48 bytes: the triad then shows the speed of memory

double triad_seconds(double cells)
{
    const auto count = static_cast<std::size_t>(2 * cells); // three arrays of two numbers per cell: 48 bytes
    std::vector<double> a(count), b(count, 1.0), c(count, 2.0);
    return least_seconds(10, 0.05, [&] {
        for (std::size_t k = 0; k < count; ++k) {
            a[k] = b[k] + 1.5 * c[k];
        }
        asm volatile("" : : "r"(a.data()) : "memory");
    });
}

double bytes_of_solve(const DuctCase& duct)
{
    const coupling::FlowState<2> guess = duct.guess();
    const mesh::Grid<2> grid = duct.cells();
    const coupling::FlowProblem<2> problem = duct.problem();
    leat::test::reset_peak();
    const long long before = leat::test::allocations().live_bytes;
    cascade::Cascade<2> cascade(grid, problem, guess, {});
    cascade::nested_solve(cascade, {});
    return static_cast<double>(leat::test::allocations().peak_bytes - before);
}

/// The greatest of several figures; not a number as soon as one is not.
struct Worst {
    double value = 0;
    void take(double figure) { value = std::isfinite(figure) ? std::max(value, figure) : figure * 0; }
};

struct Figures {
    Worst a, b;           ///< WU, tube and channel
    Worst ring_a, ring_b; ///< WU, annuli
    Worst triads;         ///< time to (a) on 320x80
    Worst growth;         ///< exponent
    double cascade_a = 0; ///< s, tube, Re 500, 320x80
    double cascade_b = 0; ///< s, tube, Re 500, 160x40
};

/// One shape at one Reynolds number on a family of nested grids, finest 1280x320.
void measure(const Shape& shape, double reynolds, double triad, Figures& figures)
{
    const bool ring = std::holds_alternative<Annulus>(shape);
    DuctCase duct = duct_case(shape, reynolds, {1280, 320});
    const double finest_cells = duct.count();
    const double finest_b = ring ? 0 : cost(duct, Targets(duct), repeats).seconds_b;
    double coarsest_b = 0;
    CoreNumbers finer = converged_core(duct);
    while (duct.cells().cells(0) > 160) {
        duct = coarser(duct);
        CoreNumbers exact = converged_core(duct);
        const Targets targets(duct, exact, finer);
        auto cascade = make_cascade(duct);
        const double unit = least_seconds(30, 0.03, [&] { cascade->residual(0); });
        const double sweep = least_seconds(10, 0.02, [&] { cascade->iterate(0, false); });
        const Cost spent = cost(duct, targets, repeats);
        const int along = duct.cells().cells(0);
        if (along >= 320) {
            (ring ? figures.ring_a : figures.a).take(spent.seconds_a / unit);
            (ring ? figures.ring_b : figures.b).take(spent.seconds_b / unit);
        }
        if (along == 320 && !ring) {
            figures.triads.take(spent.seconds_a / triad);
        }
        const bool reference = std::holds_alternative<Tube>(shape) && reynolds == 500;
        if (reference && along == 320) {
            figures.cascade_a = spent.seconds_a;
        }
        if (reference && along == 160) {
            figures.cascade_b = spent.seconds_b;
        }
        coarsest_b = spent.seconds_b;
        std::printf("%-13s %6g %8s %9.2f %7.2f %8.1e %8.1e %4d %8.1f %8.3f %4d %8.1f %8.3f\n", duct.name.c_str(),
                    reynolds, cells_text(duct).c_str(), unit * 1e9 / duct.count(), sweep * 1e9 / duct.count(),
                    targets.discretisation().pressure_drop, targets.discretisation().velocity, spent.cycles_a,
                    spent.seconds_a / unit, spent.seconds_a * 1e3, spent.cycles_b, spent.seconds_b / unit,
                    spent.seconds_b * 1e3);
        finer = std::move(exact);
    }
    if (!ring) {
        const double exponent = std::log(finest_b / coarsest_b) / std::log(finest_cells / duct.count());
        figures.growth.take(exponent);
        std::printf("%-13s %6g 1280x320 (b) in %.2f ms; time grows like cells^%.3f from 160x40\n", duct.name.c_str(),
                    reynolds, finest_b * 1e3, exponent);
    }
    std::fflush(stdout);
}

double seconds_of_simplec(double cascade_seconds)
{
    const DuctCase fine = duct_case(tube(), 500, {640, 160});
    const DuctCase duct = coarser(fine);
    const Targets targets(duct, converged_core(duct), converged_core(fine));
    const SingleGridRun best = best_simplec(duct, targets, longest_trial);
    std::printf("SIMPLEC on one grid, tube, Re 500, 320x80, to (a): %.3f s, %d iterations, factors %g and %g, inner "
                "tolerance %g, %d sweeps (best of %d tried); cascade %.4f s\n",
                best.seconds, best.iterations, best.settings.relaxation.velocity, best.settings.relaxation.pressure,
                best.settings.pressure_tolerance, best.settings.momentum_sweeps, best.tried, cascade_seconds);
    return best.seconds;
}

double seconds_of_newton(double cascade_seconds)
{
    const DuctCase duct = coarser(duct_case(tube(), 500, {320, 80}));
    const Targets targets(duct);
    double least = std::numeric_limits<double>::infinity();
    const auto attempt = [&](const char* ordering, const NewtonRun& run) {
        std::printf("Newton, sparse LU with %s, tube, Re 500, 160x40, to (b): %.3f s, %d steps of %.3f s; cascade "
                    "%.4f s\n",
                    ordering, run.seconds, run.steps, run.seconds_per_step, cascade_seconds);
        std::fflush(stdout);
        least = std::min(least, run.seconds);
    };
    attempt("COLAMD", solve_by_newton<Eigen::COLAMDOrdering<int>>(duct, targets, 2));
    attempt("AMD", solve_by_newton<Eigen::AMDOrdering<int>>(duct, targets, 2));
    return least;
}

} // namespace

int main()
{
    Figures figures;
    const double triad = triad_seconds(cells_beyond_caches) / cells_beyond_caches * 320 * 80;
    const double cached_triad = triad_seconds(320.0 * 80.0);
    std::printf(
        "triad over 48 bytes per cell: %.3f ns per cell from memory, %.3f when 320x80 cells stay in the caches\n\n",
        triad * 1e9 / (320 * 80), cached_triad * 1e9 / (320 * 80));
    std::printf("%-13s %6s %8s %9s %7s %17s %13s %8s %13s %8s\n", "", "", "", "residual", "sweep", "discretisation",
                "cycles, WU to", "(a)", "cycles, WU to", "(b)");
    std::printf("%-13s %6s %8s %9s %7s %8s %8s %4s %8s %8s %4s %8s %8s\n", "shape", "Re", "cells", "ns/cell", "ns/cell",
                "pressure", "velocity", "", "", "ms", "", "", "ms");
    for (const Shape& shape : {tube(), channel(), annulus(0.02), annulus(0.5), annulus(0.95)}) {
        for (const double reynolds : reynolds_numbers) {
            measure(shape, reynolds, triad, figures);
        }
    }
    const DuctCase large = duct_case(tube(), 500, {1280, 320});
    const double bytes = bytes_of_solve(large) / large.count();
    std::printf("\n");
    const double simplec = seconds_of_simplec(figures.cascade_a) / figures.cascade_a;
    const double newton = seconds_of_newton(figures.cascade_b) / figures.cascade_b;

    std::printf("\n");
    RequirementTable table;
    table.add("worst WU to (a), tube and channel, 320x80 and 640x160", figures.a.value, 100, 45);
    table.add("worst WU to (b), same", figures.b.value, 130, 65);
    table.add("worst time to (a) on 320x80, in triads over 48 bytes per cell from memory", figures.triads.value, 600,
              250);
    table.add("time to (a), SIMPLEC on one grid at its best/cascade", simplec, 100, 300,
              RequirementTable::Sense::at_least);
    table.add("time to (b), Newton with sparse LU/cascade", newton, 150, 400, RequirementTable::Sense::at_least);
    table.add("worst growth exponent of time to (b), 160x40 to 1280x320", figures.growth.value, 1.10, 1.0);
    table.add("bytes per cell, all levels, 1280x320", bytes, 300, 200);
    table.add("worst WU to (a), annuli of radius ratio 0.02, 0.5, 0.95", figures.ring_a.value, 100, 45);
    table.add("worst WU to (b), same", figures.ring_b.value, 130, 65);
    return table.print() ? 0 : 1;
}
