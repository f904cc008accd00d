// Feeds mutated inputs to every reader; the same seed gives the same inputs.
//
//   irrepwise_fuzz --corpus SOURCE_FOLDER [--runs N] [--seed S]
#include <algorithm>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <iostream>
#include <random>
#include <sstream>
#include <string>
#include <vector>

#include "fuzz/mutate.hpp"
#include "fuzz/targets.hpp"

namespace {

// Short sets with every kind of line; the published one is too long to hit anything that matters.
const std::string small_set = R"(name: small
sources:
  somewhere: "a paper, from memory"
elements:
  H:
    valence_electrons: 1
    shells:
      - {shell: 1s, h_ii: -13.6, exponent: 1.3, source: somewhere, confidence: high}
  Fe:
    valence_electrons: 8
    shells:
      - {shell: 4s, h_ii: -9.1, exponent: 1.9, source: somewhere}
      - {shell: 4p, h_ii: -5.32, exponent: 1.9, source: in words}
      - shell: 3d
        h_ii: -12.6
        exponents: [5.35, 2.00]
        coefficients: [0.5505, 0.6260]
        source: somewhere
)";
const std::string extension = R"(extends: published
name: with another carbon
elements:
  C: {valence_electrons: 4, shells: [{shell: 2s, h_ii: -20, exponent: 1.6, source: x}]}
)";

std::string content(const std::filesystem::path& path) {
  std::ostringstream text;
  text << std::ifstream(path, std::ios::binary).rdbuf();
  return text.str();
}

std::vector<std::string> files(const std::filesystem::path& folder, const std::string& extension) {
  std::vector<std::filesystem::path> paths;
  for (const auto& entry : std::filesystem::directory_iterator(folder)) {
    if (entry.path().extension() == extension) paths.push_back(entry.path());
  }
  std::sort(paths.begin(), paths.end());  // the order of a folder differs from machine to machine
  std::vector<std::string> texts;
  for (const auto& path : paths) texts.push_back(content(path));
  return texts;
}

bool run(const char* name, Outcome (*target)(const std::string&),
         const std::vector<std::string>& seeds, long runs, unsigned long seed) {
  if (seeds.empty()) {
    std::cerr << name << ": no inputs to start from\n";
    return false;
  }
  std::mt19937_64 random(seed);
  long accepted = 0;
  for (long i = 0; i < runs; ++i) {
    const std::string text = mutant(seeds, random);
    // Written beforehand, so that it is there to look at after a crash.
    std::ofstream("fuzz_last_input", std::ios::binary | std::ios::trunc) << text;
    const Outcome outcome = target(text);
    if (!outcome.failure.empty()) {
      std::cerr << name << ", run " << i << ": " << outcome.failure << "\n--- input:\n"
                << text << "\n";
      return false;
    }
    accepted += outcome.accepted;
  }
  std::cout << name << ": " << runs << " inputs, " << accepted << " read, the rest refused\n";
  return accepted < runs;  // mutations that nothing notices would test nothing
}

}  // namespace

int main(int argc, char** argv) {
  std::filesystem::path corpus;
  long runs = 1000;
  unsigned long seed = 1;
  for (int i = 1; i + 1 < argc; i += 2) {
    const std::string option = argv[i];
    if (option == "--corpus") corpus = argv[i + 1];
    if (option == "--runs") runs = std::atol(argv[i + 1]);
    if (option == "--seed") seed = std::strtoul(argv[i + 1], nullptr, 10);
  }
  if (corpus.empty()) {
    std::cerr << "usage: irrepwise_fuzz --corpus SOURCE_FOLDER [--runs N] [--seed S]\n";
    return 2;
  }
  const std::vector<std::string> xyz = files(corpus / "inputs", ".xyz");
  const std::vector<std::string> jobs = files(corpus / "inputs", ".yaml");
  const bool well = run("xyz", fuzz_xyz, xyz, runs, seed) &&
                    run("job", fuzz_job, jobs, runs, seed) &&
                    run("parameters", fuzz_parameters, {small_set, extension}, runs, seed);
  return well ? 0 : 1;
}
