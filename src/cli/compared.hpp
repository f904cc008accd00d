// From files to variants computed, analysed and matched, for every command that lays them side by
// side.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "output/compare_result.hpp"

namespace irrepwise::cli {

struct Compared {
  Comparison comparison;
  std::vector<std::string> files_read;
};

/// Computes on several threads and counts the variants done on a terminal.
///
/// @param files      coordinates or jobs; a job with `variants:` stands for all of them
/// @param reference  the name of a variant; empty: the first
/// @param chosen     names of those wanted, in the order wanted; empty: all. The first of them is
/// the
///                   reference where none is named; one that is not among them comes first
/// @param threads      as many as there are cores where not given; changes no result
/// @throws Error     for two variants of one name, an unknown reference or choice, or as `computed`
[[nodiscard]] Compared compared(const std::vector<std::string>& files, const std::string& reference,
                                std::optional<int> threads = {},
                                const std::vector<std::string>& chosen = {});

/// @returns  of all variants, each with the variant's name in front
[[nodiscard]] std::vector<std::string> warnings_of(const Comparison& comparison);

}  // namespace irrepwise::cli
