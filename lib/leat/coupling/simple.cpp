#include <leat/coupling/simple.hpp>

#include <algorithm>

namespace leat::coupling {

template <int D>
SimpleCoupling<D>::SimpleCoupling(FlowEquations<D>& equations, const Settings& settings, bool consistent)
    : equations_(equations), settings_(settings), consistent_(consistent),
      system_(equations.layout(), equations.cell_box()), residual_(field::zeros(equations.layout())),
      correction_(residual_), line_(static_cast<std::size_t>(equations.grid().cells(D - 1)) + 3),
      pressure_solver_(equations.layout(), equations.cell_box())
{
    response_.fill(residual_);
}

template <int D>
void SimpleCoupling<D>::iterate(FlowState<D>& state, const FlowState<D>* source, bool backwards)
{
    for (int c = 0; c < D; ++c) {
        predict(c, state, source, backwards);
    }
    equations_.mass_residual(state, source, residual_);
    for (double& r : residual_) {
        r = -r;
    }
    assemble_pressure();
    std::fill(correction_.begin(), correction_.end(), 0.0);
    pressure_solver_.prepare(system_, equations_.problem().closed());
    pressure_solver_.solve(residual_, correction_, settings_.pressure_tolerance, settings_.pressure_iterations);
    correct(state);
}

/// Improves one velocity component under the present pressure; leaves its response to a pressure difference.
template <int D>
void SimpleCoupling<D>::predict(int c, FlowState<D>& state, const FlowState<D>* source, bool backwards)
{
    const mesh::ControlVolumes<D>& cells = equations_.cells();
    const field::Box<D>& solved = equations_.momentum(c).solved();
    equations_.momentum_residual(c, state, source, residual_);
    system_.box = solved;
    equations_.balance(c).assemble(state.pointers(), system_);
    const int begin = solved.begin[D - 1];
    const int end = solved.end[D - 1];
    field::for_each_row<D>(solved, [&](std::array<int, D> k) {
        const std::ptrdiff_t at = equations_.layout().index(k) - begin;
        for (int j = begin; j < end; ++j) {
            k[D - 1] = j;
            system_.centre[at + j] /= settings_.relaxation.velocity;
            double resistance = system_.centre[at + j];
            if (consistent_) {
                for (int d = 0; d < D; ++d) {
                    resistance += system_.lower[d][at + j] + system_.upper[d][at + j];
                }
            }
            response_[c][at + j] = cells.area(c, k) / resistance;
            residual_[at + j] = -residual_[at + j];
        }
    });
    std::fill(correction_.begin(), correction_.end(), 0.0);
    for (int sweep = 0; sweep < settings_.momentum_sweeps; ++sweep) {
        linear::line_sweep(system_, residual_, backwards != (sweep % 2 == 1), correction_, line_);
    }
    field::for_each_row<D>(solved, [&](const std::array<int, D>& k) {
        const std::ptrdiff_t at = equations_.layout().index(k) - begin;
        for (int j = begin; j < end; ++j) {
            state.velocity[c][at + j] += correction_[at + j];
        }
    });
}

/// Mass balance of the velocities that a pressure correction brings.
template <int D>
void SimpleCoupling<D>::assemble_pressure()
{
    const mesh::ControlVolumes<D>& cells = equations_.cells();
    const field::Layout<D>& layout = equations_.layout();
    system_.box = equations_.cell_box();
    std::fill(system_.centre.begin(), system_.centre.end(), 0.0);
    for (int d = 0; d < D; ++d) {
        std::fill(system_.lower[d].begin(), system_.lower[d].end(), 0.0);
        std::fill(system_.upper[d].begin(), system_.upper[d].end(), 0.0);
        const std::ptrdiff_t stride = layout.stride[d];
        const field::Box<D>& solved = equations_.momentum(d).solved();
        const int end = solved.end[D - 1];
        field::for_each_row<D>(solved, [&](std::array<int, D> k) {
            for (; k[D - 1] < end; ++k[D - 1]) {
                const std::ptrdiff_t at = layout.index(k);
                const double coefficient = equations_.problem().density * cells.area(d, k) * response_[d][at];
                system_.centre[at - stride] += coefficient;
                if (k[d] < cells.cells(d)) { // else the face lies on the open end, beyond which p = 0
                    system_.centre[at] += coefficient;
                    system_.lower[d][at] = -coefficient;
                    system_.upper[d][at - stride] = -coefficient;
                }
            }
        });
    }
}

template <int D>
void SimpleCoupling<D>::correct(FlowState<D>& state)
{
    const field::Layout<D>& layout = equations_.layout();
    for (int c = 0; c < D; ++c) {
        const field::Box<D>& solved = equations_.momentum(c).solved();
        const int n = solved.end[D - 1] - solved.begin[D - 1];
        field::for_each_row<D>(solved, [&](const std::array<int, D>& k) {
            const std::ptrdiff_t at = layout.index(k);
            const std::ptrdiff_t below = at - layout.stride[c];
            for (int j = 0; j < n; ++j) { // ghost places of the correction are zero: p = 0 beyond an open end
                state.velocity[c][at + j] += response_[c][at + j] * (correction_[below + j] - correction_[at + j]);
            }
        });
    }
    const int n = equations_.grid().cells(D - 1);
    field::for_each_row<D>(equations_.cell_box(), [&](const std::array<int, D>& k) {
        const std::ptrdiff_t at = layout.index(k);
        for (int j = 0; j < n; ++j) {
            state.pressure[at + j] += settings_.relaxation.pressure * correction_[at + j];
        }
    });
}

template <int D>
std::size_t SimpleCoupling<D>::bytes() const noexcept
{
    const std::size_t arrays = (2 * D + 1) + D + 2;
    return (arrays * residual_.size() + line_.size()) * sizeof(double) + pressure_solver_.bytes();
}

template class SimpleCoupling<2>;
template class SimpleCoupling<3>;

} // namespace leat::coupling
