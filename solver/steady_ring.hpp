#pragma once
/// Steady flow out of the rings of a test, found as the root of the flow equation, not as a long
/// run.
///
/// The unknown is the flux potential Phi of each cell. In it the capillary flow is linear and
/// only gravity, K(Phi), is not (for a Gardner soil it is linear too), so that Newton's method
/// converges from a rough start; where it does not, a pseudo-time term is added and taken back,
/// and where that stalls (coarse under fine layers) the ground is let run (settle.hpp).
/// The far field is drained and dry, or hydrostatic to a water table: the steady flow does not
/// depend on the moisture before the test.

#include <memory>
#include <optional>
#include <vector>

#include "models/ring/single_ring.hpp"
#include "models/soil/curves.hpp"
#include "solver/domain.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

class CurveTable;
struct Material;

struct SteadyRing {
  models::Soil soil;
  models::SingleRing ring;
  double pond_head = 0.0;  ///< [m]
};

/// Heads held for good [m]; none: that ring is dry, its surface closed.
struct SteadyHeads {
  std::optional<double> ring;
  std::optional<double> outer = std::nullopt;  ///< of the annulus of a double ring
};

struct SteadyFlow {
  double ring_flow = 0.0;      ///< into the soil through the (inner) ring [m3/s]
  double outer_flow = 0.0;     ///< into the soil through the annulus [m3/s]
  double seepage_flow = 0.0;   ///< out of the surface outside the rings [m3/s]
  double balance_error = 0.0;  ///< |in - out| / in [-]
  int iterations = 0;
  int cells = 0;
};

/// @param setup rings and ground; programs and moisture before the test are not used
/// @throws SolverFailure when no steady state is found
SteadyFlow steady_flow(const TestSetup& setup, const SteadyHeads& heads,
                       const Resolution& resolution, const std::vector<Material>& materials);
/// The same on a given domain, to see what the domain does.
SteadyFlow steady_flow(const TestSetup& setup, const SteadyHeads& heads,
                       const Resolution& resolution, const std::vector<Material>& materials,
                       const Domain& domain);

/// A single ring in uniform ground.
SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table);
SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table, const Domain& domain);

}  // namespace ringwright::solver
