#include "report/solve_report.hpp"

#include "report/number_text.hpp"
#include "report/table_text.hpp"

#include <algorithm>

namespace leat::driver {

namespace {

std::string spaced(std::string_view name)
{
    std::string text(name);
    std::ranges::replace(text, '_', ' ');
    return text;
}

std::string emphasised(const std::string& text, bool decorated)
{
    return decorated ? "\x1b[1;33m" + text + "\x1b[0m" : text;
}

std::string heading(const SolveReport& report, bool decorated)
{
    const Answer& answer = report.answer;
    std::string text = report.name + ": " + std::string(name(answer.outcome)) + " in " + duration_text(report.seconds);
    if (!answer.grids.empty()) {
        const auto& cells = answer.grids.back().cells;
        text += ", " + std::to_string(cells[0]) + " x " + std::to_string(cells[1]) + " cells";
    }
    text += '\n';
    if (!answer.usable) {
        text += emphasised("THESE NUMBERS ARE NOT USABLE", decorated) + "; each is marked '!'\n";
    }
    if (!answer.message.empty()) {
        text += wrapped("", answer.message);
    }
    return text;
}

std::string cautions(const Answer& answer, bool decorated)
{
    std::string text;
    for (const std::string& caution : answer.cautions) {
        text += wrapped(emphasised("Caution:", decorated) + " ", caution);
    }
    return text.empty() ? text : text + '\n';
}

// A wall that the shape does not have needs no row; its perimeter mean tells why there is none at a cut end.
bool of_one_wall(std::string_view name)
{
    return name.ends_with("_inner") || name.ends_with("_outer");
}

// What is too long for a row of the table: names that share a remark, and the remark, below it.
class Notes {
public:
    void add(const std::string& name, const std::string& remark)
    {
        const auto same = std::ranges::find(rows_, remark, &Row::remark);
        if (same != rows_.end()) {
            same->names += ", " + name;
        } else {
            rows_.push_back({name, remark});
        }
    }
    std::string text() const
    {
        std::string text;
        for (const Row& row : rows_) {
            text += wrapped("Note: ", row.names + ": " + row.remark);
        }
        return text.empty() ? text : text + '\n';
    }

private:
    struct Row {
        std::string names;
        std::string remark;
    };
    std::vector<Row> rows_;
};

std::vector<std::string> row_of(const NamedNumber& row, const Answer& answer, Notes& notes)
{
    const std::string label = spaced(row.name);
    if (!row.number) {
        notes.add(label, row.reason);
        return {label, "-", "", "none, see note"};
    }
    const Number& number = *row.number;
    if (answer.usable && !number.reason.empty()) {
        notes.add(label, (number.usable ? "" : "not usable: ") + number.reason);
    }
    const bool too_wide = answer.outcome == Outcome::out_of_budget && !number.reason.empty();
    const bool clean = answer.usable && number.usable && !too_wide;
    return {label, (clean ? "" : "! ") + with_band(number), row.unit == "1" ? "" : std::string(row.unit),
            std::string(row.meaning)};
}

std::vector<std::string> handbook_row(const HandbookEstimate& handbook, Notes& notes)
{
    if (!handbook.remark.empty()) {
        notes.add("handbook", handbook.remark);
    }
    if (!handbook.pressure_drop) {
        return {"", "-", "", "no handbook estimate"};
    }
    return {"", significant(*handbook.pressure_drop, 4), "Pa", "handbook: " + handbook.source};
}

std::string numbers(const Answer& answer)
{
    std::vector<std::vector<std::string>> rows;
    Notes notes;
    for (const NamedNumber& row : answer.named_numbers()) {
        if (row.number || !of_one_wall(row.name)) {
            rows.push_back(row_of(row, answer, notes));
        }
        if (row.name == "pressure_drop") {
            rows.push_back(handbook_row(answer.handbook, notes));
        }
    }
    return aligned(rows, 2, true) + '\n' + notes.text();
}

} // namespace

std::string solve_text(const SolveReport& report, bool decorated)
{
    const Answer& answer = report.answer;
    std::string text = heading(report, decorated) + '\n' + cautions(answer, decorated) + numbers(answer);
    text += "Imbalances: mass " + magnitude(answer.imbalances.mass) + ", momentum " +
            magnitude(answer.imbalances.momentum) + "\n";
    for (const std::string& file : report.files) {
        text += "Written: " + file + '\n';
    }
    return text;
}

} // namespace leat::driver
