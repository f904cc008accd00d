// Parameter sets: valence electrons and shells for each element, with sources; reading them.
#pragma once

#include <map>
#include <string>
#include <string_view>
#include <vector>

#include "basis/shell.hpp"

namespace irrepwise {

struct ElementParameters {
  int valence_electrons = 0;
  std::vector<ShellParameters> shells;  // in the order of the set: ns, np, (n-1)d, (n-2)f
};

/// A named set of parameters by atomic number.
class ParameterSet {
 public:
  ParameterSet(std::string name, std::map<int, ElementParameters> elements);

  [[nodiscard]] const std::string& name() const noexcept { return name_; }
  [[nodiscard]] const std::map<int, ElementParameters>& elements() const noexcept {
    return elements_;
  }

  /// @throws Error  where the element is absent: names it and shows the YAML that supplies it
  [[nodiscard]] const ElementParameters& at(int atomic_number) const;

  /// @returns  this set with the other's elements replacing or joining its own, named after both
  [[nodiscard]] ParameterSet extended_by(const ParameterSet& other) const;

 private:
  std::string name_;
  std::map<int, ElementParameters> elements_;
};

/// The set compiled into the program, params/published.yaml.
[[nodiscard]] const ParameterSet& published_parameters();

/// @throws Error  with file, line and column
[[nodiscard]] ParameterSet parse_parameters(std::string_view yaml, const std::string& file_name);
[[nodiscard]] ParameterSet read_parameters(const std::string& path);

}  // namespace irrepwise
