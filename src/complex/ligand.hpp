// Ligands as the library holds them: atoms in a frame of their own, and how they bind.
#pragma once

#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// One way in which a ligand binds a metal.
struct Binding {
  // For each tooth its donor atoms, indices from 0; several in one tooth bind side by side.
  std::vector<std::vector<int>> teeth;
  int electrons = 0;                         // the metal counts from it, closed shells
  Eigen::Vector3d metal = {0.0, 0.0, -2.0};  // about where the metal is, Å, ligand's frame

  [[nodiscard]] int denticity() const { return static_cast<int>(teeth.size()); }
  [[nodiscard]] int hapticity() const { return static_cast<int>(teeth.front().size()); }
};

struct Ligand {
  std::string name;                // the key, as jobs write it: "NH3"
  std::vector<std::string> names;  // other names: "ammine"
  int charge = 0;                  // of the free ligand with closed shells
  std::vector<Atom> atoms;
  std::vector<Binding> bindings;          // the usual one first; at least one
  std::optional<int> bridging_electrons;  // for each of two metals that it bridges
  // Of a bridge: middle of the metals, donor, next atom; as when terminal where absent.
  std::optional<double> bridging_angle_degrees;
  double bridging_shortening_angstrom = 0.0;  // of each bond of a bridge, below the sum of radii
  double shortening_angstrom = 0.0;           // of the bond to the metal, below the sum of radii
  std::string shortening_source;
  std::string geometry;  // lengths and angles in words
  std::string source;
  std::map<std::string, std::vector<double>> lengths;  // "C-O" -> Å, where no sum of radii
};

/// Ligands by name. Always valid: each has atoms, a binding, and names that no other has.
class LigandLibrary {
 public:
  /// @throws Error  two ligands share a name
  explicit LigandLibrary(std::vector<Ligand> ligands);

  [[nodiscard]] const std::vector<Ligand>& ligands() const noexcept { return ligands_; }

  /// @param name    the key or another name; any case where that is unambiguous
  /// @throws Error  with the nearest names
  [[nodiscard]] const Ligand& find(std::string_view name) const;

  /// @returns  this library with the ligands of another added; those of the same key replaced
  /// @throws Error  a name of a new ligand is one of an old
  [[nodiscard]] LigandLibrary extended_by(const LigandLibrary& other) const;

 private:
  std::vector<Ligand> ligands_;
};

/// params/ligands.yaml, compiled into the program.
[[nodiscard]] const LigandLibrary& built_in_ligands();

/// @param file_name  how messages call the text
/// @throws Error     with file, line and column
[[nodiscard]] LigandLibrary parse_ligands(std::string_view yaml, const std::string& file_name);
[[nodiscard]] LigandLibrary read_ligands(const std::string& path);

}  // namespace irrepwise
