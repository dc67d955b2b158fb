#include "casefile/velocity_table.hpp"

#include "casefile/quantity.hpp"
#include "casefile/text_file.hpp"
#include "terminal/quoted.hpp"
#include "terminal/suggestion.hpp"

#include <algorithm>
#include <array>

namespace leat::driver {

namespace {

constexpr std::array<std::string_view, 3> position_names{"position", "radius", "distance"};
constexpr std::array<std::string_view, 1> velocity_names{"velocity"};

class TableReader {
public:
    TableReader(const std::string& file, const UnitSystem& units, FileFaults& faults)
        : file_(file), units_(units), faults_(faults)
    {
    }

    void take(std::string_view line)
    {
        ++line_;
        line = trimmed(line.substr(0, line.find('#')));
        if (line.empty()) {
            return;
        }
        const std::size_t comma = line.find(',');
        if (comma == std::string_view::npos || line.find(',', comma + 1) != std::string_view::npos) {
            fault(quoted(line) + " does not have two columns; write position, velocity");
            return;
        }
        const std::string_view first = trimmed(line.substr(0, comma));
        const std::string_view second = trimmed(line.substr(comma + 1));
        if (!header_seen_) {
            header_seen_ = true;
            position_unit_ = column_unit(first, position_names, Dimension::length);
            velocity_unit_ = column_unit(second, velocity_names, Dimension::velocity);
        } else {
            take_row(first, second);
        }
    }

    std::optional<VelocityTable> result()
    {
        if (good_ && table_.position.size() < 2) {
            faults_.add(file_, std::max(line_, 1),
                        "has too few points (" + std::to_string(table_.position.size()) +
                            "); a header such as 'radius [mm], velocity [m/s]' and at least 2 points are needed");
            good_ = false;
        }
        return good_ ? std::optional(table_) : std::nullopt;
    }

private:
    void fault(std::string text)
    {
        faults_.add(file_, line_, std::move(text));
        good_ = false;
    }

    std::optional<std::string> column_unit(std::string_view head, std::span<const std::string_view> names,
                                           Dimension dimension)
    {
        const std::size_t open = head.find('[');
        const std::string_view name = trimmed(head.substr(0, open));
        if (std::ranges::find(names, name) == names.end()) {
            fault("column " + quoted(name) + " is not known; write " + any_of(names));
            return std::nullopt;
        }
        if (open == std::string_view::npos || head.back() != ']') {
            fault("column '" + std::string(name) + "' has no unit; " + std::string(name_of(dimension).name) +
                  " is needed, such as " + std::string(name) + " [" + std::string(name_of(dimension).example) + "]");
            return std::nullopt;
        }
        std::string unit(trimmed(head.substr(open + 1, head.size() - open - 2)));
        if (const Conversion trial = units_.to_si(1.0, unit, dimension); !trial.value) {
            fault("column '" + std::string(name) + "': " + trial.fault);
            return std::nullopt;
        }
        return unit;
    }

    std::optional<double> cell(std::string_view text, const std::optional<std::string>& unit, Dimension dimension)
    {
        const ReadNumber read = read_number(text);
        if (!read.value || !read.rest.empty()) {
            fault(quoted(text) + ": " +
                  (read.value ? "holds more than a number; units stand in the header" : read.fault));
            return std::nullopt;
        }
        return unit ? units_.to_si(*read.value, *unit, dimension).value : std::nullopt;
    }

    void take_row(std::string_view first, std::string_view second)
    {
        const auto position = cell(first, position_unit_, Dimension::length);
        const auto velocity = cell(second, velocity_unit_, Dimension::velocity);
        if (!position || !velocity) {
            return;
        }
        if (!table_.position.empty() && *position <= table_.position.back()) {
            fault("position " + shortened(first) + " is not beyond the one before; positions must increase");
            return;
        }
        table_.position.push_back(*position);
        table_.velocity.push_back(*velocity);
    }

    const std::string& file_;
    const UnitSystem& units_;
    FileFaults& faults_;
    VelocityTable table_;
    std::optional<std::string> position_unit_;
    std::optional<std::string> velocity_unit_;
    int line_ = 0;
    bool header_seen_ = false;
    bool good_ = true;
};

} // namespace

std::optional<VelocityTable> read_velocity_table(std::string_view text, const std::string& file,
                                                 const UnitSystem& units, FileFaults& faults)
{
    if (const auto bad = find_not_text(text)) {
        faults.add(file, bad->line, bad->reason);
        return std::nullopt;
    }
    TableReader reader(file, units, faults);
    while (!text.empty()) {
        const std::size_t end = text.find('\n');
        reader.take(text.substr(0, end));
        text.remove_prefix(end == std::string_view::npos ? text.size() : end + 1);
    }
    return reader.result();
}

} // namespace leat::driver
