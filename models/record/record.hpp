#pragma once
/// What a test yields, virtual or real: a list of readings.
///
/// A reading is the volume that went into the ground in an interval over that
/// interval; a rate is that volume over the ring's area and the interval. There is
/// no rate at t = 0: infiltration into unsaturated soil starts infinite.

#include <vector>

namespace ringwright::models {

struct Reading {
  double time = 0.0;          ///< end of the interval, from the start of ponding [s]
  double interval = 0.0;      ///< [s]
  double volume = 0.0;        ///< into the soil in the interval [m3]
  double total_volume = 0.0;  ///< into the soil since the start [m3]
  double head = 0.0;          ///< pond depth at the reading [m]
};

struct Record {
  double ring_area = 0.0;  ///< [m2]
  std::vector<Reading> readings;

  /// Mean infiltration rate over the interval of reading i [m/s].
  double rate(std::size_t i) const {
    return readings[i].volume / (ring_area * readings[i].interval);
  }
};

}  // namespace ringwright::models
