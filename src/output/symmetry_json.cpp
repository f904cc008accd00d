#include "output/symmetry_json.hpp"

#include <cmath>

#include <nlohmann/json.hpp>

#include "core/exact_number.hpp"
#include "output/character_tables.hpp"
#include "output/json_text.hpp"
#include "output/symmetry_words.hpp"
#include "symmetry/functions.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

Json counts_json(const Reduction& reduction) {
  Json counts = Json::object();
  for (const IrrepCount& part : reduction) counts[level_label(part.label)] = part.count;
  return counts;
}

// Rounding of the matrices kept out of characters that are whole or half numbers.
double tidy(double value) {
  constexpr double rounding = 1e-12;
  const double halves = std::round(2.0 * value) / 2.0;
  return finite_number(std::abs(value - halves) < rounding ? halves : value);
}

Json vector_json(const Eigen::Ref<const Eigen::VectorXd>& values) {
  Json list = Json::array();
  for (const double value : values) list.push_back(finite_number(value));
  return list;
}

Json numbers_from_one(const std::vector<int>& atoms) {
  Json list = Json::array();
  for (const int atom : atoms) list.push_back(atom + 1);
  return list;
}

Json classes_json(const PointGroup& group) {
  Json list = Json::array();
  for (const ConjugacyClass& conjugacy : group.classes()) {
    list.push_back({{"symbol", conjugacy.symbol}, {"size", conjugacy.operations.size()}});
  }
  return list;
}

Json irreps_json(const PointGroup& group) {
  Json list = Json::array();
  const auto functions = assign_functions(group);
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    const Irrep& irrep = group.irreps()[i];
    Json characters = Json::array(), complex = Json::array(), names = Json::array();
    for (const ConjugacyClass& conjugacy : group.classes()) {
      const int g = conjugacy.operations.front();
      characters.push_back(tidy(irrep.characters[g]));
      if (!irrep.complex_pair) continue;
      const std::complex<double> value = complex_character(irrep, g);
      complex.push_back({tidy(value.real()), tidy(value.imag())});
    }
    for (const FunctionSet& set : functions[i]) names.push_back(function_text(set));
    Json entry = {{"label", level_label(irrep.label)},
                  {"dimension", irrep.dimension},
                  {"complex_pair", irrep.complex_pair},
                  {"characters", std::move(characters)},
                  {"functions", std::move(names)}};
    if (irrep.complex_pair) entry["complex_characters"] = std::move(complex);
    list.push_back(std::move(entry));
  }
  return list;
}

Json term_json(const Term& term) {
  return {{"multiplicity", term.multiplicity},
          {"irrep", level_label(term.irrep)},
          {"dimension", term.dimension},
          {"count", term.count}};
}

Json terms_json(const std::vector<Term>& terms) {
  Json list = Json::array();
  for (const Term& term : terms) list.push_back(term_json(term));
  return list;
}

void add_group(Json& document, const PointGroup& group) {
  document["point_group"] = group.symbol().name();
  document["order"] = group.symbol().is_finite() ? Json(group.order()) : Json(nullptr);
  document["classes"] = classes_json(group);
  document["irreps"] = irreps_json(group);
}

void add_answers(Json& document, const PointGroup& group, const GroupAnswers& answers) {
  document["products"] = Json::array();
  for (const ProductAnswer& answer : answers.products) {
    Json entry = {{"product", factors_text(answer.factors)},
                  {"irreps", counts_json(answer.product)}};
    if (answer.has_parts) {
      entry["symmetric"] = counts_json(answer.symmetric);
      entry["antisymmetric"] = counts_json(answer.antisymmetric);
    }
    document["products"].push_back(std::move(entry));
  }
  document["configurations"] = Json::array();
  for (const TermsAnswer& answer : answers.terms) {
    document["configurations"].push_back(
        {{"configuration", answer.configuration}, {"terms", terms_json(answer.terms)}});
  }
  document["descents"] = Json::array();
  for (const DescentAnswer& descent : answers.descents) {
    Json correlation = Json::object();
    for (std::size_t i = 0; i < descent.times.size(); ++i) {
      correlation[level_label(group.irreps()[i].label)] =
          counts_json(reduction_of(descent.embedding.subgroup, descent.times[i]));
    }
    document["descents"].push_back({{"subgroup", descent.embedding.subgroup.symbol().name()},
                                    {"embedding", descent.embedding.name},
                                    {"correlation", std::move(correlation)}});
  }
}

