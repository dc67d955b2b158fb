#pragma once

#include <stdexcept>
#include <string>
#include <utility>
#include <vector>

namespace leat {

/// One thing that is wrong with an input.
struct Fault {
    std::string field{}; ///< the member at fault, spelled as in the structs: "inlet.mean_velocity"
    std::string value{}; ///< what it holds, as text
    std::string valid{}; ///< what would be right: "must be > 0 m/s"

    /// "inlet.mean_velocity = -0.45: must be > 0 m/s"
    std::string text() const;
};

/// Base of every failure that leat reports by an exception.
class Error : public std::runtime_error {
public:
    using std::runtime_error::runtime_error;
};

/// The input cannot be worked on. Carries every fault that one pass found; thrown before any work starts.
class InvalidInput : public Error {
public:
    explicit InvalidInput(std::vector<Fault> faults);
    const std::vector<Fault>& faults() const noexcept { return faults_; }

private:
    std::vector<Fault> faults_;
};

/// A file could not be created, written or read.
class FileError : public Error {
public:
    /// What was being done when it failed.
    enum class Action { create, write, read, refuse_overwrite };

    FileError(Action action, std::string path, const std::string& message)
        : Error(path + ": " + message), action_(action), path_(std::move(path))
    {
    }
    Action action() const noexcept { return action_; }
    const std::string& path() const noexcept { return path_; }

private:
    Action action_;
    std::string path_{};
};

/// Collects faults over a whole input, then throws them together.
class Faults {
public:
    /// Notes one fault.
    void add(std::string field, std::string value, std::string valid);
    /// Notes a fault unless `number` is finite and > 0; `unit` is named in the message.
    void require_positive(const std::string& field, double number, const std::string& unit);
    bool empty() const noexcept { return list_.empty(); }
    const std::vector<Fault>& list() const noexcept { return list_; }
    /// Throws InvalidInput when anything was noted.
    void throw_if_any() const;

private:
    std::vector<Fault> list_;
};

/// A number as text, shortest form that reads back to the same value; independent of the locale.
std::string to_text(double number);

/// A number as text with three significant digits, for messages; independent of the locale.
std::string to_short_text(double number);

} // namespace leat
