#include "job/variants.hpp"

#include <cmath>
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

TEST_CASE("each stands for all combinations of its metals and ligands") {
  const JobFile file(std::string(platform) +
                     "variants:\n"
                     "  - name: chloride\n"
                     "  - each: {ligands: [Br, {ligand: OH2, distance: 2.1}], vertices: [1, 3]}\n"
                     "  - name: \"{ligand} on {metal}\"\n"
                     "    each: {metals: [Pd, Ni], ligands: [Br, NH3], vertices: 1}\n"
                     "    k: 2\n"
                     "  - each: {metals: [Ni]}\n");
  const std::vector<VariantJob> variants = variant_jobs(file.path());
  std::vector<std::string> names, formulas;
  for (const VariantJob& variant : variants) {
    names.push_back(variant.name);
    formulas.push_back(hill_formula(variant.read().molecule));
  }
  CHECK(names == std::vector<std::string>{"chloride", "Br", "OH2", "Br on Pd", "NH3 on Pd",
                                          "Br on Ni", "NH3 on Ni", "Ni"});
  CHECK(formulas == std::vector<std::string>{"Cl4Pt", "Br2Cl2Pt", "Cl2H4O2Pt", "BrCl3Pd",
                                             "Cl3H3NPd", "BrCl3Ni", "Cl3H3NNi", "Cl4Ni"});
  CHECK(variants[2].read().built->ligands.back().distances_angstrom[0] == 2.1);
  CHECK(variants[3].read().hueckel.k == 2.0);
}

TEST_CASE("a variant may change the angle of the polyhedron, or the second of two centres") {
  const JobFile angular(
      "build: {metal: Hg, polyhedron: A-2, oxidation: 2, ligands: [Cl, Cl]}\n"
      "variants: [{name: bent, replace: {polyhedron: {symbol: A-2, angle: 100}}}]\n");
  const Molecule bent = variant_jobs(angular.path())[0].read().molecule;
  const Eigen::Matrix3Xd at = bent.positions();
  // The angle asked for: cos 100° = -0.17364818.
  CHECK(std::abs(at.col(1).normalized().dot(at.col(2).normalized()) + 0.17364818) < 1e-8);
  const JobFile two(
      "build:\n"
      "  centres:\n"
      "    - {metal: Pd, polyhedron: SP-4, oxidation: 2, ligands: [Cl, Cl]}\n"
      "    - {metal: Pd, polyhedron: SP-4, oxidation: 2, ligands: [Cl, Cl]}\n"
      "  bridges: [{ligand: Cl, vertices: [1, 1]}, {ligand: Cl, vertices: [2, 2]}]\n"
      "variants:\n"
      "  - {name: platinum, replace: {metal: Pt, centre: 2}}\n"
      "  - {name: none, replace: {metal: Pt, centre: 3}}\n");
  const std::vector<VariantJob> variants = variant_jobs(two.path());
  const Molecule mixed = variants[0].read().molecule;
  CHECK(mixed.atoms()[0].atomic_number == 46);
  CHECK(mixed.atoms()[1].atomic_number == 78);
  CHECK_THROWS_AS(static_cast<void>(variants[1].read()), Error);
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
  CHECK(message("  - {name: a, replace: {metal: Pd, centre: 2}}\n")
            .starts_with("test.yaml:9:24: variant 'a': there is no centre 2, expected 1 to 1"));
  CHECK(message("  - each: {ligands: [Br, NH4], vertices: 1}\n")
            .starts_with("test.yaml:9:26: variant 'NH4': no ligand is called 'NH4'"));
  CHECK(message("  - each: {ligands: [Br, Br], vertices: 1}\n")
            .starts_with("test.yaml:9:26: the name 'Br' is used already"));
  CHECK(message("  - each: {ligands: [Br]}\n").find("vertices") != std::string::npos);
  CHECK(message("  - each: {ligands: [{ligand: Br, vertices: 2}], vertices: 1}\n")
            .starts_with("test.yaml:9:22: the vertices stand beside"));
  CHECK(
      message("  - each: {vertices: 1}\n").starts_with("test.yaml:9:11: give a list of `ligands`"));
  CHECK(message("  - each: {metals: [Pd], vertices: 1}\n")
            .starts_with("test.yaml:9:36: `vertices` goes with `ligands`"));
  CHECK(message("  - each: {metals: []}\n").find("found nothing") != std::string::npos);
  CHECK(message("  - {geometry: {atoms: [[H, 0, 0, 0]]}, each: {metals: [Pd]}}\n")
            .find("`each` changes what `build` makes") != std::string::npos);
  // Phosphanes so near do not fit, and the place is that of the ligand, not of the section `build`.
  CHECK(message("  - each: {ligands: [{ligand: PMe3, distance: 1}], vertices: [1, 2]}\n")
            .starts_with("test.yaml:9:22: variant 'PMe3': PMe3 on vertex"));
  CHECK(message("  []\n").find("found no variant") != std::string::npos);
}
