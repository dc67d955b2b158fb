#include <leat/coupling/flow_equations.hpp>

#include <leat/base/error.hpp>

namespace leat::coupling {

namespace {

using balance::Side;

Side::Kind momentum_side(FlowSide side, bool normal)
{
    switch (side) {
    case FlowSide::fixed:
        return normal ? Side::Kind::on_node : Side::Kind::value;
    case FlowSide::symmetry:
        return normal ? Side::Kind::on_node : Side::Kind::flux;
    case FlowSide::open:
        break;
    }
    return normal ? Side::Kind::open : Side::Kind::flux;
}

template <int D>
balance::Transport<D> momentum_transport(const mesh::Grid<D>& grid, const FlowProblem<D>& problem, int component)
{
    typename balance::Transport<D>::Setup setup;
    setup.diffusivity = problem.viscosity;
    setup.schemes = problem.schemes;
    setup.hoop = grid.coordinates() == mesh::Coordinates::cylindrical && component == 1;
    for (int d = 0; d < D; ++d) {
        for (int end = 0; end < 2; ++end) {
            setup.sides[d][end].kind = momentum_side(problem.sides[d][end], d == component);
        }
    }
    return {grid, component, setup};
}

/// The pressure force on the volumes of one velocity component.
template <int D>
class PressureForce final : public balance::RowTerm<D> {
public:
    PressureForce(const mesh::ControlVolumes<D>& cells, const field::Layout<D>& layout, int component,
                  const double* pressure)
        : cells_(cells), layout_(layout), component_(component), pressure_(pressure)
    {
    }

    void add(const std::array<int, D>& row, int begin, int end, double* __restrict r) const override
    {
        double common = 1;
        for (int e = 0; e < D - 1; ++e) {
            common *= cells_.area_factor[component_][e][row[e]];
        }
        std::array<int, D> first = row;
        first[D - 1] = 0;
        const double* __restrict area = cells_.area_factor[component_][D - 1].data();
        const double* __restrict above = pressure_ + layout_.index(first);
        const double* __restrict below = above - layout_.stride[component_];
        for (int j = begin; j < end; ++j) {
            r[j] += common * area[j] * (above[j] - below[j]);
        }
    }

private:
    const mesh::ControlVolumes<D>& cells_;
    const field::Layout<D>& layout_;
    int component_;
    const double* pressure_;
};

template <int D>
void check(const FlowProblem<D>& problem)
{
    Faults faults;
    faults.require_positive("density", problem.density, "kg/m^3");
    faults.require_positive("viscosity", problem.viscosity, "Pa s");
    for (int d = 0; d < D; ++d) {
        for (int end = 0; end < 2; ++end) {
            if (problem.sides[d][end] == FlowSide::open && !(d == 0 && end == 1)) {
                faults.add("sides[" + std::to_string(d) + "][" + std::to_string(end) + "]", "open",
                           "only the end of direction 0 may be open");
            }
        }
    }
    faults.throw_if_any();
}

} // namespace

template <int D>
FlowEquations<D>::FlowEquations(const mesh::Grid<D>& grid, const FlowProblem<D>& problem)
    : grid_(grid), problem_(problem), layout_(grid.cells()), cells_(grid, mesh::ControlVolumes<D>::unshifted)
{
    check(problem);
    momentum_.reserve(D);
    for (int c = 0; c < D; ++c) {
        momentum_.push_back(momentum_transport(grid_, problem_, c));
    }
    for (int c = 0; c < D; ++c) {
        balance_.emplace_back(momentum_[c], cells_, problem.density);
    }
}

template <int D>
field::Box<D> FlowEquations<D>::cell_box() const noexcept
{
    field::Box<D> box;
    box.end = grid_.cells();
    return box;
}

template <int D>
void FlowEquations<D>::momentum_residual(int c, const FlowState<D>& state, const FlowState<D>* source,
                                         field::Values& out)
{
    const PressureForce<D> force(cells_, layout_, c, state.pressure.data());
    balance_[c].residual(state.pointers(), state.velocity[c], source == nullptr ? nullptr : source->velocity[c].data(),
                         &force, out);
}

template <int D>
void FlowEquations<D>::momentum_residual_row(int c, const FlowState<D>& state, const FlowState<D>* source,
                                             const std::array<int, D>& row, double* out)
{
    const PressureForce<D> force(cells_, layout_, c, state.pressure.data());
    balance_[c].residual_row(state.pointers(), state.velocity[c].data(),
                             source == nullptr ? nullptr : source->velocity[c].data(), &force, row, out);
}

template <int D>
void FlowEquations<D>::mass_residual_row(const FlowState<D>& state, const FlowState<D>* source,
                                         const std::array<int, D>& row, double* __restrict out) const
{
    const int n = grid_.cells(D - 1);
    std::array<int, D> first = row;
    first[D - 1] = 0;
    const std::ptrdiff_t at = layout_.index(first);
    for (int d = 0; d < D; ++d) {
        std::array<double, 2> common = {problem_.density, problem_.density};
        for (int e = 0; e < D - 1; ++e) {
            common[0] *= cells_.area_factor[d][e][row[e]];
            common[1] *= cells_.area_factor[d][e][row[e] + (d == e ? 1 : 0)];
        }
        const double* __restrict u = state.velocity[d].data() + at;
        const double* __restrict next = u + layout_.stride[d];
        const double* __restrict area = cells_.area_factor[d][D - 1].data();
        const double* __restrict next_area = area + (d == D - 1 ? 1 : 0);
        if (d == 0) {
            for (int j = 0; j < n; ++j) {
                out[j] = common[1] * next_area[j] * next[j] - common[0] * area[j] * u[j];
            }
        } else {
            for (int j = 0; j < n; ++j) {
                out[j] += common[1] * next_area[j] * next[j] - common[0] * area[j] * u[j];
            }
        }
    }
    if (source != nullptr) {
        const double* __restrict s = source->pressure.data() + at;
        for (int j = 0; j < n; ++j) {
            out[j] -= s[j];
        }
    }
}

template <int D>
void FlowEquations<D>::mass_residual(const FlowState<D>& state, const FlowState<D>* source, field::Values& out) const
{
    field::for_each_row<D>(cell_box(), [&](const std::array<int, D>& row) {
        mass_residual_row(state, source, row, out.data() + layout_.index(row));
    });
}

template <int D>
void FlowEquations<D>::residual(const FlowState<D>& state, const FlowState<D>* source, FlowState<D>& out)
{
    for (int c = 0; c < D; ++c) {
        momentum_residual(c, state, source, out.velocity[c]);
    }
    mass_residual(state, source, out.pressure);
}

template <int D>
void FlowEquations<D>::copy_boundary(const FlowState<D>& from, FlowState<D>& to) const
{
    for (int c = 0; c < D; ++c) {
        const field::Box<D>& solved = momentum_[c].solved();
        field::Values kept = to.velocity[c];
        to.velocity[c] = from.velocity[c];
        field::for_each_row<D>(solved, [&](const std::array<int, D>& row) {
            const std::ptrdiff_t at = layout_.index(row);
            const int n = solved.end[D - 1] - solved.begin[D - 1];
            for (int j = 0; j < n; ++j) {
                to.velocity[c][at + j] = kept[at + j];
            }
        });
    }
}

template class FlowEquations<2>;
template class FlowEquations<3>;

} // namespace leat::coupling
