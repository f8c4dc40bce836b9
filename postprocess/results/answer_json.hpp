#pragma once
#include <nlohmann/json.hpp>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::postprocess {

/// The whole answer but for the fields, nothing rounded. A figure is {"value", "error", "unit"}, a
/// number without an error estimate {"value", "unit"}; a count, a mark or a text stands bare. Units
/// are SI, "1" without dimension.
/// A Kfs is given at test temperature and at 20 degC.
nlohmann::json to_json(const Answer& answer);

/// The document of `answer.json` and of the command line: format, version, answer, provenance.
nlohmann::json answer_document(const Answer& answer, const Provenance& provenance);

}  // namespace ringwright::postprocess
