#include "terminal/suggestion.hpp"

#include <algorithm>
#include <numeric>
#include <vector>

namespace leat::driver {

std::size_t edit_distance(std::string_view from, std::string_view to)
{
    std::vector<std::size_t> before_last(to.size() + 1);
    std::vector<std::size_t> last(to.size() + 1);
    std::vector<std::size_t> row(to.size() + 1);
    std::iota(last.begin(), last.end(), std::size_t{0});
    for (std::size_t i = 1; i <= from.size(); ++i) {
        row[0] = i;
        for (std::size_t j = 1; j <= to.size(); ++j) {
            const std::size_t replace = last[j - 1] + (from[i - 1] == to[j - 1] ? 0 : 1);
            row[j] = std::min({replace, last[j] + 1, row[j - 1] + 1});
            if (i > 1 && j > 1 && from[i - 1] == to[j - 2] && from[i - 2] == to[j - 1]) {
                row[j] = std::min(row[j], before_last[j - 2] + 1);
            }
        }
        before_last.swap(last);
        last.swap(row);
    }
    return last[to.size()];
}

std::string_view nearest(std::string_view word, std::span<const std::string_view> known)
{
    if (word.size() > 64) {
        return {}; // no misspelling of any word of ours; keeps the cost of a hostile word down
    }
    std::string_view best;
    std::size_t least = 4;
    for (const std::string_view candidate : known) {
        const std::size_t limit = std::min<std::size_t>(3, std::max<std::size_t>(1, candidate.size() / 3));
        const std::size_t distance = edit_distance(word, candidate);
        if (distance <= limit && distance < least) {
            best = candidate;
            least = distance;
        }
    }
    return best;
}

std::string any_of(std::span<const std::string_view> words)
{
    std::string text;
    for (std::size_t i = 0; i < words.size(); ++i) {
        if (i > 0) {
            text += i + 1 == words.size() ? " or " : ", ";
        }
        text += words[i];
    }
    return text;
}

} // namespace leat::driver
