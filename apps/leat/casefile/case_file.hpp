#pragma once

#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>

#include <stdexcept>
#include <string>
#include <utility>
#include <vector>

namespace leat::driver {

/// A case, understood and without fault.
struct CaseFile {
    std::string name; ///< the stem of the file: "gearbox-return"
    std::string text; ///< as it stands in the file
    Passage passage;
    Accuracy accuracy;
    Options options;
};

/// A case cannot be worked on.
class CaseError : public std::runtime_error {
public:
    CaseError(std::vector<std::string> messages, bool unreadable)
        : std::runtime_error("case"), messages_(std::move(messages)), unreadable_(unreadable)
    {
    }
    /// One per fault: "FILE:LINE: what is wrong; what would be right".
    const std::vector<std::string>& messages() const { return messages_; }
    /// The case, or a file that it names, cannot be read; nothing else is wrong.
    bool unreadable() const { return unreadable_; }

private:
    std::vector<std::string> messages_;
    bool unreadable_;
};

/// Calls the library with a case of that file; what it throws as InvalidInput becomes a CaseError.
template <typename Call>
auto with_case_faults(const std::string& path, const Call& call)
{
    try {
        return call();
    } catch (const InvalidInput& error) {
        std::vector<std::string> messages;
        for (const Fault& fault : error.faults()) {
            messages.push_back(path + ": " + fault.text());
        }
        throw CaseError(std::move(messages), false);
    }
}

/// Reads and checks a case; messages name the file as given. Throws CaseError with every fault, UnitSystemError.
CaseFile read_case_file(const std::string& path);

} // namespace leat::driver
