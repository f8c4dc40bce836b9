#pragma once
/// Published soils: class averages with the table they come from.

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// One row of a published table of van Genuchten - Mualem parameters (l = 0.5).
struct PublishedSoil {
  std::string_view texture;   ///< USDA class, lower case: "silt loam"
  std::string_view source;    ///< short: "Carsel & Parrish 1988"
  std::string_view citation;  ///< author, year, journal, pages, table
  double theta_r, theta_s;    ///< [-]
  double alpha;               ///< [1/m]
  double n;                   ///< [-]
  double Ks;                  ///< [m/s] at 20 degC (as published)
};

/// All rows, ordered by class from coarse to fine, then by source.
std::span<const PublishedSoil> published_soils();

/// The rows of one class (one per source); empty for an unknown class.
std::vector<PublishedSoil> published_soils_of(std::string_view texture);

/// The twelve class names, coarse to fine.
std::vector<std::string_view> texture_classes();

/// Minimum capillary height used when none is given [m]: -0.02 for n < 2, 0 otherwise
/// (Vogel, van Genuchten & Cislerova 2001, Adv. Water Resour. 24:133).
double default_minimum_capillary_height(double n);

/// The soil of a row. @param h_s minimum capillary height [m], <= 0; none: the default for its n
Soil make_soil(const PublishedSoil& row, std::optional<double> h_s = std::nullopt);

}  // namespace ringwright::models
