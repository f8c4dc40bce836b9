#pragma once
/// A YAML text as a tree in which every value knows its place.
///
/// Built from the events of the YAML library rather than from its own nodes, because those keep
/// duplicate keys silently, convert quoted numbers, take `yes` and `on` for true, `010` for 8,
/// accept `.nan`, count from zero, ignore further documents and leave merge keys unapplied.
/// Here nothing is converted: a scalar stays text; what could be misread is refused.

#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "cases/input/diagnostic.hpp"

namespace ringwright::cases {

struct LocatedNode {
  enum class Kind { empty, scalar, list, map };
  using Entry = std::pair<LocatedNode, LocatedNode>;  ///< key (a scalar) and value

  Kind kind = Kind::empty;
  Place place;
  std::string text;  ///< of a scalar
  bool quoted = false;
  bool refused = false;            ///< reported already: no further word about it
  bool in_braces = false;          ///< inside { } or [ ], where a comma ends a value
  std::vector<LocatedNode> items;  ///< of a list
  std::vector<Entry> entries;      ///< of a map, in the order of the file
};

/// Parses `text`; what is wrong is appended to `problems`, and the tree holds what could be read
/// (the first of duplicate keys). After a syntax error the tree is an empty node.
LocatedNode parse_yaml(std::string_view text, std::vector<Diagnostic>& problems);

}  // namespace ringwright::cases
