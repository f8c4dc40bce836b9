#include "postprocess/results/fields_file.hpp"

#include <catch2/catch.hpp>
#include <set>

#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/field_group.hpp"
#include "tests/postprocess/results/h5_reader.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

namespace {

/// A result file on the disk, as another program would find it.
class WrittenFile {
 public:
  explicit WrittenFile(const Answer& answer) : path_(folder_.path() / "fields.h5") {
    write_atomically(path_, fields_file(answer, synthetic_provenance()));
  }
  const std::filesystem::path& path() const { return path_; }

 private:
  TemporaryFolder folder_;
  std::filesystem::path path_;
};

using Names = std::vector<std::string>;
using Extents = std::vector<hsize_t>;

/// Name of the scale attached to each dimension of a dataset.
Names scales_of(const H5Reader& reader, const std::string& name) {
  const auto dataset = reader.object(name);
  Names found;
  const auto keep = [](hid_t, unsigned, hid_t scale, void* data) -> herr_t {
    char text[256] = {};
    H5Iget_name(scale, text, sizeof text);
    static_cast<Names*>(data)->push_back(text);
    return 0;
  };
  for (unsigned i = 0; i < reader.extent(name).size(); ++i) {
    H5DSiterate_scales(dataset.id(), i, nullptr, keep, &found);
  }
  return found;
}

bool is_scale(const H5Reader& reader, const std::string& name) {
  return H5DSis_scale(reader.object(name).id()) > 0;
}

}  // namespace

TEST_CASE("the root says what the file is") {
  const WrittenFile file(synthetic_answer());
  const H5Reader reader(file.path());
  CHECK(reader.attribute("/", "format") == "ringwright-fields");
  CHECK(reader.number_attribute("/", "format_version") == 1);
  CHECK(reader.attribute("/", "source") == "Ringwright 0.1.0");
  CHECK(reader.created_order("/") == Names{"fields", "totals", "record", "ladder", "figures",
                                           "as_read", "stages", "pairs", "verdicts", "flags",
                                           "events", "water", "provenance"});
}

TEST_CASE("mesh and snapshots come back bit for bit") {
  const Answer answer = synthetic_answer();
  const WrittenFile file(answer);
  const H5Reader reader(file.path());
  const auto points = reader.doubles("/fields/points");
  CHECK(reader.extent("/fields/points") == Extents{12, 2});
  for (std::size_t i = 0; i < 12; ++i) {
    CHECK(points[2 * i] == answer.run.drawing.points[i][0]);
    CHECK(points[2 * i + 1] == answer.run.drawing.points[i][1]);
  }
  const auto cells = reader.ints("/fields/cells");
  CHECK(reader.extent("/fields/cells") == Extents{6, 4});
  for (std::size_t i = 0; i < 24; ++i) CHECK(cells[i] == answer.run.drawing.cells[i / 4][i % 4]);
  CHECK(reader.doubles("/fields/centre_z")[5] == answer.run.drawing.centres[5][1]);
  CHECK(reader.doubles("/fields/time") == std::vector<double>{600.0, 1200.0, 1800.0});
  for (std::size_t i = 0; i < 3; ++i) {
    CHECK(reader.doubles(snapshot_name("head", i)) == answer.run.snapshots[i].head);
    CHECK(reader.doubles(snapshot_name("water_content", i)) ==
          answer.run.snapshots[i].water_content);
  }
}

TEST_CASE("the stacked fields are virtual and equal the snapshots") {
  const WrittenFile file(synthetic_answer());
  const H5Reader reader(file.path());
  for (const std::string field : {"head", "water_content"}) {
    const std::string name = "/fields/" + field;
    const auto dataset = reader.object(name);
    const H5Handle list(H5Dget_create_plist(dataset.id()), H5Pclose);
    CHECK(H5Pget_layout(list.id()) == H5D_VIRTUAL);
    CHECK(reader.extent(name) == Extents{3, 6});
    std::vector<double> expected;
    for (std::size_t i = 0; i < 3; ++i) {
      for (const double value : reader.doubles(snapshot_name(field, i))) expected.push_back(value);
    }
    CHECK(reader.doubles(name) == expected);
    CHECK(reader.attribute(name, "coordinates") == "centre_r centre_z");
  }
}

TEST_CASE("every dataset has units and a long name") {
  const WrittenFile file(synthetic_answer());
  const H5Reader reader(file.path());
  const auto names = reader.names(H5O_TYPE_DATASET);
  CHECK(names.size() > 60);
  for (const auto& name : names) {
    INFO(name);
    CHECK_NOTHROW(reader.attribute(name, "units"));
    CHECK_FALSE(reader.attribute(name, "long_name").empty());
  }
  CHECK(reader.attribute("/fields/head", "units") == "m");
  CHECK(reader.attribute("/ladder/rate_error", "units") == "m/s");
}

