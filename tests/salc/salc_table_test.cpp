#include "salc/salc_table.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <tuple>

#include <doctest/doctest.h>

#include "basis/parameter_set.hpp"
#include "support/molecules.hpp"

using namespace irrepwise;

namespace {

struct Tables {
  MolecularSymmetry symmetry;
  Basis basis;
  std::vector<EquivalentAtoms> sets;
  std::vector<std::optional<LocalFrames>> frames;
  std::vector<SalcFunction> standard, local;
};

Tables tables(const Molecule& molecule) {
  MolecularSymmetry symmetry = find_symmetry(molecule);
  Basis basis = make_basis(molecule, published_parameters());
  std::vector<EquivalentAtoms> sets = equivalent_atoms(symmetry);
  auto frames = frames_of_sets(symmetry, sets);
  auto standard = salc_table(symmetry, basis, sets);
  auto local = salc_table(symmetry, basis, sets, frames);
  return {std::move(symmetry), std::move(basis),    std::move(sets),
          std::move(frames),   std::move(standard), std::move(local)};
}

// Over all orbitals of the basis, standard frame.
Eigen::VectorXd spread(const Tables& all, const SalcFunction& salc) {
  Eigen::VectorXd vector = Eigen::VectorXd::Zero(all.basis.n_orbitals);
  const EquivalentAtoms& set = all.sets[salc.set];
  const int in_atom = salc.shell - all.basis.first_shell[set.representative()];
  for (int i = 0; i < set.size(); ++i) {
    const Shell& shell = all.basis.shells[all.basis.first_shell[set.atoms[i]] + in_atom];
    HarmonicVector on_atom = HarmonicVector::Zero(shell.size());
    for (std::size_t c = 0; c < salc.components.size(); ++c) {
      on_atom[salc.components[c]] = salc.coefficients(i, static_cast<Eigen::Index>(c));
    }
    if (salc.frame != OrbitalFrame::Standard) {
      on_atom = (harmonic_rotation(shell.l, all.frames[salc.set]->frames[i]) * on_atom).eval();
    }
    vector.segment(shell.first_orbital, shell.size()) = on_atom;
  }
  return vector;
}

Eigen::VectorXd turned(const Tables& all, int g, const Eigen::VectorXd& vector) {
  Eigen::VectorXd image = Eigen::VectorXd::Zero(vector.size());
  for (const Shell& shell : all.basis.shells) {
    const int in_atom =
        static_cast<int>(&shell - all.basis.shells.data()) - all.basis.first_shell[shell.atom];
    const int atom = all.symmetry.images[g][shell.atom];
    const Shell& to = all.basis.shells[all.basis.first_shell[atom] + in_atom];
    image.segment(to.first_orbital, to.size()) =
        harmonic_rotation(shell.l, all.symmetry.group.operations()[g]) *
        vector.segment(shell.first_orbital, shell.size());
  }
  return image;
}

const SalcFunction& find(const std::vector<SalcFunction>& list, const PointGroup& group, int set,
                         Part part, const std::string& irrep, int partner) {
  const auto found = std::find_if(list.begin(), list.end(), [&](const SalcFunction& salc) {
    return salc.set == set && salc.part == part && salc.partner == partner &&
           salc.irrep == group.irrep_index(irrep);
  });
  REQUIRE(found != list.end());
  return *found;
}

}  // namespace

TEST_CASE("SALCs are orthonormal, as many as orbitals, and turn by the irrep's matrices") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    if (test.molecule.size() > 24 || test.point_group == "Kh") continue;  // larger ones take long
    const Tables all = tables(test.molecule);
    const PointGroup& group = all.symmetry.group;
    for (const std::vector<SalcFunction>* list : {&all.standard, &all.local}) {
      REQUIRE(static_cast<int>(list->size()) == all.basis.n_orbitals);
      Eigen::MatrixXd columns(all.basis.n_orbitals, all.basis.n_orbitals);
      for (std::size_t i = 0; i < list->size(); ++i) {
        columns.col(static_cast<Eigen::Index>(i)) = spread(all, (*list)[i]);
      }
      CHECK((columns.transpose() * columns).isIdentity(1e-10));
      double worst = 0.0;
      for (std::size_t i = 0; i < list->size(); ++i) {
        const SalcFunction& salc = (*list)[i];
        if (salc.partner != 1) continue;
        const int d = group.irreps()[salc.irrep].dimension;
        const auto partners = columns.middleCols(static_cast<Eigen::Index>(i), d);
        for (int g = 0; g < group.order(); ++g) {
          for (int r = 0; r < d; ++r) {
            const Eigen::VectorXd expected =
                partners * group.irreps()[salc.irrep].matrices[g].col(r);
            const Eigen::VectorXd found = turned(all, g, partners.col(r));
            worst = std::max(worst, (found - expected).cwiseAbs().maxCoeff());
          }
        }
      }
      CHECK(worst < 1e-10);
    }
  }
}

