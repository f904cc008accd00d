// Variants of one job: what `variants:` says instead of the job itself.
#pragma once

#include <functional>
#include <string>
#include <vector>

#include "core/error.hpp"
#include "job/job.hpp"

namespace irrepwise {

/// One entry of a comparison. Reading it may take time (a complex is built), so that it waits until
/// it is called; it may be called from any thread.
struct VariantJob {
  std::string name;
  std::string place;          // "family.yaml:12:5", for messages
  std::function<Job()> read;  // throws Error as `read_job`
  // The error with the name of the variant behind its place, as `read` throws it.
  std::function<Error(const Error&)> named;
};

/// A job file with `variants:` gives one entry for each of them, in order; any other file is one
/// entry by the name of the file without folder and ending.
///
/// @throws Error  as `read_job`; for a variant without a name, or a name used twice
[[nodiscard]] std::vector<VariantJob> variant_jobs(const std::string& path);

/// @returns  whether the file is a job with `variants:`
/// @throws Error  for a job file that cannot be read
[[nodiscard]] bool has_variants(const std::string& path);

}  // namespace irrepwise
