#include "cases/simulate/first_screen.hpp"

#include <fmt/format.h>

#include <utility>
#include <vector>

#include "cases/simulate/formula_range.hpp"
#include "cases/simulate/headline.hpp"
#include "cases/simulate/ladder_table.hpp"
#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/screen_foot.hpp"
#include "cases/simulate/version.hpp"

namespace ringwright::cases {
namespace {

std::string title(const Case& what, const Test& test) {
  std::string text = fmt::format("Ringwright {}: one virtual ring test", program_version);
  if (!what.job.empty()) text += fmt::format(" for {}", what.job);
  const std::string ground = what.ground.variants.front().label;
  return paragraph(text, "", "  ") +
         paragraph(fmt::format("{}: {} cm ring, {} cm into {} ({}), {} cm constant head, water "
                               "{:g} degC",
                               test.name, centimetres(2.0 * test.ring.radius),
                               centimetres(test.ring.insertion), ground, what.ground.moisture.words,
                               centimetres(test.protocol.head), what.ground.water_temperature),
                   "", "  ");
}

// A line per folder.
std::string files_lines(std::span<const std::filesystem::path> files) {
  std::vector<std::pair<std::filesystem::path, std::string>> folders;
  for (const auto& file : files) {
    if (folders.empty() || folders.back().first != file.parent_path()) {
      folders.emplace_back(file.parent_path(), "");
    }
    folders.back().second += " " + file.filename().string();
  }
  std::string text;
  for (const auto& [folder, names] : folders) {
    text += paragraph(folder.string() + ":" + names, text.empty() ? "  Files  " : "         ",
                      "           ");
  }
  return text;
}

// Which tables of published soils have no ladder on the screen.
std::string other_ladders(const Case& what, const AnsweredTest& answered) {
  std::string sources;
  for (std::size_t i = 1; i < answered.answers.size(); ++i) {
    sources += (sources.empty() ? "" : ", ") + what.ground.variants[i].source;
  }
  return sources.empty() ? "" : fmt::format("    the ladder by {}: --csv\n", sources);
}

std::string tables(const Case& what, const AnsweredTest& answered) {
  const postprocess::Answer& answer = answered.answers.front();
  std::string text;
  if (answered.answers.size() > 1) {
    text = fmt::format("  By {}\n", what.ground.variants.front().source);
  }
  text += ladder_table(answer) + other_ladders(what, answered);
  const std::string readings = reading_table(answer, what.ground.water_temperature);
  if (!readings.empty())
    text += "\n" + readings + "\n" + stop_details(answer) + formula_range(answer);
  return text + "\n";
}

}  // namespace

std::string first_screen(const Case& what, const AnsweredTest& answered,
                         std::span<const std::filesystem::path> files) {
  std::string text = title(what, answered.test) + "\n" + headline(what, answered) + "\n";
  if (!answered.answers.front().ladder.empty()) text += tables(what, answered);
  return text + assumed_block(what, answered) + doubt_lines(what, answered) + files_lines(files);
}

}  // namespace ringwright::cases
