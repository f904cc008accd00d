#include "page/page_parts.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

#include "figure/svg.hpp"
#include "molecule/element.hpp"
#include "output/html_parts.hpp"
#include "output/html_text.hpp"
#include "output/table_html.hpp"

namespace irrepwise {
namespace {

// Source of each formula as in DEVELOPERS.md.
std::string rule_html(const Levels& levels) {
  const std::string k = levels.k ? fmt::format("{}", *levels.k) : "";
  switch (levels.rule) {
    case Rule::Weighted:
      return fmt::format(
          "the weighted rule, <i>H<sub>ij</sub></i> = ½<i>K′S<sub>ij</sub></i>"
          "(<i>H<sub>ii</sub></i> + <i>H<sub>jj</sub></i>) with <i>K′</i> = <i>K</i> + Δ² + "
          "(1 − <i>K</i>)Δ⁴, Δ = (<i>H<sub>ii</sub></i> − <i>H<sub>jj</sub></i>)/"
          "(<i>H<sub>ii</sub></i> + <i>H<sub>jj</sub></i>), <i>K</i> = {} (Ammeter, Bürgi, "
          "Thibeault "
          "and Hoffmann, J. Am. Chem. Soc. 100, 3686 (1978))",
          k);
    case Rule::WolfsbergHelmholz:
      return fmt::format(
          "<i>H<sub>ij</sub></i> = ½<i>KS<sub>ij</sub></i>(<i>H<sub>ii</sub></i> + "
          "<i>H<sub>jj</sub></i>), <i>K</i> = {} (Wolfsberg and Helmholz, J. Chem. Phys. 20, 837 "
          "(1952))",
          k);
    case Rule::GeometricMean:
      return fmt::format(
          "<i>H<sub>ij</sub></i> = −<i>KS<sub>ij</sub></i>√(<i>H<sub>ii</sub>H<sub>jj</sub></i>), "
          "<i>K</i> = {} (Ballhausen and Gray, Inorg. Chem. 1, 111 (1962))",
          k);
    case Rule::Cusachs:
      return "<i>H<sub>ij</sub></i> = ½<i>S</i>(2 − |<i>S</i>|)(<i>H<sub>ii</sub></i> + "
             "<i>H<sub>jj</sub></i>), <i>S</i> in the diatomic frame (Cusachs, J. Chem. Phys. 43, "
             "S157 (1965))";
  }
  return {};
}

bool same_numbers(const Shell& a, const Shell& b) {
  const auto s = a.radial.terms();
  const auto t = b.radial.terms();
  return a.l == b.l && a.n() == b.n() && a.h_ii_ev == b.h_ii_ev &&
         std::equal(s.begin(), s.end(), t.begin(), t.end(), [](const auto& x, const auto& y) {
           return x.function.zeta() == y.function.zeta() && x.coefficient == y.coefficient;
         });
}

struct ShellInUse {
  int element = 0;
  const Shell* shell = nullptr;
  std::vector<std::string> atoms;  // with the molecule's name where there are several
};

// Of every molecule, each set of numbers once: heavy elements first.
std::vector<ShellInUse> shells_in_use(std::span<const PageMolecule> molecules) {
  std::vector<ShellInUse> shells;
  for (const PageMolecule& molecule : molecules) {
    const LevelsResult& result = *molecule.result;
    for (const Shell& shell : result.basis.shells) {
      const int element =
          result.molecule.atoms()[static_cast<std::size_t>(shell.atom)].atomic_number;
      auto known = std::find_if(shells.begin(), shells.end(), [&](const ShellInUse& s) {
        return s.element == element && same_numbers(*s.shell, shell);
      });
      if (known == shells.end()) known = shells.insert(shells.end(), {element, &shell, {}});
      const std::string atom = atom_name(result.molecule, shell.atom);
      known->atoms.push_back(molecules.size() == 1 ? atom : molecule.name + ": " + atom);
    }
  }
  std::stable_sort(shells.begin(), shells.end(), [](const ShellInUse& a, const ShellInUse& b) {
    return std::pair(-a.element, a.shell->l) < std::pair(-b.element, b.shell->l);
  });
  return shells;
}

// Which atoms have these numbers, where others of the element have other ones.
std::string where_words(const std::vector<ShellInUse>& shells, const ShellInUse& shell) {
  const auto rivals = std::count_if(shells.begin(), shells.end(), [&](const ShellInUse& other) {
    return other.element == shell.element && other.shell->l == shell.shell->l;
  });
  if (rivals == 1) return "every " + std::string(element_symbol(shell.element));
  std::string words;
  for (const std::string& atom : shell.atoms) words += (words.empty() ? "" : ", ") + atom;
  return words;
}

Table parameters_in_use(std::span<const PageMolecule> molecules) {
  Table table;
  table.caption = "Parameters in use";
  table.columns = {{"atoms", "atoms", "", Align::Left, 0, true},
                   {"shell", "shell", "", Align::Left, 0, false},
                   {"h_ii_ev", "H_ii", "eV", Align::Decimal, 0, false},
                   {"exponent_1", "ζ1", "1/bohr", Align::Decimal, 0, false},
                   {"coefficient_1", "c1", "", Align::Decimal, 0, false},
                   {"exponent_2", "ζ2", "1/bohr", Align::Decimal, 0, false},
                   {"coefficient_2", "c2", "", Align::Decimal, 0, false}};
  const std::vector<ShellInUse> shells = shells_in_use(molecules);
  for (const ShellInUse& shell : shells) {
    Row row{{where_words(shells, shell),
             fmt::format("{}{}", shell.shell->n(), shell_letter(shell.shell->l)),
             Number{shell.shell->h_ii_ev, 3}}};
    for (const ContractedRadial::Term& term : shell.shell->radial.terms()) {
      row.cells.emplace_back(Number{term.function.zeta(), 4});
      row.cells.emplace_back(Number{term.coefficient, 4});
    }
    row.cells.resize(table.columns.size());
    table.lines.emplace_back(std::move(row));
  }
  table.notes = {"`irrepwise parameters` names the source of each published value."};
  return table;
}

}  // namespace

PageSection levels_section(const Figure& diagram, DiagramRoom room) {
  const bool wide = room == DiagramRoom::Above;
  std::string html = fmt::format(
      "<p class=\"hint\">Choose a level by a click, or with the arrow keys once one has the focus, "
      "to see its "
      "composition, coefficients and orbital.</p>\n<noscript><p>The picture of single levels "
      "needs JavaScript; every table is here without it.</p></noscript>\n"
      "<div class=\"levels{}\">\n<div class=\"scroll\"><figure class=\"diagram{}\" "
      "style=\"--natural: {:.0f}px\">\n",
      wide ? " wide" : "", wide ? " roomy" : "", diagram.width);
  html += svg_element(diagram, "diagram");
  html +=
      "</figure></div>\n<aside class=\"panel\" aria-live=\"polite\" "
      "aria-labelledby=\"level-heading\">\n<div>\n<h3 id=\"level-heading\">Molecule</h3>\n"
      "<canvas id=\"view\" tabindex=\"0\" role=\"img\" aria-label=\"Molecule\"></canvas>\n"
      "<div id=\"view-tools\" class=\"buttons\" role=\"group\" aria-label=\"View\"></div>\n"
      "</div>\n<div id=\"level-facts\"></div>\n</aside>\n</div>\n";
  return {"levels", "Levels and orbitals", std::move(html)};
}

PageSection method_section(std::span<const PageMolecule> molecules,
                           const std::vector<std::string>& limits) {
  std::vector<std::string> rules;
  for (const PageMolecule& molecule : molecules) {
    std::string rule = rule_html(molecule.result->levels);
    if (std::find(rules.begin(), rules.end(), rule) == rules.end()) rules.push_back(rule);
  }
  std::string html =
      "<p>Extended Hückel: the orbitals solve <i>HC</i> = <i>SCE</i> over the valence orbitals, "
      "Slater functions whose overlaps <i>S<sub>ij</sub></i> are computed exactly, separately for "
      "each irreducible representation. <i>H<sub>ii</sub></i> are parameters; between orbitals of "
      "different atoms stands ";
  for (std::size_t i = 0; i < rules.size(); ++i) html += (i > 0 ? "; or " : "") + rules[i];
  html += ". Populations are those of Mulliken, J. Chem. Phys. 23, 1833 (1955).</p>\n";
  html += remarks_html(limits) + table_html(parameters_in_use(molecules));
  return {"method", "Method and limits", std::move(html)};
}

PageSection repeat_section(const Provenance& provenance) {
  std::string html = fmt::format(
      "<p>Made by {} with</p>\n<div class=\"source\"><pre><code>{}</code></pre></div>\n"
      "<p>from the files below. Another version or other parameters may give other numbers.</p>\n",
      html_text(generator_words(provenance)), html_text(provenance.command));
  for (const SourceText& file : provenance.files) {
    html += fmt::format(
        "<details open><summary>{}</summary>\n<div class=\"source\"><pre><code>{}</code></pre>"
        "</div></details>\n",
        html_text(file.name), html_text(file.text));
  }
  return {"repeat", "To repeat this run", std::move(html)};
}

Table geometry_table(const LevelsResult& result) {
  Table table;
  table.caption = "Positions as computed: made exactly symmetric, in the frame of the input";
  table.columns = {{"atom", "atom", "", Align::Left, 0, false},
                   {"x", "x", "Å", Align::Decimal, 0, false},
                   {"y", "y", "Å", Align::Decimal, 0, false},
                   {"z", "z", "Å", Align::Decimal, 0, false}};
  const Molecule molecule = computed_molecule(result);
  for (int i = 0; i < molecule.size(); ++i) {
    const Eigen::Vector3d& at = molecule.atoms()[static_cast<std::size_t>(i)].position;
    table.lines.emplace_back(
        Row{{atom_name(molecule, i), Number{at.x(), 4}, Number{at.y(), 4}, Number{at.z(), 4}}});
  }
  return table;
}

PageMolecule page_molecule(const std::string& name, const LevelsResult& result,
                           const EnergyWindow& window) {
  PageMolecule molecule{name, &result, {}};
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    const double energy_ev = result.levels.levels[i].energy_ev;
    if (energy_ev < window.from_ev || energy_ev > window.to_ev) continue;
    molecule.levels.push_back({static_cast<int>(i), {}});
  }
  return molecule;
}

std::string generator_words(const Provenance& provenance) {
  return "irrepwise " + provenance.version;
}

}  // namespace irrepwise
