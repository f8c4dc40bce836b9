#pragma once
/// CPU time of the calling thread; other work on the machine hardly enters it.

#include <functional>

namespace ringwright::validation {

/// [s]
double thread_cpu_time();

struct CpuTime {
  double median = 0.0, least = 0.0;  ///< of one call [s]
};

/// Calls `work` once unmeasured, then 7 times or for about a second, whichever is more, at most
/// 200 times.
CpuTime cpu_time_of(const std::function<void()>& work);

struct SideBySide {
  double alone = 0.0, together = 0.0;  ///< CPU time of one call [s], medians over rounds
};

/// The same work on one thread and on two threads at once, in alternating rounds.
SideBySide side_by_side(const std::function<void()>& work);

}  // namespace ringwright::validation
