#include "casefile/text_file.hpp"

#include <array>
#include <cerrno>
#include <system_error>

#include <fcntl.h>
#include <sys/stat.h>
#include <unistd.h>

namespace leat::driver {

namespace {

[[noreturn]] void fail(int error)
{
    throw Unreadable(std::generic_category().message(error));
}

class OpenFile {
public:
    explicit OpenFile(const std::string& path) : descriptor_(::open(path.c_str(), O_RDONLY | O_CLOEXEC | O_NOCTTY))
    {
        if (descriptor_ < 0) {
            fail(errno);
        }
    }
    ~OpenFile() { ::close(descriptor_); }
    OpenFile(const OpenFile&) = delete;
    OpenFile& operator=(const OpenFile&) = delete;
    int descriptor() const { return descriptor_; }

private:
    int descriptor_;
};

// Length of the UTF-8 sequence that starts at `at`; 0 when it is none (RFC 3629: no overlong forms, no surrogates).
std::size_t sequence_length(std::string_view bytes, std::size_t at)
{
    const auto byte = [&](std::size_t i) {
        return i < bytes.size() ? static_cast<unsigned char>(bytes[i]) : static_cast<unsigned char>(0);
    };
    const unsigned char first = byte(at);
    if (first < 0x80) {
        return 1;
    }
    const std::size_t length = first >= 0xF0 ? 4 : first >= 0xE0 ? 3 : 2;
    if (first < 0xC2 || first > 0xF4) {
        return 0;
    }
    for (std::size_t i = 1; i < length; ++i) {
        if ((byte(at + i) & 0xC0U) != 0x80U) {
            return 0;
        }
    }
    const unsigned char second = byte(at + 1);
    const bool bad = (first == 0xE0 && second < 0xA0) || (first == 0xED && second > 0x9F) ||
                     (first == 0xF0 && second < 0x90) || (first == 0xF4 && second > 0x8F);
    return bad ? 0 : length;
}

} // namespace

std::string read_bytes(const std::string& path)
{
    const OpenFile file(path);
    struct stat status {};
    if (::fstat(file.descriptor(), &status) != 0) {
        fail(errno);
    }
    if (S_ISDIR(status.st_mode)) {
        throw Unreadable("is a folder, not a file");
    }
    std::string bytes;
    std::array<char, 65536> buffer{};
    for (;;) {
        const ssize_t count = ::read(file.descriptor(), buffer.data(), buffer.size());
        if (count < 0) {
            if (errno == EINTR) {
                continue;
            }
            fail(errno);
        }
        if (count == 0) {
            break;
        }
        bytes.append(buffer.data(), static_cast<std::size_t>(count));
        if (bytes.size() > largest_text_file) {
            throw Unreadable("holds more than " + std::to_string(largest_text_file >> 20U) + " MiB");
        }
    }
    if (bytes.starts_with("\xEF\xBB\xBF")) {
        bytes.erase(0, 3);
    }
    return bytes;
}

std::optional<NotText> find_not_text(std::string_view bytes)
{
    int line = 1;
    std::size_t line_start = 0;
    for (std::size_t at = 0; at < bytes.size();) {
        const auto byte = static_cast<unsigned char>(bytes[at]);
        if (byte == '\n') {
            ++line;
            line_start = ++at;
            continue;
        }
        if ((byte < 0x20 && byte != '\t' && byte != '\r') || byte == 0x7F) {
            return NotText{line, "holds a control byte; this is no text file"};
        }
        const std::size_t length = sequence_length(bytes, at);
        if (length == 0) {
            return NotText{line, "holds a byte that is not UTF-8; this is no text file"};
        }
        at += length;
        if (at - line_start > longest_line) {
            return NotText{line, "line is longer than " + std::to_string(longest_line) + " bytes"};
        }
    }
    return std::nullopt;
}

std::string_view trimmed(std::string_view text)
{
    constexpr std::string_view blanks = " \t\r";
    const std::size_t first = text.find_first_not_of(blanks);
    if (first == std::string_view::npos) {
        return {};
    }
    return text.substr(first, text.find_last_not_of(blanks) - first + 1);
}

} // namespace leat::driver
