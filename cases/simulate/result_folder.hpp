#pragma once
/// Where the files of a simulation go, and their writing.
///
/// At the top of the folder stand what concerns all tests: summary.txt (the first screens),
/// ladder.csv, case.yaml (the case as read), and stages.csv where a test has stages. The files of
/// one answer (record.csv, answer.json, fields.h5, fields.xdmf) stand beside them when there is one
/// answer only, else in a folder per test and per source of the soil, as far as there are several.

#include <filesystem>
#include <vector>

#include "cases/simulate/simulation.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::cases {

/// A name as part of a path: letters and digits in lower case, '-' for all else.
std::string path_word(std::string_view name);

/// The folder of one answer below the simulation's.
std::filesystem::path answer_folder(const Case& what, const Test& test, const SoilVariant& variant);

/// Versions of the libraries the results do not know of by themselves.
std::vector<postprocess::NamedVersion> own_libraries();

/// What a result carries about the case and the program.
postprocess::Origin origin_of(const Case& what);

/// Writes everything; each file is complete or not there.
/// @return the files of each test, those for all tests with the first
/// @throws postprocess::ResultFileError
std::vector<std::vector<std::filesystem::path>> write_result_folder(
    const std::filesystem::path& folder, const Simulation& simulation);

}  // namespace ringwright::cases
