#pragma once
/// The few ways in which a result file is written: groups, labelled datasets, attributes and
/// dimension scales. All of them keep the order of creation and no object times, so that the same
/// content gives the same bytes. All throw Hdf5Error when the library refuses.

#include <cstdint>
#include <span>
#include <string>
#include <utility>
#include <vector>

#include "postprocess/results/h5_handle.hpp"

namespace ringwright::postprocess {

/// What every dataset carries as attributes.
struct Label {
  std::string units;      ///< as units libraries read it; "1" without dimension, "" for text
  std::string long_name;  ///< for axes and legends
};

using Extent = std::vector<hsize_t>;  ///< length of each dimension

H5Handle create_group(hid_t parent, const std::string& name);

/// Variable-length UTF-8.
void write_attribute(hid_t object, const std::string& name, const std::string& text);
void write_attribute(hid_t object, const std::string& name, std::int64_t number);

/// @throws std::logic_error when the extent does not hold exactly these values
H5Handle write_array(hid_t parent, const std::string& name, std::span<const double> values,
                     const Extent& extent, const Label& label);
H5Handle write_array(hid_t parent, const std::string& name, std::span<const std::int32_t> values,
                     const Extent& extent, const Label& label);

void write_scalar(hid_t parent, const std::string& name, double value, const Label& label);
void write_scalar(hid_t parent, const std::string& name, std::int64_t value, const Label& label);
/// Variable-length UTF-8; the text ends at its first NUL.
void write_text(hid_t parent, const std::string& name, const std::string& text,
                const std::string& long_name);

/// A list of texts of that kind.
H5Handle write_texts(hid_t parent, const std::string& name, const std::vector<std::string>& texts,
                     const std::string& long_name);

/// One dataset (row, value) that shows other datasets of the same file as its rows.
/// @param rows absolute names of datasets of extent (length), existing or not
H5Handle write_stack(hid_t parent, const std::string& name, const std::vector<std::string>& rows,
                     hsize_t length, const Label& label);

/// Makes a dataset the scale of a dimension.
void make_scale(const H5Handle& dataset, const std::string& name);
/// Names the scale of each dimension of a dataset, in order.
void attach_scales(const H5Handle& dataset, const std::vector<const H5Handle*>& scales);

/// The scale 0, 1, 2 ... of a dimension that is only counted.
H5Handle write_index(hid_t parent, const std::string& name, std::size_t length,
                     const std::string& long_name);

}  // namespace ringwright::postprocess
