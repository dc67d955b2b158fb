#pragma once

#include <leat/scheme/scheme.hpp>

#include <cstddef>

namespace leat::balance {

/// One row of faces whose fluxes are wanted; pointers are such that [j] belongs to the lower face of node j.
struct FaceRow {
    const double* value;        ///< nodes
    std::ptrdiff_t stride;      ///< from the node below the face to the node above it
    const double* flow;         ///< mass flow through the face
    double conductance;         ///< factor common to the row
    const double* conductances; ///< factor of each face
    int begin;                  ///< first j
    int end;                    ///< one past the last j
};

/// flux[j] = flow x face value - conductance x (value above - value below), for faces between two nodes.
/// along: every face of the row has the same place `face` in the tables of the scheme (rows across the direction);
/// otherwise face j has place j (the row runs along the direction).
void face_fluxes(const scheme::DirectionalScheme& scheme, bool along, int face, const FaceRow& row, double* flux);

/// The same for one face on the boundary, where no value beyond the two neighbours may be touched.
double boundary_flux(const scheme::DirectionalScheme& scheme, int face, double below, double above, double flow,
                     double conductance) noexcept;

} // namespace leat::balance
