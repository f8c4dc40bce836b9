#include "solver/flow/material_face.hpp"

#include <cmath>

namespace ringwright::solver {
namespace {

constexpr int kMostIterations = 80;
constexpr double kSame = 1e-13;
constexpr double kFarthest = 1e7;  // [m]

// Both halves at a head of the face.
class FaceBalance {
 public:
  FaceBalance(const HalfFace& a, const HalfFace& b, const CurvePoint& at_a, const CurvePoint& at_b)
      : a_(a),
        b_(b),
        into_(a.conductance * pushed(at_a, a.rise_cell)),
        out_(-b.conductance * pushed(at_b, -b.rise_cell)) {}

  // q_a - q_b, falling with h
  double operator()(double h) {
    A = a_.table->at_head(h);
    B = b_.table->at_head(h);
    q_a = into_ - a_.conductance * pushed(A, -a_.rise_face);
    q_b = out_ + b_.conductance * pushed(B, b_.rise_face);
    slope_a = -a_.conductance * pushed_slope(A, -a_.rise_face);
    slope_b = b_.conductance * pushed_slope(B, b_.rise_face);
    return q_a - q_b;
  }
  double size() const { return std::abs(q_a) + std::abs(q_b) + std::abs(into_) + std::abs(out_); }

  CurvePoint A, B;
  double q_a = 0.0, q_b = 0.0, slope_a = 0.0, slope_b = 0.0;

 private:
  const HalfFace &a_, &b_;
  double into_, out_;
};

// Heads spread over decades: halved on a scale that is linear about 0 and logarithmic beyond.
double middle(double low, double high) {
  constexpr double kLinear = 1e-3;  // [m]
  return kLinear * std::sinh(0.5 * (std::asinh(low / kLinear) + std::asinh(high / kLinear)));
}

// Newton's method within the bracket that its own signs build up.
double face_head(FaceBalance& f, double h) {
  double low = -kFarthest, high = kFarthest;
  for (int i = 0; i < kMostIterations; ++i) {
    const double value = f(h);
    if (std::abs(value) <= kSame * f.size()) return h;
    (value > 0.0 ? low : high) = h;
    double next = h - value / (f.slope_a - f.slope_b);
    if (!(next > low && next < high)) next = middle(low, high);
    if (std::abs(next - h) <= 1e-15 * (1e-3 + std::abs(h))) return h;
    h = next;
  }
  return h;
}

}  // namespace

MaterialFlow material_flow(const HalfFace& a, const HalfFace& b, const CurvePoint& at_a,
                           const CurvePoint& at_b, double& head) {
  FaceBalance f(a, b, at_a, at_b);
  head = face_head(f, head);
  const double own_a = a.conductance * pushed_slope(at_a, a.rise_cell);
  const double own_b = -b.conductance * pushed_slope(at_b, -b.rise_cell);
  const double sum = f.slope_b - f.slope_a;
  return {0.5 * (f.q_a + f.q_b), own_a * f.slope_b / sum, -own_b * f.slope_a / sum};
}

}  // namespace ringwright::solver
