#include "postprocess/results/result_files.hpp"

#include <catch2/catch.hpp>
#include <nlohmann/json.hpp>
#include <thread>

#include "postprocess/results/fields_file.hpp"
#include "tests/postprocess/results/file_size_limit.hpp"
#include "tests/postprocess/results/h5_reader.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

namespace {

/// Contents of the four files of a folder, one after the other.
std::vector<std::string> contents(const ResultFiles& files) {
  return {content_of(files.fields), content_of(files.picture), content_of(files.record),
          content_of(files.answer)};
}

}  // namespace

TEST_CASE("one answer gives four files in a folder of its own") {
  const TemporaryFolder folder;
  const auto files =
      write_results(folder.path() / "out", synthetic_answer(), synthetic_provenance());
  CHECK(folder.entries() == 5);
  CHECK(files.fields == folder.path() / "out" / "fields.h5");
  CHECK(H5Reader(files.fields).attribute("/", "format") == "ringwright-fields");
  CHECK(content_of(files.picture).find(">fields.h5:/fields/snapshots/head_0002<") !=
        std::string::npos);
  CHECK(content_of(files.record).starts_with("time_h,"));
  const auto document = nlohmann::json::parse(content_of(files.answer));
  CHECK(document.at("format") == "ringwright-answer");
  CHECK(document.at("answer").contains("ladder"));
  CHECK(document.at("provenance").contains("case_sha256"));
}

TEST_CASE("the same answer gives the same bytes") {
  const TemporaryFolder folder;
  const auto first =
      write_results(folder.path() / "one", synthetic_answer(), synthetic_provenance());
  std::this_thread::sleep_for(std::chrono::milliseconds(1100));  // a stamp of seconds would show
  const auto second =
      write_results(folder.path() / "two", synthetic_answer(), synthetic_provenance());
  CHECK(contents(first) == contents(second));
}

TEST_CASE("files written side by side are the same as alone", "[threads]") {
  const std::string alone = fields_file(synthetic_answer(), synthetic_provenance());
  std::vector<std::string> together(4);
  std::vector<std::thread> threads;
  for (auto& text : together) {
    threads.emplace_back([&text] {
      for (int i = 0; i < 5; ++i) text = fields_file(synthetic_answer(), synthetic_provenance());
    });
  }
  for (auto& thread : threads) thread.join();
  for (const auto& text : together) CHECK(text == alone);
}

TEST_CASE("a folder that cannot be made leaves nothing behind") {
  const TemporaryFolder folder;
  const auto refused = [&](const std::filesystem::path& out) {
    CHECK_THROWS_AS(write_results(out, synthetic_answer(), synthetic_provenance()),
                    ResultFileError);
  };
  refused(folder.path() / "missing" / "out");
  CHECK(folder.entries() == 0);
  std::ofstream(folder.path() / "file") << "a file";
  refused(folder.path() / "file");
  refused(folder.path() / "file" / "out");
  CHECK(folder.entries() == 1);
  CHECK(content_of(folder.path() / "file") == "a file");
}

TEST_CASE("one file that cannot be written keeps the older set whole") {
  const TemporaryFolder folder;
  const auto files = write_results(folder.path(), synthetic_answer(), synthetic_provenance());
  const auto before = contents(files);
  Answer newer = synthetic_answer();
  newer.run.snapshots[0].head[0] = -9.0;
  {
    // The fields no longer fit.
    const FileSizeLimit limit(before[0].size() / 2);
    CHECK_THROWS_AS(write_results(folder.path(), newer, synthetic_provenance()), ResultFileError);
  }
  CHECK(contents(files) == before);
  CHECK(folder.entries() == 4);

  // The last of the four cannot be written.
  std::filesystem::create_directory(folder.path() / "answer.json.part");
  CHECK_THROWS_AS(write_results(folder.path(), newer, synthetic_provenance()), ResultFileError);
  CHECK(contents(files) == before);
  CHECK(folder.entries() == 5);
}

TEST_CASE("a new folder goes away when nothing could be written into it") {
  const TemporaryFolder folder;
  {
    const FileSizeLimit limit(100);
    CHECK_THROWS_AS(
        write_results(folder.path() / "out", synthetic_answer(), synthetic_provenance()),
        ResultFileError);
  }
  CHECK(folder.entries() == 0);
}
