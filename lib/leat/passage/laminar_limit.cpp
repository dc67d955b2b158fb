#include <leat/passage/laminar_limit.hpp>

namespace leat::passage {

namespace {

LaminarLimit limit(const Tube&)
{
    return {2300, "tube", "Schlichting 1979"};
}
LaminarLimit limit(const Channel&)
{
    return {2300, "channel", "Patel & Head 1969"};
}
LaminarLimit limit(const Annulus&)
{
    return {2000, "annulus", "Walker, Whan & Rothfus 1957"};
}

} // namespace

LaminarLimit laminar_limit(const Shape& shape)
{
    return std::visit([](const auto& kind) { return limit(kind); }, shape);
}

} // namespace leat::passage
