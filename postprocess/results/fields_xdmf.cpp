#include "postprocess/results/fields_xdmf.hpp"

#include <fmt/format.h>

#include <string_view>

#include "postprocess/results/field_group.hpp"

namespace ringwright::postprocess {
namespace {

std::string escaped(std::string_view text) {
  std::string safe;
  for (const char c : text) {
    if (c == '&') {
      safe += "&amp;";
    } else if (c == '<') {
      safe += "&lt;";
    } else {
      safe += c;
    }
  }
  return safe;
}

std::string data_item(std::string_view type, std::string_view extent, int bytes,
                      const std::string& place) {
  return fmt::format(
      R"(<DataItem Format="HDF" NumberType="{}" Precision="{}" Dimensions="{}">{}</DataItem>)",
      type, bytes, extent, escaped(place));
}

std::string attribute(const std::string& field, std::string_view unit, std::size_t snapshot,
                      std::size_t cells, const std::string& fields) {
  return fmt::format(
      "        <Attribute Name=\"{}\" AttributeType=\"Scalar\" Center=\"Cell\">\n"
      "          <Information Name=\"units\" Value=\"{}\"/>\n"
      "          {}\n"
      "        </Attribute>\n",
      field, unit,
      data_item("Float", std::to_string(cells), 8, fields + ":" + snapshot_name(field, snapshot)));
}

// The same in every grid; whole numbers.
std::string soil_attribute(std::size_t cells, const std::string& fields) {
  return fmt::format(
      "        <Attribute Name=\"soil\" AttributeType=\"Scalar\" Center=\"Cell\">\n"
      "          <Information Name=\"units\" Value=\"1\"/>\n"
      "          {}\n"
      "        </Attribute>\n",
      data_item("Int", std::to_string(cells), 4, fields + ":/fields/soil"));
}

std::string mesh(const solver::Drawing& drawing, const std::string& fields) {
  const auto cells = drawing.cells.size();
  return fmt::format(
      "        <Topology TopologyType=\"Quadrilateral\" NumberOfElements=\"{}\">\n"
      "          {}\n"
      "        </Topology>\n"
      "        <Geometry GeometryType=\"XY\">\n"
      "          {}\n"
      "        </Geometry>\n",
      cells, data_item("Int", fmt::format("{} 4", cells), 4, fields + ":/fields/cells"),
      data_item("Float", fmt::format("{} 2", drawing.points.size()), 8,
                fields + ":/fields/points"));
}

std::string grid(const solver::TestRun& run, std::size_t snapshot, const std::string& fields) {
  const auto cells = run.drawing.cells.size();
  return fmt::format(
      "      <Grid Name=\"ground\" GridType=\"Uniform\">\n"
      "        <Time Value=\"{}\"/>\n"
      "{}{}{}{}"
      "      </Grid>\n",
      run.snapshots[snapshot].time, mesh(run.drawing, fields),
      attribute("head", "m", snapshot, cells, fields),
      attribute("water_content", "1", snapshot, cells, fields), soil_attribute(cells, fields));
}

}  // namespace

std::string fields_xdmf(const solver::TestRun& run, const std::string& fields) {
  std::string grids;
  for (std::size_t i = 0; i < run.snapshots.size(); ++i) grids += grid(run, i, fields);
  return "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"
         "<Xdmf Version=\"3.0\">\n"
         "  <Domain>\n"
         "    <Grid Name=\"test\" GridType=\"Collection\" CollectionType=\"Temporal\">\n" +
         grids +
         "    </Grid>\n"
         "  </Domain>\n"
         "</Xdmf>\n";
}

}  // namespace ringwright::postprocess
