// Adds the place of a request to the errors that it leads to.
#pragma once

#include <string>

#include "core/error.hpp"

namespace irrepwise {

/// @param place   "job.yaml:4:7"; empty where none is known
/// @returns       what the action returns
/// @throws Error  that of the action, with the place before it
template <typename Action>
auto at_place(const std::string& place, Action action) {
  try {
    return action();
  } catch (const Error& error) {
    if (place.empty()) throw;
    throw error_at(place, error);
  }
}

}  // namespace irrepwise
