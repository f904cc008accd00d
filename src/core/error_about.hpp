// Errors that tell which word of a job is to blame, found where its place is not known.
#pragma once

#include <string>
#include <utility>

#include "core/error.hpp"

namespace irrepwise {

/// Carries the key of the job's value that is wrong ("multiplicity", "subgroup") up to whoever
/// knows where the user gave it. The message is complete without.
class ErrorAbout : public Error {
 public:
  ErrorAbout(std::string key, const std::string& message) : Error(message), key_(std::move(key)) {}

  [[nodiscard]] const std::string& key() const noexcept { return key_; }

 private:
  std::string key_;
};

/// @returns       what the action returns
/// @throws Error  as the action, about this key unless it says another
template <typename Action>
auto about(const char* key, Action action) {
  try {
    return action();
  } catch (const ErrorAbout&) {
    throw;
  } catch (const Error& error) {
    throw ErrorAbout(key, error.what());
  }
}

}  // namespace irrepwise
