#pragma once

#include <leat/passage/solve.hpp>
#include <leat/record/result.hpp>

#include <functional>

namespace leat::driver {

/// The calls into the library, so that a test can let each of them fail.
struct Engine {
    std::function<Answer(const Passage&, const Accuracy&, const Options&, const Observer&, std::stop_token)> solve =
        leat::solve;
    std::function<Plan(const Passage&, const Accuracy&, const Options&)> plan = leat::plan;
    std::function<void(const std::string&, const std::string&, bool)> check_writable =
        [](const std::string& directory, const std::string& name, bool overwrite) {
            record::check_writable(directory, name, overwrite);
        };
    std::function<record::ResultFiles(const std::string&, const std::string&, const std::string&, const Answer&, bool)>
        write_result = [](const std::string& directory, const std::string& name, const std::string& case_text,
                          const Answer& answer, bool overwrite) {
            return record::write_result(directory, name, case_text, answer, overwrite);
        };
};

} // namespace leat::driver
