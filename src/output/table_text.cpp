#include "output/table_text.hpp"

#include <algorithm>
#include <numeric>
#include <string>

#include "core/text.hpp"
#include "output/display_width.hpp"

namespace irrepwise {
namespace {

constexpr int indent = 2;
constexpr int gap = 2;
constexpr int narrowest_wrap = 22;  // a wrapping column below this is worse than one column fewer

// One column as it will be printed: its cells' texts and how wide it is.
struct Printed {
  const Column* column;
  std::vector<std::string> texts;  // one per row, aligned at the decimal point where that applies
  int width = 0;
};

Printed print_column(const Table& table, std::size_t index) {
  const Column& column = table.columns[index];
  Printed printed{&column, {}, display_width(column_title(column))};
  std::vector<DecimalParts> parts;
  int after = 0;
  for (const auto& line : table.lines) {
    if (const Row* row = std::get_if<Row>(&line)) {
      parts.push_back(decimal_parts(row->cells[index]));
      after = std::max(after, display_width(parts.back().after));
    }
  }
  for (const DecimalParts& part : parts) {
    // Filled up behind the point, and set to the right as a whole, the points meet.
    const bool decimal = column.align == Align::Decimal;
    printed.texts.push_back(part.before + padded_right(part.after, decimal ? after : 0));
    printed.width = std::max(printed.width, display_width(printed.texts.back()));
  }
  return printed;
}

int total_width(const std::vector<Printed>& columns) {
  return std::accumulate(columns.begin(), columns.end(), indent - gap,
                         [](int sum, const Printed& c) { return sum + gap + c.width; });
}

// With room for every column, wrapping ones as narrow as may be.
int width_for_all(const std::vector<Printed>& columns) {
  int width = total_width(columns);
  for (const Printed& column : columns) {
    if (column.column->wraps) width -= std::max(0, column.width - narrowest_wrap);
  }
  return width;
}

void narrow_wrapping(std::vector<Printed>& columns, int width, int narrowest) {
  for (Printed& column : columns) {
    const int excess = total_width(columns) - width;
    if (excess > 0 && column.column->wraps) {
      column.width = std::min(column.width, std::max(narrowest, column.width - excess));
    }
  }
}

// Those of the columns that are kept, narrowed to the width where that can be.
std::vector<Printed> kept_columns(const std::vector<Printed>& all, const std::vector<bool>& kept,
                                  int width, int narrowest) {
  std::vector<Printed> columns;
  for (std::size_t i = 0; i < all.size(); ++i) {
    if (kept[i]) columns.push_back(all[i]);
  }
  narrow_wrapping(columns, width, narrowest);
  return columns;
}

/// @returns  which columns to keep: the highest priority number goes first, and what has gone comes
///           back where there is room after all
std::vector<bool> choose_columns(const std::vector<Printed>& all, int width) {
  std::vector<bool> kept(all.size(), true);
  std::vector<std::size_t> order;
  for (std::size_t i = all.size(); i-- > 0;) {
    if (all[i].column->priority > 0) order.push_back(i);
  }
  std::stable_sort(order.begin(), order.end(), [&](std::size_t a, std::size_t b) {
    return all[a].column->priority > all[b].column->priority;
  });
  const auto fits = [&] {
    return total_width(kept_columns(all, kept, width, narrowest_wrap)) <= width;
  };
  std::size_t gone = 0;
  while (gone < order.size() && !fits()) kept[order[gone++]] = false;
  while (gone-- > 0) {
    kept[order[gone]] = true;
    if (!fits()) kept[order[gone]] = false;
  }
  return kept;
}

std::string aligned(const Printed& column, const std::string& text) {
  return column.column->align == Align::Left ? padded_right(text, column.width)
                                             : padded_left(text, column.width);
}

void add_line(std::string& out, std::string line) {
  line.erase(line.find_last_not_of(' ') + 1);
  out += line + '\n';
}

void add_row(std::string& out, const std::vector<Printed>& columns,
             const std::vector<std::string>& texts) {
  std::vector<std::vector<std::string>> pieces;
  std::size_t height = 1;
  for (std::size_t i = 0; i < columns.size(); ++i) {
    pieces.push_back(columns[i].column->wraps ? wrapped(texts[i], columns[i].width)
                                              : std::vector<std::string>{texts[i]});
    height = std::max(height, pieces.back().size());
  }
  for (std::size_t part = 0; part < height; ++part) {
    std::string line(indent - gap, ' ');
    for (std::size_t i = 0; i < columns.size(); ++i) {
      line += std::string(gap, ' ');
      line += aligned(columns[i], part < pieces[i].size() ? pieces[i][part] : "");
    }
    add_line(out, line);
  }
}

std::string rule(int width, const std::string& words) {
  std::string line(indent, ' ');
  int filled = indent;
  if (!words.empty()) {
    line += "── " + words + " ";
    filled += 4 + display_width(words);
  }
  for (; filled < width; ++filled) line += "─";
  return line;
}

}  // namespace

std::vector<int> text_widths(const Table& table) {
  std::vector<int> widths;
  for (std::size_t i = 0; i < table.columns.size(); ++i) {
    widths.push_back(gap + print_column(table, i).width);
  }
  return widths;
}

std::string table_text(const Table& table, int width) {
  std::vector<Printed> all;
  for (std::size_t i = 0; i < table.columns.size(); ++i) all.push_back(print_column(table, i));
  const std::vector<bool> kept = choose_columns(all, width);
  std::vector<Printed> columns = kept_columns(all, kept, width, narrowest_wrap);
  if (total_width(columns) > width) columns = kept_columns(all, kept, width, 1);
  std::vector<std::string> dropped;
  for (std::size_t i = 0; i < all.size(); ++i) {
    if (!kept[i]) dropped.push_back(all[i].column->header);
  }
  const int rule_width = total_width(columns);

  std::string out;
  if (!table.caption.empty()) {
    for (const std::string& line : wrapped(table.caption, width)) add_line(out, line);
  }
  if (!table.legend.empty()) {
    for (const std::string& line : wrapped(table.legend, width)) add_line(out, line);
    add_line(out, "");
  }
  std::vector<std::string> titles;
  for (const Printed& column : columns) titles.push_back(column_title(*column.column));
  add_row(out, columns, titles);
  add_line(out, rule(rule_width, ""));
  std::size_t row = 0;
  for (const auto& line : table.lines) {
    if (const auto* separator = std::get_if<Separator>(&line)) {
      add_line(out, rule(rule_width, separator->words));
      continue;
    }
    std::vector<std::string> texts;
    for (const Printed& column : columns) texts.push_back(column.texts[row]);
    add_row(out, columns, texts);
    ++row;
  }
  std::vector<std::string> notes = table.notes;
  if (!dropped.empty()) {
    notes.push_back("Left out for want of width: " + joined(dropped) + "; a width of " +
                    std::to_string(width_for_all(all)) + " holds all.");
  }
  for (const std::string& note : notes) {
    for (const std::string& line : wrapped(note, width - indent)) {
      add_line(out, std::string(indent, ' ') + line);
    }
  }
  return out;
}

}  // namespace irrepwise
