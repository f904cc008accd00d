#include "output/compare_json.hpp"

#include <optional>
#include <utility>

#include "molecule/molecule.hpp"
#include "output/frontier_fate.hpp"
#include "output/json_text.hpp"
#include "output/table_csv.hpp"

namespace irrepwise {
namespace {

Json level_json(const VariantResult& variant, const std::optional<int>& level) {
  return level ? Json(name_of_level(variant, *level)) : Json(nullptr);
}

double energy_ev(const VariantResult& variant, int level) {
  return finite_number(variant.levels.levels.levels[static_cast<std::size_t>(level)].energy_ev);
}

Json frontier_json(const VariantResult& variant) {
  const Frontier& frontier = variant.levels.levels.frontier;
  const auto energy = [&](const std::optional<int>& level) {
    return level ? Json(energy_ev(variant, *level)) : Json(nullptr);
  };
  Json gap;
  if (frontier.homo && frontier.lumo) {
    gap = energy_ev(variant, *frontier.lumo) - energy_ev(variant, *frontier.homo);
  }
  return {{"homo", level_json(variant, frontier.homo)},
          {"lumo", level_json(variant, frontier.lumo)},
          {"homo_ev", energy(frontier.homo)},
          {"lumo_ev", energy(frontier.lumo)},
          {"gap_ev", gap},
          {"open_shell", frontier.open_shell}};
}

Json metal_levels_json(const VariantResult& variant, const MetalFacts* metal) {
  Json list = Json::array();
  if (!metal) return list;
  for (const DLevel& entry : metal->d_block.levels) {
    list.push_back(
        {{"label", name_of_level(variant, entry.level)},
         {"parent_label", entry.parent_label.empty() ? Json(nullptr) : Json(entry.parent_label)},
         {"energy_ev", energy_ev(variant, entry.level)},
         {"d_share", finite_number(entry.d_share)},
         {"parent_weight", finite_number(entry.parent_weight)},
         {"occupation",
          finite_number(
              variant.levels.levels.levels[static_cast<std::size_t>(entry.level)].occupation)}});
  }
  return list;
}

Json parent_json(const MetalFacts* metal) {
  if (!metal || metal->d_block.parent_group.empty()) return nullptr;
  Json parent = {{"point_group", metal->d_block.parent_group}};
  if (metal->d_block.shape) {
    const PolyhedronFit& shape = *metal->d_block.shape;
    parent["polyhedron"] = shape.symbol;
    parent["name"] = shape.name;
    parent["deviation_degrees"] = finite_number(shape.deviation_degrees);
  }
  return parent;
}

Json donors_json(const VariantResult& variant, const std::vector<MetalBond>& bonds) {
  Json list = Json::array();
  for (const MetalBond& bond : bonds) {
    list.push_back(atom_name(variant.levels.molecule, bond.donor));
  }
  return list;
}

Json bonds_json(const VariantResult& variant, const MetalFacts* metal) {
  Json list = Json::array();
  if (!metal) return list;
  for (const BondType& type : metal->bonds) {
    list.push_back({{"element", type.element},
                    {"ligand", type.ligand},
                    {"bridging", type.bridging},
                    {"opposite", opposite_word(type.opposite)},
                    {"opposite_element",
                     type.opposite_element.empty() ? Json(nullptr) : Json(type.opposite_element)},
                    {"length", length_word(type.length)},
                    {"atoms", donors_json(variant, type.bonds)},
                    {"count", type.bonds.size()},
                    {"overlap_population", finite_number(type.overlap_population())},
                    {"distance_angstrom", finite_number(type.distance_angstrom())}});
  }
  return list;
}

Json flip_json(const VariantResult& variant, const std::optional<LevelFlip>& flip) {
  if (!flip) return nullptr;
  const std::vector<Parameter>& parameters = variant.robustness.parameters;
  Json json = {
      {"upper", name_of_level(variant, flip->upper)},
      {"lower", name_of_level(variant, flip->lower)},
      {"gap_ev", finite_number(flip->gap_ev)},
      {"coincide", flip->coincide()},
      {"parameter", flip->parameter
                        ? Json(parameters[static_cast<std::size_t>(*flip->parameter)].name)
                        : Json(nullptr)},
      {"first_order_ev",
       flip->parameter ? Json(finite_number(flip->first_order_ev)) : Json(nullptr)},
      {"change_ev", flip->change_ev ? Json(finite_number(*flip->change_ev)) : Json(nullptr)},
      {"fragile", flip->fragile}};
  if (flip->other) {
    json["other_parameter"] = parameters[static_cast<std::size_t>(*flip->other)].name;
    json["other_relative_change"] = finite_number(flip->other_relative);
  }
  return json;
}

Json sensitivities_json(const Robustness& robustness) {
  Json list = Json::array();
  for (std::size_t p = 0; p < robustness.parameters.size(); ++p) {
    const Parameter& parameter = robustness.parameters[p];
    const auto row = robustness.slopes.row(static_cast<Eigen::Index>(p));
    list.push_back({{"parameter", parameter.name},
                    {"unit", parameter.unit},
                    {"value", finite_number(parameter.value)},
                    {"homo", finite_number(row[0])},
                    {"lumo", finite_number(row[1])},
                    {"gap", finite_number(row[2])}});
  }
  return list;
}

Json metal_json(const VariantResult& variant, const MetalFacts* metal) {
  return {{"metal", metal ? Json(atom_name(variant.levels.molecule, metal->atom)) : Json(nullptr)},
          {"equivalent_metals", metal ? Json(metal->n_equivalent) : Json(0)},
          {"metal_charge", metal ? Json(finite_number(metal->charge)) : Json(nullptr)},
          {"d_population",
           metal && metal->has_d_shell ? Json(finite_number(metal->d_population)) : Json(nullptr)},
          {"bonds", bonds_json(variant, metal)},
          {"parent", parent_json(metal)},
          {"metal_levels", metal_levels_json(variant, metal)}};
}

Json variant_json(const VariantResult& variant) {
  const LevelsResult& result = variant.levels;
  Json others = Json::array();
  for (std::size_t i = 1; i < variant.metals.size(); ++i) {
    others.push_back(metal_json(variant, &variant.metals[i]));
  }
  Json json = {{"name", variant.name},
               {"formula", hill_formula(result.molecule)},
               {"charge", result.molecule.charge()},
               {"valence_electrons", result.levels.electrons},
               {"point_group", result.symmetry.group.symbol().name()},
               {"frontier", frontier_json(variant)}};
  json.update(metal_json(variant, variant.metal()));
  json.update({{"varied_donors", donors_json(variant, variant.varied_bonds)},
               {"other_metals", std::move(others)},
               {"sum_of_occupied_ev", finite_number(result.levels.sum_of_occupied_ev)},
               {"fragile", variant.robustness.fragile()},
               {"robustness",
                {{"occupied", flip_json(variant, variant.robustness.occupied)},
                 {"empty", flip_json(variant, variant.robustness.empty)}}},
               {"sensitivities", sensitivities_json(variant.robustness)},
               {"warnings", result.warnings}});
  return json;
}

const char* stays_key(Stays stays) {
  switch (stays) {
    case Stays::No:
      return "no";
    case Stays::InPart:
      return "in_part";
    case Stays::Whole:
      return "yes";
  }
  return "";
}

Json fate_json(const Comparison& comparison, int index, FrontierSide side) {
  const std::optional<FrontierFate> fate = frontier_fate(comparison, index, side);
  if (!fate) return nullptr;
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  const VariantResult& variant = comparison.variants[static_cast<std::size_t>(index)];
  Json levels = Json::array();
  for (const FatePart& part : fate->parts) {
    levels.push_back({{"reference", name_of_level(reference, part.match.reference)},
                      {"variant", name_of_level(variant, part.match.variant)},
                      {"overlap", finite_number(part.match.overlap)},
                      {"shift_ev", finite_number(shift_ev(comparison, index, part.match))},
                      {"still_frontier", part.at_frontier}});
  }
  return {{"reference", name_of_level(reference, fate->reference_level)},
          {"stays", stays_key(fate->stays)},
          {"levels", std::move(levels)}};
}

Json matches_json(const Comparison& comparison) {
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  Json list = Json::array();
  for (std::size_t i = 0; i < comparison.variants.size(); ++i) {
    if (static_cast<int>(i) == comparison.reference) continue;
    const VariantResult& variant = comparison.variants[i];
    const Matching& matching = comparison.matchings[i];
    Json pairs = Json::array();
    for (const LevelMatch& match : matching.matches) {
      pairs.push_back(
          {{"reference", name_of_level(reference, match.reference)},
           {"variant", name_of_level(variant, match.variant)},
           {"irrep", match.irrep},
           {"overlap", finite_number(match.overlap)},
           {"shift_ev", finite_number(shift_ev(comparison, static_cast<int>(i), match))}});
    }
    Json crossings = Json::array();
    for (const FrontierSide side : {FrontierSide::Homo, FrontierSide::Lumo}) {
      std::string words = crossing_words(comparison, static_cast<int>(i), side);
      if (!words.empty()) crossings.push_back(std::move(words));
    }
    list.push_back({{"reference", reference.name},
                    {"variant", variant.name},
                    {"common_group", matching.common_group},
                    {"shared_atoms", matching.shared_atoms},
                    {"replaced_donors", matching.replaced_donors},
                    {"levels", std::move(pairs)},
                    {"homo", fate_json(comparison, static_cast<int>(i), FrontierSide::Homo)},
                    {"lumo", fate_json(comparison, static_cast<int>(i), FrontierSide::Lumo)},
                    {"crossings", std::move(crossings)}});
  }
  return list;
}

Json splittings_json(const Comparison& comparison) {
  Json list = Json::array();
  for (const VariantResult& variant : comparison.variants) {
    for (const MetalFacts& metal : variant.metals) {
      const std::vector<ParentMean>& means = metal.d_block.means;
      for (std::size_t i = 0; i + 1 < means.size(); ++i) {
        list.push_back({{"variant", variant.name},
                        {"from", means[i].label},
                        {"to", means[i + 1].label},
                        {"value_ev", finite_number(means[i + 1].energy_ev - means[i].energy_ev)},
                        {"metal", atom_name(variant.levels.molecule, metal.atom)}});
      }
    }
  }
  return list;
}

}  // namespace

std::string compare_json(const Comparison& comparison) {
  Json variants = Json::array();
  for (const VariantResult& variant : comparison.variants)
    variants.push_back(variant_json(variant));
  return json_text(
      {{"schema", "irrepwise.compare.1"},
       {"reference", comparison.variants[static_cast<std::size_t>(comparison.reference)].name},
       {"variants", std::move(variants)},
       {"matches", matches_json(comparison)},
       {"splittings", splittings_json(comparison)}});
}

std::string compare_csv(const Comparison& comparison, const SummaryChoice& choice) {
  return table_csv(summary_table(comparison, choice, SummaryPart::Whole));
}

}  // namespace irrepwise
