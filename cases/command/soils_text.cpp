#include "cases/command/soils_text.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <vector>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "models/soil/capillary_length.hpp"

namespace ringwright::cases {
namespace {

using models::PublishedSoil;

double capillary_length(const PublishedSoil& soil, double minimum_capillary_height) {
  return models::capillary_length(*models::make_soil(soil, minimum_capillary_height).curves);
}

std::string row(const PublishedSoil& soil, bool with_name) {
  const double h_s = models::default_minimum_capillary_height(soil.n);
  return fmt::format("{:15}  {:22} {:7.3f} {:7.3f} {:7.4f} {:6.3f} {:>8} {:5g} {:>8} {:>8}\n",
                     with_name ? soil.texture : "", soil.source, soil.theta_r, soil.theta_s,
                     soil.alpha / 100.0, soil.n, mm_per_hour(soil.Ks), 100.0 * h_s,
                     rounded(100.0 * capillary_length(soil, h_s)),
                     rounded(100.0 * capillary_length(soil, 0.0)));
}

std::vector<std::string_view> citations(std::span<const PublishedSoil> soils) {
  std::vector<std::string_view> found;
  for (const PublishedSoil& soil : soils) {
    if (std::find(found.begin(), found.end(), soil.citation) == found.end()) {
      found.push_back(soil.citation);
    }
  }
  return found;
}

nlohmann::json with_unit(double value, std::string_view unit) {
  return {{"value", value}, {"unit", unit}};
}

}  // namespace

std::string soils_text(std::span<const PublishedSoil> soils) {
  std::string text = fmt::format(
      "{0:15}  {0:22} {0:7} {0:7} {1:>7} {0:6} {2:>8} {3:>5} {4:>17}\n"
      "{5:15}  {6:22} {7:>7} {8:>7} {9:>7} {10:>6} {11:>8} {12:>5} {13:>8} {14:>8}\n",
      "", "alpha", "Ks", "h_s", "capillary cm", "class", "table", "theta_r", "theta_s", "1/cm", "n",
      "mm/h", "cm", "at h_s", "at 0");
  std::string_view previous;
  for (const PublishedSoil& soil : soils) {
    text += row(soil, soil.texture != previous);
    previous = soil.texture;
  }
  text += "\n" + paragraph(
                     "van Genuchten - Mualem, l = 0.5; Ks at 20 degC, as published. h_s: "
                     "minimum capillary height taken unless you give one (Vogel et al. 2001, "
                     "Adv. Water Resour. 24:133). capillary: capillary length with that h_s "
                     "and with h_s = 0.",
                     "", "");
  for (const std::string_view citation : citations(soils)) {
    text += paragraph(citation, "Source: ", "  ");
  }
  return text;
}

nlohmann::json soils_json(std::span<const PublishedSoil> soils) {
  nlohmann::json rows = nlohmann::json::array();
  for (const PublishedSoil& soil : soils) {
    const double h_s = models::default_minimum_capillary_height(soil.n);
    rows.push_back(
        {{"texture", soil.texture},
         {"source", soil.source},
         {"citation", soil.citation},
         {"theta_r", with_unit(soil.theta_r, "1")},
         {"theta_s", with_unit(soil.theta_s, "1")},
         {"alpha", with_unit(soil.alpha, "1/m")},
         {"n", with_unit(soil.n, "1")},
         {"Ks", with_unit(soil.Ks, "m/s")},
         {"minimum_capillary_height", with_unit(h_s, "m")},
         {"capillary_length", with_unit(capillary_length(soil, h_s), "m")},
         {"capillary_length_without_height", with_unit(capillary_length(soil, 0.0), "m")}});
  }
  return rows;
}

}  // namespace ringwright::cases
