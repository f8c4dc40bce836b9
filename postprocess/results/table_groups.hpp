#pragma once
/// The groups of `fields.h5` that are tables over time, and the single figures.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/h5_handle.hpp"

namespace ringwright::postprocess {

/// /totals: volumes and flows of the finest run, one entry per sample.
void write_totals_group(hid_t file, const std::vector<solver::Sample>& samples);

/// /record: the readings up to the stop.
void write_record_group(hid_t file, const Answer& answer);

/// /ladder: what a crew would report if it stopped at each time; every figure with its error.
void write_ladder_group(hid_t file, const std::vector<LadderRow>& ladder);

/// /figures: the single numbers of the answer.
void write_figures_group(hid_t file, const Answer& answer);

}  // namespace ringwright::postprocess
