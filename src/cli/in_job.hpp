// Adds the place in the job to the errors of a computation.
#pragma once

#include <string>

#include "job/job.hpp"

namespace irrepwise::cli {

/// @param name    how messages call the job, for errors that are about none of its values
/// @returns       what the action returns
/// @throws Error  that of the action, with the place of what it is about
template <typename Action>
auto in_job(const Job& job, const std::string& name, Action action) {
  try {
    return action();
  } catch (const Error& error) {
    throw error_in(job, name, error);
  }
}

}  // namespace irrepwise::cli
