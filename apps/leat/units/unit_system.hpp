#pragma once

#include "units/dimension.hpp"

#include <memory>
#include <optional>
#include <stdexcept>
#include <string>
#include <string_view>

namespace leat::driver {

/// The data base of units could not be loaded.
class UnitSystemError : public std::runtime_error {
public:
    using std::runtime_error::runtime_error;
};

/// A value in SI, or what is wrong with its unit.
struct Conversion {
    std::optional<double> value; ///< SI
    std::string fault;           ///< empty when there is a value
};

/// The units of the UDUNITS-2 data base, with the trade's P, cP and gpm (US gallons per minute) added.
class UnitSystem {
public:
    /// Throws UnitSystemError.
    UnitSystem();
    ~UnitSystem();
    UnitSystem(const UnitSystem&) = delete;
    UnitSystem& operator=(const UnitSystem&) = delete;

    /// `value` `unit` in the SI unit of `dimension`. Only units that are proportional to it are taken.
    Conversion to_si(double value, std::string_view unit, Dimension dimension) const;

private:
    struct Data;
    std::unique_ptr<Data> data_;
};

} // namespace leat::driver
