#include "cases/input/tree_builder.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <utility>

#include "cases/input/suggestion.hpp"
#include "cases/input/text_traps.hpp"

namespace ringwright::cases {
namespace {

// Words that a YAML 1.1 reader turns into true or false. As a key, n is van Genuchten's exponent.
bool is_yes_or_no(const std::string& text, bool is_key) {
  constexpr std::array words{"yes", "no", "on", "off", "true", "false", "y", "n"};
  const std::string word = normalised(text);
  if (is_key && word.size() == 1) return false;
  return std::find(words.begin(), words.end(), word) != words.end();
}

}  // namespace

TreeBuilder::TreeBuilder(std::string_view text, std::vector<Diagnostic>& problems)
    : problems_(problems) {
  std::size_t start = 0;
  while (start <= text.size()) {
    const std::size_t end = std::min(text.find('\n', start), text.size());
    lines_.push_back(text.substr(start, end - start));
    start = end + 1;
  }
}

Place TreeBuilder::place_of(const YAML::Mark& mark, int length) const {
  if (mark.is_null()) return Place{};
  const auto line = std::min(static_cast<std::size_t>(mark.line), lines_.size() - 1);
  const std::string_view text = lines_[line];
  const int column = characters_in(text, static_cast<std::size_t>(mark.column)) + 1;
  const int rest = characters_in(text, text.size()) - column + 1;
  return Place{static_cast<int>(line) + 1, column, std::clamp(length, 1, std::max(1, rest))};
}

// The library takes the end of the text for the missing end of a quoted value, and a value that
// runs over lines is mostly a forgotten quote: a quoted value stays on its line.
bool TreeBuilder::is_closed(const YAML::Mark& mark) const {
  const std::string_view line =
      lines_[std::min(static_cast<std::size_t>(mark.line), lines_.size() - 1)];
  const auto start = static_cast<std::size_t>(mark.column);
  if (start >= line.size()) return false;
  const char quote = line[start];
  for (std::size_t i = start + 1; i < line.size(); ++i) {
    if (quote == '"' && line[i] == '\\') {
      ++i;
    } else if (line[i] == quote) {
      const bool doubled = quote == '\'' && i + 1 < line.size() && line[i + 1] == quote;
      if (!doubled) return true;
      ++i;
    }
  }
  return false;
}

void TreeBuilder::refuse_extras(const Place& place, const std::string& tag, YAML::anchor_t anchor) {
  if (anchor != 0) {
    problem(place, "anchors (&name) are not used in case files", "write the value out");
  }
  if (!tag.empty() && tag != "?" && tag != "!") {
    problem(place, fmt::format("tags are not used in case files ('{}')", tag), "leave the tag out");
  }
}

void TreeBuilder::OnNull(const YAML::Mark& mark, YAML::anchor_t anchor) {
  LocatedNode node;
  node.place = place_of(mark);
  node.in_braces = inside_braces();
  refuse_extras(node.place, "", anchor);
  accept(std::move(node));
}

void TreeBuilder::OnAlias(const YAML::Mark& mark, YAML::anchor_t) {
  LocatedNode node;
  node.place = place_of(mark);
  problem(node.place, "aliases (*name) are not used in case files", "write the value out");
  node.refused = true;
  accept(std::move(node));
}

void TreeBuilder::OnScalar(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                           const std::string& value) {
  LocatedNode node;
  node.kind = LocatedNode::Kind::scalar;
  node.text = value;
  node.quoted = tag == "!";
  node.place = place_of(mark, characters_in(value, value.size()) + (node.quoted ? 2 : 0));
  node.in_braces = inside_braces();
  refuse_extras(node.place, tag, anchor);
  if (!node.quoted && is_yes_or_no(value, expects_key())) {
    problem(node.place, fmt::format("'{}' is read as true or false by YAML", value),
            "say it in another word, or put it in quotes");
    node.refused = true;
  }
  if (node.quoted && !is_closed(mark)) {
    problem(node.place, "the quote that begins here is not closed on this line",
            "close it, or leave it out");
    unclosed_quote_ = true;
  }
  accept(std::move(node));
}

void TreeBuilder::OnSequenceStart(const YAML::Mark& mark, const std::string& tag,
                                  YAML::anchor_t anchor, YAML::EmitterStyle::value style) {
  refuse_extras(place_of(mark), tag, anchor);
  open(LocatedNode::Kind::list, mark, style);
}

void TreeBuilder::OnMapStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                             YAML::EmitterStyle::value style) {
  refuse_extras(place_of(mark), tag, anchor);
  open(LocatedNode::Kind::map, mark, style);
}

void TreeBuilder::open(LocatedNode::Kind kind, const YAML::Mark& mark,
                       YAML::EmitterStyle::value style) {
  Open opened;
  opened.node.kind = kind;
  opened.node.place = place_of(mark);
  opened.node.in_braces = inside_braces() || style == YAML::EmitterStyle::Flow;
  open_.push_back(std::move(opened));
}

void TreeBuilder::close() {
  LocatedNode node = std::move(open_.back().node);
  open_.pop_back();
  accept(std::move(node));
}

void TreeBuilder::accept(LocatedNode node) {
  if (open_.empty()) {
    root_ = std::move(node);
  } else if (open_.back().node.kind == LocatedNode::Kind::list) {
    open_.back().node.items.push_back(std::move(node));
  } else {
    add_to_map(open_.back(), std::move(node));
  }
}

void TreeBuilder::check_key(const LocatedNode& key) {
  if (key.kind != LocatedNode::Kind::scalar) {
    problem(key.place, "a key must be words, not empty, a list or a map");
  } else if (key.text == "<<") {
    problem(key.place, "merge keys (<<) are not used in case files", "write the keys out");
  }
}

void TreeBuilder::add_to_map(Open& map, LocatedNode node) {
  if (!map.key) {
    check_key(node);
    map.key = std::move(node);
    return;
  }
  LocatedNode key = std::move(*map.key);
  map.key.reset();
  // What a merge key would have brought is unknown: nothing more is said of this map.
  if (key.text == "<<") map.node.refused = true;
  if (key.kind != LocatedNode::Kind::scalar || key.text == "<<" || key.refused) return;
  if (node.kind == LocatedNode::Kind::empty) node.place = key.place;
  for (const auto& [other, value] : map.node.entries) {
    if (other.text != key.text) continue;
    problems_.push_back({key.place, fmt::format("key '{}' is given twice", key.text),
                         "keep one of the two", other.place, "first given here"});
    return;
  }
  map.node.entries.emplace_back(std::move(key), std::move(node));
}

}  // namespace ringwright::cases
