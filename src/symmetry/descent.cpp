#include "symmetry/descent.hpp"

#include <algorithm>
#include <cctype>
#include <cmath>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/text.hpp"
#include "harmonics/real_harmonics.hpp"
#include "symmetry/angular_label.hpp"

namespace irrepwise {
namespace {

// Character of an irrep of a linear molecule under any operation of the continuous group.
double linear_character(const AngularIrrep& irrep, const Eigen::Matrix3d& operation) {
  const bool turned_over = operation(2, 2) < 0;
  // With the inversion taken out, what is left is a turn about the axis or a mirror through it.
  const Eigen::Matrix3d g = turned_over ? Eigen::Matrix3d(-operation) : operation;
  const bool mirror = g(0, 0) * g(1, 1) - g(0, 1) * g(1, 0) < 0;
  const double sign = turned_over ? irrep.inversion : 1.0;
  if (irrep.m == 0) return sign * (mirror ? irrep.reflection : 1.0);
  return mirror ? 0.0 : sign * 2.0 * std::cos(irrep.m * std::atan2(g(1, 0), g(0, 0)));
}

// Names compare without case and blanks, " as ''.
std::string comparable(std::string_view text) {
  std::string result;
  for (char c : ascii_label(text)) {
    if (c == '"')
      result += "''";
    else if (std::isspace(static_cast<unsigned char>(c)) == 0)
      result.push_back(static_cast<char>(std::tolower(static_cast<unsigned char>(c))));
  }
  return result;
}

std::string names_of(const std::vector<Embedding>& ways) {
  std::vector<std::string> names;
  for (const Embedding& way : ways) names.push_back(way.name);
  return joined(names, "or");
}

// What might be a subgroup by its order alone, by falling order.
std::vector<Schoenflies> candidates(const PointGroup& group) {
  std::vector<std::pair<int, Schoenflies>> found;
  const auto add = [&](Schoenflies symbol, int order) {
    if (order < group.order() && group.order() % order == 0) found.emplace_back(order, symbol);
  };
  add({Family::Ih, 1}, 120);
  add({Family::I, 1}, 60);
  add({Family::Oh, 1}, 48);
  for (Family family : {Family::O, Family::Th, Family::Td}) add({family, 1}, 24);
  add({Family::T, 1}, 12);
  for (int n = std::min(group.order(), Schoenflies::max_n); n >= 2; --n) {
    add({Family::Dnh, n}, 4 * n);
    add({Family::Dnd, n}, 4 * n);
    add({Family::Dn, n}, 2 * n);
    add({Family::Cnv, n}, 2 * n);
    add({Family::Cnh, n}, 2 * n);
    add({Family::S2n, n}, 2 * n);
    add({Family::Cn, n}, n);
  }
  add({Family::Cs, 1}, 2);
  add({Family::Ci, 1}, 2);
  add({Family::C1, 1}, 1);
  std::stable_sort(found.begin(), found.end(),
                   [](const auto& a, const auto& b) { return a.first > b.first; });
  std::vector<Schoenflies> symbols;
  for (const auto& [order, symbol] : found) symbols.push_back(symbol);
  return symbols;
}

}  // namespace

double continuous_character(const PointGroup& group, std::size_t irrep,
                            const Eigen::Matrix3d& operation) {
  if (group.symbol().family == Family::Kh) {
    return harmonic_rotation(static_cast<int>(irrep), operation).trace();
  }
  return linear_character(parse_angular_label(group.symbol(), group.irreps()[irrep].label),
                          operation);
}

Embedding find_embedding(const PointGroup& group, std::string_view text) {
  const std::string_view symbol_part = trimmed(text.substr(0, text.find('(')));
  const Schoenflies symbol = parse_schoenflies(symbol_part);
  std::vector<Embedding> ways = embeddings(group, symbol);
  if (ways.empty()) {
    std::string hint = "name a subgroup";
    if (group.symbol().is_finite()) {
      std::vector<std::string> names;
      for (const Schoenflies& known : subgroup_symbols(group)) names.push_back(known.name());
      if (!names.empty()) hint = "its subgroups are " + joined(names);
    }
    throw Error(
        fmt::format("{} is no subgroup of {}; {}", symbol.name(), group.symbol().name(), hint));
  }
  for (Embedding& way : ways) {
    if (comparable(way.name) == comparable(text)) return std::move(way);
  }
  const bool plain = symbol_part.size() == trimmed(text).size();
  if (plain && ways.size() == 1) return std::move(ways.front());
  if (ways.size() == 1) {
    throw Error(fmt::format("'{}': there is only one way from {} to {}; write {}", text,
                            group.symbol().name(), symbol.name(), ways.front().name));
  }
  throw Error(fmt::format("'{}': {} lies in {} in {} ways; choose {}", text, symbol.name(),
                          group.symbol().name(), ways.size(), names_of(ways)));
}

std::vector<std::vector<int>> correlate(const PointGroup& group, const Embedding& embedding) {
  const PointGroup& subgroup = embedding.subgroup;
  std::vector<std::vector<int>> counts;
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    std::vector<double> characters;
    for (int h = 0; h < subgroup.order(); ++h) {
      characters.push_back(embedding.operations.empty()
                               ? continuous_character(group, i,
                                              embedding.rotation.transpose() *
                                                  subgroup.operations()[h] * embedding.rotation)
                               : group.irreps()[i].characters[embedding.operations[h]]);
    }
    std::vector<int>& row = counts.emplace_back();
    for (const Irrep& irrep : subgroup.irreps()) {
      double sum = 0.0;
      for (int h = 0; h < subgroup.order(); ++h) sum += irrep.characters[h] * characters[h];
      row.push_back(static_cast<int>(
          std::lround(sum / (subgroup.order() * (irrep.complex_pair ? 2.0 : 1.0)))));
    }
  }
  return counts;
}

std::vector<Schoenflies> subgroup_symbols(const PointGroup& group) {
  std::vector<Schoenflies> found;
  if (!group.symbol().is_finite()) return found;
  for (const Schoenflies& symbol : candidates(group)) {
    if (!embeddings(group, symbol).empty()) found.push_back(symbol);
  }
  return found;
}

}  // namespace irrepwise
