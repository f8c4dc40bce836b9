#pragma once
#include <string>
#include <string_view>

namespace ringwright::postprocess {

/// SHA-256 of the bytes of a text, 64 lower-case hexadecimal digits.
/// @throws std::runtime_error when the cryptography library refuses
/// @source FIPS 180-4 (2015), Secure Hash Standard
/// @checked tests/postprocess/results/sha256_test.cpp
std::string sha256(std::string_view text);

}  // namespace ringwright::postprocess
