#include "cases/input/read_lid.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/phrase_parts.hpp"

namespace ringwright::cases {
namespace {

constexpr double usual_standpipe = 0.05;
constexpr double usual_depth = 0.10;

// The depth of the water under the lid: `head` beside `pressure`, else `depth` of the lid.
double depth_of(const SectionReader& section, const SectionReader& lid, const Test& test,
                Reading& reading) {
  const auto depth = lid.quantity("depth");
  if (section.has("pressure")) {
    if (lid.has("depth") && section.has("head")) {
      reading.contradiction(lid.key_place("depth"),
                            lid.front_of("depth") + "the depth is given twice",
                            section.key_place("head"), "beside a pressure, 'head' is the depth",
                            "leave one of the two out");
    }
    return section.quantity("head").value_or(0.0);
  }
  if (lid.has("depth")) return depth.value_or(0.0);
  const double free_height = test.height ? *test.height - test.ring.insertion : usual_depth;
  reading.assume(lid.path_of("depth"),
                 fmt::format("water {:g} cm deep under the lid", 100 * free_height));
  return free_height;
}

void read_strength(const SectionReader& section, models::Lid& lid, Reading& reading) {
  if (const auto seal = section.quantity("seal")) lid.seal_radius = *seal / 2;
  lid.relief_head = section.quantity("relief");
  // What pump and valve reach, failed open, counts where nothing relieves it.
  if (!section.has("relief")) lid.relief_head = section.quantity("supply pressure");
  lid.rating = section.quantity("rating");
  lid.weight = section.quantity("weight").value_or(0.0);
  if (!section.has("weight"))
    reading.assume(section.path_of("weight"), "weight of lid and ring taken as 0 kg");
  if (!section.has("seal"))
    reading.assume(section.path_of("seal"), "lid sealed at the ring's inner diameter");
}

void read_ballast_factor(const SectionReader& section, Test& test, Reading& reading) {
  if (section.is_broken()) return;
  test.ballast_factor = section.quantity("ballast factor").value_or(test.ballast_factor);
  if (!section.has("ballast factor"))
    reading.assume(section.path_of("ballast factor"),
                   fmt::format("ballast of {:g} times the lift", test.ballast_factor));
}

void check_seal(const SectionReader& section, const SectionReader& lid, const Test& test,
                Reading& reading) {
  if (!test.lid->seal_radius || *test.lid->seal_radius >= test.ring.radius - 1e-9) return;
  reading.contradiction(lid.value_place("seal"), lid.front_of("seal") + "inside the ring",
                        section.value_place(section.has("ring") ? "ring" : "inner ring"),
                        "inner diameter of the ring", "the lift acts on all out to the seal");
}

void refuse_without_lid(const SectionReader& section, Reading& reading) {
  for (const std::string_view key : {"pressure", "pressed by"}) {
    if (!section.has(key)) continue;
    reading.problem(section.key_place(key),
                    section.front_of(key) + "water is pressed only under a lid",
                    "for example  lid: { relief: 1.2 m, rating: 20 kPa, weight: 12 kg }");
  }
}

// "standpipe 5 cm wide"
bool read_width(const SectionReader& section, std::string_view key, std::string_view text,
                VesselKind kind, Test& test) {
  take_back(text, " wide");
  const auto width = section.quantity_in(key, text);
  test.vessel = kind;
  test.vessel_diameter = width.value_or(0.0);
  return width.has_value();
}

void read_vessel(const SectionReader& section, std::string_view key, Test& test, Reading& reading) {
  const auto text = section.text(key);
  if (!text) return;
  std::string_view words = *text;
  const bool lid = test.lid.has_value() || section.is_suggested("lid");
  if (words == "air" && key == "pressed by") {
    test.vessel = VesselKind::air;
    if (test.lid) test.lid->by_air = true;
  } else if (take_front(words, "standpipe ")) {
    if (!lid && key == "falls in")
      section.problem(key, "a standpipe stands on a lid", "give the lid, or a tank 40 cm wide");
    read_width(section, key, words, VesselKind::standpipe, test);
  } else if (key == "falls in" && take_front(words, "tank ")) {
    if (lid)
      reading.contradiction(section.value_place(key),
                            section.front_of(key) + "a tank is joined to an open ring",
                            section.key_place("lid"), "this one has a lid", "name a standpipe");
    read_width(section, key, words, VesselKind::tank, test);
  } else {
    section.problem(key, fmt::format("'{}' is not understood", *text),
                    key == "falls in" ? "write  standpipe 5 cm wide  or  tank 40 cm wide"
                                      : "write  standpipe 5 cm wide  or  air");
  }
}

void refuse_two_vessels(const SectionReader& section, Reading& reading) {
  if (!section.has("pressed by") || !section.has("falls in")) return;
  reading.contradiction(section.key_place("falls in"),
                        section.front_of("falls in") + "the level falls where it presses",
                        section.key_place("pressed by"), "already said here",
                        "leave one of the two out");
}

void warn_of_silence(const SectionReader& section, const models::Lid& lid, Reading& reading) {
  std::vector<std::string> missing;
  if (!lid.relief_head) missing.emplace_back("relief");
  if (!lid.rating) missing.emplace_back("rating");
  if (missing.empty()) return;
  reading.warn(section.path_of("lid"),
               fmt::format("{} of the lid not stated: the figures are not for use under pressure",
                           fmt::join(missing, " and ")));
}

}  // namespace

void read_lid(const SectionReader& section, Test& test, Reading& reading) {
  if (section.has("lid")) {
    const SectionReader lid = section.subsection("lid");
    models::Lid words;
    if (!lid.is_broken()) {
      words.underside = depth_of(section, lid, test, reading);
      read_strength(lid, words, reading);
    }
    test.lid = words;
    read_ballast_factor(lid, test, reading);
    if (!lid.is_broken()) check_seal(section, lid, test, reading);
  } else if (!section.is_suggested("lid")) {
    refuse_without_lid(section, reading);
  }
  read_vessel(section, "pressed by", test, reading);
  read_vessel(section, "falls in", test, reading);
  refuse_two_vessels(section, reading);
  if (!test.lid || test.vessel != VesselKind::ring) return;
  test.vessel = VesselKind::standpipe;
  test.vessel_diameter = usual_standpipe;
  reading.assume(section.path_of("pressed by"),
                 fmt::format("standpipe {:g} cm wide", 100 * usual_standpipe));
}

void check_lid(const SectionReader& section, const Test& test, const HeadWords& heads,
               Reading& reading) {
  if (!test.lid) return;
  const SectionReader lid = section.subsection("lid");
  if (lid.is_broken()) return;
  for (const StageWords& stage : heads.stages) {
    if (stage.stage.head < test.lid->underside - 1e-9) {
      reading.contradiction(
          stage.place,
          fmt::format("{}a head of {:g} cm does not reach the lid, {:g} cm above the soil",
                      section.front(), 100 * stage.stage.head, 100 * test.lid->underside),
          section.key_place("lid"), "the lid",
          "heads count from the soil: depth under the lid plus pressure");
      return;
    }
    if (test.lid->relief_head && stage.stage.head > *test.lid->relief_head + 1e-9) {
      const std::string_view key = lid.has("relief") ? "relief" : "supply pressure";
      reading.contradiction(stage.place,
                            fmt::format("{}a head of {:g} cm is above the {}", section.front(),
                                        100 * stage.stage.head, key),
                            lid.value_place(key),
                            key == "relief" ? "relief opens here" : "the supply reaches so far",
                            "it counts from the soil, as heads do");
      return;
    }
  }
  if (test.lid->relief_head && test.lid->rating && *test.lid->relief_head > *test.lid->rating)
    reading.warn(section.path_of("lid"), "the relief opens only above what the lid is rated for");
  warn_of_silence(section, *test.lid, reading);
}

}  // namespace ringwright::cases
