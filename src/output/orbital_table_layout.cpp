#include "output/orbital_table_layout.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "output/caption_words.hpp"
#include "output/table_text.hpp"
#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

using Indices = std::vector<std::size_t>;

constexpr double nothing = 1e-9;  // zero by symmetry but for rounding

class Layout {
 public:
  Layout(const LevelsResult& result, const OrbitalTable& table, const OrbitalTableLayout& layout)
      : result_(result),
        table_(table),
        layout_(layout),
        shares_(table.options.entries == TableEntries::Shares),
        salcs_(table.options.functions == TableFunctions::Salcs) {}

  [[nodiscard]] std::vector<Table> tables() const {
    std::vector<Table> tables;
    for (const auto& [rows, columns] : blocks()) {
      const std::vector<Indices> parts = broken(rows, columns);
      for (std::size_t part = 0; part < parts.size(); ++part) {
        Table made = part_table(rows, parts[part]);
        made.caption = caption(columns, parts.size() == 1 ? 0 : part + 1, parts.size());
        if (tables.empty()) made.legend = legend();
        tables.push_back(std::move(made));
      }
    }
    return tables;
  }

 private:
  // Rows and columns that belong together: all, or those of one irrep.
  [[nodiscard]] std::vector<std::pair<Indices, Indices>> blocks() const {
    Indices rows(table_.functions.size());
    Indices columns(table_.orbitals.size());
    std::iota(rows.begin(), rows.end(), std::size_t{0});
    std::iota(columns.begin(), columns.end(), std::size_t{0});
    if (!salcs_) return {{rows, columns}};
    std::vector<std::pair<Indices, Indices>> blocks;
    std::vector<int> irreps;
    for (const std::size_t column : columns) {
      const int irrep = level(column).irrep;
      if (std::find(irreps.begin(), irreps.end(), irrep) != irreps.end()) continue;
      irreps.push_back(irrep);
      Indices of_rows;
      Indices of_columns;
      for (const std::size_t row : rows) {
        if (table_.functions[row].irrep == irrep) of_rows.push_back(row);
      }
      for (const std::size_t other : columns) {
        if (level(other).irrep == irrep) of_columns.push_back(other);
      }
      blocks.emplace_back(std::move(of_rows), std::move(of_columns));
    }
    return blocks;
  }

  // Columns by whole levels, as many as fit the width, one level at least.
  [[nodiscard]] std::vector<Indices> broken(const Indices& rows, const Indices& columns) const {
    const std::vector<int> widths = text_widths(part_table(rows, columns));
    const int fixed = std::accumulate(widths.begin(), widths.begin() + first_columns, 0);
    std::vector<Indices> parts;
    int filled = 0;
    for (std::size_t i = 0; i < columns.size();) {
      std::size_t end = i;
      int wide = 0;
      for (; end < columns.size() && choice(columns[end]).level == choice(columns[i]).level;
           ++end) {
        wide += widths[first_columns + end];
      }
      if (parts.empty() || fixed + filled + wide > layout_.width) {
        parts.emplace_back();
        filled = 0;
      }
      filled += wide;
      for (; i < end; ++i) parts.back().push_back(columns[i]);
    }
    return parts;
  }

  [[nodiscard]] Table part_table(const Indices& rows, const Indices& columns) const {
    Table table;
    table.columns = {{salcs_ ? "set" : "atom", salcs_ ? "set" : "atom", "", Align::Left, 0, false},
                     {"orbital", salcs_ ? "SALC" : "orbital", "", Align::Left, 0, false}};
    for (const std::size_t column : columns) {
      const TableOrbital& orbital = table_.orbitals[column];
      const std::size_t colon = orbital.name.find(':');
      Column head{orbital.name, "", "", Align::Decimal, 0, false};
      head.label = orbital.name.substr(0, colon);
      if (colon != std::string::npos) head.header = orbital.name.substr(colon);
      table.columns.push_back(std::move(head));
    }
    add_heads(table, columns);
    add_body(table, rows, columns);
    return table;
  }

