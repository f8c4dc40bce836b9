#pragma once
#include <filesystem>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::postprocess {

/// Where the results of one answer are.
struct ResultFiles {
  std::filesystem::path fields;   ///< fields.h5
  std::filesystem::path picture;  ///< fields.xdmf
  std::filesystem::path record;   ///< record.csv
  std::filesystem::path answer;   ///< answer.json
};

/// Writes the result files of one answer, laid out as LAYOUT.md says; older ones are replaced.
///
/// All four are complete on the disk before the first gets its name: either all are new, or, when
/// the disk is full or the folder read-only, all are as before.
/// @param folder made if it is missing and its parent exists
/// @throws ResultFileError when a file or the folder cannot be written
/// @throws std::logic_error when the answer's fields do not fit its mesh
ResultFiles write_results(const std::filesystem::path& folder, const Answer& answer,
                          const Provenance& provenance);

}  // namespace ringwright::postprocess
