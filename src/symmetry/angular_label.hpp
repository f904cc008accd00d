// Labels of the irreps of linear molecules and single atoms for any angular momentum.
#pragma once

#include <string>
#include <string_view>

#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// One irrep of Cinfv, Dinfh (m = |m|) or Kh (m = l).
struct AngularIrrep {
  int m = 0;
  int reflection = 1;  // under sigma-v, for m = 0 of linear molecules: +1 or -1
  int inversion = 0;   // +1 g, -1 u, 0 where the group has no inversion

  friend bool operator==(const AngularIrrep&, const AngularIrrep&) = default;
};

/// "Sigmag+", "Pi", "Eta" (m = 5), "Lambdau" (m = 8), from m = 9 on our own "m9u"; Kh: "Sg", "Pu",
/// and so on through D F G H I K L M N O Q R T U V, then "l17u".
[[nodiscard]] std::string angular_label(Family family, const AngularIrrep& irrep);

/// @param text     any case; without a sign sigma means sigma+; in Kh without g or u the parity of
/// an
///                 orbital of that l is meant
/// @throws Error   with what is expected
[[nodiscard]] AngularIrrep parse_angular_label(const Schoenflies& group, std::string_view text);

/// What people write, in ASCII: greek letters by name, primes as ' and ", subscripts and
/// superscript signs as they are, superscript digits as powers: "πu²" -> "piu^2".
[[nodiscard]] std::string ascii_label(std::string_view text);

}  // namespace irrepwise
