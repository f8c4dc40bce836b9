#include <limits>

#include "models/ring/lid_lift.hpp"
#include "postprocess/reading/flags/closed_ring.hpp"
#include "postprocess/reading/flags/flags.hpp"

namespace ringwright::postprocess {
namespace {

// Raised where the weight does not hold the lift with the factor.
void lift(const TestAsRead& test, const models::Lid& lid, std::vector<Flag>& flags) {
  const double highest = lid.relief_head.value_or(highest_head(test, false));
  const models::LidLift found = models::lid_lift(lid, highest, test.question.setup.ring.radius,
                                                 test.question.circumstances.ballast_factor);
  // where nobody says how high the pressure can go, no ballast can be named
  const double ballast = lid.relief_head ? found.ballast : std::numeric_limits<double>::quiet_NaN();
  if (found.ballast > 0.0 || !lid.relief_head)
    flags.push_back({FlagKind::lid_lift, found.force, found.force - found.net_force, ballast});
}

}  // namespace

void lid_flags(const TestAsRead& test, std::vector<Flag>& flags) {
  if (!is_closed_ring(test.question)) return;
  const models::Lid lid = test.question.circumstances.lid.value_or(models::Lid{});
  lift(test, lid, flags);
  if (!models::is_stated_safe(lid))
    flags.push_back(
        {FlagKind::lid_not_for_use, lid.relief_head.value_or(0.0), lid.rating.value_or(0.0)});
}

}  // namespace ringwright::postprocess
