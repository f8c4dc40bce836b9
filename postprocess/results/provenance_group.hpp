#pragma once
#include "postprocess/results/h5_handle.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::postprocess {

/// /provenance: texts and versions, and what belongs together as JSON.
void write_provenance_group(hid_t file, const Provenance& provenance);

}  // namespace ringwright::postprocess
