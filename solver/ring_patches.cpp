#include "solver/ring_patches.hpp"

#include <algorithm>
#include <stdexcept>
#include <string>

namespace ringwright::solver {

RingPatches ring_patches(const CellsAndFaces& mesh) {
  const auto find = [&](const std::string& name) -> std::optional<std::size_t> {
    const auto it = std::find(mesh.patches.begin(), mesh.patches.end(), name);
    if (it == mesh.patches.end()) return std::nullopt;
    return static_cast<std::size_t>(it - mesh.patches.begin());
  };
  const auto index = [&](const std::string& name) {
    const auto found = find(name);
    if (!found) throw std::invalid_argument("the mesh has no patch " + name);
    return *found;
  };
  return {index("ring"), index("outside"), index("bottom"), index("side"), find("annulus")};
}

std::vector<Condition> ground_conditions(const CellsAndFaces& mesh, const TestSetup& setup) {
  const RingPatches p = ring_patches(mesh);
  std::vector<Condition> c(mesh.patches.size());
  c[p.outside].kind = Boundary::seepage;
  if (!setup.water_table) {
    c[p.bottom].kind = Boundary::free_drainage;
    return c;
  }
  const double table = -*setup.water_table;
  c[p.side] = {Boundary::head, [table](double, double z) { return table - z; }, false};
  return c;
}

}  // namespace ringwright::solver
