#pragma once

#include <initializer_list>
#include <memory>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

namespace leat::reference {

/// One row of a table. Every fault is a std::runtime_error that begins with "file:line: ".
class Row {
public:
    Row(std::shared_ptr<const std::vector<std::string>> columns, std::vector<std::string> fields, std::string where);

    /// The text under a column; throws when there is no such column.
    const std::string& operator[](std::string_view column) const;
    /// The field as a number; throws unless all of it is one finite number.
    double number(std::string_view column) const;
    /// The number behind "name=" in a field of such statements ("Re=100; y=125/128"): a number or a fraction. Throws
    /// when the name is not there or no number follows it.
    double stated(std::string_view column, std::string_view name) const;
    /// "file:line"
    const std::string& where() const noexcept { return where_; }

private:
    [[noreturn]] void fail(const std::string& message) const;

    std::shared_ptr<const std::vector<std::string>> columns_;
    std::vector<std::string> fields_;
    std::string where_;
};

/// Every row of a table of this folder (a bare name) or of a file with a full path. Strict: comma separated, fields
/// with commas or quotes in double quotes (a quote doubled), as many fields in each row as column names in the first,
/// no field over several lines. Throws std::runtime_error naming file and line.
std::vector<Row> read(const std::string& file);

/// The rows whose fields equal the wanted ones, column by column. Throws when there is none, so that no test passes by
/// comparing with nothing.
std::vector<Row> select(const std::vector<Row>& rows,
                        std::initializer_list<std::pair<std::string_view, std::string_view>> wanted);

} // namespace leat::reference
