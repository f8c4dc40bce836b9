#pragma once
/// The curves that the tests of this room go through.

#include <memory>
#include <string>
#include <vector>

#include "models/soil/brooks_corey.hpp"
#include "models/soil/catalogue.hpp"
#include "models/soil/durner.hpp"
#include "models/soil/gardner.hpp"
#include "models/soil/van_genuchten.hpp"

namespace ringwright::models {

struct SampleCurves {
  std::string name;
  std::shared_ptr<const Curves> curves;
};

/// 12 classes of 2 tables with and without minimum capillary height, Gardner, Brooks-Corey, and
/// soils of two and three pore systems, apart and nearly merged.
inline std::vector<SampleCurves> sample_curves() {
  std::vector<SampleCurves> all;
  for (const PublishedSoil& row : published_soils()) {
    for (const double h_s : {0.0, -0.02}) {
      all.push_back({std::string(row.texture) + ", " + std::string(row.source) + ", h_s " +
                         std::to_string(h_s),
                     make_soil(row, h_s).curves});
    }
  }
  for (const double alpha : {1.0, 4.0, 12.0, 36.0}) {
    all.push_back({"Gardner " + std::to_string(alpha), std::make_shared<Gardner>(alpha)});
  }
  for (const double L : {0.131, 0.592, 3.0}) {
    all.push_back(
        {"Brooks-Corey, Mualem " + std::to_string(L), std::make_shared<BrooksCorey>(-0.2, L)});
    all.push_back({"Brooks-Corey, Burdine " + std::to_string(L),
                   std::make_shared<BrooksCorey>(BrooksCorey::burdine(-0.2, L))});
  }
  for (const double h_s : {0.0, -0.01, -0.02}) {
    const auto add = [&](const char* name, std::vector<PoreSystem> systems) {
      all.push_back({std::string("Durner, ") + name + ", h_s " + std::to_string(h_s),
                     std::make_shared<Durner>(std::move(systems), 0.5, h_s)});
    };
    add("apart", {{0.4, 20.0, 2.1}, {0.6, 0.5, 1.4}});
    add("macropores", {{0.08, 200.0, 3.0}, {0.92, 3.6, 1.56}});
    add("wide macropores", {{0.05, 500.0, 1.6}, {0.95, 1.0, 1.2}});
    add("few macropores", {{0.002, 100.0, 3.0}, {0.998, 1.0, 3.0}});
    add("merged", {{0.5, 4.0, 1.8}, {0.5, 3.0, 1.7}});
    add("three", {{0.08, 200.0, 3.0}, {0.62, 3.6, 1.56}, {0.3, 0.4, 1.8}});
  }
  return all;
}

}  // namespace ringwright::models
