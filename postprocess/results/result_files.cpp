#include "postprocess/results/result_files.hpp"

#include <string>
#include <system_error>

#include "postprocess/results/answer_json.hpp"
#include "postprocess/results/fields_file.hpp"
#include "postprocess/results/fields_xdmf.hpp"
#include "postprocess/results/h5_call.hpp"
#include "postprocess/results/json_text.hpp"
#include "postprocess/results/record_csv.hpp"

namespace ringwright::postprocess {
namespace {

/// A folder that goes away again, if it was made here, when nothing was put into it.
class OutputFolder {
 public:
  explicit OutputFolder(const std::filesystem::path& folder) : folder_(folder) {
    std::error_code error;
    made_ = std::filesystem::create_directory(folder, error);
    if (error) throw ResultFileError(folder, error.message());
  }
  OutputFolder(const OutputFolder&) = delete;
  OutputFolder& operator=(const OutputFolder&) = delete;
  ~OutputFolder() {
    std::error_code not_empty;
    if (made_) std::filesystem::remove(folder_, not_empty);
  }

 private:
  std::filesystem::path folder_;
  bool made_ = false;
};

std::string fields_or_error(const std::filesystem::path& path, const Answer& answer,
                            const Provenance& provenance) {
  try {
    return fields_file(answer, provenance);
  } catch (const Hdf5Error& error) {
    throw ResultFileError(path, error.what());
  }
}

}  // namespace

ResultFiles write_results(const std::filesystem::path& folder, const Answer& answer,
                          const Provenance& provenance) {
  ResultFiles files = {folder / "fields.h5", folder / "fields.xdmf", folder / "record.csv",
                       folder / "answer.json"};
  const std::string fields = fields_or_error(files.fields, answer, provenance);
  const OutputFolder output(folder);
  PartFile parts[] = {{files.fields, fields},
                      {files.picture, fields_xdmf(answer.run, files.fields.filename().string())},
                      {files.record, record_csv(answer)},
                      {files.answer, json_text(answer_document(answer, provenance))}};
  for (auto& part : parts) part.commit();
  return files;
}

}  // namespace ringwright::postprocess
