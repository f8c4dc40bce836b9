#include <algorithm>
#include <catch2/catch.hpp>
#include <map>
#include <sstream>

#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/fields_file.hpp"
#include "postprocess/results/record_csv.hpp"
#include "tests/postprocess/results/h5_reader.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

namespace {

using Units = std::map<std::string, std::string>;

std::string layout_page() {
  return content_of(std::filesystem::path(RINGWRIGHT_SOURCE_DIR) / "postprocess/results/LAYOUT.md");
}

/// Cells of a line of a table, without blanks at the ends and without quotes.
std::vector<std::string> cells_of(const std::string& line) {
  std::vector<std::string> cells;
  std::istringstream stream(line.substr(1));
  for (std::string cell; std::getline(stream, cell, '|');) {
    const auto drop = [](char c) { return c == ' ' || c == '`'; };
    cell.erase(cell.begin(), std::find_if_not(cell.begin(), cell.end(), drop));
    cell.erase(std::find_if_not(cell.rbegin(), cell.rend(), drop).base(), cell.end());
    cells.push_back(cell);
  }
  return cells;
}

/// Unit by name of the tables whose names begin as told; the unit stands in the given column.
Units named_units(const std::string& beginning, std::size_t column) {
  Units units;
  std::istringstream lines(layout_page());
  for (std::string line; std::getline(lines, line);) {
    if (!line.starts_with("| `" + beginning)) continue;
    const auto cells = cells_of(line);
    units[cells.at(0)] = cells.at(column);
  }
  return units;
}

}  // namespace

TEST_CASE("the layout page names every dataset of the file with its unit, and no other") {
  const TemporaryFolder folder;
  write_atomically(folder.path() / "fields.h5",
                   fields_file(synthetic_answer(), synthetic_provenance()));
  const H5Reader reader(folder.path() / "fields.h5");
  Units written;
  for (const auto& name : reader.names(H5O_TYPE_DATASET)) {
    std::string shown = name;
    if (name.starts_with("/fields/snapshots/")) shown.replace(name.rfind('_') + 1, 4, "NNNN");
    written[shown] = reader.attribute(name, "units");
  }
  CHECK(named_units("/", 3) == written);
}

TEST_CASE("the layout page names every column of the record") {
  const std::string table = record_csv(Answer{});
  std::istringstream header(table.substr(0, table.find('\n')));
  const std::string page = layout_page();
  for (std::string column; std::getline(header, column, ',');) {
    INFO(column);
    CHECK(page.find("| `" + column + "` | ") != std::string::npos);
  }
}
