#include "basis/parameter_set.hpp"

#include <filesystem>
#include <utility>

#include <fmt/format.h>

#include "basis/parameter_template.hpp"
#include "basis/parameter_yaml.hpp"
#include "core/error.hpp"
#include "core/file.hpp"
#include "core/yaml.hpp"
#include "molecule/element.hpp"

namespace irrepwise {

extern const std::string_view published_yaml;  // params/published.yaml, embedded by the build

ParameterSet::ParameterSet(std::string name, std::map<int, ElementParameters> elements)
    : name_(std::move(name)), elements_(std::move(elements)) {}

const ElementParameters& ParameterSet::at(int atomic_number) const {
  const auto found = elements_.find(atomic_number);
  if (found != elements_.end()) return found->second;
  throw Error(fmt::format(
      "no parameters for {} in the set '{}'; supply them, with numbers of your own for the dots, "
      "in a file for --parameters:\n"
      "extends: published\n"
      "elements:\n"
      "{}",
      element_symbol(atomic_number), name_, parameter_template(atomic_number)));
}

ParameterSet ParameterSet::extended_by(const ParameterSet& other) const {
  std::map<int, ElementParameters> elements = other.elements_;
  elements.insert(elements_.begin(), elements_.end());  // keeps what is already there
  return ParameterSet(fmt::format("{} + {}", name_, other.name_), std::move(elements));
}

const ParameterSet& published_parameters() {
  static const ParameterSet set = parse_parameters(published_yaml, "params/published.yaml");
  return set;
}

ParameterSet parse_parameters(std::string_view yaml, const std::string& file_name) {
  return read_parameter_set(YamlNode::parse(yaml, file_name),
                            std::filesystem::path(file_name).stem().string());
}

ParameterSet read_parameters(const std::string& path) {
  return parse_parameters(read_text_file(path), path);
}

}  // namespace irrepwise
