#include "cases/simulate/first_screen.hpp"

#include <fmt/format.h>

#include <utility>
#include <vector>

#include "cases/simulate/event_lines.hpp"
#include "cases/simulate/flag_lines.hpp"
#include "cases/simulate/formula_range.hpp"
#include "cases/simulate/headline.hpp"
#include "cases/simulate/ladder_table.hpp"
#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/screen_foot.hpp"
#include "cases/simulate/stage_table.hpp"
#include "cases/simulate/stop_figures.hpp"
#include "cases/simulate/test_title.hpp"
#include "cases/simulate/verdict_table.hpp"
#include "cases/simulate/water_table.hpp"

namespace ringwright::cases {
namespace {

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

// Which tables of published soils have no table of their own on the screen.
std::string sources_of_others(const Case& what, const AnsweredTest& answered) {
  std::string sources;
  for (std::size_t i = 1; i < answered.answers.size(); ++i) {
    sources += (sources.empty() ? "" : ", ") + what.ground.variants[i].source;
  }
  return sources;
}

std::string other_ladders(const Case& what, const AnsweredTest& answered) {
  const std::string sources = sources_of_others(what, answered);
  return sources.empty() ? "" : fmt::format("    the ladder by {}: --csv\n", sources);
}

std::string with_blank(const std::string& block) { return block.empty() ? "" : block + "\n"; }

// The ladder and the readings at the stop of a constant head.
std::string ladder_tables(const Case& what, const AnsweredTest& answered) {
  const postprocess::Answer& answer = answered.answers.front();
  return ladder_table(answer) + other_ladders(what, answered) + "\n" +
         with_blank(reading_table(answer, what.ground.water_temperature));
}

// Stages, pairs of heads and levels of any other test.
std::string stage_tables(const Case& what, const AnsweredTest& answered) {
  const postprocess::Answer& answer = answered.answers.front();
  const std::string others = sources_of_others(what, answered);
  const std::string note =
      others.empty() ? "" : fmt::format("    the stages by {}: --csv\n", others);
  return with_blank(stage_table(answer) + note) +
         with_blank(pair_table(answer, what.ground.water_temperature)) +
         with_blank(level_table(answer));
}

// What happens in the ground and with the water until the stop.
std::string details(const postprocess::Answer& answer) {
  std::string text = stop_details(answer);
  text += influence_line(answer) + event_lines(answer) + reading_lines(answer);
  if (stop_of(answer) != nullptr) text += formula_range(answer);
  return text;
}

std::string tables(const Case& what, const AnsweredTest& answered) {
  const postprocess::Answer& answer = answered.answers.front();
  std::string text;
  if (answered.answers.size() > 1) {
    text = fmt::format("  By {}\n", what.ground.variants.front().source);
  }
  text += answer.ladder.empty() ? stage_tables(what, answered) : ladder_tables(what, answered);
  if (!stop_time(answer)) return text;
  return text + with_blank(verdict_table(answer)) + with_blank(water_table(answer)) +
         with_blank(details(answer));
}

std::string flags(const postprocess::Answer& answer) {
  return with_blank(stages_left_out(answer) + flag_lines(answer));
}

}  // namespace

std::string first_screen(const Case& what, const AnsweredTest& answered,
                         std::span<const std::filesystem::path> files) {
  const postprocess::Answer& answer = answered.answers.front();
  std::string text = test_title(what, answered.test) + not_for_use(answer) + "\n" +
                     headline(what, answered) + "\n" + flags(answer);
  if (!answer.ladder.empty() || stop_time(answer)) text += tables(what, answered);
  return text + assumed_block(what, answered) + doubt_lines(what, answered) + files_lines(files);
}

}  // namespace ringwright::cases
