#include "catch.hpp"

#include <leat/monitor/judge.hpp>

#include <algorithm>
#include <cmath>
#include <limits>
#include <random>
#include <vector>

using namespace leat;
using monitor::Judge;
using monitor::Rules;

namespace {

/// Feeds worst imbalances until an outcome; the last value is repeated for ever.
std::optional<Outcome> feed(Judge& judge, const std::vector<double>& worst, int most = 100000)
{
    for (int k = 0; k < most; ++k) {
        const double value = worst[std::min<std::size_t>(k, worst.size() - 1)];
        if (const auto outcome = judge.judge({value, 0.5 * value})) {
            return outcome;
        }
    }
    return std::nullopt;
}

bool says(const Judge& judge, const std::string& text)
{
    return judge.message().find(text) != std::string::npos;
}

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr double not_a_number = std::numeric_limits<double>::quiet_NaN();

} // namespace

TEST_CASE("Judge: converged when both imbalances are within the tolerance, from iteration 0 on")
{
    Judge judge(Rules{1e-3, 100, 20, 0.9, 1e6});
    CHECK(feed(judge, {1, 0.1, 0.01, 1e-3}) == Outcome::converged);
    CHECK(judge.iterations() == 3);
    CHECK(says(judge, "converged"));
    CHECK(says(judge, "mass 0.001"));
    CHECK(says(judge, "momentum 0.0005"));
    Judge at_once(Rules{1e-3, 100, 20, 0.9, 1e6});
    CHECK(feed(at_once, {0}) == Outcome::converged);
    CHECK(at_once.iterations() == 0);
    Judge momentum_lags(Rules{1e-3, 100, 20, 0.9, 1e6});
    CHECK(!momentum_lags.judge({1e-4, 2e-3}));
    CHECK(!momentum_lags.judge({2e-3, 1e-4}));
    CHECK(momentum_lags.judge({1e-4, 1e-4}) == Outcome::converged);
}

TEST_CASE("Judge: stalled after `patience` iterations without progress")
{
    Judge judge(Rules{1e-9, 1000, 7, 0.9, 1e6});
    CHECK(feed(judge, {1, 0.1, 0.095}) == Outcome::stalled);
    CHECK(judge.iterations() == 8);
    CHECK(judge.best() == 0.1);
    CHECK(says(judge, "stalled"));
    CHECK(says(judge, "0.1 "));
    CHECK(says(judge, "1e-09"));
}

TEST_CASE("Judge: diverged on growth and on what is not finite")
{
    Judge growth(Rules{1e-9, 1000, 20, 0.9, 1e3});
    CHECK(feed(growth, {1, 10, 1000, 1001}) == Outcome::diverged);
    CHECK(growth.iterations() == 3);
    CHECK(says(growth, "diverged"));
    for (const double bad : {infinity, -infinity, not_a_number}) {
        Judge at_once(Rules{});
        CHECK(feed(at_once, {bad}) == Outcome::diverged);
        Judge later(Rules{});
        CHECK(feed(later, {1, 0.5, bad}) == Outcome::diverged);
        CHECK(later.iterations() == 2);
        Judge momentum(Rules{});
        CHECK(momentum.judge({1e-12, bad}) == Outcome::diverged);
        Judge mass(Rules{});
        CHECK(mass.judge({bad, 1e-12}) == Outcome::diverged);
    }
}

TEST_CASE("Judge: out of budget when the iterations are spent")
{
    Judge judge(Rules{1e-9, 3, 20, 0.9, 1e6});
    CHECK(feed(judge, {1, 0.5, 0.25, 0.125}) == Outcome::out_of_budget);
    CHECK(judge.iterations() == 3);
    CHECK(says(judge, "out of budget: 3 iterations"));
    Judge last_moment(Rules{1e-9, 3, 20, 0.9, 1e6});
    CHECK(feed(last_moment, {1, 0.5, 0.25, 1e-10}) == Outcome::converged);
}

TEST_CASE("Judge: every sequence ends within a bounded number of iterations")
{
    std::mt19937_64 random(20260117);
    std::uniform_real_distribution<double> uniform(0, 1);
    for (int sequence = 0; sequence < 3000; ++sequence) {
        Rules rules;
        rules.patience = 1 + static_cast<int>(uniform(random) * 20);
        rules.progress = 0.5 + 0.49 * uniform(random);
        rules.iterations = std::numeric_limits<int>::max();
        const double first = std::pow(10, -6 + 8 * uniform(random));
        // Each step of progress takes at most `patience` iterations, and there is room for so many steps.
        const double steps = std::max(0.0, std::log(rules.tolerance / first) / std::log(rules.progress)) + 1;
        const int bound = static_cast<int>(rules.patience * (steps + 1)) + 1;
        const int kind = sequence % 3;
        const double drift = 1 - 0.02 * uniform(random);
        Judge judge(rules);
        double value = first;
        std::optional<Outcome> outcome;
        int fed = 0;
        for (; !outcome && fed <= bound; ++fed) {
            outcome = judge.judge({value, value * uniform(random)});
            switch (kind) {
            case 0: // anything at all
                value = first * std::pow(10, -12 + 19 * uniform(random));
                break;
            case 1: // slowly down, shaken
                value *= drift * (0.9 + 0.2 * uniform(random));
                break;
            default: // the slowest that still counts as progress, as rarely as allowed
                value =
                    fed % rules.patience == rules.patience - 1 ? judge.best() * rules.progress * 0.999 : judge.best();
            }
        }
        INFO("sequence " << sequence << ", bound " << bound << ": " << judge.message());
        CHECK(outcome);
        CHECK(!judge.message().empty());
    }
}

TEST_CASE("Outcomes and imbalances: names, and the worst is never hidden by a NaN")
{
    CHECK(name(Outcome::converged) == "converged");
    CHECK(name(Outcome::stalled) == "stalled");
    CHECK(name(Outcome::diverged) == "diverged");
    CHECK(name(Outcome::out_of_budget) == "out_of_budget");
    CHECK(name(Outcome::cancelled) == "cancelled");
    CHECK(Imbalances{1, 2}.worst() == 2);
    CHECK(Imbalances{3, 2}.worst() == 3);
    CHECK(std::isnan(Imbalances{not_a_number, 2}.worst()));
    CHECK(std::isnan(Imbalances{1, not_a_number}.worst()));
}
