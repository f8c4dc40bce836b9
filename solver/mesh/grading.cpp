#include "solver/mesh/grading.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

namespace ringwright::solver {
namespace {

void check_growth(double growth) {
  if (!(growth >= 1.0)) throw std::invalid_argument("cells must not shrink away from an end");
}

// Added term by term: the closed form loses all digits near ratio 1.
double geometric_sum(double first, double ratio, int count) {
  double sum = 0.0;
  for (int i = 0; i < count; ++i, first *= ratio) sum += first;
  return sum;
}

// Ratio at which the two ends together fill the length. The sum grows with the ratio.
double fitting_ratio(double length, double first, int n_first, double last, int n_last,
                     double growth) {
  double low = 0.2, high = growth * 1.0001;
  for (int i = 0; i < 100; ++i) {
    const double q = 0.5 * (low + high);
    const double sum = geometric_sum(first, q, n_first) + geometric_sum(last, q, n_last);
    (sum < length ? low : high) = q;
  }
  return 0.5 * (low + high);
}

}  // namespace

std::vector<double> graded_one_end(double from, double to, double first, double growth) {
  check_growth(growth);
  const double length = std::abs(to - from), sign = to > from ? 1.0 : -1.0;
  std::vector<double> edges{from};
  if (length <= 1.5 * first) {
    edges.push_back(to);
    return edges;
  }
  int n = 1;
  while (geometric_sum(first, growth, n) < length) ++n;
  const double q = fitting_ratio(length, first, n, 0.0, 0, growth);
  double size = first, x = 0.0;
  for (int i = 0; i + 1 < n; ++i, size *= q) edges.push_back(from + sign * (x += size));
  edges.push_back(to);
  return edges;
}

std::vector<double> graded_both_ends(double from, double to, double first, double last,
                                     double growth) {
  const double length = std::abs(to - from), sign = to > from ? 1.0 : -1.0;
  check_growth(growth);
  if (first + last >= length) {  // too short for two ends: equal cells no wider than either
    const int n = std::max(1, static_cast<int>(std::ceil(length / std::min(first, last))));
    std::vector<double> equal;
    for (int i = 0; i < n; ++i) equal.push_back(from + (to - from) * i / n);
    equal.push_back(to);
    return equal;
  }
  // What two end cells leave open may be a sliver: three smaller cells then, in the proportions
  // of the ends.
  const double three = first + last + std::min(first, last);
  if (length < three - 0.5 * std::min(first, last)) {
    const double share = length / three;
    return graded_both_ends(from, to, share * first, share * last, growth);
  }
  int n_first = 1, n_last = 1;
  double size_first = first, size_last = last, sum = first + last;
  while (sum < length) {
    if (size_first * growth <= size_last * growth)
      size_first *= growth, sum += size_first, ++n_first;
    else
      size_last *= growth, sum += size_last, ++n_last;
  }
  const double q = fitting_ratio(length, first, n_first, last, n_last, growth);
  std::vector<double> edges{from};
  double size = first, x = 0.0;
  for (int i = 0; i < n_first; ++i, size *= q) edges.push_back(from + sign * (x += size));
  size = last * std::pow(q, n_last - 1);
  for (int i = 0; i + 1 < n_last; ++i, size /= q) edges.push_back(from + sign * (x += size));
  edges.push_back(to);
  return edges;
}

std::vector<double> graded_centres(const std::vector<double>& edges) {
  const std::size_t n = edges.size() - 1;
  std::vector<double> centres;
  for (std::size_t i = 0; i < n; ++i) {
    double g = 1.0;  // the cells at the two ends keep their midpoint
    if (i > 0 && i + 1 < n)
      g = std::sqrt((edges[i + 2] - edges[i + 1]) / (edges[i] - edges[i - 1]));
    centres.push_back(edges[i] + (edges[i + 1] - edges[i]) / (1.0 + std::sqrt(g)));
  }
  return centres;
}

}  // namespace ringwright::solver
