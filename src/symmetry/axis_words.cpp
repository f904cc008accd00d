#include "symmetry/axis_words.hpp"

#include <algorithm>
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

// Where a direction points, for one that passes through no atom: towards atoms, or midway between
// two that the group exchanges, as they are seen along another axis.
std::string as_seen_along(const Molecule& molecule, const Eigen::Vector3d& direction, char view) {
  constexpr std::size_t most_in_line = 3;
  constexpr double same_angle = 1e-6;
  const Eigen::Vector3d eye = Eigen::Vector3d::Unit(view - 'x');
  const Eigen::Vector3d sideways = eye.cross(direction);
  const auto& atoms = molecule.atoms();
  std::vector<std::string> in_line;
  int nearest = -1;
  double least_angle = 0.0;
  for (int i = 0; i < molecule.size(); ++i) {
    const double ahead = direction.dot(atoms[i].position);
    const double beside = sideways.dot(atoms[i].position);
    if (ahead < on_element) continue;
    if (std::abs(beside) < on_element) in_line.push_back(atom_name(molecule, i));
    const double angle = std::atan2(std::abs(beside), ahead);
    const bool nearer = nearest < 0 || angle < least_angle - same_angle;
    const bool heavier = nearest >= 0 && angle < least_angle + same_angle &&
                         atoms[i].atomic_number > atoms[nearest].atomic_number;
    if (!nearer && !heavier) continue;
    nearest = i;
    least_angle = angle;
  }
  if (in_line.size() > most_in_line) in_line.resize(most_in_line);
  if (!in_line.empty()) return fmt::format(", towards {} seen along {}", joined(in_line), view);
  if (nearest < 0) return "";
  for (int i = 0; i < molecule.size(); ++i) {
    const Eigen::Vector3d& a = atoms[nearest].position;
    const Eigen::Vector3d& b = atoms[i].position;
    if (atoms[i].atomic_number == atoms[nearest].atomic_number &&
        std::abs(direction.dot(a - b)) < on_element && std::abs(sideways.dot(a + b)) < on_element) {
      return fmt::format(", midway between {} and {} seen along {}", atom_name(molecule, nearest),
                         atom_name(molecule, i), view);
    }
  }
  return "";
}

std::string axis_phrase(const char* name, const std::string& symbol, const Molecule& molecule,
                        const Eigen::Vector3d& axis) {
  return fmt::format(
      "{} = {}{}", name, symbol,
      through_atoms(molecule, [&](const Eigen::Vector3d& r) { return axis.cross(r).norm(); }));
}

// An axis that has others of its kind beside it, so that it needs more words where it passes
// through no atom but the central one.
std::string chosen_axis_phrase(const char* name, const std::string& symbol,
                               const Molecule& molecule, const Eigen::Vector3d& axis, char view) {
  const std::string phrase = axis_phrase(name, symbol, molecule, axis);
  const auto& atoms = molecule.atoms();
  const bool tells = std::any_of(atoms.begin(), atoms.end(), [&](const Atom& atom) {
    return axis.cross(atom.position).norm() < on_element && atom.position.norm() > on_element;
  });
  if (tells) return phrase;
  const bool across_plane = std::all_of(atoms.begin(), atoms.end(), [&](const Atom& atom) {
    return std::abs(axis.dot(atom.position)) < on_element;
  });
  if (across_plane && molecule.size() > 2) return phrase + ", across the plane of all atoms";
  return phrase + as_seen_along(molecule, axis, view);
}

std::string plane_phrase(const char* name, const std::string& symbol, const Molecule& molecule,
                         const Eigen::Vector3d& normal) {
  return fmt::format(
      "{} = {}{}", name, symbol,
      through_atoms(molecule, [&](const Eigen::Vector3d& r) { return std::abs(normal.dot(r)); }));
}

// Of a mirror plane that contains z and at most atoms on it: those apart from z tell where it lies.
std::string chosen_plane_phrase(const char* name, const std::string& symbol,
                                const Molecule& molecule, const Eigen::Vector3d& normal) {
  const Eigen::Vector3d z = Eigen::Vector3d::UnitZ();
  const bool tells =
      std::any_of(molecule.atoms().begin(), molecule.atoms().end(), [&](const Atom& atom) {
        return std::abs(normal.dot(atom.position)) < on_element &&
               z.cross(atom.position).norm() > on_element;
      });
  const std::string phrase = plane_phrase(name, symbol, molecule, normal);
  return tells ? phrase : phrase + as_seen_along(molecule, normal.cross(z).cwiseAbs(), 'z');
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
        words.push_back(chosen_plane_phrase("yz", "mirror plane", molecule, x));
      } else {
        words.push_back(chosen_plane_phrase("xz", "σv", molecule, y));
      }
      break;
    case Family::Dn:
    case Family::Dnh:
      if (symbol.n == 2) {
        words = {chosen_axis_phrase("z", "C2", molecule, z, 'x'),
                 chosen_axis_phrase("y", "C2", molecule, y, 'z'),
                 chosen_axis_phrase("x", "C2", molecule, x, 'z')};
      } else {
        words = {axis_phrase("z", principal, molecule, z),
                 chosen_axis_phrase("x", "C2'", molecule, x, 'z')};
      }
      break;
    case Family::Dnd:
      words = {
          axis_phrase("z", symbol.n == 2 ? "S4" : fmt::format("C{} (S{})", symbol.n, 2 * symbol.n),
                      molecule, z),
          chosen_axis_phrase("x", "C2'", molecule, x, 'z')};
      break;
  }
  return words;
}

}  // namespace irrepwise
