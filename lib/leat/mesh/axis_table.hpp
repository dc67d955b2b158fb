#pragma once

#include <cstddef>
#include <vector>

namespace leat::mesh {

/// A one-dimensional table over the nodes or faces of one direction, with room for the ghost places -1 and n + 1.
class AxisTable {
public:
    AxisTable() = default;
    /// Places -1 .. n + 1, all `value`.
    explicit AxisTable(int n, double value = 0) : values_(static_cast<std::size_t>(n) + 3, value) {}

    double& operator[](std::ptrdiff_t k) noexcept { return values_[static_cast<std::size_t>(k + 1)]; }
    double operator[](std::ptrdiff_t k) const noexcept { return values_[static_cast<std::size_t>(k + 1)]; }
    /// Pointer to place 0, for kernels.
    const double* data() const noexcept { return values_.data() + 1; }

private:
    std::vector<double> values_;
};

} // namespace leat::mesh
