#pragma once

#include <string>
#include <vector>

namespace leat::driver {

/// Collects what is wrong with a case and the files that it names.
class FileFaults {
public:
    static constexpr std::size_t most_listed = 200;

    /// `file` as the user gave it; faults are noted on it unless another is named.
    explicit FileFaults(std::string file) : file_(std::move(file)) {}

    /// Notes a fault; line 0 when it has none.
    void add(int line, std::string text);
    void add(const std::string& file, int line, std::string text);
    /// Notes that a file that the case names cannot be read; `line` is where the case names it.
    void add_unreadable(int line, std::string text);

    bool empty() const { return list_.empty(); }
    /// Takes a line of the case as at fault without a message: what is wrong stands in the file that it names.
    void taint(int line) { tainted_.push_back(line); }

    /// A fault of the case itself was noted on this line, or it was tainted.
    bool has(int line) const;
    /// Nothing but unreadable files was noted.
    bool only_unreadable() const;
    /// "FILE:LINE: text", the case before other files, lines in their order; every fault once. Of a file that is no
    /// case at all only the first `most_listed` are kept, and a last message counts the rest.
    std::vector<std::string> messages() const;
    const std::string& file() const { return file_; }

private:
    struct Row {
        std::string file;
        int line = 0;
        std::string text;
        bool unreadable = false;
    };
    void note(Row row);

    std::string file_;
    std::vector<Row> list_;
    std::vector<int> tainted_;
    std::size_t dropped_ = 0;
};

} // namespace leat::driver
