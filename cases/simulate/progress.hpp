#pragma once
/// How far a computation is and how long it still takes, told on the side while it runs.

#include <functional>
#include <mutex>
#include <optional>
#include <ostream>
#include <string>
#include <string_view>

namespace ringwright::cases {

enum class ProgressStyle {
  automatic,  ///< a bar on a terminal that can redraw a line, lines otherwise
  bar,        ///< one line, drawn again and again
  lines,      ///< now and then a line of text
  json,       ///< now and then a JSON object on a line: done, elapsed_s, to_go_s (null: not known)
  none
};

/// "auto", "bar", "lines", "json" or "none".
std::optional<ProgressStyle> progress_style(std::string_view word);

/// Seconds still to go when `done` of the work took `elapsed` seconds; none while too little is
/// done to tell.
std::optional<double> seconds_to_go(double done, double elapsed);

/// Safe to tell from several threads. Short runs stay silent; only JSON tells begin and end always.
class Progress {
 public:
  /// Seconds since any fixed moment.
  using Clock = std::function<double()>;

  /// @param redraws the stream is a terminal that can redraw a line; @param clock none: real time
  Progress(ProgressStyle style, std::ostream& stream, bool redraws, Clock clock = {});
  Progress(const Progress&) = delete;
  Progress& operator=(const Progress&) = delete;
  /// Wipes the bar.
  ~Progress();

  /// @param done fraction; one that is smaller than told before is ignored
  void tell(double done);

 private:
  void draw_bar(double elapsed);
  void write_line(double elapsed);
  void write_json(double elapsed);

  ProgressStyle style_;
  std::ostream& stream_;
  Clock clock_;
  double begin_;
  double last_told_ = 0.0;  // elapsed
  double done_ = 0.0;
  bool told_ = false;
  std::mutex mutex_;
};

}  // namespace ringwright::cases
