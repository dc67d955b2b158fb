#include <leat/monitor/judge.hpp>

#include <leat/base/error.hpp>

#include <algorithm>
#include <cmath>

namespace leat::monitor {

namespace {

std::string pair_text(const Imbalances& i)
{
    return "mass " + to_short_text(i.mass) + ", momentum " + to_short_text(i.momentum);
}

} // namespace

std::optional<Outcome> Judge::judge(const Imbalances& imbalances)
{
    const double worst = imbalances.worst();
    if (count_++ == 0) {
        first_ = best_ = worst;
    } else if (worst < rules_.progress * best_) {
        best_ = worst;
        since_progress_ = 0;
    } else {
        ++since_progress_;
    }
    if (!std::isfinite(worst) || (first_ > 0 && worst > rules_.growth * first_)) {
        const std::string after = " after " + std::to_string(count_ - 1) + " iterations";
        message_ = std::isfinite(worst) ? "diverged: imbalances (" + pair_text(imbalances) + ")" + after + " exceed " +
                                              to_short_text(rules_.growth) + " times the first"
                                        : "diverged: imbalances" + after + " are not finite";
        return Outcome::diverged;
    }
    if (worst <= rules_.tolerance) {
        message_ = "converged: imbalances (" + pair_text(imbalances) + ") are within the tolerance " +
                   to_short_text(rules_.tolerance);
        return Outcome::converged;
    }
    if (since_progress_ >= rules_.patience) {
        message_ = "stalled: no progress beyond an imbalance of " + to_short_text(best_) + " for " +
                   std::to_string(since_progress_) + " iterations; the tolerance is " + to_short_text(rules_.tolerance);
        return Outcome::stalled;
    }
    if (count_ - 1 >= rules_.iterations) {
        message_ = "out of budget: " + std::to_string(count_ - 1) + " iterations are spent, imbalances (" +
                   pair_text(imbalances) + ") exceed the tolerance " + to_short_text(rules_.tolerance);
        return Outcome::out_of_budget;
    }
    return std::nullopt;
}

} // namespace leat::monitor
