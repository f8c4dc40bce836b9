#include "cases/input/read_parameters.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <memory>
#include <string>

#include "cases/input/minimum_capillary_height.hpp"
#include "cases/input/read_phrases.hpp"
#include "models/soil/brooks_corey.hpp"
#include "models/soil/catalogue.hpp"
#include "models/soil/durner.hpp"
#include "models/soil/gardner.hpp"
#include "models/soil/van_genuchten.hpp"

namespace ringwright::cases {
namespace {

using CurvesPointer = std::shared_ptr<const models::Curves>;

struct Family {
  std::string name;
  std::vector<std::string_view> needed, allowed;
};

Family family_of(const std::string& name) {
  if (name == "Gardner") return {name, {"alpha"}, {}};
  if (name == "Durner") return {name, {"alpha", "n", "alpha 2", "n 2", "weight 2"}, {"l"}};
  if (name == "Brooks-Corey") return {name, {"entry head", "lambda"}, {"l"}};
  return {name, {"alpha", "n"}, {"l"}};
}

bool contains(const std::vector<std::string_view>& keys, std::string_view key) {
  return std::find(keys.begin(), keys.end(), key) != keys.end();
}

// Every family has its own parameters; the others' have no meaning beside them.
bool check_family(const SectionReader& section, const Family& family, const Place& where,
                  Reading& reading) {
  const std::size_t before = reading.problems.size();
  for (const std::string_view key :
       {"alpha", "n", "l", "entry head", "lambda", "alpha 2", "n 2", "weight 2"}) {
    const bool has = section.has(key);
    if (contains(family.needed, key) && !has) {
      reading.problem(
          where, fmt::format("{}a {} curve needs the key '{}'", section.front(), family.name, key));
    }
    if (!has || contains(family.needed, key) || contains(family.allowed, key)) continue;
    const std::string message =
        fmt::format("{}a {} curve has no such parameter", section.front_of(key), family.name);
    if (section.has("curve")) {
      reading.contradiction(section.key_place(key), message, section.key_place("curve"),
                            "the curve is chosen here");
    } else {
      reading.problem(section.key_place(key), message,
                      key.ends_with(" 2")
                          ? "two pore systems are a Durner curve: write  curve: Durner"
                          : "name the curve, for example  curve: Brooks-Corey");
    }
  }
  return reading.problems.size() == before;
}

// Ks inside or Kfs beside: one of them.
std::optional<double> read_Ks(const SectionReader& ground, const SectionReader& section,
                              const Place& where, Reading& reading) {
  if (section.has("Ks") && ground.has("Kfs")) {
    reading.contradiction(ground.key_place("Kfs"),
                          ground.front_of("Kfs") + "the conductivity is given twice",
                          section.key_place("Ks"), "also given here as Ks", "keep one of the two");
    return std::nullopt;
  }
  if (section.has("Ks")) return section.quantity("Ks");
  if (ground.has("Kfs")) return read_conductivity(ground, "Kfs", reading);
  reading.problem(where, section.front() + "the conductivity is missing",
                  "give Ks here, or Kfs beside 'parameters'");
  return std::nullopt;
}

// Both pore systems share one minimum capillary height; the smaller n decides about it.
CurvesPointer make_durner(const SectionReader& ground, const SectionReader& section, double alpha,
                          double n, double l, Reading& reading) {
  const auto alpha_2 = section.quantity("alpha 2");
  const auto n_2 = section.quantity("n 2");
  const auto weight_2 = section.quantity("weight 2");
  if (!alpha_2 || !n_2 || !weight_2) return nullptr;
  const std::array all_n{n, *n_2};
  const auto h_s = read_minimum_capillary_height(ground, all_n, "parameters", reading);
  const std::vector<models::PoreSystem> systems{{1.0 - *weight_2, alpha, n},
                                                {*weight_2, *alpha_2, *n_2}};
  return std::make_shared<models::Durner>(
      systems, l, h_s.value_or(models::default_minimum_capillary_height(std::min(n, *n_2))));
}

CurvesPointer make_curves(const SectionReader& ground, const SectionReader& section,
                          const Family& family, Reading& reading) {
  const auto alpha = section.quantity("alpha");
  const auto n = section.quantity("n");
  const auto entry_head = section.quantity("entry head");
  const auto lambda = section.quantity("lambda");
  const auto l = section.quantity("l");
  if (contains(family.allowed, "l") && !section.has("l"))
    reading.assume(section.path_of("l"), "l = 0.5");
  if (family.name == "Gardner" && alpha) return std::make_shared<models::Gardner>(*alpha);
  if (family.name == "Brooks-Corey" && entry_head && lambda) {
    return std::make_shared<models::BrooksCorey>(*entry_head, *lambda, l.value_or(0.5));
  }
  if (family.name == "Durner" && alpha && n)
    return make_durner(ground, section, *alpha, *n, l.value_or(0.5), reading);
  if (family.name == "van Genuchten" && alpha && n) {
    const std::array all_n{*n};
    const auto h_s = read_minimum_capillary_height(ground, all_n, "parameters", reading);
    return std::make_shared<models::VanGenuchten>(
        *alpha, *n, l.value_or(0.5), h_s.value_or(models::default_minimum_capillary_height(*n)));
  }
  return nullptr;
}

}  // namespace

std::vector<SoilVariant> read_parameters(const SectionReader& ground, Reading& reading) {
  const Place where = ground.key_place("parameters");
  const SectionReader section = ground.subsection("parameters");
  if (section.is_broken()) return {};
  const bool choice_is_wrong = section.has("curve") && !section.text("curve");
  if (choice_is_wrong) return {};
  const Family family = family_of(section.has("curve") ? *section.text("curve") : "van Genuchten");
  if (family.name != "van Genuchten" && family.name != "Durner") {
    refuse_minimum_capillary_height(ground, family.name, section.key_place("curve"), reading);
  }
  const bool fits = check_family(section, family, where, reading);
  const auto theta_r = section.quantity("theta_r");
  const auto theta_s = section.quantity("theta_s");
  const auto Ks = read_Ks(ground, section, where, reading);
  const auto curves = make_curves(ground, section, family, reading);
  if (theta_r && theta_s && *theta_r >= *theta_s) {
    reading.contradiction(
        section.value_place("theta_r"),
        fmt::format("{}{:g} is not below theta_s", section.front_of("theta_r"), *theta_r),
        section.value_place("theta_s"), "theta_s is given here");
    return {};
  }
  if (!fits || !theta_r || !theta_s || !Ks || !curves) return {};
  return {{"soil by parameters", "case file", models::Soil{curves, *theta_r, *theta_s, *Ks, 0.0}}};
}

}  // namespace ringwright::cases
