#include "catch.hpp"

#include "random_flow.hpp"

#include <leat/balance/balance.hpp>
#include <leat/linear/stencil_system.hpp>

#include <algorithm>
#include <cmath>

using namespace leat;
using balance::Side;
using mesh::Coordinates;

namespace {

/// A balance with a random flow and every kind of side that its volumes can have.
template <int D>
struct Sample {
    Sample(int shift, const std::array<Scheme, D>& schemes, bool closed, bool hoop = false)
        : flow(Coordinates::cylindrical, counts(), closed, 31),
          transport(flow.grid, shift, setup(shift, schemes, hoop)), balance(transport, flow.cells, flow.density),
          value(flow.random_values()), source(flow.random_values())
    {
    }
    static std::array<int, D> counts()
    {
        std::array<int, D> all{};
        for (int d = 0; d < D; ++d) {
            all[d] = 7 - d;
        }
        return all;
    }
    static typename balance::Transport<D>::Setup setup(int shift, const std::array<Scheme, D>& schemes, bool hoop)
    {
        typename balance::Transport<D>::Setup s;
        s.diffusivity = 0.2;
        s.schemes = schemes;
        s.hoop = hoop;
        for (int d = 0; d < D; ++d) {
            s.sides[d][0].kind = d % 2 == 0 ? Side::Kind::value : Side::Kind::flux;
            s.sides[d][1] = d % 2 == 0 ? Side{Side::Kind::flux, 0} : Side{Side::Kind::exchange, 0.7};
        }
        if (shift >= 0) {
            s.sides[shift] = {Side{Side::Kind::on_node, 0}, Side{Side::Kind::open, 0}};
        }
        return s;
    }

