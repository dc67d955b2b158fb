#include "casefile/file_faults.hpp"

#include <algorithm>

namespace leat::driver {

void FileFaults::note(Row row)
{
    if (list_.size() < most_listed) {
        list_.push_back(std::move(row));
    } else {
        ++dropped_;
    }
}

void FileFaults::add(int line, std::string text)
{
    note({file_, line, std::move(text), false});
}

void FileFaults::add(const std::string& file, int line, std::string text)
{
    note({file, line, std::move(text), false});
}

void FileFaults::add_unreadable(int line, std::string text)
{
    note({file_, line, std::move(text), true});
}

bool FileFaults::has(int line) const
{
    return std::ranges::find(tainted_, line) != tainted_.end() ||
           std::any_of(list_.begin(), list_.end(),
                       [&](const Row& row) { return row.line == line && row.file == file_; });
}

bool FileFaults::only_unreadable() const
{
    return !list_.empty() && std::all_of(list_.begin(), list_.end(), [](const Row& row) { return row.unreadable; });
}

std::vector<std::string> FileFaults::messages() const
{
    std::vector<Row> rows = list_;
    // Faults without a line (a missing section) come last within their file.
    const auto place = [](const Row& row) { return row.line == 0 ? 1 << 30 : row.line; };
    std::stable_sort(rows.begin(), rows.end(), [&](const Row& a, const Row& b) {
        const bool own_a = a.file == file_;
        const bool own_b = b.file == file_;
        return own_a != own_b ? own_a : place(a) < place(b);
    });
    std::vector<std::string> texts;
    for (const Row& row : rows) {
        std::string text = row.file + (row.line == 0 ? "" : ":" + std::to_string(row.line)) + ": " + row.text;
        if (std::find(texts.begin(), texts.end(), text) == texts.end()) {
            texts.push_back(std::move(text));
        }
    }
    if (dropped_ > 0) {
        texts.push_back(file_ + ": and " + std::to_string(dropped_) + " more faults");
    }
    return texts;
}

} // namespace leat::driver
