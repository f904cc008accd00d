#include "analysis/metal_bonds.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>
#include <optional>
#include <utility>

#include "analysis/donors.hpp"
#include "molecule/bonded_atoms.hpp"
#include "molecule/element.hpp"
#include "molecule/metals.hpp"

namespace irrepwise {
namespace {

// What tells donors apart before lengths do.
struct Kind {
  int element = 0;
  std::string ligand;
  bool bridging = false;

  bool operator==(const Kind&) const = default;
};

struct Donor {
  MetalBond bond;
  Kind kind;
  Opposite opposite = Opposite::None;
  int opposite_element = 0;
  int first_equivalent = 0;
};

Kind kind_of(const Molecule& molecule, const std::vector<int>& metals, int donor) {
  const auto n_metals = std::count_if(
      metals.begin(), metals.end(), [&](int metal) { return are_bonded(molecule, metal, donor); });
  return {molecule.atoms()[static_cast<std::size_t>(donor)].atomic_number,
          ligand_formula(molecule, donor), n_metals > 1};
}

constexpr double rounding =
    1e-6;  // of a cosine or a distance in Å: what lies at a limit stays there

// The site most nearly across the metal.
const DonorSite* opposite_site(const std::vector<DonorSite>& sites, const DonorSite& site) {
  const DonorSite* found = nullptr;
  double least = std::cos(opposite_degrees * std::numbers::pi / 180.0) + rounding;
  for (const DonorSite& other : sites) {
    const double cosine = site.direction.dot(other.direction);
    if (cosine > least) continue;
    least = cosine;
    found = &other;
  }
  return found;
}

// Among the operations that leave the metal in place: others may exchange what stands opposite.
int first_equivalent(const MolecularSymmetry& symmetry, int metal, int atom) {
  int first = atom;
  for (const std::vector<int>& image : symmetry.images) {
    if (image[static_cast<std::size_t>(metal)] != metal) continue;
    first = std::min(first, image[static_cast<std::size_t>(atom)]);
  }
  return first;
}

std::vector<Donor> donors_of(const MolecularSymmetry& symmetry, const Populations& populations,
                             int metal) {
  const Molecule& molecule = symmetry.molecule;
  const std::vector<int> metals = centre_atoms(molecule);
  const std::vector<DonorSite> sites = donor_sites(molecule, metal);
  std::vector<Donor> donors;
  for (const DonorSite& site : sites) {
    const DonorSite* const across = opposite_site(sites, site);
    for (const int atom : site.atoms) {
      Donor donor;
      donor.bond.donor = atom;
      donor.kind = kind_of(molecule, metals, atom);
      donor.first_equivalent = first_equivalent(symmetry, metal, atom);
      if (across) {
        // Of a site of several elements the heaviest names it, unless it holds a like donor.
        donor.opposite = Opposite::Other;
        for (const int opposite : across->atoms) {
          const Kind other = kind_of(molecule, metals, opposite);
          if (other == donor.kind) donor.opposite = Opposite::Like;
          donor.opposite_element = std::max(donor.opposite_element, other.element);
        }
        if (donor.opposite == Opposite::Like) donor.opposite_element = donor.kind.element;
      }
      for (const OverlapPopulation& pair : populations.overlap_populations) {
        if (pair.atom_a != std::min(atom, metal) || pair.atom_b != std::max(atom, metal)) continue;
        donor.bond.overlap_population = pair.value;
        donor.bond.distance_angstrom = pair.distance_angstrom;
      }
      donors.push_back(std::move(donor));
    }
  }
  std::sort(donors.begin(), donors.end(),
            [](const Donor& a, const Donor& b) { return a.bond.donor < b.bond.donor; });
  // An angle at the very limit must not part equivalent donors.
  for (Donor& donor : donors) {
    const auto first = std::find_if(donors.begin(), donors.end(), [&](const Donor& other) {
      return other.first_equivalent == donor.first_equivalent;
    });
    donor.opposite = first->opposite;
    donor.opposite_element = first->opposite_element;
  }
  return donors;
}

// The middle of the widest gap in the distances, if it is wide enough.
std::optional<double> length_limit(const std::vector<MetalBond>& bonds) {
  std::vector<double> distances;
  for (const MetalBond& bond : bonds) distances.push_back(bond.distance_angstrom);
  std::sort(distances.begin(), distances.end());
  std::optional<double> limit;
  double widest = length_gap_angstrom;
  for (std::size_t i = 1; i < distances.size(); ++i) {
    const double gap = distances[i] - distances[i - 1];
    if (gap <= widest + rounding) continue;
    widest = gap;
    limit = 0.5 * (distances[i] + distances[i - 1]);
  }
  return limit;
}

void add_type(BondType type, std::vector<BondType>& types) {
  const std::optional<double> limit = length_limit(type.bonds);
  if (!limit) {
    types.push_back(std::move(type));
    return;
  }
  const auto first_long =
      std::stable_partition(type.bonds.begin(), type.bonds.end(),
                            [&](const MetalBond& bond) { return bond.distance_angstrom < *limit; });
  BondType far = type;
  far.length = BondLength::Long;
  far.bonds.assign(first_long, type.bonds.end());
  type.length = BondLength::Short;
  type.bonds.erase(first_long, type.bonds.end());
  types.push_back(std::move(type));
  types.push_back(std::move(far));
}

std::string elements_text(std::vector<int> elements) {
  std::vector<std::string> symbols;
  for (const int z : elements) symbols.emplace_back(element_symbol(z));
  std::sort(symbols.begin(), symbols.end());
  symbols.erase(std::unique(symbols.begin(), symbols.end()), symbols.end());
  std::string text;
  for (const std::string& symbol : symbols) text += (text.empty() ? "" : ", ") + symbol;
  return text;
}

}  // namespace

const char* opposite_word(Opposite opposite) {
  switch (opposite) {
    case Opposite::None:
      return "none";
    case Opposite::Like:
      return "like";
    case Opposite::Other:
      return "other";
  }
  return "";
}

const char* length_word(BondLength length) {
  switch (length) {
    case BondLength::Alike:
      return "alike";
    case BondLength::Short:
      return "short";
    case BondLength::Long:
      return "long";
  }
  return "";
}

double BondType::overlap_population() const {
  double sum = 0.0;
  for (const MetalBond& bond : bonds) sum += bond.overlap_population;
  return sum / static_cast<double>(bonds.size());
}

double BondType::distance_angstrom() const {
  double sum = 0.0;
  for (const MetalBond& bond : bonds) sum += bond.distance_angstrom;
  return sum / static_cast<double>(bonds.size());
}

std::string ligand_formula(const Molecule& molecule, int donor) {
  std::vector<bool> seen(molecule.atoms().size(), false);
  for (const int metal : centre_atoms(molecule)) seen[static_cast<std::size_t>(metal)] = true;
  std::vector<int> reached = {donor};
  seen[static_cast<std::size_t>(donor)] = true;
  for (std::size_t next = 0; next < reached.size(); ++next) {
    for (const int atom : bonded_atoms(molecule, reached[next])) {
      if (seen[static_cast<std::size_t>(atom)]) continue;
      seen[static_cast<std::size_t>(atom)] = true;
      reached.push_back(atom);
    }
  }
  std::vector<Atom> atoms;
  for (const int atom : reached) atoms.push_back(molecule.atoms()[static_cast<std::size_t>(atom)]);
  return hill_formula(Molecule(std::move(atoms), 0));
}

std::vector<BondType> bond_types(const MolecularSymmetry& symmetry, const Populations& populations,
                                 int metal) {
  std::vector<Donor> left = donors_of(symmetry, populations, metal);
  std::vector<BondType> types;
  while (!left.empty()) {
    const Donor first = left.front();
    BondType type{std::string(element_symbol(first.kind.element)),
                  first.kind.ligand,
                  first.kind.bridging,
                  first.opposite,
                  {},
                  BondLength::Alike,
                  {}};
    std::vector<Donor> rest;
    std::vector<int> across;
    for (Donor& donor : left) {
      if (donor.kind == first.kind && donor.opposite == first.opposite) {
        type.bonds.push_back(donor.bond);
        if (donor.opposite != Opposite::None) across.push_back(donor.opposite_element);
      } else {
        rest.push_back(std::move(donor));
      }
    }
    type.opposite_element = elements_text(std::move(across));
    add_type(std::move(type), types);
    left = std::move(rest);
  }
  std::sort(types.begin(), types.end(), [](const BondType& a, const BondType& b) {
    return a.bonds.front().donor < b.bonds.front().donor;
  });
  return types;
}

}  // namespace irrepwise
