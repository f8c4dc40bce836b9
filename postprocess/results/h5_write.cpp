#include "postprocess/results/h5_write.hpp"

#include <hdf5_hl.h>

#include <functional>
#include <numeric>
#include <stdexcept>

namespace ringwright::postprocess {
namespace {

H5Handle property_list(hid_t kind) {
  return h5_open("make a property list", H5Pclose, [&] { return H5Pcreate(kind); });
}

H5Handle dataset_properties() {
  auto list = property_list(H5P_DATASET_CREATE);
  h5_call("drop object times", [&] { return H5Pset_obj_track_times(list.id(), false); });
  h5_call("keep attribute order", [&] {
    return H5Pset_attr_creation_order(list.id(), H5P_CRT_ORDER_TRACKED | H5P_CRT_ORDER_INDEXED);
  });
  return list;
}

H5Handle space_of(const Extent& extent) {
  return h5_open("make a dataspace", H5Sclose, [&] {
    if (extent.empty()) return H5Screate(H5S_SCALAR);
    return H5Screate_simple(static_cast<int>(extent.size()), extent.data(), nullptr);
  });
}

H5Handle text_type() {
  auto type = h5_open("make a text type", H5Tclose, [] { return H5Tcopy(H5T_C_S1); });
  h5_call("make text of any length", [&] { return H5Tset_size(type.id(), H5T_VARIABLE); });
  h5_call("make text UTF-8", [&] { return H5Tset_cset(type.id(), H5T_CSET_UTF8); });
  return type;
}

/// @param type in the file, and in memory where it has the machine's form
void put_attribute(hid_t object, const std::string& name, hid_t type, hid_t memory_type,
                   const void* value) {
  const auto space = space_of({});
  const auto attribute = h5_open("create attribute " + name, H5Aclose, [&] {
    return H5Acreate2(object, name.c_str(), type, space.id(), H5P_DEFAULT, H5P_DEFAULT);
  });
  h5_call("write attribute " + name, [&] { return H5Awrite(attribute.id(), memory_type, value); });
}

void put_label(const H5Handle& dataset, const Label& label) {
  write_attribute(dataset.id(), "units", label.units);
  write_attribute(dataset.id(), "long_name", label.long_name);
}

H5Handle create_dataset(hid_t parent, const std::string& name, hid_t type, const H5Handle& space,
                        const H5Handle& properties) {
  return h5_open("create dataset " + name, H5Dclose, [&] {
    return H5Dcreate2(parent, name.c_str(), type, space.id(), H5P_DEFAULT, properties.id(),
                      H5P_DEFAULT);
  });
}

/// Any values with the types they have in the file and in memory.
struct Values {
  hid_t file_type;
  hid_t memory_type;
  const void* data;
};

H5Handle put_dataset(hid_t parent, const std::string& name, const Values& values,
                     const Extent& extent, const Label& label) {
  auto dataset =
      create_dataset(parent, name, values.file_type, space_of(extent), dataset_properties());
  h5_call("write dataset " + name, [&] {
    return H5Dwrite(dataset.id(), values.memory_type, H5S_ALL, H5S_ALL, H5P_DEFAULT, values.data);
  });
  put_label(dataset, label);
  return dataset;
}

void expect_extent(const std::string& name, std::size_t count, const Extent& extent) {
  const auto room = std::accumulate(extent.begin(), extent.end(), hsize_t{1}, std::multiplies<>());
  if (room != count) {
    throw std::logic_error("dataset " + name + ": " + std::to_string(count) + " values for " +
                           std::to_string(room) + " places");
  }
}

}  // namespace

H5Handle create_group(hid_t parent, const std::string& name) {
  const auto list = property_list(H5P_GROUP_CREATE);
  constexpr unsigned ordered = H5P_CRT_ORDER_TRACKED | H5P_CRT_ORDER_INDEXED;
  h5_call("drop object times", [&] { return H5Pset_obj_track_times(list.id(), false); });
  h5_call("keep link order", [&] { return H5Pset_link_creation_order(list.id(), ordered); });
  h5_call("keep attribute order", [&] { return H5Pset_attr_creation_order(list.id(), ordered); });
  return h5_open("create group " + name, H5Gclose, [&] {
    return H5Gcreate2(parent, name.c_str(), H5P_DEFAULT, list.id(), H5P_DEFAULT);
  });
}

void write_attribute(hid_t object, const std::string& name, const std::string& text) {
  const auto type = text_type();
  const char* start = text.c_str();
  put_attribute(object, name, type.id(), type.id(), &start);
}

void write_attribute(hid_t object, const std::string& name, std::int64_t number) {
  put_attribute(object, name, H5T_STD_I64LE, H5T_NATIVE_INT64, &number);
}

H5Handle write_array(hid_t parent, const std::string& name, std::span<const double> values,
                     const Extent& extent, const Label& label) {
  expect_extent(name, values.size(), extent);
  return put_dataset(parent, name, {H5T_IEEE_F64LE, H5T_NATIVE_DOUBLE, values.data()}, extent,
                     label);
}

H5Handle write_array(hid_t parent, const std::string& name, std::span<const std::int32_t> values,
                     const Extent& extent, const Label& label) {
  expect_extent(name, values.size(), extent);
  return put_dataset(parent, name, {H5T_STD_I32LE, H5T_NATIVE_INT32, values.data()}, extent, label);
}

void write_scalar(hid_t parent, const std::string& name, double value, const Label& label) {
  put_dataset(parent, name, {H5T_IEEE_F64LE, H5T_NATIVE_DOUBLE, &value}, {}, label);
}

void write_scalar(hid_t parent, const std::string& name, std::int64_t value, const Label& label) {
  put_dataset(parent, name, {H5T_STD_I64LE, H5T_NATIVE_INT64, &value}, {}, label);
}

void write_text(hid_t parent, const std::string& name, const std::string& text,
                const std::string& long_name) {
  const auto type = text_type();
  const char* start = text.c_str();
  put_dataset(parent, name, {type.id(), type.id(), &start}, {}, {"", long_name});
}

H5Handle write_texts(hid_t parent, const std::string& name, const std::vector<std::string>& texts,
                     const std::string& long_name) {
  const auto type = text_type();
  std::vector<const char*> starts;
  for (const std::string& text : texts) starts.push_back(text.c_str());
  return put_dataset(parent, name, {type.id(), type.id(), starts.data()}, {texts.size()},
                     {"", long_name});
}

H5Handle write_stack(hid_t parent, const std::string& name, const std::vector<std::string>& rows,
                     hsize_t length, const Label& label) {
  const auto space = space_of({rows.size(), length});
  const auto row_space = space_of({length});
  const auto properties = dataset_properties();
  for (hsize_t i = 0; i < rows.size() && length > 0; ++i) {
    const hsize_t start[] = {i, 0};
    const hsize_t count[] = {1, length};
    h5_call("select a row of " + name, [&] {
      return H5Sselect_hyperslab(space.id(), H5S_SELECT_SET, start, nullptr, count, nullptr);
    });
    h5_call("map a row of " + name, [&] {
      return H5Pset_virtual(properties.id(), space.id(), ".", rows[i].c_str(), row_space.id());
    });
  }
  h5_call("select all of " + name, [&] { return H5Sselect_all(space.id()); });
  auto dataset = create_dataset(parent, name, H5T_IEEE_F64LE, space, properties);
  put_label(dataset, label);
  return dataset;
}

void make_scale(const H5Handle& dataset, const std::string& name) {
  h5_call("make a scale of " + name, [&] { return H5DSset_scale(dataset.id(), name.c_str()); });
}

void attach_scales(const H5Handle& dataset, const std::vector<const H5Handle*>& scales) {
  for (unsigned i = 0; i < scales.size(); ++i) {
    h5_call("attach a scale", [&] { return H5DSattach_scale(dataset.id(), scales[i]->id(), i); });
  }
}

H5Handle write_index(hid_t parent, const std::string& name, std::size_t length,
                     const std::string& long_name) {
  std::vector<std::int32_t> numbers(length);
  std::iota(numbers.begin(), numbers.end(), 0);
  auto index = write_array(parent, name, numbers, {length}, {"1", long_name});
  make_scale(index, name);
  return index;
}

}  // namespace ringwright::postprocess
