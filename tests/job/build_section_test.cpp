// The section `build` of a job: what it makes, and how it is refused, with the place.
#include <filesystem>
#include <fstream>
#include <string>

#include <unistd.h>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "job/job.hpp"
#include "job/job_file.hpp"

using namespace irrepwise;

namespace {

// A job in a file of its own, removed at the end.
class JobFile {
 public:
  explicit JobFile(const std::string& text)
      : path_(std::filesystem::temp_directory_path() /
              ("irrepwise_build_section_" + std::to_string(getpid()) + ".yaml")) {
    std::ofstream(path_, std::ios::binary) << text;
  }
  ~JobFile() { std::filesystem::remove(path_); }
  JobFile(const JobFile&) = delete;
  JobFile& operator=(const JobFile&) = delete;

  [[nodiscard]] std::string name() const { return path_.string(); }

 private:
  std::filesystem::path path_;
};

Job job(const std::string& text) { return read_job(JobFile(text).name()); }

// The message with "job.yaml" for the file.
std::string refusal(const std::string& text) {
  const JobFile file(text);
  try {
    (void)read_job(file.name());
  } catch (const Error& error) {
    std::string message = error.what();
    for (std::size_t at = message.find(file.name()); at != std::string::npos;
         at = message.find(file.name())) {
      message.replace(at, file.name().size(), "job.yaml");
    }
    return message;
  }
  return "accepted";
}

const std::string square = "build:\n  metal: Pt\n  polyhedron: SP-4\n  oxidation: 2\n  ligands:\n";

}  // namespace

TEST_CASE("a job builds its complex in place of a geometry") {
  const Job built =
      job("title: cis\n" + square +
          "    - {ligand: NH3, vertices: [1, 2], twist: 0, distance: 2.05}\n    - Cl\n    - Cl\n");
  REQUIRE(built.built);
  REQUIRE(built.complex);
  CHECK(built.title == "cis");
  CHECK(built.molecule.size() == 11);
  CHECK(built.molecule.charge() == 0);
  CHECK(built.built->ligands[2].vertices == std::vector<int>{3});
  CHECK(built.built->ligands[0].distances_angstrom[0] == 2.05);
}

TEST_CASE("the charge of the job gives the oxidation state, and other sections go with it") {
  const Job built =
      job("charge: -2\nrule: wolfsberg-helmholz\nbuild:\n  metal: Pt\n  polyhedron: SP-4\n"
          "  ligands: [Cl, Cl, Cl, Cl]\noverrides:\n  - {atom: 2, shell: 3p, h_ii: -14}\n");
  CHECK(built.built->centres[0].electrons.oxidation == 2);
  CHECK(built.hueckel.rule == Rule::WolfsbergHelmholz);
  CHECK(built.overrides.size() == 1);
}

TEST_CASE("a charge from outside the file obeys the rule for the one in it") {
  Job stated = job(square + "    - Cl\n    - Cl\n    - Cl\n    - Cl\n");
  set_charge(stated, -2, "--charge");
  CHECK(stated.molecule.charge() == -2);
  CHECK(stated.places["charge"] == "--charge");
  std::string message;
  try {
    set_charge(stated, -1, "--charge");
  } catch (const Error& error) {
    message = error.what();
  }
  CHECK(message.starts_with("--charge: the charge "));
  CHECK(message.find("contradicts oxidation state") != std::string::npos);
  // Where the file leaves the oxidation state open, it follows.
  Job open =
      job("charge: -2\nbuild:\n  metal: Pt\n  polyhedron: SP-4\n  ligands: [Cl, Cl, Cl, Cl]\n");
  set_charge(open, 0, "--charge");
  CHECK(open.molecule.charge() == 0);
  CHECK(open.built->centres[0].electrons.oxidation == 4);
}

TEST_CASE("two centres with bridges are read") {
  const Job built =
      job("build:\n  centres:\n"
          "    - {metal: Pd, polyhedron: SP-4, oxidation: 2, ligands: [Cl, Cl]}\n"
          "    - {metal: Pt, polyhedron: SP-4, oxidation: 2, ligands: [Br, Br]}\n"
          "  bridges:\n"
          "    - {ligand: Cl, vertices: [1, 1]}\n"
          "    - {ligand: Cl, vertices: [2, 2], distances: [2.3, 2.4]}\n");
  CHECK(built.built->centres.size() == 2);
  CHECK(built.molecule.charge() == -2);
  CHECK(built.built->ligands.back().distances_angstrom == std::vector<double>{2.3, 2.4});
}

