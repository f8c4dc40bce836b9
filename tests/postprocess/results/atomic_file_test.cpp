#include "postprocess/results/atomic_file.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "tests/postprocess/results/file_size_limit.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

TEST_CASE("a file is written whole and replaces an older one") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  write_atomically(path, "older and longer\n");
  write_atomically(path, std::string("new\0er\n", 7));
  CHECK(content_of(path) == std::string("new\0er\n", 7));
  CHECK(folder.entries() == 1);
}

TEST_CASE("a part without a name goes away") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  {
    const PartFile part(path, "text");
    CHECK(content_of(folder.path() / "record.csv.part") == "text");
    CHECK_FALSE(std::filesystem::exists(path));
  }
  CHECK(folder.entries() == 0);
}

TEST_CASE("a stale part is replaced") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  std::ofstream(folder.path() / "record.csv.part") << "left by a power cut, and longer";
  write_atomically(path, "text");
  CHECK(content_of(path) == "text");
  CHECK(folder.entries() == 1);
}

TEST_CASE("a missing folder is an error that names file and cause") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "nowhere" / "record.csv";
  try {
    write_atomically(path, "text");
    FAIL("no error");
  } catch (const ResultFileError& error) {
    CHECK(error.path() == path);
    CHECK(error.cause() == "No such file or directory");
    CHECK(std::string(error.what()) ==
          "cannot write " + path.string() + ": No such file or directory");
  }
  CHECK(folder.entries() == 0);
}

TEST_CASE("a file in place of a folder is an error") {
  const TemporaryFolder folder;
  std::ofstream(folder.path() / "out") << "a file";
  CHECK_THROWS_AS(write_atomically(folder.path() / "out" / "record.csv", "text"), ResultFileError);
  CHECK(content_of(folder.path() / "out") == "a file");
  CHECK(folder.entries() == 1);
}

TEST_CASE("a folder in place of the file is an error and stays") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  std::filesystem::create_directory(path);
  CHECK_THROWS_AS(write_atomically(path, "text"), ResultFileError);
  CHECK(folder.entries() == 1);
}

TEST_CASE("a name that cannot be taken removes the part") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  {
    PartFile part(path, "text");
    std::filesystem::create_directory(path);
    CHECK_THROWS_AS(part.commit(), ResultFileError);
  }
  CHECK(folder.entries() == 1);
}

TEST_CASE("a disk that fills up leaves the older file and no part") {
  const TemporaryFolder folder;
  const auto path = folder.path() / "record.csv";
  write_atomically(path, "older");
  {
    const FileSizeLimit limit(4096);
    CHECK_THROWS_AS(write_atomically(path, std::string(10000, 'x')), ResultFileError);
  }
  CHECK(content_of(path) == "older");
  CHECK(folder.entries() == 1);
}
