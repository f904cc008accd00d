#include "complex/clash.hpp"

#include <cstddef>
#include <limits>
#include <utility>

#include "molecule/element.hpp"

namespace irrepwise {
namespace {

constexpr int hydrogen = 1;
constexpr double roomy = 1.3;
constexpr double radius_without_source_angstrom = 1.7;  // elements beyond curium

double radius(int element) {
  return covalent_radius_angstrom(element).value_or(radius_without_source_angstrom);
}

// A ligand, a bridge or a metal: atoms that are judged against those of the others only.
struct Group {
  const std::vector<Atom>* atoms = nullptr;
  std::vector<Eigen::Vector3d> positions;
  std::vector<bool> is_donor;
  const std::string* words = nullptr;
};

double limit_between(int a, int b) {
  if (a == hydrogen && b == hydrogen) return clash_hydrogens_angstrom;
  if (a == hydrogen || b == hydrogen) return clash_hydrogen_other_angstrom;
  return radius(a) + radius(b) + clash_beyond_radii_angstrom;
}

void keep_nearer(Contact& nearest, double distance, double limit, const std::string& first,
                 const std::string& second) {
  const double lack = roomy - distance / limit;
  if (lack > 0.0) nearest.crowding += lack * lack;
  if (distance / limit >= nearest.relative) return;
  nearest = {distance / limit, distance, limit, nearest.crowding, first, second};
}

void compare_groups(const Group& a, const Group& b, Contact& nearest) {
  for (std::size_t i = 0; i < a.positions.size(); ++i) {
    for (std::size_t j = 0; j < b.positions.size(); ++j) {
      const double limit = limit_between((*a.atoms)[i].atomic_number, (*b.atoms)[j].atomic_number);
      const double distance = (a.positions[i] - b.positions[j]).norm();
      keep_nearer(nearest, distance, limit, *a.words, *b.words);
    }
  }
}

void compare_with_metal(const Group& group, const Eigen::Vector3d& metal, int element,
                        bool holds_it, Contact& nearest) {
  for (std::size_t i = 0; i < group.positions.size(); ++i) {
    if (holds_it && group.is_donor[i]) continue;
    const double limit = radius((*group.atoms)[i].atomic_number) + radius(element);
    keep_nearer(nearest, (group.positions[i] - metal).norm(), limit, *group.words,
                std::string(element_symbol(element)));
  }
}

}  // namespace

Contact nearest_contact(const Assembly& assembly, const std::vector<int>& metals,
                        const std::vector<Pose>& poses) {
  Contact nearest;
  nearest.relative = std::numeric_limits<double>::infinity();
  std::vector<Group> groups;
  for (std::size_t i = 0; i < assembly.sites.size(); ++i) {
    const Site& site = assembly.sites[i];
    const Eigen::Vector3d& metal = assembly.metals[static_cast<std::size_t>(site.centre)];
    Group group{&site.body.atoms, posed(site.body.atoms, poses[i], metal),
                std::vector<bool>(site.body.atoms.size(), false), &site.words};
    for (const std::vector<int>& tooth : site.seated.binding->teeth) {
      for (const int donor : tooth) group.is_donor[static_cast<std::size_t>(donor)] = true;
    }
    for (std::size_t m = 0; m < metals.size(); ++m) {
      const bool holds_it = static_cast<int>(m) == site.centre;
      compare_with_metal(group, assembly.metals[m], metals[m], holds_it, nearest);
    }
    groups.push_back(std::move(group));
  }
  for (const PlacedBridge& bridge : assembly.bridges) {
    Group group{&bridge.ligand->atoms, bridge.positions,
                std::vector<bool>(bridge.positions.size(), false), &bridge.words};
    group.is_donor[static_cast<std::size_t>(bridge.ligand->bindings.front().teeth[0][0])] = true;
    for (std::size_t m = 0; m < metals.size(); ++m) {
      compare_with_metal(group, assembly.metals[m], metals[m], true, nearest);
    }
    groups.push_back(std::move(group));
  }
  for (std::size_t a = 0; a < groups.size(); ++a) {
    for (std::size_t b = 0; b < a; ++b) compare_groups(groups[b], groups[a], nearest);
  }
  if (metals.size() == 2) {
    keep_nearer(nearest, (assembly.metals[0] - assembly.metals[1]).norm(), clash_metals_angstrom,
                "the first metal", "the second metal");
  }
  return nearest;
}

}  // namespace irrepwise