TEST_CASE("every dimension has a scale in its own group or above") {
  const WrittenFile file(synthetic_answer());
  const H5Reader reader(file.path());
  for (const auto& name : reader.names(H5O_TYPE_DATASET)) {
    INFO(name);
    if (is_scale(reader, name)) continue;
    const auto scales = scales_of(reader, name);
    CHECK(scales.size() == reader.extent(name).size());
    for (const auto& scale : scales) {
      CHECK(name.starts_with(scale.substr(0, scale.rfind('/') + 1)));
    }
  }
  CHECK(scales_of(reader, "/fields/head") == Names{"/fields/time", "/fields/cell"});
  CHECK(scales_of(reader, "/fields/cells") == Names{"/fields/cell", "/fields/corner"});
  CHECK(scales_of(reader, "/ladder/rate") == Names{"/ladder/time"});
}

TEST_CASE("no object carries a time") {
  const WrittenFile file(synthetic_answer());
  const H5Reader reader(file.path());
  auto names = reader.names(H5O_TYPE_DATASET);
  for (const auto& group : reader.names(H5O_TYPE_GROUP)) names.push_back(group);
  names.push_back("/");
  for (const auto& name : names) {
    INFO(name);
    H5O_info_t info;
    REQUIRE(H5Oget_info_by_name2(reader.id(), name.c_str(), &info, H5O_INFO_TIME, H5P_DEFAULT) >=
            0);
    CHECK(info.ctime == 0);
  }
}

TEST_CASE("record, totals and ladder come back bit for bit") {
  const Answer answer = synthetic_answer();
  const WrittenFile file(answer);
  const H5Reader reader(file.path());
  for (std::size_t i = 0; i < 2; ++i) {
    CHECK(reader.doubles("/record/time")[i] == answer.record.readings[i].time);
    CHECK(reader.doubles("/record/volume")[i] == answer.record.readings[i].volume);
    CHECK(reader.doubles("/record/rate")[i] == answer.record.rate(i));
  }
  for (std::size_t i = 0; i < 3; ++i) {
    const auto& rung = answer.ladder[i];
    CHECK(reader.doubles("/totals/ring_volume")[i] == answer.run.samples[i].ring_volume);
    CHECK(reader.doubles("/totals/stored_volume")[i] == answer.run.samples[i].stored_volume);
    CHECK(reader.doubles("/ladder/rate")[i] == rung.rate.value);
    CHECK(reader.doubles("/ladder/rate_error")[i] == rung.rate.error);
    CHECK(reader.doubles("/ladder/reads_one_head")[i] == rung.reads.one_head.value);
    CHECK(reader.doubles("/ladder/supply_volume_error")[i] == rung.supply_volume.error);
  }
  CHECK(reader.ints("/ladder/stops_here") == std::vector<int>{0, 1, 0});
}

TEST_CASE("figures and provenance come back") {
  const Answer answer = synthetic_answer();
  const WrittenFile file(answer);
  const H5Reader reader(file.path());
  CHECK(reader.doubles("/figures/steady_rate")[0] == answer.steady_rate.value);
  CHECK(reader.doubles("/figures/steady_rate_error")[0] == answer.steady_rate.error);
  CHECK(reader.doubles("/figures/true_kfs")[0] == answer.question.setup.soil.Ks);
  CHECK(reader.ints("/figures/time_to_steady_beyond")[0] == 1);
  CHECK(reader.ints("/figures/interrupted")[0] == 0);
  const auto provenance = synthetic_provenance();
  CHECK(reader.text("/provenance/case_text") == provenance.case_text);
  CHECK(reader.text("/provenance/case_sha256") == provenance.case_sha256);
  CHECK(nlohmann::json::parse(reader.text("/provenance/resolved_case")) ==
        provenance.resolved_case);
  CHECK(reader.attribute("/provenance/libraries", "SUNDIALS") == "6.4.1");
  CHECK(reader.ints("/provenance/statistics/newton_iterations")[0] == 987);
  CHECK(reader.doubles("/provenance/tolerances/theta_tolerance")[0] == 1e-3);
}

TEST_CASE("an answer cut short before its first snapshot is still a valid file") {
  Answer answer = synthetic_answer();
  answer.run.snapshots.clear();
  answer.run.samples.clear();
  answer.record.readings.clear();
  answer.ladder.clear();
  answer.interrupted = true;
  const WrittenFile file(answer);
  const H5Reader reader(file.path());
  CHECK(reader.extent("/fields/head") == Extents{0, 6});
  CHECK(reader.extent("/record/volume") == Extents{0});
  CHECK(reader.ints("/figures/interrupted")[0] == 1);
}

TEST_CASE("a run without a drawing is still a valid file") {
  Answer answer = synthetic_answer();
  answer.run.drawing = {};
  answer.run.snapshots.clear();
  const WrittenFile file(answer);
  CHECK(H5Reader(file.path()).extent("/fields/cells") == Extents{0, 4});
}

TEST_CASE("a field that does not fit the mesh is refused") {
  Answer answer = synthetic_answer();
  answer.run.snapshots[1].head.pop_back();
  CHECK_THROWS_AS(fields_file(answer, synthetic_provenance()), std::logic_error);
  // ... and what was open is closed: the next file is as good as ever
  const WrittenFile file(synthetic_answer());
  CHECK(H5Reader(file.path()).extent("/fields/head") == Extents{3, 6});
}
