// What orbitals at the centre and of ligands span: facts of the trade.
#include <map>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "molecule/element.hpp"
#include "salc/salc_basis.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

// How often each irrep occurs in the shells of one l on all atoms of an element.
std::map<std::string, int> counts(const char* molecule, const char* element, int l) {
  const Run r = run(test_molecule(molecule).molecule);
  std::map<std::string, int> found;
  for (std::size_t i = 0; i < r.levels.salcs.by_irrep.size(); ++i) {
    for (const Salc& salc : r.levels.salcs.by_irrep[i]) {
      const Shell& shell = r.basis.shells[salc.shell];
      if (shell.l != l || !atom_name(r.symmetry.molecule, shell.atom).starts_with(element))
        continue;
      ++found[level_label(r.symmetry.group.irreps()[i].label)];
    }
  }
  return found;
}

std::string spanned(const std::map<std::string, int>& found) {
  std::string text;
  for (const auto& [label, count] : found) {
    if (count == 0) continue;
    text += (text.empty() ? "" : " + ") + (count == 1 ? "" : fmt::format("{} ", count)) + label;
  }
  return text;
}

std::string spanned(const char* molecule, const char* element, int l) {
  return spanned(counts(molecule, element, l));
}

}  // namespace

TEST_CASE("s, p, d and f at the centre span what the tables say") {
  // Common practice; Cotton, Chemical Applications of Group Theory, appendix (from memory).
  const char* c4v = "pentacarbonylchloromanganese";
  CHECK(spanned(c4v, "Mn", 0) == "a1");
  CHECK(spanned(c4v, "Mn", 1) == "a1 + e");
  CHECK(spanned(c4v, "Mn", 2) == "a1 + b1 + b2 + e");
  const char* td = "titanium tetrachloride";
  CHECK(spanned(td, "Ti", 0) == "a1");
  CHECK(spanned(td, "Ti", 1) == "t2");
  CHECK(spanned(td, "Ti", 2) == "e + t2");
  const char* oh = "hexacarbonylchromium";
  CHECK(spanned(oh, "Cr", 0) == "a1g");
  CHECK(spanned(oh, "Cr", 1) == "t1u");
  CHECK(spanned(oh, "Cr", 2) == "eg + t2g");
  CHECK(spanned("uranium hexafluoride", "U", 3) == "a2u + t1u + t2u");
  const char* d4h = "tetrachloroplatinate(II)";
  CHECK(spanned(d4h, "Pt", 0) == "a1g");
  CHECK(spanned(d4h, "Pt", 1) == "a2u + eu");
  CHECK(spanned(d4h, "Pt", 2) == "a1g + b1g + b2g + eg");
  const char* d3h = "pentacarbonyliron";
  CHECK(spanned(d3h, "Fe", 0) == "a1'");
  CHECK(spanned(d3h, "Fe", 1) == "a2\" + e'");
  CHECK(spanned(d3h, "Fe", 2) == "a1' + e\" + e'");
  const char* d5h = "ferrocene, eclipsed";
  CHECK(spanned(d5h, "Fe", 0) == "a1'");
  CHECK(spanned(d5h, "Fe", 1) == "a2\" + e1'");
  CHECK(spanned(d5h, "Fe", 2) == "a1' + e1\" + e2'");
}

TEST_CASE("donors around a centre span what the textbook says") {
  // Common practice: six σ donors in Oh give a1g + eg + t1u, their twelve π orbitals t1g + t1u +
  // t2g
  // + t2u; four σ donors in Td a1 + t2, in D4h a1g + b1g + eu. A p shell is σ and π together.
  const char* oh = "sulfur hexafluoride";
  CHECK(spanned(oh, "F", 0) == "a1g + eg + t1u");
  std::map<std::string, int> pi = counts(oh, "F", 1);
  for (const auto& [label, count] : counts(oh, "F", 0)) pi[label] -= count;
  CHECK(spanned(pi) == "t1g + t1u + t2g + t2u");
  CHECK(spanned("titanium tetrachloride", "Cl", 0) == "a1 + t2");
  CHECK(spanned("tetrachloroplatinate(II)", "Cl", 0) == "a1g + b1g + eu");
  // The π orbitals of benzene, of C60 (with 240 orbitals in all): those of the textbook for six
  // hydrogens; sixty s functions span 60 dimensions with each irrep of I as often as its dimension.
  CHECK(spanned("benzene", "H", 0) == "a1g + b1u + e1u + e2g");
  CHECK(spanned("buckminsterfullerene", "C", 0) ==
        "ag + 2 gg + 2 gu + 3 hg + 2 hu + t1g + 2 t1u + t2g + 2 t2u");
}
