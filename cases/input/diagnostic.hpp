#pragma once
/// What is wrong with a case, where, and what to do: errors as a compiler writes them.
///
///   garden.yaml:7:3: error: ground: unknown key 'textur'
///      6 | ground:
///      7 |   textur: silt loam
///        |   ^~~~~~
///      8 |   water: 10 degC
///     hint: did you mean 'texture'?

#include <optional>
#include <stdexcept>
#include <string>
#include <vector>

namespace ringwright::cases {

/// A stretch of one line of the case text. Line and column count from 1, in characters.
struct Place {
  int line = 1;
  int column = 1;
  int length = 1;
};

struct Diagnostic {
  Place place;
  std::string message;
  std::string hint;            ///< may be empty
  std::optional<Place> other;  ///< the second place of a duplicate or contradiction
  std::string other_note;      ///< what is there, e.g. "first given here"
};

/// The case text an error points into.
struct Source {
  std::string name;  ///< file name as shown
  std::string text;
  /// Not empty when the text was composed from command-line flags: the flag behind each line,
  /// e.g. "--ring"; errors then name the flag and show no lines.
  std::vector<std::string> line_flags;
};

/// One diagnostic as text, with a newline at the end.
std::string render(const Diagnostic& diagnostic, const Source& source);

/// Everything found wrong with a case. `what()` shows the first `shown_at_most`, by line.
class CaseErrors : public std::runtime_error {
 public:
  static constexpr std::size_t shown_at_most = 20;

  CaseErrors(std::vector<Diagnostic> diagnostics, const Source& source);
  /// Sorted by place.
  const std::vector<Diagnostic>& diagnostics() const { return diagnostics_; }

 private:
  std::vector<Diagnostic> diagnostics_;
};

}  // namespace ringwright::cases
