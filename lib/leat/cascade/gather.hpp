#pragma once

#include <leat/field/layout.hpp>

#include <array>
#include <vector>

namespace leat::cascade {

/// How the values along one direction of a target grid are put together from up to three neighbouring values of a
/// source grid: target(k) = sum_m weight[k][m] source(first[k] + m), begin <= k < end.
struct AxisGather {
    int begin = 0;
    int end = 0;
    std::vector<int> first; ///< entry k - begin
    std::vector<std::array<double, 3>> weight;
    bool copies = true; ///< target(k) = source(k) throughout

    explicit AxisGather(int first_target = 0) : begin(first_target), end(first_target) {}

    void push(int source, std::array<double, 3> weights)
    {
        copies = copies && source == end && weights[0] == 1 && weights[1] == 0 && weights[2] == 0;
        first.push_back(source);
        weight.push_back(weights);
        end = begin + static_cast<int>(first.size());
    }
};

/// The tensor product of one AxisGather per direction. `line` is scratch of one padded source line.
/// add: adds to the target instead of replacing it.
template <int D>
void gather(const std::array<AxisGather, D>& axes, const field::Layout<D>& from, const field::Values& source,
            const field::Layout<D>& to, field::Values& target, bool add, field::Values& line);

extern template void gather<2>(const std::array<AxisGather, 2>&, const field::Layout<2>&, const field::Values&,
                               const field::Layout<2>&, field::Values&, bool, field::Values&);
extern template void gather<3>(const std::array<AxisGather, 3>&, const field::Layout<3>&, const field::Values&,
                               const field::Layout<3>&, field::Values&, bool, field::Values&);

} // namespace leat::cascade
