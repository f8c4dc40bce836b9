#include "cases/input/located_yaml.hpp"

#include <fmt/format.h>
#include <yaml-cpp/eventhandler.h>
#include <yaml-cpp/exceptions.h>
#include <yaml-cpp/mark.h>
#include <yaml-cpp/parser.h>

#include <algorithm>
#include <array>
#include <optional>
#include <sstream>

#include "cases/input/suggestion.hpp"
#include "cases/input/text_traps.hpp"

namespace ringwright::cases {
namespace {

// Words that a YAML 1.1 reader turns into true or false.
bool is_yes_or_no(const std::string& text) {
  constexpr std::array words{"yes", "no", "on", "off", "y", "n", "true", "false"};
  const std::string word = normalised(text);
  return std::find(words.begin(), words.end(), word) != words.end();
}

class TreeBuilder : public YAML::EventHandler {
 public:
  TreeBuilder(std::string_view text, std::vector<Diagnostic>& problems) : problems_(problems) {
    std::size_t start = 0;
    while (start <= text.size()) {
      const std::size_t end = std::min(text.find('\n', start), text.size());
      lines_.push_back(text.substr(start, end - start));
      start = end + 1;
    }
  }

  LocatedNode take_root() { return std::move(root_); }
  Place place_of(const YAML::Mark& mark, int length = 1) const;

  void OnDocumentStart(const YAML::Mark&) override {}
  void OnDocumentEnd() override {}
  void OnNull(const YAML::Mark& mark, YAML::anchor_t anchor) override;
  void OnAlias(const YAML::Mark& mark, YAML::anchor_t anchor) override;
  void OnScalar(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                const std::string& value) override;
  void OnSequenceStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                       YAML::EmitterStyle::value style) override;
  void OnSequenceEnd() override { close(); }
  void OnMapStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                  YAML::EmitterStyle::value style) override;
  void OnMapEnd() override { close(); }

 private:
  struct Open {
    LocatedNode node;
    std::optional<LocatedNode> key;  // of a map: waits for its value
  };

  void open(LocatedNode::Kind kind, const YAML::Mark& mark, YAML::EmitterStyle::value style);
  void close();
  void accept(LocatedNode node);
  void add_to_map(Open& map, LocatedNode node);
  void check_key(const LocatedNode& key);
  void refuse_extras(const Place& place, const std::string& tag, YAML::anchor_t anchor);
  bool inside_braces() const { return !open_.empty() && open_.back().node.in_braces; }
  void problem(const Place& place, std::string message, std::string hint = "") {
    problems_.push_back({place, std::move(message), std::move(hint), {}, ""});
  }

  std::vector<std::string_view> lines_;
  std::vector<Diagnostic>& problems_;
  std::vector<Open> open_;
  LocatedNode root_;
};

Place TreeBuilder::place_of(const YAML::Mark& mark, int length) const {
  if (mark.is_null()) return Place{};
  const auto line = std::min(static_cast<std::size_t>(mark.line), lines_.size() - 1);
  const std::string_view text = lines_[line];
  const int column = characters_in(text, static_cast<std::size_t>(mark.column)) + 1;
  const int rest = characters_in(text, text.size()) - column + 1;
  return Place{static_cast<int>(line) + 1, column, std::clamp(length, 1, std::max(1, rest))};
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
  if (!node.quoted && is_yes_or_no(value)) {
    problem(node.place, fmt::format("'{}' is read as true or false by YAML", value),
            "say it in another word, or put it in quotes");
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
  if (key.kind != LocatedNode::Kind::scalar || key.text == "<<") return;
  if (node.kind == LocatedNode::Kind::empty) node.place = key.place;
  for (const auto& [other, value] : map.node.entries) {
    if (other.text != key.text) continue;
    problems_.push_back({key.place, fmt::format("key '{}' is given twice", key.text),
                         "keep one of the two", other.place, "first given here"});
    return;
  }
  map.node.entries.emplace_back(std::move(key), std::move(node));
}

// Only notes where a document begins.
class DocumentStart : public YAML::EventHandler {
 public:
  YAML::Mark mark = YAML::Mark::null_mark();

  void OnDocumentStart(const YAML::Mark& start) override { mark = start; }
  void OnDocumentEnd() override {}
  void OnNull(const YAML::Mark&, YAML::anchor_t) override {}
  void OnAlias(const YAML::Mark&, YAML::anchor_t) override {}
  void OnScalar(const YAML::Mark&, const std::string&, YAML::anchor_t,
                const std::string&) override {}
  void OnSequenceStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                       YAML::EmitterStyle::value) override {}
  void OnSequenceEnd() override {}
  void OnMapStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                  YAML::EmitterStyle::value) override {}
  void OnMapEnd() override {}
};

// What the library says in its own terms, said in the writer's.
std::string plain_words(const std::string& message) {
  if (message == YAML::ErrorMsg::MAP_VALUE) return "a ':' where no value can begin";
  if (message == YAML::ErrorMsg::END_OF_MAP)
    return "this line does not fit: wrong indentation, or ': ' missing";
  if (message == YAML::ErrorMsg::END_OF_MAP_FLOW) return "a '}' or ',' is missing";
  if (message == YAML::ErrorMsg::END_OF_SEQ_FLOW) return "a ']' or ',' is missing";
  if (message == YAML::ErrorMsg::FLOW_END) return "a '}' or ']' that nothing opened";
  if (message == YAML::ErrorMsg::EOF_IN_SCALAR) return "a quote is never closed";
  return message;
}

}  // namespace

LocatedNode parse_yaml(std::string_view text, std::vector<Diagnostic>& problems) {
  const std::size_t before = problems.size();
  find_text_traps(text, problems);
  if (problems.size() > before) return {};
  std::istringstream stream{std::string(text)};
  TreeBuilder builder(text, problems);
  try {
    YAML::Parser parser(stream);
    parser.HandleNextDocument(builder);
    LocatedNode root = builder.take_root();
    DocumentStart second;
    if (parser.HandleNextDocument(second)) {
      problems.push_back({builder.place_of(second.mark),
                          "a second document begins here",
                          "a case file holds one document: delete '---' or split the file",
                          {},
                          ""});
    }
    return root;
  } catch (const YAML::Exception& error) {
    problems.push_back({builder.place_of(error.mark),
                        fmt::format("not YAML: {}", plain_words(error.msg)),
                        "",
                        {},
                        ""});
    return {};
  }
}

}  // namespace ringwright::cases
