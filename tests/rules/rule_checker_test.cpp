/// The rules themselves, on small made-up trees: a violation is found, its neighbour is not.
#include <catch2/catch.hpp>

#include <map>
#include <string>

#include "tests/rules/file_form.hpp"
#include "tests/rules/header_fences.hpp"
#include "tests/rules/include_direction.hpp"
#include "tests/rules/source_tree.hpp"

using namespace ringwright::rules;

namespace {
SourceTree tree_of(const std::map<std::string, std::string>& texts) {
  SourceTree tree;
  for (const auto& [path, text] : texts) tree[path] = parse_source(text);
  return tree;
}

std::string including(const std::string& target) { return "#include " + target + "\n"; }
}  // namespace

TEST_CASE("a source is parsed", "[rules]") {
  const auto file = parse_source(
      "#pragma once\n// #include <thread>\n#include <vector>\n #  include \"models/a.hpp\" // "
      "why\n");
  CHECK(file.lines == 4);
  CHECK(file.pragma_once);
  REQUIRE(file.includes.size() == 2);
  CHECK(file.includes[0].target == "vector");
  CHECK(file.includes[0].angled);
  CHECK(file.includes[1].target == "models/a.hpp");
  CHECK_FALSE(file.includes[1].angled);
  CHECK(file.includes[1].line == 4);
}

TEST_CASE("an upward include is found, a downward one is not", "[rules]") {
  const auto tree = tree_of({{"models/a.hpp", including("\"solver/b.hpp\"")},
                             {"solver/b.hpp", ""},
                             {"cases/c.cpp", including("\"models/a.hpp\"")}});
  CHECK(listing(upward_includes(tree)) == "models/a.hpp:1: upward include: models -> solver\n");
}

TEST_CASE("each floor is above the one before", "[rules]") {
  const std::map<std::string, std::string> above = {
      {"models", "solver"}, {"solver", "postprocess"}, {"postprocess", "cases"}};
  for (const auto& [low, high] : above) {
    const std::string lower = low + "/a.hpp", higher = high + "/b.hpp";
    const auto up = tree_of({{lower, including("\"" + higher + "\"")}, {higher, ""}});
    const auto down = tree_of({{higher, including("\"" + lower + "\"")}, {lower, ""}});
    CHECK(upward_includes(up).size() == 1);
    CHECK(upward_includes(down).empty());
  }
}

TEST_CASE("tests and validation are seen by no floor and see all", "[rules]") {
  const auto tree = tree_of({{"cases/a.cpp", including("\"tests/t.hpp\"")},
                             {"tests/t.hpp", including("\"cases/b.hpp\"")},
                             {"tests/u_test.cpp", including("\"tests/t.hpp\"")},
                             {"validation/v_check.cpp", including("\"tests/t.hpp\"")},
                             {"validation/v.hpp", ""},
                             {"tests/w_test.cpp", including("\"validation/v.hpp\"")},
                             {"cases/b.hpp", ""}});
  CHECK(listing(upward_includes(tree)) ==
        "cases/a.cpp:1: cases must not include tests\n"
        "tests/w_test.cpp:1: tests must not include validation\n");
}

TEST_CASE("includes relative to the file are found", "[rules]") {
  const auto tree = tree_of({{"models/soil/a.hpp", ""},
                             {"models/soil/near.cpp", including("\"a.hpp\"")},
                             {"models/soil/up.cpp", including("\"../soil/a.hpp\"")},
                             {"models/soil/right.cpp", including("\"models/soil/a.hpp\"")},
                             {"models/soil/outside.cpp", including("<vector>")}});
  const auto found = includes_not_from_root(tree);
  REQUIRE(found.size() == 2);
  CHECK(found[0].file == "models/soil/near.cpp");
  CHECK(found[1].file == "models/soil/up.cpp");
}

TEST_CASE("a cycle is found with its chain, a diamond is none", "[rules]") {
  const auto cycle = tree_of({{"models/a.hpp", including("\"models/b.hpp\"")},
                              {"models/b.hpp", including("\"models/c.hpp\"")},
                              {"models/c.hpp", including("\"models/a.hpp\"")}});
  CHECK(listing(include_cycles(cycle)) ==
        "models/a.hpp: include cycle: models/a.hpp -> models/b.hpp -> models/c.hpp -> "
        "models/a.hpp\n");
  const auto self = tree_of({{"models/a.hpp", including("\"models/a.hpp\"")}});
  CHECK(include_cycles(self).size() == 1);
  const auto diamond =
      tree_of({{"models/a.hpp", including("\"models/b.hpp\"") + including("\"models/c.hpp\"")},
               {"models/b.hpp", including("\"models/d.hpp\"")},
               {"models/c.hpp", including("\"models/d.hpp\"")},
               {"models/d.hpp", ""}});
  CHECK(include_cycles(diamond).empty());
}

