#pragma once
/// The discrete flow equation on cells and faces: flows, net outflow of each cell and its
/// Jacobian. Knows no coordinates and no time stepping.
///
/// Mixed form of the Richards equation, finite volumes:
///
///   V dW/dt = - sum of flows out of the cell,   W = (theta - theta_r) + Ss max(h, 0)
///
/// Flow through the face from cell a to cell b, T its transmissibility, dz = z_a - z_b:
///
///   q = Ks T [ Phi_a - Phi_b + (w Kr_a + (1 - w) Kr_b) dz ]
///
/// The capillary part is the Kirchhoff difference, exact where Kr between the two cells is
/// monotone, so no mean of K enters it. The gravity part takes the arithmetic mean on fine
/// cells and turns to the upstream K where a cell is tall against the capillary length
/// lambda: w = (1 + coth(p) - 1/p) / 2 with p = dz / (2 lambda), the weight for which the
/// steady one-dimensional flow of a Gardner soil is exact (exponential fitting; Il'in 1969,
/// Scharfetter & Gummel 1969). It depends on mesh and soil only, not on the state, so
/// Newton sees no extra nonlinearity and coarse far-field cells stay monotone. Where a soil's K
/// falls off faster than its capillary length says, a tall wet cell under a dry one would still
/// draw water out of it down to nothing: what the lower cell adds to the gravity flow is therefore
/// not more than what its own capillarity holds back, (1 - w) Kr_b dz <= Phi_b.
///
/// Across a face between two materials Phi differs by material and the Kirchhoff difference is
/// wrong: there the head at the face is found from equal flow on both sides (material_face.hpp).
/// Horizontal flow takes Ks times the soil's anisotropy.
///
/// The unknowns are those of the cells and, behind them, the heads of the ponds (pond.hpp). A pond
/// takes part only while the condition of its patch is Boundary::pond; otherwise it rests.

#include <algorithm>
#include <memory>
#include <span>
#include <vector>

#include "models/soil/curves.hpp"
#include "solver/flow/conditions.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/flow/material.hpp"
#include "solver/flow/material_face.hpp"
#include "solver/flow/pond.hpp"
#include "solver/linear/sparse_pattern.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::solver {

class FlowSystem {
 public:
  /// @param materials one per soil index of the mesh
  /// @param conditions one per patch of the mesh, same order
  /// @throws std::invalid_argument when these do not fit the mesh
  FlowSystem(const CellsAndFaces& mesh, std::vector<Material> materials,
             std::vector<Condition> conditions, std::vector<Pond> ponds = {});
  /// The same for ground of one soil.
  FlowSystem(const CellsAndFaces& mesh, const models::Soil& soil,
             std::shared_ptr<const CurveTable> table, std::vector<Condition> conditions);

  int cells() const { return cells_; }
  /// Cells and ponds.
  int unknowns() const { return static_cast<int>(volume_.size()); }
  int patches() const { return patches_; }
  int ponds() const { return static_cast<int>(ponds_.size()); }
  /// Index of the unknown of pond k.
  int pond_unknown(int k) const { return cells_ + k; }
  const SparsePattern& pattern() const { return pattern_; }
  /// Of the cells, and of the ponds area times scale [m3].
  std::span<const double> volume() const { return volume_; }
  const Material& material(int i) const { return materials_[static_cast<std::size_t>(soil_[i])]; }
  const CurveTable& table(int i) const { return *material(i).table; }

  /// Another condition on a patch; takes effect at once, values at time t [s].
  void set_condition(int patch, Condition condition, double t);
  void set_feed(int pond, const PondFeed& feed) { feeds_[static_cast<std::size_t>(pond)] = feed; }

  /// Evaluates the conditions that vary, at time t [s].
  void set_time(double t);
  /// Evaluates curves at the unknowns u [m].
  void set_state(std::span<const double> u);

