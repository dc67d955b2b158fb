#include "report/json_values.hpp"

#include <cmath>

namespace leat::driver {

Json finite_or_null(std::optional<double> value)
{
    return value && std::isfinite(*value) ? Json(*value) : Json(nullptr);
}

Json json_of(const HandbookEstimate& handbook)
{
    return {{"pressure_drop", finite_or_null(handbook.pressure_drop)},
            {"unit", "Pa"},
            {"source", handbook.source},
            {"remark", handbook.remark}};
}

std::string document_text(const Json& document)
{
    return document.dump(1, ' ', false, Json::error_handler_t::replace) + '\n';
}

} // namespace leat::driver
