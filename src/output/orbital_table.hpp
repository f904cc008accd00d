// Orbital coefficients or shares of chosen levels, over atomic orbitals or over SALCs, as numbers.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "output/equivalence.hpp"
#include "output/levels_result.hpp"
#include "output/orbital_choice.hpp"
#include "salc/salc_table.hpp"

namespace irrepwise {

enum class TableEntries { Coefficients, Shares };
enum class TableFunctions { Orbitals, Salcs };

struct OrbitalTableOptions {
  TableEntries entries = TableEntries::Coefficients;
  TableFunctions functions = TableFunctions::Orbitals;
  OrbitalFrame frame = OrbitalFrame::Standard;
};

/// An atomic orbital, or a SALC.
struct TableFunction {
  int set = 0;              // index in the sets of atoms
  std::optional<int> atom;  // of an atomic orbital
  OrbitalFrame frame = OrbitalFrame::Standard;
  std::string name;   // "5dx2-y2", "3pσ"; of a SALC "3p", "5dxz, 5dyz" on a single atom
  int irrep = 0;      // of a SALC
  int number = 1;     // of a SALC: of those of the same name and irrep
  int of_number = 1;  // and how many there are
  int partner = 0;    // of a SALC of a complex pair: 1 or 2; otherwise 0
};

/// A partner of a level; over SALCs, where all partners are alike, the level as a whole.
struct TableOrbital {
  OrbitalChoice choice;
  std::string name;  // "2b2g", "2eg:1"; over SALCs "2eg", and "1e:1" for a complex pair
};

struct OrbitalTable {
  OrbitalTableOptions options;
  std::vector<AtomSet> sets;
  std::vector<TableFunction> functions;
  std::vector<TableOrbital> orbitals;
  Eigen::MatrixXd coefficients;  // `n_functions x n_orbitals`, with overlap: c^T S c = 1
  Eigen::MatrixXd shares;        // the same shape, Mulliken's; columns sum to 1
  std::string centre_words;      // what local frames point to: "Pt1"; empty without any
  std::string frame_sentences;   // more about them, see `further_frame_sentences`
};

/// @param choices  over SALCs, a level counts once, whichever partner is chosen; functions of other
///                 irreps than a level's have zeros
/// @throws Error   for local frames where no atom has one
[[nodiscard]] OrbitalTable orbital_table(const LevelsResult& result,
                                         const std::vector<OrbitalChoice>& choices,
                                         const OrbitalTableOptions& options);

}  // namespace irrepwise
