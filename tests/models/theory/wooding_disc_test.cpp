#include "models/theory/wooding_disc.hpp"

#include <catch2/catch.hpp>

using ringwright::models::wooding_disc_flow;

TEST_CASE("Wooding's disc: below the exact flow by its known error", "[theory]") {
  // Exact Q alpha/(Ks a) at alpha a 0.1, 1, 4 and Wooding's error [%]: computed for this project
  // by an independent prototype (spectral solution of the dual integral equations).
  struct Row {
    double alpha_a, exact, error;
  };
  for (const Row& row : {Row{0.1, 4.51107, -4.4}, Row{1, 7.53378, -5.2}, Row{4, 16.80567, -1.4}}) {
    const double alpha = row.alpha_a / 0.1;
    const double scaled = wooding_disc_flow(2e-6, alpha, 0.1) * alpha / (2e-6 * 0.1);
    CHECK(100 * (scaled / row.exact - 1) == Approx(row.error).margin(0.05));
  }
}
