#include "cases/command/interrupt.hpp"

#include <atomic>

namespace ringwright::cases {
namespace {

// A signal handler reaches nothing but static storage.
std::atomic<bool> asked_to_stop{false};
static_assert(std::atomic<bool>::is_always_lock_free);

}  // namespace

Interrupt::Interrupt() {
  asked_to_stop = false;
  struct sigaction action {};
  action.sa_handler = [](int) { asked_to_stop = true; };
  sigemptyset(&action.sa_mask);
  action.sa_flags = static_cast<int>(SA_RESETHAND | SA_RESTART);
  sigaction(SIGINT, &action, &before_);
}

Interrupt::~Interrupt() { sigaction(SIGINT, &before_, nullptr); }

bool Interrupt::asked() { return asked_to_stop; }

}  // namespace ringwright::cases
