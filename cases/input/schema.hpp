#pragma once
/// The grammar of case files, declared once as data.
///
/// The reader takes from it which keys may stand where, of what kind and in what range they are,
/// and what to suggest; the JSON Schema for editors is generated from it (json_schema.hpp). A
/// key that is added here exists; one that is not here is an error in a case file.

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "cases/input/units.hpp"

namespace ringwright::cases {

enum class ValueKind {
  version,   ///< the whole number 1
  text,      ///< any words
  phrase,    ///< words with a small grammar of their own, told by the examples
  choice,    ///< one of `choices`
  number,    ///< without a unit
  quantity,  ///< with a unit of `dimension`
  section,   ///< keys of its own
  sections,  ///< a list of sections of the same keys; a phrase may stand for one where the key has
             ///< examples of it, and one alone needs no list
  phrases    ///< a phrase or a list of them
};

/// Allowed values in SI, both ends included unless said otherwise.
struct Range {
  double least;
  double most;
  std::string words;           ///< as told to the user, "2 cm to 4 m"
  bool without_least = false;  ///< the lower end itself is not allowed
};

struct Key {
  std::string name = {};
  ValueKind kind = ValueKind::text;
  /// Other words people use for it, lower case; not read, but answered with the right one.
  std::vector<std::string> also_called = {};
  std::string meaning = {};  ///< one sentence
  std::vector<std::string> examples = {};
  Dimension dimension = Dimension::fraction;
  std::optional<Range> range = {};
  bool required = false;
  /// Of a required key: others that may stand in its place.
  std::vector<std::string> or_else = {};
  std::vector<std::string> choices = {};
  std::vector<Key> keys = {};  ///< of a section, or of each of several
  /// Of a section: keys not in `keys` are names the user chooses, each for a section of these.
  std::vector<Key> named = {};

  /// The key of that name, or null.
  const Key* find(std::string_view key_name) const;
};

/// The whole case file, a section.
Key case_file_grammar();

}  // namespace ringwright::cases
