// The table model: what every command fills and every writer reads.
#pragma once

#include <string>
#include <variant>
#include <vector>

namespace irrepwise {

/// A number with the digits that people shall see; programs get it in full.
struct Number {
  double value = 0.0;
  int digits = 3;          // after the decimal point
  bool with_plus = false;  // "+0.62", for charges
};

/// The label of an irrep or a level in ASCII ("2e1g"); each writer typesets it in its own way.
struct SymmetryLabel {
  std::string ascii;
};

/// Words with labels of symmetry among them, these in braces: "{a1g} + 2{eg}".
struct Words {
  std::string marked;
};

using Cell = std::variant<std::monostate, std::string, Number, SymmetryLabel, Words>;

enum class Align { Left, Right, Decimal };

struct Column {
  std::string key;     // for programs: "energy_ev"
  std::string header;  // for people: "energy"
  std::string unit;    // "eV"; empty where there is none
  Align align = Align::Left;
  int priority = 0;        // 0: always kept; a narrow terminal drops the highest first
  bool wraps = false;      // long text may run over several lines
  std::string label = {};  // symmetry label in ASCII that stands right before the header: "2e1g"
};

/// A line across the table, with a few words in it or none.
struct Separator {
  std::string words;
};

struct Row {
  std::vector<Cell> cells;  // as many as there are columns
};

struct Table {
  std::string caption;  // a few words: what it is
  std::vector<Column> columns;
  std::vector<std::variant<Row, Separator>> lines;
  std::vector<std::string> notes;
  std::string legend = {};  // sentences that let it stand alone: method, geometry, axes, units
};

/// @returns  "energy / eV", "2e1g:1"
[[nodiscard]] std::string column_title(const Column& column);

/// For people: numbers with their digits (never "-0.00"), labels in readable form.
[[nodiscard]] std::string cell_text(const Cell& cell);

/// For programs: the shortest digits that read back as the same double, labels in ASCII.
[[nodiscard]] std::string cell_exact(const Cell& cell);

/// Words taken apart, in order.
struct WordsPart {
  std::string text;
  bool is_label = false;  // then in ASCII
};
[[nodiscard]] std::vector<WordsPart> parts_of(const Words& words);

/// A number's text in two parts, "-12" and ".345"; any other cell is all in the first.
struct DecimalParts {
  std::string before;
  std::string after;
};
[[nodiscard]] DecimalParts decimal_parts(const Cell& cell);

}  // namespace irrepwise
