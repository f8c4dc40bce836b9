#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::postprocess {

/// The bytes of `fields.h5`: mesh and fields of the finest run, totals, record, ladder, figures and
/// provenance, laid out as LAYOUT.md says.
///
/// The file is built in memory (memory_file.hpp says why) and costs about the size of the fields
/// once more.
/// @throws Hdf5Error when the library refuses
/// @throws std::logic_error when a field does not fit the mesh
std::string fields_file(const Answer& answer, const Provenance& provenance);

}  // namespace ringwright::postprocess
