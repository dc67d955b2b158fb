#include <leat/monitor/outcome.hpp>

namespace leat {

std::string_view name(Outcome outcome) noexcept
{
    switch (outcome) {
    case Outcome::converged:
        return "converged";
    case Outcome::stalled:
        return "stalled";
    case Outcome::diverged:
        return "diverged";
    case Outcome::out_of_budget:
        return "out_of_budget";
    case Outcome::cancelled:
        break;
    }
    return "cancelled";
}

} // namespace leat
