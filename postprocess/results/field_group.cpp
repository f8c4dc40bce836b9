#include "postprocess/results/field_group.hpp"

#include <fmt/format.h>

#include <vector>

#include "postprocess/results/h5_write.hpp"
#include "solver/mesh/ring_soils.hpp"

namespace ringwright::postprocess {
namespace {

using solver::Drawing;
using solver::Snapshot;
using Field = std::vector<double> Snapshot::*;

template <typename Value, typename Rows>
std::vector<Value> flat(const Rows& rows) {
  std::vector<Value> values;
  for (const auto& row : rows) values.insert(values.end(), row.begin(), row.end());
  return values;
}

std::vector<double> coordinate(const Drawing& drawing, std::size_t axis) {
  std::vector<double> values;
  for (const auto& centre : drawing.centres) values.push_back(centre.at(axis));
  return values;
}

void write_points(hid_t group, const Drawing& drawing) {
  const auto point = write_index(group, "point", drawing.points.size(), "point of the mesh");
  const auto axis = write_index(group, "axis", 2, "0: radius r, 1: elevation z");
  const auto points =
      write_array(group, "points", flat<double>(drawing.points), {drawing.points.size(), 2},
                  {"m", "radius and elevation of the points, soil surface at 0"});
  attach_scales(points, {&point, &axis});
}

void write_cells(hid_t group, const Drawing& drawing, const H5Handle& cell) {
  const auto corner = write_index(group, "corner", 4, "corner of a cell, counter-clockwise");
  const auto cells = write_array(group, "cells", flat<std::int32_t>(drawing.cells),
                                 {drawing.cells.size(), 4}, {"1", "corner points of the cells"});
  attach_scales(cells, {&cell, &corner});
  const Extent extent = {drawing.cells.size()};
  attach_scales(write_array(group, "centre_r", coordinate(drawing, 0), extent,
                            {"m", "radius of the cell centre"}),
                {&cell});
  attach_scales(write_array(group, "centre_z", coordinate(drawing, 1), extent,
                            {"m", "elevation of the cell centre, soil surface at 0"}),
                {&cell});
}

void write_soils(hid_t group, const Drawing& drawing, const solver::TestSetup& setup,
                 const H5Handle& cell) {
  std::vector<std::int32_t> soils;
  for (const auto& centre : drawing.centres)
    soils.push_back(solver::soil_at(setup, centre[0], -centre[1]));
  attach_scales(write_array(group, "soil", soils, {drawing.cells.size()},
                            {"1", "soil index, 0: the uppermost layer, then downwards"}),
                {&cell});
}

std::vector<double> times_of(const std::vector<Snapshot>& snapshots) {
  std::vector<double> times;
  for (const auto& snapshot : snapshots) times.push_back(snapshot.time);
  return times;
}

/// The base of an absolute name.
std::string base_of(const std::string& name) { return name.substr(name.rfind('/') + 1); }

void write_field(hid_t group, hid_t snapshots_group, const std::vector<Snapshot>& snapshots,
                 const std::string& name, Field field, const Label& label, const H5Handle& time,
                 const H5Handle& cell, hsize_t cells) {
  std::vector<std::string> rows;
  for (std::size_t i = 0; i < snapshots.size(); ++i) {
    rows.push_back(snapshot_name(name, i));
    const Label row_label = {label.units,
                             fmt::format("{} at {} s", label.long_name, snapshots[i].time)};
    attach_scales(
        write_array(snapshots_group, base_of(rows.back()), snapshots[i].*field, {cells}, row_label),
        {&cell});
  }
  const auto stack = write_stack(group, name, rows, cells, label);
  write_attribute(stack.id(), "coordinates", "centre_r centre_z");
  attach_scales(stack, {&time, &cell});
}

}  // namespace

std::string snapshot_name(const std::string& field, std::size_t snapshot) {
  return fmt::format("/fields/snapshots/{}_{:04}", field, snapshot);
}

void write_field_group(hid_t file, const solver::TestRun& run, const solver::TestSetup& setup) {
  const auto group = create_group(file, "fields");
  const hsize_t cells = run.drawing.cells.size();
  const auto time = write_array(group.id(), "time", times_of(run.snapshots), {run.snapshots.size()},
                                {"s", "time since ponding"});
  make_scale(time, "time");
  const auto cell = write_index(group.id(), "cell", cells, "cell of the mesh");
  write_points(group.id(), run.drawing);
  write_cells(group.id(), run.drawing, cell);
  write_soils(group.id(), run.drawing, setup, cell);
  const auto snapshots = create_group(group.id(), "snapshots");
  write_field(group.id(), snapshots.id(), run.snapshots, "head", &Snapshot::head,
              {"m", "pressure head"}, time, cell, cells);
  write_field(group.id(), snapshots.id(), run.snapshots, "water_content", &Snapshot::water_content,
              {"1", "volumetric water content"}, time, cell, cells);
}

}  // namespace ringwright::postprocess
