// `--variant NAME`: one variant of a job, for commands that take a single molecule.
#pragma once

#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "job/job.hpp"
#include "output/report.hpp"

namespace irrepwise::cli {

void add_variant_option(CLI::App& command, std::string& name);

/// @param option   "--variant", the place of the error
/// @param names    those that there are, at least one
/// @returns        the index of the name
/// @throws Error   for a name that is not there, with the nearest and those that are
[[nodiscard]] int find_variant(const char* option, const std::vector<std::string>& names,
                               const std::string& name);

/// Several of them, as an option split them at commas, which names may hold as well.
///
/// @returns       their indices, in the order named
/// @throws Error  as `find_variant`; for one named twice
[[nodiscard]] std::vector<int> find_variants(const char* option,
                                             const std::vector<std::string>& names,
                                             const std::vector<std::string>& pieces);

/// @param variant  the name of a variant; empty: the job as it is
/// @throws Error   as `read_job`; for a file without variants, or without this one
[[nodiscard]] Job read_job_or_variant(const std::string& file, const std::string& variant);

/// @returns  "job.yaml", "job.yaml: variant 'carbonyl'": how messages call it
[[nodiscard]] std::string job_place(const std::string& file, const std::string& variant);

/// What to know of a job that has variants where it was taken as it is.
/// @returns  what follows "variant:"; empty where the job has none, or a variant was taken
[[nodiscard]] std::string words_on_variants(const std::string& file, const std::string& variant);

/// Puts these words under the report's facts.
void add_variants_fact(Report& report, const std::string& file, const std::string& variant);

}  // namespace irrepwise::cli
