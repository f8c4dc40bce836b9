#include "postprocess/results/memory_file.hpp"

#include <fmt/format.h>

#include <exception>

namespace ringwright::postprocess {
namespace {

/// Growth of the buffer; the library fills the place to spare with zeros.
constexpr std::size_t step = 1 << 16;

// No exception may cross the library: a buffer that cannot grow is told as "no memory".
void* grow(void*, std::size_t size, H5FD_file_image_op_t, void* buffer) {
  try {
    auto& bytes = *static_cast<std::string*>(buffer);
    bytes.resize(size);
    return bytes.data();
  } catch (const std::exception&) {
    return nullptr;
  }
}

/// The buffer is ours and outlives the file.
herr_t keep(void*, H5FD_file_image_op_t, void*) { return 0; }
void* share(void* buffer) { return buffer; }
herr_t keep_shared(void*) { return 0; }

/// Readable by every program that knows format 1.8, and 1.10 where rows are stacked.
H5Handle memory_access(std::string& buffer) {
  auto list = h5_open("make a property list", H5Pclose, [] { return H5Pcreate(H5P_FILE_ACCESS); });
  h5_call("hold a file in memory", [&] { return H5Pset_fapl_core(list.id(), step, false); });
  H5FD_file_image_callbacks_t callbacks = {nullptr, nullptr,     grow,   keep,
                                           share,   keep_shared, &buffer};
  h5_call("hold a file in a buffer",
          [&] { return H5Pset_file_image_callbacks(list.id(), &callbacks); });
  h5_call("set the format",
          [&] { return H5Pset_libver_bounds(list.id(), H5F_LIBVER_V18, H5F_LIBVER_V110); });
  return list;
}

H5Handle file_creation() {
  auto list = h5_open("make a property list", H5Pclose, [] { return H5Pcreate(H5P_FILE_CREATE); });
  constexpr unsigned ordered = H5P_CRT_ORDER_TRACKED | H5P_CRT_ORDER_INDEXED;
  h5_call("drop object times", [&] { return H5Pset_obj_track_times(list.id(), false); });
  h5_call("keep link order", [&] { return H5Pset_link_creation_order(list.id(), ordered); });
  h5_call("keep attribute order", [&] { return H5Pset_attr_creation_order(list.id(), ordered); });
  return list;
}

H5Handle new_file(std::string& buffer) {
  const auto creation = file_creation();
  const auto access = memory_access(buffer);
  // The library knows files in memory by their name, so each needs its own; it is not in the file.
  const std::string name = fmt::format("memory {}", static_cast<const void*>(&buffer));
  return h5_open("make a file", H5Fclose, [&] {
    return H5Fcreate(name.c_str(), H5F_ACC_TRUNC, creation.id(), access.id());
  });
}

/// End of the file as its first block tells it, 8 bytes little-endian at byte 28.
/// @source HDF5 file format specification, version 3.0, superblock versions 2 and 3
std::size_t end_of_file(const std::string& bytes) {
  std::size_t end = 0;
  for (std::size_t i = 8; i-- > 0;) {
    end = end << 8 | static_cast<unsigned char>(bytes.at(28 + i));
  }
  if (end > bytes.size()) throw Hdf5Error("HDF5 left an incomplete file in memory");
  return end;
}

}  // namespace

MemoryFile::MemoryFile() : file_(new_file(buffer_)) {}

std::string MemoryFile::close() {
  file_.close("finish the file");
  buffer_.resize(end_of_file(buffer_));
  return std::move(buffer_);
}

}  // namespace ringwright::postprocess
