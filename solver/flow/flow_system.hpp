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
/// Newton sees no extra nonlinearity and coarse far-field cells stay monotone.
///
/// Pitfalls: across a face between two materials Phi differs by material and the Kirchhoff
/// difference is wrong; this class therefore takes one material.

#include <algorithm>
#include <memory>
#include <span>
#include <vector>

#include "models/soil/curves.hpp"
#include "solver/flow/conditions.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/linear/sparse_pattern.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::solver {

class FlowSystem {
 public:
  /// @param conditions one per patch of the mesh, same order
  FlowSystem(const CellsAndFaces& mesh, const models::Soil& soil,
             std::shared_ptr<const CurveTable> table, std::vector<Condition> conditions);

  int cells() const { return static_cast<int>(volume_.size()); }
  int patches() const { return static_cast<int>(patch_outflow_.size()); }
  const CurveTable& table() const { return *table_; }
  const SparsePattern& pattern() const { return pattern_; }
  std::span<const double> volume() const { return volume_; }

  /// Evaluates the conditions that vary, at time t [s].
  void set_time(double t);
  /// Evaluates curves at the unknowns u [m], one per cell.
  void set_state(std::span<const double> u);

  /// Storage W of a cell [-] at the state set, and its slope dW/du [1/m].
  double storage(int i) const {
    const auto k = static_cast<std::size_t>(i);
    return fillable_ * point_[k].Se + soil_.specific_storage * std::max(u_[k], 0.0);
  }
  double storage_slope(int i) const {
    const auto k = static_cast<std::size_t>(i);
    return fillable_ * point_[k].dSe + (u_[k] > 0.0 ? soil_.specific_storage : 0.0);
  }
  const CurvePoint& point(int i) const { return point_[static_cast<std::size_t>(i)]; }
  double storage_of_u(double u) const;

  /// Net outflow of each cell [m3/s]; fills patch_outflow() too.
  void net_outflow(std::span<double> out);
  /// Flow out through each patch [m3/s].
  std::span<const double> patch_outflow() const { return patch_outflow_; }
  /// Adds d(net outflow)/du to the values of pattern().
  void add_jacobian(std::span<double> values) const;

  double fillable() const { return fillable_; }  ///< theta_s - theta_r [-]

 private:
  struct InnerFace {
    int a, b;
    double conductance;     // Ks T
    double rise_a, rise_b;  // w dz, (1 - w) dz
    int aa, ab, ba, bb;     // positions in the matrix
  };
  struct OuterFace {
    int cell, patch, diagonal;
    double conductance, rise_in, rise_out, area, normal_down, position;
    double Phi = 0.0, K = 0.0, flux = 0.0;  // of the condition
  };

  void build_pattern(const CellsAndFaces& mesh);
  double outflow(const OuterFace& f) const;
  double outflow_slope(const OuterFace& f) const;
  void update(OuterFace& f, double t);

  models::Soil soil_;
  std::shared_ptr<const CurveTable> table_;
  std::vector<Condition> conditions_;
  double fillable_;
  std::vector<double> volume_;
  std::vector<InnerFace> inner_;
  std::vector<OuterFace> outer_;
  std::vector<CurvePoint> point_;
  std::vector<double> u_;
  std::vector<double> patch_outflow_;
  SparsePattern pattern_;
  bool varies_ = false;
};

}  // namespace ringwright::solver
