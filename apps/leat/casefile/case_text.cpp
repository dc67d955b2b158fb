#include "casefile/case_text.hpp"

#include "casefile/text_file.hpp"
#include "terminal/quoted.hpp"

namespace leat::driver {

namespace {

class Splitter {
public:
    explicit Splitter(FileFaults& faults) : faults_(faults) {}

    void take(std::string_view line)
    {
        ++line_;
        line = trimmed(line.substr(0, line.find('#')));
        if (line.empty()) {
            return;
        }
        if (line.front() == '[') {
            open_section(line);
        } else {
            add_entry(line);
        }
    }
    CaseText result() && { return std::move(text_); }

private:
    void open_section(std::string_view line)
    {
        const std::size_t end = line.find(']');
        if (end == std::string_view::npos || end + 1 != line.size()) {
            faults_.add(line_, quoted(line) + " is no section; write [name] alone on its line");
            section_known_ = false;
            return;
        }
        text_.sections.push_back({std::string(trimmed(line.substr(1, end - 1))), line_});
        section_known_ = true;
    }

    void add_entry(std::string_view line)
    {
        const std::size_t equals = line.find('=');
        if (equals == std::string_view::npos) {
            faults_.add(line_, quoted(line) + " is neither a [section] nor 'key = value'");
            return;
        }
        const std::string key(trimmed(line.substr(0, equals)));
        const std::string_view value = trimmed(line.substr(equals + 1));
        if (key.empty()) {
            faults_.add(line_, quoted(line) + " has no key; write 'key = value'");
        } else if (text_.sections.empty() && section_known_) {
            faults_.add(line_, quoted(key) + " stands before any section; a case begins with [passage]");
        } else if (section_known_) {
            text_.entries.push_back({text_.sections.back().name, key, std::string(value), line_});
            if (value.empty()) {
                faults_.add(line_, "[" + shortened(text_.sections.back().name) + "] " + shortened(key) +
                                       " has no value; write '" + shortened(key) + " = value'");
            }
        }
    }

    FileFaults& faults_;
    CaseText text_;
    int line_ = 0;
    bool section_known_ = true; // false after a broken section line: its entries belong to nothing
};

} // namespace

CaseText split_case_text(std::string_view text, FileFaults& faults)
{
    Splitter splitter(faults);
    while (!text.empty()) {
        const std::size_t end = text.find('\n');
        splitter.take(text.substr(0, end));
        text.remove_prefix(end == std::string_view::npos ? text.size() : end + 1);
    }
    return std::move(splitter).result();
}

} // namespace leat::driver
