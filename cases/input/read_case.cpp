#include "cases/input/read_case.hpp"

#include <fmt/format.h>

#include "cases/input/located_yaml.hpp"
#include "cases/input/read_ground.hpp"
#include "cases/input/read_tests.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {
namespace {

constexpr int grammar_version = 1;

void check_version(const SectionReader& file, const LocatedNode& root, Reading& reading) {
  if (!file.has("ringwright")) return;
  const auto version = file.text("ringwright");
  if (version && *version != std::to_string(grammar_version)) {
    file.problem("ringwright", fmt::format("version '{}' is not known", *version),
                 fmt::format("this program reads version {}", grammar_version));
  }
  const LocatedNode& first = root.entries.front().first;
  if (first.text != "ringwright") {
    reading.contradiction(file.key_place("ringwright"), "the version must come first", first.place,
                          fmt::format("'{}' comes before it", first.text),
                          "put 'ringwright: 1' on top of the file");
  }
}

void read_file(const LocatedNode& root, Case& result, Reading& reading) {
  const Key grammar = case_file_grammar();
  const SectionReader file(root, grammar.keys, "", root.place, reading);
  check_version(file, root, reading);
  if (file.has("job")) result.job = file.text("job").value_or("");
  if (const auto accuracy = file.quantity("accuracy")) {
    result.accuracy = *accuracy;
  } else if (!file.has("accuracy")) {
    reading.assume("accuracy", fmt::format("accuracy {:g} %", 100 * result.accuracy));
  }
  GroundPlaces places;
  if (const auto* ground = file.section("ground")) {
    result.ground =
        read_ground(*ground, file.key_place("ground"), *grammar.find("ground"), places, reading);
  }
  if (const auto* tests = file.section("tests")) {
    result.tests = read_tests(*tests, file.key_place("tests"), *grammar.find("tests"),
                              {result.ground, places}, reading);
  }
}

}  // namespace

Case read_case(const Source& source) {
  Reading reading;
  reading.from_flags = !source.line_flags.empty();
  const LocatedNode root = parse_yaml(source.text, reading.problems);
  Case result;
  result.text = source.text;
  if (root.kind != LocatedNode::Kind::empty) {
    read_file(root, result, reading);
  } else if (reading.problems.empty()) {
    reading.problem(Place{}, "the file holds no case",
                    "the command 'new' writes one to start from");
  }
  if (!reading.problems.empty()) throw CaseErrors(std::move(reading.problems), source);
  result.assumed = std::move(reading.assumed);
  result.warnings = std::move(reading.warnings);
  return result;
}

Case read_case(const std::string& text, const std::filesystem::path& file) {
  Case result = read_case(Source{file.string(), text, {}});
  result.file = file;
  return result;
}

}  // namespace ringwright::cases
