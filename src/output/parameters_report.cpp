#include "output/parameters_report.hpp"

#include <string>

#include <fmt/format.h>

#include "core/error.hpp"
#include "molecule/element.hpp"
#include "output/json_text.hpp"
#include "output/table_csv.hpp"

namespace irrepwise {
namespace {

std::string shell_name(const ShellParameters& shell) {
  return fmt::format("{}{}", shell.n, shell_letter(shell.l));
}

Table parameter_table(const ParameterSet& parameters, const std::vector<int>& elements) {
  Table table;
  table.columns = {{"element", "element", "", Align::Left, 0, false},
                   {"valence_electrons", "electrons", "", Align::Right, 3, false},
                   {"shell", "shell", "", Align::Left, 0, false},
                   {"h_ii_ev", "H_ii", "eV", Align::Decimal, 0, false},
                   {"exponent_1", "ζ1", "", Align::Decimal, 0, false},
                   {"coefficient_1", "c1", "", Align::Decimal, 0, false},
                   {"exponent_2", "ζ2", "", Align::Decimal, 0, false},
                   {"coefficient_2", "c2", "", Align::Decimal, 0, false},
                   {"source", "source", "", Align::Left, 2, true}};
  for (const int element : elements) {
    const ElementParameters& found = parameters.at(element);
    for (const ShellParameters& shell : found.shells) {
      Row row{{std::string(element_symbol(element)), Number{double(found.valence_electrons), 0},
               shell_name(shell), Number{shell.h_ii_ev, 3}}};
      for (std::size_t i = 0; i < 2; ++i) {
        if (i < shell.radial.terms().size()) {
          const ContractedRadial::Term& term = shell.radial.terms()[i];
          row.cells.emplace_back(Number{term.function.zeta(), 4});
          row.cells.emplace_back(Number{term.coefficient, 4});
        } else {
          row.cells.insert(row.cells.end(), 2, Cell());
        }
      }
      row.cells.emplace_back(shell.source);
      table.lines.emplace_back(std::move(row));
    }
  }
  return table;
}

std::string quoted_yaml(const std::string& text) {
  std::string out = "\"";
  for (const char c : text) {
    if (c == '"' || c == '\\') out += '\\';
    out += c == '\n' ? ' ' : c;
  }
  return out + '"';
}

// The fewest digits that scale to the same coefficients on reading, as published ones do with four.
std::string coefficients_text(const ContractedRadial& radial) {
  const auto terms = radial.terms();
  const auto rounded = [](double value, int digits) {
    return std::stod(fmt::format("{:.{}f}", value, digits));
  };
  constexpr int all_digits = 17;
  for (int digits = 3; digits < all_digits; ++digits) {
    const double c0 = rounded(terms[0].coefficient, digits);
    const double c1 = rounded(terms[1].coefficient, digits);
    try {
      const ContractedRadial again({{terms[0].function, c0}, {terms[1].function, c1}});
      if (again.terms()[0].coefficient == terms[0].coefficient &&
          again.terms()[1].coefficient == terms[1].coefficient) {
        return fmt::format("{}, {}", c0, c1);
      }
    } catch (const Error&) {  // so few digits that it looks like a misprint
    }
  }
  return fmt::format("{}, {}", terms[0].coefficient, terms[1].coefficient);
}

// "exponent: 1.3", or both exponents with their coefficients.
std::string yaml_radial(const ContractedRadial& radial) {
  const auto terms = radial.terms();
  if (terms.size() == 1) return fmt::format("exponent: {}", terms[0].function.zeta());
  return fmt::format("exponents: [{}, {}], coefficients: [{}]", terms[0].function.zeta(),
                     terms[1].function.zeta(), coefficients_text(radial));
}

}  // namespace

Report parameters_report(const ParameterSet& parameters, const std::vector<int>& elements) {
  Report report;
  report.title = fmt::format("Parameter set: {}", parameters.name());
  report.facts = {{"radial part",
                   {"N r^(n−1) (c1 e^(−ζ1 r) + c2 e^(−ζ2 r)), ζ in 1/bohr; each term "
                    "and the whole of norm\u00A01"}}};
  report.tables.push_back(parameter_table(parameters, elements));
  return report;
}

std::string parameters_csv(const ParameterSet& parameters, const std::vector<int>& elements) {
  return table_csv(parameter_table(parameters, elements));
}

std::string parameters_json(const ParameterSet& parameters, const std::vector<int>& elements) {
  Json list = Json::array();
  for (const int element : elements) {
    const ElementParameters& found = parameters.at(element);
    Json shells = Json::array();
    for (const ShellParameters& shell : found.shells) {
      Json terms = Json::array();
      for (const ContractedRadial::Term& term : shell.radial.terms()) {
        terms.push_back({{"exponent", finite_number(term.function.zeta())},
                         {"coefficient", finite_number(term.coefficient)}});
      }
      shells.push_back({{"shell", shell_name(shell)},
                        {"n", shell.n},
                        {"l", shell.l},
                        {"h_ii_ev", finite_number(shell.h_ii_ev)},
                        {"terms", terms},
                        {"source", shell.source}});
    }
    list.push_back({{"element", element_symbol(element)},
                    {"atomic_number", element},
                    {"valence_electrons", found.valence_electrons},
                    {"shells", shells}});
  }
  return json_text(Json{{"schema", "irrepwise.parameters.1"},
                        {"parameter_set", parameters.name()},
                        {"elements", list}});
}

std::string parameters_yaml(const ParameterSet& parameters, const std::vector<int>& elements) {
  std::string out = fmt::format("name: {}\n\nelements:\n", quoted_yaml(parameters.name()));
  for (const int element : elements) {
    const ElementParameters& found = parameters.at(element);
    out += fmt::format("  {}:\n    valence_electrons: {}\n    shells:\n", element_symbol(element),
                       found.valence_electrons);
    for (const ShellParameters& shell : found.shells) {
      out += fmt::format("      - {{shell: {}, h_ii: {}, {},\n         source: {}}}\n",
                         shell_name(shell), shell.h_ii_ev, yaml_radial(shell.radial),
                         quoted_yaml(shell.source));
    }
  }
  return out;
}

}  // namespace irrepwise
