#pragma once

#include "casefile/case_file.hpp"
#include "scratch_folder.hpp"

#include <string>
#include <vector>

/// A valid case; each of its lines is known by its number in the tests.
inline const std::string tube_case = "# oil\n"                       // 1
                                     "[passage]\n"                   // 2
                                     "shape = tube\n"                // 3
                                     "diameter = 8 mm\n"             // 4
                                     "length = 1.5 m   # straight\n" // 5
                                     "[fluid]\n"                     // 6
                                     "density = 865 kg/m^3\n"        // 7
                                     "viscosity = 28 mPa.s\n"        // 8
                                     "[inlet]\n"                     // 9
                                     "profile = flat\n"              // 10
                                     "mean_velocity = 0.45 m/s\n";   // 11

/// The text with its first `old` replaced.
inline std::string with(std::string text, const std::string& old, const std::string& replacement)
{
    const std::size_t at = text.find(old);
    return at == std::string::npos ? "with(): not found" : text.replace(at, old.size(), replacement);
}

/// What is wrong with a case of that text, without the folder of the file: "a.case:4: ..."; empty when nothing is.
inline std::vector<std::string> faults_of_text(const std::string& text)
{
    const ScratchFolder folder;
    const std::string prefix = folder.path("");
    try {
        leat::driver::read_case_file(folder.file("a.case", text));
    } catch (const leat::driver::CaseError& error) {
        std::vector<std::string> messages = error.messages();
        for (std::string& message : messages) {
            for (std::size_t at; (at = message.find(prefix)) != std::string::npos;) {
                message.erase(at, prefix.size());
            }
        }
        return messages;
    }
    return {};
}

using Messages = std::vector<std::string>;
