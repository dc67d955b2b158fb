#include <leat/record/hdf5_mutex.hpp>
#include <leat/record/hdf5_session.hpp>

#include <utility>

namespace leat::record {

std::mutex& hdf5_mutex() noexcept
{
    static std::mutex mutex;
    return mutex;
}

Hdf5Session::Hdf5Session() : lock_(hdf5_mutex())
{
    // A host may have set its handler by either of two interfaces, and each kind can only be read by its own.
    require_success(H5Eauto_is_v2(H5E_DEFAULT, &handler_is_second_kind_), "tell its error handler");
    if (handler_is_second_kind_ != 0) {
        require_success(H5Eget_auto2(H5E_DEFAULT, &handler_, &handler_data_), "give its error handler");
    }
#ifndef H5_NO_DEPRECATED_SYMBOLS
    if (handler_is_second_kind_ == 0) {
        require_success(H5Eget_auto1(&old_handler_, &handler_data_), "give its error handler");
    }
#endif
    require_success(H5Eset_auto2(H5E_DEFAULT, nullptr, nullptr), "set its error handler");
}

Hdf5Session::~Hdf5Session()
{
#ifndef H5_NO_DEPRECATED_SYMBOLS
    if (handler_is_second_kind_ == 0) {
        H5Eset_auto1(old_handler_, handler_data_);
        return;
    }
#endif
    H5Eset_auto2(H5E_DEFAULT, handler_, handler_data_);
}

Hdf5Handle::Hdf5Handle(hid_t id, Close close, const std::string& action) : id_(id), close_(close)
{
    require_success(id, action);
}

Hdf5Handle::Hdf5Handle(Hdf5Handle&& other) noexcept
    : id_(std::exchange(other.id_, H5I_INVALID_HID)), close_(other.close_)
{
}

Hdf5Handle::~Hdf5Handle()
{
    if (id_ >= 0) {
        close_(id_);
    }
}

void require_success(long long status, const std::string& action)
{
    if (status < 0) {
        throw Hdf5Failure("HDF5 cannot " + action);
    }
}

Hdf5Handle memory_file_access()
{
    Hdf5Handle access(H5Pcreate(H5P_FILE_ACCESS), H5Pclose, "make an access list");
    constexpr std::size_t growth = std::size_t{1} << 20;
    require_success(H5Pset_fapl_core(access.id(), growth, false), "keep a file in memory");
    // Readable by every HDF5 since 1.8. Not later: the superblock of later layouts has a checksum, which is wrong in
    // the image of an open file, because its state flag is cleared without a new sum.
    require_success(H5Pset_libver_bounds(access.id(), H5F_LIBVER_EARLIEST, H5F_LIBVER_V18), "choose its layout");
    return access;
}

} // namespace leat::record
