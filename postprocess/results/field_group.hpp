#pragma once
#include <cstddef>
#include <string>

#include "postprocess/results/h5_handle.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {

/// Absolute name in the file of the dataset that holds one field at one time.
/// @param field "head" or "water_content"
/// @param snapshot counted from 0
std::string snapshot_name(const std::string& field, std::size_t snapshot);

/// Writes the group /fields: mesh with the soil of each cell, one dataset per field and snapshot,
/// and for each field all snapshots as one dataset (time, cell). It is the mesh's own group,
/// because readers look for the scales of a dimension beside a dataset or above it.
/// @throws std::logic_error when a snapshot does not have one value per cell
void write_field_group(hid_t file, const solver::TestRun& run, const solver::TestSetup& setup);

}  // namespace ringwright::postprocess
