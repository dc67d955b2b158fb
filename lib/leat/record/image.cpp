#include <leat/base/version.hpp>
#include <leat/record/hdf5_write.hpp>
#include <leat/record/image.hpp>
#include <leat/record/recordable.hpp>
#include <leat/record/user_block.hpp>

#include <limits>
#include <span>
#include <string>
#include <type_traits>

namespace leat::record {

namespace {

constexpr double not_a_number = std::numeric_limits<double>::quiet_NaN();

Hdf5Handle create_memory_file()
{
    const Hdf5Handle creation(H5Pcreate(H5P_FILE_CREATE), H5Pclose, "make a creation list");
    require_success(H5Pset_userblock(creation.id(), user_block_size), "reserve the user block");
    require_success(H5Pset_obj_track_times(creation.id(), false), "leave out time stamps");
    require_success(H5Pset_link_creation_order(creation.id(), H5P_CRT_ORDER_TRACKED | H5P_CRT_ORDER_INDEXED),
                    "keep the order of a group");
    // Lets an attribute, here the case text, be longer than 64 KiB in this layout.
    require_success(H5Pset_attr_creation_order(creation.id(), H5P_CRT_ORDER_TRACKED), "keep the order of attributes");
    const Hdf5Handle access = memory_file_access();
    return {H5Fcreate(memory_file_name, H5F_ACC_TRUNC, creation.id(), access.id()), H5Fclose, "make a file in memory"};
}

// The bytes of a whole file, its user block still empty.
std::vector<std::byte> bytes_of(const Hdf5Handle& file)
{
    require_success(H5Fflush(file.id(), H5F_SCOPE_GLOBAL), "complete a file in memory");
    const ssize_t size = H5Fget_file_image(file.id(), nullptr, 0);
    require_success(size, "tell the size of a file in memory");
    // HDF5 gives the bytes behind the user block.
    std::vector<std::byte> bytes(user_block_size + static_cast<std::size_t>(size));
    const std::span<std::byte> image = std::span(bytes).subspan(user_block_size);
    require_success(H5Fget_file_image(file.id(), image.data(), image.size()), "give the bytes of a file in memory");
    constexpr std::string_view signature = "\x89HDF\r\n\x1a\n";
    if (std::string_view(reinterpret_cast<const char*>(image.data()), image.size()).substr(0, signature.size()) !=
        signature) {
        throw Hdf5Failure("HDF5 gave the bytes of a file in memory in another layout than is known here");
    }
    return bytes;
}

void write_mesh(const Hdf5Handle& file, const Fields& fields)
{
    std::vector<double> points;
    points.reserve(3 * fields.points_x.size() * fields.points_y.size());
    for (const double y : fields.points_y) {
        for (const double x : fields.points_x) {
            points.insert(points.end(), {x, y, 0.0});
        }
    }
    const Hdf5Handle group = create_group(file, "mesh");
    describe(write_array(group, "points", {fields.points_y.size(), fields.points_x.size(), 3}, points), "m",
             "corners of the cells: x along the passage, y across it, z = 0");
}

void write_cells(const Hdf5Handle& file, const Fields& fields)
{
    const hsize_t ni = static_cast<hsize_t>(fields.cells[0]);
    const hsize_t nj = static_cast<hsize_t>(fields.cells[1]);
    std::vector<double> velocity;
    velocity.reserve(3 * fields.velocity_along.size());
    for (std::size_t cell = 0; cell < fields.velocity_along.size(); ++cell) {
        velocity.insert(velocity.end(), {fields.velocity_along[cell], fields.velocity_across[cell], 0.0});
    }
    const Hdf5Handle group = create_group(file, "cells");
    describe(write_array(group, "pressure", {nj, ni}, fields.pressure), "Pa",
             "pressure without its hydrostatic part, relative to the section mean at the end");
    describe(write_array(group, "velocity", {nj, ni, 3}, velocity), "m/s",
             "velocity at the cell centres: along, across, 0");
}

// The unknowns as they were solved for, each where it lives: an exact continuation needs no interpolation.
void write_restart(const Hdf5Handle& file, const Fields& fields)
{
    const hsize_t ni = static_cast<hsize_t>(fields.cells[0]);
    const hsize_t nj = static_cast<hsize_t>(fields.cells[1]);
    const Hdf5Handle group = create_group(file, "restart");
    describe(write_array(group, "velocity_along", {nj, ni + 1}, fields.face_velocity_along), "m/s",
             "velocity along, on the faces between cells (j, i-1) and (j, i)");
    describe(write_array(group, "velocity_across", {nj + 1, ni}, fields.face_velocity_across), "m/s",
             "velocity across, on the faces between cells (j-1, i) and (j, i)");
    describe(write_array(group, "pressure", {nj, ni}, fields.pressure), "Pa", "pressure at the cell centres");
}

void write_stations(const Hdf5Handle& file, const Answer& answer)
{
    const Hdf5Handle group = create_group(file, "stations");
    for (const NamedColumn& column : answer.named_columns()) {
        std::vector<double> values;
        values.reserve(column.values.size());
        for (const std::optional<double>& value : column.values) {
            values.push_back(value.value_or(not_a_number));
        }
        const Hdf5Handle array = write_array(group, std::string(column.name), {values.size()}, values);
        describe(array, column.unit, column.meaning);
        write_attribute(array, "missing", "NaN: has no limit or is not defined at this station");
    }
}

void write_numbers(const Hdf5Handle& file, const Answer& answer)
{
    const Hdf5Handle group = create_group(file, "numbers");
    for (const NamedNumber& row : answer.named_numbers()) {
        const Number none{.value = not_a_number, .band = {}, .usable = false, .reason = row.reason};
        const Number& number = row.number ? *row.number : none;
        const Hdf5Handle value = write_array(group, std::string(row.name), {}, std::span(&number.value, 1));
        write_attribute(value, "band", number.band.value_or(not_a_number));
        write_attribute(value, "units", row.unit);
        write_attribute(value, "usable", number.usable ? 1 : 0);
        write_attribute(value, "reason", number.reason);
        write_attribute(value, "meaning", row.meaning);
        write_attribute(value, "missing", "NaN: absent, reason says why");
    }
}

void write_history(const Hdf5Handle& file, const Answer& answer)
{
    const Hdf5Handle group = create_group(file, "history");
    const auto write_column = [&](const std::string& name, const char* meaning, auto value_of) {
        std::vector<std::decay_t<decltype(value_of(HistoryRow{}))>> values;
        values.reserve(answer.history.size());
        for (const HistoryRow& row : answer.history) {
            values.push_back(value_of(row));
        }
        describe(
            write_array(group, name, {values.size()}, std::span<const typename decltype(values)::value_type>(values)),
            "1", meaning);
    };
    write_column("grid", "index of the grid, 0 = coarsest", [](const HistoryRow& row) { return row.grid; });
    write_column("iteration", "outer iteration on this grid, 0 = the state that it started from",
                 [](const HistoryRow& row) { return row.iteration; });
    write_column("mass", "imbalance of mass / inlet mass flow",
                 [](const HistoryRow& row) { return row.imbalances.mass; });
    write_column("momentum", "imbalance of momentum / (inlet momentum flux + |pressure drop| x area)",
                 [](const HistoryRow& row) { return row.imbalances.momentum; });
}

} // namespace

std::vector<std::byte> result_image(std::string_view case_text, const Answer& answer)
{
    require_recordable(case_text, answer);
    const Hdf5Session session;
    const Hdf5Handle file = create_memory_file();
    write_attribute(file, "format", "leat result");
    write_attribute(file, "format_version", format_version);
    write_attribute(file, "writer", "leat " + std::string(version()));
    write_attribute(file, "case_text", case_text);
    write_attribute(file, "outcome", name(answer.outcome));
    write_mesh(file, *answer.fields);
    write_cells(file, *answer.fields);
    write_stations(file, answer);
    write_numbers(file, answer);
    write_history(file, answer);
    write_restart(file, *answer.fields);
    std::vector<std::byte> bytes = bytes_of(file);
    seal(bytes);
    return bytes;
}

} // namespace leat::record
