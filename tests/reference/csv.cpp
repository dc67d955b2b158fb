#include "csv.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <filesystem>
#include <fstream>
#include <optional>
#include <stdexcept>

namespace leat::reference {

namespace {

std::filesystem::path folder()
{
#ifdef LEAT_TEST_REFERENCE_DIR
    return LEAT_TEST_REFERENCE_DIR;
#else
    return std::filesystem::path(__FILE__).parent_path();
#endif
}

/// Reads one finite number off the front of the text.
std::optional<double> take_number(std::string_view& text)
{
    double number = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), number);
    if (error != std::errc() || !std::isfinite(number)) {
        return std::nullopt;
    }
    text.remove_prefix(static_cast<std::size_t>(end - text.data()));
    return number;
}

/// Splits a line into its fields; `where` begins the message of a fault.
std::vector<std::string> split(std::string_view line, const std::string& where)
{
    std::vector<std::string> fields(1);
    bool quoted = false;
    for (std::size_t i = 0; i < line.size(); ++i) {
        const char c = line[i];
        if (quoted && c == '"') {
            if (i + 1 < line.size() && line[i + 1] == '"') {
                fields.back() += '"';
                ++i;
                continue;
            }
            quoted = false;
            if (i + 1 < line.size() && line[i + 1] != ',') {
                throw std::runtime_error(where + ": text behind a closing quote");
            }
        } else if (quoted) {
            fields.back() += c;
        } else if (c == ',') {
            fields.emplace_back();
        } else if (c == '"') {
            if (i > 0 && line[i - 1] != ',') {
                throw std::runtime_error(where + ": a quote inside an unquoted field");
            }
            quoted = true;
        } else {
            fields.back() += c;
        }
    }
    if (quoted) {
        throw std::runtime_error(where + ": a quoted field without its closing quote");
    }
    return fields;
}

} // namespace

Row::Row(std::shared_ptr<const std::vector<std::string>> columns, std::vector<std::string> fields, std::string where)
    : columns_(std::move(columns)), fields_(std::move(fields)), where_(std::move(where))
{
}

void Row::fail(const std::string& message) const
{
    throw std::runtime_error(where_ + ": " + message);
}

const std::string& Row::operator[](std::string_view column) const
{
    const auto found = std::find(columns_->begin(), columns_->end(), column);
    if (found == columns_->end()) {
        fail("no column '" + std::string(column) + "'");
    }
    return fields_[static_cast<std::size_t>(found - columns_->begin())];
}

double Row::number(std::string_view column) const
{
    std::string_view text = (*this)[column];
    const std::optional<double> number = take_number(text);
    if (!number || !text.empty()) {
        fail("'" + (*this)[column] + "' under '" + std::string(column) + "' is not a finite number");
    }
    return *number;
}

double Row::stated(std::string_view column, std::string_view name) const
{
    const std::string_view text = (*this)[column];
    const std::string key = std::string(name) + "=";
    for (std::size_t at = text.find(key); at != std::string_view::npos; at = text.find(key, at + 1)) {
        if (at > 0 && text[at - 1] != ' ') {
            continue;
        }
        std::string_view rest = text.substr(at + key.size());
        std::optional<double> number = take_number(rest);
        if (number && rest.starts_with('/')) {
            rest.remove_prefix(1);
            const std::optional<double> divisor = take_number(rest);
            number = divisor && *divisor != 0 ? std::optional(*number / *divisor) : std::nullopt;
        }
        if (number && (rest.empty() || std::string_view(";, ").find(rest.front()) != std::string_view::npos)) {
            return *number;
        }
        fail("no number behind '" + key + "' in '" + std::string(text) + "'");
    }
    fail("no '" + key + "' in '" + std::string(text) + "'");
}

std::vector<Row> read(const std::string& file)
{
    const std::filesystem::path path = folder() / file; // a path with a root replaces the folder
    std::ifstream stream(path, std::ios::binary);
    if (!stream) {
        throw std::runtime_error(path.string() + ":0: cannot be read");
    }
    std::shared_ptr<const std::vector<std::string>> columns;
    std::vector<Row> rows;
    std::string line;
    for (int number = 1; std::getline(stream, line); ++number) {
        const std::string where = path.string() + ":" + std::to_string(number);
        std::vector<std::string> fields = split(line, where);
        if (!columns) {
            for (auto field = fields.begin(); field != fields.end(); ++field) {
                if (field->empty() || std::find(fields.begin(), field, *field) != field) {
                    throw std::runtime_error(where + ": column names must be different and not empty");
                }
            }
            columns = std::make_shared<const std::vector<std::string>>(std::move(fields));
            continue;
        }
        if (fields.size() != columns->size()) {
            throw std::runtime_error(where + ": " + std::to_string(fields.size()) + " fields under " +
                                     std::to_string(columns->size()) + " columns");
        }
        rows.emplace_back(columns, std::move(fields), where);
    }
    if (rows.empty()) {
        throw std::runtime_error(path.string() + ":1: no rows");
    }
    return rows;
}

std::vector<Row> select(const std::vector<Row>& rows,
                        std::initializer_list<std::pair<std::string_view, std::string_view>> wanted)
{
    std::vector<Row> chosen;
    std::copy_if(rows.begin(), rows.end(), std::back_inserter(chosen), [&wanted](const Row& row) {
        return std::all_of(wanted.begin(), wanted.end(),
                           [&row](const auto& pair) { return row[pair.first] == pair.second; });
    });
    if (chosen.empty()) {
        std::string text = rows.empty() ? std::string("no rows") : rows.front().where() + " and below: no row";
        for (const auto& [column, value] : wanted) {
            text += " with " + std::string(column) + " '" + std::string(value) + "'";
        }
        throw std::runtime_error(text);
    }
    return chosen;
}

} // namespace leat::reference
