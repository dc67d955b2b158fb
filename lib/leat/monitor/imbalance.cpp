#include <leat/monitor/imbalance.hpp>

#include <cmath>

namespace leat::monitor {

namespace {

template <int D>
double sum_of_sizes(const field::Layout<D>& layout, const field::Box<D>& box, const field::Values& values)
{
    double sum = 0;
    const int n = box.end[D - 1] - box.begin[D - 1];
    field::for_each_row<D>(box, [&](const std::array<int, D>& k) {
        const double* v = values.data() + layout.index(k);
        double row = 0;
        for (int j = 0; j < n; ++j) {
            row += std::abs(v[j]);
        }
        sum += row;
    });
    return sum;
}

} // namespace

template <int D>
Scales duct_scales(const coupling::FlowEquations<D>& equations, const coupling::FlowState<D>& state)
{
    const field::Layout<D>& layout = equations.layout();
    field::Box<D> plane = equations.cell_box();
    const int last = plane.end[0] - 1;
    plane.end[0] = 1;
    const double density = equations.problem().density;
    double mass = 0;
    double momentum = 0;
    double force = 0;
    field::for_each_row<D>(plane, [&](std::array<int, D> k) {
        for (; k[D - 1] < plane.end[D - 1]; ++k[D - 1]) {
            const double area = equations.cells().area(0, k);
            std::array<int, D> end = k;
            end[0] = last;
            const double u = state.velocity[0][layout.index(k)];
            mass += density * area * u;
            momentum += density * area * u * u;
            force += area * (state.pressure[layout.index(k)] - state.pressure[layout.index(end)]);
        }
    });
    return {std::abs(mass), momentum + std::abs(force)}; // a negative scale would pass for convergence
}

template <int D>
Imbalances imbalances(const coupling::FlowEquations<D>& equations, const coupling::FlowState<D>& residual,
                      const Scales& scales)
{
    double momentum = 0;
    for (int c = 0; c < D; ++c) {
        momentum += sum_of_sizes<D>(equations.layout(), equations.momentum(c).solved(), residual.velocity[c]);
    }
    const double mass = sum_of_sizes<D>(equations.layout(), equations.cell_box(), residual.pressure);
    return {mass / scales.mass, momentum / scales.momentum};
}

template Scales duct_scales(const coupling::FlowEquations<2>&, const coupling::FlowState<2>&);
template Scales duct_scales(const coupling::FlowEquations<3>&, const coupling::FlowState<3>&);
template Imbalances imbalances(const coupling::FlowEquations<2>&, const coupling::FlowState<2>&, const Scales&);
template Imbalances imbalances(const coupling::FlowEquations<3>&, const coupling::FlowState<3>&, const Scales&);

} // namespace leat::monitor
