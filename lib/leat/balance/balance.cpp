#include <leat/balance/balance.hpp>

#include <leat/balance/face_flux.hpp>

#include <algorithm>
#include <cmath>

namespace leat::balance {

namespace {

/// The part of a scheme that a line solve takes implicitly: linear upwind along, central across; else upwind, whose
/// matrix is always dominated by its diagonal.
template <int D>
scheme::DirectionalScheme implicit_scheme(const Transport<D>& t, int d)
{
    using End = scheme::DirectionalScheme::End;
    const Scheme wanted = t.setup().schemes[d];
    const bool keep = wanted == (d == D - 1 ? Scheme::central : Scheme::linear_upwind);
    std::array<End, 2> ends{};
    for (int end = 0; end < 2; ++end) {
        const auto kind = t.setup().sides[d][end].kind;
        ends[end] = kind == Side::Kind::value                                  ? End::value
                    : kind == Side::Kind::flux || kind == Side::Kind::exchange ? End::free
                                                                               : End::on_node;
    }
    return {keep ? wanted : Scheme::upwind, t.volumes().node[d], t.volumes().face[d], t.volumes().nodes(d), ends};
}

template <int D, std::size_t... d>
std::array<scheme::DirectionalScheme, D> implicit_schemes(const Transport<D>& t, std::index_sequence<d...>)
{
    return {implicit_scheme(t, static_cast<int>(d))...};
}

} // namespace

template <int D>
Balance<D>::Balance(const Transport<D>& transport, const mesh::ControlVolumes<D>& cells, double density)
    : transport_(&transport), mass_flow_(cells, transport.layout(), density, transport.volumes().shift()),
      implicit_(implicit_schemes(transport, std::make_index_sequence<D>()))
{
    const auto room = static_cast<std::size_t>(transport.layout().cells[D - 1]) + 3;
    for (auto& pair : flow_) {
        pair[0].resize(room);
        pair[1].resize(room);
    }
    flux_.resize(room);
}

template <int D>
double Balance<D>::row_conductance(int d, const std::array<int, D>& row) const noexcept
{
    double product = transport_->setup().diffusivity;
    for (int e = 0; e < D - 1; ++e) {
        product *= transport_->conductance_factor(d, e)[row[e]];
    }
    return product;
}

template <int D>
double Balance<D>::row_sink(const std::array<int, D>& row) const noexcept
{
    double product = transport_->setup().diffusivity;
    for (int e = 0; e < D - 1; ++e) {
        product *= transport_->sink_factor(e)[row[e]];
    }
    return product;
}

template <int D>
void Balance<D>::faces(const Velocity& velocity, const double* value, int d, const std::array<int, D>& row,
                       double* flow, double* flux) const
{
    const Transport<D>& t = *transport_;
    const int begin = t.solved().begin[D - 1];
    const int end = t.solved().end[D - 1] + (d == D - 1 ? 1 : 0);
    mass_flow_.row(velocity, d, row, begin, end, flow);
    std::array<int, D> first = row;
    first[D - 1] = 0;
    const double* v = value + t.layout().index(first);
    const std::ptrdiff_t stride = t.layout().stride[d];
    const double common = row_conductance(d, row);
    const double* each = t.conductance_factor(d, D - 1).data();
    const int nodes = t.volumes().nodes(d);
    FaceRow inner{v, stride, flow, common, each, begin, end};
    const auto on_boundary = [&](int place, int j) {
        flux[j] = boundary_flux(t.scheme(d), place, v[j - stride], v[j], flow[j], common * each[j]);
    };
    if (d == D - 1) {
        if (begin == 0) {
            on_boundary(0, 0);
            inner.begin = 1;
        }
        if (end == nodes + 1) {
            on_boundary(nodes, nodes);
            inner.end = nodes;
        }
        face_fluxes(t.scheme(d), false, 0, inner, flux);
    } else if (row[d] == 0 || row[d] == nodes) {
        for (int j = begin; j < end; ++j) {
            on_boundary(row[d], j);
        }
    } else {
        face_fluxes(t.scheme(d), true, row[d], inner, flux);
    }
}

template <int D>
void Balance<D>::start_row(const Velocity& velocity, const double* value, const double* source, const RowTerm<D>* term,
                           const std::array<int, D>& row, double* flow, double* __restrict r)
{
    const Transport<D>& t = *transport_;
    const int begin = t.solved().begin[D - 1];
    const int end = t.solved().end[D - 1];
    std::array<int, D> first = row;
    first[D - 1] = 0;
    const std::ptrdiff_t at = t.layout().index(first);
    const double* __restrict flux = flux_.data();
    faces(velocity, value, D - 1, row, flow, flux_.data());
    for (int j = begin; j < end; ++j) {
        r[j] = flux[j + 1] - flux[j];
    }
    if (source != nullptr) {
        const double* __restrict s = source + at;
        for (int j = begin; j < end; ++j) {
            r[j] -= s[j];
        }
    }
    if (t.setup().hoop) {
        const double common = row_sink(row);
        const double* sink = t.sink_factor(D - 1).data();
        const double* __restrict v = value + at;
        for (int j = begin; j < end; ++j) {
            r[j] += common * sink[j] * v[j];
        }
    }
    if (term != nullptr) {
        term->add(row, begin, end, r);
    }
}

template <int D>
void Balance<D>::residual(const Velocity& velocity, const field::Values& value, const double* source,
                          const RowTerm<D>* term, field::Values& out)
{
    const Transport<D>& t = *transport_;
    const field::Box<D>& box = t.solved();
    double* flow = flow_[0][0].data();
    const double* __restrict flux = flux_.data();
    const int begin = box.begin[D - 1];
    const int end = box.end[D - 1];
    // Each row takes the flux through its lower faces and hands it to the row below, which has been visited before.
    field::for_each_row<D>(box, [&](const std::array<int, D>& row) {
        std::array<int, D> first = row;
        first[D - 1] = 0;
        double* __restrict r = out.data() + t.layout().index(first);
        start_row(velocity, value.data(), source, term, row, flow, r);
        for (int d = 0; d < D - 1; ++d) {
            faces(velocity, value.data(), d, row, flow, flux_.data());
            if (row[d] > box.begin[d]) {
                double* __restrict below = r - t.layout().stride[d];
                for (int j = begin; j < end; ++j) {
                    r[j] -= flux[j];
                    below[j] += flux[j];
                }
            } else {
                for (int j = begin; j < end; ++j) {
                    r[j] -= flux[j];
                }
            }
            if (row[d] == box.end[d] - 1) {
                std::array<int, D> above = row;
                ++above[d];
                faces(velocity, value.data(), d, above, flow, flux_.data());
                for (int j = begin; j < end; ++j) {
                    r[j] += flux[j];
                }
            }
        }
    });
}

template <int D>
void Balance<D>::residual_row(const Velocity& velocity, const double* value, const double* source,
                              const RowTerm<D>* term, const std::array<int, D>& row, double* __restrict out)
{
    const int begin = transport_->solved().begin[D - 1];
    const int end = transport_->solved().end[D - 1];
    const double* __restrict flux = flux_.data();
    start_row(velocity, value, source, term, row, flow_[D - 1][0].data(), out);
    for (int d = 0; d < D - 1; ++d) {
        std::array<int, D> face = row;
        for (int side = 0; side < 2; ++side, ++face[d]) {
            faces(velocity, value, d, face, flow_[d][side].data(), flux_.data());
            const double sign = side == 0 ? -1 : 1;
            for (int j = begin; j < end; ++j) {
                out[j] += sign * flux[j];
            }
        }
    }
}

template <int D>
void Balance<D>::line_coefficients(const std::array<int, D>& row, double* __restrict centre, double* __restrict lower,
                                   double* __restrict upper) const
{
    const Transport<D>& t = *transport_;
    const int begin = t.solved().begin[D - 1];
    const int end = t.solved().end[D - 1];
    {
        const scheme::DirectionalScheme& s = implicit_[D - 1];
        const double* __restrict flow = flow_[D - 1][0].data();
        const double common = row_conductance(D - 1, row);
        const double* __restrict each = t.conductance_factor(D - 1, D - 1).data();
        // weight of the node below and above a face, by the sense of the flow through it
        const auto below = [&](int f) { return flow[f] >= 0 ? s.up(0)[f] : s.down(1)[f]; };
        const auto above = [&](int f) { return flow[f] >= 0 ? s.down(0)[f] : s.up(1)[f]; };
        for (int j = begin; j < end; ++j) {
            const double g0 = common * each[j];
            const double g1 = common * each[j + 1];
            centre[j] = flow[j + 1] * below(j + 1) - flow[j] * above(j) + g0 + g1;
            lower[j] = -flow[j] * below(j) - g0;
            upper[j] = flow[j + 1] * above(j + 1) - g1;
        }
    }
    if (t.setup().hoop) {
        const double common = row_sink(row);
        for (int j = begin; j < end; ++j) {
            centre[j] += common * t.sink_factor(D - 1)[j];
        }
    }
    for (int d = 0; d < D - 1; ++d) {
        const scheme::DirectionalScheme& s = implicit_[d];
        std::array<int, D> face = row;
        for (int side = 0; side < 2; ++side, ++face[d]) {
            const int f = face[d];
            const double* __restrict flow = flow_[d][side].data();
            const double common = row_conductance(d, face);
            const double* __restrict each = t.conductance_factor(d, D - 1).data();
            const double with = side == 0 ? -s.down(0)[f] : s.up(0)[f];
            const double against = side == 0 ? -s.up(1)[f] : s.down(1)[f];
            for (int j = begin; j < end; ++j) {
                centre[j] += flow[j] * (flow[j] >= 0 ? with : against) + common * each[j];
            }
        }
    }
}

template <int D>
void Balance<D>::assemble(const Velocity& velocity, linear::StencilSystem<D>& system)
{
    const Transport<D>& t = *transport_;
    const field::Box<D>& box = t.solved();
    double* flow = flow_[0][0].data();
    const int begin = box.begin[D - 1];
    const int end = box.end[D - 1];
    std::fill(system.centre.begin(), system.centre.end(), 0.0);
    for (int d = 0; d < D; ++d) {
        std::fill(system.lower[d].begin(), system.lower[d].end(), 0.0);
        std::fill(system.upper[d].begin(), system.upper[d].end(), 0.0);
    }
    for (int d = 0; d < D; ++d) {
        const bool power_law = t.setup().schemes[d] == Scheme::power_law;
        const std::ptrdiff_t stride = t.layout().stride[d];
        field::Box<D> face_box = box;
        ++face_box.end[d];
        field::for_each_row<D>(face_box, [&](const std::array<int, D>& row) {
            const int last = d == D - 1 ? end + 1 : end;
            mass_flow_.row(velocity, d, row, begin, last, flow);
            const double common = row_conductance(d, row);
            const double* each = t.conductance_factor(d, D - 1).data();
            std::array<int, D> k = row;
            for (int j = begin; j < last; ++j) {
                k[D - 1] = j;
                const std::ptrdiff_t at = t.layout().index(k);
                double g = common * each[j];
                if (power_law && g > 0) {
                    g *= scheme::power_law_factor(std::abs(flow[j]) / g);
                }
                const double from_below = g + std::max(flow[j], 0.0);
                const double from_above = g + std::max(-flow[j], 0.0);
                if (k[d] < box.end[d]) { // the volume above the face
                    const bool free = k[d] == 0 && g == 0 && t.setup().sides[d][0].kind != Side::Kind::value;
                    system.centre[at] += free ? 0 : from_below;
                    if (k[d] > box.begin[d]) {
                        system.lower[d][at] = -from_below;
                    }
                }
                if (k[d] > box.begin[d]) { // the volume below it
                    const bool free =
                        k[d] == t.volumes().nodes(d) && g == 0 && t.setup().sides[d][1].kind != Side::Kind::value;
                    system.centre[at - stride] += free ? 0 : from_above;
                    if (k[d] < box.end[d]) {
                        system.upper[d][at - stride] = -from_above;
                    }
                }
            }
        });
    }
    if (t.setup().hoop) {
        field::for_each_row<D>(box, [&](std::array<int, D> k) {
            const double common = row_sink(k);
            for (k[D - 1] = begin; k[D - 1] < end; ++k[D - 1]) {
                system.centre[t.layout().index(k)] += common * t.sink_factor(D - 1)[k[D - 1]];
            }
        });
    }
}

template class Balance<2>;
template class Balance<3>;

} // namespace leat::balance
