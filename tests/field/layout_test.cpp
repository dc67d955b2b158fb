#include "catch.hpp"

#include <leat/field/layout.hpp>

#include <algorithm>
#include <set>
#include <vector>

using namespace leat::field;

TEST_CASE("Every place of a layout has its own index, ghosts included", "[field]")
{
    const Layout<3> layout({3, 2, 4});
    std::set<std::ptrdiff_t> seen;
    for (int i = -1; i <= 4; ++i) {
        for (int j = -1; j <= 3; ++j) {
            for (int k = -1; k <= 5; ++k) {
                seen.insert(layout.index({i, j, k}));
            }
        }
    }
    CHECK(seen.size() == 6u * 5u * 7u);
    CHECK(static_cast<std::ptrdiff_t>(seen.size()) == layout.size);
    CHECK(*seen.begin() == 0);
    CHECK(*seen.rbegin() == layout.size - 1);
    CHECK(zeros(layout).size() == seen.size());
}

TEST_CASE("Strides step to the neighbours and the last direction is contiguous", "[field]")
{
    const Layout<3> layout({3, 2, 4});
    const std::ptrdiff_t at = layout.index({1, 1, 2});
    CHECK(layout.index({2, 1, 2}) - at == layout.stride[0]);
    CHECK(layout.index({1, 2, 2}) - at == layout.stride[1]);
    CHECK(layout.index({1, 1, 3}) - at == layout.stride[2]);
    CHECK(layout.stride[2] == 1);
}

TEST_CASE("Rows of a box are visited once each, in the order of memory", "[field]")
{
    const Layout<3> layout({4, 5, 3});
    const Box<3> box{{1, -1, 2}, {4, 3, 4}};
    std::vector<std::ptrdiff_t> visited;
    for_each_row<3>(box, [&](const std::array<int, 3>& k) {
        CHECK(k[2] == 2);
        visited.push_back(layout.index(k));
    });
    CHECK(visited.size() == 3u * 4u);
    CHECK(std::is_sorted(visited.begin(), visited.end()));
    CHECK(std::set<std::ptrdiff_t>(visited.begin(), visited.end()).size() == visited.size());
    CHECK(visited.front() == layout.index({1, -1, 2}));
    CHECK(visited.back() == layout.index({3, 2, 2}));
}

TEST_CASE("An empty box has no rows", "[field]")
{
    std::vector<int> rows;
    for (const Box<2>& box :
         std::vector<Box<2>>{{{0, 2}, {3, 2}}, {{3, 0}, {3, 2}}, {{0, 3}, {3, 2}}, {{0, 0}, {3, 2}}}) {
        rows.push_back(0);
        for_each_row<2>(box, [&](const auto&) { ++rows.back(); });
    }
    CHECK(rows == std::vector<int>{0, 0, 0, 3});
}
