#include "cases/input/located_yaml.hpp"

#include <yaml-cpp/eventhandler.h>
#include <yaml-cpp/exceptions.h>
#include <yaml-cpp/mark.h>
#include <yaml-cpp/parser.h>

#include <sstream>
#include <utility>

#include "cases/input/text_traps.hpp"
#include "cases/input/tree_builder.hpp"

namespace ringwright::cases {
namespace {

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

// What the library says in its own terms, said in the writer's, with a hint.
std::pair<std::string, std::string> plain_words(const std::string& message) {
  using namespace YAML::ErrorMsg;
  const std::string colon =
      "a ':' is missing in the line above, or a value with ': ' in it needs quotes";
  if (message == MAP_VALUE) return {"a ':' where no value can begin", colon};
  if (message == MAP_KEY) return {"a key where none can begin", colon};
  if (message == END_OF_MAP) {
    return {"this line does not fit",
            "each key ends with ': '; the keys of one block begin in one column"};
  }
  if (message == END_OF_MAP_FLOW) return {"a '}' or ',' is missing before this", ""};
  if (message == END_OF_SEQ_FLOW) return {"a ']' or ',' is missing before this", ""};
  if (message == FLOW_END) return {"a '}' or ']' that nothing opened", ""};
  if (message == UNKNOWN_ANCHOR) {
    return {"nothing of this name",
            "aliases (*name) are not used in case files: write the value out"};
  }
  return {message, ""};
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
    if (builder.has_unclosed_quote()) return {};
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
    const auto [words, hint] = plain_words(error.msg);
    problems.push_back({builder.place_of(error.mark), "not YAML: " + words, hint, {}, ""});
    return {};
  }
}

}  // namespace ringwright::cases
