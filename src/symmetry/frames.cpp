#include "symmetry/frames.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <fmt/format.h>
#include <Eigen/Geometry>

#include "core/error_about.hpp"
#include "symmetry/frame_merit.hpp"
#include "symmetry/operation.hpp"
#include "symmetry/standard_operations.hpp"

namespace irrepwise {
namespace {

// Hand-drawn structures and rounded vectors: a wish within this angle of an axis means the axis.
constexpr double wish_degrees = 5.0;
const double wish_cosine = std::cos(wish_degrees * std::numbers::pi / 180.0);

Eigen::Matrix3d turned_over() { return Eigen::Vector3d(1, -1, -1).asDiagonal(); }

// The turn by the smallest angle that takes one direction to another.
Eigen::Matrix3d smallest_turn(const Eigen::Vector3d& from, const Eigen::Vector3d& to) {
  return Eigen::Quaterniond::FromTwoVectors(from, to).toRotationMatrix();
}

bool is_free(Family family) {
  return family == Family::C1 || family == Family::Ci || family == Family::Kh;
}

// Turns about z that bring x to the nearest of the heaviest atoms off the axis.
std::vector<Eigen::Matrix3d> turns_towards_atoms(const Molecule& molecule) {
  double best_distance = 0.0;
  int best_number = 0;
  std::vector<Eigen::Vector3d> towards;
  for (const Atom& atom : molecule.atoms()) {
    const Eigen::Vector3d across(atom.position[0], atom.position[1], 0.0);
    const double distance = across.norm();
    if (distance < 1e-4) continue;
    const bool heavier = atom.atomic_number > best_number;
    const bool same = atom.atomic_number == best_number;
    if (heavier || (same && distance < best_distance - 1e-6)) {
      towards.clear();
      best_number = atom.atomic_number;
      best_distance = distance;
    }
    if (atom.atomic_number == best_number && std::abs(distance - best_distance) <= 1e-6) {
      towards.push_back(across.normalized());
    }
  }
  std::vector<Eigen::Matrix3d> turns;
  for (const Eigen::Vector3d& x : towards) {
    Eigen::Matrix3d turn = Eigen::Matrix3d::Identity();
    turn.topLeftCorner<2, 2>() << x[0], x[1], -x[1], x[0];
    turns.push_back(turn);
  }
  if (turns.empty()) turns.push_back(Eigen::Matrix3d::Identity());
  return turns;
}

ErrorAbout not_an_axis(const char* name, const Schoenflies& symbol) {
  return ErrorAbout(
      name,
      fmt::format("the wanted {} axis is no axis that {} can have there (to within {}°); leave it "
                  "out, or choose "
                  "a symmetry axis that the conventions allow as {}",
                  name, symbol.name(), wish_degrees, name));
}

// z fixed up to its sign, x free: the wish, else an atom, else the smallest turn.
std::vector<Eigen::Matrix3d> free_turns(const Schoenflies& symbol, const Molecule& molecule,
                                        const Eigen::Matrix3d& rotation, const WantedAxes& wanted) {
  std::vector<Eigen::Matrix3d> found;
  for (const Eigen::Matrix3d& over :
       {Eigen::Matrix3d(Eigen::Matrix3d::Identity()), turned_over()}) {
    const Eigen::Matrix3d base = over * rotation;
    if (wanted.x) {
      const Eigen::Vector3d x = base * *wanted.x;
      if (x.head<2>().norm() < 0.1) throw not_an_axis("x", symbol);
      const Eigen::Vector2d unit = x.head<2>().normalized();
      Eigen::Matrix3d turn = Eigen::Matrix3d::Identity();
      turn.topLeftCorner<2, 2>() << unit[0], unit[1], -unit[1], unit[0];
      found.push_back(turn * base);
    } else if (symbol.family == Family::Cs || !symbol.is_finite()) {
      found.push_back(smallest_turn(base.row(2), Eigen::Vector3d::UnitZ()));
    } else {
      Molecule turned = molecule.with_positions(over * molecule.positions());
      for (const Eigen::Matrix3d& turn : turns_towards_atoms(turned)) found.push_back(turn * base);
    }
  }
  return found;
}

Eigen::Matrix3d wished_frame(const WantedAxes& wanted) {
  if (wanted.z && wanted.x) {
    Eigen::Matrix3d frame;
    frame.row(2) = *wanted.z;
    frame.row(0) = (*wanted.x - wanted.x->dot(*wanted.z) * *wanted.z).normalized();
    frame.row(1) = frame.row(2).transpose().cross(frame.row(0).transpose()).transpose();
    return frame;
  }
  if (wanted.z) return smallest_turn(*wanted.z, Eigen::Vector3d::UnitZ());
  if (wanted.x) return smallest_turn(*wanted.x, Eigen::Vector3d::UnitX());
  return Eigen::Matrix3d::Identity();
}

Eigen::Vector3d direction_of(const AxisDirection& wish, const char* name, const Molecule& molecule,
                             const Eigen::Vector3d& origin) {
  Eigen::Vector3d direction = Eigen::Vector3d::Zero();
  if (const auto* vector = std::get_if<Eigen::Vector3d>(&wish)) {
    direction = *vector;
  } else {
    const auto& atoms = std::get<std::vector<int>>(wish);
    for (int atom : atoms) {
      if (atom < 0 || atom >= molecule.size()) {
        throw ErrorAbout(
            name, fmt::format("the {} axis names atom {}; the molecule has atoms 1 to {}", name,
                              atom + 1, molecule.size()));
      }
    }
    const auto at = [&](std::size_t i) -> Eigen::Vector3d {
      return molecule.atoms()[atoms[i]].position;
    };
    if (atoms.size() == 1) direction = at(0) - origin;
    if (atoms.size() == 2) direction = at(1) - at(0);
    if (atoms.size() == 3) direction = (at(1) - at(0)).cross(at(2) - at(0));
  }
  if (!direction.allFinite() || direction.norm() < 1e-6) {
    throw ErrorAbout(
        name, fmt::format("the {} axis has no direction: a null vector, an atom at the origin, or "
                          "atoms on one line; name others",
                          name));
  }
  return direction.normalized();
}

}  // namespace

bool turns_freely(Family family) {
  return family == Family::Cs || family == Family::Cn || family == Family::Cnh ||
         family == Family::S2n || family == Family::Cinfv || family == Family::Dinfh;
}

std::vector<Eigen::Matrix3d> standard_turns(const Schoenflies& symbol) {
  switch (symbol.family) {
    case Family::T:
    case Family::Td:
    case Family::Th:
    case Family::O:
    case Family::Oh:
      return standard_operations({Family::O, 1});
    case Family::I:
    case Family::Ih:
      return standard_operations({Family::I, 1});
    case Family::Dn:
    case Family::Dnh:
      if (symbol.n == 2) return standard_operations({Family::O, 1});
      break;
    default:
      break;
  }
  return standard_operations({Family::Dn, 2 * symbol.n});
}

WantedAxes wanted_axes(const SymmetryOptions& options, const Molecule& molecule,
                       const Eigen::Vector3d& origin) {
  WantedAxes wanted;
  if (options.z) wanted.z = direction_of(*options.z, "z", molecule, origin);
  if (options.x) wanted.x = direction_of(*options.x, "x", molecule, origin);
  if (wanted.z && wanted.x && wanted.z->cross(*wanted.x).norm() < 0.1) {
    throw ErrorAbout("x",
                     "the x axis is parallel to the z axis; choose another x, or leave it out");
  }
  return wanted;
}

bool better_merit(const std::vector<double>& a, const std::vector<double>& b) {
  for (std::size_t i = 0; i < std::min(a.size(), b.size()); ++i) {
    const double scale = 1e-6 * std::max({1.0, std::abs(a[i]), std::abs(b[i])});
    if (a[i] > b[i] + scale) return true;
    if (a[i] < b[i] - scale) return false;
  }
  return false;
}

FrameChoice choose_frame(const Schoenflies& symbol, const Molecule& molecule,
                         const Eigen::Matrix3d& rotation, const WantedAxes& wanted) {
  if (is_free(symbol.family)) return {wished_frame(wanted), {}};

  std::vector<FrameChoice> choices;
  if (turns_freely(symbol.family)) {
    for (const Eigen::Matrix3d& frame : free_turns(symbol, molecule, rotation, wanted)) {
      choices.push_back({frame, {}});
    }
  } else {
    for (const Eigen::Matrix3d& turn : standard_turns(symbol)) {
      choices.push_back({turn * rotation, frame_merit(symbol, molecule, turn)});
    }
  }
  const auto drop_unless_along = [&](const std::optional<Eigen::Vector3d>& wish, int row,
                                     const char* name) {
    if (!wish) return;
    std::erase_if(choices, [&](const FrameChoice& choice) {
      return choice.rotation.row(row).dot(*wish) < wish_cosine;
    });
    if (choices.empty()) throw not_an_axis(name, symbol);
  };
  drop_unless_along(wanted.z, 2, "z");
  if (!turns_freely(symbol.family)) drop_unless_along(wanted.x, 0, "x");

  const FrameChoice* best = &choices.front();
  for (const FrameChoice& choice : choices) {
    if (better_merit(best->merit, choice.merit)) continue;
    if (better_merit(choice.merit, best->merit) ||
        choice.rotation.trace() > best->rotation.trace() + 1e-9) {
      best = &choice;
    }
  }
  return *best;
}

}  // namespace irrepwise
