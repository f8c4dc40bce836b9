#include "models/soil/catalogue.hpp"

#include <array>
#include <cmath>
#include <memory>

#include "models/soil/van_genuchten.hpp"

namespace ringwright::models {
namespace {

constexpr double kCentimetre = 0.01;
constexpr double kCentimetrePerDay = 0.01 / 86400.0;

constexpr std::array<std::string_view, 12> kTextures{"sand",
                                                     "loamy sand",
                                                     "sandy loam",
                                                     "loam",
                                                     "silt",
                                                     "silt loam",
                                                     "sandy clay loam",
                                                     "clay loam",
                                                     "silty clay loam",
                                                     "sandy clay",
                                                     "silty clay",
                                                     "clay"};

// Units of the paper: alpha in 1/cm, Ks in cm/d (24 times the mean printed in cm/h, rounded).
struct CarselParrishRow {
  double theta_r, theta_s, alpha, n, Ks;
};

constexpr std::array<CarselParrishRow, 12> kCarselParrish{{
    {0.045, 0.43, 0.145, 2.68, 712.8},
    {0.057, 0.41, 0.124, 2.28, 350.2},
    {0.065, 0.41, 0.075, 1.89, 106.1},
    {0.078, 0.43, 0.036, 1.56, 24.96},
    {0.034, 0.46, 0.016, 1.37, 6.00},
    {0.067, 0.45, 0.020, 1.41, 10.80},
    {0.100, 0.39, 0.059, 1.48, 31.44},
    {0.095, 0.41, 0.019, 1.31, 6.24},
    {0.089, 0.43, 0.010, 1.23, 1.68},
    {0.100, 0.38, 0.027, 1.23, 2.88},
    {0.070, 0.36, 0.005, 1.09, 0.48},
    {0.068, 0.38, 0.008, 1.09, 4.80},
}};

// log10 of alpha in 1/cm, of n, and of Ks in cm/d.
struct SchaapRow {
  double theta_r, theta_s, log_alpha, log_n, log_Ks;
};

constexpr std::array<SchaapRow, 12> kSchaap{{
    {0.053, 0.375, -1.453, 0.502, 2.808},
    {0.049, 0.390, -1.459, 0.242, 2.022},
    {0.039, 0.387, -1.574, 0.161, 1.583},
    {0.061, 0.399, -1.954, 0.168, 1.081},
    {0.050, 0.489, -2.182, 0.225, 1.641},
    {0.065, 0.439, -2.296, 0.221, 1.261},
    {0.063, 0.384, -1.676, 0.124, 1.120},
    {0.079, 0.442, -1.801, 0.151, 0.913},
    {0.090, 0.482, -2.076, 0.182, 1.046},
    {0.117, 0.385, -1.476, 0.082, 1.055},
    {0.111, 0.481, -1.790, 0.121, 0.983},
    {0.098, 0.459, -1.825, 0.098, 1.169},
}};

PublishedSoil from_carsel_parrish(std::string_view texture, const CarselParrishRow& row) {
  return {texture,
          "Carsel & Parrish 1988",
          "Carsel & Parrish 1988, Water Resources Research 24:755-769, class means",
          row.theta_r,
          row.theta_s,
          row.alpha / kCentimetre,
          row.n,
          row.Ks * kCentimetrePerDay};
}

PublishedSoil from_schaap(std::string_view texture, const SchaapRow& row) {
  return {texture,
          "Schaap et al. 2001",
          "Schaap, Leij & van Genuchten 2001, Journal of Hydrology 251:163-176, class averages",
          row.theta_r,
          row.theta_s,
          std::pow(10.0, row.log_alpha) / kCentimetre,
          std::pow(10.0, row.log_n),
          std::pow(10.0, row.log_Ks) * kCentimetrePerDay};
}

std::array<PublishedSoil, 24> all_rows() {
  std::array<PublishedSoil, 24> rows{};
  for (std::size_t i = 0; i < kTextures.size(); ++i) {
    rows[2 * i] = from_carsel_parrish(kTextures[i], kCarselParrish[i]);
    rows[2 * i + 1] = from_schaap(kTextures[i], kSchaap[i]);
  }
  return rows;
}

}  // namespace

std::span<const PublishedSoil> published_soils() {
  static const std::array<PublishedSoil, 24> rows = all_rows();
  return rows;
}

std::vector<PublishedSoil> published_soils_of(std::string_view texture) {
  std::vector<PublishedSoil> found;
  for (const PublishedSoil& row : published_soils()) {
    if (row.texture == texture) found.push_back(row);
  }
  return found;
}

std::vector<std::string_view> texture_classes() { return {kTextures.begin(), kTextures.end()}; }

double default_minimum_capillary_height(double n) { return n < 2.0 ? -0.02 : 0.0; }

Soil make_soil(const PublishedSoil& row, std::optional<double> h_s) {
  const double height = h_s.value_or(default_minimum_capillary_height(row.n));
  return {std::make_shared<VanGenuchten>(row.alpha, row.n, 0.5, height), row.theta_r, row.theta_s,
          row.Ks, 0.0};
}

}  // namespace ringwright::models
