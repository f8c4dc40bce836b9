#include "postprocess/reading/stop_rule.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

namespace ringwright::postprocess {
namespace {

// Sums of intervals and of volumes reach a round figure only to within rounding.
constexpr double kRounding = 1e-9;

/// The readings (last - n, last].
bool within_share(const models::Record& record, std::size_t last, std::size_t n, double share) {
  double mean = 0.0;
  for (std::size_t i = last + 1 - n; i <= last; ++i)
    mean += record.rate(i) / static_cast<double>(n);
  if (!(mean > 0.0)) return false;  // a ring that drinks nothing is not steady
  for (std::size_t i = last + 1 - n; i <= last; ++i)
    if (!(std::abs(record.rate(i) - mean) <= share * std::abs(mean))) return false;
  return true;
}

bool within_amount(const models::Record& record, std::size_t last, std::size_t n, double amount) {
  double least = record.rate(last), most = least;
  for (std::size_t i = last + 1 - n; i < last; ++i) {
    least = std::min(least, record.rate(i));
    most = std::max(most, record.rate(i));
  }
  return most > 0.0 && most - least <= amount * (1.0 + kRounding);
}

void check(const models::StopRule& rule) {
  const double needed = rule.kind == models::StopKind::after_time            ? rule.time
                        : rule.kind == models::StopKind::after_volume        ? rule.volume
                        : rule.kind == models::StopKind::change_within_share ? rule.share
                                                                             : rule.amount;
  if (!(needed >= 0.0))
    throw std::invalid_argument("time, volume, share or amount of a stop rule is below 0");
  if (rule.readings < 1) throw std::invalid_argument("a stop rule needs one reading or more");
}

// A reading belongs to the stage in which its interval lies.
std::size_t stage_of(const models::Reading& reading, std::span<const double> stage_starts) {
  const double middle = reading.time - 0.5 * reading.interval;
  const auto next = std::upper_bound(stage_starts.begin(), stage_starts.end(), middle);
  return static_cast<std::size_t>(next - stage_starts.begin());
}

class Judge {
 public:
  Judge(const models::Record& record, const models::StopRule& rule)
      : record_(record), rule_(rule), n_(static_cast<std::size_t>(rule.readings)) {
    if (record.readings.empty()) return;
    const models::Reading& first = record.readings.front();
    start_ = first.time - first.interval;
    volume_before_ = first.total_volume - first.volume;
  }

  /// @param in_stage readings of the stage up to and with this one
  bool met(std::size_t last, std::size_t in_stage) const {
    const models::Reading& r = record_.readings[last];
    switch (rule_.kind) {
      case models::StopKind::after_time:
        return r.time - start_ >= rule_.time * (1.0 - kRounding);
      case models::StopKind::after_volume:
        return r.total_volume - volume_before_ >= rule_.volume * (1.0 - kRounding);
      case models::StopKind::change_within_share:
        return in_stage >= n_ && within_share(record_, last, n_, rule_.share);
      case models::StopKind::change_within_amount:
        return in_stage >= n_ && within_amount(record_, last, n_, rule_.amount);
    }
    return false;
  }

 private:
  const models::Record& record_;
  const models::StopRule& rule_;
  std::size_t n_;
  double start_ = 0.0, volume_before_ = 0.0;
};

}  // namespace

std::optional<std::size_t> first_steady_reading(const models::Record& record, int readings,
                                                double within) {
  const auto n = static_cast<std::size_t>(readings);
  for (std::size_t last = n - 1; last < record.readings.size(); ++last)
    if (within_share(record, last, n, within)) return last;
  return std::nullopt;
}

std::optional<std::size_t> first_stop(const models::Record& record, const models::StopRule& rule,
                                      std::span<const double> stage_starts) {
  check(rule);
  const Judge judge(record, rule);
  std::size_t in_stage = 0, stage = 0;
  for (std::size_t i = 0; i < record.readings.size(); ++i) {
    const std::size_t its_stage = stage_of(record.readings[i], stage_starts);
    in_stage = i > 0 && its_stage == stage ? in_stage + 1 : 1;
    stage = its_stage;
    if (judge.met(i, in_stage)) return i;
  }
  return std::nullopt;
}

}  // namespace ringwright::postprocess
