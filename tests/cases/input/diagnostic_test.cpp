#include "cases/input/diagnostic.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "cases/input/suggestion.hpp"

namespace ringwright::cases {

TEST_CASE("a diagnostic shows its place, the lines around, a caret and a hint") {
  const Source source{"garden.yaml", "ground:\n  textur: loam\n  water: 10 degC\n", {}};
  const Diagnostic diagnostic{{2, 3, 6}, "unknown key 'textur'", "did you mean 'texture'?", {}, ""};
  CHECK(render(diagnostic, source) ==
        "garden.yaml:2:3: error: unknown key 'textur'\n"
        "    1 | ground:\n"
        "    2 |   textur: loam\n"
        "      |   ^~~~~~\n"
        "    3 |   water: 10 degC\n"
        "  hint: did you mean 'texture'?\n");
}

TEST_CASE("a contradiction shows both places") {
  const Source source{"garden.yaml", "a: 1\nb: 2\na: 3\n", {}};
  const Diagnostic diagnostic{
      {3, 1, 1}, "key 'a' is given twice", "", Place{1, 1, 1}, "first here"};
  CHECK(render(diagnostic, source) ==
        "garden.yaml:3:1: error: key 'a' is given twice\n"
        "    2 | b: 2\n"
        "    3 | a: 3\n"
        "      | ^\n"
        "garden.yaml:1:1: note: first here\n"
        "    1 | a: 1\n"
        "      | ^\n"
        "    2 | b: 2\n");
}

TEST_CASE("errors are sorted by place and the first twenty are shown") {
  std::vector<Diagnostic> diagnostics;
  for (int line = 23; line > 0; --line) {
    diagnostics.push_back({{line, 1, 1}, "wrong " + std::to_string(line), "", {}, ""});
  }
  const CaseErrors errors(diagnostics, Source{"x.yaml", std::string(30, '\n'), {}});
  CHECK(errors.diagnostics().size() == 23);
  CHECK(errors.diagnostics().front().place.line == 1);
  const std::string text = errors.what();
  CHECK(text.find("error: wrong 20\n") != std::string::npos);
  CHECK(text.find("error: wrong 21\n") == std::string::npos);
  CHECK(text.find("x.yaml: 3 more errors are not shown\n") != std::string::npos);
}

TEST_CASE("a long line is cut round the caret") {
  const Source source{"x.yaml", "a: " + std::string(1000, 'x') + "\n", {}};
  CHECK(render({{1, 900, 1}, "wrong", "", {}, ""}, source) ==
        "x.yaml:1:900: error: wrong\n"
        "    1 | " +
            std::string(120, 'x') +
            "\n"
            "      | " +
            std::string(59, ' ') + "^\n");
}

TEST_CASE("the nearest word is suggested, a far one is not") {
  const std::vector<std::string> keys{"ring", "insert", "head", "minimum capillary height"};
  CHECK(suggest("rng", keys) == "did you mean 'ring'?");
  CHECK(suggest("Ring", keys) == "did you mean 'ring'?");
  CHECK(suggest("insret", keys) == "did you mean 'insert'?");
  CHECK(suggest("minimum-capillary_height", keys) == "did you mean 'minimum capillary height'?");
  CHECK(suggest("mesh", keys) == "allowed: ring, insert, head, minimum capillary height");
}

}  // namespace ringwright::cases
