#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/passage.hpp>

namespace leat::passage {

/// What a handbook gives for the pressure drop of a valid passage, Delta p = 4 f_app L/D_h rho u_m^2/2:
/// flat inlet, by the correlation of Shah 1978 where its constants exist (see shah_constants); developed inlet, by the
/// exact developed friction (Shah & London 1978); tabulated inlet, nothing. `remark` says what was interpolated, why
/// there is none, and that the correlation belongs to high Reynolds numbers where Re < 1000.
HandbookEstimate handbook_estimate(const Passage& passage, const Derived& derived);

} // namespace leat::passage
