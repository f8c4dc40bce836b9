#include "postprocess/reading/test_times.hpp"

#include <algorithm>
#include <cmath>

namespace ringwright::postprocess {
namespace {

constexpr double minute = 60.0, hour = 3600.0, day = 24 * hour;
// Two times closer than this share are one row.
constexpr double kSame = 1e-9;
constexpr double kTooClose = 0.15;

bool same(double a, double b) { return std::abs(a - b) <= kSame * std::max(a, b); }

}  // namespace

double default_reading_interval(double longest) { return std::max(minute, 0.05 * longest); }

std::vector<double> reading_times(double interval, double longest) {
  std::vector<double> times;
  const auto whole = static_cast<long>(std::floor(longest / interval * (1 + kSame)));
  for (long k = 1; k <= whole; ++k) times.push_back(static_cast<double>(k) * interval);
  if (times.empty() || !same(times.back(), longest)) times.push_back(longest);
  return times;
}

std::vector<double> stopping_times(double interval, double longest) {
  std::vector<double> times;
  for (double t : {1 * minute, 2 * minute, 5 * minute, 10 * minute, 15 * minute, 30 * minute, hour,
                   2 * hour, 3 * hour, 4 * hour, 6 * hour, 8 * hour, 12 * hour, day, 2 * day,
                   4 * day, 7 * day, 14 * day, 28 * day})
    if (t >= interval * (1 - kSame) && t <= longest * (1 + kSame)) times.push_back(t);
  return times;
}

std::vector<double> ladder_times(double interval, double stop, double longest, std::size_t rows) {
  std::vector<double> near;
  for (double t : stopping_times(interval, longest))
    if (std::abs(t / stop - 1) > kTooClose && std::abs(t / longest - 1) > kTooClose &&
        t >= 0.05 * stop)
      near.push_back(t);
  // keep those closest to the stop on a logarithmic scale
  std::sort(near.begin(), near.end(), [&](double a, double b) {
    return std::abs(std::log(a / stop)) < std::abs(std::log(b / stop));
  });
  if (near.size() > rows) near.resize(rows);
  near.push_back(stop);
  if (!same(stop, longest)) near.push_back(longest);
  std::sort(near.begin(), near.end());
  return near;
}

}  // namespace ringwright::postprocess
