#include "postprocess/results/provenance_group.hpp"

#include "postprocess/results/h5_write.hpp"
#include "postprocess/results/json_text.hpp"

namespace ringwright::postprocess {
namespace {

void put_versions(const H5Handle& group, const Provenance& provenance) {
  write_attribute(group.id(), "program_version", provenance.program_version);
  write_attribute(group.id(), "compiler", provenance.compiler);
  if (provenance.written_at) write_attribute(group.id(), "written_at", *provenance.written_at);
  const auto libraries = create_group(group.id(), "libraries");
  for (const auto& [name, version] : provenance.libraries) {
    write_attribute(libraries.id(), name, version);
  }
}

void put_mesh(hid_t parent, const MeshSizes& mesh) {
  const auto group = create_group(parent, "mesh");
  write_scalar(group.id(), "cells", std::int64_t{mesh.cells}, {"1", "number of cells"});
  write_scalar(group.id(), "points", std::int64_t{mesh.points}, {"1", "number of points"});
  write_scalar(group.id(), "domain_radius", mesh.domain_radius, {"m", "radius of the ground"});
  write_scalar(group.id(), "domain_depth", mesh.domain_depth, {"m", "depth of the ground"});
}

void put_tolerances(hid_t parent, const Provenance& provenance) {
  const auto group = create_group(parent, "tolerances");
  write_scalar(group.id(), "accuracy", provenance.accuracy, {"1", "relative accuracy asked for"});
  if (!provenance.resolution) return;
  const auto& resolution = *provenance.resolution;
  write_scalar(group.id(), "tip_cell", resolution.tip_cell,
               {"m", "edge of the cells at the foot of the wall, before splitting"});
  write_scalar(group.id(), "top_cell", resolution.top_cell,
               {"m", "height of the uppermost cells, before splitting"});
  write_scalar(group.id(), "growth", resolution.growth,
               {"1", "largest ratio of neighbouring cells, before splitting"});
  write_scalar(group.id(), "growth_down", resolution.growth_down,
               {"1", "the same downwards below the foot of the wall"});
  write_scalar(group.id(), "growth_inside", resolution.growth_inside,
               {"1", "the same between surface and foot of the wall"});
  write_scalar(group.id(), "splits", std::int64_t{resolution.splits},
               {"1", "times every cell was split in 2 x 2"});
  write_scalar(group.id(), "theta_tolerance", resolution.theta_tolerance,
               {"1", "absolute error of water content per time step"});
}

void put_statistics(hid_t parent, const Provenance& provenance) {
  const auto group = create_group(parent, "statistics");
  const auto& run = provenance.statistics;
  write_scalar(group.id(), "steps", std::int64_t{run.steps}, {"1", "time steps"});
  write_scalar(group.id(), "newton_iterations", std::int64_t{run.newton_iterations},
               {"1", "Newton iterations"});
  write_scalar(group.id(), "factorisations", std::int64_t{run.factorisations},
               {"1", "matrix factorisations"});
  write_scalar(group.id(), "convergence_failures", std::int64_t{run.convergence_failures},
               {"1", "time steps repeated because Newton did not converge"});
  write_scalar(group.id(), "domain_enlargements", std::int64_t{run.domain_enlargements},
               {"1", "runs repeated on a larger ground"});
  write_scalar(group.id(), "balance_error", run.balance_error,
               {"1", "water balance error over throughput"});
  write_scalar(group.id(), "total_steps", std::int64_t{provenance.total_steps},
               {"1", "time steps over all companion runs"});
}

}  // namespace

void write_provenance_group(hid_t file, const Provenance& provenance) {
  const auto group = create_group(file, "provenance");
  put_versions(group, provenance);
  write_text(group.id(), "case_text", provenance.case_text, "case as read");
  write_text(group.id(), "case_sha256", provenance.case_sha256, "SHA-256 of the case as read");
  write_text(group.id(), "resolved_case", json_text(provenance.resolved_case),
             "case in SI with every default, JSON");
  put_mesh(group.id(), provenance.mesh);
  put_tolerances(group.id(), provenance);
  put_statistics(group.id(), provenance);
}

}  // namespace ringwright::postprocess
