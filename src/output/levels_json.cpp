#include "output/levels_json.hpp"

#include <nlohmann/json.hpp>

#include "hueckel/dense.hpp"
#include "molecule/element.hpp"
#include "output/composition.hpp"
#include "output/json_text.hpp"

namespace irrepwise {
namespace {

constexpr double smallest_share = 1e-4;

Json vector_json(const Eigen::Ref<const Eigen::VectorXd>& values) {
  Json list = Json::array();
  for (const double value : values) list.push_back(finite_number(value));
  return list;
}

Json matrix_json(const Eigen::Ref<const Eigen::MatrixXd>& matrix) {
  Json rows = Json::array();
  for (Eigen::Index i = 0; i < matrix.rows(); ++i) {
    rows.push_back(vector_json(matrix.row(i).transpose()));
  }
  return rows;
}

Json symmetry_json(const MolecularSymmetry& symmetry) {
  return {{"tolerance_angstrom", finite_number(symmetry.tolerance_angstrom)},
          {"largest_shift_angstrom", finite_number(symmetry.largest_shift_angstrom)},
          {"rms_shift_angstrom", finite_number(symmetry.rms_shift_angstrom)},
          {"rotation", matrix_json(symmetry.rotation)},
          {"origin", vector_json(symmetry.origin)},
          {"axes", symmetry.axes},
          {"full_group",
           symmetry.full_group.empty() ? symmetry.group.symbol().name() : symmetry.full_group}};
}

Json method_json(const LevelsResult& result) {
  return {{"rule", rule_name(result.levels.rule)},
          {"k", result.levels.k ? Json(finite_number(*result.levels.k)) : Json(nullptr)},
          {"parameter_set", result.parameter_set}};
}

Json composition_json(const LevelsResult& result, int level) {
  Json list = Json::array();
  for (const OrbitalShare& share : orbital_shares(result, level, smallest_share)) {
    const Shell& shell = result.basis.shells[static_cast<std::size_t>(share.shell)];
    const Atom& atom = result.molecule.atoms()[static_cast<std::size_t>(shell.atom)];
    list.push_back({{"atom", shell.atom + 1},
                    {"element", element_symbol(atom.atomic_number)},
                    {"orbital", shell_orbital_name(shell, share.orbital - shell.first_orbital)},
                    {"share", finite_number(share.share)}});
  }
  return list;
}

Json orbitals_json(const LevelsResult& result, const LevelsJsonParts& parts) {
  const PointGroup& group = result.symmetry.group;
  Json list = Json::array();
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    const Level& level = result.levels.levels[i];
    const Irrep& irrep = group.irreps()[static_cast<std::size_t>(level.irrep)];
    Json entry = {{"label", level_name(group, level)},
                  {"irrep", level_label(irrep.label)},
                  {"number", level.number},
                  {"degeneracy", level.degeneracy},
                  {"energy_ev", finite_number(level.energy_ev)},
                  {"occupation", finite_number(level.occupation)},
                  {"composition", composition_json(result, static_cast<int>(i))}};
    if (parts.coefficients) {
      entry["coefficients"] =
          matrix_json(input_frame_orbitals(result, static_cast<int>(i)).transpose());
    }
    list.push_back(std::move(entry));
  }
  return list;
}

Json frontier_json(const LevelsResult& result) {
  const Frontier& frontier = result.levels.frontier;
  const auto level = [&](const std::optional<int>& index) {
    return index ? &result.levels.levels[static_cast<std::size_t>(*index)] : nullptr;
  };
  const Level* homo = level(frontier.homo);
  const Level* lumo = level(frontier.lumo);
  const PointGroup& group = result.symmetry.group;
  const auto label = [&](const Level* l) {
    return l ? Json(level_name(group, *l)) : Json(nullptr);
  };
  const auto energy = [](const Level* l) {
    return l ? Json(finite_number(l->energy_ev)) : Json(nullptr);
  };
  return {{"homo", label(homo)},
          {"lumo", label(lumo)},
          {"homo_ev", energy(homo)},
          {"lumo_ev", energy(lumo)},
          {"gap_ev",
           homo && lumo ? Json(finite_number(lumo->energy_ev - homo->energy_ev)) : Json(nullptr)},
          {"open_shell", frontier.open_shell}};
}

Json gross_by_orbital_json(const LevelsResult& result, int atom) {
  Json gross = Json::object();
  const auto at = static_cast<std::size_t>(atom);
  for (int s = result.basis.first_shell[at]; s < result.basis.first_shell[at + 1]; ++s) {
    const Shell& shell = result.basis.shells[static_cast<std::size_t>(s)];
    for (int m = 0; m < shell.size(); ++m) {
      gross[shell_orbital_name(shell, m)] =
          finite_number(result.populations.gross_by_orbital[shell.first_orbital + m]);
    }
  }
  return gross;
}

Json atoms_json(const LevelsResult& result, const Molecule& computed) {
  Json list = Json::array();
  for (int i = 0; i < computed.size(); ++i) {
    const Atom& atom = computed.atoms()[static_cast<std::size_t>(i)];
    list.push_back({{"index", i + 1},
                    {"element", element_symbol(atom.atomic_number)},
                    {"x", finite_number(atom.position.x())},
                    {"y", finite_number(atom.position.y())},
                    {"z", finite_number(atom.position.z())},
                    {"charge", finite_number(result.populations.charge[i])},
                    {"gross_population", finite_number(result.populations.gross_by_atom[i])},
                    {"gross_by_orbital", gross_by_orbital_json(result, i)}});
  }
  return list;
}

Json overlap_populations_json(const Populations& populations) {
  Json list = Json::array();
  for (const OverlapPopulation& pair : populations.overlap_populations) {
    list.push_back({{"atoms", {pair.atom_a + 1, pair.atom_b + 1}},
                    {"distance_angstrom", finite_number(pair.distance_angstrom)},
                    {"value", finite_number(pair.value)},
                    {"bonded", pair.bonded}});
  }
  return list;
}

Json matrices_json(const LevelsResult& result, const Molecule& computed) {
  const DenseMatrices dense =
      dense_matrices(computed, result.basis, result.levels.rule, result.levels.k);
  return {{"overlap", matrix_json(dense.overlap)},
          {"hamiltonian_ev", matrix_json(dense.hamiltonian_ev)}};
}

Json orbital_titles_json(const LevelsResult& result) {
  Json titles = Json::array();
  for (int i = 0; i < result.basis.n_orbitals; ++i) {
    titles.push_back(orbital_title(result.molecule, result.basis, i));
  }
  return titles;
}

}  // namespace

std::string levels_json(const LevelsResult& result, const LevelsJsonParts& parts) {
  const Molecule computed = computed_molecule(result);
  Json document = {{"schema", "irrepwise.levels.1"},
                   {"title", result.title},
                   {"formula", hill_formula(result.molecule)},
                   {"charge", result.molecule.charge()},
                   {"electrons", result.levels.electrons},
                   {"point_group", result.symmetry.group.symbol().name()},
                   {"symmetry", symmetry_json(result.symmetry)},
                   {"method", method_json(result)},
                   {"orbitals", orbitals_json(result, parts)},
                   {"frontier", frontier_json(result)},
                   {"atoms", atoms_json(result, computed)},
                   {"overlap_populations", overlap_populations_json(result.populations)},
                   {"sum_of_occupied_ev", finite_number(result.levels.sum_of_occupied_ev)},
                   {"warnings", result.warnings}};
  if (parts.matrices || parts.coefficients) {
    document["matrices"] = Json{{"orbitals", orbital_titles_json(result)}};
    if (parts.matrices) document["matrices"].update(matrices_json(result, computed));
  }
  return json_text(document);
}

}  // namespace irrepwise
