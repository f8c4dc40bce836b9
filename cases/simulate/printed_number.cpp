#include "cases/simulate/printed_number.hpp"

#include <fmt/format.h>

#include <cmath>

namespace ringwright::cases {
namespace {

struct Rounding {
  int digits;
  int exponent;  // of the first figure
};

Rounding rounding_of(double size) {
  // 1.97 begins with 1, and so does 0.997 once it is rounded to two figures.
  const bool begins_with_1 =
      fmt::format("{:.1e}", size).front() == '1' || fmt::format("{:.2e}", size).front() == '1';
  const int digits = begins_with_1 ? 3 : 2;
  const std::string text = fmt::format("{:.{}e}", size, digits - 1);
  return {digits, std::stoi(text.substr(text.find('e') + 1))};
}

std::string printed(double value, const Rounding& rounding) {
  const int last = rounding.exponent - rounding.digits + 1;  // decimal place of the last figure
  if (rounding.exponent < -4 || rounding.exponent > 6) {
    return fmt::format("{:.{}e}", value, rounding.digits - 1);
  }
  if (last <= 0) return fmt::format("{:.{}f}", value, -last);
  const double step = std::pow(10.0, last);
  return fmt::format("{:.0f}", std::round(value / step) * step);
}

}  // namespace

std::string rounded(double value) {
  if (!std::isfinite(value)) return "-";
  if (value == 0.0) return "0";
  return printed(value, rounding_of(std::abs(value)));
}

std::string rounded_up(double value) {
  if (!std::isfinite(value)) return "-";
  if (!(value > 0.0)) return "0";
  const double step = std::pow(10.0, std::floor(std::log10(value)) - 1.0);
  // A hair below, so that 13 is not turned into 14 by the last bit of the division.
  const double up = std::ceil(value / step - 1e-9) * step;
  const int decimals = std::max(0, -static_cast<int>(std::floor(std::log10(step) + 0.5)));
  return fmt::format("{:.{}f}", up, decimals);
}

std::string percent(double fraction) {
  if (!std::isfinite(fraction)) return "-";
  const double value = 100.0 * fraction;
  if (std::abs(value) >= 9.95) return fmt::format("{:.0f} %", value);
  if (std::abs(value) < 0.05) return "0 %";
  return fmt::format("{:.1f} %", value);
}

std::string given_percent(double fraction) { return fmt::format("{:.6g} %", 100.0 * fraction); }

std::string mm_per_hour(double speed) { return rounded(speed * 3.6e6); }
std::string inch_per_hour(double speed) { return rounded(speed * 3600.0 / 0.0254); }
std::string litres(double volume) { return rounded(volume * 1e3); }
std::string centimetres(double length) { return fmt::format("{:.4g}", length * 100.0); }
std::string about_cm(double length) { return rounded(length * 100.0) + " cm"; }

std::string flow(double value) {
  const double millilitres = value * 6e7;
  if (millilitres >= 1000.0) return rounded(millilitres / 1000.0) + " L/min";
  return rounded(millilitres) + " mL/min";
}

std::string time_text(double seconds) {
  if (!std::isfinite(seconds)) return "-";
  if (seconds < 60.0) return fmt::format("{:.3g} s", seconds);
  if (seconds < 600.0 && std::abs(std::remainder(seconds, 60.0)) > 1.0) {
    return fmt::format("{:.1f} min", seconds / 60.0);
  }
  const long minutes = std::lround(seconds / 60.0);
  const long hours = minutes / 60;
  if (hours == 0) return fmt::format("{} min", minutes);
  if (hours >= 96 && minutes % (24 * 60) == 0) return fmt::format("{} days", hours / 24);
  if (minutes % 60 == 0) return fmt::format("{} h", hours);
  return fmt::format("{} h {} min", hours, minutes % 60);
}

std::string about_time(double seconds) {
  if (seconds < 90.0) return rounded(seconds) + " s";
  if (seconds < 90.0 * 60.0) return rounded(seconds / 60.0) + " min";
  if (seconds < 72.0 * 3600.0) return rounded(seconds / 3600.0) + " h";
  return rounded(seconds / 86400.0) + " days";
}

}  // namespace ringwright::cases
