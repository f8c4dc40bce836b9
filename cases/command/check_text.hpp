#pragma once
#include <string>

#include "cases/input/case.hpp"

namespace ringwright::cases {

/// What `simulate` would do with a case: the tests and soils as understood, in other units too;
/// what is assumed and where it could be given; roughly how long it takes.
std::string check_text(const Case& what);

/// Rough duration of all its virtual tests on one processor [s].
double rough_duration(const Case& what);

}  // namespace ringwright::cases
