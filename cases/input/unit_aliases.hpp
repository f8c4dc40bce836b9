#pragma once
/// Units as crews write them, put into the words of the units library.

#include <string>
#include <string_view>
#include <vector>

namespace ringwright::cases {

/// The unit text with aliases replaced: "gal" is the US gallon, "gpm" US gallons per minute,
/// `"` inches, `'` feet, "per" and "hrs" as one says them.
/// @throws ValueError for bare C or F (temperature needs degC or degF), "pF", for characters no
///         unit has and for a number inside the unit
std::string without_aliases(std::string_view unit);

/// Units to suggest when one is not known.
std::vector<std::string> usual_units();

}  // namespace ringwright::cases
