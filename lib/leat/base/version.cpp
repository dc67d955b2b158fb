#include <leat/base/version.hpp>

namespace leat {

std::string_view version() noexcept
{
    return LEAT_VERSION; // given by CMakeLists.txt from its project() line
}

} // namespace leat
