#include "output/table_document.hpp"

namespace irrepwise {

Json table_document(const LevelsResult& result, const std::string& source) {
  return {{"schema", "irrepwise.table.1"},
          {"title", result.title},
          {"geometry", source},
          {"formula", hill_formula(result.molecule)},
          {"charge", result.molecule.charge()},
          {"point_group", result.symmetry.group.symbol().name()},
          {"axes", result.symmetry.axes},
          {"method",
           {{"rule", rule_name(result.levels.rule)},
            {"k", result.levels.k ? Json(finite_number(*result.levels.k)) : Json(nullptr)},
            {"parameter_set", result.parameter_set}}}};
}

}  // namespace irrepwise
