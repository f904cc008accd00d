// Words and labels as HTML.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

/// Plain words, safe between tags and inside quoted attributes: & < > " ' are escaped, control
/// characters, which HTML forbids, replaced.
[[nodiscard]] std::string html_text(std::string_view text);

/// Plain words between tags, names of orbitals among them typeset: "5d<sub>x²−y²</sub>".
[[nodiscard]] std::string html_words(std::string_view words);

/// @param ascii  "2e1g", "A1\"", "Sigmag+"
/// @returns      "2<i>e</i><sub>1g</sub>": number upright, letter in italics, the rest below or
/// above
[[nodiscard]] std::string html_label(const std::string& ascii);

}  // namespace irrepwise
