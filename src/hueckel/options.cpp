#include "hueckel/options.hpp"

#include <array>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr std::array all_rules = {Rule::Weighted, Rule::WolfsbergHelmholz, Rule::GeometricMean,
                                  Rule::Cusachs};

}  // namespace

std::string rule_name(Rule rule) {
  switch (rule) {
    case Rule::Weighted:
      return "weighted";
    case Rule::WolfsbergHelmholz:
      return "wolfsberg-helmholz";
    case Rule::GeometricMean:
      return "geometric-mean";
    case Rule::Cusachs:
      return "cusachs";
  }
  return {};
}

Rule parse_rule(const std::string& name) {
  std::vector<std::string> names;
  for (const Rule rule : all_rules) {
    if (rule_name(rule) == name) return rule;
    names.push_back(rule_name(rule));
  }
  const std::string nearest = nearest_word(name, names);
  throw Error(fmt::format("unknown rule {}; {}the rules are {}", quoted(name),
                          nearest.empty() ? "" : fmt::format("did you mean '{}'? ", nearest),
                          joined(names)));
}

std::optional<double> default_k(Rule rule) {
  switch (rule) {
    case Rule::Weighted:
    case Rule::WolfsbergHelmholz:
      return 1.75;
    case Rule::GeometricMean:
      return 2.0;
    case Rule::Cusachs:
      return std::nullopt;
  }
  return std::nullopt;
}

}  // namespace irrepwise
