#include "catch.hpp"
#include "reference/csv.hpp"

#include <cstdio>
#include <filesystem>
#include <fstream>
#include <random>

using namespace leat;

namespace {

/// A table that lives as long as this.
class Table {
public:
    explicit Table(const std::string& text)
        : path_(std::filesystem::temp_directory_path() /
                ("leat-table-" + std::to_string(std::random_device()()) + ".csv"))
    {
        std::ofstream(path_, std::ios::binary) << text;
    }
    Table(const Table&) = delete;
    Table& operator=(const Table&) = delete;
    ~Table() { std::filesystem::remove(path_); }
    std::vector<reference::Row> read() const { return reference::read(path_.string()); }

private:
    std::filesystem::path path_;
};

/// Whether the action throws, with this text in the message.
template <class Action>
bool complains(const Action& action, const std::string& text)
{
    try {
        action();
    } catch (const std::runtime_error& error) {
        INFO(error.what());
        CHECK(std::string(error.what()).find(text) != std::string::npos);
        return true;
    }
    return false;
}

} // namespace

TEST_CASE("Every reference table reads, and its value columns hold numbers", "[reference]")
{
    for (const char* file : {"fd_friction.csv", "hydrodynamic_entrance.csv", "benchmarks.csv", "exact_solutions.csv",
                             "practice_and_gci.csv", "finite_re.csv", "finite_re_stations.csv"}) {
        for (const reference::Row& row : reference::read(file)) {
            CHECK_NOTHROW(row.number("value"));
        }
    }
    for (const reference::Row& row : reference::read("approach_to_bl.csv")) {
        CHECK_NOTHROW(row.number("boundary_layer_limit") + row.number("coef_Re_-1/2") + row.number("coef_Re_-1"));
    }
}

TEST_CASE("The table reader keeps quoted commas and quotes, and reads stated numbers", "[reference]")
{
    const Table table("name,condition,value\n\"a, \"\"b\"\"\",Re=100; y=125/128,-1.5e-3\n");
    const auto rows = table.read();
    REQUIRE(rows.size() == 1);
    CHECK(rows[0]["name"] == "a, \"b\"");
    CHECK(rows[0].number("value") == -1.5e-3);
    CHECK(rows[0].stated("condition", "Re") == 100);
    CHECK(rows[0].stated("condition", "y") == 125.0 / 128);
    CHECK(rows[0].where().ends_with(".csv:2"));
}

TEST_CASE("The table reader refuses what is not exactly a table, naming the line", "[reference]")
{
    CHECK(complains([&] { Table("a,b\n1,2\n1\n").read(); }, ".csv:3: 1 fields under 2 columns"));
    CHECK(complains([&] { Table("a,b\n1,\"2\n").read(); }, ".csv:2: a quoted field without"));
    CHECK(complains([&] { Table("a,b\n1,\"2\"x\n").read(); }, ".csv:2: text behind"));
    CHECK(complains([&] { Table("a,b\n1,2\"x\n").read(); }, ".csv:2: a quote inside"));
    CHECK(complains([&] { Table("a,a\n1,2\n").read(); }, ".csv:1: column names"));
    CHECK(complains([&] { Table("a,b\n").read(); }, "no rows"));
    CHECK(complains([&] { reference::read("no-such-table.csv"); }, "cannot be read"));

    const auto rows = Table("a,b\n1x,Re=x\ninf,\n").read();
    CHECK(complains([&] { rows[0].number("a"); }, ".csv:2: '1x'"));
    CHECK(complains([&] { rows[1].number("a"); }, ".csv:3: 'inf'"));
    CHECK(complains([&] { rows[1].number("b"); }, ".csv:3: ''"));
    CHECK(complains([&] { rows[0].number("c"); }, "no column 'c'"));
    CHECK(complains([&] { rows[0].stated("b", "Re"); }, "no number behind"));
    CHECK(complains([&] { rows[0].stated("b", "x"); }, "no 'x='"));
    CHECK(complains([&] { reference::select(rows, {{"a", "2"}}); }, "with a '2'"));
}
