#include "solver/wetted.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace ringwright::solver {
namespace {

constexpr double kMovedAtEdge = 1e-3;  // of dtheta, at the outer faces of the domain
constexpr double kFartherIn = 1.5;
constexpr double kWettedShare = 0.05;  // of dtheta, defines the wetted body
constexpr double kFull = 1e-3;         // dtheta below which a cell has nothing left to fill [-]

}  // namespace

WettedGround::WettedGround(const FlowSystem& flow, const Drawing& drawing,
                           std::vector<double> before, double wall_radius)
    : flow_(flow), drawing_(drawing), before_(std::move(before)), wall_radius_(wall_radius) {
  const auto& centres = drawing_.centres;
  while (columns_ < centres.size() && centres[columns_][1] == centres[0][1]) ++columns_;
}

double WettedGround::fillable(std::size_t cell) const {
  return flow_.fillable(static_cast<int>(cell)) - before_[cell];
}

// Storage above which a cell counts as wetted. Where the ground far outside became wetter by
// itself, that is where it starts from.
double WettedGround::limit(std::size_t cell, std::span<const double> storage) const {
  if (fillable(cell) < kFull) return std::numeric_limits<double>::infinity();
  const std::size_t far = cell - cell % columns_ + columns_ - 1;
  return std::max(before_[cell], storage[far]) + kWettedShare * fillable(cell);
}

// Where the wetted body ends along a line of cells, linear between centres.
Wetted WettedGround::extent(std::span<const double> storage) const {
  const auto& centres = drawing_.centres;
  const std::size_t n = before_.size();
  const auto end = [&](std::size_t inner, std::size_t outer, std::size_t axis) {
    const double a = storage[inner] - limit(inner, storage);
    const double b = storage[outer] - limit(outer, storage);
    const double share = std::isfinite(b) ? a / (a - b) : 0.5;
    return centres[inner][axis] + share * (centres[outer][axis] - centres[inner][axis]);
  };
  const auto is_wet = [&](std::size_t c) { return storage[c] >= limit(c, storage); };
  Wetted w;
  for (std::size_t c = 0; c < n; ++c) {
    if (!is_wet(c)) continue;
    const std::size_t below = c + columns_, right = c + 1;
    if (below < n && !is_wet(below)) w.depth = std::max(w.depth, -end(c, below, 1));
    if (right % columns_ != 0 && !is_wet(right))
      w.beyond_wall = std::max(w.beyond_wall, end(c, right, 0) - wall_radius_);
  }
  return w;
}

// The ground may drain everywhere, so what counts is not that theta moved at the edge but
// that it moved differently there: across the last columns and along the bottom.
bool WettedGround::reached_the_edge(std::span<const double> storage) const {
  const auto& centres = drawing_.centres;
  const std::size_t rows = before_.size() / columns_;
  const auto limit = [&](std::size_t c) { return kMovedAtEdge * std::max(fillable(c), kFull); };
  // compared with a column a fair share farther in, however wide the outer cells are
  std::size_t back = 1;
  const auto radius = [&](std::size_t column) { return centres[column][0]; };
  while (back + 1 < columns_ && radius(columns_ - 1 - back) > radius(columns_ - 1) / kFartherIn)
    ++back;
  for (std::size_t j = 0; j < rows; ++j) {
    const std::size_t last = j * columns_ + columns_ - 1;
    if (std::abs(storage[last] - storage[last - back]) > limit(last)) return true;
  }
  const std::size_t bottom = (rows - 1) * columns_;
  return std::abs(storage[bottom] - storage[bottom + columns_ - 1]) > limit(bottom);
}

}  // namespace ringwright::solver