Json operations_json(const SymmetryResult& result) {
  Json list = Json::array();
  const PointGroup& group = result.symmetry.group;
  for (const ConjugacyClass& conjugacy : group.classes()) {
    for (const int g : conjugacy.operations) {
      const SymmetryOperation operation = classify_operation(group.operations()[g]);
      Json matrix = Json::array();
      for (int row = 0; row < 3; ++row) {
        matrix.push_back(vector_json(group.operations()[g].row(row).transpose()));
      }
      list.push_back({{"symbol", operation_symbol(operation)},
                      {"class", conjugacy.symbol},
                      {"axis", vector_json(operation.axis)},
                      {"matrix", std::move(matrix)},
                      {"images", numbers_from_one(result.symmetry.images[g])}});
    }
  }
  return list;
}

Json reductions_json(const SymmetryResult& result) {
  Json list = Json::array();
  for (const OrbitalReduction& reduction : result.orbitals->reductions) {
    Json shells = Json::array();
    int l = 0;
    for (const int shell : reduction.shells) {
      const Shell& of = result.orbitals->basis.shells[shell];
      l = of.l;
      shells.push_back(std::to_string(of.n()) + shell_letter(of.l));
    }
    list.push_back({{"set", numbers_from_one(result.sets[reduction.set].atoms)},
                    {"part", part_key(reduction.part, l)},
                    {"shells", std::move(shells)},
                    {"orbitals", reduction.orbitals},
                    {"irreps", counts_json(reduction_of(result.symmetry.group, reduction.times))}});
  }
  return list;
}

Json bonding_json(const SymmetryResult& result) {
  Json list = Json::array();
  for (const BondingIrrep& row : bonding_by_irrep(result)) {
    Json on = Json::array();
    for (std::size_t s = 0; s < row.parts.size(); ++s) {
      if (row.parts[s].empty()) continue;
      on.push_back({{"set", numbers_from_one(result.sets[s].atoms)}, {"orbitals", row.parts[s]}});
    }
    list.push_back({{"irrep", level_label(result.symmetry.group.irreps()[row.irrep].label)},
                    {"can_bond", row.can_bond},
                    {"on", std::move(on)}});
  }
  return list;
}

Json salcs_json(const SymmetryResult& result) {
  Json list = Json::array();
  for (const SalcFunction& salc : result.orbitals->salcs) {
    const Shell& shell = result.orbitals->basis.shells[salc.shell];
    const std::vector<int>& atoms = result.sets[salc.set].atoms;
    Json coefficients = Json::array();
    for (std::size_t atom = 0; atom < atoms.size(); ++atom) {
      for (std::size_t i = 0; i < salc.components.size(); ++i) {
        const double value =
            salc.coefficients(static_cast<Eigen::Index>(atom), static_cast<Eigen::Index>(i));
        if (value == 0.0) continue;
        Json entry = {{"atom", atoms[atom] + 1},
                      {"orbital", salc_orbital_name(shell, salc.components[i], salc.frame)},
                      {"value", finite_number(value)}};
        if (const auto exact = exact_form(value)) entry["exact"] = *exact;
        coefficients.push_back(std::move(entry));
      }
    }
    list.push_back({{"irrep", level_label(result.symmetry.group.irreps()[salc.irrep].label)},
                    {"number", salc.number},
                    {"partner", salc.partner},
                    {"set", numbers_from_one(atoms)},
                    {"part", part_key(salc.part, shell.l)},
                    {"shell", std::to_string(shell.n()) + shell_letter(shell.l)},
                    {"frame", salc.frame == OrbitalFrame::Standard ? "standard" : "local"},
                    {"coefficients", std::move(coefficients)}});
  }
  return list;
}

