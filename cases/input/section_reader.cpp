#include "cases/input/section_reader.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

std::vector<std::string> names_of(const std::vector<Key>& keys) {
  std::vector<std::string> names;
  for (const Key& key : keys) names.push_back(key.name);
  return names;
}

std::string example_of(const Key& key) {
  return key.examples.empty() ? ""
                              : fmt::format("for example  {}: {}", key.name, key.examples.front());
}

std::string found(const LocatedNode& node) {
  switch (node.kind) {
    case LocatedNode::Kind::empty:
      return "nothing";
    case LocatedNode::Kind::scalar:
      return fmt::format("'{}'", node.text);
    case LocatedNode::Kind::list:
      return node.items.empty() ? "an empty list" : "a list";
    case LocatedNode::Kind::map:
      return node.entries.empty() ? "an empty block" : "a block of keys";
  }
  return "";
}

}  // namespace

void Reading::problem(const Place& place, std::string message, std::string hint) {
  add({place, std::move(message), std::move(hint), {}, ""});
}

void Reading::contradiction(const Place& place, std::string message, const Place& other,
                            std::string other_note, std::string hint) {
  add({place, std::move(message), std::move(hint), other, std::move(other_note)});
}

// A key beside all tests is read for each of them.
void Reading::add(Diagnostic diagnostic) {
  const bool known = std::any_of(problems.begin(), problems.end(), [&](const Diagnostic& other) {
    return other.place.line == diagnostic.place.line &&
           other.place.column == diagnostic.place.column && other.message == diagnostic.message;
  });
  if (!known) problems.push_back(std::move(diagnostic));
}

void Reading::assume(std::string key, std::string text) {
  assumed.push_back({std::move(key), std::move(text)});
}

void Reading::warn(std::string key, std::string text) {
  warnings.push_back({std::move(key), std::move(text)});
}

SectionReader::SectionReader(const LocatedNode& node, const std::vector<Key>& keys,
                             std::string path, const Place& where, Reading& reading, bool open)
    : node_(&node), keys_(keys), path_(std::move(path)), where_(where), reading_(reading) {
  broken_ = node.refused || node.kind != LocatedNode::Kind::map || node.entries.empty();
  if (node.refused) return;
  if (broken_) {
    reading_.problem(node.place,
                     fmt::format("{}: a block of keys is needed, not {}",
                                 path_.empty() ? "case file" : path_, found(node)),
                     fmt::format("keys: {}{}", open ? "a name of yours for each test, and " : "",
                                 fmt::join(names_of(keys_), ", ")));
    return;
  }
  for (const auto& entry : node.entries) {
    const bool known = std::any_of(keys_.begin(), keys_.end(),
                                   [&](const Key& key) { return key.name == entry.first.text; });
    if (known) continue;
    if (open) {
      named_.push_back(&entry);
    } else {
      check_unknown(entry);
    }
  }
  check_missing();
}

void SectionReader::check_unknown(const LocatedNode::Entry& entry) {
  const auto& [key, value] = entry;
  if (key.in_braces && value.kind == LocatedNode::Kind::empty) {
    reading_.problem(key.place, fmt::format("{}'{}' is a key without a value", front(), key.text),
                     "inside { } a comma ends a value: put a value with a comma in quotes");
    return;
  }
  for (const Key& candidate : keys_) {
    const auto& others = candidate.also_called;
    if (std::find(others.begin(), others.end(), normalised(key.text)) == others.end()) continue;
    suggested_.push_back(candidate.name);
    reading_.problem(key.place, fmt::format("{}unknown key '{}'", front(), key.text),
                     fmt::format("it is called '{}' here: {}", candidate.name, candidate.meaning));
    return;
  }
  const auto names = names_of(keys_);
  if (const auto near = nearest(key.text, names)) suggested_.push_back(*near);
  reading_.problem(key.place, fmt::format("{}unknown key '{}'", front(), key.text),
                   suggest(key.text, names));
}

void SectionReader::check_missing() {
  for (const Key& key : keys_) {
    if (!key.required || entry_of(key.name) || is_suggested(key.name)) continue;
    const bool other =
        std::any_of(key.or_else.begin(), key.or_else.end(),
                    [&](const std::string& name) { return entry_of(name) || is_suggested(name); });
    if (other) continue;
    reading_.problem(where_, fmt::format("{}the key '{}' is missing", front(), key.name),
                     example_of(key));
  }
}

bool SectionReader::is_suggested(std::string_view key) const {
  return std::find(suggested_.begin(), suggested_.end(), key) != suggested_.end();
}

std::string SectionReader::front() const {
  return path_.empty() || reading_.from_flags ? "" : path_ + ": ";
}

