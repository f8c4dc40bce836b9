#pragma once
/// Quantities as people write them, into SI. The only place with unit text.
///
/// A units library knows the units; a table of aliases goes before it, because to the library
/// `gal` is an acceleration, `gpm` unknown, `"` an angle, `C` a charge and `F` a capacitance.

#include <memory>
#include <string>
#include <string_view>

#include "cases/input/number.hpp"

namespace ringwright::cases {

/// What kind of quantity a value must be, and so its SI unit.
enum class Dimension {
  fraction,                ///< [-]; "25 %" or 0.25
  length,                  ///< [m]
  head,                    ///< [m] of water; a length or a pressure
  time,                    ///< [s]
  speed,                   ///< [m/s]; conductivities and rates
  per_head,                ///< [1/m]; per length or per pressure
  per_length,              ///< [1/m]
  temperature,             ///< [degC]
  temperature_difference,  ///< [K]; 9 degF of difference are 5 K
  volume,                  ///< [m3]
  flow,                    ///< [m3/s]
  mass,                    ///< [kg]
  density,                 ///< [kg/m3]
};

/// "a length", for messages.
std::string_view name_of(Dimension dimension);
/// A value of that dimension as one would write it, "30 cm".
std::string_view example_of(Dimension dimension);

/// Weight of water at 20 degC [Pa/m]: density 998.207 kg/m3 (Tanaka et al. 2001, Metrologia
/// 38:301) times standard gravity 9.80665 m/s2. Turns pressures into heads.
inline constexpr double water_weight = 998.207 * 9.80665;

/// The units library with its data base, which costs some milliseconds to load: make one per
/// reading. One object must not be used by two threads at once.
class Units {
 public:
  /// @throws std::runtime_error if the data base of the units library cannot be read
  Units();
  ~Units();
  Units(const Units&) = delete;
  Units& operator=(const Units&) = delete;

  /// The quantity in `text` in the SI unit of `dimension`. A time may be "1 h 10 min".
  /// @throws ValueError for no number, no unit (except fractions), an unknown unit or another
  ///         kind of quantity
  double read(std::string_view text, Dimension dimension) const;

 private:
  class Library;
  std::unique_ptr<Library> library_;
};

}  // namespace ringwright::cases
