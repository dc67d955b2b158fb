#include <leat/linear/pentadiagonal.hpp>

namespace leat::linear {

namespace {

/// Elimination away from one end. What the next row needs stays in registers: going through memory would double the
/// length of the chain.
struct Elimination {
    double first_1 = 0, first_2 = 0;   ///< factors of the next unknown in the last row and the one before it
    double second_1 = 0, second_2 = 0; ///< factors of the next but one

    void row(double outer_2, double outer_1, double here, double inner_1, double inner_2, int j,
             const PentadiagonalFactors& f) noexcept
    {
        const double coupling = outer_1 - outer_2 * first_2;
        const double pivot = 1 / (here - outer_2 * second_2 - coupling * first_1);
        const double first = (inner_1 - coupling * second_1) * pivot;
        first_2 = first_1;
        second_2 = second_1;
        first_1 = first;
        second_1 = inner_2 * pivot;
        f.pivot[j] = pivot;
        f.outward[j] = coupling * pivot;
        f.inward[j] = first;
    }
};

} // namespace

void factorise(int rows, const OuterBands& outer, const double* below_1, const double* here, const double* above_1,
               const PentadiagonalFactors& f) noexcept
{
    const int half = rows / 2; // rows 0 .. half - 1 are eliminated upwards, the others downwards
    Elimination up;
    Elimination down;
    for (int low = 0, high = rows - 1; low < half; ++low, --high) {
        up.row(outer.below_2[low], below_1[low], here[low], above_1[low], outer.above_2[low], low, f);
        down.row(outer.above_2[high], above_1[high], here[high], below_1[high], outer.below_2[high], high, f);
    }
    if (rows % 2 == 1) {
        down.row(outer.above_2[half], above_1[half], here[half], below_1[half], outer.below_2[half], half, f);
    }
}

void solve(int rows, const OuterBands& outer, const PentadiagonalFactors& f, double* __restrict x) noexcept
{
    const int half = rows / 2;
    const double* __restrict below_2 = outer.below_2;
    const double* __restrict above_2 = outer.above_2;
    const double* __restrict pivot = f.pivot;
    const double* __restrict outward = f.outward;
    const double* __restrict inward = f.inward;
    double up_1 = 0, up_2 = 0, down_1 = 0, down_2 = 0;
    for (int low = 0, high = rows - 1; low < half; ++low, --high) {
        const double up = pivot[low] * (x[low] - below_2[low] * up_2) - outward[low] * up_1;
        const double down = pivot[high] * (x[high] - above_2[high] * down_2) - outward[high] * down_1;
        up_2 = up_1;
        up_1 = up;
        down_2 = down_1;
        down_1 = down;
        x[low] = up;
        x[high] = down;
    }
    if (rows % 2 == 1) {
        const double down = pivot[half] * (x[half] - above_2[half] * down_2) - outward[half] * down_1;
        down_2 = down_1;
        down_1 = down;
        x[half] = down;
    }
    // The last row from below (half - 1) and the last from above (half) hold each other and, through their outer
    // bands, the rows behind each: two equations remain. A row that does not exist counts as x = 0.
    const auto inner_up = [&](int j) { return j >= 0 ? inward[j] : 0.0; };
    const auto inner_up_2 = [&](int j) { return j >= 0 ? above_2[j] * pivot[j] : 0.0; };
    const auto inner_down = [&](int j) { return j < rows ? inward[j] : 0.0; };
    const auto inner_down_2 = [&](int j) { return j < rows ? below_2[j] * pivot[j] : 0.0; };
    const int m = half - 1;
    const double a00 = 1 - inner_up_2(m) * inner_down_2(m + 2);
    const double a01 = inner_up(m) - inner_up_2(m) * inner_down(m + 2);
    const double a10 = inner_down(m + 1) - inner_down_2(m + 1) * inner_up(m - 1);
    const double a11 = 1 - inner_down_2(m + 1) * inner_up_2(m - 1);
    const double r0 = up_1 - inner_up_2(m) * down_2;
    const double r1 = down_1 - inner_down_2(m + 1) * up_2;
    const double inverse = 1 / (a00 * a11 - a01 * a10);
    double low_1 = m >= 0 ? (r0 * a11 - r1 * a01) * inverse : 0;
    double high_1 = m >= 0 ? (r1 * a00 - r0 * a10) * inverse : r1;
    if (m >= 0) {
        x[m] = low_1;
    }
    x[m + 1] = high_1;
    double low_2 = high_1;
    double high_2 = low_1;
    int low = m - 1;
    int high = m + 2;
    for (; low >= 0; --low, ++high) { // there is never less above than below
        const double lower = x[low] - above_2[low] * pivot[low] * low_2 - inward[low] * low_1;
        const double upper = x[high] - below_2[high] * pivot[high] * high_2 - inward[high] * high_1;
        low_2 = low_1;
        low_1 = lower;
        high_2 = high_1;
        high_1 = upper;
        x[low] = lower;
        x[high] = upper;
    }
    for (; high < rows; ++high) {
        const double upper = x[high] - below_2[high] * pivot[high] * high_2 - inward[high] * high_1;
        high_2 = high_1;
        high_1 = upper;
        x[high] = upper;
    }
}

} // namespace leat::linear
