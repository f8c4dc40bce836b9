#include "cases/simulate/simulation_json.hpp"

#include "cases/simulate/resolved_case.hpp"
#include "cases/simulate/result_folder.hpp"
#include "cases/simulate/version.hpp"
#include "postprocess/results/answer_json.hpp"

namespace ringwright::cases {

nlohmann::json simulation_json(const Simulation& simulation) {
  const postprocess::Origin origin = origin_of(simulation.what);
  nlohmann::json tests = nlohmann::json::array();
  for (const AnsweredTest& answered : simulation.tests) {
    nlohmann::json soils = nlohmann::json::array();
    for (std::size_t i = 0; i < answered.answers.size(); ++i) {
      const SoilVariant& variant = simulation.what.ground.variants[i];
      const postprocess::Answer& answer = answered.answers[i];
      nlohmann::json entry =
          postprocess::answer_document(answer, postprocess::provenance_of(origin, answer));
      entry["soil"] = variant.label;
      entry["source"] = variant.source;
      soils.push_back(std::move(entry));
    }
    tests.push_back({{"test", answered.test.name}, {"soils", soils}});
  }
  return {{"format", "ringwright-simulation"},
          {"format_version", 1},
          {"program_version", program_version},
          {"complete", simulation.complete()},
          {"accuracy_met", simulation.accuracy_met()},
          {"case", resolved_case(simulation.what)},
          {"tests", tests}};
}

}  // namespace ringwright::cases
