#include "models/record/gauge.hpp"

#include <algorithm>
#include <boost/math/distributions/normal.hpp>
#include <cmath>
#include <random>
#include <stdexcept>

namespace ringwright::models {
namespace {

// The same draws on every machine: the engine is fixed by the standard, the distributions of the
// standard library are not. Plain doubles, since long double differs between machines.
class Draws {
 public:
  explicit Draws(std::uint64_t seed) : bits_(seed) {}

  // Uniform in (0, 1): the middles of 2^53 equal parts, so that neither end comes up.
  double unit() { return (static_cast<double>(bits_() >> 11) + 0.5) * 0x1p-53; }

  double normal() {
    using namespace boost::math;
    using Plain = policies::policy<policies::promote_double<false>>;
    // The middle of the last part rounds to 1, which has no quantile.
    const double p = std::min(unit(), 1.0 - 0x1p-53);
    return quantile(normal_distribution<double, Plain>(), p);
  }

 private:
  std::mt19937_64 bits_;
};

double to_division(double value, double division) {
  return division > 0.0 ? std::round(value / division) * division : value;
}

void check(const Gauge& gauge) {
  for (const double x :
       {gauge.volume_division, gauge.random_error, gauge.head_division, gauge.head_tolerance})
    if (!(x >= 0.0) || std::isinf(x))
      throw std::invalid_argument("divisions, errors and tolerances must not be below 0");
}

// Reads the gauge: totals as they stand on the form.
class Reader {
 public:
  explicit Reader(const Gauge& gauge) : gauge_(gauge), draws_(gauge.seed) {}

  // One draw for every reading, used or not: the same eye with another gauge.
  double total(double truth) {
    const double error = gauge_.random_error * draws_.normal();
    return to_division(truth + error, gauge_.volume_division);
  }

 private:
  const Gauge& gauge_;
  Draws draws_;
};

void read_volumes(const Record& truth, const Gauge& gauge, Record& read) {
  Reader reader(gauge);
  double before = 0.0, time_before = 0.0;  // an empty gauge is known to be at 0
  for (std::size_t i = 0; i < truth.readings.size(); ++i) {
    const Reading& r = truth.readings[i];
    // Readings left out before this interval (a soak, a pause): the gauge is read at its start.
    const double start = r.time - r.interval;
    if (start - time_before > 1e-6 * r.interval) before = reader.total(r.total_volume - r.volume);
    Reading& out = read.readings[i];
    out.total_volume = reader.total(r.total_volume);
    out.volume = out.total_volume - before;
    before = out.total_volume, time_before = r.time;
  }
}

void read_heads(const Gauge& gauge, const std::vector<double>& stage_starts, Record& read) {
  // Its own draws: what is read of the volumes does not change what is read of the heads.
  Draws draws(gauge.seed ^ 0x9e3779b97f4a7c15u);
  std::vector<double> misreadings;
  for (std::size_t i = 0; i <= stage_starts.size(); ++i)
    misreadings.push_back(gauge.head_tolerance * (2.0 * draws.unit() - 1.0));
  for (Reading& r : read.readings) {
    const double middle = r.time - 0.5 * r.interval;
    const auto stage = std::upper_bound(stage_starts.begin(), stage_starts.end(), middle);
    const double misreading = misreadings[static_cast<std::size_t>(stage - stage_starts.begin())];
    const double head = to_division(r.head + misreading, gauge.head_division);
    r.head = r.head >= 0.0 ? std::max(head, 0.0) : head;
  }
}

}  // namespace

Record as_read(const Record& truth, const Gauge& gauge, const std::vector<double>& stage_starts) {
  check(gauge);
  if (!std::is_sorted(stage_starts.begin(), stage_starts.end()))
    throw std::invalid_argument("stages must be in order of time");
  Record read = truth;
  read_volumes(truth, gauge, read);
  read_heads(gauge, stage_starts, read);
  return read;
}

}  // namespace ringwright::models
