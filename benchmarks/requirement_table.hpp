#pragma once

#include <cstdio>
#include <string>
#include <vector>

namespace leat::benchmark {

/// What is asked of measured figures, and whether they keep to it.
class RequirementTable {
public:
    enum class Sense { at_most, at_least };

    void add(std::string what, double measured, double must, double stretch, Sense sense = Sense::at_most)
    {
        rows_.push_back({std::move(what), measured, must, stretch, sense});
    }

    /// False when a must is missed. A figure that is not a number misses it.
    bool print() const
    {
        bool met = true;
        std::printf("%-66s %10s    %9s %9s\n", "", "measured", "must", "stretch");
        for (const Row& row : rows_) {
            const char* sign = row.sense == Sense::at_most ? "<=" : ">=";
            const char* verdict = !keeps(row, row.must)     ? "NOT MET"
                                  : keeps(row, row.stretch) ? "met, stretch too"
                                                            : "met";
            std::printf("%-66s %10.4g %s %9g %9g  %s\n", row.what.c_str(), row.measured, sign, row.must, row.stretch,
                        verdict);
            met = met && keeps(row, row.must);
        }
        return met;
    }

private:
    struct Row {
        std::string what;
        double measured, must, stretch;
        Sense sense;
    };
    static bool keeps(const Row& row, double limit)
    {
        return row.sense == Sense::at_most ? row.measured <= limit : row.measured >= limit;
    }
    std::vector<Row> rows_;
};

} // namespace leat::benchmark
