#pragma once
/// The first screen of `simulate`: the answer in words and one table, what was assumed, and how
/// far to trust it.
///
/// One page that is read from the top and may be left at any line: the headline first, the stop
/// ladder, the readings of the stop, what was wetted and what the supply must give, what was
/// assumed, the doubt. Numbers have the digits that mean something; files carry all of them. A
/// numerical error is only ever told in a line that begins with the doubt about soil and site,
/// because that is the larger one.

#include <filesystem>
#include <span>
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// The screen of one answered test; a pure function of its arguments.
/// @param files written for it, as shown; may be empty
/// @checked tests/cases/simulate/first_screen_test.cpp, word for word
std::string first_screen(const Case& what, const AnsweredTest& answered,
                         std::span<const std::filesystem::path> files = {});

}  // namespace ringwright::cases
