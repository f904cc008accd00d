#include "output/table.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "core/error.hpp"
#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

void refuse_non_finite(double value) {
  if (!std::isfinite(value)) {
    throw Error("a result is not a finite number; check the geometry and the parameters");
  }
}

std::string rounded(const Number& number) {
  refuse_non_finite(number.value);
  std::string text = fmt::format("{:.{}f}", number.value, number.digits);
  const bool is_zero = text.find_first_of("123456789") == std::string::npos;
  if (is_zero && text.front() == '-') text.erase(0, 1);
  if (number.with_plus && !is_zero && text.front() != '-') text.insert(0, 1, '+');
  return text;
}

template <typename WriteLabel>
std::string joined_parts(const Words& words, WriteLabel write_label) {
  std::string text;
  for (const WordsPart& part : parts_of(words)) {
    text += part.is_label ? write_label(part.text) : part.text;
  }
  return text;
}

}  // namespace

std::string column_title(const Column& column) {
  std::string title = column.header;
  if (!column.label.empty()) {
    title.insert(0, readable_label(column.label));
  }
  return column.unit.empty() ? title : title + " / " + column.unit;
}

std::string cell_text(const Cell& cell) {
  if (const auto* text = std::get_if<std::string>(&cell)) return *text;
  if (const auto* number = std::get_if<Number>(&cell)) return rounded(*number);
  if (const auto* label = std::get_if<SymmetryLabel>(&cell)) return readable_label(label->ascii);
  if (const auto* words = std::get_if<Words>(&cell)) return joined_parts(*words, readable_label);
  return {};
}

std::string cell_exact(const Cell& cell) {
  if (const auto* text = std::get_if<std::string>(&cell)) return *text;
  if (const auto* label = std::get_if<SymmetryLabel>(&cell)) return label->ascii;
  if (const auto* words = std::get_if<Words>(&cell)) {
    return joined_parts(*words, [](const std::string& ascii) { return ascii; });
  }
  if (const auto* number = std::get_if<Number>(&cell)) {
    refuse_non_finite(number->value);
    return fmt::format("{}", number->value + 0.0);  // + 0.0 turns -0 into 0
  }
  return {};
}

std::vector<WordsPart> parts_of(const Words& words) {
  std::vector<WordsPart> parts;
  bool inside = false;
  std::size_t start = 0;
  const std::string& text = words.marked;
  while (start < text.size()) {
    const std::size_t end = std::min(text.find(inside ? '}' : '{', start), text.size());
    if (end > start) parts.push_back({text.substr(start, end - start), inside});
    inside = !inside;
    start = end + 1;
  }
  return parts;
}

DecimalParts decimal_parts(const Cell& cell) {
  std::string text = cell_text(cell);
  if (!std::holds_alternative<Number>(cell)) return {std::move(text), {}};
  const std::size_t point = std::min(text.find('.'), text.size());
  return {text.substr(0, point), text.substr(point)};
}

}  // namespace irrepwise
