#include "cases/input/case_from_flags.hpp"

#include <fmt/format.h>

#include <string_view>
#include <vector>

#include "cases/input/diagnostic.hpp"
#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

// One line of the composed text and the flag it comes from.
struct Line {
  std::string text;
  std::string flag;
};

// In single quotes YAML reads everything but the quote itself as it stands; a line break, which
// no value has, becomes a blank.
std::string in_quotes(std::string_view value) {
  std::string result = "'";
  for (const char c : value) {
    if (c == '\'') result += '\'';
    result += c == '\n' || c == '\r' ? ' ' : c;
  }
  return result + "'";
}

void add(std::vector<Line>& lines, std::string_view indent, std::string_view key,
         std::string_view flag, const std::optional<std::string>& value) {
  if (!value) return;
  lines.push_back({fmt::format("{}{}: {}", indent, key, in_quotes(*value)),
                   fmt::format("{} \"{}\"", flag, *value)});
}

std::vector<Line> lines_of(const CaseFlags& flags) {
  std::vector<Line> lines{{"ringwright: 1", ""}};
  add(lines, "", "job", "--job", flags.job);
  add(lines, "", "accuracy", "--accuracy", flags.accuracy);
  lines.push_back({"ground:", ""});
  add(lines, "  ", "water", "--water", flags.water);
  add(lines, "  ", "texture", "--soil", flags.soil);
  add(lines, "  ", "published", "--published", flags.published);
  add(lines, "  ", "capillary length", "--capillary-length", flags.capillary_length);
  add(lines, "  ", "alpha star", "--alpha-star", flags.alpha_star);
  add(lines, "  ", "fillable porosity", "--fillable-porosity", flags.fillable_porosity);
  add(lines, "  ", "Kfs", "--kfs", flags.Kfs);
  add(lines, "  ", "moisture", "--moisture", flags.moisture);
  add(lines, "  ", "minimum capillary height", "--minimum-capillary-height",
      flags.capillary_height);
  add(lines, "  ", "test level", "--test-level", flags.test_level);
  add(lines, "  ", "water table", "--water-table", flags.water_table);
  lines.push_back({"tests:", ""});
  const bool one_head = !flags.heads && !flags.fall;
  lines.push_back({one_head ? "  one head:" : flags.fall ? "  falling head:" : "  heads:", ""});
  add(lines, "    ", "ring", "--ring", flags.ring);
  add(lines, "    ", "insert", "--insert", flags.insert);
  add(lines, "    ", "head", "--head", flags.head);
  add(lines, "    ", "heads", "--heads", flags.heads);
  add(lines, "    ", "fall", "--fall", flags.fall);
  add(lines, "    ", "soak", "--soak", flags.soak);
  add(lines, "    ", "outer ring", "--outer-ring", flags.outer_ring);
  add(lines, "    ", "outer insert", "--outer-insert", flags.outer_insert);
  add(lines, "    ", "outer head", "--outer-head", flags.outer_head);
  add(lines, "    ", "wall", "--wall", flags.wall);
  add(lines, "  ", "stop", "--stop", flags.stop);
  add(lines, "  ", "read", "--read", flags.read);
  add(lines, "  ", "supply", "--supply", flags.supply);
  add(lines, "  ", "reservoir", "--reservoir", flags.reservoir);
  add(lines, "  ", "gauge", "--gauge", flags.gauge);
  add(lines, "  ", "assumed alpha star", "--assumed-alpha-star", flags.assumed_alpha_star);
  return lines;
}

Source source_of(const std::vector<Line>& lines) {
  Source source{"flags", "", {}};
  for (const Line& line : lines) {
    source.text += line.text + "\n";
    source.line_flags.push_back(line.flag);
  }
  return source;
}

// Said of flags, not of the keys they stand for.
void check_needed(const CaseFlags& flags, const Source& source) {
  std::vector<Diagnostic> problems;
  const auto need = [&](bool given, std::string_view flag, std::string_view example) {
    if (given) return;
    problems.push_back({Place{},
                        fmt::format("{} is missing", flag),
                        fmt::format("for example  {} \"{}\"", flag, example),
                        {},
                        ""});
  };
  need(flags.soil || flags.capillary_length || flags.alpha_star, "--soil", "silt loam, moist");
  need(flags.ring.has_value(), "--ring", "30 cm");
  need(flags.insert.has_value(), "--insert", "10 cm");
  need(flags.head || flags.heads || flags.fall, "--head", "5 cm");
  if (!problems.empty()) throw CaseErrors(std::move(problems), source);
}

}  // namespace

std::string case_text(const CaseFlags& flags) { return source_of(lines_of(flags)).text; }

Case case_from_flags(const CaseFlags& flags) {
  const Source source = source_of(lines_of(flags));
  check_needed(flags, source);
  return read_case(source);
}

}  // namespace ringwright::cases
