#include "output/character_tables.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <optional>

#include <fmt/format.h>

#include "core/exact_number.hpp"
#include "output/display_width.hpp"
#include "output/symmetry_words.hpp"
#include "symmetry/functions.hpp"

namespace irrepwise {
namespace {

constexpr double near = 1e-9;
const double golden_ratio = std::numbers::phi;

// Numbers whose meaning the notes below the table explain.
struct Notation {
  int root = 1;  // ε = exp(2πi/root)
  bool epsilon = false;
  bool golden = false;
};

int root_of_unity(const Schoenflies& symbol) {
  switch (symbol.family) {
    case Family::T:
    case Family::Th:
      return 3;
    case Family::S2n:
      return 2 * symbol.n;
    default:
      return symbol.n;
  }
}

std::string real_text(double value, Notation& notation) {
  for (const auto& [size, name] : {std::pair{golden_ratio, "φ"}, {1.0 / golden_ratio, "1/φ"}}) {
    if (std::abs(std::abs(value) - size) > near) continue;
    notation.golden = true;
    return (value < 0.0 ? "-" : "") + std::string(name);
  }
  const std::optional<std::string> exact = exact_form(value);
  if (exact && exact->find('/') == std::string::npos) return *exact;
  return fmt::format("{:.3f}", value);
}

std::string power_of_epsilon(int k, Notation& notation) {
  notation.epsilon = true;
  const int folded = std::min(k, notation.root - k);
  return "ε" + (folded > 1 ? superscript(folded) : "") + (folded == k ? "" : "*");
}

std::string complex_text(const std::complex<double>& value, Notation& notation) {
  if (std::abs(value.imag()) < near) return real_text(value.real(), notation);
  if (std::abs(value.real()) < near && std::abs(std::abs(value.imag()) - 1.0) < near) {
    return value.imag() > 0.0 ? "i" : "-i";
  }
  for (const double sign : {1.0, -1.0}) {
    const double turns = std::arg(sign * value) / (2.0 * std::numbers::pi) * notation.root;
    constexpr double near_whole = 1e-6;  // turns; arg is right to 1e-15
    const double whole = std::round(turns);
    if (std::abs(turns - whole) > near_whole) continue;
    const int k = (static_cast<int>(whole) % notation.root + notation.root) % notation.root;
    return (sign < 0.0 ? "-" : "") + power_of_epsilon(k, notation);
  }
  return fmt::format("{:.3f}{:+.3f}i", value.real(), value.imag());
}

// Characters of the continuous groups depend on the angle: 2 cos mφ.
std::string infinite_text(const Schoenflies& symbol, const ConjugacyClass& conjugacy,
                          const Irrep& irrep, double value, Notation& notation) {
  const bool by_angle = conjugacy.symbol.find("phi") != std::string::npos;
  if (!by_angle || symbol.is_finite() || irrep.dimension == 1) return real_text(value, notation);
  int m = 0;
  for (const auto& [name, number] :
       {std::pair{"Pi", 1}, std::pair{"Delta", 2}, std::pair{"Phi", 3}}) {
    if (irrep.label.starts_with(name)) m = number;
  }
  // Sφ = σh C(φ): the sign is the parity of z times that of the angle, as at φ = 0.
  const bool improper = conjugacy.symbol.find('S') != std::string::npos;
  const bool gerade = irrep.label.ends_with("g");
  const bool negative = improper && (gerade == (m % 2 != 0));
  return fmt::format("{}2cos{}φ", negative ? "-" : "", m == 1 ? "" : std::to_string(m));
}

struct Line {
  std::string label;
  std::string bracket;
  std::vector<std::string> characters;  // by class
};

std::vector<Line> lines_of(const PointGroup& group, Notation& notation) {
  std::vector<Line> lines;
  for (const Irrep& irrep : group.irreps()) {
    const auto line = [&](const std::string& label, const std::string& bracket, auto&& text) {
      Line result{label, bracket, {}};
      for (const ConjugacyClass& conjugacy : group.classes()) {
        result.characters.push_back(text(conjugacy));
      }
      lines.push_back(std::move(result));
    };
    if (!irrep.complex_pair) {
      line(irrep.label, "", [&](const ConjugacyClass& c) {
        return infinite_text(group.symbol(), c, irrep, irrep.characters[c.operations.front()],
                             notation);
      });
      continue;
    }
    line(irrep.label, "┌", [&](const ConjugacyClass& c) {
      return complex_text(complex_character(irrep, c.operations.front()), notation);
    });
    line("", "└", [&](const ConjugacyClass& c) {
      return complex_text(std::conj(complex_character(irrep, c.operations.front())), notation);
    });
  }
  return lines;
}

std::string group_order_words(const PointGroup& group) {
  const std::string name = group.symbol().name();
  return group.symbol().is_finite() ? fmt::format("{}, order {}", name, group.order())
                                    : name + ", infinite order";
}

}  // namespace

std::complex<double> complex_character(const Irrep& irrep, int operation) {
  const Eigen::MatrixXd& matrix = irrep.matrices[operation];
  return {matrix(0, 0), matrix(1, 0)};
}

std::vector<Table> character_tables(const PointGroup& group, int width) {
  Notation notation{root_of_unity(group.symbol()), false, false};
  const std::vector<Line> lines = lines_of(group, notation);
  const bool has_pairs = std::any_of(lines.begin(), lines.end(),
                                     [](const Line& line) { return !line.bracket.empty(); });
  int label_width = 5;
  for (const Line& line : lines) {
    label_width = std::max(label_width, display_width(readable_label(line.label)));
  }
  std::vector<Table> tables;
  std::size_t next = 0;
  while (next < group.classes().size()) {
    Table table;
    table.caption = (next == 0 ? "Character table of " : "Character table, continued: ") +
                    group_order_words(group);
    table.columns.push_back({"irrep", "irrep", "", Align::Left, 0, false});
    if (has_pairs) table.columns.push_back({"pair", "", "", Align::Left, 0, false});
    int used = 2 + label_width + (has_pairs ? 3 : 0);
    const std::size_t first = next;
    for (; next < group.classes().size(); ++next) {
      const std::string header = readable_class(group.classes()[next].symbol);
      int column_width = display_width(header);
      for (const Line& line : lines) {
        column_width = std::max(column_width, display_width(line.characters[next]));
      }
      used += 2 + column_width;
      if (used > width && next > first) break;
      table.columns.push_back({group.classes()[next].symbol, header, "", Align::Right, 0, false});
    }
    for (const Line& line : lines) {
      Row row{{SymmetryLabel{line.label}}};
      if (has_pairs) row.cells.emplace_back(line.bracket);
      for (std::size_t c = first; c < next; ++c) row.cells.emplace_back(line.characters[c]);
      table.lines.emplace_back(std::move(row));
    }
    tables.push_back(std::move(table));
  }
  if (notation.epsilon) {
    tables.back().notes.push_back(
        fmt::format("ε = exp(2πi/{}), * its complex conjugate.", notation.root));
  }
  if (has_pairs) {
    tables.back().notes.push_back(
        "Rows joined by a bracket are complex conjugates and count as one degenerate level.");
  }
  if (notation.golden) tables.back().notes.push_back("φ = (1 + √5)/2 = 1.618.");
  if (!group.symbol().is_finite()) {
    tables.back().notes.push_back(group.symbol().family == Family::Kh
                                      ? "Irreps of s, p, d and f orbitals."
                                      : "Irreps up to those of f orbitals; the list has no end.");
  }
  return tables;
}

Table function_table(const PointGroup& group) {
  Table table;
  table.caption = "Functions by irrep";
  table.columns = {{"irrep", "irrep", "", Align::Left, 0, false},
                   {"linear", "linear, rotations", "", Align::Left, 0, false},
                   {"quadratic", "quadratic", "", Align::Left, 0, true},
                   {"cubic", "cubic", "", Align::Left, 1, true}};
  const auto by_irrep = assign_functions(group);
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    std::string linear, quadratic, cubic;
    for (const FunctionSet& set : by_irrep[i]) {
      std::string& words = set.kind == FunctionKind::Quadratic ? quadratic
                           : set.kind == FunctionKind::Cubic   ? cubic
                                                               : linear;
      words += (words.empty() ? "" : ", ") + readable_functions(set);
    }
    table.lines.emplace_back(
        Row{{SymmetryLabel{group.irreps()[i].label}, linear, quadratic, cubic}});
  }
  return table;
}

}  // namespace irrepwise
