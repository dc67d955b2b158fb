#include "answer_bits.hpp"

#include <bit>

namespace leat::published {

std::vector<std::uint64_t> bits_of(const Answer& answer)
{
    std::vector<std::uint64_t> bits;
    const auto add = [&bits](double number) { bits.push_back(std::bit_cast<std::uint64_t>(number)); };
    const auto add_count = [&bits](auto count) { bits.push_back(static_cast<std::uint64_t>(count)); };
    add_count(answer.outcome);
    add(answer.imbalances.mass);
    add(answer.imbalances.momentum);
    for (const NamedNumber& row : answer.named_numbers()) {
        add_count(row.number.has_value());
        if (row.number) {
            add(row.number->value);
        }
    }
    for (const NamedColumn& column : answer.named_columns()) {
        for (const std::optional<double>& value : column.values) {
            add_count(value.has_value());
            add(value.value_or(0));
        }
    }
    for (const GridReport& grid : answer.grids) {
        add_count(grid.cells[0]);
        add_count(grid.cells[1]);
        add_count(grid.iterations);
    }
    for (const HistoryRow& row : answer.history) {
        add_count(row.grid);
        add_count(row.iteration);
        add(row.imbalances.mass);
        add(row.imbalances.momentum);
    }
    if (answer.fields) {
        for (const auto* field : {&answer.fields->points_x, &answer.fields->points_y, &answer.fields->pressure,
                                  &answer.fields->velocity_along, &answer.fields->velocity_across,
                                  &answer.fields->face_velocity_along, &answer.fields->face_velocity_across}) {
            for (const double value : *field) {
                add(value);
            }
        }
    }
    return bits;
}

} // namespace leat::published
