#include "job/job.hpp"

#include <filesystem>
#include <fstream>
#include <string>
#include <variant>
#include <vector>

#include <unistd.h>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "core/error.hpp"

using namespace irrepwise;

namespace {

// A folder of files that goes with the test; the current folder stays as it is.
class Folder {
 public:
  Folder()
      : path_(std::filesystem::temp_directory_path() /
              ("irrepwise_job_test_" + std::to_string(getpid()))) {
    std::filesystem::remove_all(path_);
    std::filesystem::create_directories(path_);
    write(
        "square.xyz",
        "5\ncharge=-2 title=square\nPt 0 0 0\nCl 2.3 0 0\nCl 0 2.3 0\nCl -2.3 0 0\nCl 0 -2.3 0\n");
  }
  ~Folder() { std::filesystem::remove_all(path_); }
  Folder(const Folder&) = delete;
  Folder& operator=(const Folder&) = delete;

  [[nodiscard]] std::string file(const std::string& name) const { return (path_ / name).string(); }

  void write(const std::string& name, const std::string& text) const {
    std::ofstream(file(name), std::ios::binary) << text;
  }

  [[nodiscard]] Job job(const std::string& text) const {
    write("job.yaml", text);
    return read_job(file("job.yaml"));
  }

  // The message with which a job is refused, without the folder.
  [[nodiscard]] std::string refusal(const std::string& text) const {
    try {
      (void)job(text);
    } catch (const Error& error) {
      std::string message = error.what();
      const std::string prefix = path_.string() + "/";
      for (std::size_t at = message.find(prefix); at != std::string::npos;
           at = message.find(prefix)) {
        message.erase(at, prefix.size());
      }
      return message;
    }
    return "accepted";
  }

  [[nodiscard]] std::string refusal_after_geometry(const std::string& rest) const {
    return refusal("geometry: square.xyz\n" + rest);
  }

 private:
  std::filesystem::path path_;
};

}  // namespace

TEST_CASE("an XYZ file is a job of its own, with defaults") {
  const Folder folder;
  const Job job = read_job(folder.file("square.xyz"));
  CHECK(job.title == "square");
  CHECK(job.molecule.size() == 5);
  CHECK(job.molecule.charge() == -2);
  CHECK(job.parameters.name() == "published");
  CHECK(job.hueckel.rule == Rule::Weighted);
  CHECK_FALSE(job.hueckel.k.has_value());
  CHECK(job.symmetry.tolerance_angstrom == 0.01);
  CHECK(job.source_files == std::vector<std::string>{folder.file("square.xyz")});
}

TEST_CASE("the multiplicity of an XYZ file holds unless the job says how electrons stand") {
  const Folder folder;
  folder.write("oxygen.xyz", "2\nmultiplicity=3\nO 0 0 0\nO 0 0 1.21\n");
  const Job alone = read_job(folder.file("oxygen.xyz"));
  CHECK(alone.hueckel.multiplicity == 3);
  CHECK(alone.places.at("multiplicity") == folder.file("oxygen.xyz") + ":2:14");
  CHECK(folder.job("geometry: oxygen.xyz\n").hueckel.multiplicity == 3);
  CHECK(folder.job("geometry: oxygen.xyz\nmultiplicity: 1\n").hueckel.multiplicity == 1);
  const Job filled = folder.job("geometry: oxygen.xyz\noccupations: {a1g: 4}\n");
  CHECK_FALSE(filled.hueckel.multiplicity.has_value());
  // A slip in the comment stops the job at its place.
  folder.write("slip.xyz", "1\nchrage=1\nF 0 0 0\n");
  CHECK(folder.refusal("geometry: slip.xyz\n") ==
        "slip.xyz:2:1: chrage= has no meaning here (did you mean charge=?); correct it or take it "
        "out");
}

