#include "postprocess/results/fields_file.hpp"

#include "postprocess/results/field_group.hpp"
#include "postprocess/results/h5_write.hpp"
#include "postprocess/results/memory_file.hpp"
#include "postprocess/results/protocol_groups.hpp"
#include "postprocess/results/provenance_group.hpp"
#include "postprocess/results/table_groups.hpp"

namespace ringwright::postprocess {

std::string fields_file(const Answer& answer, const Provenance& provenance) {
  MemoryFile file;
  write_attribute(file.id(), "format", "ringwright-fields");
  write_attribute(file.id(), "format_version", std::int64_t{1});
  write_attribute(file.id(), "title", "One virtual ring infiltration test");
  write_attribute(file.id(), "source", "Ringwright " + provenance.program_version);
  write_attribute(file.id(), "case_sha256", provenance.case_sha256);
  write_field_group(file.id(), answer.run, answer.question.setup);
  write_totals_group(file.id(), answer.run.samples);
  write_record_group(file.id(), answer);
  write_ladder_group(file.id(), answer.ladder);
  write_figures_group(file.id(), answer);
  write_protocol_groups(file.id(), answer);
  write_provenance_group(file.id(), provenance);
  return file.close();
}

}  // namespace ringwright::postprocess
