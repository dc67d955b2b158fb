#include <leat/record/hdf5_write.hpp>

#include <algorithm>

namespace leat::record {

namespace {

Hdf5Handle space_of(const Extents& extents)
{
    const hid_t id = extents.empty() ? H5Screate(H5S_SCALAR)
                                     : H5Screate_simple(static_cast<int>(extents.size()), extents.data(), nullptr);
    return {id, H5Sclose, "make a data space"};
}

Hdf5Handle without_times(hid_t kind)
{
    Hdf5Handle creation(H5Pcreate(kind), H5Pclose, "make a creation list");
    require_success(H5Pset_obj_track_times(creation.id(), false), "leave out time stamps");
    return creation;
}

// `values` is null for an array without elements, which HDF5 refuses to write.
Hdf5Handle write_values(const Hdf5Handle& parent, const std::string& name, const Extents& extents, hid_t stored_type,
                        hid_t type, const void* values)
{
    const Hdf5Handle space = space_of(extents);
    const Hdf5Handle creation = without_times(H5P_DATASET_CREATE);
    Hdf5Handle array(
        H5Dcreate2(parent.id(), name.c_str(), stored_type, space.id(), H5P_DEFAULT, creation.id(), H5P_DEFAULT),
        H5Dclose, "make the array " + name);
    if (values != nullptr) {
        require_success(H5Dwrite(array.id(), type, H5S_ALL, H5S_ALL, H5P_DEFAULT, values), "write the array " + name);
    }
    return array;
}

void write_attribute_value(const Hdf5Handle& owner, const std::string& name, hid_t stored_type, hid_t type,
                           const void* value)
{
    const Hdf5Handle space = space_of({});
    const Hdf5Handle attribute(H5Acreate2(owner.id(), name.c_str(), stored_type, space.id(), H5P_DEFAULT, H5P_DEFAULT),
                               H5Aclose, "make the attribute " + name);
    require_success(H5Awrite(attribute.id(), type, value), "write the attribute " + name);
}

} // namespace

Hdf5Handle create_group(const Hdf5Handle& parent, const std::string& name)
{
    const Hdf5Handle creation = without_times(H5P_GROUP_CREATE);
    require_success(H5Pset_link_creation_order(creation.id(), H5P_CRT_ORDER_TRACKED | H5P_CRT_ORDER_INDEXED),
                    "keep the order of a group");
    return {H5Gcreate2(parent.id(), name.c_str(), H5P_DEFAULT, creation.id(), H5P_DEFAULT), H5Gclose,
            "make the group " + name};
}

Hdf5Handle write_array(const Hdf5Handle& parent, const std::string& name, const Extents& extents,
                       std::span<const double> values)
{
    return write_values(parent, name, extents, H5T_IEEE_F64LE, H5T_NATIVE_DOUBLE,
                        values.empty() ? nullptr : values.data());
}

Hdf5Handle write_array(const Hdf5Handle& parent, const std::string& name, const Extents& extents,
                       std::span<const int> values)
{
    return write_values(parent, name, extents, H5T_STD_I32LE, H5T_NATIVE_INT, values.empty() ? nullptr : values.data());
}

void write_attribute(const Hdf5Handle& owner, const std::string& name, std::string_view text)
{
    const Hdf5Handle type(H5Tcopy(H5T_C_S1), H5Tclose, "make a text type");
    // HDF5 knows no text of length 0; an empty one is stored as a single NUL.
    require_success(H5Tset_size(type.id(), std::max<std::size_t>(text.size(), 1)), "set the length of a text");
    require_success(H5Tset_strpad(type.id(), H5T_STR_NULLPAD), "set the padding of a text");
    require_success(H5Tset_cset(type.id(), H5T_CSET_UTF8), "set the encoding of a text");
    write_attribute_value(owner, name, type.id(), type.id(), text.empty() ? "" : text.data());
}

void write_attribute(const Hdf5Handle& owner, const std::string& name, double number)
{
    write_attribute_value(owner, name, H5T_IEEE_F64LE, H5T_NATIVE_DOUBLE, &number);
}

void write_attribute(const Hdf5Handle& owner, const std::string& name, int number)
{
    write_attribute_value(owner, name, H5T_STD_I32LE, H5T_NATIVE_INT, &number);
}

void describe(const Hdf5Handle& array, std::string_view units, std::string_view long_name)
{
    write_attribute(array, "units", units);
    write_attribute(array, "long_name", long_name);
}

} // namespace leat::record