std::string SectionReader::front_of(std::string_view key) const {
  return reading_.from_flags ? "" : path_of(key) + ": ";
}

const LocatedNode::Entry* SectionReader::entry_of(std::string_view key) const {
  for (const auto& entry : node_->entries) {
    if (entry.first.text == key) return &entry;
  }
  return nullptr;
}

const LocatedNode* SectionReader::value_of(std::string_view key) const {
  const auto* entry = entry_of(key);
  return entry ? &entry->second : nullptr;
}

const Key& SectionReader::grammar_of(std::string_view key) const {
  for (const Key& candidate : keys_) {
    if (candidate.name == key) return candidate;
  }
  throw std::logic_error(fmt::format("the grammar has no key '{}'", key));
}

Place SectionReader::key_place(std::string_view key) const { return entry_of(key)->first.place; }
Place SectionReader::value_place(std::string_view key) const { return entry_of(key)->second.place; }

std::string SectionReader::path_of(std::string_view key) const {
  return path_.empty() ? std::string(key) : fmt::format("{}.{}", path_, key);
}

void SectionReader::problem(std::string_view key, const std::string& message,
                            std::string hint) const {
  reading_.problem(value_place(key), front_of(key) + message, std::move(hint));
}

const LocatedNode* SectionReader::scalar_of(std::string_view key) const {
  const Key& grammar = grammar_of(key);
  const LocatedNode* node = value_of(key);
  if (!node || node->refused) return nullptr;
  if (node->kind == LocatedNode::Kind::empty ||
      (node->kind == LocatedNode::Kind::scalar && trimmed(node->text).empty())) {
    problem(key, "has no value", example_of(grammar));
    return nullptr;
  }
  if (node->kind != LocatedNode::Kind::scalar) {
    problem(key, fmt::format("one value is needed, not {}", found(*node)), example_of(grammar));
    return nullptr;
  }
  return node;
}

bool SectionReader::in_range(std::string_view key, double value, std::string_view text) const {
  const Key& grammar = grammar_of(key);
  if (!grammar.range) return true;
  const Range& range = *grammar.range;
  // Ends are meant as written: a value like 2 cm must not fail by the rounding of its conversion.
  const double slack = 1e-12 * std::max(std::abs(range.least), std::abs(range.most));
  const bool above =
      range.without_least ? value > range.least + slack : value >= range.least - slack;
  if (above && value <= range.most + slack) return true;
  problem(key, fmt::format("{} is out of range", trimmed(text)),
          fmt::format("allowed: {}", range.words));
  return false;
}

std::optional<double> SectionReader::quantity_in(std::string_view key,
                                                 std::string_view text) const {
  const Key& grammar = grammar_of(key);
  try {
    const double value = grammar.kind == ValueKind::number
                             ? read_number(text)
                             : reading_.units.read(text, grammar.dimension);
    if (in_range(key, value, text)) return value;
  } catch (const ValueError& error) {
    problem(key, error.what(), error.hint());
  }
  return std::nullopt;
}

std::optional<double> SectionReader::quantity(std::string_view key) const {
  const LocatedNode* node = scalar_of(key);
  if (!node) return std::nullopt;
  const Key& grammar = grammar_of(key);
  const bool plain = grammar.kind == ValueKind::number || grammar.dimension == Dimension::fraction;
  if (plain && node->quoted && !reading_.from_flags && node->text.find('%') == std::string::npos) {
    problem(key, fmt::format("a number is needed, not the text '{}'", node->text),
            "leave the quotes out");
    return std::nullopt;
  }
  return quantity_in(key, node->text);
}

std::optional<std::string> SectionReader::text(std::string_view key) const {
  const LocatedNode* node = scalar_of(key);
  if (!node) return std::nullopt;
  const Key& grammar = grammar_of(key);
  if (grammar.kind != ValueKind::choice) return std::string(trimmed(node->text));
  for (const std::string& choice : grammar.choices) {
    if (normalised(choice) == normalised(node->text)) return choice;
  }
  problem(key, fmt::format("'{}' is none of the choices", node->text),
          suggest(node->text, grammar.choices));
  return std::nullopt;
}

SectionReader SectionReader::subsection(std::string_view key) const {
  return {*value_of(key), grammar_of(key).keys, path_of(key), key_place(key), reading_};
}

std::vector<const LocatedNode*> SectionReader::items(std::string_view key) const {
  const LocatedNode* node = value_of(key);
  if (!node || node->refused) return {};
  if (node->kind != LocatedNode::Kind::list) return {node};
  std::vector<const LocatedNode*> result;
  for (const LocatedNode& item : node->items) result.push_back(&item);
  if (result.empty()) problem(key, "the list is empty", example_of(grammar_of(key)));
  return result;
}

}  // namespace ringwright::cases
