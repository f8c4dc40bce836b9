#include "cases/input/read_incident.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/phrase_parts.hpp"

namespace ringwright::cases {
namespace {

constexpr std::string_view key = "incident";

void problem(const LocatedNode& item, const SectionReader& section, std::string message,
             Reading& reading) {
  reading.problem(item.place, section.front_of(key) + std::move(message),
                  "write for example: outer ring empty from 1 h 10 min to 1 h 40 min");
}

// In whose ring; null if the words are not understood.
RingProgram* ring_of(std::string_view words, Test& test) {
  if (words == "outer ring") return test.outer_ring ? &test.outer : nullptr;
  return words == "ring" || words == "inner ring" ? &test.program : nullptr;
}

void read_one(const LocatedNode& item, const SectionReader& section, Test& test, Reading& reading) {
  const auto halves = split(trimmed(item.text), " empty from ");
  const auto times = split(halves.back(), " to ");
  if (halves.size() != 2 || times.size() != 2) {
    problem(item, section, fmt::format("'{}' is not understood", item.text), reading);
    return;
  }
  RingProgram* ring = ring_of(halves[0], test);
  if (!ring) {
    problem(item, section, fmt::format("there is no '{}'", halves[0]), reading);
    return;
  }
  const auto from = section.quantity_in(key, times[0]);
  const auto to = section.quantity_in(key, times[1]);
  if (!from || !to) return;
  if (*to <= *from) {
    problem(item, section, "it ends before it begins", reading);
  } else if (*to > test.protocol.longest * (1 + 1e-9)) {
    problem(
        item, section,
        fmt::format("outside the test, which ends after {:.4g} min", test.protocol.longest / 60),
        reading);
  } else if (!ring->empty.empty() && *from < ring->empty.back().to) {
    problem(item, section, "it begins before the one before ends", reading);
  } else {
    ring->empty.push_back({*from, *to});
  }
}

}  // namespace

void read_incidents(const SectionReader& section, Test& test, Reading& reading) {
  for (const LocatedNode* item : section.items(key)) {
    if (item->kind == LocatedNode::Kind::scalar && !trimmed(item->text).empty())
      read_one(*item, section, test, reading);
    else
      problem(*item, section, "words are needed", reading);
  }
}

}  // namespace ringwright::cases
