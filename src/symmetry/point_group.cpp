#include "symmetry/point_group.hpp"

#include <cassert>
#include <cctype>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/text.hpp"
#include "symmetry/irreps.hpp"
#include "symmetry/product_table.hpp"
#include "symmetry/standard_operations.hpp"

namespace irrepwise {

PointGroup::PointGroup(const Schoenflies& symbol)
    : symbol_(symbol),
      operations_(standard_operations(symbol)),
      products_(product_table(operations_)) {
  inverses_.resize(operations_.size());
  for (int g = 0; g < order(); ++g) {
    for (int h = 0; h < order(); ++h) {
      if (product(g, h) == 0) inverses_[g] = h;
    }
  }
  classes_ = find_classes(symbol_, operations_, products_, inverses_);
  irreps_ = generate_irreps(symbol_, operations_);

  [[maybe_unused]] int sum_of_squares = 0;
  for (const Irrep& irrep : irreps_) {
    sum_of_squares += irrep.complex_pair ? 2 : irrep.dimension * irrep.dimension;
  }
  assert(!symbol_.is_finite() || sum_of_squares == order());
}

int PointGroup::irrep_index(const std::string& label) const {
  const auto lower = [](std::string text) {
    for (char& c : text) c = static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
    return text;
  };
  std::vector<std::string> known;
  for (std::size_t i = 0; i < irreps_.size(); ++i) {
    if (lower(irreps_[i].label) == lower(label)) return static_cast<int>(i);
    known.push_back(level_label(irreps_[i].label));
  }
  const std::string nearest = nearest_word(label, known);
  throw Error(fmt::format("{} has no irrep '{}'; {}its irreps are {}", symbol_.name(), label,
                          nearest.empty() ? "" : fmt::format("did you mean {}? ", nearest),
                          joined(known)));
}

}  // namespace irrepwise
