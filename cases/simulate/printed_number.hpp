#pragma once
/// Numbers as a screen shows them: few digits, in the units of the trade. Files never use these.

#include <string>

namespace ringwright::cases {

/// Two significant figures, three where the first is 1 or would become 1:
/// 34, 1.32, 0.71, 12.8, 340. "-" for what is not finite.
std::string rounded(double value);

/// The same, but never less than `value`: what one must bring.
std::string rounded_up(double value);

/// A fraction as per cent: 0.617 gives "62 %", 0.0144 gives "1.4 %", 0 gives "0 %".
std::string percent(double fraction);
/// A fraction that was given, not computed: 0.05 gives "5 %".
std::string given_percent(double fraction);

std::string mm_per_hour(double speed);    ///< [m/s] as "34"
std::string inch_per_hour(double speed);  ///< [m/s] as "1.34"
std::string litres(double volume);        ///< [m3] as "12.8"
std::string centimetres(double length);   ///< [m] as "30"; four digits: given lengths, not results
std::string about_cm(double length);      ///< [m] as "30 cm", rounded
std::string flow(double value);           ///< [m3/s] as "40 mL/min" or "1.2 L/min"

/// A time that is known exactly [s]: "45 s", "30 min", "2 h 30 min", from four
/// days on "30 days".
std::string time_text(double seconds);
/// A time that is known roughly [s]: "7.5 h", "12.5 days".
std::string about_time(double seconds);

}  // namespace ringwright::cases
