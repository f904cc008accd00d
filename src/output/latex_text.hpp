// Words and labels as LaTeX.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

/// Plain words as LaTeX: its special characters escaped, the letters and signs beyond ASCII that we
/// use ourselves written as commands, a prime behind a symbol ("C2'") as one, other UTF-8 as it is.
[[nodiscard]] std::string latex_text(std::string_view text);

/// As `latex_text`, with names of orbitals typeset: "$5\mathrm{d}_{x^2-y^2}$".
[[nodiscard]] std::string latex_words(std::string_view words);

/// @param ascii  "2e1g", "E1\"", "Sigmag+"
/// @returns      "$2e_{1g}$", "$E_{1}''$", "$\Sigma_{g}^{+}$"
[[nodiscard]] std::string latex_label(const std::string& ascii);

}  // namespace irrepwise
