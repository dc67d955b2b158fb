// How fast the two kernels of leat are, beside what the memory of this machine gives: one evaluation of all residuals
// and one sweep of coupled lines on 640 x 160 cells, against a triad over 48 bytes per cell; and the memory of a solve.
// Ratios of one run; every time is the least of many.

#include <leat/leat.hpp>
#include <leat/passage/duct_flow.hpp>
#include <support/allocation_counter.hpp>

#include <chrono>
#include <cstdio>
#include <vector>

namespace {

template <class Work>
double least_seconds(int times, Work&& work)
{
    double least = 1e300;
    for (int k = 0; k < times; ++k) {
        const auto start = std::chrono::steady_clock::now();
        work();
        const std::chrono::duration<double> spent = std::chrono::steady_clock::now() - start;
        least = spent.count() < least ? spent.count() : least;
    }
    return least;
}

leat::Passage example_tube()
{
    leat::Passage passage;
    passage.shape = leat::Tube{.diameter = 8e-3, .length = 0.7};
    passage.fluid = {.density = 865, .viscosity = 7e-3};
    passage.inlet.reynolds_number = 1000;
    passage.outlet = leat::Outlet::cut; // no tail: exactly the stated cells
    return passage;
}

struct Row {
    const char* what;
    double value;
    double must;
    double stretch;
};

} // namespace

int main()
{
    const leat::Passage passage = example_tube();
    leat::Options options;
    options.cells = {{640, 160}};
    const double cells = 640.0 * 160.0;

    const leat::Derived derived = leat::derive(passage);
    const leat::passage::DuctFlow flow = leat::passage::solve_duct_flow(
        passage, derived, leat::passage::make_grid(passage, derived, *options.cells), options, {}, {});
    leat::cascade::Cascade<2>& cascade = *flow.cascade;

    const auto count = static_cast<std::size_t>(2 * cells); // three arrays of two numbers per cell: 48 bytes
    std::vector<double> a(count), b(count, 1.0), c(count, 2.0);
    const double triad = least_seconds(400, [&] {
        for (std::size_t k = 0; k < count; ++k) {
            a[k] = b[k] + 1.5 * c[k];
        }
        asm volatile("" : : "r"(a.data()) : "memory");
    });
    const double residual = least_seconds(200, [&] { cascade.residual(0); });
    const double sweep = least_seconds(100, [&] { cascade.iterate(0, false); });

    leat::test::reset_peak();
    const long long before = leat::test::allocations().live_bytes;
    const leat::Answer answer = leat::solve(passage, {}, options);
    const auto bytes = static_cast<double>(leat::test::allocations().peak_bytes - before);

    const double nanoseconds = 1e9 / cells;
    std::printf("640 x 160 cells, tube, Re 1000; solve %s\n", std::string(name(answer.outcome)).c_str());
    std::printf("triad over 48 bytes per cell   %7.3f ns per cell\n", triad * nanoseconds);
    std::printf("residual                       %7.3f ns per cell\n", residual * nanoseconds);
    std::printf("sweep of coupled lines         %7.3f ns per cell\n\n", sweep * nanoseconds);
    const Row rows[] = {{"residual / triad", residual / triad, 12, 7},
                        {"sweep / residual", sweep / residual, 6, 3},
                        {"bytes per cell of a solve", bytes / cells, 250, 200}};
    bool met = true;
    std::printf("%-28s %9s %9s %9s\n", "", "measured", "at most", "stretch");
    for (const Row& row : rows) {
        std::printf("%-28s %9.2f %9.0f %9.0f  %s\n", row.what, row.value, row.must, row.stretch,
                    row.value <= row.must ? "met" : "NOT MET");
        met = met && row.value <= row.must;
    }
    return met ? 0 : 1;
}
