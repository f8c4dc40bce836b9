#include "validation/benchmark/cpu_time.hpp"

#include <ctime>

#include <algorithm>
#include <barrier>
#include <thread>
#include <vector>

namespace ringwright::validation {
namespace {

constexpr double kEnough = 1.0;  // [s]
constexpr std::size_t kFewest = 7, kMost = 200;
constexpr int kRounds = 15;
constexpr double kRoundLength = 0.05;  // [s]

double median(std::vector<double> values) {
  const auto middle = values.begin() + static_cast<std::ptrdiff_t>(values.size() / 2);
  std::nth_element(values.begin(), middle, values.end());
  return *middle;
}

double time_of_calls(const std::function<void()>& work, int calls) {
  const double start = thread_cpu_time();
  for (int i = 0; i < calls; ++i) work();
  return (thread_cpu_time() - start) / calls;
}

double time_together(const std::function<void()>& work, int calls) {
  std::barrier together(2);
  double one = 0.0, other = 0.0;
  const auto run = [&](double& result) {
    together.arrive_and_wait();
    result = time_of_calls(work, calls);
  };
  std::thread second([&] { run(other); });
  run(one);
  second.join();
  return 0.5 * (one + other);
}

}  // namespace

double thread_cpu_time() {
  timespec t{};
  clock_gettime(CLOCK_THREAD_CPUTIME_ID, &t);
  return static_cast<double>(t.tv_sec) + 1e-9 * static_cast<double>(t.tv_nsec);
}

CpuTime cpu_time_of(const std::function<void()>& work) {
  work();
  std::vector<double> times;
  double total = 0.0;
  while (times.size() < kFewest || (total < kEnough && times.size() < kMost)) {
    times.push_back(time_of_calls(work, 1));
    total += times.back();
  }
  return {median(times), *std::min_element(times.begin(), times.end())};
}

SideBySide side_by_side(const std::function<void()>& work) {
  const int calls = std::max(1, static_cast<int>(kRoundLength / time_of_calls(work, 2)));
  std::vector<double> alone, together;
  for (int round = 0; round < kRounds; ++round) {
    alone.push_back(time_of_calls(work, calls));
    together.push_back(time_together(work, calls));
  }
  return {median(alone), median(together)};
}

}  // namespace ringwright::validation
