#include "output/orbital_table.hpp"

#include <algorithm>
#include <cmath>
#include <tuple>

#include <fmt/format.h>

#include "analysis/level_coefficients.hpp"
#include "core/error.hpp"
#include "output/caption_words.hpp"
#include "salc/orbital_reductions.hpp"

namespace irrepwise {
namespace {

// What the functions are written in.
struct Frames {
  std::vector<EquivalentAtoms> sets;
  std::vector<std::optional<LocalFrames>> by_set;  // all empty for the standard frame
};

Frames frames_for(const LevelsResult& result, OrbitalFrame frame) {
  Frames frames;
  frames.sets = equivalent_atoms(result.symmetry);
  if (frame == OrbitalFrame::Local) {
    frames.by_set = frames_of_sets(result.symmetry, frames.sets);
  } else {
    frames.by_set.resize(frames.sets.size());
  }
  const bool any = std::any_of(frames.by_set.begin(), frames.by_set.end(),
                               [](const auto& local) { return local.has_value(); });
  if (frame == OrbitalFrame::Local && !any) {
    throw Error(
        "no atom has a local frame: the molecule has neither a central atom nor several "
        "metals; "
        "use the standard frame");
  }
  return frames;
}

LevelCoefficients in_frames(const LevelsResult& result, const Frames& frames, int level) {
  return in_local_frames(level_coefficients(result.symmetry, result.basis, result.levels, level),
                         result.basis, frames.sets, frames.by_set);
}

std::vector<TableFunction> atomic_functions(const LevelsResult& result, const Frames& frames,
                                            const std::vector<AtomSet>& sets,
                                            std::vector<int>& basis_orbitals) {
  std::vector<TableFunction> functions;
  for (std::size_t set = 0; set < sets.size(); ++set) {
    const OrbitalFrame frame = orbital_frame(frames.by_set[set]);
    for (const int atom : sets[set].atoms) {
      const auto at = static_cast<std::size_t>(atom);
      for (int s = result.basis.first_shell[at]; s < result.basis.first_shell[at + 1]; ++s) {
        const Shell& shell = result.basis.shells[static_cast<std::size_t>(s)];
        for (int m = 0; m < shell.size(); ++m) {
          TableFunction function;
          function.set = static_cast<int>(set);
          function.atom = atom;
          function.frame = frame;
          function.name = salc_orbital_name(shell, m, frame);
          functions.push_back(std::move(function));
          basis_orbitals.push_back(shell.first_orbital + m);
        }
      }
    }
  }
  return functions;
}

// On a single atom every partner is an orbital, or nearly; "5dxz, 5dyz" says more than "5d".
std::string single_atom_name(const std::vector<const SalcFunction*>& partners, const Shell& shell) {
  constexpr double nothing = 1e-9;
  std::string name;
  for (const SalcFunction* salc : partners) {
    int found = -1;
    for (Eigen::Index c = 0; c < salc->coefficients.cols(); ++c) {
      if (std::abs(salc->coefficients(0, c)) < nothing) continue;
      if (found >= 0) return {};
      found = salc->components[static_cast<std::size_t>(c)];
    }
    if (found < 0) return {};
    name += (name.empty() ? "" : ", ") + salc_orbital_name(shell, found, salc->frame);
  }
  return name;
}

std::string salc_name(const std::vector<const SalcFunction*>& partners, const Shell& shell,
                      int atoms) {
  if (atoms == 1) {
    const std::string name = single_atom_name(partners, shell);
    if (!name.empty()) return name;
  }
  const SalcFunction& salc = *partners.front();
  if (salc.part == Part::FacePlane) return fmt::format("{}p(r,t)", shell.n());
  const bool named_part =
      salc.part == Part::FacePi || (salc.frame == OrbitalFrame::Local && shell.l > 0);
  return fmt::format("{}{}{}", shell.n(), shell_letter(shell.l),
                     named_part ? part_name(salc.part) : "");
}

bool same_family(const SalcFunction& a, const SalcFunction& b) {
  return std::tie(a.set, a.shell, a.part, a.irrep) == std::tie(b.set, b.shell, b.part, b.irrep);
}

// The SALCs of one irrep that a table lists, and what it calls them. All partners of a SALC are
// alike but for a complex pair, where both are listed.
void add_salcs(const LevelsResult& result, const Frames& frames,
               const std::vector<SalcFunction>& all, int irrep,
               std::vector<TableFunction>& functions, std::vector<SalcFunction>& salcs) {
  const bool pair = result.symmetry.group.irreps()[static_cast<std::size_t>(irrep)].complex_pair;
  for (const SalcFunction& salc : all) {
    if (salc.irrep != irrep || (salc.partner > 1 && !pair)) continue;
    std::vector<const SalcFunction*> partners;
    TableFunction function;
    for (const SalcFunction& other : all) {
      if (!same_family(other, salc)) continue;
      function.of_number = std::max(function.of_number, other.number);
      if (other.number == salc.number && (!pair || other.partner == salc.partner)) {
        partners.push_back(&other);
      }
    }
    const Shell& shell = result.basis.shells[static_cast<std::size_t>(salc.shell)];
    function.set = salc.set;
    function.frame = salc.frame;
    function.name =
        salc_name(partners, shell, frames.sets[static_cast<std::size_t>(salc.set)].size());
    function.irrep = irrep;
    function.number = salc.number;
    function.partner = pair ? salc.partner : 0;
    functions.push_back(std::move(function));
    salcs.push_back(salc);
  }
}

OrbitalTable over_orbitals(const LevelsResult& result, const Frames& frames,
                           const std::vector<OrbitalChoice>& choices, OrbitalTable table) {
  std::vector<int> basis_orbitals;
  table.functions = atomic_functions(result, frames, table.sets, basis_orbitals);
  const auto rows = static_cast<Eigen::Index>(table.functions.size());
  const auto columns = static_cast<Eigen::Index>(choices.size());
  table.coefficients.resize(rows, columns);
  table.shares.resize(rows, columns);
  int level = -1;
  LevelCoefficients found;
  for (Eigen::Index column = 0; column < columns; ++column) {
    const OrbitalChoice& choice = choices[static_cast<std::size_t>(column)];
    if (choice.level != level) found = in_frames(result, frames, choice.level);
    level = choice.level;
    table.orbitals.push_back(
        {choice, orbital_choice_name(result.symmetry.group, result.levels, choice)});
    const Eigen::VectorXd share = found.shares().col(choice.partner);
    for (Eigen::Index row = 0; row < rows; ++row) {
      const int orbital = basis_orbitals[static_cast<std::size_t>(row)];
      table.coefficients(row, column) = found.coefficients(orbital, choice.partner);
      table.shares(row, column) = share[orbital];
    }
  }
  return table;
}

OrbitalTable over_salc_functions(const LevelsResult& result, const Frames& frames,
                                 const std::vector<OrbitalChoice>& choices, OrbitalTable table) {
  const PointGroup& group = result.symmetry.group;
  const auto irrep_of = [&](int level) {
    return result.levels.levels[static_cast<std::size_t>(level)].irrep;
  };
  std::vector<int> irreps;
  for (const OrbitalChoice& choice : choices) {
    const int irrep = irrep_of(choice.level);
    if (std::find(irreps.begin(), irreps.end(), irrep) == irreps.end()) irreps.push_back(irrep);
    const bool pair = group.irreps()[static_cast<std::size_t>(irrep)].complex_pair;
    const OrbitalChoice column{choice.level, pair ? choice.partner : 0};
    const bool known =
        std::any_of(table.orbitals.begin(), table.orbitals.end(), [&](const TableOrbital& orbital) {
          return orbital.choice.level == column.level && orbital.choice.partner == column.partner;
        });
    if (known) continue;
    const Level& level = result.levels.levels[static_cast<std::size_t>(choice.level)];
    table.orbitals.push_back({column, pair ? orbital_choice_name(group, result.levels, column)
                                           : level_name(group, level)});
  }
  const std::vector<SalcFunction> all =
      salc_table(result.symmetry, result.basis, frames.sets, frames.by_set);
  std::vector<SalcFunction> salcs;
  for (const int irrep : irreps) add_salcs(result, frames, all, irrep, table.functions, salcs);

  const auto rows = static_cast<Eigen::Index>(salcs.size());
  const auto columns = static_cast<Eigen::Index>(table.orbitals.size());
  table.coefficients.resize(rows, columns);
  table.shares.resize(rows, columns);
  for (Eigen::Index column = 0; column < columns; ++column) {
    const OrbitalChoice& choice = table.orbitals[static_cast<std::size_t>(column)].choice;
    const LevelCoefficients found =
        over_salcs(in_frames(result, frames, choice.level), result.basis, frames.sets, salcs);
    const Eigen::MatrixXd shares = found.shares();
    for (Eigen::Index row = 0; row < rows; ++row) {
      const bool same = salcs[static_cast<std::size_t>(row)].irrep == irrep_of(choice.level);
      table.coefficients(row, column) = same ? found.coefficients(row, choice.partner) : 0.0;
      table.shares(row, column) = same ? shares(row, choice.partner) : 0.0;
    }
  }
  return table;
}

}  // namespace

OrbitalTable orbital_table(const LevelsResult& result, const std::vector<OrbitalChoice>& choices,
                           const OrbitalTableOptions& options) {
  const Frames frames = frames_for(result, options.frame);
  OrbitalTable table;
  table.options = options;
  table.sets = atom_sets(result.symmetry);
  if (options.frame == OrbitalFrame::Local) {
    const std::optional<Centre> centre = find_centre(result.symmetry);
    table.centre_words = frame_goal_words(result.symmetry.molecule, frames.by_set,
                                          centre ? centre->atom : std::nullopt);
    table.frame_sentences = further_frame_sentences(frames.by_set);
  }
  return options.functions == TableFunctions::Orbitals
             ? over_orbitals(result, frames, choices, std::move(table))
             : over_salc_functions(result, frames, choices, std::move(table));
}

}  // namespace irrepwise