const char* distortion_name(DistortionKind kind) {
  switch (kind) {
    case DistortionKind::None:
    case DistortionKind::Atom:
      return "none";
    case DistortionKind::JahnTeller:
      return "jahn-teller";
    case DistortionKind::RennerTeller:
      return "renner-teller";
  }
  return "";
}

void add_frontier(Json& document, const PointGroup& group, const FrontierSymmetry& frontier) {
  document["transitions"] = Json::array();
  for (const Transition& transition : frontier.transitions) {
    const auto& levels = frontier.levels.levels;
    document["transitions"].push_back({{"from", level_name(group, levels[transition.from])},
                                       {"to", level_name(group, levels[transition.to])},
                                       {"dipole_axes", transition.rule.dipole_axes},
                                       {"two_photon", transition.rule.two_photon}});
  }
  document["terms"] = terms_json(frontier.terms);
  document["ground_terms"] = Json::array();
  for (const GroundTerm& ground : frontier.ground) {
    Json entry = term_json(ground.term);
    entry["distortion"] = distortion_name(ground.distortion.kind);
    entry["modes"] = counts_json(ground.distortion.modes);
    document["ground_terms"].push_back(std::move(entry));
  }
}

enum class Relabel { Irreps, Classes };

Json changes_json(const std::vector<Relabelled>& changes, Relabel what) {
  const auto name = [&](const std::string& label) {
    return what == Relabel::Irreps ? level_label(label) : label;
  };
  Json list = Json::array();
  for (const Relabelled& change : changes) {
    list.push_back({{"default", name(change.before)}, {"here", name(change.after)}});
  }
  return list;
}

}  // namespace

std::string symmetry_json(const SymmetryResult& result, const SymmetryHeadings& headings) {
  const MolecularSymmetry& symmetry = result.symmetry;
  const PointGroup& group = symmetry.group;
  Json document = {{"schema", "irrepwise.symmetry.1"},
                   {"title", headings.title},
                   {"formula", hill_formula(result.molecule)},
                   {"charge", result.molecule.charge()}};
  add_group(document, group);
  document["full_group"] =
      symmetry.full_group.empty() ? group.symbol().name() : symmetry.full_group;
  document["tolerance_angstrom"] = finite_number(symmetry.tolerance_angstrom);
  document["largest_shift_angstrom"] = finite_number(symmetry.largest_shift_angstrom);
  document["rms_shift_angstrom"] = finite_number(symmetry.rms_shift_angstrom);
  document["ladder"] = Json::array();
  for (const Rung& rung : result.ladder) {
    document["ladder"].push_back({{"point_group", rung.group.name()},
                                  {"tolerance_angstrom", finite_number(rung.tolerance_angstrom)}});
  }
  document["limit_angstrom"] = finite_number(result.limit_angstrom);
  document["axes"] = symmetry.axes;
  document["relabelled"] = {
      {"irreps", changes_json(result.axis_effect.irreps, Relabel::Irreps)},
      {"classes", changes_json(result.axis_effect.classes, Relabel::Classes)}};
  document["operations"] = operations_json(result);
  document["equivalent_atoms"] = Json::array();
  for (const EquivalentAtoms& set : result.sets) {
    document["equivalent_atoms"].push_back(
        {{"atoms", numbers_from_one(set.atoms)}, {"site_group", site_symbol(group, set).name()}});
  }
  document["central_atom"] = result.central_atom ? Json(*result.central_atom + 1) : Json(nullptr);
  document["reductions"] = result.orbitals ? reductions_json(result) : Json::array();
  document["bonding"] = bonding_json(result);
  document["salcs"] = result.orbitals ? salcs_json(result) : Json::array();
  document["vibrations"] = counts_json(result.displacements.vibrations);
  if (result.frontier) {
    add_frontier(document, group, *result.frontier);
  } else {
    document["transitions"] = document["terms"] = document["ground_terms"] = Json::array();
  }
  add_answers(document, group, result.answers);
  document["warnings"] = headings.warnings;
  return json_text(document);
}

std::string group_json(const PointGroup& group, const GroupAnswers& answers) {
  Json document = {{"schema", "irrepwise.symmetry.1"}};
  add_group(document, group);
  add_answers(document, group, answers);
  return json_text(document);
}

}  // namespace irrepwise
