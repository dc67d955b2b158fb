#include "report/solve_report.hpp"

#include "report/json_values.hpp"

#include <leat/base/version.hpp>

#include <cmath>

namespace leat::driver {

namespace {

Json absent(std::string_view unit, const std::string& reason)
{
    return {{"value", nullptr}, {"band", nullptr}, {"unit", unit}, {"usable", false}, {"reason", reason}};
}

Json json_of(const NamedNumber& row, bool answer_usable, const std::string& message)
{
    if (!row.number) {
        return absent(row.unit, row.reason);
    }
    const Number& number = *row.number;
    if (!std::isfinite(number.value)) {
        return absent(row.unit, "not finite");
    }
    Json json = {{"value", number.value},
                 {"band", finite_or_null(number.band)},
                 {"unit", row.unit},
                 {"usable", answer_usable && number.usable}};
    if (!number.reason.empty()) {
        json["reason"] = number.reason;
    } else if (!answer_usable) {
        json["reason"] = message;
    }
    return json;
}

Json json_of(const Stations::Column& column)
{
    Json values = Json::array();
    for (const auto& value : column) {
        values.push_back(finite_or_null(value));
    }
    return values;
}

Json json_of(const std::vector<double>& column)
{
    return json_of(Stations::Column(column.begin(), column.end()));
}

Json json_of_stations(const Answer& answer)
{
    Json stations = {{"x", json_of(answer.stations.x)}, {"x_plus", json_of(answer.stations.x_plus)}};
    for (const NamedColumn& column : answer.named_columns()) {
        if (!stations.contains(column.name)) {
            stations[std::string(column.name)] = json_of(column.values);
        }
    }
    return stations;
}

Json json_of_grids(const Answer& answer)
{
    Json grids = Json::array();
    for (const GridReport& grid : answer.grids) {
        grids.push_back(
            {{"cells", grid.cells}, {"iterations", grid.iterations}, {"seconds", finite_or_null(grid.seconds)}});
    }
    return grids;
}

} // namespace

std::string solve_document(const SolveReport& report)
{
    const Answer& answer = report.answer;
    Json numbers = Json::object();
    for (const NamedNumber& row : answer.named_numbers()) {
        numbers[std::string(row.name)] = json_of(row, answer.usable, answer.message);
    }
    const Json document = {
        {"program", "leat"},
        {"version", version()},
        {"case", report.name},
        {"outcome", name(answer.outcome)},
        {"usable", answer.usable},
        {"message", answer.message},
        {"numbers", numbers},
        {"handbook", json_of(answer.handbook)},
        {"imbalances",
         {{"mass", finite_or_null(answer.imbalances.mass)},
          {"momentum", finite_or_null(answer.imbalances.momentum)},
          {"energy", nullptr}}}, // nothing is heated
        {"grids", json_of_grids(answer)},
        {"cautions", answer.cautions},
        {"stations", json_of_stations(answer)},
        {"seconds", finite_or_null(report.seconds)},
        {"files", report.files},
    };
    return document_text(document);
}

} // namespace leat::driver
