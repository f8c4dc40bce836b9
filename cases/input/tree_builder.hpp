#pragma once
/// Events of the YAML library into a located tree; refuses what could be misread.

#include <yaml-cpp/eventhandler.h>
#include <yaml-cpp/mark.h>

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "cases/input/located_yaml.hpp"

namespace ringwright::cases {

/// Receives the events of one document. What is wrong is appended to `problems`.
class TreeBuilder : public YAML::EventHandler {
 public:
  TreeBuilder(std::string_view text, std::vector<Diagnostic>& problems);

  /// A quote swallowed what follows it: the tree says little.
  bool has_unclosed_quote() const { return unclosed_quote_; }
  LocatedNode take_root() { return std::move(root_); }
  /// A mark of the library, which counts bytes from zero, as a place.
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
  bool is_closed(const YAML::Mark& mark) const;
  void refuse_extras(const Place& place, const std::string& tag, YAML::anchor_t anchor);
  bool expects_key() const {
    return !open_.empty() && open_.back().node.kind == LocatedNode::Kind::map && !open_.back().key;
  }
  bool inside_braces() const { return !open_.empty() && open_.back().node.in_braces; }
  void problem(const Place& place, std::string message, std::string hint = "") {
    problems_.push_back({place, std::move(message), std::move(hint), {}, ""});
  }

  std::vector<std::string_view> lines_;
  std::vector<Diagnostic>& problems_;
  std::vector<Open> open_;
  LocatedNode root_;
  bool unclosed_quote_ = false;
};

}  // namespace ringwright::cases
