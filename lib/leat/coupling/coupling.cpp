#include <leat/coupling/coupling.hpp>

#include <leat/base/error.hpp>
#include <leat/coupling/lines.hpp>
#include <leat/coupling/simple.hpp>

#include <array>

namespace leat {

namespace {

constexpr std::array<std::string_view, 3> names = {"simple", "simplec", "lines"};

} // namespace

std::string_view name(Coupling coupling) noexcept
{
    return names[static_cast<std::size_t>(coupling)];
}

std::optional<Coupling> coupling_named(std::string_view text) noexcept
{
    for (std::size_t k = 0; k < names.size(); ++k) {
        if (names[k] == text) {
            return static_cast<Coupling>(k);
        }
    }
    return std::nullopt;
}

namespace coupling {

namespace {

void require_factor(Faults& faults, const std::string& field, double factor)
{
    if (!(factor > 0 && factor <= 1)) {
        faults.add(field, to_text(factor), "must be in (0, 1]");
    }
}

} // namespace

Relaxation default_relaxation(leat::Coupling coupling) noexcept
{
    switch (coupling) {
    case leat::Coupling::simple:
        return {0.8, 0.2};
    case leat::Coupling::simplec:
        return {0.95, 1.0};
    case leat::Coupling::lines:
        break;
    }
    return {0.9, 0.9};
}

template <int D>
std::unique_ptr<FlowCoupling<D>> make_coupling(leat::Coupling coupling, FlowEquations<D>& equations,
                                               const Settings& settings)
{
    Faults faults;
    require_factor(faults, "relaxation.velocity", settings.relaxation.velocity);
    require_factor(faults, "relaxation.pressure", settings.relaxation.pressure);
    if (coupling == leat::Coupling::lines) {
        for (int d = 0; d < D; ++d) {
            if (equations.grid().cells(d) < 2) {
                faults.add("cells(" + std::to_string(d) + ")", std::to_string(equations.grid().cells(d)),
                           "must be at least 2 for coupled lines");
            }
        }
    } else {
        if (settings.momentum_sweeps < 1) {
            faults.add("momentum_sweeps", std::to_string(settings.momentum_sweeps), "must be >= 1");
        }
        if (!(settings.pressure_tolerance > 0 && settings.pressure_tolerance < 1)) {
            faults.add("pressure_tolerance", to_text(settings.pressure_tolerance), "must be in (0, 1)");
        }
        if (settings.pressure_iterations < 1) {
            faults.add("pressure_iterations", std::to_string(settings.pressure_iterations), "must be >= 1");
        }
    }
    faults.throw_if_any();
    if (coupling == leat::Coupling::lines) {
        return std::make_unique<LinesCoupling>(equations, settings);
    }
    return std::make_unique<SimpleCoupling<D>>(equations, settings, coupling == leat::Coupling::simplec);
}

template std::unique_ptr<FlowCoupling<2>> make_coupling(leat::Coupling, FlowEquations<2>&, const Settings&);

} // namespace coupling
} // namespace leat
