#pragma once
/// The one door to the HDF5 library.
///
/// The library may be built without thread safety, and even where it is thread-safe its error
/// stack is easily mixed up. So every call, the closing of handles included, goes through here and
/// waits for one mutex. Calls must not be nested: the mutex is not recursive.

#include <hdf5.h>

#include <mutex>
#include <stdexcept>
#include <string>

namespace ringwright::postprocess {

/// The library refused a call.
class Hdf5Error : public std::runtime_error {
 public:
  using std::runtime_error::runtime_error;
};

/// What is held while the library is used.
class H5Access {
 public:
  H5Access();
  H5Access(const H5Access&) = delete;
  H5Access& operator=(const H5Access&) = delete;
  ~H5Access();

  /// The innermost message of the library's error stack.
  static std::string message();

 private:
  static std::mutex& mutex();

  std::lock_guard<std::mutex> lock_;
  H5E_auto2_t printer_ = nullptr;  ///< the library prints errors on stderr unless told not to
  void* printer_data_ = nullptr;
};

/// Makes one call, or several that belong together, and gives back what it gives.
/// @param what for the message: "create dataset head"
/// @throws Hdf5Error when the result is negative
template <typename Call>
auto h5_call(const std::string& what, Call&& call) {
  const H5Access access;
  const auto result = call();
  if (result < 0) throw Hdf5Error("HDF5 could not " + what + ": " + H5Access::message());
  return result;
}

}  // namespace ringwright::postprocess
