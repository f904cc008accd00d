#include "output/latex_columns.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <optional>
#include <string_view>

#include <fmt/format.h>

namespace irrepwise {
namespace {

constexpr double page = 88.0;  // digits of 10 pt in 16 cm, and a little air
constexpr double gap = 2.4;    // between columns, in digits: twice \tabcolsep, 6 pt each

struct Size {
  const char* command;
  double scale;
  double narrowest;  // letters of a paragraph: better small letters than one of many short lines
};
constexpr std::array<Size, 3> sizes = {
    {{"", 1.0, 36.0}, {"\\small", 0.9, 32.0}, {"\\footnotesize", 0.8, 22.0}}};

using Indices = std::vector<std::size_t>;

// In digits: capitals and signs are wider than they, small letters about as wide.
double wide(const std::string& text) {
  double sum = 0.0;
  for (const char c : text) {
    const auto byte = static_cast<unsigned char>(c);
    if ((byte & 0xC0u) == 0x80u) continue;  // goes on with a letter of UTF-8
    const bool wider =
        std::isupper(byte) != 0 || std::string_view("%+-=<>").find(c) != std::string_view::npos;
    sum += wider ? 1.5 : 1.0;
  }
  return sum;
}

double wide(const Table& table, std::size_t column) {
  double before = 0.0;
  double after = 0.0;
  const double title = wide(column_title(table.columns[column]));
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    const DecimalParts parts = decimal_parts(row->cells[column]);
    before = std::max(before, wide(parts.before));
    after = std::max(after, wide(parts.after));
  }
  return std::max(title, before + after);
}

class Page {
 public:
  explicit Page(const Table& table) : table_(table) {
    for (std::size_t i = 0; i < table.columns.size(); ++i) letters_.push_back(wide(table, i));
  }

  // The columns at one size of letters, nothing where they do not fit.
  [[nodiscard]] std::optional<LatexPart> fitted(const Indices& columns, const Size& size) const {
    double left = page / size.scale;
    std::vector<std::size_t> paragraphs;
    for (const std::size_t i : columns) {
      left -= gap;
      if (table_.columns[i].wraps) {
        paragraphs.push_back(i);
      } else {
        left -= letters_[i];
      }
    }
    if (left < 0.0) return std::nullopt;
    // The narrow ones take what they need, and the others share the rest.
    std::sort(paragraphs.begin(), paragraphs.end(),
              [&](std::size_t a, std::size_t b) { return letters_[a] < letters_[b]; });
    std::vector<double> width(letters_.size(), 0.0);
    for (std::size_t k = 0; k < paragraphs.size(); ++k) {
      const double share = left / static_cast<double>(paragraphs.size() - k);
      width[paragraphs[k]] = std::min(letters_[paragraphs[k]], share);
      left -= width[paragraphs[k]];
    }
    LatexPart part{size.command, {}};
    for (const std::size_t i : columns) {
      const Column& column = table_.columns[i];
      if (!column.wraps || width[i] >= letters_[i]) {
        part.columns.push_back({i, column.align == Align::Left ? "l" : "r"});
      } else if (width[i] < size.narrowest) {
        return std::nullopt;
      } else {
        part.columns.push_back(
            {i, fmt::format(">{{\\raggedright\\arraybackslash}}p{{{:.2f}\\linewidth}}",
                            width[i] * size.scale / page)});
      }
    }
    return part;
  }

 private:
  const Table& table_;
  std::vector<double> letters_;
};

}  // namespace

std::vector<LatexPart> latex_parts(const Table& table) {
  const Page sheet(table);
  Indices all(table.columns.size());
  for (std::size_t i = 0; i < all.size(); ++i) all[i] = i;
  for (const Size& size : sizes) {
    if (const auto part = sheet.fitted(all, size)) return {*part};
  }
  if (all.size() == 1) return {{sizes.back().command, {{0, "l"}}}};  // runs over, but is there
  std::vector<LatexPart> parts;
  const Size& smallest = sizes.back();
  for (std::size_t next = 1; next < all.size();) {
    Indices columns = {0, next++};
    std::optional<LatexPart> part = sheet.fitted(columns, smallest);
    if (!part) {  // runs over; there is nothing narrower to offer
      parts.push_back({smallest.command, {{columns[0], "l"}, {columns[1], "l"}}});
      continue;
    }
    for (; next < all.size(); ++next) {
      columns.push_back(next);
      const std::optional<LatexPart> wider = sheet.fitted(columns, smallest);
      if (!wider) break;
      part = wider;
    }
    parts.push_back(*part);
  }
  return parts;
}

}  // namespace irrepwise
