#pragma once
#include <string>

#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {

/// The text of `fields.xdmf`, which lets general viewers open `fields.h5` as a time series of quads
/// in the plane (r, z) with head [m] and water content [-] per cell. It names the file beside it by
/// its base name, so that the two can be moved together.
/// @param fields base name of the HDF5 file
/// @source XDMF model and format, version 3
std::string fields_xdmf(const solver::TestRun& run, const std::string& fields);

}  // namespace ringwright::postprocess