    RandomFlow<D> flow;
    balance::Transport<D> transport;
    balance::Balance<D> balance;
    field::Values value, source;
};

/// Pushes every residual by a known amount.
template <int D>
struct Push : balance::RowTerm<D> {
    void add(const std::array<int, D>& row, int begin, int end, double* r) const override
    {
        for (int j = begin; j < end; ++j) {
            r[j] += 100 * row[0] + j;
        }
    }
};

template <int D, class Visit>
void for_each_solved_row(const Sample<D>& sample, Visit visit)
{
    field::for_each_row<D>(sample.transport.solved(), [&](std::array<int, D> row) {
        std::array<int, D> first = row;
        first[D - 1] = 0;
        visit(row, sample.flow.layout.index(first));
    });
}

template <int D>
void check_rows(int shift, Scheme scheme)
{
    std::array<Scheme, D> schemes;
    schemes.fill(scheme);
    Sample<D> s(shift, schemes, false, shift == 1);
    const Push<D> push;
    field::Values whole = field::zeros(s.flow.layout);
    s.balance.residual(s.flow.pointers(), s.value, s.source.data(), &push, whole);
    field::Values plain = whole;
    s.balance.residual(s.flow.pointers(), s.value, nullptr, nullptr, plain);
    std::vector<double> row_of(std::size_t(s.flow.layout.cells[D - 1]) + 3);
    const int begin = s.transport.solved().begin[D - 1];
    const int end = s.transport.solved().end[D - 1];
    INFO(name(scheme) << ", shift " << shift);
    for_each_solved_row<D>(s, [&](const std::array<int, D>& row, std::ptrdiff_t at) {
        s.balance.residual_row(s.flow.pointers(), s.value.data(), s.source.data(), &push, row, row_of.data());
        for (int j = begin; j < end; ++j) {
            REQUIRE(whole[at + j] == Approx(row_of[j]).margin(1e-12));
            REQUIRE(whole[at + j] - plain[at + j] == Approx(100 * row[0] + j - s.source[at + j]).margin(1e-10));
        }
    });
}

/// Coefficients along a line against the change of the line's residual; exact, since the residual is linear.
template <int D>
void check_line(int shift, const std::array<Scheme, D>& schemes, bool hoop)
{
    Sample<D> s(shift, schemes, false, hoop);
    const std::size_t room = std::size_t(s.flow.layout.cells[D - 1]) + 3;
    std::vector<double> before(room), after(room), centre(room), lower(room), upper(room);
    const int begin = s.transport.solved().begin[D - 1];
    const int end = s.transport.solved().end[D - 1];
    INFO(name(schemes[0]) << " along, " << name(schemes[D - 1]) << " across, shift " << shift);
    for_each_solved_row<D>(s, [&](const std::array<int, D>& row, std::ptrdiff_t at) {
        for (int j = begin; j < end; ++j) {
            s.value[at + j] += 1;
            s.balance.residual_row(s.flow.pointers(), s.value.data(), nullptr, nullptr, row, after.data());
            s.value[at + j] -= 1;
            s.balance.residual_row(s.flow.pointers(), s.value.data(), nullptr, nullptr, row, before.data());
            s.balance.line_coefficients(row, centre.data(), lower.data(), upper.data());
            REQUIRE(centre[j] == Approx(after[j] - before[j]).margin(1e-12));
            if (j > begin) {
                REQUIRE(upper[j - 1] == Approx(after[j - 1] - before[j - 1]).margin(1e-12));
            }
            if (j + 1 < end) {
                REQUIRE(lower[j + 1] == Approx(after[j + 1] - before[j + 1]).margin(1e-12));
            }
        }
    });
}

/// The assembled matrix against changes of the residual; for a flow that passes no side and leaves no mass behind.
template <int D>
void check_matrix(int shift, Scheme scheme, bool hoop)
{
    std::array<Scheme, D> schemes;
    schemes.fill(scheme);
    Sample<D> s(shift, schemes, true, hoop);
    linear::StencilSystem<D> system(s.flow.layout, s.transport.solved());
    s.balance.assemble(s.flow.pointers(), system);
    field::Values before = field::zeros(s.flow.layout);
    field::Values after = before;
    field::Values image = before;
    s.balance.residual(s.flow.pointers(), s.value, nullptr, nullptr, before);
    const field::Values nothing = before;
    INFO(name(scheme) << ", shift " << shift);
    for_each_solved_row<D>(s, [&](const std::array<int, D>&, std::ptrdiff_t at) {
        for (int j = s.transport.solved().begin[D - 1]; j < s.transport.solved().end[D - 1]; ++j) {
            s.value[at + j] += 1;
            s.balance.residual(s.flow.pointers(), s.value, nullptr, nullptr, after);
            s.value[at + j] -= 1;
            field::Values unit = field::zeros(s.flow.layout);
            unit[at + j] = 1;
            std::fill(image.begin(), image.end(), 0.0);
            linear::residual(system, unit, field::zeros(s.flow.layout), image);
            double worst = 0;
            for (std::size_t k = 0; k < image.size(); ++k) {
                worst = std::max(worst, std::abs(after[k] - before[k] + image[k]));
            }
            REQUIRE(worst < 1e-12);
            REQUIRE(std::abs(image[at + j]) > 1e-3);
        }
    });
}

} // namespace

TEST_CASE("The residual of a row is that of the whole, with source and further term", "[balance]")
{
    for (const Scheme scheme : all_schemes()) {
        for (int shift = -1; shift < 2; ++shift) {
            check_rows<2>(shift, scheme);
            check_rows<3>(shift == 1 ? 2 : shift, scheme);
        }
    }
}

TEST_CASE("Line coefficients are the derivatives of the row's residual", "[balance]")
{
    for (const bool hoop : {false, true}) {
        for (int shift = -1; shift < 2; ++shift) {
            check_line<2>(shift, {Scheme::linear_upwind, Scheme::central}, hoop);
            check_line<2>(shift, {Scheme::upwind, Scheme::upwind}, hoop);
        }
        check_line<3>(-1, {Scheme::linear_upwind, Scheme::linear_upwind, Scheme::central}, hoop);
        check_line<3>(2, {Scheme::upwind, Scheme::linear_upwind, Scheme::central}, hoop);
    }
}

TEST_CASE("The assembled matrix is the derivative of the upwind and power-law residuals", "[balance]")
{
    for (const Scheme scheme : {Scheme::upwind, Scheme::power_law}) {
        for (int shift = -1; shift < 2; ++shift) {
            check_matrix<2>(shift, scheme, false);
            check_matrix<2>(shift, scheme, true);
        }
        check_matrix<3>(-1, scheme, false);
        check_matrix<3>(0, scheme, false);
        check_matrix<3>(2, scheme, true);
    }
}
