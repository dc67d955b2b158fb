#pragma once

#include <leat/mesh/grading.hpp>

#include <vector>

namespace leat::mesh {

/// How faces are placed along a duct.
struct AlongDuct {
    int cells = 0;          ///< between the inlet and the end; > 0
    double length = 0;      ///< of the duct, > 0
    double first_cell = 0;  ///< about what the cell at the inlet should measure; > 0
    double tail_length = 0; ///< at least this far the grid runs on beyond the end; 0: it ends there
};

/// Faces along a duct, from 0, and where the end stands among them.
struct DuctFaces {
    std::vector<double> faces;
    int end = 0; ///< faces[end] = length, exactly
};

/// Cells grow smoothly from the inlet (towards_start) and on into the tail, where the growth steepens until the tail
/// is as long as it must be. Inlet and end are faces on every grid made by leaving out each second face, as long as
/// `cells` can be halved: the tail has a multiple of the largest power of two that divides `cells` at least five times.
DuctFaces along_duct(const AlongDuct& wish);

/// From an axis or plane of symmetry (0) to a wall (1), or the other way round.
Grading centre_to_wall(double strength);
Grading wall_to_centre(double strength);

/// From wall to wall of an annulus of radius ratio inner/outer: small cells at both walls, and smaller ones at a thin
/// inner wall, where velocity varies like the logarithm of the radius.
Grading wall_to_wall(double strength, double radius_ratio);

} // namespace leat::mesh
