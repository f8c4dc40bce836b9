#pragma once
#include <signal.h>

namespace ringwright::cases {

/// While it lives, Ctrl-C does not end the program but asks it to stop at the next step; a second
/// Ctrl-C ends it at once. One at a time.
class Interrupt {
 public:
  Interrupt();
  Interrupt(const Interrupt&) = delete;
  Interrupt& operator=(const Interrupt&) = delete;
  ~Interrupt();

  /// Ctrl-C was pressed since this was made; may be asked from any thread.
  static bool asked();

 private:
  struct sigaction before_ {};
};

}  // namespace ringwright::cases
