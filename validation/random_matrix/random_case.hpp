#pragma once
/// Random ring tests, the same on every machine and in every order.

#include <algorithm>
#include <cmath>
#include <cstdint>
#include <random>
#include <string>

#include "models/soil/catalogue.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::validation {

struct RandomCase {
  std::string name;         ///< number, class, source and the drawn values, for messages
  solver::TestSetup setup;  ///< sampled at 5, 10, 25, 50 and 100 % of its duration
};

/// Draws that do not depend on the library: std::mt19937_64 gives the same bits everywhere, the
/// distributions of the standard library do not.
class Draws {
 public:
  explicit Draws(std::uint64_t seed) : bits_(seed) {}

  /// Uniform in [0, 1), from the upper 53 bits.
  double unit() { return static_cast<double>(bits_() >> 11) * 0x1p-53; }
  double log_uniform(double low, double high) { return low * std::pow(high / low, unit()); }
  double uniform(double low, double high) { return low + (high - low) * unit(); }
  bool chance(double share) { return unit() < share; }
  std::size_t below(std::size_t n) {
    return static_cast<std::size_t>(unit() * static_cast<double>(n));
  }

 private:
  std::mt19937_64 bits_;
};

/// Case `number` of a series. Class and table alternate; suction 10 to 10000 cm and radius 3 to
/// 50 cm log-uniform; insertion 0 in a quarter of the cases, else 0.5 to 20 cm; head 0 in a fifth,
/// else 0 to 50 cm; Ks t between 1 and 50 cm log-uniform, at most 200 h.
/// @param rows of the published soils to choose from
/// @param h_s minimum capillary height [m]; none: the default
inline RandomCase random_case(std::uint64_t number, std::span<const models::PublishedSoil> rows,
                              std::optional<double> h_s = std::nullopt) {
  constexpr double cm = 0.01, hour = 3600.0;
  Draws draw(1000 + number);
  const models::PublishedSoil& row = rows[number % rows.size()];
  RandomCase c;
  solver::TestSetup& s = c.setup;
  s.soil = models::make_soil(row, h_s);
  s.initial_head = -draw.log_uniform(10 * cm, 10000 * cm);
  s.ring.radius = draw.log_uniform(3 * cm, 50 * cm);
  s.ring.insertion = draw.chance(0.25) ? 0.0 : draw.uniform(0.5 * cm, 20 * cm);
  s.pond_head = draw.chance(0.2) ? 0.0 : draw.uniform(0.0, 50 * cm);
  s.duration = std::min(draw.log_uniform(1 * cm, 50 * cm) / s.soil.Ks, 200 * hour);
  for (double share : {0.05, 0.1, 0.25, 0.5, 1.0}) s.times.push_back(share * s.duration);
  const auto text = [](double x) { return std::to_string(x); };
  c.name = "case " + std::to_string(number) + ": " + std::string(row.texture) + ", " +
           std::string(row.source) + ", h0 " + text(s.initial_head) + " m, a " +
           text(s.ring.radius) + " m, d " + text(s.ring.insertion) + " m, H " + text(s.pond_head) +
           " m, " + text(s.duration / hour) + " h";
  return c;
}

}  // namespace ringwright::validation
