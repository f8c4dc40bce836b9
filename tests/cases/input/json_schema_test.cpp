#include "cases/input/json_schema.hpp"

#include <catch2/catch.hpp>
#include <fstream>
#include <nlohmann/json.hpp>
#include <sstream>
#include <string>

#include "cases/input/schema.hpp"

namespace ringwright::cases {
namespace {

// Every key says what it is and shows how to write it.
void check_described(const std::vector<Key>& keys) {
  for (const Key& key : keys) {
    INFO(key.name);
    CHECK_FALSE(key.meaning.empty());
    const bool of_keys = key.kind == ValueKind::section || key.kind == ValueKind::sections;
    CHECK((of_keys || !key.examples.empty()));
    check_described(key.keys);
    check_described(key.named);
  }
}

// Every example of a single quantity lies in the range beside it.
void check_examples(const std::vector<Key>& keys, const Units& units) {
  for (const Key& key : keys) {
    check_examples(key.keys, units);
    check_examples(key.named, units);
    if (key.kind != ValueKind::quantity || !key.range) continue;
    for (const std::string& example : key.examples) {
      INFO(key.name << ": " << example);
      const double value = units.read(example, key.dimension);
      CHECK((value >= key.range->least && value <= key.range->most));
    }
  }
}

}  // namespace

TEST_CASE("the schema beside the code is the one the grammar makes") {
  // To renew it, write what case_file_json_schema() returns over the file.
  std::ifstream file(std::string(RINGWRIGHT_SOURCE_DIR) + "/cases/input/ringwright.schema.json");
  std::stringstream text;
  text << file.rdbuf();
  CHECK(text.str() == case_file_json_schema());
}

TEST_CASE("the schema has every key of the grammar, and no mesh or tolerance") {
  const auto schema = nlohmann::json::parse(case_file_json_schema());
  CHECK(schema["$schema"] == "http://json-schema.org/draft-07/schema#");
  const auto& properties = schema["properties"];
  CHECK(properties["ground"]["properties"].contains("texture"));
  CHECK(properties["ground"]["properties"]["parameters"]["properties"].contains("n"));
  const auto& test = properties["tests"]["additionalProperties"];
  CHECK(test["required"] == nlohmann::json::array({"insert"}));
  // A ring under one of two names, the head in one of four ways.
  REQUIRE(test["allOf"].size() == 2);
  CHECK(test["allOf"][0]["anyOf"].size() == 2);
  CHECK(test["allOf"][1]["anyOf"].size() == 4);
  CHECK(properties["tests"]["properties"].contains("stop"));
  CHECK(schema["additionalProperties"] == false);
  CHECK(case_file_json_schema().find("\"mesh\"") == std::string::npos);
  CHECK(case_file_json_schema().find("\"tolerance\"") == std::string::npos);
}

TEST_CASE("every key of the grammar is described, with examples in its range") {
  const Key grammar = case_file_grammar();
  const Units units;
  check_described(grammar.keys);
  check_examples(grammar.keys, units);
}

}  // namespace ringwright::cases
