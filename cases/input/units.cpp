#include "cases/input/units.hpp"

#include <fmt/format.h>
#include <udunits2.h>

#include <array>
#include <cctype>
#include <stdexcept>

#include "cases/input/suggestion.hpp"
#include "cases/input/unit_aliases.hpp"

namespace ringwright::cases {
namespace {

struct FreeUnit {
  void operator()(ut_unit* unit) const { ut_free(unit); }
};
using UnitHandle = std::unique_ptr<ut_unit, FreeUnit>;

struct FreeConverter {
  void operator()(cv_converter* converter) const { cv_free(converter); }
};
using ConverterHandle = std::unique_ptr<cv_converter, FreeConverter>;

struct FreeSystem {
  void operator()(ut_system* system) const { ut_free_system(system); }
};

struct Kind {
  std::string_view name, example, si_unit;
};

Kind kind_of(Dimension dimension) {
  switch (dimension) {
    case Dimension::fraction:
      return {"a fraction", "25 %", "1"};
    case Dimension::length:
      return {"a length", "30 cm", "m"};
    case Dimension::head:
      return {"a height of water or a pressure", "30 cm", "m"};
    case Dimension::time:
      return {"a time", "2 h", "s"};
    case Dimension::speed:
      return {"a conductivity or rate", "18 mm/h", "m/s"};
    case Dimension::per_head:
      return {"a number per length", "0.12 1/cm", "1/m"};
    case Dimension::per_length:
      return {"a number per length", "0.12 1/cm", "1/m"};
    case Dimension::temperature:
      return {"a temperature", "10 degC", "degC"};
    case Dimension::temperature_difference:
      return {"a difference of temperature", "5 degC", "K"};
    case Dimension::volume:
      return {"a volume", "20 L", "m3"};
    case Dimension::flow:
      return {"a flow", "2 L/min", "m3/s"};
    case Dimension::mass:
      return {"a mass", "12 kg", "kg"};
    case Dimension::density:
      return {"a density", "1.9 kg/L", "kg/m3"};
  }
  throw std::logic_error("a dimension without a name");
}

// Where in "1 h 10 min" the second number begins.
std::size_t second_number(std::string_view text) {
  const auto is = [&](std::size_t i, auto test) {
    return test(static_cast<unsigned char>(text[i])) != 0;
  };
  for (std::size_t i = 2; i < text.size(); ++i) {
    const bool after_unit = is(i - 2, [](int c) { return std::isalpha(c); }) && text[i - 1] == ' ';
    if (after_unit && is(i, [](int c) { return std::isdigit(c); })) return i;
  }
  return std::string_view::npos;
}

// The same quantity as a pressure, where water pressure may stand for a height of water.
std::string_view pressure_unit(Dimension dimension) {
  if (dimension == Dimension::head) return "Pa";
  if (dimension == Dimension::per_head) return "1/Pa";
  return "";
}

}  // namespace

class Units::Library {
 public:
  Library() {
    ut_set_error_message_handler(ut_ignore);
    system_.reset(ut_read_xml(nullptr));
    if (!system_) throw std::runtime_error("the data base of the units library cannot be read");
  }

  UnitHandle parse(std::string_view unit) const {
    return UnitHandle(ut_parse(system_.get(), std::string(unit).c_str(), UT_UTF8));
  }

  /// Null if the two are not of one kind.
  ConverterHandle converter(const UnitHandle& from, std::string_view to) const {
    const UnitHandle target = parse(to);
    if (!same_kind(from, target)) return {};
    return ConverterHandle(ut_get_converter(from.get(), target.get()));
  }

  /// "a mass"
  std::string what_is(const UnitHandle& unit) const {
    constexpr std::array<std::array<std::string_view, 2>, 13> known{{{"m", "a length"},
                                                                     {"s", "a time"},
                                                                     {"m/s", "a rate"},
                                                                     {"m2", "an area"},
                                                                     {"m3", "a volume"},
                                                                     {"m3/s", "a flow"},
                                                                     {"kg", "a mass"},
                                                                     {"N", "a force"},
                                                                     {"Pa", "a pressure"},
                                                                     {"K", "a temperature"},
                                                                     {"kg/m3", "a density"},
                                                                     {"m/s2", "an acceleration"},
                                                                     {"1", "a plain number"}}};
    for (const auto& [si_unit, name] : known) {
      const UnitHandle target = parse(si_unit);
      if (same_kind(unit, target)) return std::string(name);
    }
    return "another kind of quantity";
  }

 private:
  // The library also converts a unit into its reciprocal, cm into 1/m: not wanted here.
  static bool same_kind(const UnitHandle& a, const UnitHandle& b) {
    if (!ut_are_convertible(a.get(), b.get())) return false;
    const UnitHandle ratio(ut_divide(a.get(), b.get()));
    return ratio && ut_is_dimensionless(ratio.get());
  }

  std::unique_ptr<ut_system, FreeSystem> system_;
};

std::string_view name_of(Dimension dimension) { return kind_of(dimension).name; }
std::string_view example_of(Dimension dimension) { return kind_of(dimension).example; }

Units::Units() : library_(std::make_unique<Library>()) {}
Units::~Units() = default;

double Units::read(std::string_view text, Dimension dimension) const {
  if (dimension == Dimension::time) {
    if (const std::size_t second = second_number(text); second != std::string_view::npos)
      return read(text.substr(0, second), dimension) + read(text.substr(second), dimension);
  }
  const ScannedNumber number = scan_number(text);
  const Kind kind = kind_of(dimension);
  if (number.rest.empty()) {
    if (dimension == Dimension::fraction) return number.value;
    throw ValueError(fmt::format("'{}' has no unit", trimmed(text)),
                     fmt::format("write {} with its unit, such as {}", kind.name, kind.example));
  }
  const UnitHandle unit = library_->parse(without_aliases(number.rest));
  if (!unit) {
    throw ValueError(fmt::format("'{}': the unit '{}' is not known", trimmed(text), number.rest),
                     suggest(number.rest, usual_units()));
  }
  if (const auto converter = library_->converter(unit, kind.si_unit)) {
    const double value = cv_convert_double(converter.get(), number.value);
    const bool difference = dimension == Dimension::temperature_difference;
    return difference ? value - cv_convert_double(converter.get(), 0.0) : value;
  }
  if (const auto pressure = pressure_unit(dimension); !pressure.empty()) {
    if (const auto converter = library_->converter(unit, pressure)) {
      const double value = cv_convert_double(converter.get(), number.value);
      return dimension == Dimension::head ? value / water_weight : value * water_weight;
    }
  }
  const bool minutes = dimension == Dimension::time && number.rest == "m";
  throw ValueError(
      fmt::format("'{}' is {}, not {}", trimmed(text), library_->what_is(unit), kind.name),
      minutes ? "minutes are written min" : fmt::format("write it like {}", kind.example));
}

}  // namespace ringwright::cases
