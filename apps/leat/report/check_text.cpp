#include "report/check_report.hpp"

#include "report/number_text.hpp"
#include "report/stated_passage.hpp"
#include "report/table_text.hpp"

#include <algorithm>

namespace leat::driver {

namespace {

std::string cells_text(const std::array<int, 2>& cells)
{
    return std::to_string(cells[0]) + " x " + std::to_string(cells[1]);
}

std::vector<std::string> row_of(const StatedValue& value)
{
    std::string name = value.name;
    std::ranges::replace(name, '_', ' ');
    return {name, shortest(value.value, 5), value.unit == "1" ? "" : value.unit};
}

std::string grids_text(const Plan& plan)
{
    std::string text = "Grids, cells along x across";
    for (const auto& cells : plan.grids) {
        text += (&cells == &plan.grids.front() ? ": " : ", ") + cells_text(cells);
    }
    text += "\n  finest cells: " + shortest(plan.first_cell_along, 3) + " m along at the inlet, " +
            shortest(plan.first_cell_across, 3) + " m across at the wall\n";
    if (plan.tail_length > 0) {
        text += "  the grid runs on for " + shortest(plan.tail_length, 3) + " m beyond the end\n";
    }
    return text + "Memory: about " + significant(plan.memory_bytes / 1048576, 2) + " MiB\n";
}

std::string handbook_text(const HandbookEstimate& handbook)
{
    const std::string text =
        handbook.pressure_drop ? "Handbook estimate of the pressure drop: " + significant(*handbook.pressure_drop, 4) +
                                     " Pa (" + handbook.source + ")"
                               : "No handbook estimate of the pressure drop";
    return text + (handbook.remark.empty() ? "" : ": " + handbook.remark);
}

} // namespace

std::string check_text(const CaseFile& of, const Plan& plan, bool decorated)
{
    const Passage& passage = of.passage;
    std::string text = of.name + ": valid; " + shape_name(passage.shape) + ", inlet " +
                       profile_name(passage.inlet.profile) + ", outlet " + outlet_name(passage.outlet) + "\n\n";
    for (const std::string& caution : plan.cautions) {
        text += wrapped(decorated ? "\x1b[1;33mCaution:\x1b[0m " : "Caution: ", caution);
    }
    text += plan.cautions.empty() ? "" : "\n";
    std::vector<std::vector<std::string>> rows;
    for (const StatedValue& value : sizes_of(passage.shape)) {
        rows.push_back(row_of(value));
    }
    for (const StatedValue& value : derived_values(plan.derived, passage.shape)) {
        rows.push_back(row_of(value));
    }
    text += aligned(rows, 2, true);
    text += '\n' + wrapped("Regime: ", plan.regime) + wrapped("", handbook_text(plan.handbook));
    return text + grids_text(plan);
}

} // namespace leat::driver
