#include "catch.hpp"
#include "record/contains.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/base/version.hpp>
#include <leat/record/result.hpp>

#include <cstdio>

#include <sys/wait.h>

using namespace leat;
using test::sample_answer;
using test::ScratchFolder;

namespace {

struct Finished {
    int status = -1;
    std::string output;
};

Finished run(const std::string& command)
{
    Finished finished;
    std::FILE* pipe = ::popen((command + " 2>&1").c_str(), "r");
    if (pipe == nullptr) {
        return finished;
    }
    for (int letter = std::fgetc(pipe); letter != EOF; letter = std::fgetc(pipe)) {
        finished.output += static_cast<char>(letter);
    }
    const int status = ::pclose(pipe);
    finished.status = WIFEXITED(status) ? WEXITSTATUS(status) : -1;
    return finished;
}

const std::string python = LEAT_TEST_PYTHON;

bool has_h5py()
{
    return run(python + " -c 'import h5py'").status == 0;
}

} // namespace

TEST_CASE("h5py and an XML parser find what was written")
{
    if (!has_h5py()) {
        WARN("skipped: " << python << " has no h5py");
        return;
    }
    const ScratchFolder scratch;
    const record::ResultFiles files =
        record::write_result(scratch.path(), "line", "[passage] # ä", sample_answer(), false);
    const std::string command =
        python + " " + LEAT_TEST_RESULT_READER + " " + files.hdf5 + " " + files.xdmf + " " + std::string(version());
    const Finished good = run(command);
    INFO(good.output);
    CHECK(good.status == 0);
    CHECK(test::contains(good.output, "all as expected"));

    // The same script refuses a description whose dimensions are in the wrong order, and one that leads nowhere.
    const std::string description = test::content(files.xdmf);
    const auto changed = [&](const std::string& from, const std::string& to) {
        std::string text = description;
        REQUIRE(text.find(from) != std::string::npos);
        text.replace(text.find(from), from.size(), to);
        test::put(files.xdmf, text);
        return run(command).status;
    };
    CHECK(changed("Dimensions=\"5 7\"", "Dimensions=\"7 5\"") == 1);
    CHECK(changed("Dimensions=\"4 6\"", "Dimensions=\"6 4\"") == 1);
    CHECK(changed("/cells/pressure", "/cells/presure") == 1);
    CHECK(changed("line.h5", scratch / "line.h5") == 1);
    CHECK(changed("Center=\"Cell\"", "Center=\"Node\"") == 1);
}

TEST_CASE("h5dump reads the whole file and knows its shapes")
{
    const std::string h5dump = LEAT_TEST_H5DUMP;
    if (h5dump.empty()) {
        WARN("skipped: h5dump was not found when this was built");
        return;
    }
    const ScratchFolder scratch;
    const record::ResultFiles files = record::write_result(scratch.path(), "line", "text", sample_answer(), false);
    const Finished header = run(h5dump + " -H " + files.hdf5);
    CHECK(header.status == 0);
    for (const char* part : {"DATASET \"points\"", "( 5, 7, 3 )", "( 4, 6, 3 )", "( 4, 7 )", "( 5, 6 )",
                             "H5T_IEEE_F64LE", "GROUP \"history\"", "ATTRIBUTE \"format_version\""}) {
        CAPTURE(part);
        CHECK(test::contains(header.output, part));
    }
    CHECK(run(h5dump + " " + files.hdf5).status == 0);
    CHECK(run(h5dump + " -H " + files.xdmf).status != 0);
}