  // What is said of a whole level stands above its first column.
  void add_heads(Table& table, const Indices& columns) const {
    Row energy{{std::string(), std::string("energy / eV")}};
    Row electrons{{std::string(), std::string("electrons")}};
    Row mark{{std::string(), std::string()}};
    bool any_mark = false;
    for (std::size_t i = 0; i < columns.size(); ++i) {
      if (i > 0 && choice(columns[i]).level == choice(columns[i - 1]).level) {
        for (Row* row : {&energy, &electrons, &mark}) row->cells.emplace_back();
        continue;
      }
      const Level& which = level(columns[i]);
      const bool whole = which.occupation == std::round(which.occupation);
      energy.cells.emplace_back(Number{which.energy_ev, 3});
      electrons.cells.emplace_back(Number{which.occupation, whole ? 0 : 2});
      const std::string words = frontier_words(choice(columns[i]).level);
      any_mark = any_mark || !words.empty();
      mark.cells.emplace_back(words);
    }
    if (any_mark) table.lines.emplace_back(std::move(mark));
    table.lines.emplace_back(std::move(energy));
    table.lines.emplace_back(std::move(electrons));
  }

  void add_body(Table& table, const Indices& rows, const Indices& columns) const {
    std::vector<double> blank_share(columns.size(), 0.0);
    std::size_t left_out = 0;
    std::optional<int> set;
    std::optional<int> atom;
    for (const std::size_t row : rows) {
      const TableFunction& function = table_.functions[row];
      std::vector<Cell> cells;
      bool any = false;
      for (std::size_t i = 0; i < columns.size(); ++i) {
        const double value = entry(row, columns[i]);
        if (std::abs(value) < std::max(layout_.threshold, nothing)) {
          blank_share[i] += share(row, columns[i]);
          cells.emplace_back();
          continue;
        }
        cells.emplace_back(Number{value, shares_ ? 1 : 3});
        any = true;
      }
      if (!any) {
        ++left_out;
        continue;
      }
      const bool new_set = set != function.set;
      if (new_set && (!set || has_several(*set) || has_several(function.set))) {
        table.lines.emplace_back(Separator{separator_words(function.set)});
      }
      std::string name;
      if (salcs_) {
        if (new_set) name = table_.sets[static_cast<std::size_t>(function.set)].name;
      } else if (new_set || atom != function.atom) {
        name = atom_name(result_.symmetry.molecule, *function.atom);
      }
      set = function.set;
      atom = function.atom;
      Row line{{std::move(name), function_words(function)}};
      line.cells.insert(line.cells.end(), cells.begin(), cells.end());
      table.lines.emplace_back(std::move(line));
    }
    table.notes = notes(columns, blank_share, left_out, rows.size());
  }

  [[nodiscard]] bool has_several(int set) const {
    return table_.sets[static_cast<std::size_t>(set)].atoms.size() > 1;
  }

  // The atoms of a set, where the rows below do not say so by themselves.
  [[nodiscard]] std::string separator_words(int set) const {
    if (!has_several(set)) return {};
    return atom_list(result_.symmetry.molecule, table_.sets[static_cast<std::size_t>(set)].atoms);
  }

  [[nodiscard]] std::string function_words(const TableFunction& function) const {
    std::string words = function.name;
    if (function.of_number > 1) words += fmt::format(" ({})", function.number);
    // On a single atom the orbital's name says which partner it is.
    if (function.partner > 0 && has_several(function.set)) {
      words += fmt::format(":{}", function.partner);
    }
    return words;
  }

  [[nodiscard]] std::vector<std::string> notes(const Indices& columns,
                                               const std::vector<double>& blank_share,
                                               std::size_t left_out, std::size_t all_rows) const {
    std::vector<std::string> notes;
    std::string words = layout_.threshold > 0.0
                            ? fmt::format("Blank: smaller than {:g}{} in size.", layout_.threshold,
                                          shares_ ? "\u00A0%" : "")
                            : "Blank: zero by symmetry.";
    std::size_t most = 0;
    for (std::size_t i = 0; i < columns.size(); ++i) {
      if (std::abs(blank_share[i]) > std::abs(blank_share[most])) most = i;
    }
    constexpr double worth_a_word = 5e-4;
    if (!columns.empty() && std::abs(blank_share[most]) >= worth_a_word) {
      words += fmt::format(" The blanks of an orbital amount to {:.1f}\u00A0% of it at most ({}).",
                           100.0 * std::abs(blank_share[most]),
                           readable_name(table_.orbitals[columns[most]].name));
    }
    if (left_out > 0) {
      words += fmt::format(" Left out, all blank: {} of {} {}.", left_out, all_rows,
                           salcs_ ? "SALCs" : "atomic orbitals");
    }
    notes.push_back(std::move(words));
    return notes;
  }

