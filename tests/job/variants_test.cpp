#include "job/variants.hpp"

#include <cstdio>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

namespace {

// A job file in a folder of its own, gone at the end.
class JobFile {
 public:
  explicit JobFile(const std::string& text)
      : path_(std::filesystem::temp_directory_path() / "irrepwise_variants_test.yaml") {
    std::ofstream(path_) << text;
  }
  JobFile(const JobFile&) = delete;
  JobFile& operator=(const JobFile&) = delete;
  ~JobFile() { std::filesystem::remove(path_); }
  [[nodiscard]] std::string path() const { return path_.string(); }

 private:
  std::filesystem::path path_;
};

const char* const platform =
    "build:\n"
    "  metal: Pt\n"
    "  polyhedron: SP-4\n"
    "  oxidation: 2\n"
    "  ligands: [{ligand: Cl, vertices: [1, 2, 3, 4]}]\n"
    "overrides: [{element: Cl, shell: 3p, h_ii: -14.0}]\n"
    "k: 1.8\n";

}  // namespace

TEST_CASE("a variant is the job with its own words in place of the job's") {
  const JobFile file(std::string(platform) +
                     "variants:\n"
                     "  - name: as it is\n"
                     "  - name: bromide\n"
                     "    replace: {ligands: [{ligand: Br, vertices: 1}]}\n"
                     "    overrides: [{element: Br, shell: 4p, h_ii: -13.5}]\n"
                     "  - name: ammonia\n"
                     "    replace: {metal: Pd, ligands: [{ligand: NH3, vertices: [1, 2, 3, 4]}]}\n"
                     "    rule: geometric-mean\n");
  const std::vector<VariantJob> variants = variant_jobs(file.path());
  REQUIRE(variants.size() == 3);
  CHECK(variants[1].name == "bromide");
  const Job first = variants[0].read();
  CHECK(hill_formula(first.molecule) == "Cl4Pt");
  CHECK(first.molecule.charge() == -2);
  CHECK(first.hueckel.k == 1.8);
  CHECK(first.overrides.size() == 1);
  const Job bromide = variants[1].read();
  CHECK(hill_formula(bromide.molecule) == "BrCl3Pt");
  CHECK(bromide.overrides.size() == 2);
  const Job ammonia = variants[2].read();
  CHECK(hill_formula(ammonia.molecule) == "H12N4Pd");
  CHECK(ammonia.molecule.charge() == 2);  // the oxidation state stays
  CHECK(ammonia.overrides.empty());       // there is no chlorine left
  CHECK(ammonia.hueckel.rule == Rule::GeometricMean);
  CHECK_FALSE(ammonia.hueckel.k.has_value());  // the job's K was meant for its own rule
}

TEST_CASE("a file without variants is one entry by its own name") {
  const std::vector<VariantJob> one = variant_jobs(source_path("inputs/square_ptcl4.xyz"));
  REQUIRE(one.size() == 1);
  CHECK(one[0].name == "square_ptcl4");
  CHECK(one[0].read().molecule.size() == 5);
}

TEST_CASE("what cannot be a variant is refused with its place") {
  const auto message = [](const std::string& variants) {
    const JobFile file(std::string(platform) + "variants:\n" + variants);
    try {
      for (const VariantJob& variant : variant_jobs(file.path())) {
        static_cast<void>(variant.read());
      }
    } catch (const Error& error) {
      const std::string text = error.what();
      return text.substr(text.find("test.yaml"));
    }
    return std::string("no error");
  };
  CHECK(message("  - {name: a}\n  - {name: a}\n")
            .starts_with("test.yaml:10:12: the name 'a' is used"));
  CHECK(message("  - {rule: weighted}\n").find("name") != std::string::npos);
  CHECK(message("  - {name: a, replac: {}}\n").find("'replace'") != std::string::npos);
  CHECK(message("  - {name: a, geometry: {atoms: [[H, 0, 0, 0]]}, replace: {metal: Pd}}\n")
            .find("`replace` changes what `build` makes") != std::string::npos);
  CHECK(message("  - {name: a, replace: {ligands: [{ligand: NH4, vertices: 1}]}}\n")
            .starts_with("test.yaml:9:"));
  CHECK(message("  []\n").find("found no variant") != std::string::npos);
}
