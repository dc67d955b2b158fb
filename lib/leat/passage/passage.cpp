#include <leat/passage/derived_numbers.hpp>
#include <leat/passage/passage.hpp>
#include <leat/passage/tabulated_profile.hpp>

#include <array>
#include <cmath>
#include <string>
#include <string_view>

namespace leat {

namespace {

void note_faults(const Tube& tube, Faults& faults)
{
    faults.require_positive("shape.diameter", tube.diameter, "m");
    faults.require_positive("shape.length", tube.length, "m");
}

void note_faults(const Channel& channel, Faults& faults)
{
    faults.require_positive("shape.gap", channel.gap, "m");
    faults.require_positive("shape.length", channel.length, "m");
}

void note_faults(const Annulus& annulus, Faults& faults)
{
    faults.require_positive("shape.inner_diameter", annulus.inner_diameter, "m");
    faults.require_positive("shape.outer_diameter", annulus.outer_diameter, "m");
    if (annulus.inner_diameter > 0 && annulus.outer_diameter > 0 &&
        !(annulus.outer_diameter > annulus.inner_diameter)) {
        faults.add("shape.outer_diameter", to_text(annulus.outer_diameter),
                   "must be > inner_diameter, which is " + to_text(annulus.inner_diameter) + " m");
    }
    faults.require_positive("shape.length", annulus.length, "m");
}

/// A quantity that has rivals, of which exactly one must be given.
struct Statement {
    std::string_view field;
    const std::optional<double>& value;
    std::string_view unit;
};

/// Notes each bad value, and a fault unless exactly one statement is given; `choice` names them all.
template <std::size_t count>
void note_statement_faults(const std::array<Statement, count>& statements, const std::string& choice, Faults& faults)
{
    std::string given;
    std::string_view last = statements.front().field;
    int number = 0;
    for (const Statement& statement : statements) {
        if (statement.value) {
            faults.require_positive(std::string(statement.field), *statement.value, std::string(statement.unit));
            given +=
                (number++ == 0 ? "" : " and ") + std::string(statement.field.substr(statement.field.find('.') + 1));
            last = statement.field;
        }
    }
    if (number == 0) {
        faults.add(std::string(last), "", "none given; give exactly one of " + choice);
    } else if (number > 1) {
        faults.add(std::string(last), "", given + " are given; give exactly one of " + choice);
    }
}

std::array<Statement, 4> flow_statements(const Passage& passage)
{
    const bool channel = std::holds_alternative<Channel>(passage.shape);
    const Inlet& inlet = passage.inlet;
    return {{{"inlet.mean_velocity", inlet.mean_velocity, "m/s"},
             {"inlet.flow_rate", inlet.flow_rate, channel ? "m^2/s" : "m^3/s"},
             {"inlet.mass_flow_rate", inlet.mass_flow_rate, channel ? "kg/(s m)" : "kg/s"},
             {"inlet.reynolds_number", inlet.reynolds_number, ""}}};
}

/// For a passage whose members are right one by one: what they lead to must be a number, and Re within bounds.
void note_derived_faults(const Passage& passage, Faults& faults)
{
    const Derived derived = passage::derived_numbers(passage);
    const auto sound = [](double number) { return std::isfinite(number) && number > 0; };
    if (!sound(derived.area) || !sound(derived.hydraulic_diameter) || !sound(derived.wetted_perimeter)) {
        faults.add("shape", "", "its area comes out as " + to_text(derived.area) + "; must be finite and > 0");
        return;
    }
    std::string field;
    double stated = 0;
    for (const Statement& statement : flow_statements(passage)) {
        if (statement.value) {
            field = statement.field;
            stated = *statement.value;
        }
    }
    const std::string cause = " (density " + to_text(derived.density) + " kg/m^3, viscosity " +
                              to_text(derived.viscosity) + " Pa s, mean velocity " + to_text(derived.mean_velocity) +
                              " m/s, hydraulic diameter " + to_text(derived.hydraulic_diameter) + " m)";
    const double reynolds = derived.reynolds_number;
    if (!(reynolds >= 1e-6 && reynolds <= 1e7)) {
        faults.add(field, to_text(stated),
                   "gives the Reynolds number " + to_text(reynolds) + cause + "; must be within 1e-6 .. 1e7");
    } else if (!sound(derived.viscosity) || !sound(derived.mean_velocity) || !sound(derived.mass_flow_rate) ||
               !sound(derived.density * derived.mean_velocity * derived.mean_velocity) ||
               !sound(derived.length / derived.hydraulic_diameter)) {
        faults.add(field, to_text(stated), "gives numbers beyond the range of the computer" + cause);
    }
}

} // namespace

std::vector<Fault> faults_of(const Passage& passage)
{
    Faults faults;
    std::visit([&faults](const auto& kind) { note_faults(kind, faults); }, passage.shape);
    const bool shape_is_sound = faults.empty();

    faults.require_positive("fluid.density", passage.fluid.density, "kg/m^3");
    note_statement_faults<2>({{{"fluid.viscosity", passage.fluid.viscosity, "Pa s"},
                               {"fluid.kinematic_viscosity", passage.fluid.kinematic_viscosity, "m^2/s"}}},
                             "viscosity, kinematic_viscosity", faults);
    note_statement_faults(flow_statements(passage), "mean_velocity, flow_rate, mass_flow_rate, reynolds_number",
                          faults);
    if (faults.empty()) {
        note_derived_faults(passage, faults);
    }

    const Inlet& inlet = passage.inlet;
    const bool wants_table = inlet.profile == InletProfile::table;
    if (wants_table != inlet.table.has_value()) {
        faults.add("inlet.table", "",
                   wants_table ? "missing; the profile is a table" : "is given, but the profile is not a table");
    } else if (wants_table && shape_is_sound) {
        passage::note_table_faults(*inlet.table, passage.shape, faults);
    }
    return faults.list();
}

Derived derive(const Passage& passage)
{
    std::vector<Fault> faults = faults_of(passage);
    if (!faults.empty()) {
        throw InvalidInput(std::move(faults));
    }
    return passage::derived_numbers(passage);
}

} // namespace leat
