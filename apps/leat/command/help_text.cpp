#include "command/help_text.hpp"

namespace leat::driver {

std::string short_help()
{
    return R"(leat: what does a laminar flow do in this duct, and how sure are we?

  leat solve CASE    pressure drop, friction, wall shear, development length
  leat check CASE    is the case valid, and what would be solved

For example, a case oil.case that holds

  [passage]
  shape    = tube
  diameter = 8 mm
  length   = 1.5 m
  [fluid]
  density   = 865 kg/m^3
  viscosity = 28 mPa.s
  [inlet]
  profile       = flat
  mean_velocity = 0.45 m/s

is solved by: leat solve oil.case
More: leat --help, leat solve --help
)";
}

std::string long_help()
{
    return short_help() + R"(
A case
  # begins a comment; every quantity has its unit; keys in brackets may be left out.
  [passage]   shape = tube (diameter) | channel (gap) | annulus (inner_diameter, outer_diameter); length;
              [outlet = continues | cut]; [stations = 0.1 m, 0.2 m]
  [fluid]     density; viscosity or kinematic_viscosity
  [inlet]     [profile = flat | developed | table]; [table = FILE beside the case]; one of mean_velocity,
              flow_rate, mass_flow_rate, reynolds_number
  [accuracy]  [band = 0.2 %] on the pressure drop; [band_on = development_length, ...] on these numbers too
  [numerics]  [scheme_along], [scheme_across] = upwind | central | power_law | linear_upwind | quick |
              van_leer | minmod; [coupling = simple | simplec | lines]; [cells = 160 x 40];
              [cell_budget = 400000]; [relaxation = 0.9 0.3] (velocity, pressure); [iterations = 20000];
              [tolerance = 1e-9]
  A channel's flow is per metre of width (L/min/m, kg/(s.m)). A table is a file of comma-separated pairs
  under a line such as: radius [mm], velocity [m/s]

Exit codes
  0 converged, or valid    1 not converged, or cells spent before the wanted band: numbers marked
  2 diverged: numbers marked
  64 command line wrong    65 case wrong                      66 file unreadable
  70 fault of leat         73 cannot create, or exists        74 writing failed
  130 interrupted: numbers so far, marked
)";
}

std::string command_help(CommandLine::Command command)
{
    if (command == CommandLine::Command::check) {
        return "leat check CASE [options]\n\nValidates a case; shows the passage in SI, Reynolds number and regime, "
               "the "
               "handbook estimate and\nthe planned grids, without solving.\n\n" +
               option_list(command);
    }
    return "leat solve CASE [options]\n\nSolves a case and prints its numbers. The result goes to the standard output, "
           "progress and messages\nto the standard error. Ctrl-C ends the solve with the numbers so far, marked.\n\n" +
           option_list(command);
}

} // namespace leat::driver
