#include <leat/record/file_access.hpp>
#include <leat/record/hdf5_read.hpp>
#include <leat/record/machine_file_system.hpp>
#include <leat/record/read.hpp>
#include <leat/record/user_block.hpp>

#include <array>
#include <cmath>

namespace leat::record {

namespace {

// The bytes of a sealed file, verified. The block is looked at first: a foreign file may be of any size.
std::vector<std::byte> verified_bytes(FileSystem& file_system, const std::string& path)
{
    const auto refuse_if = [&](const std::string& fault) {
        if (!fault.empty()) {
            throw FileError(FileError::Action::read, path, fault);
        }
    };
    const FileSystem::Reply reply = uninterrupted([&] { return file_system.open_to_read(path); });
    OpenFile file(file_system, value_of(reply, FileError::Action::read, path, "read"), path);
    const std::size_t size = file.size();
    std::vector<std::byte> bytes(std::min(size, user_block_size));
    file.read_all(bytes);
    refuse_if(fault_of_block(bytes, size));
    const std::size_t read = bytes.size();
    bytes.resize(size);
    file.read_all(std::span(bytes).subspan(read));
    refuse_if(fault_of_file(bytes));
    return bytes;
}

Hdf5Handle open_memory_file(std::vector<std::byte>& bytes)
{
    const Hdf5Handle access = memory_file_access();
    require_success(H5Pset_file_image(access.id(), bytes.data(), bytes.size()), "take the bytes of a file");
    return {H5Fopen(memory_file_name, H5F_ACC_RDONLY, access.id()), H5Fclose, "interpret it"};
}

Outcome outcome_of(const std::string& text)
{
    for (const Outcome outcome :
         {Outcome::converged, Outcome::stalled, Outcome::diverged, Outcome::out_of_budget, Outcome::cancelled}) {
        if (name(outcome) == text) {
            return outcome;
        }
    }
    throw Hdf5Failure("the outcome '" + text + "' is not known");
}

StoredNumber read_stored_number(const Hdf5Handle& group, const std::string& name)
{
    const Hdf5Handle array = open_array(group, name);
    StoredNumber stored{.name = name,
                        .unit = read_text(array, "units"),
                        .meaning = read_text(array, "meaning"),
                        .number = {},
                        .reason = {}};
    const double value = read_array(array, name, {}).front();
    const double band = read_number(array, "band");
    const std::string reason = read_text(array, "reason");
    if (std::isnan(value)) {
        stored.reason = reason;
        return stored;
    }
    stored.number = Number{.value = value, .band = {}, .usable = read_integer(array, "usable") != 0, .reason = reason};
    if (!std::isnan(band)) {
        stored.number->band = band;
    }
    return stored;
}

Restart read_restart(const Hdf5Handle& file)
{
    const Hdf5Handle mesh = open_group(file, "mesh");
    const Hdf5Handle points = open_array(mesh, "points");
    const Extents extents = extents_of(points, "points");
    if (extents.size() != 3 || extents[0] < 2 || extents[1] < 2 || extents[2] != 3) {
        throw Hdf5Failure("the array points has not the shape of a mesh");
    }
    const hsize_t nj = extents[0] - 1;
    const hsize_t ni = extents[1] - 1;
    const std::vector<double> corners = read_array(points, "points", extents);
    Restart restart;
    restart.cells = {static_cast<int>(ni), static_cast<int>(nj)};
    for (std::size_t i = 0; i <= ni; ++i) {
        restart.points_x.push_back(corners[3 * i]);
    }
    for (std::size_t j = 0; j <= nj; ++j) {
        restart.points_y.push_back(corners[3 * j * (ni + 1) + 1]);
    }
    const Hdf5Handle group = open_group(file, "restart");
    const auto read = [&](const std::string& name, const Extents& shape) {
        return read_array(open_array(group, name), name, shape);
    };
    restart.pressure = read("pressure", {nj, ni});
    restart.face_velocity_along = read("velocity_along", {nj, ni + 1});
    restart.face_velocity_across = read("velocity_across", {nj + 1, ni});
    return restart;
}

StoredResult interpret(std::vector<std::byte>& bytes)
{
    const Hdf5Session session;
    const Hdf5Handle file = open_memory_file(bytes);
    StoredResult result;
    result.writer = read_text(file, "writer");
    result.case_text = read_text(file, "case_text");
    result.outcome = outcome_of(read_text(file, "outcome"));
    const Hdf5Handle numbers = open_group(file, "numbers");
    for (const std::string& name : names_in(numbers)) {
        result.numbers.push_back(read_stored_number(numbers, name));
    }
    result.restart = read_restart(file);
    return result;
}

} // namespace

StoredResult read_result(FileSystem& file_system, const std::string& path)
{
    std::vector<std::byte> bytes = verified_bytes(file_system, path);
    try {
        return interpret(bytes);
    } catch (const Hdf5Failure& failure) {
        throw FileError(FileError::Action::read, path, failure.what());
    }
}

StoredResult read_result(const std::string& path)
{
    MachineFileSystem file_system;
    return read_result(file_system, path);
}

} // namespace leat::record
