#pragma once

#include <leat/base/error.hpp>

#include <hdf5.h>

#include <mutex>
#include <string>

namespace leat::record {

/// An HDF5 call failed. Inside the record room only: callers turn it into a FileError.
class Hdf5Failure : public Error {
public:
    using Error::Error;
};

/// Sole use of HDF5 while it lives, without its error printing; the host's error handler comes back at the end.
/// Must outlive every Hdf5Handle made under it.
class Hdf5Session {
public:
    Hdf5Session();
    ~Hdf5Session();
    Hdf5Session(const Hdf5Session&) = delete;
    Hdf5Session& operator=(const Hdf5Session&) = delete;

private:
    std::lock_guard<std::mutex> lock_;
    unsigned handler_is_second_kind_ = 1; ///< H5E_auto2_t, not the older H5E_auto1_t
    H5E_auto2_t handler_ = nullptr;
#ifndef H5_NO_DEPRECATED_SYMBOLS
    H5E_auto1_t old_handler_ = nullptr;
#endif
    void* handler_data_ = nullptr;
};

/// Owns one HDF5 identifier.
class Hdf5Handle {
public:
    using Close = herr_t (*)(hid_t);

    /// Takes what an HDF5 call returned; throws Hdf5Failure "HDF5 cannot `action`" when it is an error.
    Hdf5Handle(hid_t id, Close close, const std::string& action);
    Hdf5Handle(Hdf5Handle&& other) noexcept;
    Hdf5Handle& operator=(Hdf5Handle&&) = delete;
    ~Hdf5Handle();
    hid_t id() const noexcept { return id_; }

private:
    hid_t id_;
    Close close_;
};

/// Throws Hdf5Failure "HDF5 cannot `action`" when `status`, returned by an HDF5 call, is an error.
void require_success(long long status, const std::string& action);

/// An access list for files that live in memory only. HDF5 looks for a file of the name it is given even then;
/// memory_file_name cannot exist.
Hdf5Handle memory_file_access();
inline constexpr const char* memory_file_name = "/dev/null/leat-result";

} // namespace leat::record
