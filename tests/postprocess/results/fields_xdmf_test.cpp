#include "postprocess/results/fields_xdmf.hpp"

#include <boost/property_tree/ptree.hpp>
#include <boost/property_tree/xml_parser.hpp>
#include <catch2/catch.hpp>
#include <sstream>

#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/fields_file.hpp"
#include "tests/postprocess/results/h5_reader.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;
using Tree = boost::property_tree::ptree;

namespace {

Tree parsed(const std::string& text) {
  std::istringstream stream(text);
  Tree tree;
  boost::property_tree::read_xml(stream, tree);
  return tree;
}

std::vector<Tree> children(const Tree& tree, const std::string& name) {
  std::vector<Tree> found;
  for (const auto& [key, child] : tree) {
    if (key == name) found.push_back(child);
  }
  return found;
}

std::vector<Tree> grids(const Tree& tree) {
  return children(tree.get_child("Xdmf.Domain.Grid"), "Grid");
}

void collect_data_items(const Tree& tree, std::vector<Tree>& found) {
  for (const auto& [key, child] : tree) {
    if (key == "DataItem") found.push_back(child);
    collect_data_items(child, found);
  }
}

}  // namespace

TEST_CASE("the time series has one grid of quads per snapshot") {
  const auto run = three_snapshots();
  const Tree tree = parsed(fields_xdmf(run, "fields.h5"));
  CHECK(tree.get<std::string>("Xdmf.Domain.Grid.<xmlattr>.CollectionType") == "Temporal");
  const auto found = grids(tree);
  REQUIRE(found.size() == 3);
  for (std::size_t i = 0; i < 3; ++i) {
    CHECK(found[i].get<double>("Time.<xmlattr>.Value") == run.snapshots[i].time);
    CHECK(found[i].get<std::string>("Topology.<xmlattr>.TopologyType") == "Quadrilateral");
    CHECK(found[i].get<int>("Topology.<xmlattr>.NumberOfElements") == 6);
    CHECK(found[i].get<std::string>("Geometry.<xmlattr>.GeometryType") == "XY");
    const auto attributes = children(found[i], "Attribute");
    REQUIRE(attributes.size() == 3);
    CHECK(attributes[0].get<std::string>("<xmlattr>.Name") == "head");
    CHECK(attributes[1].get<std::string>("<xmlattr>.Name") == "water_content");
    CHECK(attributes[2].get<std::string>("<xmlattr>.Name") == "soil");
    for (const auto& attribute : attributes) {
      CHECK(attribute.get<std::string>("<xmlattr>.Center") == "Cell");
    }
  }
}

TEST_CASE("every item points at a dataset of just that extent in the file beside it") {
  const TemporaryFolder folder;
  const Answer answer = synthetic_answer();
  write_atomically(folder.path() / "fields.h5", fields_file(answer, synthetic_provenance()));
  const H5Reader reader(folder.path() / "fields.h5");
  std::vector<Tree> items;
  collect_data_items(parsed(fields_xdmf(answer.run, "fields.h5")), items);
  REQUIRE(items.size() == 15);
  for (const auto& item : items) {
    const auto place = item.data();
    INFO(place);
    REQUIRE(place.starts_with("fields.h5:/"));
    std::ostringstream extent;
    for (const auto length : reader.extent(place.substr(place.find(':') + 1))) {
      extent << (extent.tellp() > 0 ? " " : "") << length;
    }
    CHECK(item.get<std::string>("<xmlattr>.Dimensions") == extent.str());
  }
}

TEST_CASE("a file name with signs of the markup stays one name") {
  std::vector<Tree> items;
  collect_data_items(parsed(fields_xdmf(three_snapshots(), "a<b&c.h5")), items);
  CHECK(items.at(0).data() == "a<b&c.h5:/fields/cells");
}

TEST_CASE("a run without snapshots is an empty series") {
  CHECK(grids(parsed(fields_xdmf({}, "fields.h5"))).empty());
}
