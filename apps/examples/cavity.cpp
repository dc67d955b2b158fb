// A solver of one's own, put together from the lower rooms of the library: the flow in a square cavity whose lid
// slides. Prints the extremes of velocity on the centre lines; published: Botella & Peyret 1998, Computers & Fluids 27,
// 421-433, u_min = -0.38857, v_max = 0.37694, v_min = -0.52708 of the lid speed at Re 1000.

#include <leat/cascade/cascade.hpp>
#include <leat/mesh/grading.hpp>
#include <leat/monitor/imbalance.hpp>
#include <leat/monitor/judge.hpp>

#include <algorithm>
#include <cmath>
#include <cstdio>
#include <optional>
#include <vector>

int main()
{
    constexpr int cells = 128;
    constexpr double reynolds = 1000;

    // mesh: cells that narrow towards the walls
    const std::vector<double> faces = leat::mesh::sample(leat::mesh::towards_both(1.0), cells, 0, 1);
    const leat::mesh::Grid<2> grid(leat::mesh::Coordinates::cartesian, {faces, faces});

    // field: boundary values stand in place. The lid is the end of direction 1, so its velocity goes into the ghost
    // places above the last row; everything else starts, and the other walls stay, at rest.
    const leat::field::Layout<2> layout(grid.cells());
    leat::coupling::FlowState<2> boundary(layout);
    for (int i = 1; i < cells; ++i) {
        boundary.velocity[0][layout.index({i, cells})] = 1;
    }

    // balance and coupling: all sides fixed, which is what a FlowProblem starts with
    leat::coupling::FlowProblem<2> problem;
    problem.viscosity = 1 / reynolds;
    problem.schemes = {leat::Scheme::central, leat::Scheme::central};

    // cascade: SIMPLEC on every one of the nested grids
    leat::cascade::CascadeSettings settings;
    settings.coupling = leat::Coupling::simplec;
    settings.coupling_settings.relaxation = {.velocity = 0.8, .pressure = 1};
    leat::cascade::Cascade<2> cascade(grid, problem, boundary, settings);
    for (int level = cascade.levels() - 1; level > 0; --level) {
        cascade.cycle(level);
        cascade.start_from_coarser(level - 1);
    }

    // monitor: a closed cavity has no inlet, so the lid sets the scales: density x speed x side = 1
    leat::monitor::Rules rules;
    rules.tolerance = 1e-6;
    rules.iterations = 200;
    leat::monitor::Judge judge(rules);
    std::optional<leat::Outcome> outcome;
    while (!(outcome = judge.judge(leat::monitor::imbalances<2>(cascade.equations(0), cascade.residual(0), {1, 1})))) {
        cascade.cycle(0);
    }
    std::printf("%d x %d cells, Re %g, %d cycles\n%s\n", cells, cells, reynolds, judge.iterations(),
                judge.message().c_str());

    // x = 1/2 is a face of this grid, so u stands on it; likewise v on y = 1/2
    double least_u = 0;
    double largest_v = 0;
    double least_v = 0;
    for (int k = 0; k < cells; ++k) {
        least_u = std::min(least_u, cascade.state(0).velocity[0][layout.index({cells / 2, k})]);
        const double v = cascade.state(0).velocity[1][layout.index({k, cells / 2})];
        largest_v = std::max(largest_v, v);
        least_v = std::min(least_v, v);
    }
    std::printf("u_min on x = 1/2   %9.5f\nv_max on y = 1/2   %9.5f\nv_min on y = 1/2   %9.5f\n", least_u, largest_v,
                least_v);
    const bool close = std::abs(least_u + 0.38857) < 0.005 && std::abs(largest_v - 0.37694) < 0.005 &&
                       std::abs(least_v + 0.52708) < 0.005;
    return outcome == leat::Outcome::converged && close ? 0 : 1;
}
