#pragma once
#include <nlohmann/json.hpp>
#include <span>
#include <string>

#include "models/soil/catalogue.hpp"

namespace ringwright::cases {

/// Published soils as a table, the tables of a class one below the other, with the capillary
/// length each yields for the default minimum capillary height and for none; sources at the end.
std::string soils_text(std::span<const models::PublishedSoil> soils);

/// The same, not rounded, in SI.
nlohmann::json soils_json(std::span<const models::PublishedSoil> soils);

}  // namespace ringwright::cases
