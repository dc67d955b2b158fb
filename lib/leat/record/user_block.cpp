#include <leat/record/digest.hpp>
#include <leat/record/user_block.hpp>

#include <algorithm>
#include <charconv>
#include <string_view>

namespace leat::record {

namespace {

constexpr std::string_view first_words = "leat-result ";
constexpr std::string_view length_word = "\nlength ";

std::string block_text(std::span<const std::byte> file)
{
    std::string text(first_words);
    text += std::to_string(format_version);
    text += length_word;
    text += std::to_string(file.size());
    text += "\nsha256 " + sha256(file.subspan(user_block_size)) + "\n";
    text.resize(user_block_size, '\0');
    return text;
}

// The number at the start of `text`, which is cut off from it; -1 when there is none.
long long take_number(std::string_view& text)
{
    long long number = -1;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), number);
    if (error != std::errc{} || number < 0) {
        return -1;
    }
    text.remove_prefix(static_cast<std::size_t>(end - text.data()));
    return number;
}

} // namespace

void seal(std::span<std::byte> file)
{
    const std::string text = block_text(file);
    std::transform(text.begin(), text.end(), file.begin(), [](char letter) { return static_cast<std::byte>(letter); });
}

std::string fault_of_block(std::span<const std::byte> block, std::size_t file_size)
{
    std::string_view text(reinterpret_cast<const char*>(block.data()), std::min(block.size(), user_block_size));
    if (!text.starts_with(first_words)) {
        return "is not a result file of leat";
    }
    text.remove_prefix(first_words.size());
    const long long version = take_number(text);
    if (version != format_version) {
        return version < 0 ? "is damaged: its first line is not that of a result file"
                           : "has format version " + std::to_string(version) + ", but only version " +
                                 std::to_string(format_version) + " can be read";
    }
    if (!text.starts_with(length_word)) {
        return "is damaged: its length is not stated";
    }
    text.remove_prefix(length_word.size());
    const long long length = take_number(text);
    if (length < 0 || static_cast<unsigned long long>(length) != file_size) {
        return "is damaged: it has " + std::to_string(file_size) + " bytes, not the " + std::to_string(length) +
               " that were written";
    }
    return {};
}

std::string fault_of_file(std::span<const std::byte> file)
{
    if (std::string fault = fault_of_block(file, file.size()); !fault.empty()) {
        return fault;
    }
    if (file.size() < user_block_size) {
        return "is damaged: it is cut short";
    }
    // Comparing the whole block finds a changed byte in its padding too.
    const std::string expected = block_text(file);
    const bool same = std::equal(expected.begin(), expected.end(), file.begin(),
                                 [](char letter, std::byte byte) { return static_cast<std::byte>(letter) == byte; });
    return same ? std::string{} : "is damaged: its digest does not fit its contents";
}

} // namespace leat::record