  [[nodiscard]] std::string caption(const Indices& columns, std::size_t part,
                                    std::size_t parts) const {
    std::string words = shares_ ? "Mulliken shares" : "Orbital coefficients";
    words += salcs_ ? " over SALCs" : " over atomic orbitals";
    if (salcs_) {
      const Irrep& irrep =
          result_.symmetry.group.irreps()[static_cast<std::size_t>(level(columns.front()).irrep)];
      words += ", " + readable_label(level_label(irrep.label));
    }
    words += ": " + (result_.title.empty() ? readable_formula(result_.molecule) : result_.title);
    if (part > 0) words += fmt::format(" (part {} of {})", part, parts);
    return words;
  }

  [[nodiscard]] std::string legend() const {
    std::string words = geometry_sentence(result_, layout_.source) + " " +
                        method_sentence(result_) + " " + axes_sentence(result_);
    if (salcs_) {
      words += fmt::format(" SALCs as in irrepwise symmetry --{}, {}.",
                           table_.options.frame == OrbitalFrame::Local ? "local" : "salcs",
                           has_pair() ? "of complex conjugate irreps both partners"
                                      : "with the same coefficient for every partner");
    } else if (table_.options.frame == OrbitalFrame::Standard) {
      words += " Orbitals in this frame.";
    }
    if (table_.options.frame == OrbitalFrame::Local) words += " " + frame_words();
    if (shares_) {
      words +=
          " Mulliken shares c(Sc) in per cent: 100 for each orbital, single ones may be negative.";
    } else {
      words += " Coefficients without unit, cᵀSc = 1; the largest of a level's first partner";
      words += table_.options.frame == OrbitalFrame::Local
                   ? ", in the frame of the molecule, is positive."
                   : " is positive.";
    }
    return words + " Energies in eV, electrons of the whole level.";
  }

  [[nodiscard]] bool has_pair() const {
    return std::any_of(table_.functions.begin(), table_.functions.end(),
                       [](const TableFunction& function) { return function.partner > 0; });
  }

  [[nodiscard]] std::string frame_words() const {
    std::string words = fmt::format(
        "Local frames: z of an atom points to {}, σ along it, π across; πy stands across "
        "the mirror plane that holds the line, or the plane of the atom's bonds, and symmetry "
        "carries it from atom to atom, sign "
        "included.",
        table_.centre_words);
    words += table_.frame_sentences;
    std::vector<bool> standard(table_.sets.size(), true);
    for (const TableFunction& function : table_.functions) {
      if (function.frame != OrbitalFrame::Standard)
        standard[static_cast<std::size_t>(function.set)] = false;
    }
    std::string others;
    for (std::size_t set = 0; set < table_.sets.size(); ++set) {
      const bool listed = std::any_of(
          table_.functions.begin(), table_.functions.end(),
          [&](const TableFunction& function) { return function.set == static_cast<int>(set); });
      if (standard[set] && listed) others += (others.empty() ? "" : ", ") + table_.sets[set].name;
    }
    if (!others.empty()) words += " In the frame of the molecule: " + others + ".";
    return words;
  }

  [[nodiscard]] std::string frontier_words(int which) const {
    if (result_.levels.frontier.homo == which) return "HOMO";
    if (result_.levels.frontier.lumo == which) return "LUMO";
    return {};
  }

  [[nodiscard]] static std::string readable_name(const std::string& name) {
    const std::size_t colon = std::min(name.find(':'), name.size());
    return readable_label(name.substr(0, colon)) + name.substr(colon);
  }

  [[nodiscard]] double entry(std::size_t row, std::size_t column) const {
    return shares_ ? 100.0 * share(row, column)
                   : table_.coefficients(static_cast<Eigen::Index>(row),
                                         static_cast<Eigen::Index>(column));
  }
  [[nodiscard]] double share(std::size_t row, std::size_t column) const {
    return table_.shares(static_cast<Eigen::Index>(row), static_cast<Eigen::Index>(column));
  }
  [[nodiscard]] const OrbitalChoice& choice(std::size_t column) const {
    return table_.orbitals[column].choice;
  }
  [[nodiscard]] const Level& level(std::size_t column) const {
    return result_.levels.levels[static_cast<std::size_t>(choice(column).level)];
  }

  static constexpr int first_columns = 2;  // atom or set, orbital

  const LevelsResult& result_;
  const OrbitalTable& table_;
  const OrbitalTableLayout& layout_;
  bool shares_;
  bool salcs_;
};

}  // namespace

std::vector<Table> orbital_tables(const LevelsResult& result, const OrbitalTable& table,
                                  const OrbitalTableLayout& layout) {
  return Layout(result, table, layout).tables();
}

}  // namespace irrepwise
