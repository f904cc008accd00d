// Feeds mutated inputs to every reader; the same seed gives the same inputs.
//
//   irrepwise_fuzz --corpus SOURCE_FOLDER [--runs N] [--seed S] [--keep FILE]
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
const std::string other_set = R"(extends: published
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

struct Options {
  std::filesystem::path corpus;
  std::filesystem::path keep;  // where each input is written before it is read, for after a crash
  long runs = 1000;
  unsigned long seed = 1;
};

bool run(const char* name, Outcome (*target)(const std::string&),
         const std::vector<std::string>& seeds, const Options& options) {
  if (seeds.empty()) {
    std::cerr << name << ": no inputs to start from\n";
    return false;
  }
  std::mt19937_64 random(options.seed);
  long accepted = 0;
  for (long i = 0; i < options.runs; ++i) {
    const std::string text = mutant(seeds, random);
    if (!options.keep.empty())
      std::ofstream(options.keep, std::ios::binary | std::ios::trunc) << text;
    const Outcome outcome = target(text);
    if (!outcome.failure.empty()) {
      std::cerr << name << ", run " << i << ": " << outcome.failure << "\n--- input:\n"
                << text << "\n";
      return false;
    }
    accepted += outcome.accepted;
  }
  std::cout << name << ": " << options.runs << " inputs, " << accepted
            << " read, the rest refused\n";
  return accepted < options.runs;  // mutations that nothing notices would test nothing
}

}  // namespace

int main(int argc, char** argv) {
  Options options;
  for (int i = 1; i + 1 < argc; i += 2) {
    const std::string option = argv[i];
    if (option == "--corpus") options.corpus = argv[i + 1];
    if (option == "--keep") options.keep = argv[i + 1];
    if (option == "--runs") options.runs = std::atol(argv[i + 1]);
    if (option == "--seed") options.seed = std::strtoul(argv[i + 1], nullptr, 10);
  }
  if (options.corpus.empty()) {
    std::cerr
        << "usage: irrepwise_fuzz --corpus SOURCE_FOLDER [--runs N] [--seed S] [--keep FILE]\n";
    return 2;
  }
  const std::vector<std::string> xyz = files(options.corpus / "inputs", ".xyz");
  const std::vector<std::string> jobs = files(options.corpus / "inputs", ".yaml");
  const bool well = run("xyz", fuzz_xyz, xyz, options) && run("job", fuzz_job, jobs, options) &&
                    run("parameters", fuzz_parameters, {small_set, other_set}, options);
  return well ? 0 : 1;
}
