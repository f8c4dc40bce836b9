#pragma once
#include <string>
#include <utility>

#include "postprocess/results/h5_call.hpp"

namespace ringwright::postprocess {

/// Owns one object of the HDF5 library and closes it.
class H5Handle {
 public:
  using Closer = herr_t (*)(hid_t);

  H5Handle(hid_t id, Closer closer) : id_(id), closer_(closer) {}
  H5Handle(const H5Handle&) = delete;
  H5Handle& operator=(const H5Handle&) = delete;
  H5Handle(H5Handle&& other) noexcept
      : id_(std::exchange(other.id_, H5I_INVALID_HID)), closer_(other.closer_) {}
  H5Handle& operator=(H5Handle&&) = delete;
  ~H5Handle() {
    if (id_ < 0) return;
    const H5Access access;
    closer_(id_);
  }

  hid_t id() const { return id_; }

  /// Closes it now, where a failure must be heard of.
  /// @throws Hdf5Error when the library refuses
  void close(const std::string& what) {
    h5_call(what, [&] { return closer_(std::exchange(id_, H5I_INVALID_HID)); });
  }

 private:
  hid_t id_;
  Closer closer_;
};

/// Makes the call and owns what it opens.
/// @throws Hdf5Error when nothing was opened
template <typename Call>
H5Handle h5_open(const std::string& what, H5Handle::Closer closer, Call&& call) {
  return {h5_call(what, std::forward<Call>(call)), closer};
}

}  // namespace ringwright::postprocess
