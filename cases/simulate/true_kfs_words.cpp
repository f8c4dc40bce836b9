#include "cases/simulate/true_kfs_words.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::cases {

std::string true_kfs_words(const Case& what, const postprocess::Answer& answer) {
  const double Kfs = postprocess::true_kfs(answer.question);
  const double temperature = what.ground.water_temperature;
  if (temperature == 20.0) return fmt::format("{} mm/h at 20 degC", mm_per_hour(Kfs));
  return fmt::format("{} mm/h at {:g} degC ({} at 20 degC)", mm_per_hour(Kfs), temperature,
                     mm_per_hour(Kfs * answer.question.viscosity_ratio));
}

std::string no_rate_words(const Case& what, const postprocess::Answer& answer) {
  return "The last reading is no rate of the soil and gives no Kfs: the ring was empty, or water "
         "came up in it. The true Kfs is " +
         true_kfs_words(what, answer) + ".";
}

}  // namespace ringwright::cases
