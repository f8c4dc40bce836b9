#include "cases/input/units.hpp"

#include <catch2/catch.hpp>
#include <string>

namespace ringwright::cases {
namespace {

std::string message_of(const Units& units, const std::string& text, Dimension dimension) {
  try {
    units.read(text, dimension);
  } catch (const ValueError& error) {
    return std::string(error.what()) + " | " + error.hint();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("quantities are read into SI as people write them") {
  const Units units;
  const auto read = [&](const char* text, Dimension dimension) {
    return Approx(units.read(text, dimension)).epsilon(1e-9);
  };
  // Inch 25.4 mm, foot 0.3048 m, US gallon 231 cubic inches: exact by definition (NIST Special
  // Publication 811, 2008, appendix B).
  CHECK(0.30 == read("30 cm", Dimension::length));
  CHECK(0.30 == read("30cm", Dimension::length));
  CHECK(0.3048 == read("12 in", Dimension::length));
  CHECK(0.3048 == read("12\"", Dimension::length));
  CHECK(0.3048 == read("12 \u2033", Dimension::length));
  CHECK(0.3048 == read("1'", Dimension::length));
  CHECK(0.3048 == read("1 ft", Dimension::length));
  CHECK(3.0 == read("300 cm", Dimension::head));
  CHECK(-0.02 == read("-2 cm", Dimension::head));
  CHECK(0.5 * 0.0254 / 3600 == read("0.5 in/h", Dimension::speed));
  CHECK(0.5 * 0.0254 / 3600 == read("0.5 in/hr", Dimension::speed));
  CHECK(0.018 / 3600 == read("18 mm/h", Dimension::speed));
  CHECK(0.018 / 3600 == read("18 mm per hour", Dimension::speed));
  CHECK(0.25 / 86400 == read("25 cm/day", Dimension::speed));
  CHECK(1.5e-6 == read("1.5e-6 m/s", Dimension::speed));
  CHECK(7200 == read("2 h", Dimension::time));
  CHECK(7200 == read("2 hrs", Dimension::time));
  CHECK(600 == read("10 mins", Dimension::time));
  CHECK(12 == read("0.12 1/cm", Dimension::per_head));
  CHECK(12 == read("0.12 per cm", Dimension::per_head));
  CHECK(12 == read("0.12 cm-1", Dimension::per_head));
  CHECK(12 == read("0.12 cm^-1", Dimension::per_head));
  CHECK(3.785411784e-3 == read("1 gal", Dimension::volume));
  CHECK(3.785411784e-3 / 60 == read("1 gpm", Dimension::flow));
  CHECK(2e-3 / 60 == read("2 L/min", Dimension::flow));
}

TEST_CASE("fractions are read with or without the percent sign") {
  const Units units;
  CHECK(units.read("25 %", Dimension::fraction) == Approx(0.25));
  CHECK(units.read("25%", Dimension::fraction) == Approx(0.25));
  CHECK(units.read("25 percent", Dimension::fraction) == Approx(0.25));
  CHECK(units.read("0.25", Dimension::fraction) == Approx(0.25));
}

TEST_CASE("temperatures need their scale, and differences are not temperatures") {
  const Units units;
  CHECK(units.read("10 degC", Dimension::temperature) == Approx(10));
  CHECK(units.read("10 \u00B0C", Dimension::temperature) == Approx(10));
  CHECK(units.read("10\u00B0C", Dimension::temperature) == Approx(10));
  CHECK(units.read("10 deg C", Dimension::temperature) == Approx(10));
  CHECK(units.read("50 degF", Dimension::temperature) == Approx(10));
  CHECK(units.read("50 \u00B0F", Dimension::temperature) == Approx(10));
  CHECK(units.read("9 degF", Dimension::temperature_difference) == Approx(5));
  CHECK(units.read("5 degC", Dimension::temperature_difference) == Approx(5));
  CHECK(message_of(units, "10 C", Dimension::temperature) ==
        "C alone is the coulomb, not a temperature | write degC");
  CHECK(message_of(units, "50 F", Dimension::temperature) ==
        "F alone is the farad, not a temperature | write degF");
}

TEST_CASE("heads and suctions may be pressures") {
  const Units units;
  // rho = 998.207 kg/m3 at 20 degC (Tanaka et al. 2001, Metrologia 38:301), g = 9.80665 m/s2.
  CHECK(units.read("10 kPa", Dimension::head) == Approx(10000 / (998.207 * 9.80665)));
  // psi = 6894.757 Pa (NIST Special Publication 811, 2008, appendix B).
  CHECK(units.read("1 psi", Dimension::head) == Approx(6894.757 / 9789.067).epsilon(1e-6));
  CHECK(units.read("0.1 1/kPa", Dimension::per_head) == Approx(0.1 * 9.789067).epsilon(1e-6));
  CHECK(message_of(units, "10 kPa", Dimension::length) ==
        "'10 kPa' is a pressure, not a length | write it like 30 cm");
}

TEST_CASE("what is not a quantity of the kind wanted is refused with what to write") {
  const Units units;
  CHECK(message_of(units, "30", Dimension::length) ==
        "'30' has no unit | write a length with its unit, such as 30 cm");
  CHECK(message_of(units, "0", Dimension::head) ==
        "'0' has no unit | write a height of water or a pressure with its unit, such as 30 cm");
  CHECK(message_of(units, "30 cn", Dimension::length) ==
        "'30 cn': the unit 'cn' is not known | did you mean 'cm'?");
  CHECK(message_of(units, "30 kg", Dimension::length) ==
        "'30 kg' is a mass, not a length | write it like 30 cm");
  CHECK(message_of(units, "2 gal", Dimension::length) ==
        "'2 gal' is a volume, not a length | write it like 30 cm");
  // The units library itself would turn a length into its reciprocal.
  CHECK(message_of(units, "8 cm", Dimension::per_head) ==
        "'8 cm' is a length, not a number per length | write it like 0.12 1/cm");
  CHECK(message_of(units, "10 m", Dimension::time) ==
        "'10 m' is a length, not a time | minutes are written min");
  CHECK(message_of(units, "2.5 pF", Dimension::head) ==
        "pF is a logarithm, not a unit | write the suction itself: pF 2.5 is 316 cm");
  CHECK(message_of(units, "1 1/2 in", Dimension::length) ==
        "a number inside the unit '1/2 in' | write one number and one unit, such as 12.5 in");
  CHECK(message_of(units, "5 cm 3", Dimension::length) ==
        "a number inside the unit 'cm 3' | write one number and one unit, such as 12.5 in");
  CHECK(message_of(units, "5 cm; rm", Dimension::length) ==
        "'cm; rm' is not a unit: ';' does not belong | ");
}

TEST_CASE("numbers that a YAML reader would take for others are refused") {
  const auto message = [](const char* text) {
    try {
      scan_number(text);
    } catch (const ValueError& error) {
      return std::string(error.what());
    }
    return std::string("accepted");
  };
  CHECK(message("010 cm") == "'010 cm' begins with 0 and looks octal");
  CHECK(message("0x1F") == "'0x1F' is not a decimal number");
  CHECK(message("0o17") == "'0o17' is not a decimal number");
  CHECK(message(".nan") == "'.nan' is not a finite number");
  CHECK(message("-.inf h") == "'-.inf h' is not a finite number");
  CHECK(message("NaN") == "'NaN' is not a finite number");
  CHECK(message("1e999") == "'1e999' is beyond any number of use here");
  CHECK(message("1,5 cm") == "'1,5 cm' has a comma inside the number");
  CHECK(message("1_000 cm") == "'1_000 cm' has '_' inside the number");
  CHECK(message("1:30") == "'1:30' looks like a time of day");
  CHECK(message("1/2 in") == "'1/2 in' has a fraction");
  CHECK(message("") == "'' does not begin with a number");
  CHECK(message("in 5") == "'in 5' does not begin with a number");
  CHECK(scan_number("0.5 in").value == 0.5);
  CHECK(scan_number("0").value == 0.0);
  CHECK(scan_number("-.5").value == -0.5);
  CHECK(scan_number("+5.").value == 5.0);
  CHECK(scan_number("1.5e-6 m/s").rest == "m/s");
  CHECK(scan_number("30 inch").rest == "inch");
}

TEST_CASE("a time may have two parts, and masses and densities are known") {
  const Units units;
  CHECK(units.read("1 h 10 min", Dimension::time) == Approx(4200));
  CHECK(units.read("1 d 2 h 3 min 4 s", Dimension::time) == Approx(86400 + 7200 + 180 + 4));
  CHECK_THROWS_AS(units.read("1 h 10", Dimension::time), ValueError);
  CHECK_THROWS_AS(units.read("1 h 10 cm", Dimension::time), ValueError);
  CHECK_THROWS_AS(units.read("1 m 10 cm", Dimension::length), ValueError);
  // The pound is 0.45359237 kg by definition (international yard and pound agreement, 1959).
  CHECK(units.read("10 lb", Dimension::mass) == Approx(4.5359237));
  CHECK(units.read("1.9 g/cm3", Dimension::density) == Approx(1900));
}

}  // namespace ringwright::cases
