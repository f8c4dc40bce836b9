#include "cases/input/schema.hpp"

#include "cases/input/schema_ground.hpp"
#include "cases/input/schema_tests.hpp"

namespace ringwright::cases {

const Key* Key::find(std::string_view key_name) const {
  for (const Key& key : keys) {
    if (key.name == key_name) return &key;
  }
  return nullptr;
}

Key case_file_grammar() {
  Key file;
  file.name = "case file";
  file.kind = ValueKind::section;
  file.meaning = "What is known of the ground and which ring tests are to be looked at.";
  file.keys = {
      {.name = "ringwright",
       .kind = ValueKind::version,
       .meaning = "Version of the case file's grammar; comes first.",
       .examples = {"1"},
       .required = true},
      {.name = "job",
       .kind = ValueKind::text,
       .meaning = "Name of the job, as it is to stand on the results.",
       .examples = {"Alderwick Township, 12 rain gardens"}},
      {.name = "accuracy",
       .kind = ValueKind::quantity,
       .meaning = "Numerical accuracy asked of every printed figure; 1 % if not given.",
       .examples = {"1 %"},
       .dimension = Dimension::fraction,
       .range = Range{0.001, 0.05, "0.1 % to 5 % (0.001 to 0.05)"}},
      ground_grammar(),
      tests_grammar(),
  };
  return file;
}

}  // namespace ringwright::cases
