#pragma once
#include <string>

#include "postprocess/results/h5_handle.hpp"

namespace ringwright::postprocess {

/// An HDF5 file that exists in memory only, to be handed over whole once it is closed.
///
/// Why not on the disk: HDF5 1.10 crashes when a disk fills up under an open file (tried: the
/// second attempt to flush runs into freed memory). Why not H5Fget_file_image: in the format kept
/// here it leaves a wrong checksum in the first block of the image. So the library's own memory
/// driver writes into a buffer that stays with us when the file is closed.
class MemoryFile {
 public:
  /// @throws Hdf5Error when the library refuses
  MemoryFile();
  MemoryFile(const MemoryFile&) = delete;
  MemoryFile& operator=(const MemoryFile&) = delete;

  hid_t id() const { return file_.id(); }

  /// Closes the file and gives its bytes. Every object in it must be closed before.
  /// @throws Hdf5Error when the library refuses
  std::string close();

 private:
  std::string buffer_;  ///< declared first: the file writes into it while it is closed
  H5Handle file_;
};

}  // namespace ringwright::postprocess