  /// Storage W of an unknown [-] at the state set, and its slope dW/du [1/m].
  double storage(int i) const {
    const auto k = static_cast<std::size_t>(i);
    return fillable_[k] * point_[k].Se + specific_storage_[k] * std::max(u_[k], 0.0);
  }
  double storage_slope(int i) const {
    const auto k = static_cast<std::size_t>(i);
    return fillable_[k] * point_[k].dSe + (u_[k] > 0.0 ? specific_storage_[k] : 0.0);
  }
  const CurvePoint& point(int i) const { return point_[static_cast<std::size_t>(i)]; }
  /// Storage of a cell at another value of its unknown.
  double storage_of_u(int cell, double u) const;
  double head_of_u(int i, double u) const;
  double u_of_head(int i, double h) const;
  /// theta_s - theta_r of a cell [-]; 1 for a pond.
  double fillable(int i) const { return fillable_[static_cast<std::size_t>(i)]; }
  /// Where the branches of an unknown meet: below `driest` nothing is, above `entry` storage is
  /// flat (for a pond: below), below `turn` the unknown is affine in the storage.
  struct Bounds {
    double driest, entry, turn;
  };
  const Bounds& bounds(int i) const { return bounds_[static_cast<std::size_t>(i)]; }

  /// Net outflow of each unknown [m3/s]; fills totals() too.
  void net_outflow(std::span<double> out);
  /// Flow out through each patch [m3/s], behind them for each pond what its supply gives and what
  /// evaporates.
  std::span<const double> totals() const { return totals_; }
  std::span<const double> patch_outflow() const {
    return std::span<const double>(totals_).first(static_cast<std::size_t>(patches_));
  }
  int supply_total(int pond) const { return patches_ + 2 * pond; }
  int evaporation_total(int pond) const { return patches_ + 2 * pond + 1; }
  /// Largest position on a patch at which water comes out, at the state set.
  double farthest_outflow(int patch) const;
  /// Adds d(net outflow)/du to the values of pattern().
  void add_jacobian(std::span<double> values) const;

 private:
  struct InnerFace {
    int a, b;
    double conductance;     // Ks T
    double rise_a, rise_b;  // w dz, (1 - w) dz
    int aa, ab, ba, bb;     // positions in the matrix
  };
  struct MixedFace {
    int a, b;
    HalfFace half_a, half_b;
    double head = 0.0;  // at the face, found last
    MaterialFlow flow = {};
    int aa = 0, ab = 0, ba = 0, bb = 0;
  };
  struct OuterFace {
    int cell, patch, diagonal;
    double conductance, rise_in, rise_out, area, normal_down, position;
    double Phi = 0.0, K = 0.0, flux = 0.0;  // of the condition
    double dPhi = 0.0, dK = 0.0;            // with respect to the head of a pond
    int cell_pond = -1, pond_cell = -1;     // positions in the matrix
  };
  struct Stretch {  // consecutive cells of one material
    std::size_t begin, end;
    const CurveTable* table;
  };

  void add_face(const Face& f);
  void add_outer_face(const BoundaryFace& f);
  void add_pond(const Pond& pond);
  void build_pattern();
  const Condition& condition(const OuterFace& f) const {
    return conditions_[static_cast<std::size_t>(f.patch)];
  }
  double outflow(const OuterFace& f) const;
  double outflow_slope(const OuterFace& f) const;
  void update(OuterFace& f, double t);
  bool is_active(std::size_t pond) const;
  void set_pond_state(std::size_t pond);
  void set_mixed_faces();
  void add_pond_flows(std::span<double> out);
  void add_pond_jacobian(std::span<double> values) const;

  int cells_ = 0, patches_ = 0;
  std::vector<Material> materials_;
  std::vector<int> soil_;
  std::vector<Condition> conditions_;
  std::vector<Pond> ponds_;
  std::vector<PondFeed> feeds_;
  std::vector<int> pond_of_patch_;  // -1: none
  std::vector<double> volume_, fillable_, specific_storage_;
  std::vector<Bounds> bounds_;
  std::vector<Stretch> stretches_;
  std::vector<InnerFace> inner_;
  std::vector<MixedFace> mixed_;
  std::vector<OuterFace> outer_;
  std::vector<CurvePoint> point_;
  std::vector<double> u_;
  std::vector<double> totals_;
  SparsePattern pattern_;
  bool varies_ = false;
};

}  // namespace ringwright::solver
