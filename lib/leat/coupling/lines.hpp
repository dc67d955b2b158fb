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
/// function (linear::solve).
class LinesCoupling final : public FlowCoupling<2> {
public:
    LinesCoupling(FlowEquations<2>& equations, const Settings& settings);
    void iterate(FlowState<2>& state, const FlowState<2>* source, bool backwards) override;
    void hold_linearisation() noexcept override;
    std::size_t bytes() const noexcept override;

private:
    /// What the linearisation of one station comes to; [j] belongs to cell or face j.
    struct Factors {
        double* along;   ///< D/(A a_j), with D, N, S the axial coefficients of the node, above and below it
        double* beyond;  ///< -N/(A a_{j+1})
        double* before;  ///< -S/(A a_{j-1})
        double* pivot;   ///< of the pentadiagonal system, rows 1 .. n - 1
        double* outward; ///< likewise
        double* inward;  ///< likewise
    };
    static constexpr int factor_count = 6;

    void correct_station(FlowState<2>& state, const FlowState<2>* source, int station, bool backwards);
    void balances(const FlowState<2>& state, const FlowState<2>* source, int station, int face);
    void linearise(int station, int face, const Factors& factors);
    void right_hand_side(double sign, const Factors& factors);
    void update(FlowState<2>& state, int station, int face, double sign, const Factors& factors) const;
    Factors factors_of(int station) noexcept;

    FlowEquations<2>& equations_;
    double damping_velocity_;
    double damping_pressure_;
    int cells_across_;
    std::ptrdiff_t room_;                ///< places per line and array
    field::Values factors_;              ///< of every station, or of one when none are held
    std::vector<unsigned char> is_held_; ///< by station; empty: this coupling cannot hold any
    bool hold_ = false;
    /// One line's residuals, coefficients and unknowns; [1 + j] belongs to cell or face j.
    struct Line {
        field::Values mass, mass_beside;                 ///< net mass outflow of the station, of its neighbour
        field::Values axial, cross;                      ///< balances on the axial and the cross faces
        field::Values centre, lower, upper;              ///< coefficients of one kind of balance
        field::Values band_below, band_here, band_above; ///< of psi_{j-1}, psi_j, psi_{j+1}
        field::Values inverse_axial, inverse_cross;      ///< 1/(area factor across), 0 beyond the line
        field::Values constant;                          ///< what a pressure correction is without psi
        field::Values psi;
    } line_;
    double inverse_axial_area_ = 0; ///< of the present station, without the factor across
    double inverse_cross_area_ = 0;
};

} // namespace leat::coupling
