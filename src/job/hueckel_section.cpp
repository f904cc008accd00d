#include <string>

#include <fmt/format.h>

#include "core/error.hpp"
#include "job/job_file.hpp"

namespace irrepwise {
namespace {

Rule read_rule(const YamlNode& node) {
  const std::string& name = node.word("the name of a rule");
  try {
    return parse_rule(name);
  } catch (const Error& error) {
    throw error_at(node.place(), error);
  }
}

std::map<std::string, int> read_occupations(const YamlNode& node) {
  std::map<std::string, int> electrons;
  for (const YamlNode::Entry& entry : node.map("irreps with their electrons, e.g. {a1g: 4}")) {
    const int count = entry.value.whole_number("a whole number of electrons");
    if (count < 0) {
      entry.value.fail(fmt::format("found {} electrons, expected 0 or more", count));
    }
    electrons[entry.key.word()] = count;
  }
  if (electrons.empty()) node.fail("found no irrep, expected electrons for at least one");
  return electrons;
}

}  // namespace

HueckelOptions read_hueckel(const YamlNode& job, const YamlNode* variant) {
  const auto says = [&](const char* key) { return variant && variant->find(key); };
  // What the variant says makes the job's own words of no account, also of what they go with: its K
  // was meant for its rule, its occupations for its irreps.
  const auto find = [&](const char* key, const char* with) -> const YamlNode* {
    if (says(key)) return variant->find(key);
    return says(with) ? nullptr : job.find(key);
  };
  HueckelOptions options;
  if (const YamlNode* const rule = find("rule", "")) options.rule = read_rule(*rule);
  if (const YamlNode* const k = find("k", "rule")) {
    options.k = k->number("a number");
    if (!default_k(options.rule)) {
      k->fail(fmt::format("the rule {} has no K; remove this line", rule_name(options.rule)));
    }
    constexpr double largest_k = 10.0;  // far beyond any use: a slip of the decimal point
    if (!(*options.k > 0.0 && *options.k <= largest_k)) {
      k->fail(
          fmt::format("found K = {}, expected more than 0 and at most {}", *options.k, largest_k));
    }
  }
  const YamlNode* const occupations = find("occupations", "multiplicity");
  if (const YamlNode* const multiplicity = find("multiplicity", "occupations")) {
    options.multiplicity = multiplicity->whole_number("a multiplicity 2S + 1");
    if (*options.multiplicity < 1) {
      multiplicity->fail(
          fmt::format("found a multiplicity of {}, expected 1 or more", *options.multiplicity));
    }
    if (occupations) {
      occupations->fail("`multiplicity` and `occupations` exclude each other; keep one");
    }
  }
  if (occupations) options.electrons_by_irrep = read_occupations(*occupations);
  return options;
}

}  // namespace irrepwise