TEST_CASE("what cannot be built is refused with its line and column") {
  CHECK(refusal(square + "    - Cl\n    - Cl\n    - NH33\n    - Cl\n") ==
        "job.yaml:8:7: no ligand is called 'NH33', did you mean 'NH3'? `irrepwise build --list "
        "ligands` shows all");
  CHECK(
      refusal("build:\n  metal: Pt\n  polyhedron: SQ-4\n  ligands: []\n") ==
      "job.yaml:3:15: 'SQ-4' is no polyhedral symbol; did you mean SP-4? Otherwise the known ones "
      "are L-2, A-2, TP-3, TPY-3, TS-3, T-4, SP-4, SPY-4, SS-4, TBPY-5, SPY-5, OC-6, TPR-6, "
      "PBPY-7, OCF-7, TPRS-7, CU-8, SAPR-8, DD-8, HBPY-8 and TPRS-9");
  CHECK(refusal("build:\n  metal: Pq\n  polyhedron: SP-4\n") ==
        "job.yaml:2:10: 'Pq' is not an element; did you mean 'P'?");
  CHECK(refusal(square +
                "    - {ligand: Cl, vertices: [1, 2, 3]}\n    - {ligand: Br, vertices: 3}\n") ==
        "job.yaml:7:7: vertex 3 is taken twice, by Cl and Br; give each vertex to one ligand");
  CHECK(refusal(square + "    - Cl\n    - Cl\n    - Cl\n") ==
        "job.yaml:2:3: nothing is on vertex 4 of SP-4; give it a ligand, or choose a smaller "
        "polyhedron");
  CHECK(refusal(square + "    - Cl\n    - Cl\n    - Cl\n    - Cl\n    - Br\n") ==
        "job.yaml:10:7: no vertex is left for Br; SP-4 has 4");
  CHECK(refusal(square + "    - {ligand: Cl, vertices: 5}\n") ==
        "job.yaml:6:7: SP-4 has no vertex 5, expected 1 to 4");
  CHECK(refusal(square + "    - {ligand: Cp, hapticity: 4}\n") ==
        "job.yaml:6:7: Cp does not bind with hapticity 4; it binds with η5");
  CHECK(refusal(square + "    - {ligand: NH3, denticity: 2}\n") ==
        "job.yaml:6:7: NH3 does not bind with denticity 2; it binds with one tooth");
  CHECK(refusal(square + "    - {ligand: en, vertices: [1, 3]}\n") ==
        "job.yaml:6:7: en cannot span vertices 1 and 3 of SP-4, which are 180° apart; give it two "
        "neighbouring vertices, at most 125° apart");
  CHECK(refusal("charge: -1\n" + square + "    - Cl\n    - Cl\n    - Cl\n    - Cl\n") ==
        "job.yaml:1:9: the charge -1 contradicts oxidation state +2 and ligands -4, which make -2; "
        "correct one, or leave one out");
  CHECK(refusal("build:\n  metal: Ti\n  polyhedron: T-4\n  oxidation: 5\n  ligands: [Cl, Cl, Cl, "
                "Cl]\n") ==
        "job.yaml:4:14: the oxidation state +5 takes more electrons from Ti than its 4 valence "
        "electrons; check oxidation state, charge and ligands");
  CHECK(refusal(square + "    - {ligand: Cl, vertices: [1, 2, 3, 4], distance: 0}\n") ==
        "job.yaml:6:54: found a distance of 0 Å, expected 0.5 to 6");
  CHECK(refusal(square + "    - {ligand: Cl, vertex: 1}\n") ==
        "job.yaml:6:20: unknown key 'vertex' in a ligand; known keys are ligand, vertices, covers, "
        "denticity, hapticity, distance, twist, angle, bite and mirrored");
  CHECK(refusal("geometry: a.xyz\n" + square + "    - Cl\n") ==
        "job.yaml:1:11: `geometry` and `build` exclude each other; keep one");
  CHECK(refusal("build:\n  metal: Pt\n  polyhedron: {symbol: SP-4, angle: 80}\n") ==
        "job.yaml:3:15: SP-4 has no angle that could be set; leave it out");
}

TEST_CASE("a substitution is read with what it changes") {
  const YamlNode node = YamlNode::parse(
      "metal: Pd\noxidation: 2\nligands:\n  - {ligand: CO, vertices: 1}\ndistances: {2: 2.3}\n",
      "job.yaml");
  const Substitution change = read_substitution(node);
  CHECK(change.metal == 46);
  CHECK(change.oxidation == 2);
  CHECK(change.ligands.front().vertices == std::vector<int>{1});
  CHECK(change.distances_angstrom.front() == std::pair{2, 2.3});
  const YamlNode wrong = YamlNode::parse("ligands: [CO]\n", "job.yaml");
  CHECK_THROWS_WITH_AS(
      static_cast<void>(read_substitution(wrong)),
      "job.yaml:1:11: name the vertices that this ligand takes over, e.g. {ligand: "
      "CO, vertices: 1}",
      Error);
}
