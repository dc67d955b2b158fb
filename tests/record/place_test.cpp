#include "catch.hpp"
#include "record/contains.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/record/place.hpp>
#include <leat/record/result.hpp>

using namespace leat;
using namespace leat::record;
using test::put;
using test::sample_answer;
using test::ScratchFolder;

namespace {

struct Refusal {
    bool happened = false;
    FileError::Action action{};
    std::string text;
};

template <class Call>
Refusal refusal(Call&& call)
{
    try {
        call();
        return {};
    } catch (const FileError& failure) {
        return {true, failure.action(), failure.what()};
    }
}

} // namespace

TEST_CASE("check_writable foretells what write_result meets, and leaves nothing behind")
{
    const ScratchFolder scratch;
    put(scratch / "plain", "a file");
    std::filesystem::create_directory(scratch / "full");
    put(scratch / "full/line.h5", "earlier");
    std::filesystem::create_directory(scratch / "half");
    put(scratch / "half/line.xdmf", "earlier");
    std::filesystem::create_directories(scratch / "odd/line.h5");

    struct Row {
        std::string folder, name;
        bool overwrite, refused;
        FileError::Action action;
        std::string text;
    };
    using enum FileError::Action;
    const std::vector<Row> rows = {
        {scratch / "new/deep/", "line", false, false, create, ""},
        {scratch / "full", "line", true, false, create, ""},
        {scratch / "full", "line", false, true, refuse_overwrite,
         scratch / "full/line.h5: exists and is not overwritten"},
        {scratch / "half", "line", false, true, refuse_overwrite,
         scratch / "half/line.xdmf: exists and is not overwritten"},
        {scratch / "odd", "line", true, true, create,
         scratch / "odd/line.h5: cannot create: a folder of this name exists"},
        {scratch / "plain", "line", true, true, create,
         scratch / "plain: cannot create anything in it: it is not a folder"},
        {scratch / "plain/below", "line", true, true, create, scratch / "plain/below: cannot create: Not a directory"},
        {scratch / "full", std::string(300, 'n'), false, true, create, "File name too long"},
        {scratch / "full", "", false, true, create, "cannot be named ''"},
        {scratch / "full", "a/b", false, true, create, "cannot be named 'a/b'"},
        {scratch / "full", "a:b", false, true, create, "cannot be named 'a:b'"},
        {scratch / "full", "a\nb", false, true, create, "cannot be named"},
        {scratch / "full", " a", false, true, create, "cannot be named ' a'"},
        {"/proc/leat-nowhere", "line", false, true, create, "/proc"},
    };
    const auto before = test::tree(scratch.path());
    for (const Row& row : rows) {
        CAPTURE(row.folder, row.name, row.overwrite);
        const Refusal foretold = refusal([&] { check_writable(row.folder, row.name, row.overwrite); });
        CHECK(foretold.happened == row.refused);
        CHECK(test::tree(scratch.path()) == before);
        if (row.refused) {
            CHECK(foretold.action == row.action);
            CHECK(test::contains(foretold.text, row.text));
            const Refusal met =
                refusal([&] { write_result(row.folder, row.name, "", sample_answer(), row.overwrite); });
            CHECK(met.happened);
            CHECK(met.action == row.action);
            CHECK(test::tree(scratch.path()) == before);
        }
    }
}

TEST_CASE("the current folder, blanks and letters of any script in names")
{
    const ScratchFolder scratch;
    const std::filesystem::path home = std::filesystem::current_path();
    std::filesystem::current_path(scratch.path());
    CHECK_NOTHROW(check_writable("", "Ölkühler 3 & <4>", false));
    const ResultFiles files = write_result("", "Ölkühler 3 & <4>", "", sample_answer(), false);
    std::filesystem::current_path(home);
    CHECK(files.hdf5 == "./Ölkühler 3 & <4>.h5");
    CHECK(test::tree(scratch.path()).size() == 2);
    CHECK(test::contains(test::content(scratch / "Ölkühler 3 & <4>.xdmf"),
                         ">Ölkühler 3 &amp; &lt;4&gt;.h5:/mesh/points<"));
}

TEST_CASE("a link in the place of a result is replaced, what it leads to stays")
{
    const ScratchFolder scratch;
    put(scratch / "precious", "text");
    std::filesystem::create_symlink("precious", scratch / "line.h5");
    std::filesystem::create_symlink("nowhere", scratch / "line.xdmf");
    const Refusal refused = refusal([&] { write_result(scratch.path(), "line", "", sample_answer(), false); });
    CHECK(refused.action == FileError::Action::refuse_overwrite);
    write_result(scratch.path(), "line", "", sample_answer(), true);
    CHECK(test::content(scratch / "precious") == "text");
    CHECK_FALSE(std::filesystem::is_symlink(scratch / "line.h5"));
    CHECK_FALSE(std::filesystem::is_symlink(scratch / "line.xdmf"));
}

TEST_CASE("the parent of a path")
{
    CHECK(parent_of("a") == ".");
    CHECK(parent_of("a/") == ".");
    CHECK(parent_of("a/b") == "a");
    CHECK(parent_of("a//b//") == "a");
    CHECK(parent_of("/a") == "/");
    CHECK(parent_of("/") == "/");
    CHECK(parent_of(".") == ".");
}
