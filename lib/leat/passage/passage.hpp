#pragma once

#include <leat/base/error.hpp>

#include <optional>
#include <variant>
#include <vector>

namespace leat {

/// A circular tube. Hydraulic diameter = diameter.
struct Tube {
    double diameter = 0; ///< m, > 0
    double length = 0;   ///< m, > 0
};

/// A plane channel between two parallel plates; hydraulic diameter = 2 gap. All numbers per metre of width.
struct Channel {
    double gap = 0;    ///< m, > 0: wall to wall
    double length = 0; ///< m, > 0
};

/// A concentric annulus; hydraulic diameter = outer_diameter - inner_diameter.
struct Annulus {
    double inner_diameter = 0; ///< m, > 0
    double outer_diameter = 0; ///< m, > inner_diameter
    double length = 0;         ///< m, > 0
};

using Shape = std::variant<Tube, Channel, Annulus>;

/// A Newtonian liquid or gas with constant properties. Give exactly one of the two viscosities.
struct Fluid {
    double density = 0;                          ///< kg/m^3, > 0
    std::optional<double> viscosity{};           ///< Pa s, > 0 (dynamic)
    std::optional<double> kinematic_viscosity{}; ///< m^2/s, > 0
};

enum class InletProfile {
    flat,      ///< the same axial velocity all over the section
    developed, ///< the fully developed profile of the shape
    table      ///< `Inlet::table`
};

/// A measured or computed inlet profile. Its shape is scaled to the stated flow.
/// Between the points it is interpolated by a monotone cubic (Fritsch & Carlson 1980).
struct VelocityTable {
    std::vector<double> position{}; ///< m, strictly increasing. Tube: radius from 0 to diameter/2. Channel: distance
                                    ///< from the lower wall, 0 to gap (taken as symmetric: 0 to gap/2 serves too).
                                    ///< Annulus: radius from inner_diameter/2 to outer_diameter/2.
    std::vector<double> velocity{}; ///< any unit; as many as positions, at least 2, finite, mean > 0
};

/// The inlet. State the flow in exactly one of the four ways.
struct Inlet {
    InletProfile profile = InletProfile::flat;
    std::optional<double> mean_velocity{};   ///< m/s, > 0
    std::optional<double> flow_rate{};       ///< m^3/s (channel: m^2/s, per metre of width), > 0
    std::optional<double> mass_flow_rate{};  ///< kg/s (channel: kg/(s m)), > 0
    std::optional<double> reynolds_number{}; ///< on the hydraulic diameter, > 0
    std::optional<VelocityTable> table{};    ///< with profile = table, and only then
};

enum class Outlet {
    continues, ///< the duct goes on beyond the end; numbers are read at the end
    cut        ///< the duct ends there: zero traction at every point of the end plane
};

/// What an engineer states.
struct Passage {
    Shape shape{};
    Fluid fluid{};
    Inlet inlet{};
    Outlet outlet = Outlet::continues;
};

/// Every fault of a passage, found in one pass; empty when it can be solved.
std::vector<Fault> faults_of(const Passage& passage);

/// What follows from a valid passage by arithmetic.
struct Derived {
    double length = 0;             ///< m
    double hydraulic_diameter = 0; ///< m, 4 A/P with the full wetted perimeter
    double area = 0;               ///< m^2 (channel: m, per metre of width)
    double wetted_perimeter = 0;   ///< m (channel: 2, per metre of width)
    double density = 0;            ///< kg/m^3
    double viscosity = 0;          ///< Pa s
    double mean_velocity = 0;      ///< m/s
    double mass_flow_rate = 0;     ///< kg/s (channel: kg/(s m))
    double reynolds_number = 0;    ///< rho u_m D_h/mu
};

/// Throws InvalidInput with all faults_of(passage).
Derived derive(const Passage& passage);

} // namespace leat
