#pragma once

#include <leat/balance/mass_flow.hpp>
#include <leat/balance/transport.hpp>
#include <leat/field/layout.hpp>
#include <leat/linear/stencil_system.hpp>

#include <array>

namespace leat::balance {

/// What else acts on a row of volumes (a pressure force, say).
template <int D>
class RowTerm {
public:
    virtual ~RowTerm() = default;
    /// Adds to the residual r[j], begin <= j < end, of the row; r[j] belongs to node j.
    virtual void add(const std::array<int, D>& row, int begin, int end, double* r) const = 0;
};

/// Evaluates the balances of one transported quantity. Holds row buffers, so one object serves one thread.
template <int D>
class Balance {
public:
    using Velocity = typename MassFlow<D>::Velocity;

    /// `transport` and `cells` (the unshifted volumes) must outlive this object.
    Balance(const Transport<D>& transport, const mesh::ControlVolumes<D>& cells, double density);

    const Transport<D>& transport() const noexcept { return *transport_; }

    /// out = net outflow + sink - source + term, for every solved volume; other places are left alone.
    /// `source` and `term` may be null.
    void residual(const Velocity& velocity, const field::Values& value, const double* source, const RowTerm<D>* term,
                  field::Values& out);

    /// The same for one row of volumes, into out[j]; leaves the mass flows of the row in the buffers.
    void residual_row(const Velocity& velocity, const double* value, const double* source, const RowTerm<D>* term,
                      const std::array<int, D>& row, double* out);

    /// Derivatives of the last residual_row along its line: of volume j by its own value (centre) and by those of
    /// j - 1 and j + 1. Values outside the line and differences of higher order are held fixed.
    void line_coefficients(const std::array<int, D>& row, double* centre, double* lower, double* upper) const;

    /// Matrix of the upwind (power law: as it is) form, for solving towards a zero residual by correction.
    /// The diagonal leaves out the net mass outflow, so that it dominates.
    void assemble(const Velocity& velocity, linear::StencilSystem<D>& system);

private:
    void faces(const Velocity& velocity, const double* value, int d, const std::array<int, D>& row, double* flow,
               double* flux) const;
    /// What a row has by itself: fluxes along the row, sink, source, term.
    void start_row(const Velocity& velocity, const double* value, const double* source, const RowTerm<D>* term,
                   const std::array<int, D>& row, double* flow, double* r);
    double row_conductance(int d, const std::array<int, D>& row) const noexcept;
    double row_sink(const std::array<int, D>& row) const noexcept;

    const Transport<D>* transport_;
    MassFlow<D> mass_flow_;
    std::array<scheme::DirectionalScheme, D> implicit_;
    std::array<std::array<field::Values, 2>, D> flow_; ///< through the lower and upper faces of the last row
    field::Values flux_;
};

extern template class Balance<2>;
extern template class Balance<3>;

} // namespace leat::balance