TEST_CASE("every part of a job file is read") {
  const Folder folder;
  folder.write("own.yaml",
               "name: own\nextends: published\nelements:\n  H:\n    valence_electrons: 1\n"
               "    shells: [{shell: 1s, h_ii: -13.6, exponent: 1.0}]\n");
  const Job job = folder.job(
      "title: the square\n"
      "geometry: {file: square.xyz}\n"
      "charge: -1\n"
      "occupations: {a1g: 4, eg: 3}\n"
      "parameters: own.yaml\n"
      "overrides:\n"
      "  - {element: Pt, shell: 5d, h_ii: -12.0}\n"
      "  - {atom: 2, shell: 3p, exponent: 1.8}\n"
      "  - {element: Cl, valence_electrons: 6}\n"
      "  - {atom: 1, shell: 5d, exponents: [6.013, 2.696], coefficients: [0.6334, 0.5513]}\n"
      "rule: wolfsberg-helmholz\n"
      "k: 1.9\n"
      "symmetry:\n"
      "  tolerance: 0.05\n"
      "  axes:\n"
      "    z: {normal: [2, 3, 4]}\n"
      "    x: {atoms: [1, 2]}\n"
      "  subgroup: C2v\n");
  CHECK(job.title == "the square");
  CHECK(job.molecule.charge() == -1);
  CHECK(job.parameters.name() == "published + own");
  REQUIRE(job.overrides.size() == 4);
  CHECK(job.overrides[0].atomic_number == 78);
  CHECK(job.overrides[0].l == 2);
  CHECK(job.overrides[0].h_ii_ev == -12.0);
  CHECK_FALSE(job.overrides[0].radial.has_value());
  CHECK(job.overrides[1].atom == 1);
  CHECK(job.overrides[1].radial->terms()[0].function.zeta() == 1.8);
  CHECK(job.overrides[1].radial->n() == 3);
  CHECK(job.overrides[2].valence_electrons == 6);
  CHECK(job.overrides[3].radial->terms().size() == 2);
  CHECK(job.hueckel.rule == Rule::WolfsbergHelmholz);
  CHECK(job.hueckel.k == 1.9);
  CHECK(job.hueckel.electrons_by_irrep == std::map<std::string, int>{{"a1g", 4}, {"eg", 3}});
  CHECK(job.symmetry.tolerance_angstrom == 0.05);
  CHECK(std::get<std::vector<int>>(*job.symmetry.z) == std::vector<int>{1, 2, 3});
  CHECK(std::get<std::vector<int>>(*job.symmetry.x) == std::vector<int>{0, 1});
  CHECK(job.symmetry.subgroup == "C2v");
  CHECK(job.source_files == std::vector<std::string>{folder.file("job.yaml"),
                                                     folder.file("square.xyz"),
                                                     folder.file("own.yaml")});
}

TEST_CASE("atoms in place are the same as a list, as lines, and in bohr") {
  const Folder folder;
  const Job list = folder.job(
      "geometry:\n  atoms:\n    - [N, 0, 0, 0]\n    - [O1, 0, 0, 1.15]\nmultiplicity: 2\n");
  const Job lines =
      folder.job("geometry:\n  atoms: |\n    # nitrogen first\n    N 0 0 0\n\n    8   0  0 1.15\n");
  CHECK(list.molecule.positions() == lines.molecule.positions());
  CHECK(hill_formula(list.molecule) == "NO");
  CHECK(hill_formula(lines.molecule) == "NO");
  CHECK(list.hueckel.multiplicity == 2);
  const Job bohr = folder.job("geometry: {unit: bohr, atoms: [[N, 0, 0, 0], [O, 0, 0, 2]]}\n");
  CHECK(bohr.molecule.atoms()[1].position.z() == 2.0 * bohr_in_angstrom);
}

TEST_CASE("the geometry of another job is taken with its charge") {
  const Folder folder;
  folder.write("other.yaml", "title: other\ngeometry: square.xyz\ncharge: 1\n");
  const Job job = folder.job("geometry: other.yaml\n");
  CHECK(job.molecule.size() == 5);
  CHECK(job.molecule.charge() == 1);
  CHECK(job.source_files.size() == 3);
}

TEST_CASE("a file that includes itself is refused, directly or through another") {
  const Folder folder;
  CHECK(folder.refusal("geometry: ./job.yaml\n") ==
        "job.yaml:1:11: the geometry leads back to this file: job.yaml → ./job.yaml; name a file "
        "with atoms");
  folder.write("other.yaml", "geometry:\n  file: job.yaml\n");
  CHECK(folder.refusal("geometry: other.yaml\n") ==
        "other.yaml:2:9: the geometry leads back to this file: job.yaml → other.yaml → job.yaml; "
        "name a file with atoms");
}

TEST_CASE("parameters in place stand alone or extend the published set") {
  const Folder folder;
  const std::string hydrogen =
      "  elements:\n    Cl:\n      valence_electrons: 5\n      shells:\n"
      "        - {shell: 3p, h_ii: -14.2, exponent: 2}\n";
  const Job extending =
      folder.job("geometry: square.xyz\nparameters:\n  extends: published\n" + hydrogen);
  CHECK(extending.parameters.name() == "published + in place");
  CHECK(extending.parameters.at(17).shells.size() == 1);
  const Job alone = folder.job("geometry: square.xyz\nparameters:\n" + hydrogen);
  CHECK(alone.parameters.elements().size() == 1);
  const Job named = folder.job("geometry: square.xyz\nparameters: published\n");
  CHECK(named.parameters.elements().size() == published_parameters().elements().size());
}

