/// The libraries from outside the tree: one coarse ring test, and its water balance.
#include <cmath>
#include <iostream>

#include "models/soil/catalogue.hpp"
#include "solver/virtual_test.hpp"

int main() {
  using namespace ringwright;
  solver::TestSetup setup;
  setup.soil = models::make_soil(models::published_soils_of("sandy loam").front());
  setup.initial_head = -3.0;
  setup.ring = {.radius = 0.1, .insertion = 0.05};
  setup.pond_head = 0.05;
  setup.duration = 1800.0;
  setup.times = {600.0, 1800.0};
  const auto run = solver::run_test(setup, {.tip_cell = 0.01, .top_cell = 0.01});
  if (run.samples.size() != 2) return 1;

  const auto& last = run.samples.back();
  const double gone = last.stored_volume + last.drainage_volume + last.seepage_volume;
  std::cout << "into the soil " << 1000.0 * last.ring_volume << " L\n";
  const bool more_than_before = last.ring_volume > run.samples.front().ring_volume;
  // Mass balance: what went in is what is there or went out.
  const bool balanced = std::abs(gone - last.ring_volume) < 1e-5 * last.ring_volume;
  return more_than_before && balanced ? 0 : 1;
}
