// Schoenflies symbols of the molecular point groups.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

enum class Family {
  C1,
  Ci,
  Cs,
  Cn,
  Cnv,
  Cnh,
  Dn,
  Dnh,
  Dnd,
  S2n,
  T,
  Td,
  Th,
  O,
  Oh,
  I,
  Ih,
  Cinfv,
  Dinfh,
  Kh
};

/// A group by family and n. For S2n, n is half the order of the axis: S4 has n = 2.
struct Schoenflies {
  Family family = Family::C1;
  int n = 1;

  static constexpr int max_n = 120;  // far beyond any molecule; keeps tables in bounds

  /// @returns  "D4h", "S4", "Cinfv", "Kh"
  [[nodiscard]] std::string name() const;

  [[nodiscard]] bool is_finite() const;

  friend bool operator==(const Schoenflies&, const Schoenflies&) = default;
};

/// @param text    "D4h", "d4h", "S4", "Cinfv", "C∞v"; C2h and the like for any n up to max_n. C1v
/// and
///                C1h mean Cs, S2 means Ci, D1 means C2, D1h C2v, D1d C2h, C1 and S1 as usual
/// @throws Error  with the nearest known symbol
[[nodiscard]] Schoenflies parse_schoenflies(std::string_view text);

}  // namespace irrepwise
