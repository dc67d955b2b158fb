#include <leat/mesh/grading.hpp>

#include <leat/base/error.hpp>

#include <cmath>

namespace leat::mesh {

namespace {

constexpr double negligible = 1e-6; // below this strength the maps are the identity to round-off squared

} // namespace

Grading uniform()
{
    return [](double s) { return s; };
}

Grading towards_start(double strength)
{
    if (strength < negligible) {
        return uniform();
    }
    return [strength](double s) { return std::sinh(strength * s) / std::sinh(strength); };
}

Grading towards_end(double strength)
{
    const Grading mirrored = towards_start(strength);
    return [mirrored](double s) { return 1 - mirrored(1 - s); };
}

Grading towards_both(double strength)
{
    if (strength < negligible) {
        return uniform();
    }
    return [strength](double s) { return 0.5 * (1 + std::tanh(strength * (2 * s - 1)) / std::tanh(strength)); };
}

double strength_for_first_cell(double ratio)
{
    if (!(ratio > 0 && ratio <= 1)) {
        throw InvalidInput({{"ratio", to_text(ratio), "must be in (0, 1]"}});
    }
    // a/sinh(a) falls monotonically from 1; bisection in a is short and cannot fail.
    double low = 0;
    double high = 1;
    const auto first = [](double a) { return a < negligible ? 1.0 : a / std::sinh(a); };
    while (first(high) > ratio) {
        high *= 2;
    }
    for (int k = 0; k < 60; ++k) {
        const double middle = 0.5 * (low + high);
        (first(middle) > ratio ? low : high) = middle;
    }
    return 0.5 * (low + high);
}

std::vector<double> sample(const Grading& grading, int cells, double start, double end)
{
    Faults faults;
    if (cells < 1) {
        faults.add("cells", std::to_string(cells), "must be at least 1");
    }
    if (!(end > start)) {
        faults.add("end", to_text(end), "must be greater than start = " + to_text(start));
    }
    faults.throw_if_any();
    std::vector<double> faces(static_cast<std::size_t>(cells) + 1);
    for (int k = 0; k <= cells; ++k) {
        faces[k] = start + (end - start) * grading(static_cast<double>(k) / cells);
        if (k > 0 && !(faces[k] > faces[k - 1])) {
            faults.add("grading", to_text(faces[k]), "must increase from face to face");
            faults.throw_if_any();
        }
    }
    faces.front() = start;
    faces.back() = end;
    return faces;
}

} // namespace leat::mesh
