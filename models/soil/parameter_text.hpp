#pragma once
#include <string>

namespace ringwright::models {

/// A number for provenance lines: the shortest digits that read back as the same double,
/// the same in every locale.
std::string parameter_text(double value);

}  // namespace ringwright::models