TEST_CASE("unknown keys are refused at every level with the nearest known one") {
  const Folder folder;
  CHECK(folder.refusal_after_geometry("chrage: 1\n") ==
        "job.yaml:2:1: unknown key 'chrage' in a job; did you mean 'charge'?");
  CHECK(folder.refusal("geometry: {fille: a.xyz}\n") ==
        "job.yaml:1:12: unknown key 'fille' in the geometry; did you mean 'file'?");
  CHECK(folder.refusal_after_geometry("symmetry: {axis: 1}\n") ==
        "job.yaml:2:12: unknown key 'axis' in the symmetry; did you mean 'axes'?");
  CHECK(folder.refusal_after_geometry("symmetry: {axes: {y: 1}}\n") ==
        "job.yaml:2:19: unknown key 'y' in the axes; did you mean 'z'?");
  CHECK(folder.refusal_after_geometry("overrides: [{elment: Pt}]\n") ==
        "job.yaml:2:14: unknown key 'elment' in an override; did you mean 'element'?");
  CHECK(folder.refusal_after_geometry("charge: 1\ncharge: 2\n") ==
        "job.yaml:3:1: the key 'charge' stands here twice (first in line 2); keep one");
}

TEST_CASE("values of a wrong type or out of range are refused where they stand") {
  const Folder folder;
  const auto refusal = [&](const std::string& rest) { return folder.refusal_after_geometry(rest); };
  CHECK(refusal("charge: 0.5\n") ==
        "job.yaml:2:9: found '0.5', expected a whole number of charges");
  CHECK(refusal("charge: 123456\n") ==
        "job.yaml:2:9: found a charge of 123456, expected -100000 to 100000");
  CHECK(refusal("charge: [1]\n") ==
        "job.yaml:2:9: found a list, expected a whole number of charges");
  CHECK(refusal("multiplicity: 0\n") ==
        "job.yaml:2:15: found a multiplicity of 0, expected 1 or more");
  CHECK(refusal("multiplicity: 1\noccupations: {a1: 2}\n") ==
        "job.yaml:3:14: `multiplicity` and `occupations` exclude each other; keep one");
  CHECK(refusal("occupations: {a1: -2}\n") ==
        "job.yaml:2:19: found -2 electrons, expected 0 or more");
  CHECK(refusal("occupations: {}\n") ==
        "job.yaml:2:14: found no irrep, expected electrons for at least one");
  CHECK(refusal("rule: weigthed\n") ==
        "job.yaml:2:7: unknown rule 'weigthed'; did you mean 'weighted'? the rules are weighted, "
        "wolfsberg-helmholz, geometric-mean and cusachs");
  CHECK(refusal("k: -1\n") == "job.yaml:2:4: found K = -1, expected more than 0 and at most 10");
  CHECK(refusal("rule: cusachs\nk: 1.75\n") ==
        "job.yaml:3:4: the rule cusachs has no K; remove this line");
  CHECK(refusal("symmetry: {tolerance: 0}\n") ==
        "job.yaml:2:23: found a tolerance of 0 Å, expected more than 0 and at most 1");
  CHECK(refusal("symmetry: {axes: {z: {vector: [0, 0, 0]}}}\n") ==
        "job.yaml:2:31: a vector of zeros has no direction");
  CHECK(refusal("symmetry: {axes: {z: {atom: 6}}}\n") ==
        "job.yaml:2:29: there is no atom 6, expected 1 to 5");
  CHECK(refusal("symmetry: {axes: {z: {atoms: [1, 1]}}}\n") ==
        "job.yaml:2:30: one atom stands here twice");
  CHECK(refusal("symmetry: {axes: {z: {atom: 1, atoms: [1, 2]}}}\n") ==
        "job.yaml:2:22: expected one of `vector`, `atom`, `atoms` (two) and `normal` (three "
        "atoms)");
  CHECK(refusal("symmetry: {axes: {z: [0, 0, 1]}}\n") ==
        "job.yaml:2:22: found a list, expected an axis");
  CHECK(folder.refusal("title: x\n") == "job.yaml:1:1: the key 'geometry' is missing here");
  CHECK(folder.refusal("- 1\n") == "job.yaml:1:1: found a list, expected a job");
  CHECK(folder.refusal("# nothing\n") == "job.yaml:1:1: found nothing, expected a job");
}

