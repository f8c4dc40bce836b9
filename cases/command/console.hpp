#pragma once
#include <ostream>
#include <string_view>

namespace ringwright::cases {

/// Where a command speaks: data to `out`, talk to `err`.
struct Console {
  std::ostream& out;
  std::ostream& err;
  bool redraws = false;  ///< err is a terminal that can redraw a line
  bool colour = false;   ///< err may be coloured

  /// "ringwright: error: ..." on err.
  void error(std::string_view message) const;
  /// "ringwright: warning: ..." on err.
  void warning(std::string_view message) const;
};

/// Standard output and error; no redrawing or colours where they are not a terminal, on a dumb
/// one, and no colours where NO_COLOR is set.
Console standard_console();

}  // namespace ringwright::cases
