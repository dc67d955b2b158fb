#include <leat/record/file_access.hpp>
#include <leat/record/hdf5_session.hpp>
#include <leat/record/image.hpp>
#include <leat/record/machine_file_system.hpp>
#include <leat/record/place.hpp>
#include <leat/record/publish.hpp>
#include <leat/record/result.hpp>
#include <leat/record/xdmf.hpp>

namespace leat::record {

namespace {

std::string folder_of(const std::string& directory)
{
    const std::size_t last = directory.find_last_not_of('/');
    if (last == std::string::npos) {
        return directory.empty() ? "." : "/";
    }
    return directory.substr(0, last + 1);
}

ResultFiles names_of(const std::string& folder, const std::string& name)
{
    require_file_name(folder, name);
    return {.hdf5 = folder + "/" + name + ".h5", .xdmf = folder + "/" + name + ".xdmf"};
}

std::vector<std::byte> image_of(const std::string& path, const std::string& case_text, const Answer& answer)
{
    try {
        return result_image(case_text, answer);
    } catch (const Hdf5Failure& failure) {
        throw FileError(FileError::Action::write, path, failure.what());
    }
}

} // namespace

ResultFiles write_result(FileSystem& file_system, const std::string& directory, const std::string& name,
                         const std::string& case_text, const Answer& answer, bool overwrite)
{
    const std::string folder = folder_of(directory);
    const ResultFiles files = names_of(folder, name);
    const std::vector<std::byte> image = image_of(files.hdf5, case_text, answer);
    const std::string description = xdmf_text(name + ".h5", answer.fields->cells);
    publish(file_system, folder,
            {{name + ".h5", image}, {name + ".xdmf", std::as_bytes(std::span<const char>(description))}}, overwrite);
    return files;
}

ResultFiles write_result(const std::string& directory, const std::string& name, const std::string& case_text,
                         const Answer& answer, bool overwrite)
{
    MachineFileSystem file_system;
    return write_result(file_system, directory, name, case_text, answer, overwrite);
}

void check_writable(FileSystem& file_system, const std::string& directory, const std::string& name, bool overwrite)
{
    const std::string folder = folder_of(directory);
    const ResultFiles files = names_of(folder, name);
    const std::vector<std::string> missing = missing_folders(file_system, folder);
    if (missing.empty()) {
        require_free(file_system, files.hdf5, overwrite);
        require_free(file_system, files.xdmf, overwrite);
    }
    const std::string parent = missing.empty() ? folder : parent_of(missing.front());
    const TemporaryFile probe = create_temporary(file_system, parent);
    {
        const OpenFile close_at_end(file_system, probe.descriptor, probe.path);
    }
    value_of(uninterrupted([&] { return file_system.remove(probe.path); }), FileError::Action::create, probe.path,
             "remove it");
}

void check_writable(const std::string& directory, const std::string& name, bool overwrite)
{
    MachineFileSystem file_system;
    check_writable(file_system, directory, name, overwrite);
}

} // namespace leat::record
