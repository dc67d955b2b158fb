#include <leat/mesh/grid.hpp>

#include <leat/base/error.hpp>

#include <cmath>
#include <utility>

namespace leat::mesh {

template <int D>
Grid<D>::Grid(Coordinates coordinates, std::array<std::vector<double>, D> faces)
    : coordinates_(coordinates), faces_(std::move(faces))
{
    Faults faults;
    for (int d = 0; d < D; ++d) {
        const std::string field = "faces[" + std::to_string(d) + "]";
        if (faces_[d].size() < 2) {
            faults.add(field, std::to_string(faces_[d].size()) + " faces", "must have at least 2");
            continue;
        }
        for (std::size_t k = 0; k < faces_[d].size(); ++k) {
            if (!std::isfinite(faces_[d][k]) || (k > 0 && !(faces_[d][k] > faces_[d][k - 1]))) {
                faults.add(field, to_text(faces_[d][k]), "must be finite and increase strictly");
                break;
            }
        }
    }
    if (coordinates_ == Coordinates::cylindrical && !faces_[1].empty() && faces_[1].front() < 0) {
        faults.add("faces[1]", to_text(faces_[1].front()), "a radius must be >= 0");
    }
    faults.throw_if_any();
}

template <int D>
std::array<int, D> Grid<D>::cells() const noexcept
{
    std::array<int, D> all;
    for (int d = 0; d < D; ++d) {
        all[d] = cells(d);
    }
    return all;
}

template <int D>
std::vector<double> Grid<D>::centres(int direction) const
{
    const std::vector<double>& f = faces_[direction];
    std::vector<double> middle(f.size() - 1);
    for (std::size_t k = 0; k < middle.size(); ++k) {
        middle[k] = 0.5 * (f[k] + f[k + 1]);
    }
    return middle;
}

template <int D>
Grid<D> Grid<D>::coarsened(std::array<bool, D> halve) const
{
    std::array<std::vector<double>, D> kept;
    for (int d = 0; d < D; ++d) {
        if (halve[d] && !can_coarsen(d)) {
            throw InvalidInput(
                {{"cells(" + std::to_string(d) + ")", std::to_string(cells(d)), "must be even to be halved"}});
        }
        for (std::size_t k = 0; k < faces_[d].size(); k += halve[d] ? 2 : 1) {
            kept[d].push_back(faces_[d][k]);
        }
    }
    return Grid(coordinates_, std::move(kept));
}

template class Grid<2>;
template class Grid<3>;

} // namespace leat::mesh
