// Parts that the page of a molecule and that of a comparison share.
#pragma once

#include <span>
#include <string>
#include <vector>

#include "figure/figure.hpp"
#include "figure/level_diagram.hpp"
#include "page/html_page.hpp"
#include "page/page_data.hpp"
#include "page/provenance.hpp"

namespace irrepwise {

enum class DiagramRoom { Beside, Above };  // where the panel of a level stands

/// The diagram with the panel that a click on a level fills.
[[nodiscard]] PageSection levels_section(const Figure& diagram, DiagramRoom room);

/// How orbitals are computed, with the parameters in use of every molecule, and what the method
/// cannot tell.
[[nodiscard]] PageSection method_section(std::span<const PageMolecule> molecules,
                                         const std::vector<std::string>& limits);

/// Command, version and files.
[[nodiscard]] PageSection repeat_section(const Provenance& provenance);

/// Positions of the symmetrised atoms in the frame of the input.
[[nodiscard]] Table geometry_table(const LevelsResult& result);

/// The levels that lie in the window, without surfaces.
[[nodiscard]] PageMolecule page_molecule(const std::string& name, const LevelsResult& result,
                                         const EnergyWindow& window);

/// @returns  "irrepwise 0.1.0"
[[nodiscard]] std::string generator_words(const Provenance& provenance);

}  // namespace irrepwise
