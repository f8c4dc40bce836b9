#include "validation/benchmark/staged_cost.hpp"

#include <fmt/format.h>

#include <memory>
#include <stdexcept>
#include <string_view>

#include "models/soil/catalogue.hpp"
#include "postprocess/reading/answer_question.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "validation/benchmark/cpu_time.hpp"
#include "validation/benchmark/measured_simulation.hpp"

namespace ringwright::validation {
namespace {

constexpr double kAccuracy = 0.01;
constexpr double kMinute = 60.0;

models::Soil soil_of(std::string_view texture) {
  for (const models::PublishedSoil& row : models::published_soils_of(texture))
    if (row.source == "Carsel & Parrish 1988") return models::make_soil(row);
  throw std::invalid_argument("no such class");
}

// 14.5 cm ring, 5 cm deep, 15 cm of water for 100 min: the higher of the two heads below.
solver::TestSetup constant_head(std::string_view texture) {
  solver::TestSetup s;
  s.soil = soil_of(texture);
  s.initial_head = -3.0;
  s.ring = {0.0725, 0.05};
  s.pond_head = 0.15;
  s.duration = 100 * kMinute;
  for (int k = 1; k <= 20; ++k) s.times.push_back(5 * k * kMinute);
  return s;
}

// 5, 15, 5, 15 cm for 40, 20, 20, 20 min, bailed on the way down.
solver::TestSetup two_heads(std::string_view texture) {
  solver::TestSetup s = constant_head(texture);
  const auto bail = models::StepDown::bail;
  s.program.stages = {{.head = 0.05, .duration = 40 * kMinute, .down = bail},
                      {.head = 0.15, .duration = 20 * kMinute, .down = bail},
                      {.head = 0.05, .duration = 20 * kMinute, .down = bail},
                      {.head = 0.15, .duration = 20 * kMinute, .down = bail}};
  return s;
}

solver::TestSetup single_ring(std::string_view texture) {
  solver::TestSetup s = constant_head(texture);
  s.ring = {0.15, 0.10};
  s.pond_head = 0.10;
  return s;
}

solver::TestSetup double_ring(std::string_view texture, double inner, double outer) {
  solver::TestSetup s = single_ring(texture);
  s.ring.insertion = inner;
  s.outer_ring = models::SingleRing{0.30, outer};
  return s;
}

double run_cost(const solver::TestSetup& s) {
  const Table table = std::make_shared<solver::CurveTable>(s.soil.curves);
  const solver::Resolution r =
      solver::resolution_for(s, kAccuracy, table->capillary_length(), 0.05 * s.duration);
  return cpu_time_of([&] { measured_cached(s, r, table); }).median;
}

double answer_cost(const solver::TestSetup& s) {
  postprocess::Question q;
  q.setup = s;
  q.setup.times.clear();
  q.reading_interval = 5 * kMinute;
  q.assumed_alpha_star = 12.0;
  q.accuracy = kAccuracy;
  q.find_influence = false;
  return cpu_time_of([&] { postprocess::answer(q); }).median;
}

void print_row(std::string_view what, std::string_view texture, const solver::TestSetup& s,
               const solver::TestSetup& base) {
  const double run = run_cost(s), plain = run_cost(base);
  const double answer = answer_cost(s), plain_answer = answer_cost(base);
  fmt::print("{:<28}{:<12}{:>8.2f}{:>8.2f}{:>7.2f}{:>10.1f}{:>10.1f}{:>7.2f}\n", what, texture,
             1e3 * run, 1e3 * plain, run / plain, 1e3 * answer, 1e3 * plain_answer,
             answer / plain_answer);
}

}  // namespace

void print_staged_costs() {
  fmt::print("\nStages and second rings against one head in one ring, 1 %, CPU ms\n");
  fmt::print("{:<28}{:<12}{:>8}{:>8}{:>7}{:>10}{:>10}{:>7}\n", "test", "soil", "run", "plain",
             "times", "answer", "plain", "times");
  for (std::string_view texture : {"sand", "loam", "silt loam", "clay"}) {
    print_row("two heads, four stages", texture, two_heads(texture), constant_head(texture));
    print_row("double ring, 10 and 10 cm", texture, double_ring(texture, 0.10, 0.10),
              single_ring(texture));
    print_row("double ring, 10 and 15 cm", texture, double_ring(texture, 0.10, 0.15),
              single_ring(texture));
  }
}

}  // namespace ringwright::validation
