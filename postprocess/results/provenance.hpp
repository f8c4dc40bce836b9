#pragma once
/// Where a result comes from: enough to make it again and to see that it is the same.
///
/// Nothing here looks at a clock, a host or a user: two results of one case by one program are
/// equal byte for byte. A date gets in only when the caller gives one.

#include <nlohmann/json.hpp>
#include <optional>
#include <string>
#include <vector>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

struct NamedVersion {
  std::string name;
  std::string version;
};

/// What only the caller knows.
struct Origin {
  std::string program_version;
  std::string case_text;                  ///< as read, byte for byte
  nlohmann::json resolved_case;           ///< every value in SI, defaults filled in
  std::vector<NamedVersion> libraries;    ///< those of the other floors
  std::optional<std::string> written_at;  ///< date and time if wanted; none: left out
};

struct MeshSizes {
  int cells = 0;
  int points = 0;
  double domain_radius = 0.0;  ///< [m]
  double domain_depth = 0.0;   ///< [m]
};

struct Provenance {
  std::string program_version;
  std::string case_text;
  std::string case_sha256;              ///< of case_text, 64 hexadecimal digits
  nlohmann::json resolved_case;         ///< SI
  std::vector<NamedVersion> libraries;  ///< those of Origin, then those used here
  std::string compiler;
  MeshSizes mesh;                                ///< of the finest run
  double accuracy = 0.0;                         ///< asked for, relative [-]
  std::optional<solver::Resolution> resolution;  ///< of the finest run, when the answer names it
  solver::RunStatistics statistics;              ///< of the finest run
  long total_steps = 0;                          ///< over all companion runs
  std::optional<std::string> written_at;
};

/// Adds to the origin what the answer and this build know.
/// @throws std::runtime_error when the hash cannot be made
Provenance provenance_of(const Origin& origin, const Answer& answer);

/// All of it; values with a unit as {"value", "unit"}.
nlohmann::json to_json(const Provenance& provenance);

}  // namespace ringwright::postprocess
