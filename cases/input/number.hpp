#pragma once
/// Strict reading of a decimal number at the start of a text.
///
/// A YAML 1.1 reader takes `010` for 8, `1_000` for 1000, `1:30` for 90 and `.nan` for a
/// number. People mean something else, so all of these are refused here, with what to write.

#include <stdexcept>
#include <string>
#include <string_view>

namespace ringwright::cases {

/// A value that cannot be taken as written. `what()` says why, `hint()` what to write instead.
class ValueError : public std::runtime_error {
 public:
  explicit ValueError(const std::string& message, std::string hint = "")
      : std::runtime_error(message), hint_(std::move(hint)) {}
  const std::string& hint() const { return hint_; }

 private:
  std::string hint_;
};

struct ScannedNumber {
  double value = 0.0;
  std::string_view rest;  ///< what follows the number, leading blanks removed
};

/// Blanks removed at both ends.
std::string_view trimmed(std::string_view text);

/// The decimal number at the start of `text`; sign, point and exponent allowed.
/// @throws ValueError for no number, octal-looking, hexadecimal, grouped, sexagesimal,
///         not finite or too large numbers, and for a comma as decimal point
ScannedNumber scan_number(std::string_view text);

/// `text` as a number with nothing after it.
/// @throws ValueError
double read_number(std::string_view text);

}  // namespace ringwright::cases
