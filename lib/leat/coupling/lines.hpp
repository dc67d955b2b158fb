#pragma once

#include <leat/coupling/coupling.hpp>

#include <vector>

namespace leat::coupling {

/// Coupled cross-stream lines (after Galpin, Van Doormaal & Raithby 1985) on staggered unknowns.
///
/// On the cells across the duct at one axial station the axial velocities of the faces downstream of them (upstream
/// at a closed end), the cross velocities inside the station and the pressures are corrected together. With
/// psi_j = density x area x (correction of the cross velocity), mass gives the axial corrections, the axial balances
/// then give the pressure corrections, and what remains is one pentadiagonal system for psi, a discrete stream
/// function. It is solved without pivoting, from both walls towards the middle, so that two chains of divisions run at
/// the same time.
class LinesCoupling final : public FlowCoupling<2> {
public:
    LinesCoupling(FlowEquations<2>& equations, const Settings& settings);
    void iterate(FlowState<2>& state, const FlowState<2>* source, bool backwards) override;
    std::size_t bytes() const noexcept override;

private:
    void correct_station(FlowState<2>& state, const FlowState<2>* source, int station, bool backwards);
    void gather(FlowState<2>& state, const FlowState<2>* source, int station, int face);
    void form_bands(int station, int face, double sign);
    void solve_bands();

    FlowEquations<2>& equations_;
    double damping_velocity_;
    double damping_pressure_;
    int cells_across_;
    /// One line's residuals, coefficients and unknowns; [1 + j] belongs to cell or face j.
    struct Line {
        field::Values mass, mass_beside; ///< net mass outflow of the station, of its neighbour
        field::Values axial, axial_centre, axial_lower, axial_upper; ///< balance on the axial faces
        field::Values cross, cross_centre, cross_lower, cross_upper; ///< balance on the cross faces
        field::Values inverse_axial, inverse_cross; ///< 1/(one-dimensional area factor), 0 beyond the line
        field::Values along, beyond, before;        ///< D/(A a_j), N/(A a_{j+1}), S/(A a_{j-1})
        field::Values constant;                     ///< what a pressure correction is without psi
        field::Values band_before, band_below, band_here, band_above, band_beyond; ///< of psi_{j-2} .. psi_{j+2}
        field::Values psi, first, second; ///< unknown; factors of the two neighbours towards the middle
    } line_;
    double inverse_axial_area_ = 0; ///< of the present station, without the factor across
    double inverse_cross_area_ = 0;
};

} // namespace leat::coupling
