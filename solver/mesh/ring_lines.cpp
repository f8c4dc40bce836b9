#include "solver/mesh/ring_lines.hpp"

#include <algorithm>
#include <cmath>

#include "models/soil/capillary_length.hpp"
#include "solver/mesh/grading.hpp"
#include "solver/mesh/ring_soils.hpp"
#include "solver/mesh/ring_walls.hpp"

namespace ringwright::solver {
namespace {

using models::SingleRing;

// A line that must be there, at a radius or a depth, and the size of the cells beside it.
struct Line {
  double at, size;
};

void append(std::vector<double>& edges, const std::vector<double>& more) {
  edges.insert(edges.end(), more.begin() + (edges.empty() ? 0 : 1), more.end());
}

// Lines that come first hold their place against later ones as good as equal.
void add(std::vector<Line>& lines, Line line, double same) {
  for (Line& other : lines)
    if (std::abs(other.at - line.at) <= same) {
      other.size = std::min(other.size, line.size);
      return;
    }
  lines.push_back(line);
}

void sort(std::vector<Line>& lines) {
  std::sort(lines.begin(), lines.end(), [](Line a, Line b) { return a.at < b.at; });
}

bool lies_in_gap(const TestSetup& setup, double radius) {
  if (!setup.gap) return false;
  for (const SingleRing& ring : rings_of(setup))
    if (ring.insertion > 0.0 && std::abs(radius - ring.radius) < setup.gap->width) return true;
  return false;
}

bool lies_below_foot_in_gap(const TestSetup& setup, double depth) {
  if (!setup.gap) return false;
  for (const SingleRing& ring : rings_of(setup))
    if (ring.insertion > 0.0 && depth > ring.insertion && depth < ring.insertion + setup.gap->width)
      return true;
  return false;
}

// The size that grading from `tip` has reached at a distance.
double grown(double tip, double growth, double distance) {
  return tip + (1.0 - 1.0 / growth) * distance;
}

void add_borders(std::vector<Line>& lines, const TestSetup& setup, const SingleRing& ring,
                 double size) {
  constexpr double same = 1e-6;
  double width = 0.0;
  for (double next :
       {setup.gap ? setup.gap->width : 0.0, setup.disturbed ? setup.disturbed->width : 0.0}) {
    if (next <= 0.0) continue;
    width += next;
    if (ring.radius - width > same) add(lines, {ring.radius - width, size}, same);
    add(lines, {ring.radius + width, size}, same);
  }
}

std::vector<Line> radial_lines(const TestSetup& setup, const Resolution& resolution) {
  std::vector<Line> lines;
  const std::vector<SingleRing> rings = rings_of(setup);
  const bool bare = inner_ring_divides_nothing(setup);
  const auto size_at = [&](const SingleRing& ring) {
    const double size = resolution.tip_cell * stretch_at_foot(setup, ring);
    return setup.gap && ring.insertion > 0.0 ? std::min(size, setup.gap->width) : size;
  };
  for (std::size_t k = bare ? 1 : 0; k < rings.size(); ++k) {
    lines.push_back({rings[k].radius, size_at(rings[k])});
    if (rings[k].insertion <= 0.0)
      lines.push_back({rings[k].radius + rings[k].wall, size_at(rings[k])});
  }
  for (const SingleRing& ring : rings)
    if (ring.insertion > 0.0) add_borders(lines, setup, ring, size_at(ring));
  if (bare) {
    const double a = setup.ring.radius, from = setup.outer_ring->radius - a;
    const double size = grown(size_at(*setup.outer_ring), resolution.growth, from);
    add(lines, {a, std::min({size, a / 6, from / 2})}, 1e-6);
  }
  sort(lines);
  return lines;
}

// Where the ground changes, cells are as small as the grading would have made them there anyway,
// but not coarse against the capillary length, nor against the layer they are in.
double size_at_layer(const TestSetup& setup, const Resolution& resolution, std::size_t layer) {
  const models::Layer& below = setup.layers_below[layer];
  const double above = layer == 0 ? 0.0 : setup.layers_below[layer - 1].top;
  double lambda = INFINITY, thickness = below.top - above;
  for (int side : {0, 1})
    lambda = std::min(lambda, models::capillary_length(
                                  *layer_soil(setup, static_cast<int>(layer) + side).curves));
  if (layer + 1 < setup.layers_below.size())
    thickness = std::min(thickness, setup.layers_below[layer + 1].top - below.top);
  double deepest = 0.0;
  for (const SingleRing& ring : rings_of(setup)) deepest = std::max(deepest, ring.insertion);
  const double grown_to =
      grown(resolution.tip_cell, resolution.growth_down, std::max(0.0, below.top - deepest));
  return std::min({grown_to, std::max(resolution.tip_cell, lambda / 2), thickness / 2});
}

// Above a water table rest is a balance of capillary flow and gravity, and holds on cells that are
// small against the capillary length.
void add_fringe(std::vector<Line>& lines, const TestSetup& setup, const Domain& domain,
                double tip) {
  const double table = *setup.water_table;
  const double lambda = models::capillary_length(*layer_soil(setup, layer_at(setup, table)).curves);
  const Line at_table{table, std::max(tip / 2, lambda / 5)};
  if (at_table.at + at_table.size < domain.depth) add(lines, at_table, tip / 4);
  const Line above{table - 3 * lambda, std::max(tip / 2, lambda / 3)};
  double deepest = 0.0;
  for (const Line& line : lines)
    if (line.at < table) deepest = std::max(deepest, line.at);
  if (above.at > deepest + 2 * above.size) lines.push_back(above);
}

std::vector<Line> depth_lines(const TestSetup& setup, const Domain& domain,
                              const Resolution& resolution) {
  const double tip = resolution.tip_cell;
  bool strip = false, driven = false;
  std::vector<Line> lines;
  const std::vector<SingleRing> rings = rings_of(setup);
  for (std::size_t k = inner_ring_divides_nothing(setup) ? 1 : 0; k < rings.size(); ++k)
    (rings[k].insertion > 0.0 ? driven : strip) = true;
  const double top = std::min(resolution.top_cell, tip);
  lines.push_back({0.0, !strip ? resolution.top_cell : driven ? top : tip});
  const double foot = setup.gap ? std::min(tip, setup.gap->width) : tip;
  for (const SingleRing& ring : rings)
    if (ring.insertion > 0.0) add(lines, {ring.insertion, foot}, 0.0);
  if (setup.gap)
    for (const SingleRing& ring : rings)
      if (ring.insertion > 0.0) add(lines, {ring.insertion + setup.gap->width, foot}, 1e-6);
  const auto inside = [&](Line line) { return line.at + line.size < domain.depth; };
  for (std::size_t k = 0; k < setup.layers_below.size(); ++k) {
    const Line line{setup.layers_below[k].top, size_at_layer(setup, resolution, k)};
    if (inside(line)) add(lines, line, kSameDepth);
  }
  if (setup.water_table) add_fringe(lines, setup, domain, tip);
  sort(lines);
  return lines;
}

}  // namespace

std::vector<double> ring_radii(const TestSetup& setup, const Domain& domain,
                               const Resolution& resolution) {
  const std::vector<Line> lines = radial_lines(setup, resolution);
  const double growth = resolution.growth;
  std::vector<double> radii = graded_one_end(lines[0].at, 0.0, lines[0].size, growth);
  std::reverse(radii.begin(), radii.end());
  radii.front() = 0.0;
  for (std::size_t k = 0; k + 1 < lines.size(); ++k) {
    const Line from = lines[k], to = lines[k + 1];
    if (lies_in_gap(setup, 0.5 * (from.at + to.at)))
      radii.push_back(to.at);
    else
      append(radii, graded_both_ends(from.at, to.at, from.size, to.size, growth));
  }
  append(radii, graded_one_end(lines.back().at, domain.radius, lines.back().size, growth));
  return radii;
}

std::vector<double> ring_elevations(const TestSetup& setup, const Domain& domain,
                                    const Resolution& resolution) {
  const std::vector<Line> lines = depth_lines(setup, domain, resolution);
  double shallowest = INFINITY;
  for (const SingleRing& ring : rings_of(setup))
    if (ring.insertion > 0.0) shallowest = std::min(shallowest, ring.insertion);
  std::vector<double> elevations;
  for (std::size_t k = 0; k + 1 < lines.size(); ++k) {
    const Line from = lines[k], to = lines[k + 1];
    const bool above_feet = std::isfinite(shallowest) && to.at <= shallowest && !setup.gap;
    if (lies_below_foot_in_gap(setup, 0.5 * (from.at + to.at)))
      elevations.push_back(-to.at);
    else
      append(elevations,
             graded_both_ends(-from.at, -to.at, from.size, to.size,
                              above_feet ? resolution.growth_inside : resolution.growth_down));
  }
  append(elevations, graded_one_end(-lines.back().at, -domain.depth, lines.back().size,
                                    resolution.growth_down));
  return elevations;
}

}  // namespace ringwright::solver
