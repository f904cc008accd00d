#include "symmetry/selection.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/molecules.hpp"
#include "symmetry/vibrations.hpp"

using namespace irrepwise;

namespace {

using Axes = std::vector<std::string>;

TransitionRule rule(const char* group, const char* from, const char* to) {
  return transition_rule(PointGroup(parse_schoenflies(group)), from, to);
}

TermDistortion distortion(const char* molecule, const char* term) {
  const MolecularSymmetry symmetry = find_symmetry(test_molecule(molecule).molecule);
  return term_distortion(symmetry.group, term, displacement_irreps(symmetry).vibrations);
}

}  // namespace

TEST_CASE("transitions are allowed as the textbooks say") {
  // Laporte's rule; benzene: Cotton, chapter on selection rules (from memory).
  CHECK(rule("Oh", "t2g", "eg").dipole_axes.empty());
  CHECK(rule("Oh", "t2g", "eg").two_photon);
  CHECK(rule("Oh", "t2g", "t1u").dipole_axes == Axes{"x", "y", "z"});
  CHECK_FALSE(rule("Oh", "t2g", "t1u").two_photon);
  CHECK(rule("D6h", "e1g", "e2u").dipole_axes == Axes{"x", "y"});
  CHECK(rule("D6h", "a2u", "a1g").dipole_axes == Axes{"z"});
  CHECK(rule("D6h", "e1g", "b2g").dipole_axes.empty());
  CHECK(rule("Td", "e", "t2").dipole_axes == Axes{"x", "y", "z"});
  CHECK(rule("C2v", "a1", "b1").dipole_axes == Axes{"x"});
  CHECK(rule("C2v", "a2", "b2").dipole_axes == Axes{"x"});
  CHECK(rule("C2v", "a1", "a2").dipole_axes.empty());
  CHECK(rule("D4h", "eg", "a2u").dipole_axes == Axes{"x", "y"});
  CHECK(rule("Dinfh", "piu", "pig").dipole_axes == Axes{"z"});
  CHECK(rule("Dinfh", "sigmag+", "piu").dipole_axes == Axes{"x", "y"});
  CHECK(rule("Cinfv", "sigma+", "sigma-").dipole_axes.empty());
  CHECK(rule("C1", "a", "a").dipole_axes == Axes{"x", "y", "z"});
  CHECK(rule("Kh", "s", "p").dipole_axes == Axes{"x", "y", "z"});
  CHECK(rule("Kh", "s", "d").dipole_axes.empty());
  CHECK_THROWS_AS((void)rule("Oh", "t2g", "b1"), Error);
}

TEST_CASE("Jahn-Teller active modes are those of the textbooks") {
  // Bersuker, The Jahn-Teller Effect; C60 anions: O'Brien and Chancey (both from memory).
  CHECK(reduction_text(distortion("sulfur hexafluoride", "eg").modes) == "Eg");
  CHECK(reduction_text(distortion("sulfur hexafluoride", "t2g").modes) == "Eg + T2g");
  CHECK(reduction_text(distortion("methane", "t2").modes) == "E + 2T2");
  CHECK(reduction_text(distortion("tetrachloroplatinate(II)", "eg").modes) == "B1g + B2g");
  CHECK(reduction_text(distortion("benzene", "e1g").modes) == "4E2g");
  CHECK(reduction_text(distortion("ammonia", "e").modes) == "2E");
  CHECK(reduction_text(distortion("buckminsterfullerene", "t1u").modes) == "8Hg");
  CHECK(reduction_text(distortion("buckminsterfullerene", "hu").modes) == "6Gg + 8Hg");
  CHECK(distortion("sulfur hexafluoride", "a1g").kind == DistortionKind::None);
  CHECK(distortion("water", "b2").kind == DistortionKind::None);
  CHECK(distortion("carbon dioxide", "pig").kind == DistortionKind::RennerTeller);
  CHECK(reduction_text(distortion("carbon dioxide", "pig").modes) == "Piu");
  CHECK(distortion("carbon dioxide", "sigmag+").kind == DistortionKind::None);
  // An atom's terms but S are degenerate, and it has nothing to vibrate.
  CHECK(distortion("helium atom", "Fg").kind == DistortionKind::Atom);
  CHECK(distortion("helium atom", "Sg").kind == DistortionKind::None);
}

TEST_CASE("every degenerate term of every non-linear molecule has an active mode") {
  // The theorem of Jahn and Teller, Proc. R. Soc. A 161, 220 (1937), proven there group by group.
  for (const TestMolecule& test : test_molecules()) {
    const MolecularSymmetry symmetry = find_symmetry(test.molecule);
    if (!symmetry.group.symbol().is_finite()) continue;
    const Reduction vibrations = displacement_irreps(symmetry).vibrations;
    for (const Irrep& irrep : symmetry.group.irreps()) {
      const std::string name = test.name, label = irrep.label;
      CAPTURE(name);
      CAPTURE(label);
      const TermDistortion found = term_distortion(symmetry.group, label, vibrations);
      CHECK((found.kind == DistortionKind::JahnTeller) == (irrep.dimension > 1));
      CHECK(found.modes.empty() == (irrep.dimension == 1));
    }
  }
}
