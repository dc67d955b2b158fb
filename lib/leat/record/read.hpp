#pragma once

#include <leat/base/error.hpp>
#include <leat/passage/answer.hpp>

#include <array>
#include <optional>
#include <string>
#include <vector>

namespace leat::record {

class FileSystem;

/// One number of a result file.
struct StoredNumber {
    std::string name;
    std::string unit;             ///< SI, "1" when dimensionless
    std::string meaning;          ///< a few words
    std::optional<Number> number; ///< empty: absent, `reason` says why
    std::string reason;           ///< as NamedNumber::reason
};

/// What an exact continuation starts from. Layout as in Fields.
struct Restart {
    std::array<int, 2> cells{};               ///< ni along, nj across
    std::vector<double> points_x;             ///< m, ni + 1
    std::vector<double> points_y;             ///< m, nj + 1
    std::vector<double> pressure;             ///< Pa, [j*ni + i]
    std::vector<double> face_velocity_along;  ///< m/s, [j*(ni+1) + i]
    std::vector<double> face_velocity_across; ///< m/s, [j*ni + i]
};

/// What can be read back from a result file.
struct StoredResult {
    std::string writer; ///< "leat X.Y.Z"
    std::string case_text;
    Outcome outcome = Outcome::stalled;
    std::vector<StoredNumber> numbers; ///< in the order of Answer::named_numbers()
    Restart restart;
};

/// Reads NAME.h5 as written by write_result(). Values come back bit for bit.
/// The digest of the whole file is verified before any part is interpreted: a file with a single changed, missing or
/// additional byte is refused. Throws FileError(read), whose message says whether the file cannot be read, is no
/// result file, has another format version, or is damaged.
StoredResult read_result(const std::string& path);

/// The same through other file operations than this machine's.
StoredResult read_result(FileSystem& file_system, const std::string& path);

} // namespace leat::record
