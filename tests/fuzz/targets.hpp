// The readers under test: each takes any bytes, and either reads them or refuses them.
#pragma once

#include <string>

/// What came of one input.
struct Outcome {
  bool accepted = false;
  std::string failure;  // empty where all is well: not an Error, a message of nothing, a lost value
};

[[nodiscard]] Outcome fuzz_xyz(const std::string& text);
[[nodiscard]] Outcome fuzz_parameters(const std::string& text);

/// Writes the text into a file of the working directory, as jobs are read from files.
[[nodiscard]] Outcome fuzz_job(const std::string& text);
