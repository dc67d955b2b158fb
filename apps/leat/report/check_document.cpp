#include "report/check_report.hpp"

#include "report/json_values.hpp"
#include "report/stated_passage.hpp"

#include <leat/base/version.hpp>

namespace leat::driver {

namespace {

Json json_of(const std::vector<StatedValue>& values)
{
    Json json = Json::object();
    for (const StatedValue& value : values) {
        json[value.name] = {{"value", finite_or_null(value.value)}, {"unit", value.unit}};
    }
    return json;
}

} // namespace

std::string check_document(const CaseFile& of, const Plan& plan)
{
    const Passage& passage = of.passage;
    const Json document = {
        {"program", "leat"},
        {"version", version()},
        {"case", of.name},
        {"valid", true},
        {"shape", shape_name(passage.shape)},
        {"profile", profile_name(passage.inlet.profile)},
        {"outlet", outlet_name(passage.outlet)},
        {"sizes", json_of(sizes_of(passage.shape))},
        {"derived", json_of(derived_values(plan.derived, passage.shape))},
        {"regime", plan.regime},
        {"handbook", json_of(plan.handbook)},
        {"grids", plan.grids},
        {"first_cell_along", finite_or_null(plan.first_cell_along)},
        {"first_cell_across", finite_or_null(plan.first_cell_across)},
        {"tail_length", finite_or_null(plan.tail_length)},
        {"memory_bytes", finite_or_null(plan.memory_bytes)},
        {"cautions", plan.cautions},
    };
    return document_text(document);
}

} // namespace leat::driver
