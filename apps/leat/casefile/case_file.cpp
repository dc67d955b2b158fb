#include "casefile/case_file.hpp"

#include "casefile/library_faults.hpp"
#include "casefile/numerics_reader.hpp"
#include "casefile/passage_reader.hpp"
#include "casefile/text_file.hpp"

#include <filesystem>

namespace leat::driver {

namespace {

double length_of(const Shape& shape)
{
    return std::visit([](const auto& of) { return of.length; }, shape);
}

std::string read_or_throw(const std::string& path)
{
    try {
        return read_bytes(path);
    } catch (const Unreadable& error) {
        throw CaseError({path + ": " + error.what()}, true);
    }
}

} // namespace

CaseFile read_case_file(const std::string& path)
{
    CaseFile result;
    result.name = std::filesystem::path(path).stem().string();
    result.text = read_or_throw(path);
    FileFaults faults(path);
    if (const auto bad = find_not_text(result.text)) {
        faults.add(bad->line, bad->reason);
        throw CaseError(faults.messages(), false);
    }
    const CaseText split = split_case_text(result.text, faults);
    if (split.sections.empty() && faults.empty()) {
        faults.add(0, "is empty; a case has the sections [passage], [fluid] and [inlet]");
        throw CaseError(faults.messages(), false);
    }
    const UnitSystem units;
    const Entries entries(split, units, faults);
    result.passage = read_passage(entries);
    result.accuracy = read_accuracy(entries);
    result.options = read_options(entries);
    add_library_faults(faults_of(result.passage), entries);
    add_library_faults(faults_of(result.accuracy, result.options, length_of(result.passage.shape)), entries);
    if (!faults.empty()) {
        throw CaseError(faults.messages(), faults.only_unreadable());
    }
    return result;
}

} // namespace leat::driver
