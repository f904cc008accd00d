// Deterministic mutations of text: what typing errors, cut files and malice make of an input.
#pragma once

#include <random>
#include <string>
#include <vector>

/// @param seeds  well-formed inputs, at least one; the mutant starts from one of them
[[nodiscard]] std::string mutant(const std::vector<std::string>& seeds, std::mt19937_64& random);
