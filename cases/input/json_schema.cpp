#include "cases/input/json_schema.hpp"

#include <nlohmann/json.hpp>

#include "cases/input/schema.hpp"

namespace ringwright::cases {
namespace {

using Json = nlohmann::ordered_json;

constexpr const char* number_and_unit =
    R"(^ *[-+]?([0-9]+\.?[0-9]*|\.[0-9]+)([eE][-+]?[0-9]+)? *[^ 0-9].*$)";
constexpr const char* number_and_percent = R"(^ *[-+]?([0-9]+\.?[0-9]*|\.[0-9]+) *(%|percent) *$)";

Json section_schema(const std::vector<Key>& keys);

std::string description_of(const Key& key) {
  std::string text = key.meaning;
  const bool words = key.kind == ValueKind::phrase || key.kind == ValueKind::phrases;
  if (key.range && !words) text += " Allowed: " + key.range->words + ".";
  return text;
}

// A schema range in the unit of the file exists only for plain numbers.
void add_range(Json& schema, const Range& range) {
  schema[range.without_least ? "exclusiveMinimum" : "minimum"] = range.least;
  schema["maximum"] = range.most;
}

Json quantity_schema(const Key& key) {
  if (key.dimension != Dimension::fraction)
    return {{"type", "string"}, {"pattern", number_and_unit}};
  Json number{{"type", "number"}};
  if (key.range) add_range(number, *key.range);
  const Json percent{{"type", "string"}, {"pattern", number_and_percent}};
  return {{"anyOf", Json::array({number, percent})}};
}

Json one_or_more(const Json& item) {
  const Json list{{"type", "array"}, {"minItems", 1}, {"items", item}};
  return {{"anyOf", Json::array({item, list})}};
}

Json sections_schema(const Key& key) {
  const Json section = section_schema(key.keys);
  if (key.examples.empty()) return one_or_more(section);
  const Json phrase{{"type", "string"}, {"minLength", 1}, {"examples", key.examples}};
  return one_or_more({{"anyOf", Json::array({phrase, section})}});
}

Json value_schema(const Key& key) {
  switch (key.kind) {
    case ValueKind::version:
      return {{"const", 1}};
    case ValueKind::text:
      return {{"type", "string"}, {"minLength", 1}};
    case ValueKind::phrase:
      return {{"type", "string"}, {"minLength", 1}};
    case ValueKind::choice:
      return {{"enum", key.choices}};
    case ValueKind::quantity:
      return quantity_schema(key);
    case ValueKind::section: {
      Json section = section_schema(key.keys);
      if (!key.named.empty()) section["additionalProperties"] = section_schema(key.named);
      return section;
    }
    case ValueKind::sections:
      return sections_schema(key);
    case ValueKind::phrases: {
      const Json phrase{{"type", "string"}, {"minLength", 1}};
      return one_or_more(phrase);
    }
    case ValueKind::number:
      break;
  }
  Json number{{"type", "number"}};
  if (key.range) add_range(number, *key.range);
  return number;
}

Json key_schema(const Key& key) {
  Json schema{{"description", description_of(key)}};
  schema.update(value_schema(key));
  // The examples of numbers are text in the grammar; editors offer them as text is offered.
  const bool text = schema.value("type", "") == "string";
  if (text && !key.examples.empty()) schema["examples"] = key.examples;
  return schema;
}

Json section_schema(const std::vector<Key>& keys) {
  Json properties = Json::object();
  Json required = Json::array(), alternatives = Json::array();
  for (const Key& key : keys) {
    properties[key.name] = key_schema(key);
    if (!key.required) continue;
    if (key.or_else.empty()) {
      required.push_back(key.name);
      continue;
    }
    Json any = Json::array({{{"required", Json::array({key.name})}}});
    for (const std::string& other : key.or_else)
      any.push_back({{"required", Json::array({other})}});
    alternatives.push_back({{"anyOf", any}});
  }
  Json schema{{"type", "object"}, {"minProperties", 1}, {"additionalProperties", false}};
  if (!required.empty()) schema["required"] = required;
  if (!alternatives.empty()) schema["allOf"] = alternatives;
  schema["properties"] = properties;
  return schema;
}

}  // namespace

std::string case_file_json_schema() {
  const Key grammar = case_file_grammar();
  Json schema{{"$schema", "http://json-schema.org/draft-07/schema#"},
              {"title", "Ringwright case file, version 1"},
              {"description", grammar.meaning}};
  schema.update(section_schema(grammar.keys));
  return schema.dump(2) + "\n";
}

}  // namespace ringwright::cases
