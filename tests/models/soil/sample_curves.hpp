#pragma once
/// The curves that the tests of this room go through.

#include <memory>
#include <string>
#include <vector>

#include "models/soil/brooks_corey.hpp"
#include "models/soil/catalogue.hpp"
#include "models/soil/gardner.hpp"
#include "models/soil/van_genuchten.hpp"

namespace ringwright::models {

struct SampleCurves {
  std::string name;
  std::shared_ptr<const Curves> curves;
};

/// 12 classes of 2 tables with and without minimum capillary height, Gardner, Brooks-Corey.
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
  return all;
}

}  // namespace ringwright::models
