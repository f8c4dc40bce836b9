#include "solver/ring_patches.hpp"

#include <algorithm>
#include <stdexcept>
#include <string>

namespace ringwright::solver {

RingPatches ring_patches(const CellsAndFaces& mesh) {
  const auto index = [&](const std::string& name) {
    const auto it = std::find(mesh.patches.begin(), mesh.patches.end(), name);
    if (it == mesh.patches.end()) throw std::invalid_argument("the mesh has no patch " + name);
    return static_cast<std::size_t>(it - mesh.patches.begin());
  };
  return {index("ring"), index("outside"), index("bottom")};
}

std::vector<Condition> ring_conditions(const CellsAndFaces& mesh, double pond_head) {
  const RingPatches p = ring_patches(mesh);
  std::vector<Condition> c(mesh.patches.size());
  c[p.ring] = Condition::constant(Boundary::head, pond_head);
  c[p.outside].kind = Boundary::seepage;
  c[p.bottom].kind = Boundary::free_drainage;
  return c;
}

}  // namespace ringwright::solver
