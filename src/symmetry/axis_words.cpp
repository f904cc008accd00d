#include "symmetry/axis_words.hpp"

#include <cmath>

#include <fmt/format.h>
#include <Eigen/Geometry>

#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr double on_element = 1e-4;  // Å; coordinates are exact here
constexpr std::size_t most_names = 6;

template <typename Distance>
std::string through_atoms(const Molecule& molecule, Distance distance) {
  std::vector<std::string> names;
  for (int i = 0; i < molecule.size(); ++i) {
    if (distance(molecule.atoms()[i].position) < on_element)
      names.push_back(atom_name(molecule, i));
  }
  if (names.empty()) return "";
  if (names.size() == static_cast<std::size_t>(molecule.size()) && names.size() > 2) {
    return " through all atoms";
  }
  if (names.size() > most_names + 1) {  // "1 more" is as long as a name
    const std::size_t more = names.size() - most_names;
    names.resize(most_names);
    return fmt::format(" through {} and {} more", fmt::join(names, ", "), more);
  }
  return " through " + joined(names);
}

std::string axis_phrase(const char* name, const std::string& symbol, const Molecule& molecule,
                        const Eigen::Vector3d& axis) {
  return fmt::format(
      "{} = {}{}", name, symbol,
      through_atoms(molecule, [&](const Eigen::Vector3d& r) { return axis.cross(r).norm(); }));
}

std::string plane_phrase(const char* name, const std::string& symbol, const Molecule& molecule,
                         const Eigen::Vector3d& normal) {
  return fmt::format(
      "{} = {}{}", name, symbol,
      through_atoms(molecule, [&](const Eigen::Vector3d& r) { return std::abs(normal.dot(r)); }));
}

// Cn, Cnh, S2n: x was laid towards an atom; which one is found again by its direction.
std::string towards_phrase(const Molecule& molecule) {
  std::string nearest;
  double best = 0.0;
  int best_number = 0;
  for (int i = 0; i < molecule.size(); ++i) {
    const Eigen::Vector3d& r = molecule.atoms()[i].position;
    const bool on_x = r[0] > on_element && std::abs(r[1]) < on_element;
    const int number = molecule.atoms()[i].atomic_number;
    if (on_x && (number > best_number || (number == best_number && r[0] < best - on_element))) {
      nearest = atom_name(molecule, i);
      best = r[0];
      best_number = number;
    }
  }
  return nearest.empty() ? "" : "x towards " + nearest;
}

}  // namespace

std::vector<std::string> axis_words(const PointGroup& group, const Molecule& molecule) {
  const Schoenflies& symbol = group.symbol();
  const Eigen::Vector3d x = Eigen::Vector3d::UnitX(), y = Eigen::Vector3d::UnitY(),
                        z = Eigen::Vector3d::UnitZ();
  const std::string principal = fmt::format("C{}", symbol.n);
  std::vector<std::string> words;
  const auto cubic = [&](const char* kind) {
    words = {axis_phrase("x", kind, molecule, x), axis_phrase("y", kind, molecule, y),
             axis_phrase("z", kind, molecule, z)};
  };
  switch (symbol.family) {
    case Family::C1:
    case Family::Ci:
    case Family::Kh:
      words = {"as in the input"};
      break;
    case Family::Cs:
      words = {plane_phrase("xy", "mirror plane", molecule, z)};
      break;
    case Family::Cinfv:
    case Family::Dinfh:
      words = {"z = molecular axis"};
      break;
    case Family::T:
    case Family::Th:
      cubic("C2");
      break;
    case Family::Td:
      cubic("S4");
      break;
    case Family::O:
    case Family::Oh:
      cubic("C4");
      break;
    case Family::I:
    case Family::Ih:
      cubic("C2");
      words.push_back("a C5 in the yz plane along (0, 1, 1.618)");
      break;
    case Family::Cn:
    case Family::Cnh:
    case Family::S2n: {
      const std::string kind =
          symbol.family == Family::S2n ? fmt::format("S{}", 2 * symbol.n) : principal;
      words = {axis_phrase("z", kind, molecule, z)};
      if (const std::string towards = towards_phrase(molecule); !towards.empty()) {
        words.push_back(towards);
      }
      break;
    }
    case Family::Cnv:
      words = {axis_phrase("z", principal, molecule, z)};
      if (symbol.n == 2) {
        words.push_back(plane_phrase("yz", "mirror plane", molecule, x));
      } else {
        words.push_back(plane_phrase("xz", "σv", molecule, y));
      }
      break;
    case Family::Dn:
    case Family::Dnh:
      words = {axis_phrase("z", principal, molecule, z)};
      if (symbol.n == 2) {
        words.push_back(axis_phrase("y", "C2", molecule, y));
        words.push_back(axis_phrase("x", "C2", molecule, x));
      } else {
        words.push_back(axis_phrase("x", "C2'", molecule, x));
      }
      break;
    case Family::Dnd:
      words = {
          axis_phrase("z", symbol.n == 2 ? "S4" : fmt::format("C{} (S{})", symbol.n, 2 * symbol.n),
                      molecule, z),
          axis_phrase("x", "C2'", molecule, x)};
      break;
  }
  return words;
}

}  // namespace irrepwise
