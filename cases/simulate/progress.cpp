#include "cases/simulate/progress.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <chrono>
#include <nlohmann/json.hpp>

#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {
namespace {

double real_seconds() {
  const auto now = std::chrono::steady_clock::now().time_since_epoch();
  return std::chrono::duration<double>(now).count();
}

// Seconds between two reports, which is also the silence before the first.
double interval_of(ProgressStyle style) {
  if (style == ProgressStyle::bar) return 0.2;
  return style == ProgressStyle::json ? 0.5 : 5.0;
}

std::string to_go_words(double done, double elapsed) {
  const auto to_go = seconds_to_go(done, elapsed);
  return to_go ? "about " + about_time(std::max(1.0, *to_go)) + " to go" : "time to go not known";
}

}  // namespace

std::optional<ProgressStyle> progress_style(std::string_view word) {
  if (word == "auto") return ProgressStyle::automatic;
  if (word == "bar") return ProgressStyle::bar;
  if (word == "lines") return ProgressStyle::lines;
  if (word == "json") return ProgressStyle::json;
  if (word == "none") return ProgressStyle::none;
  return std::nullopt;
}

std::optional<double> seconds_to_go(double done, double elapsed) {
  if (!(done > 0.02) || !(elapsed > 0.0)) return std::nullopt;
  return elapsed * (1.0 - std::min(done, 1.0)) / done;
}

Progress::Progress(ProgressStyle style, std::ostream& stream, bool redraws, Clock clock)
    : style_(style),
      stream_(stream),
      clock_(clock ? std::move(clock) : Clock(real_seconds)),
      begin_(clock_()) {
  if (style_ == ProgressStyle::automatic) {
    style_ = redraws ? ProgressStyle::bar : ProgressStyle::lines;
  }
}

Progress::~Progress() {
  if (style_ == ProgressStyle::bar && told_) stream_ << '\r' << std::string(70, ' ') << '\r';
  stream_.flush();
}

void Progress::tell(double done) {
  const std::lock_guard lock(mutex_);
  if (style_ == ProgressStyle::none || !(done >= done_)) return;
  done_ = std::min(done, 1.0);
  const double elapsed = clock_() - begin_;
  const bool always = style_ == ProgressStyle::json && (!told_ || done_ >= 1.0);
  if (elapsed - last_told_ < interval_of(style_) && !always) return;
  last_told_ = elapsed;
  told_ = true;
  if (style_ == ProgressStyle::bar) draw_bar(elapsed);
  if (style_ == ProgressStyle::lines) write_line(elapsed);
  if (style_ == ProgressStyle::json) write_json(elapsed);
  stream_.flush();
}

void Progress::draw_bar(double elapsed) {
  constexpr double length = 30.0;
  const std::string filled(static_cast<std::size_t>(length * done_), '=');
  stream_ << '\r'
          << fmt::format("[{:<30}] {:3.0f} %  {:<30}", filled, 100.0 * done_,
                         to_go_words(done_, elapsed));
}

void Progress::write_line(double elapsed) {
  stream_ << fmt::format("{:.0f} % done after {}, {}\n", 100.0 * done_, about_time(elapsed),
                         to_go_words(done_, elapsed));
}

void Progress::write_json(double elapsed) {
  nlohmann::json line = {{"done", done_}, {"elapsed_s", elapsed}, {"to_go_s", nullptr}};
  if (const auto to_go = seconds_to_go(done_, elapsed)) line["to_go_s"] = *to_go;
  stream_ << line.dump() << '\n';
}

}  // namespace ringwright::cases
