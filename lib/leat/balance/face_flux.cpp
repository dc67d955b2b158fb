#include <leat/balance/face_flux.hpp>

#include <cmath>

namespace leat::balance {

namespace {

/// Tables of a scheme read at a fixed place or at the place of the face; the compiler hoists the fixed ones.
template <bool fixed>
struct Place {
    int face;
    double operator()(const double* table, int j) const noexcept { return table[fixed ? face : j]; }
};

template <bool fixed>
void central_fluxes(const scheme::DirectionalScheme& s, Place<fixed> at, const FaceRow& row, double* __restrict flux)
{
    const double* __restrict value = row.value;
    const double* __restrict below = row.value - row.stride;
    const double* up = s.up(0);
    const double* down = s.down(0);
    for (int j = row.begin; j < row.end; ++j) {
        const double interpolated = at(up, j) * below[j] + at(down, j) * value[j];
        flux[j] = row.flow[j] * interpolated - row.conductance * row.conductances[j] * (value[j] - below[j]);
    }
}

template <bool fixed>
void biased_fluxes(const scheme::DirectionalScheme& s, Place<fixed> at, const FaceRow& row, double* __restrict flux)
{
    const double* __restrict v0 = row.value - 2 * row.stride;
    const double* __restrict v1 = row.value - row.stride;
    const double* __restrict v2 = row.value;
    const double* __restrict v3 = row.value + row.stride;
    for (int j = row.begin; j < row.end; ++j) {
        const double with = at(s.far(0), j) * v0[j] + at(s.up(0), j) * v1[j] + at(s.down(0), j) * v2[j];
        const double against = at(s.far(1), j) * v3[j] + at(s.up(1), j) * v2[j] + at(s.down(1), j) * v1[j];
        const double interpolated = row.flow[j] >= 0 ? with : against;
        flux[j] = row.flow[j] * interpolated - row.conductance * row.conductances[j] * (v2[j] - v1[j]);
    }
}

template <bool fixed>
void power_law_fluxes(const scheme::DirectionalScheme& s, Place<fixed> at, const FaceRow& row, double* __restrict flux)
{
    for (int j = row.begin; j < row.end; ++j) {
        const double below = row.value[j - row.stride];
        const double above = row.value[j];
        const double flow = row.flow[j];
        const int sense = flow >= 0 ? 0 : 1;
        const double upstream = sense == 0 ? below : above;
        const double other = sense == 0 ? above : below;
        const double conductance = row.conductance * row.conductances[j];
        const double factor = conductance > 0 ? scheme::power_law_factor(std::abs(flow) / conductance) : 0;
        flux[j] = flow * (at(s.up(sense), j) * upstream + at(s.down(sense), j) * other) -
                  factor * conductance * (above - below);
    }
}

template <bool fixed>
void limited_fluxes(const scheme::DirectionalScheme& s, Place<fixed> at, const FaceRow& row, double* __restrict flux)
{
    const std::ptrdiff_t step = row.stride;
    for (int j = row.begin; j < row.end; ++j) {
        const double* v = row.value + j;
        const double flow = row.flow[j];
        const int sense = flow >= 0 ? 0 : 1;
        const double far = sense == 0 ? v[-2 * step] : v[step];
        const double up = sense == 0 ? v[-step] : v[0];
        const double down = sense == 0 ? v[0] : v[-step];
        double interpolated = at(s.up(sense), j) * up + at(s.down(sense), j) * down;
        if (down != up) {
            const double r = at(s.ratio(sense), j) * (up - far) / (down - up);
            interpolated += scheme::limiter(s.scheme(), r) * at(s.reach(sense), j) * (down - up);
        }
        flux[j] = flow * interpolated - row.conductance * row.conductances[j] * (v[0] - v[-step]);
    }
}

template <bool fixed>
void dispatch(const scheme::DirectionalScheme& s, Place<fixed> at, const FaceRow& row, double* flux)
{
    switch (s.scheme()) {
    case Scheme::central:
        return central_fluxes(s, at, row, flux);
    case Scheme::upwind:
    case Scheme::linear_upwind:
    case Scheme::quick:
        return biased_fluxes(s, at, row, flux);
    case Scheme::power_law:
        return power_law_fluxes(s, at, row, flux);
    case Scheme::van_leer:
    case Scheme::minmod:
        return limited_fluxes(s, at, row, flux);
    }
}

} // namespace

void face_fluxes(const scheme::DirectionalScheme& scheme, bool along, int face, const FaceRow& row, double* flux)
{
    if (along) {
        dispatch(scheme, Place<true>{face}, row, flux);
    } else {
        dispatch(scheme, Place<false>{face}, row, flux);
    }
}

double boundary_flux(const scheme::DirectionalScheme& scheme, int face, double below, double above, double flow,
                     double conductance) noexcept
{
    // On a boundary face both senses of a scheme name the same node.
    return flow * (scheme.up(0)[face] * below + scheme.down(0)[face] * above) - conductance * (above - below);
}

} // namespace leat::balance
