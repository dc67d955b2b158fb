// Does the error band hold the truth, and how wide is it? Random passages (tube, channel, annulus; Re 1 to 2000; flat
// or developed inlet; continued or cut; 0.016 to 3 development lengths) are solved on nested grids whose finest has 64
// x 16, 96 x 24 and 128 x 32 cells (an annulus: twice as many across), and on grids eight times finer in each
// direction, extrapolated; developed passages are compared with the exact solution. Prints, for the band of leat and
// for the recipes that it was chosen over, how often the truth lies within, and how wide the band is against the true
// error. Usage: leat_benchmark_band_coverage [passages] [seed]

#include "published/band_samples.hpp"

#include <leat/cascade/error_band.hpp>
#include <leat/cascade/grid_convergence.hpp>

#include <algorithm>
#include <cstdio>
#include <cstdlib>
#include <functional>
#include <limits>
#include <map>

using namespace leat;
using test::BandSample;

namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();

using Estimator = std::function<double(const BandSample&)>;

std::array<double, 3> last_three(const BandSample& sample) // finest first
{
    const auto& v = sample.values;
    return {v.end()[-1].value, v.end()[-2].value, v.end()[-3].value};
}

double own(const BandSample& sample)
{
    return cascade::error_band(sample.values).half_width.value_or(infinity);
}

/// Three-grid index with the apparent order (Celik et al. 2008).
double observed_order(const BandSample& sample)
{
    const auto values = last_three(sample);
    const auto found = cascade::grid_convergence(values, {2, 2});
    return found ? found->index : values[0] == values[1] ? 0 : infinity;
}

/// Two-grid index of order 2 (Roache 1994).
Estimator fixed_order(double safety)
{
    return [safety](const BandSample& sample) {
        const auto values = last_three(sample);
        return cascade::grid_convergence_index(values[0], values[1], 2, 2, safety);
    };
}

/// Factor of safety of Xing & Stern 2010 (J. Fluids Eng. 132, 061403): P = apparent order/2; (2.45 - 0.85 P) times the
/// Richardson error for P <= 1, else (16.4 P - 14.8) times. Made for increments of one sign that shrink; where they
/// change sign, three times the greater increment stands in.
double factor_of_safety(const BandSample& sample)
{
    const auto values = last_three(sample);
    const double fine = values[0] - values[1];
    const double coarse = values[1] - values[2];
    if (fine == 0 || coarse / fine <= 0) {
        return 3 * std::max(std::abs(fine), std::abs(coarse));
    }
    const double order = std::log2(coarse / fine);
    if (order <= 0) {
        return infinity;
    }
    const double share = order / 2;
    const double factor = share <= 1 ? 2.45 - 0.85 * share : 16.4 * share - 14.8;
    return factor * std::abs(fine) / (std::exp2(order) - 1);
}

struct Score {
    int count = 0;
    int covered = 0;
    std::vector<double> widths; ///< band/true error
    double worst = 0;           ///< true error/band

    void add(const BandSample& sample, double half_width)
    {
        ++count;
        covered += sample.covered_by(half_width) ? 1 : 0;
        widths.push_back(sample.error() > 0 ? half_width / sample.error() : infinity);
        worst = std::max(worst, half_width > 0 ? sample.error() / half_width : 0);
    }
    double median()
    {
        std::nth_element(widths.begin(), widths.begin() + widths.size() / 2, widths.end());
        return widths[widths.size() / 2];
    }
    void print(const std::string& name)
    {
        if (count > 0) {
            std::printf("  %-34s %6d %9.2f %% %10.2f %12.3g\n", name.c_str(), count, 100.0 * covered / count, median(),
                        worst);
        }
    }
};

void print_head(const std::string& title)
{
    std::printf("%s\n  %-34s %6s %11s %10s %12s\n", title.c_str(), "", "count", "held", "band/error", "error/band");
}

void compare_estimators(const std::vector<BandSample>& samples)
{
    const std::vector<std::pair<std::string, Estimator>> estimators = {{"leat", own},
                                                                       {"apparent order, 1.25", observed_order},
                                                                       {"order 2, 1.25", fixed_order(1.25)},
                                                                       {"order 2, 3", fixed_order(3)},
                                                                       {"factor of safety (2010)", factor_of_safety}};
    print_head("recipes (median of band/error, worst of error/band)");
    for (const auto& [name, estimate] : estimators) {
        Score all;
        Score hard;
        Score easy;
        for (const BandSample& sample : samples) {
            const double half_width = estimate(sample);
            all.add(sample, half_width);
            (sample.hard() ? hard : easy).add(sample, half_width);
        }
        all.print(name);
        hard.print("  developing, not asymptotic");
        easy.print("  the others");
    }
}

void print_classes(const std::vector<BandSample>& samples)
{
    std::map<std::string, Score> scores;
    const BandSample* worst = &samples.front();
    int refused = 0;
    for (const BandSample& sample : samples) {
        const double half_width = own(sample);
        scores["number " + sample.number].add(sample, half_width);
        scores["shape " + sample.shape].add(sample, half_width);
        refused += cascade::error_band(sample.values).has_limit ? 0 : 1;
        if (sample.error() / half_width > worst->error() / own(*worst)) {
            worst = &sample;
        }
    }
    print_head("\nleat, by class");
    for (auto& [name, score] : scores) {
        score.print(name);
    }
    std::printf("\nrefused though they have a limit: %d\n", refused);
    std::printf("worst miss: %s, %s, Re %.4g, %d x %d cells: error %.3g %%, band %.3g %%\n", worst->number.c_str(),
                worst->shape.c_str(), worst->reynolds_number, worst->cells[0], worst->cells[1],
                100 * worst->error() / worst->scale, 100 * own(*worst) / worst->scale);
}

} // namespace

int main(int count, char** arguments)
{
    const int passages = count > 1 ? std::max(1, std::atoi(arguments[1])) : 60;
    const auto seed = static_cast<unsigned>(count > 2 ? std::atoi(arguments[2]) : 20240);
    std::vector<BandSample> samples;
    test::PassageLottery lottery(seed);
    for (int k = 0; k < passages; ++k) {
        const Passage passage = lottery.next();
        for (const int across : {16, 24, 32}) {
            test::add_samples(passage, {4 * across, across}, samples);
        }
    }
    std::printf("%d passages, seed %u: %zu samples (number x passage x finest grid)\n\n", passages, seed,
                samples.size());
    compare_estimators(samples);
    print_classes(samples);
    return 0;
}
