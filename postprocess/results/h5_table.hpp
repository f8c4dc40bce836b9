#pragma once
#include <string>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/h5_write.hpp"

namespace ringwright::postprocess {

/// A group of columns that share one dimension: time, or a count.
template <typename Row>
class Table {
 public:
  /// Rows that have a time each.
  Table(hid_t file, const std::string& name, const std::vector<Row>& rows)
      : group_(create_group(file, name)),
        rows_(rows),
        scale_(write_array(group_.id(), "time", values([](const Row& row) { return row.time; }),
                           {rows.size()}, {"s", "time since ponding"})) {
    make_scale(scale_, "time");
  }
  /// Rows that are counted from 0.
  /// @param dimension name of the count @param long_name what is counted
  Table(hid_t file, const std::string& name, const std::vector<Row>& rows,
        const std::string& dimension, const std::string& long_name)
      : group_(create_group(file, name)),
        rows_(rows),
        scale_(write_index(group_.id(), dimension, rows.size(), long_name)) {}

  /// @param of the value of a row
  template <typename Of>
  void column(const std::string& name, const Label& label, Of of) const {
    attach_scales(write_array(group_.id(), name, values(of), {rows_.size()}, label), {&scale_});
  }

  /// @param of the Figure of a row; the error goes into a column of its own
  template <typename Of>
  void figure(const std::string& name, const Label& label, Of of) const {
    column(name, label, [&](const Row& row) { return of(row).value; });
    column(name + "_error", {label.units, "numerical error of: " + label.long_name},
           [&](const Row& row) { return of(row).error; });
  }

  /// @param of true or false for a row
  template <typename Of>
  void marks(const std::string& name, const std::string& long_name, Of of) const {
    counts(name, long_name, [&](const Row& row) { return of(row) ? 1 : 0; });
  }

  /// @param of the whole number of a row
  template <typename Of>
  void counts(const std::string& name, const std::string& long_name, Of of) const {
    std::vector<std::int32_t> numbers;
    for (const auto& row : rows_) numbers.push_back(static_cast<std::int32_t>(of(row)));
    attach_scales(write_array(group_.id(), name, numbers, {numbers.size()}, {"1", long_name}),
                  {&scale_});
  }

  /// @param of the text of a row
  template <typename Of>
  void texts(const std::string& name, const std::string& long_name, Of of) const {
    std::vector<std::string> found;
    for (const auto& row : rows_) found.emplace_back(of(row));
    attach_scales(write_texts(group_.id(), name, found, long_name), {&scale_});
  }

 private:
  template <typename Of>
  std::vector<double> values(Of of) const {
    std::vector<double> found;
    for (const auto& row : rows_) found.push_back(of(row));
    return found;
  }

  H5Handle group_;
  const std::vector<Row>& rows_;
  H5Handle scale_;
};

}  // namespace ringwright::postprocess
