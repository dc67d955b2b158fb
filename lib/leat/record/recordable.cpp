#include <leat/base/error.hpp>
#include <leat/record/recordable.hpp>

#include <algorithm>
#include <cmath>
#include <span>
#include <string>

namespace leat::record {

namespace {

void check_array(Faults& faults, const std::string& name, std::span<const double> values, std::size_t length)
{
    if (values.size() != length) {
        faults.add("answer.fields." + name, "",
                   "must have " + std::to_string(length) + " values, has " + std::to_string(values.size()));
    }
    const auto odd = std::find_if_not(values.begin(), values.end(), [](double value) { return std::isfinite(value); });
    if (odd != values.end()) {
        faults.add("answer.fields." + name + "[" + std::to_string(odd - values.begin()) + "]", to_text(*odd),
                   "must be finite");
    }
}

void check_fields(Faults& faults, const Fields& fields)
{
    const auto [ni, nj] = fields.cells;
    if (ni < 1 || nj < 1) {
        faults.add("answer.fields.cells", std::to_string(ni) + " x " + std::to_string(nj), "must be >= 1 x 1");
        return;
    }
    const std::size_t along = static_cast<std::size_t>(ni);
    const std::size_t across = static_cast<std::size_t>(nj);
    check_array(faults, "points_x", fields.points_x, along + 1);
    check_array(faults, "points_y", fields.points_y, across + 1);
    check_array(faults, "pressure", fields.pressure, along * across);
    check_array(faults, "velocity_along", fields.velocity_along, along * across);
    check_array(faults, "velocity_across", fields.velocity_across, along * across);
    check_array(faults, "face_velocity_along", fields.face_velocity_along, (along + 1) * across);
    check_array(faults, "face_velocity_across", fields.face_velocity_across, along * (across + 1));
}

void check_column(Faults& faults, const std::string& name, const Stations::Column& values, std::size_t length)
{
    if (values.size() != length) {
        faults.add("answer.stations." + name, "",
                   "must have " + std::to_string(length) + " values as x, has " + std::to_string(values.size()));
    }
    for (const std::optional<double>& value : values) {
        if (value && !std::isfinite(*value)) {
            faults.add("answer.stations." + name, to_text(*value), "must be finite or absent");
            return;
        }
    }
}

} // namespace

void require_recordable(std::string_view case_text, const Answer& answer)
{
    Faults faults;
    if (case_text.find('\0') != std::string_view::npos) {
        faults.add("case_text", "", "must hold no NUL");
    }
    if (answer.fields) {
        check_fields(faults, *answer.fields);
    } else {
        faults.add("answer.fields", "", "must be set (solve with Options::keep_fields)");
    }
    for (const NamedColumn& column : answer.named_columns()) {
        check_column(faults, std::string(column.name), column.values, answer.stations.x.size());
    }
    for (const NamedNumber& row : answer.named_numbers()) {
        if (row.number && !std::isfinite(row.number->value)) {
            faults.add("answer.numbers." + std::string(row.name), to_text(row.number->value),
                       "must be finite or absent");
        }
        if (row.number && row.number->band && !std::isfinite(*row.number->band)) {
            faults.add("answer.numbers." + std::string(row.name) + ".band", to_text(*row.number->band),
                       "must be finite or absent");
        }
    }
    faults.throw_if_any();
}

} // namespace leat::record
