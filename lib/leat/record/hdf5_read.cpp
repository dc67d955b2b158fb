#include <leat/record/hdf5_read.hpp>

#include <functional>
#include <numeric>

namespace leat::record {

namespace {

Hdf5Handle open_attribute(const Hdf5Handle& owner, const std::string& name)
{
    return {H5Aopen(owner.id(), name.c_str(), H5P_DEFAULT), H5Aclose, "find the attribute " + name};
}

void require_single(const Hdf5Handle& attribute, const std::string& name)
{
    const Hdf5Handle space(H5Aget_space(attribute.id()), H5Sclose, "tell the shape of the attribute " + name);
    if (H5Sget_simple_extent_npoints(space.id()) != 1) {
        throw Hdf5Failure("the attribute " + name + " is not a single value");
    }
}

void read_value(const Hdf5Handle& owner, const std::string& name, hid_t type, void* value)
{
    const Hdf5Handle attribute = open_attribute(owner, name);
    require_single(attribute, name);
    require_success(H5Aread(attribute.id(), type, value), "read the attribute " + name);
}

} // namespace

Hdf5Handle open_group(const Hdf5Handle& parent, const std::string& name)
{
    return {H5Gopen2(parent.id(), name.c_str(), H5P_DEFAULT), H5Gclose, "find the group " + name};
}

Hdf5Handle open_array(const Hdf5Handle& parent, const std::string& name)
{
    return {H5Dopen2(parent.id(), name.c_str(), H5P_DEFAULT), H5Dclose, "find the array " + name};
}

std::vector<std::string> names_in(const Hdf5Handle& group)
{
    H5G_info_t info{};
    require_success(H5Gget_info(group.id(), &info), "list a group");
    std::vector<std::string> names;
    for (hsize_t k = 0; k < info.nlinks; ++k) {
        const auto name_of = [&](char* to, std::size_t size) {
            const ssize_t length =
                H5Lget_name_by_idx(group.id(), ".", H5_INDEX_CRT_ORDER, H5_ITER_INC, k, to, size, H5P_DEFAULT);
            require_success(length, "list a group");
            return static_cast<std::size_t>(length);
        };
        std::string name(name_of(nullptr, 0), '\0');
        name_of(name.data(), name.size() + 1);
        names.push_back(std::move(name));
    }
    return names;
}

Extents extents_of(const Hdf5Handle& array, const std::string& name)
{
    const Hdf5Handle space(H5Dget_space(array.id()), H5Sclose, "tell the shape of the array " + name);
    const int rank = H5Sget_simple_extent_ndims(space.id());
    require_success(rank, "tell the shape of the array " + name);
    Extents extents(static_cast<std::size_t>(rank));
    require_success(H5Sget_simple_extent_dims(space.id(), extents.data(), nullptr),
                    "tell the shape of the array " + name);
    return extents;
}

std::vector<double> read_array(const Hdf5Handle& array, const std::string& name, const Extents& extents)
{
    if (extents_of(array, name) != extents) {
        throw Hdf5Failure("the array " + name + " has not the shape that the mesh asks for");
    }
    std::vector<double> values(std::accumulate(extents.begin(), extents.end(), hsize_t{1}, std::multiplies<>{}));
    require_success(H5Dread(array.id(), H5T_NATIVE_DOUBLE, H5S_ALL, H5S_ALL, H5P_DEFAULT, values.data()),
                    "read the array " + name);
    return values;
}

std::string read_text(const Hdf5Handle& owner, const std::string& name)
{
    const Hdf5Handle attribute = open_attribute(owner, name);
    require_single(attribute, name);
    const Hdf5Handle type(H5Aget_type(attribute.id()), H5Tclose, "tell the type of the attribute " + name);
    if (H5Tget_class(type.id()) != H5T_STRING || H5Tis_variable_str(type.id()) != 0) {
        throw Hdf5Failure("the attribute " + name + " is not a text of fixed length");
    }
    std::string text(H5Tget_size(type.id()), '\0');
    require_success(H5Aread(attribute.id(), type.id(), text.data()), "read the attribute " + name);
    // The padding; a stored text ends in no NUL of its own.
    text.resize(text.find_last_not_of('\0') + 1);
    return text;
}

double read_number(const Hdf5Handle& owner, const std::string& name)
{
    double number = 0;
    read_value(owner, name, H5T_NATIVE_DOUBLE, &number);
    return number;
}

int read_integer(const Hdf5Handle& owner, const std::string& name)
{
    int number = 0;
    read_value(owner, name, H5T_NATIVE_INT, &number);
    return number;
}

} // namespace leat::record
