#pragma once

#include <functional>
#include <vector>

namespace leat::mesh {

/// A smooth, strictly increasing map of [0, 1] onto [0, 1] that places the faces of a grid along one direction.
/// Sampling the same map at twice as many points refines every cell into two: coarse cells are exact unions.
using Grading = std::function<double(double)>;

/// Equal cells.
Grading uniform();

/// Small cells at 0, growing towards 1: sinh(a s)/sinh(a); the first cell is a/sinh(a) of the mean. strength a >= 0.
Grading towards_start(double strength);

/// Small cells at 1: the mirror image of towards_start.
Grading towards_end(double strength);

/// Small cells at both ends: (1 + tanh(a (2 s - 1))/tanh(a))/2 (Vinokur 1983, symmetric case). strength a >= 0.
Grading towards_both(double strength);

/// The strength for which the first cell of towards_start is `ratio` (0 < ratio <= 1) of the mean cell, in the limit
/// of many cells. Solved by bisection to round-off.
double strength_for_first_cell(double ratio);

/// Faces start + (end - start) g(k/cells), k = 0 .. cells; the ends are hit exactly. Throws InvalidInput when
/// cells < 1, end <= start, or the map does not increase.
std::vector<double> sample(const Grading& grading, int cells, double start, double end);

} // namespace leat::mesh