TEST_CASE("the two Eg partners of six σ orbitals meet dz2 and dx2-y2") {
  // Common practice: (2,2,-1,-1,-1,-1)/√12 with the ligands on z ahead, and (1,-1,1,-1)/2.
  const Tables all = tables(test_molecule("sulfur hexafluoride").molecule);
  const PointGroup& group = all.symmetry.group;
  const Eigen::VectorXd meets_z2 =
      find(all.local, group, 1, Part::Sigma, "Eg", 1).coefficients.col(0);
  const Eigen::VectorXd meets_x2_y2 =
      find(all.local, group, 1, Part::Sigma, "Eg", 2).coefficients.col(0);
  for (int i = 0; i < 6; ++i) {
    const Eigen::Vector3d along =
        all.symmetry.molecule.atoms()[all.sets[1].atoms[i]].position.normalized();
    const double x = along[0], y = along[1], z = along[2];
    CHECK(meets_z2[i] ==
          doctest::Approx((3 * z * z - 1) / std::sqrt(12.0)).epsilon(1e-10).scale(0));
    CHECK(std::abs(meets_x2_y2[i] - (x * x - y * y) / 2.0) < 1e-12);
  }
}

TEST_CASE("the T1u σ partners meet px, py and pz in this order") {
  const Tables all = tables(test_molecule("sulfur hexafluoride").molecule);
  for (int axis = 0; axis < 3; ++axis) {
    const SalcFunction& salc = find(all.local, all.symmetry.group, 1, Part::Sigma, "T1u", axis + 1);
    for (int i = 0; i < 6; ++i) {
      const Eigen::Vector3d along =
          all.symmetry.molecule.atoms()[all.sets[1].atoms[i]].position.normalized();
      // One sign for all partners, either way.
      CHECK(std::abs(std::abs(salc.coefficients(i, 0)) - std::abs(along[axis]) / std::sqrt(2.0)) <
            1e-12);
    }
  }
}

TEST_CASE("benzene's π orbitals have the coefficients of Hückel theory") {
  // a2u: all 1/√6; e1g: (2 1 -1 -2 -1 1)/√12 and (0 1 1 0 -1 -1)/2; from the cosines, Hückel
  // (1931).
  const Tables all = tables(test_molecule("benzene").molecule);
  const PointGroup& group = all.symmetry.group;
  const int carbon = 0;
  const auto sizes = [&](const char* irrep, int partner) {
    std::vector<double> found;
    for (const double c :
         find(all.local, group, carbon, Part::PiOutOfPlane, irrep, partner).coefficients.col(0)) {
      found.push_back(std::abs(c));
    }
    std::sort(found.begin(), found.end());
    return found;
  };
  for (const double c : sizes("A2u", 1)) CHECK(std::abs(c - 1 / std::sqrt(6.0)) < 1e-12);
  // Which of the two partners has the node through atoms depends on where x runs.
  const auto agrees = [](const std::vector<double>& found, const std::vector<double>& expected) {
    for (std::size_t i = 0; i < expected.size(); ++i) {
      if (std::abs(found[i] - expected[i]) > 1e-12) return false;
    }
    return true;
  };
  const double small = 1 / std::sqrt(12.0);
  const std::vector<double> large_on_two = {small, small, small, small, 2 * small, 2 * small};
  const std::vector<double> none_on_two = {0, 0, 0.5, 0.5, 0.5, 0.5};
  CHECK(agrees(sizes("E1g", 1), large_on_two) != agrees(sizes("E1g", 1), none_on_two));
  CHECK(agrees(sizes("E1g", 1), large_on_two) == agrees(sizes("E1g", 2), none_on_two));
}

TEST_CASE("orbitals are called by their frame") {
  const Basis basis =
      make_basis(test_molecule("titanium tetrachloride").molecule, published_parameters());
  const Shell& p = basis.shells[basis.first_shell[1] + 1];
  CHECK(salc_orbital_name(p, 2, OrbitalFrame::Local) == "3pσ");
  CHECK(salc_orbital_name(p, 0, OrbitalFrame::Local) == "3pπx");
  CHECK(salc_orbital_name(p, 2, OrbitalFrame::Standard) == "3pz");
}
