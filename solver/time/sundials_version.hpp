#pragma once
#include <string>

namespace ringwright::solver {

/// Version of the time integration library, "6.4.1"; for provenance.
std::string sundials_version();

}  // namespace ringwright::solver
