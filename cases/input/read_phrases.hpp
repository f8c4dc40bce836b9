#pragma once
/// Values that are short phrases rather than one number.

#include <optional>
#include <string>
#include <string_view>

#include "cases/input/case.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// "18 mm/h at 10 degC" as conductivity at 20 degC [m/s]; without a temperature it is at 20 degC.
std::optional<double> read_conductivity(const SectionReader& section, std::string_view key,
                                        Reading& reading);

/// "0.12 1/cm" or the word of an alpha* class [1/m].
std::optional<double> read_alpha_star(const SectionReader& section, std::string_view key);

/// "dry", "moist", "wet", "suction 300 cm", "content 25 %", "60 % full".
/// @param key where `text` stands, for errors
std::optional<Moisture> read_moisture(const SectionReader& section, std::string_view key,
                                      std::string_view text, Reading& reading);

/// How readings are taken.
struct ReadWords {
  std::optional<double> interval;   ///< [s]
  std::optional<double> ruler;      ///< [m]
  std::optional<double> head_kept;  ///< [m]
};

/// "every 10 min", "every 10 min, ruler to 1 mm, head kept to 5 mm".
std::optional<ReadWords> read_readings(const SectionReader& section, Reading& reading);

}  // namespace ringwright::cases
