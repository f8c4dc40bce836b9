#pragma once
/// Reads result files back through the HDF5 C library, independent of how they were written.

#include <hdf5.h>
#include <hdf5_hl.h>

#include <filesystem>
#include <stdexcept>
#include <string>
#include <vector>

#include "postprocess/results/h5_handle.hpp"

namespace ringwright::tests {

class H5Reader {
 public:
  explicit H5Reader(const std::filesystem::path& file)
      : file_(postprocess::h5_open("open " + file.string(), H5Fclose, [&] {
          return H5Fopen(file.c_str(), H5F_ACC_RDONLY, H5P_DEFAULT);
        })) {}

  hid_t id() const { return file_.id(); }

  postprocess::H5Handle object(const std::string& name) const {
    return postprocess::h5_open("open " + name, H5Oclose,
                                [&] { return H5Oopen(id(), name.c_str(), H5P_DEFAULT); });
  }

  std::vector<hsize_t> extent(const std::string& name) const {
    const auto dataset = object(name);
    const auto space = space_of(dataset);
    std::vector<hsize_t> found(static_cast<std::size_t>(H5Sget_simple_extent_ndims(space.id())));
    H5Sget_simple_extent_dims(space.id(), found.data(), nullptr);
    return found;
  }

  std::vector<double> doubles(const std::string& name) const {
    return read<double>(name, H5T_NATIVE_DOUBLE);
  }
  std::vector<int> ints(const std::string& name) const { return read<int>(name, H5T_NATIVE_INT); }

  std::string text(const std::string& name) const {
    const auto dataset = object(name);
    const auto type = utf8();
    char* found = nullptr;
    if (H5Dread(dataset.id(), type.id(), H5S_ALL, H5S_ALL, H5P_DEFAULT, &found) < 0) {
      throw std::runtime_error("cannot read " + name);
    }
    return taken(found);
  }

  /// A list of texts.
  std::vector<std::string> texts(const std::string& name) const {
    const auto dataset = object(name);
    const auto type = utf8();
    const auto space = space_of(dataset);
    std::vector<char*> found(static_cast<std::size_t>(H5Sget_simple_extent_npoints(space.id())));
    if (H5Dread(dataset.id(), type.id(), H5S_ALL, H5S_ALL, H5P_DEFAULT, found.data()) < 0) {
      throw std::runtime_error("cannot read " + name);
    }
    std::vector<std::string> copies;
    for (char* text : found) copies.push_back(taken(text));
    return copies;
  }

  /// A text attribute of an object; checks that it is of variable length and UTF-8.
  std::string attribute(const std::string& object_name, const std::string& name) const {
    const postprocess::H5Handle found = open_attribute(object_name, name);
    const postprocess::H5Handle type(H5Aget_type(found.id()), H5Tclose);
    if (H5Tis_variable_str(type.id()) <= 0 || H5Tget_cset(type.id()) != H5T_CSET_UTF8) {
      throw std::runtime_error(object_name + "@" + name + " is no variable-length UTF-8 text");
    }
    char* value = nullptr;
    H5Aread(found.id(), type.id(), &value);
    return taken(value);
  }

  long long number_attribute(const std::string& object_name, const std::string& name) const {
    const postprocess::H5Handle found = open_attribute(object_name, name);
    long long value = 0;
    H5Aread(found.id(), H5T_NATIVE_LLONG, &value);
    return value;
  }

  /// Absolute names of everything below the root, in alphabetical order.
  std::vector<std::string> names(H5O_type_t kind) const {
    Visit visit{kind, {}};
    H5Ovisit2(id(), H5_INDEX_NAME, H5_ITER_INC, &collect, &visit, H5O_INFO_BASIC);
    return visit.found;
  }

  /// Names of a group's links in the order of their creation.
  std::vector<std::string> created_order(const std::string& group) const {
    std::vector<std::string> found;
    const auto opened = object(group);
    postprocess::h5_call("list " + group, [&] {
      return H5Literate(opened.id(), H5_INDEX_CRT_ORDER, H5_ITER_INC, nullptr, &keep_name, &found);
    });
    return found;
  }

 private:
  struct Visit {
    H5O_type_t kind;
    std::vector<std::string> found;
  };

  static herr_t collect(hid_t, const char* name, const H5O_info_t* info, void* data) {
    auto& visit = *static_cast<Visit*>(data);
    if (info->type == visit.kind && name[0] != '.') visit.found.push_back("/" + std::string(name));
    return 0;
  }

  static herr_t keep_name(hid_t, const char* name, const H5L_info_t*, void* data) {
    static_cast<std::vector<std::string>*>(data)->push_back(name);
    return 0;
  }

  static postprocess::H5Handle utf8() {
    postprocess::H5Handle type(H5Tcopy(H5T_C_S1), H5Tclose);
    H5Tset_size(type.id(), H5T_VARIABLE);
    H5Tset_cset(type.id(), H5T_CSET_UTF8);
    return type;
  }

  static postprocess::H5Handle space_of(const postprocess::H5Handle& dataset) {
    return {H5Dget_space(dataset.id()), H5Sclose};
  }

  static std::string taken(char* text) {
    const std::string copy = text == nullptr ? "" : text;
    H5free_memory(text);
    return copy;
  }

  postprocess::H5Handle open_attribute(const std::string& object_name,
                                       const std::string& name) const {
    return postprocess::h5_open("open " + object_name + "@" + name, H5Aclose, [&] {
      return H5Aopen_by_name(id(), object_name.c_str(), name.c_str(), H5P_DEFAULT, H5P_DEFAULT);
    });
  }

  template <typename Value>
  std::vector<Value> read(const std::string& name, hid_t type) const {
    const auto dataset = object(name);
    const auto space = space_of(dataset);
    std::vector<Value> found(static_cast<std::size_t>(H5Sget_simple_extent_npoints(space.id())));
    postprocess::h5_call("read " + name, [&] {
      return H5Dread(dataset.id(), type, H5S_ALL, H5S_ALL, H5P_DEFAULT, found.data());
    });
    return found;
  }

  postprocess::H5Handle file_;
};

}  // namespace ringwright::tests
