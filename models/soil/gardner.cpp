#include "models/soil/gardner.hpp"

#include <cmath>
#include <stdexcept>

#include "models/soil/parameter_text.hpp"

namespace ringwright::models {

Gardner::Gardner(double alpha) : alpha_(alpha) {
  if (!(alpha > 0.0) || std::isinf(alpha)) throw std::invalid_argument("alpha must be above 0");
}

double Gardner::saturation(double h) const { return h < 0.0 ? std::exp(alpha_ * h) : 1.0; }

double Gardner::saturation_slope(double h) const {
  return h < 0.0 ? alpha_ * std::exp(alpha_ * h) : 0.0;
}

double Gardner::head_at(double Se) const {
  if (!(Se > 0.0)) throw std::invalid_argument("no head for a saturation of 0 or less");
  return Se < 1.0 ? std::log(Se) / alpha_ : 0.0;
}

double Gardner::relative_flux_potential(double h) const {
  return h < 0.0 ? std::exp(alpha_ * h) / alpha_ : 1.0 / alpha_ + h;
}

std::string Gardner::describe() const {
  return "Gardner: alpha " + parameter_text(alpha_) + " 1/m";
}

}  // namespace ringwright::models
