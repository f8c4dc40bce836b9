#include "cases/input/case_from_flags.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "cases/input/diagnostic.hpp"
#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

CaseFlags usual_flags() {
  CaseFlags flags;
  flags.soil = "silt loam, moist";
  flags.ring = "30 cm";
  flags.insert = "10 cm";
  flags.head = "5 cm";
  return flags;
}

std::string errors_of(const CaseFlags& flags) {
  try {
    case_from_flags(flags);
  } catch (const CaseErrors& errors) {
    return errors.what();
  }
  return "";
}

}  // namespace

TEST_CASE("a case from flags is the case of the text they stand for") {
  CaseFlags flags = usual_flags();
  flags.accuracy = "0.5 %";
  flags.water = "10 degC";
  flags.Kfs = "18 mm/h at 20 degC";
  flags.stop = "after 6 h";
  flags.job = "it's a job: with \"signs\"";
  const Case from_flags = case_from_flags(flags);
  const Case from_text = read_case(case_text(flags), "x.yaml");
  CHECK(from_flags.job == "it's a job: with \"signs\"");
  CHECK(from_flags.file.empty());
  CHECK(from_flags.text == from_text.text);
  CHECK(from_flags.accuracy == from_text.accuracy);
  CHECK(from_flags.accuracy == Approx(0.005));
  CHECK(from_flags.tests[0].protocol.longest == from_text.tests[0].protocol.longest);
  CHECK(from_flags.ground.variants[0].soil.Ks == from_text.ground.variants[0].soil.Ks);
  CHECK(from_flags.assumed.size() == from_text.assumed.size());
}

TEST_CASE("accuracy may be a plain fraction on the command line as in a file") {
  CaseFlags flags = usual_flags();
  flags.accuracy = "0.003";
  CHECK(case_from_flags(flags).accuracy == Approx(0.003));
}

TEST_CASE("errors name the flag") {
  CaseFlags flags = usual_flags();
  flags.ring = "30";
  CHECK(errors_of(flags) ==
        "--ring \"30\": error: '30' has no unit\n"
        "  hint: write a length with its unit, such as 30 cm\n");
  flags = usual_flags();
  flags.soil = "silt lome, moist";
  CHECK(errors_of(flags) ==
        "--soil \"silt lome, moist\": error: 'silt lome' is not a texture class\n"
        "  hint: did you mean 'silt loam'?\n");
  flags = usual_flags();
  flags.moisture = "wet";
  CHECK(errors_of(flags) ==
        "--moisture \"wet\": error: the moisture is given twice\n"
        "--soil \"silt loam, moist\": note: also given here\n"
        "  hint: keep one of the two\n");
}

TEST_CASE("a missing flag is named with an example") {
  CaseFlags flags = usual_flags();
  flags.ring.reset();
  flags.soil.reset();
  CHECK(errors_of(flags) ==
        "flags: error: --soil is missing\n"
        "  hint: for example  --soil \"silt loam, moist\"\n"
        "flags: error: --ring is missing\n"
        "  hint: for example  --ring \"30 cm\"\n");
}

TEST_CASE("heads or a fall may stand for the head") {
  CaseFlags flags = usual_flags();
  flags.head.reset();
  flags.heads = "5 cm then 15 cm, each for 1 h";
  flags.outer_ring = "60 cm";
  flags.supply = "6 L/min";
  const Case heads = case_from_flags(flags);
  CHECK(heads.tests[0].program.stages.size() == 2);
  CHECK(heads.tests[0].outer_ring->radius == Approx(0.30));
  CHECK(heads.tests[0].program.supply.largest_rate.value() == Approx(1e-4));
  flags.heads.reset();
  flags.fall = "from 20 cm to 5 cm";
  CHECK(case_from_flags(flags).tests[0].rule->kind == models::StopKind::after_volume);
  flags.fall = "from 5 cm to 20 cm";
  CHECK(errors_of(flags) ==
        "--fall \"from 5 cm to 20 cm\": error: a fall from 5 cm does not reach 20 cm\n"
        "  hint: name the higher level first\n");
}

TEST_CASE("a flag cannot bring keys of its own into the text") {
  CaseFlags flags = usual_flags();
  flags.water = "10 degC'\n  Kfs: '5 mm/h";
  CHECK_FALSE(errors_of(flags).empty());
}

}  // namespace ringwright::cases
