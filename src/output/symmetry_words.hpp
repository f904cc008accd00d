// The words of symmetry as people read them: classes, functions, reductions, terms.
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "output/table.hpp"
#include "symmetry/functions.hpp"
#include "symmetry/reduction.hpp"
#include "symmetry/terms.hpp"

namespace irrepwise {

/// "3sigmad" -> "3σd", "2Cphi" -> "2C(φ)", "2C5^2" -> "2C5²"
[[nodiscard]] std::string readable_class(std::string_view symbol);

/// "x2-y2" -> "x²−y²", "(x, y)" as it is
[[nodiscard]] std::string readable_functions(const FunctionSet& set);

/// What orbitals span, with the labels of levels: "a1g + 2 × eg"; "nothing" where there is none.
[[nodiscard]] Words reduction_words(const Reduction& reduction);

/// Vibrations: "a1g, 2 × eg".
[[nodiscard]] Words mode_words(const Reduction& reduction);

/// The same with capital labels, as of states and of products: "A1g + 2Eg".
[[nodiscard]] Words state_words(const Reduction& reduction);

/// "³T1g", "2 ¹Eg" where it occurs twice; several with commas between them
[[nodiscard]] Words term_words(const std::vector<Term>& terms);

/// Digits as superscripts: "12" -> "¹²".
[[nodiscard]] std::string superscript(int number);

}  // namespace irrepwise
