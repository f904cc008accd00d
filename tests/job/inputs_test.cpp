// The jobs that come with the program are read, and are what their comments say.
#include <algorithm>
#include <cmath>
#include <filesystem>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "job/job.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

namespace {

Job shipped(const std::string& name) { return read_job(source_path("inputs/" + name)); }

double distance(const Molecule& molecule, int a, int b) {
  return (molecule.positions().col(a) - molecule.positions().col(b)).norm();
}

// All distances between elements below `longest`, each within 1e-6 Å of one of the expected.
void check_bonds(const Molecule& molecule, double longest, const std::vector<double>& expected) {
  for (int a = 0; a < molecule.size(); ++a) {
    for (int b = 0; b < a; ++b) {
      const double found = distance(molecule, a, b);
      if (found > longest) continue;
      const bool known = std::any_of(expected.begin(), expected.end(), [&](double length) {
        return std::abs(found - length) < 1e-6;  // eight decimals are written
      });
      CAPTURE(found);
      CHECK(known);
    }
  }
}

}  // namespace

TEST_CASE("every shipped input is read without a warning and has parameters and electrons") {
  int n_files = 0;
  for (const auto& entry : std::filesystem::directory_iterator(source_path("inputs"))) {
    const std::string name = entry.path().filename().string();
    CAPTURE(name);
    if (entry.path().extension() != ".xyz" && entry.path().extension() != ".yaml") continue;
    const Job job = shipped(name);
    CHECK_FALSE(job.title.empty());
    CHECK(geometry_warnings(job.molecule).empty());
    const Basis basis = make_basis(job.molecule, job.parameters, job.overrides);
    const int electrons = basis.electrons(job.molecule.charge());
    CHECK(electrons > 0);
    CHECK(electrons <= 2 * basis.n_orbitals);
    int given = 0;
    for (const auto& [irrep, count] : job.hueckel.electrons_by_irrep) given += count;
    if (given > 0) CHECK(given == electrons);
    if (job.hueckel.multiplicity) CHECK((electrons + *job.hueckel.multiplicity) % 2 == 1);
    ++n_files;
  }
  CHECK(n_files >= 16);
}

TEST_CASE("shipped geometries have the bond lengths that their comments state") {
  check_bonds(shipped("square_ptcl4.xyz").molecule, 2.5, {2.32});
  check_bonds(shipped("hexacarbonyl_cr.xyz").molecule, 2.5, {1.91, 1.14});
  check_bonds(shipped("benzene.xyz").molecule, 1.6, {1.40, 1.09});
  check_bonds(shipped("ethane_staggered.xyz").molecule, 1.6, {1.54, 1.10});
  check_bonds(shipped("cage_c60.xyz").molecule, 1.6, {1.45, 1.40});
  check_bonds(shipped("linear_dicyanidoaurate.xyz").molecule, 2.1, {2.00, 1.15});
  check_bonds(shipped("tetrahedral_cocl4.xyz").molecule, 2.5, {2.28});
  check_bonds(shipped("hexafluoridoferrate.xyz").molecule, 2.5, {1.93});
  check_bonds(shipped("hydride_platform.yaml").molecule, 2.2, {1.60, 1.42});
  // Fe–C by Pythagoras from the ring's radius 1.42 / (2 sin 36°) and the height 1.65 Å.
  const double radius = 1.42 / (2.0 * std::sin(std::acos(-1.0) / 5.0));
  for (const char* name : {"sandwich_fe_staggered.xyz", "sandwich_fe_eclipsed.xyz"}) {
    check_bonds(shipped(name).molecule, 2.2, {1.42, 1.08, std::hypot(radius, 1.65)});
  }
}

TEST_CASE("every carbon of the shipped cage has two single bonds and one double") {
  const Molecule cage = shipped("cage_c60.xyz").molecule;
  REQUIRE(cage.size() == 60);
  for (int a = 0; a < 60; ++a) {
    int n_single = 0;
    int n_double = 0;
    for (int b = 0; b < 60; ++b) {
      if (a == b) continue;
      n_single += std::abs(distance(cage, a, b) - 1.45) < 1e-6;
      n_double += std::abs(distance(cage, a, b) - 1.40) < 1e-6;
    }
    CHECK(n_single == 2);
    CHECK(n_double == 1);
  }
}
