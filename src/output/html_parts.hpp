// Parts of a report as HTML, for documents and pages.
#pragma once

#include <string>
#include <vector>

#include "output/report.hpp"

namespace irrepwise {

/// A list of definitions, or nothing where there are no facts.
[[nodiscard]] std::string facts_html(const std::vector<Fact>& facts);

/// A section of their own, or nothing.
[[nodiscard]] std::string warnings_html(const std::vector<std::string>& warnings);

/// A paragraph each.
[[nodiscard]] std::string remarks_html(const std::vector<std::string>& remarks);

}  // namespace irrepwise
