// The options that change a job: charge, method, symmetry. They win over what the job file says.
#pragma once

#include <optional>
#include <string>

#include <CLI/CLI.hpp>

#include "job/job.hpp"

namespace irrepwise::cli {

struct JobOptions {
  std::string file;
  std::string variant;  // of the job file; empty: the job as it is
  std::optional<int> charge;
  std::optional<int> multiplicity;
  std::string parameters;
  std::string rule;
  std::optional<double> k;
  std::optional<double> tolerance;
  std::string z;
  std::string x;
  std::string subgroup;
  std::string group;
  std::optional<double> limit;

  /// Whether any of them, file and variant aside, was given.
  [[nodiscard]] bool is_used() const;
};

enum class FileOption { Required, Optional, None };

void add_job_options(CLI::App& command, JobOptions& options,
                     FileOption file = FileOption::Required);

/// @returns  the file, and the variant where there is one: how messages call the job
[[nodiscard]] std::string job_place(const JobOptions& options);

/// Reads the file and applies the options.
/// @throws Error  as read_job; for an option, with its name as the place
[[nodiscard]] Job read_job_with(const JobOptions& options);

}  // namespace irrepwise::cli
