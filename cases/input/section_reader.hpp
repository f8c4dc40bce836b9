#pragma once
/// One section of a case file against its grammar: unknown keys, kinds, ranges.

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "cases/input/case.hpp"
#include "cases/input/located_yaml.hpp"
#include "cases/input/schema.hpp"
#include "cases/input/units.hpp"

namespace ringwright::cases {

/// What all parts of one reading share.
struct Reading {
  Units units;
  std::vector<Diagnostic> problems;
  std::vector<Assumption> assumed;
  std::vector<Assumption> warnings;
  bool from_flags = false;  ///< errors name flags, not paths

  /// Said once, however often it is found.
  void problem(const Place& place, std::string message, std::string hint = "");
  /// Two places that cannot both hold. @param other_note what is at the second place
  void contradiction(const Place& place, std::string message, const Place& other,
                     std::string other_note, std::string hint = "");
  void assume(std::string key, std::string text);
  /// What can be done as it is written but is hardly meant.
  void warn(std::string key, std::string text);

 private:
  void add(Diagnostic diagnostic);
};

class SectionReader {
 public:
  /// Reports unknown keys and missing ones. `node` may be anything: what is not a section is
  /// reported and read as an empty one.
  /// @param keys the grammar of its keys; must outlive the reader
  /// @param path dotted, empty for the whole file; @param where the key of the section
  /// @param open keys not in the grammar are names and left alone
  SectionReader(const LocatedNode& node, const std::vector<Key>& keys, std::string path,
                const Place& where, Reading& reading, bool open = false);

  /// Not a block of keys at all, which has been reported.
  bool is_broken() const { return broken_; }
  bool has(std::string_view key) const { return value_of(key) != nullptr; }
  /// Where the key stands; call only if has(key).
  Place key_place(std::string_view key) const;
  Place value_place(std::string_view key) const;
  /// "ground.water"
  std::string path_of(std::string_view key) const;
  /// "ground.water: ", the start of a message; empty when errors name flags.
  std::string front_of(std::string_view key) const;
  /// The same for the section itself: "ground: ".
  std::string front() const;

  /// Value of a quantity or number in SI and in range; none if absent or reported as wrong.
  std::optional<double> quantity(std::string_view key) const;
  /// Text of a text, phrase or choice (a choice as the grammar spells it).
  std::optional<std::string> text(std::string_view key) const;
  /// The node of a section; null if absent.
  const LocatedNode* section(std::string_view key) const { return value_of(key); }
  /// A reader of a section that is there.
  SectionReader subsection(std::string_view key) const;
  /// The items of a list, or the value itself where it is none; empty if absent or reported.
  std::vector<const LocatedNode*> items(std::string_view key) const;
  /// The grammar of a key. @throws std::logic_error for a key that is not in it
  const Key& grammar_of(std::string_view key) const;

  /// `text`, part of the value of `key`, as a quantity in the range of the grammar.
  std::optional<double> quantity_in(std::string_view key, std::string_view text) const;
  /// Reports `message` at the value of `key`, the key's path before it.
  void problem(std::string_view key, const std::string& message, std::string hint = "") const;

  /// A misspelt key was taken for this one.
  bool is_suggested(std::string_view key) const;

  /// Keys that are not in the grammar, in the order of the file (only of an open section).
  const std::vector<const LocatedNode::Entry*>& named() const { return named_; }

 private:
  const LocatedNode* value_of(std::string_view key) const;
  const LocatedNode::Entry* entry_of(std::string_view key) const;
  const LocatedNode* scalar_of(std::string_view key) const;
  void check_unknown(const LocatedNode::Entry& entry);
  void check_missing();
  bool in_range(std::string_view key, double value, std::string_view text) const;

  const LocatedNode* node_;
  const std::vector<Key>& keys_;
  std::string path_;
  Place where_;
  Reading& reading_;
  bool broken_ = false;
  std::vector<std::string> suggested_;  // missing keys already spoken of
  std::vector<const LocatedNode::Entry*> named_;
};

}  // namespace ringwright::cases
