#include <leat/passage/options.hpp>

#include <leat/passage/computed_numbers.hpp>

#include <algorithm>
#include <cmath>
#include <string>

namespace leat {

namespace {

void require_within(const std::string& field, double number, double least, double most, Faults& faults)
{
    if (!(number >= least && number <= most)) {
        faults.add(field, to_text(number), "must be within " + to_text(least) + " .. " + to_text(most));
    }
}

void require_cells(const std::array<int, 2>& cells, Faults& faults)
{
    const auto [along, across] = cells;
    const bool along_fits = along >= 16 && along <= 5120 && along % 8 == 0;
    const bool across_fits = across >= 8 && across <= 1280 && across % 4 == 0;
    if (!along_fits || !across_fits) {
        faults.add("options.cells", std::to_string(along) + " x " + std::to_string(across),
                   "along must be a multiple of 8 within 16 .. 5120, across a multiple of 4 within 8 .. 1280");
    }
}

void require_names(const std::vector<std::string>& names, Faults& faults)
{
    const auto known = passage::computed_names();
    for (const std::string& name : names) {
        if (std::find(known.begin(), known.end(), name) == known.end()) {
            std::string list;
            for (const std::string_view one : known) {
                list += (list.empty() ? "" : ", ") + std::string(one);
            }
            faults.add("accuracy.band_on", name, "must be one of " + list);
        }
    }
}

void require_factor(const std::string& field, double factor, Faults& faults)
{
    if (!(factor > 0 && factor <= 1)) {
        faults.add(field, to_text(factor), "must be > 0 and <= 1");
    }
}

void require_stations(const std::vector<double>& stations, double length, Faults& faults)
{
    for (std::size_t i = 0; i < stations.size(); ++i) {
        const double station = stations[i];
        const bool inside = std::isfinite(station) && station >= 0 && (!(length > 0) || station <= length);
        if (!inside) {
            faults.add("options.stations", to_text(station),
                       length > 0 ? "must be within 0 .. " + to_text(length) + " m, the length of the passage"
                                  : std::string("must be finite and >= 0 m"));
        } else if (i > 0 && station <= stations[i - 1]) {
            faults.add("options.stations", to_text(stations[i - 1]) + " m then " + to_text(station) + " m",
                       "must be increasing");
        }
    }
}

} // namespace

std::vector<Fault> faults_of(const Accuracy& accuracy, const Options& options, double length)
{
    Faults faults;
    require_within("accuracy.band", accuracy.band, 1e-5, 0.5, faults);
    require_names(accuracy.band_on, faults);
    if (options.cells) {
        require_cells(*options.cells, faults);
    }
    require_within("options.cell_budget", options.cell_budget, 1e4, 1e8, faults);
    if (options.relaxation) {
        require_factor("options.relaxation.velocity", options.relaxation->velocity, faults);
        require_factor("options.relaxation.pressure", options.relaxation->pressure, faults);
    }
    if (options.iterations < 1) {
        faults.add("options.iterations", std::to_string(options.iterations), "must be >= 1");
    }
    require_within("options.tolerance", options.tolerance, 1e-14, 1e-2, faults);
    require_stations(options.stations, length, faults);
    return faults.list();
}

} // namespace leat
