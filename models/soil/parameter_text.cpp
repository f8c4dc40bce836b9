#include "models/soil/parameter_text.hpp"

#include <array>
#include <charconv>

namespace ringwright::models {

std::string parameter_text(double value) {
  std::array<char, 32> text{};
  const auto result = std::to_chars(text.data(), text.data() + text.size(), value);
  return {text.data(), result.ptr};
}

}  // namespace ringwright::models
