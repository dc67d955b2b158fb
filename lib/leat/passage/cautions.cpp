#include <leat/passage/cautions.hpp>
#include <leat/passage/developed.hpp>
#include <leat/passage/development_length.hpp>
#include <leat/passage/laminar_limit.hpp>
#include <leat/passage/rounded_text.hpp>

namespace leat::passage {

namespace {

/// A number beside a threshold: as short as it can be without looking equal to it.
std::string beside(double number, double threshold)
{
    const std::string text = rounded_text(number);
    return text == rounded_text(threshold) ? to_text(number) : text;
}

} // namespace

std::vector<std::string> cautions_before(const Passage& passage, const Derived& derived)
{
    std::vector<std::string> cautions;
    const double reynolds = derived.reynolds_number;
    const LaminarLimit limit = laminar_limit(passage.shape);
    if (reynolds > limit.reynolds_number) {
        cautions.push_back("Re " + beside(reynolds, limit.reynolds_number) + " is above " +
                           rounded_text(limit.reynolds_number) + ", the laminar limit of practice (" +
                           std::string(limit.shape) + ", " + std::string(limit.source) +
                           "): the real flow may be turbulent, with a larger pressure drop");
    }
    const double diameters = derived.length / derived.hydraulic_diameter;
    if (diameters < short_passage) {
        cautions.push_back("length is " + beside(diameters, short_passage) + " hydraulic diameters, below " +
                           rounded_text(short_passage) +
                           " (threshold of practice): what lies before the inlet and after the end governs the flow");
    }
    if (reynolds < creeping_reynolds_number && passage.inlet.profile == InletProfile::flat) {
        cautions.push_back("Re " + beside(reynolds, creeping_reynolds_number) + " is below " +
                           rounded_text(creeping_reynolds_number) +
                           " with a flat inlet: the duct acts upstream of its inlet, where no real profile stays flat "
                           "(Vrentas, Duda & Bargeron 1966)");
    }
    const double lengths = derived.length / development_length_estimate(passage.shape, reynolds);
    if (passage.inlet.profile == InletProfile::flat && lengths > developed_passage) {
        cautions.push_back(
            "length is " + beside(lengths, developed_passage) + " development lengths (Durst et al. 2005), above " +
            rounded_text(developed_passage) + ": the developed-flow formula with f Re = " +
            rounded_text(developed_flow(passage.shape).friction_reynolds) + " serves (Shah & London 1978)");
    }
    return cautions;
}

std::string regime_text(const Passage& passage, const Derived& derived)
{
    const LaminarLimit limit = laminar_limit(passage.shape);
    const bool laminar = derived.reynolds_number <= limit.reynolds_number;
    return (laminar ? "laminar: Re " : "beyond the laminar limit: Re ") +
           beside(derived.reynolds_number, limit.reynolds_number) + (laminar ? " is not above " : " is above ") +
           rounded_text(limit.reynolds_number) + " (" + std::string(limit.shape) + ", " + std::string(limit.source) +
           ")";
}

} // namespace leat::passage
