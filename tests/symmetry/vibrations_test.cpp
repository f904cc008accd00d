#include "symmetry/vibrations.hpp"

#include <string>

#include <doctest/doctest.h>

#include "support/molecules.hpp"

using namespace irrepwise;

namespace {

std::string vibrations(const char* molecule) {
  return reduction_text(
      displacement_irreps(find_symmetry(test_molecule(molecule).molecule)).vibrations);
}

}  // namespace

TEST_CASE("vibrations of well-known molecules are those of the handbooks") {
  // Wilson, Decius and Cross, Molecular Vibrations; Nakamoto, Infrared and Raman Spectra of
  // Inorganic and Coordination Compounds; C60: common practice (all from memory). Water lies in yz,
  // C2' of benzene and of PtCl4(2-) passes through atoms.
  CHECK(vibrations("water") == "2A1 + B2");
  CHECK(vibrations("ammonia") == "2A1 + 2E");
  CHECK(vibrations("methane") == "A1 + E + 2T2");
  CHECK(vibrations("benzene") ==
        "2A1g + A2g + 2B2g + E1g + 4E2g + A2u + 2B1u + 2B2u + 3E1u + 2E2u");
  CHECK(vibrations("sulfur hexafluoride") == "A1g + Eg + T2g + 2T1u + T2u");
  CHECK(vibrations("uranium hexafluoride") == "A1g + Eg + T2g + 2T1u + T2u");
  CHECK(vibrations("tetrachloroplatinate(II)") == "A1g + B1g + B2g + A2u + B2u + 2Eu");
  CHECK(vibrations("carbon dioxide") == "Sigmag+ + Sigmau+ + Piu");
  CHECK(vibrations("acetylene") == "2Sigmag+ + Pig + Sigmau+ + Piu");
  CHECK(vibrations("buckminsterfullerene") ==
        "2Ag + 3T1g + 4T2g + 6Gg + 8Hg + Au + 4T1u + 5T2u + 6Gu + 7Hu");
}

TEST_CASE("displacements are translations, rotations and vibrations in every molecule") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const MolecularSymmetry symmetry = find_symmetry(test.molecule);
    const DisplacementIrreps irreps = displacement_irreps(symmetry);
    const bool atom = symmetry.group.symbol().family == Family::Kh;
    const bool linear = !symmetry.group.symbol().is_finite();
    CHECK(total_dimension(irreps.displacements) == 3 * test.molecule.size());
    CHECK(total_dimension(irreps.translations) == 3);
    CHECK(total_dimension(irreps.rotations) == (atom ? 0 : linear ? 2 : 3));
    CHECK(total_dimension(irreps.vibrations) == 3 * test.molecule.size() - (atom     ? 3
                                                                            : linear ? 5
                                                                                     : 6));
    for (const IrrepCount& irrep : irreps.vibrations) CHECK(irrep.count > 0);
  }
}
