#include <leat/base/error.hpp>
#include <leat/record/file_access.hpp>
#include <leat/record/place.hpp>
#include <leat/record/publish.hpp>

#include <utility>

namespace leat::record {

namespace {

using Action = FileError::Action;

bool not_offered(int error)
{
    return error == ENOSYS || error == EINVAL || error == ENOTSUP || error == EOPNOTSUPP || error == EPERM ||
           error == EMLINK || error == EXDEV;
}

// What has been done, so that it can be undone.
class Publication {
public:
    Publication(FileSystem& file_system, const std::string& directory) : files_(file_system), directory_(directory) {}

    void make_folders()
    {
        for (const std::string& path : missing_folders(files_, directory_)) {
            const FileSystem::Reply reply = uninterrupted([&] { return files_.make_folder(path); });
            if (reply.error == EEXIST) {
                continue; // somebody else made it meanwhile
            }
            value_of(reply, Action::create, path, "create the folder");
            new_folders_.push_back(path);
            sync_folder(files_, parent_of(path));
        }
    }

    // Brings the bytes to the disk under another name.
    void stage(const NewFile& file, bool existed)
    {
        const TemporaryFile temporary = create_temporary(files_, directory_);
        entries_.push_back({.target = directory_ + "/" + file.name, .staged = temporary.path, .existed = existed});
        OpenFile open(files_, temporary.descriptor, entries_.back().target);
        open.write_all(file.bytes);
        open.sync();
        open.close();
    }

    void place_all(bool overwrite)
    {
        for (Entry& entry : entries_) {
            if (overwrite) {
                keep_previous(entry);
                value_of(uninterrupted([&] { return files_.rename(entry.staged, entry.target); }), Action::write,
                         entry.target, "give it its name");
                entry.staged.clear();
                entry.placed = true;
            } else {
                place_new(entry);
            }
            sync_folder(files_, directory_);
        }
    }

    // From here on the new files stand.
    void finish()
    {
        std::string left;
        FileSystem::Reply failure;
        for (const Entry& entry : entries_) {
            for (const std::string& path : {entry.staged, entry.previous}) {
                const FileSystem::Reply reply = remove(path);
                if (reply.error != 0) {
                    left = path;
                    failure = reply;
                }
            }
        }
        value_of(failure, Action::write, left, "remove it (the new files are complete)");
    }

    // Returns what could not be undone, for the message.
    std::string undo()
    {
        std::string left;
        for (auto entry = entries_.rbegin(); entry != entries_.rend(); ++entry) {
            if (entry->placed && !entry->previous.empty()) {
                const FileSystem::Reply reply =
                    uninterrupted([&] { return files_.rename(entry->previous, entry->target); });
                if (reply.error != 0) {
                    left += "; the previous file is now " + entry->previous;
                }
            } else if (entry->placed && !entry->existed) {
                remove(entry->target);
            } else {
                remove(entry->previous);
            }
            remove(entry->staged);
        }
        for (auto folder = new_folders_.rbegin(); folder != new_folders_.rend(); ++folder) {
            uninterrupted([&] { return files_.remove_folder(*folder); });
        }
        return left;
    }

private:
    struct Entry {
        std::string target;
        std::string staged;     ///< the new bytes under another name; empty once they have only the target's
        std::string previous{}; ///< a second name of the file that `target` named before
        bool existed = false;   ///< `target` named a file at the start
        bool placed = false;    ///< `target` names the new bytes
    };

    FileSystem::Reply remove(const std::string& path)
    {
        return path.empty() ? FileSystem::Reply{} : uninterrupted([&] { return files_.remove(path); });
    }

    void keep_previous(Entry& entry)
    {
        if (!entry.existed) {
            return;
        }
        const std::string path = temporary_name(directory_);
        const FileSystem::Reply reply = uninterrupted([&] { return files_.link(entry.target, path); });
        if (reply.error == ENOENT) {
            entry.existed = false; // gone meanwhile
        } else if (!not_offered(reply.error)) {
            value_of(reply, Action::write, entry.target, "keep the previous file");
            entry.previous = path;
        }
    }

    // Gives the new bytes a name that must be free, in one step that fails when it is not.
    void place_new(Entry& entry)
    {
        FileSystem::Reply reply = uninterrupted([&] { return files_.rename_to_new(entry.staged, entry.target); });
        if (reply.error == 0) {
            entry.staged.clear();
            entry.placed = true;
            return;
        }
        if (not_offered(reply.error)) {
            reply = uninterrupted([&] { return files_.link(entry.staged, entry.target); });
            entry.placed = reply.error == 0;
        }
        if (not_offered(reply.error)) {
            // The last resort takes the name with an empty file, which only this call can have made, and replaces it.
            reply = uninterrupted([&] { return files_.create_new(entry.target); });
            if (reply.error == 0) {
                entry.placed = true;
                OpenFile(files_, reply.value, entry.target).close();
                reply = uninterrupted([&] { return files_.rename(entry.staged, entry.target); });
                if (reply.error == 0) {
                    entry.staged.clear();
                }
            }
        }
        if (reply.error == EEXIST) {
            throw FileError(Action::refuse_overwrite, entry.target, "exists and is not overwritten");
        }
        value_of(reply, Action::write, entry.target, "give it its name");
    }

    FileSystem& files_;
    std::string directory_;
    std::vector<std::string> new_folders_;
    std::vector<Entry> entries_;
};

} // namespace

void publish(FileSystem& file_system, const std::string& directory, const std::vector<NewFile>& files, bool overwrite)
{
    Publication publication(file_system, directory);
    try {
        publication.make_folders();
        std::vector<bool> existed;
        for (const NewFile& file : files) {
            existed.push_back(require_free(file_system, directory + "/" + file.name, overwrite));
        }
        for (std::size_t k = 0; k < files.size(); ++k) {
            publication.stage(files[k], existed[k]);
        }
        publication.place_all(overwrite);
    } catch (const FileError& failure) {
        const std::string left = publication.undo();
        if (left.empty()) {
            throw;
        }
        // what() begins with the path, which the constructor puts in front again.
        throw FileError(failure.action(), failure.path(),
                        std::string(failure.what()).substr(failure.path().size() + 2) + left);
    } catch (...) {
        publication.undo();
        throw;
    }
    publication.finish();
}

} // namespace leat::record
