// Frontier orbitals that every chemist knows.
#include <string>

#include <doctest/doctest.h>

#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

std::string label_at(const Run& r, int level) {
  return level_label(r.symmetry.group.irreps()[r.levels.levels[level].irrep].label);
}

struct Labels {
  std::string homo, lumo;
};

Labels frontier(const char* name) {
  const Run r = run(test_molecule(name).molecule);
  CHECK_FALSE(r.levels.frontier.open_shell);
  return {label_at(r, *r.levels.frontier.homo), label_at(r, *r.levels.frontier.lumo)};
}

}  // namespace

TEST_CASE("benzene's frontier orbitals are e1g and e2u, those of C60 hu and t1u") {
  // Common practice: Hückel's π levels, and those of the fullerene found in 1985 and after.
  CHECK(frontier("benzene").homo == "e1g");
  CHECK(frontier("benzene").lumo == "e2u");
  CHECK(frontier("buckminsterfullerene").homo == "hu");
  CHECK(frontier("buckminsterfullerene").lumo == "t1u");
}

TEST_CASE("the highest full level of an octahedral carbonyl of a d6 metal is t2g") {
  // Common practice: 18 electrons, t2g⁶.
  CHECK(frontier("hexacarbonylchromium").homo == "t2g");
}

TEST_CASE("ferrocene's frontier is a1 and e2 and, empty, e1: the d orbitals between two rings") {
  // Common practice: six electrons in dz2 (a1) and dx2-y2, dxy (e2), which are the iron's, lie
  // close and nearly do not bond, below the antibonding dxz, dyz (e1); g in D5d, ' and " in D5h.
  // The rings' own e1 of the other parity may lie between the two.
  struct Form {
    std::string name, e2, a1, e1;
  };
  for (const Form& form : {Form{"ferrocene, eclipsed", "e2'", "a1'", "e1\""},
                           Form{"ferrocene, staggered", "e2g", "a1g", "e1g"}}) {
    CAPTURE(form.name);
    const Run r = run(test_molecule(form.name).molecule);
    CHECK_FALSE(r.levels.frontier.open_shell);
    const int homo = *r.levels.frontier.homo;
    CHECK(label_at(r, homo) == form.a1);
    CHECK(label_at(r, *r.levels.frontier.lumo) == form.e1);
    int e2 = homo;
    while (e2 > 0 && label_at(r, e2) != form.e2) --e2;
    CHECK(r.levels.levels[homo].energy_ev - r.levels.levels[e2].energy_ev < 1.0);

    const Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
    for (int level : {homo, e2}) {
      double iron = 0.0;
      for (const Shell& shell : r.basis.shells) {
        if (r.symmetry.molecule.atoms()[shell.atom].atomic_number != 26 || shell.l != 2) continue;
        iron += populations.shares.col(level).segment(shell.first_orbital, shell.size()).sum();
      }
      CHECK(iron > 0.7);
    }
  }
}
