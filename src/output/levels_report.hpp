// The report of `levels` for people.
#pragma once

#include <optional>

#include "output/levels_result.hpp"
#include "output/report.hpp"

namespace irrepwise {

/// Whether the caption says how to see the levels left out, which only whoever types commands
/// needs.
enum class LevelsHint { NameAllOption, None };

/// Which levels to show. By default those around the frontier, with the whole d block of every
/// metal.
struct LevelWindow {
  bool all = false;
  std::optional<double> from_ev = {};  // either turns the default window off
  std::optional<double> to_ev = {};
  LevelsHint hint = LevelsHint::None;
};

/// Levels from high to low with the frontier marked; charges, gross populations and the overlap
/// populations of bonds, equivalent ones once (with `all`: every atom and every pair of atoms).
///
/// @throws Error  where no level lies in the range asked for: names the lowest and the highest
[[nodiscard]] Report levels_report(const LevelsResult& result, const LevelWindow& window = {});

}  // namespace irrepwise
