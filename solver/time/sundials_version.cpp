#include "solver/time/sundials_version.hpp"

#include <sundials/sundials_config.h>

namespace ringwright::solver {

std::string sundials_version() { return SUNDIALS_VERSION; }

}  // namespace ringwright::solver
