#include "postprocess/results/sha256.hpp"

#include <catch2/catch.hpp>

using ringwright::postprocess::sha256;

// NIST, Example algorithms for FIPS 180-4, SHA-256: one-block and two-block message.
TEST_CASE("SHA-256 of the standard's examples") {
  CHECK(sha256("abc") == "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
  CHECK(sha256("abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq") ==
        "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1");
}

TEST_CASE("SHA-256 covers every byte, zeros included") {
  using namespace std::string_literals;
  CHECK(sha256("a\0b"s) != sha256("a\0c"s));
  CHECK(sha256("case\n") != sha256("case\r\n"));
}
