#include "symmetry/reduction.hpp"

#include <fmt/format.h>

namespace irrepwise {

std::string reduction_text(const Reduction& reduction) {
  std::string text;
  for (const IrrepCount& irrep : reduction) {
    if (!text.empty()) text += " + ";
    text += irrep.count == 1 ? irrep.label : fmt::format("{}{}", irrep.count, irrep.label);
  }
  return text.empty() ? "0" : text;
}

int total_dimension(const Reduction& reduction) {
  int total = 0;
  for (const IrrepCount& irrep : reduction) total += irrep.count * irrep.dimension;
  return total;
}

int count_of(const Reduction& reduction, const std::string& label) {
  for (const IrrepCount& irrep : reduction) {
    if (irrep.label == label) return irrep.count;
  }
  return 0;
}

}  // namespace irrepwise