TEST_CASE("each fenced library is found outside its fence and left alone inside", "[rules]") {
  struct Row {
    const char *header, *inside, *outside;
  };
  const auto row = GENERATE(values<Row>({
      {"<ida/ida.h>", "solver/time/a.cpp", "solver/linear/a.cpp"},
      {"<nvector/nvector_serial.h>", "solver/time/a.cpp", "solver/flow/a.cpp"},
      {"<klu.h>", "solver/linear/a.cpp", "solver/time/a.cpp"},
      {"<suitesparse/klu.h>", "solver/linear/a.cpp", "models/a.cpp"},
      {"<hdf5.h>", "postprocess/results/a.cpp", "postprocess/reading/a.cpp"},
      {"<H5Cpp.h>", "postprocess/results/a.cpp", "cases/simulate/a.cpp"},
      {"<openssl/evp.h>", "postprocess/results/a.cpp", "cases/input/a.cpp"},
      {"<yaml-cpp/yaml.h>", "cases/input/a.cpp", "cases/command/a.cpp"},
      {"<udunits2.h>", "cases/input/a.cpp", "postprocess/results/a.cpp"},
      {"<CLI/CLI.hpp>", "cases/command/a.cpp", "cases/simulate/a.cpp"},
      {"<nlohmann/json.hpp>", "postprocess/results/a.cpp", "postprocess/reading/a.cpp"},
      {"<nlohmann/json.hpp>", "cases/command/a.cpp", "solver/a.cpp"},
      {"<fmt/format.h>", "postprocess/reading/a.cpp", "solver/a.cpp"},
      {"<Eigen/Sparse>", "solver/linear/a.cpp", "models/a.cpp"},
      {"<catch2/catch.hpp>", "validation/a_check.cpp", "models/a.cpp"},
      {"<unistd.h>", "cases/command/a.cpp", "solver/a.cpp"},
  }));
  CAPTURE(row.header, row.inside, row.outside);
  CHECK(broken_fences(tree_of({{row.inside, including(row.header)}})).empty());
  CHECK(broken_fences(tree_of({{row.outside, including(row.header)}})).size() == 1);
  CHECK(broken_fences(tree_of({{"tests/a_test.cpp", including(row.header)}})).empty());
}

TEST_CASE("quotes do not hide a fenced header", "[rules]") {
  CHECK(broken_fences(tree_of({{"models/a.cpp", including("\"klu.h\"")}})).size() == 1);
}

TEST_CASE("a library nobody fenced is found", "[rules]") {
  CHECK(broken_fences(tree_of({{"cases/a.cpp", including("<stranger/all.hpp>")}})).size() == 1);
  CHECK(broken_fences(tree_of({{"cases/a.cpp", including("<vector>")}})).empty());
}

TEST_CASE("clocks, threads, files and printing are found in the lower floors", "[rules]") {
  const std::string header = GENERATE("chrono", "thread", "fstream", "iostream", "cstdio", "mutex",
                                      "locale", "ctime", "filesystem", "stdio.h");
  CAPTURE(header);
  const std::string text = including("<" + header + ">");
  CHECK(impure_floors(tree_of({{"models/a.cpp", text}})).size() == 1);
  CHECK(impure_floors(tree_of({{"solver/a.cpp", text}})).size() == 1);
  CHECK(impure_floors(tree_of({{"postprocess/a.cpp", text}})).empty());
}

TEST_CASE("what the lower floors need of the standard library is free", "[rules]") {
  const std::string text = including("<vector>") + including("<atomic>") + including("<cmath>");
  CHECK(impure_floors(tree_of({{"solver/a.cpp", text}})).empty());
}

TEST_CASE("a header without pragma once and a long file are found", "[rules]") {
  std::string lines_400 = "#pragma once\n";
  for (int i = 1; i < 400; ++i) lines_400 += "\n";
  const auto tree = tree_of({{"models/bare.hpp", "\n"},
                             {"models/guarded.hpp", lines_400},
                             {"models/long.cpp", lines_400 + "\n"}});
  CHECK(listing(misshapen_files(tree)) ==
        "models/bare.hpp: header without #pragma once\n"
        "models/long.cpp:401: longer than 400 lines\n");
}
