#include "postprocess/results/provenance.hpp"

#include <catch2/catch.hpp>

#include "tests/postprocess/results/synthetic_answer.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

TEST_CASE("provenance says what case, what program and how it went") {
  const auto found = to_json(synthetic_provenance());
  CHECK(found.at("case_text") == synthetic_origin().case_text);
  CHECK(found.at("case_sha256").get<std::string>().size() == 64);
  CHECK(found.at("resolved_case") == synthetic_origin().resolved_case);
  CHECK(found.at("program_version") == "0.1.0");
  CHECK_FALSE(found.at("compiler").get<std::string>().empty());
  CHECK(found.at("libraries").at("SUNDIALS") == "6.4.1");
  for (const auto* library : {"HDF5", "Eigen", "nlohmann-json", "fmt", "OpenSSL"}) {
    INFO(library);
    const auto version = found.at("libraries").at(library).get<std::string>();
    CHECK(version.find_first_not_of("0123456789.") == std::string::npos);
    CHECK(version.find('.') != std::string::npos);
  }
  CHECK(found.at("mesh").at("cells") == 6);
  CHECK(found.at("mesh").at("points") == 12);
  CHECK(found.at("mesh").at("domain_radius").at("value") == 0.3);
  CHECK(found.at("tolerances").at("accuracy").at("value") == 0.01);
  CHECK(found.at("tolerances").at("theta_tolerance").at("value") == 1e-3);
  CHECK(found.at("statistics").at("steps") == 321);
  CHECK(found.at("statistics").at("total_steps") == 4321);
}

TEST_CASE("a date is in the provenance only when given") {
  Origin origin = synthetic_origin();
  CHECK_FALSE(to_json(provenance_of(origin, synthetic_answer())).contains("written_at"));
  origin.written_at = "2031-05-06T07:08:09Z";
  CHECK(to_json(provenance_of(origin, synthetic_answer())).at("written_at") ==
        "2031-05-06T07:08:09Z");
}

TEST_CASE("an answer that names no resolution has only the accuracy as tolerance") {
  Answer answer = synthetic_answer();
  answer.resolution.reset();
  CHECK(to_json(provenance_of(synthetic_origin(), answer)).at("tolerances").size() == 1);
}