TEST_CASE("overrides of what is not there, or of nothing, are refused where they stand") {
  const Folder folder;
  const auto refusal = [&](const std::string& item) {
    return folder.refusal_after_geometry("overrides:\n  - {" + item + "}\n");
  };
  CHECK(refusal("element: Fe, shell: 3d, h_ii: -12") == "job.yaml:3:15: there is no Fe in Cl4Pt");
  CHECK(refusal("element: Pl, shell: 3d, h_ii: -12") ==
        "job.yaml:3:15: 'Pl' is not an element; did you mean 'P'?");
  CHECK(refusal("atom: 0, shell: 3d, h_ii: -12") ==
        "job.yaml:3:12: there is no atom 0, expected 1 to 5");
  CHECK(refusal("element: Pt, shell: 4d, h_ii: -12") ==
        "job.yaml:3:26: Pt has no 4d shell in the parameter set, only 6s, 6p, 5d");
  CHECK(refusal("element: Pt, h_ii: -12") ==
        "job.yaml:3:5: name the shell that this is for, e.g. `shell: 3d`");
  CHECK(refusal("element: Pt") == "job.yaml:3:5: this override changes nothing");
  CHECK(refusal("element: Pt, shell: 5d") ==
        "job.yaml:3:5: this override changes nothing of the shell; give `h_ii` or an exponent");
  CHECK(refusal("element: Pt, atom: 1, shell: 5d, h_ii: -12") ==
        "job.yaml:3:5: expected either `element` or `atom` in an override");
  CHECK(refusal("element: Pt, valence_electrons: 33") ==
        "job.yaml:3:38: found 33 valence electrons, expected 0 to 32");
}

TEST_CASE("geometries in place are refused with line and column") {
  const Folder folder;
  CHECK(folder.refusal("geometry:\n  atoms:\n    - [N, 0, 0]\n") ==
        "job.yaml:3:7: found a list of 3, expected an atom: symbol, x, y, z");
  CHECK(folder.refusal("geometry:\n  atoms:\n    - [Nn, 0, 0, 0]\n") ==
        "job.yaml:3:8: 'Nn' is not an element; did you mean 'N'?");
  CHECK(folder.refusal("geometry:\n  atoms:\n    - [N, 0, nan, 0]\n") ==
        "job.yaml:3:14: found 'nan', expected a finite number");
  CHECK(folder.refusal("geometry:\n  atoms: |\n    N 0 0 0\n    O 0 0  1,2\n") ==
        "job.yaml:4:12: found '1,2', expected a number; write the decimal point as '.'");
  CHECK(folder.refusal("geometry:\n  atoms: |\n    N 0 0 0\n\n     O 0 0\n") ==
        "job.yaml:5:6: found 'O 0 0', expected an atom: symbol, x, y, z");
  CHECK(folder.refusal("geometry:\n  atoms: N 0 0 0\n") ==
        "job.yaml:2:10: found 'N 0 0 0', expected a list of atoms, or lines of atoms behind '|'");
  CHECK(folder.refusal("geometry:\n  atoms: []\n") ==
        "job.yaml:2:10: a molecule needs at least one atom");
  CHECK(folder.refusal("geometry:\n  atoms: [[N, 0, 0, 0], [N, 0, 0, 0.1]]\n") ==
        "job.yaml:2:10: atoms 1 (N) and 2 (N) are 0.100 Å apart, expected at least 0.3 Å; remove a "
        "double atom, or check the unit of the coordinates");
  CHECK(folder.refusal("geometry: {file: a.xyz, atoms: [[N, 0, 0, 0]]}\n") ==
        "job.yaml:1:11: expected either `file` or `atoms` in the geometry");
  CHECK(folder.refusal("geometry: {file: square.xyz, unit: bohr}\n") ==
        "job.yaml:1:36: `unit` goes with `atoms`; an XYZ file is in Å");
  CHECK(folder.refusal("geometry: {atoms: [[N, 0, 0, 0]], unit: nm}\n") ==
        "job.yaml:1:41: found 'nm', expected angstrom or bohr");
}

TEST_CASE("files that a job names are refused where it names them, or where they are wrong") {
  const Folder folder;
  CHECK(folder.refusal("geometry: missing.xyz\n") ==
        "job.yaml:1:11: missing.xyz: there is no such file; check its name and folder");
  CHECK(folder.refusal_after_geometry("parameters: missing.yaml\n") ==
        "job.yaml:2:13: missing.yaml: there is no such file; check its name and folder");
  folder.write("bad.xyz", "1\n\nFe 0 0 x\n");
  CHECK(folder.refusal("geometry: bad.xyz\n") == "bad.xyz:3:8: found 'x', expected a number");
}
