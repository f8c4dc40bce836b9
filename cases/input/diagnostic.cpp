#include "cases/input/diagnostic.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <string_view>
#include <tuple>

namespace ringwright::cases {
namespace {

std::vector<std::string_view> lines_of(std::string_view text) {
  std::vector<std::string_view> lines;
  while (true) {
    const std::size_t end = text.find('\n');
    std::string_view line = text.substr(0, end);
    if (!line.empty() && line.back() == '\r') line.remove_suffix(1);
    lines.push_back(line);
    if (end == std::string_view::npos) return lines;
    text.remove_prefix(end + 1);
  }
}

// Tabs and control characters would move the caret or the terminal: shown as one blank each.
std::string shown(std::string_view line) {
  std::string result(line);
  for (char& c : result) {
    if (static_cast<unsigned char>(c) < 0x20 || c == 0x7f) c = ' ';
  }
  return result;
}

// Of longer lines a stretch round the caret is shown [characters].
constexpr int widest = 120;

// Bytes of the first `characters` of UTF-8 text.
std::size_t bytes_of(std::string_view line, int characters) {
  std::size_t i = 0;
  for (; i < line.size(); ++i) {
    const bool begins = (static_cast<unsigned char>(line[i]) & 0xC0) != 0x80;
    if (begins && characters-- == 0) break;
  }
  return i;
}

std::string_view cut(std::string_view line, int first, int count) {
  const std::size_t begin = bytes_of(line, first);
  return line.substr(begin, bytes_of(line.substr(begin), count));
}

std::string excerpt(const Place& place, const std::vector<std::string_view>& lines) {
  std::string result;
  const int last = static_cast<int>(lines.size());
  const int first = place.column > widest ? place.column - widest / 2 : 0;
  for (int line = std::max(1, place.line - 1); line <= std::min(last, place.line + 1); ++line) {
    const std::string_view text = lines[static_cast<std::size_t>(line - 1)];
    if (line != place.line && text.empty()) continue;
    result += fmt::format("{:>5} | {}\n", line, shown(cut(text, first, widest)));
    if (line != place.line) continue;
    const int length = std::min(place.length, widest / 2);
    result +=
        fmt::format("      | {}^{}\n", std::string(std::max(0, place.column - 1 - first), ' '),
                    std::string(std::max(0, length - 1), '~'));
  }
  return result;
}

std::string_view flag_of(const Place& place, const Source& source) {
  const auto index = static_cast<std::size_t>(place.line - 1);
  return index < source.line_flags.size() ? std::string_view(source.line_flags[index]) : "";
}

std::string render_flags(const Diagnostic& diagnostic, const Source& source) {
  const std::string_view flag = flag_of(diagnostic.place, source);
  std::string result =
      fmt::format("{}: error: {}\n", flag.empty() ? "flags" : flag, diagnostic.message);
  if (diagnostic.other) {
    result +=
        fmt::format("{}: note: {}\n", flag_of(*diagnostic.other, source), diagnostic.other_note);
  }
  if (!diagnostic.hint.empty()) result += fmt::format("  hint: {}\n", diagnostic.hint);
  return result;
}

std::string render_all(const std::vector<Diagnostic>& diagnostics, const Source& source) {
  std::string result;
  const std::size_t shown_count = std::min(diagnostics.size(), CaseErrors::shown_at_most);
  for (std::size_t i = 0; i < shown_count; ++i) result += render(diagnostics[i], source);
  if (diagnostics.size() > shown_count) {
    result += fmt::format("{}: {} more errors are not shown\n", source.name,
                          diagnostics.size() - shown_count);
  }
  return result;
}

std::vector<Diagnostic> sorted(std::vector<Diagnostic> diagnostics) {
  std::stable_sort(diagnostics.begin(), diagnostics.end(), [](const auto& a, const auto& b) {
    return std::tie(a.place.line, a.place.column) < std::tie(b.place.line, b.place.column);
  });
  return diagnostics;
}

}  // namespace

std::string render(const Diagnostic& diagnostic, const Source& source) {
  if (!source.line_flags.empty()) return render_flags(diagnostic, source);
  const auto lines = lines_of(source.text);
  const Place& place = diagnostic.place;
  std::string result = fmt::format("{}:{}:{}: error: {}\n", source.name, place.line, place.column,
                                   diagnostic.message);
  result += excerpt(place, lines);
  if (diagnostic.other) {
    result += fmt::format("{}:{}:{}: note: {}\n", source.name, diagnostic.other->line,
                          diagnostic.other->column, diagnostic.other_note);
    result += excerpt(*diagnostic.other, lines);
  }
  if (!diagnostic.hint.empty()) result += fmt::format("  hint: {}\n", diagnostic.hint);
  return result;
}

CaseErrors::CaseErrors(std::vector<Diagnostic> diagnostics, const Source& source)
    : std::runtime_error(render_all(sorted(diagnostics), source)),
      diagnostics_(sorted(std::move(diagnostics))) {}

}  // namespace ringwright::cases
