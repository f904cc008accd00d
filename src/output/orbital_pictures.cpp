#include "output/orbital_pictures.hpp"

#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "figure/rich_text.hpp"
#include "output/caption_words.hpp"

namespace irrepwise {
namespace {

std::string surface_remark(const std::string& name, const OrbitalScene& scene,
                           const OrbitalGrid& grid) {
  const std::array<int, 3>& n = grid.shape.size;
  return fmt::format(
      "{}: isovalue {:.4f} bohr^(-3/2) encloses {:g} % of the density; integral on the grid {:.4f} "
      "({} x {} x {} points, spacing {:.3g} Å)",
      name, scene.isovalue, 100.0 * scene.share, scene.integral, n[0], n[1], n[2],
      grid.shape.spacing_angstrom);
}

OrbitalGrid sampled(const OrbitalField& field, const SurfaceChoice& choice,
                    const std::string& name) {
  try {
    return sample(field, choice.spacing_angstrom);
  } catch (const Error& error) {
    throw error_at(name, error);
  }
}

}  // namespace

std::string method_words(const LevelsResult& result) {
  const Levels& levels = result.levels;
  return fmt::format("extended Hückel, {} rule{} · parameters: {}", rule_name(levels.rule),
                     levels.k ? fmt::format(", K\u00A0=\u00A0{}", *levels.k) : "",
                     result.parameter_set);
}

SheetWords sheet_heading(const LevelsResult& result) {
  const RichText method =
      group_text(result.symmetry.group.symbol().name()) + plain_text(" · " + method_words(result));
  if (result.title.empty()) return {readable_formula(result.molecule), method};
  return {result.title, formula_text(result.molecule) + plain_text(" · ") + method};
}

ChosenOrbitals chosen_orbitals(const LevelsResult& result, std::vector<OrbitalChoice> choices) {
  ChosenOrbitals out;
  out.choices = std::move(choices);
  out.coefficients.resize(result.basis.n_orbitals, static_cast<Eigen::Index>(out.choices.size()));
  for (std::size_t i = 0; i < out.choices.size(); ++i) {
    const OrbitalChoice& choice = out.choices[i];
    const Level& level = result.levels.levels[static_cast<std::size_t>(choice.level)];
    OrbitalCaption caption;
    caption.label = level_name(result.symmetry.group, level);
    caption.partner = choice.partner + 1;
    caption.degeneracy = level.degeneracy;
    caption.energy_ev = level.energy_ev;
    caption.occupation = level.occupation;
    if (result.levels.frontier.homo == choice.level) caption.mark = "HOMO";
    if (result.levels.frontier.lumo == choice.level) caption.mark = "LUMO";
    out.names.push_back(level.degeneracy == 1
                            ? caption.label
                            : fmt::format("{}:{}", caption.label, caption.partner));
    out.captions.push_back(std::move(caption));
    out.coefficients.col(static_cast<Eigen::Index>(i)) =
        level_orbitals(result.symmetry, result.basis, result.levels, choice.level)
            .col(choice.partner);
  }
  return out;
}

OrbitalSurfaces orbital_surfaces(const LevelsResult& result, const ChosenOrbitals& chosen,
                                 const SurfaceChoice& choice) {
  const Molecule& molecule = result.symmetry.molecule;
  OrbitalSurfaces out;
  const std::size_t n = chosen.choices.size();
  for (std::size_t first = 0; first < n;) {
    std::size_t end = first + 1;
    while (end < n && chosen.choices[end].level == chosen.choices[first].level) ++end;
    const OrbitalField field(
        molecule, result.basis,
        chosen.coefficients.middleCols(static_cast<Eigen::Index>(first),
                                       static_cast<Eigen::Index>(end - first)));
    const OrbitalGrid grid = sampled(field, choice, chosen.names[first]);
    for (std::size_t i = first; i < end; ++i) {
      out.scenes.push_back(
          orbital_scene(molecule, field, grid, static_cast<int>(i - first), choice.share));
      out.remarks.push_back(surface_remark(chosen.names[i], out.scenes.back(), grid));
    }
    first = end;
  }
  return out;
}

}  // namespace irrepwise
