#include "cases/input/located_yaml.hpp"

#include <catch2/catch.hpp>
#include <string>
#include <vector>

namespace ringwright::cases {
namespace {

std::vector<std::string> messages_of(const std::string& text) {
  std::vector<Diagnostic> problems;
  parse_yaml(text, problems);
  std::vector<std::string> messages;
  for (const Diagnostic& problem : problems) {
    messages.push_back(std::to_string(problem.place.line) + ":" +
                       std::to_string(problem.place.column) + " " + problem.message);
  }
  return messages;
}

using Messages = std::vector<std::string>;

}  // namespace

TEST_CASE("every node knows its place, counted from one in characters") {
  std::vector<Diagnostic> problems;
  const LocatedNode root =
      parse_yaml("job: \"\u00E4\u00F6\" # x\nground: { a: \u00B0C, b: 5 }\n", problems);
  REQUIRE(problems.empty());
  REQUIRE(root.entries.size() == 2);
  CHECK(root.entries[0].second.place.line == 1);
  CHECK(root.entries[0].second.place.column == 6);
  CHECK(root.entries[0].second.place.length == 4);
  CHECK(root.entries[0].second.quoted);
  const LocatedNode& ground = root.entries[1].second;
  REQUIRE(ground.entries.size() == 2);
  CHECK(ground.entries[1].first.place.line == 2);
  CHECK(ground.entries[1].first.place.column == 18);
  CHECK(ground.entries[1].first.in_braces);
  CHECK_FALSE(ground.entries[1].second.quoted);
}

TEST_CASE("scalars stay text") {
  std::vector<Diagnostic> problems;
  const LocatedNode root = parse_yaml("a: 010\nb: 12\"\nc: 1_0\n", problems);
  REQUIRE(problems.empty());
  CHECK(root.entries[0].second.text == "010");
  CHECK(root.entries[1].second.text == "12\"");
  CHECK(root.entries[2].second.text == "1_0");
}

TEST_CASE("traps of YAML are refused") {
  CHECK(messages_of("a: 1\nb: 2\na: 3\n") == Messages{"3:1 key 'a' is given twice"});
  CHECK(messages_of("a: yes\n") == Messages{"1:4 'yes' is read as true or false by YAML"});
  CHECK(messages_of("a: Off\n") == Messages{"1:4 'Off' is read as true or false by YAML"});
  CHECK(messages_of("on: 5\n") == Messages{"1:1 'on' is read as true or false by YAML"});
  CHECK(messages_of("a: \"yes\"\n").empty());
  CHECK(messages_of("n: 1.56\n").empty());
  CHECK(messages_of("a: &x 5\n") == Messages{"1:4 anchors (&name) are not used in case files"});
  CHECK(messages_of("a: !!str 5\n").size() == 1);
  CHECK(messages_of("a: 1\n---\nb: 1\n") == Messages{"2:1 a second document begins here"});
  CHECK(messages_of("a: 1\n...\n").empty());
  CHECK(messages_of("a:\n\tb: 1\n") == Messages{"2:1 a tab; YAML aligns by blanks only"});
  CHECK(messages_of("a: 1 #\tx\n").empty());
  CHECK(messages_of("a: \"x\n") ==
        Messages{"1:4 the quote that begins here is not closed on this line"});
  CHECK(messages_of("a: 'it''s'\nb: \"x\\\"y\"\n").empty());
  CHECK(messages_of("? [a]\n: b\n") ==
        Messages{"1:3 a key must be words, not empty, a list or a map"});
  CHECK(messages_of(std::string("a: 1\0\n", 6)) == Messages{"1:5 control character 0x00"});
  CHECK(messages_of("a: \xff\n") == Messages{"1:4 byte 0xff is not UTF-8 text"});
}

TEST_CASE("a text too long or nested too deep for a case file is refused as such") {
  const Messages line{"1:1 a line too long, or brackets nested too deep, for a case file"};
  CHECK(messages_of("a: " + std::string(17, '[')) == line);
  CHECK(messages_of("a: " + std::string(60000, '[')) == line);
  CHECK(messages_of("a: " + std::string(60000, 'x')) == line);
  CHECK(messages_of(std::string(1u << 19, '#')).size() == 1);
}

}  // namespace ringwright::cases
