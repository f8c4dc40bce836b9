#pragma once
/// The commented case file that the command `new` writes.

#include <string>

namespace ringwright::cases {

/// A complete case that reads without errors; what may be left out is commented out.
std::string starter_case();

}  // namespace ringwright::cases
