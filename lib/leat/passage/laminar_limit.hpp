#pragma once

#include <leat/passage/passage.hpp>

#include <string_view>

namespace leat::passage {

/// Up to which Reynolds number a flow in practice stays laminar.
struct LaminarLimit {
    double reynolds_number = 0; ///< on the hydraulic diameter
    std::string_view shape;     ///< "tube", "channel", "annulus"
    std::string_view source;    ///< by author and year
};

/// The limit of a shape. Tube: 2300, the critical value of practice (Schlichting 1979). Channel: 2300, with a margin
/// below the 2600 at which Patel & Head 1969 saw channel flow leave the laminar law. Annulus: 2000, the lower end of
/// the practical range 2000 to 2300 (Walker, Whan & Rothfus 1957); a thin core may disturb the flow earlier (the
/// stability number of Hanks 1963). All on the hydraulic diameter, quoted from memory, uncertain by 10 %; quiet inlets
/// keep flows laminar far beyond.
LaminarLimit laminar_limit(const Shape& shape);

} // namespace leat::passage
