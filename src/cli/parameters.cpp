// irrepwise parameters: what would be used for each element, with its source.
#include <memory>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/output_options.hpp"
#include "core/error.hpp"
#include "core/text.hpp"
#include "molecule/element.hpp"
#include "output/parameters_report.hpp"

namespace irrepwise::cli {
namespace {

struct ParametersOptions {
  std::vector<std::string> symbols;
  std::string file;
  OutputOptions output;
};

int element_named(const std::string& symbol) {
  if (const std::optional<int> found = atomic_number(symbol)) return *found;
  std::vector<std::string> known;
  for (int z = 1; z <= max_atomic_number; ++z) known.emplace_back(element_symbol(z));
  const std::string nearest = nearest_word(symbol, known);
  throw Error(fmt::format("unknown element '{}'; {}give a symbol such as Fe", symbol,
                          nearest.empty() ? "" : "did you mean '" + nearest + "'? Otherwise "));
}

// Those asked for, checked to be there, or all of the set.
std::vector<int> chosen_elements(const ParametersOptions& options, const ParameterSet& parameters) {
  std::vector<int> elements;
  for (const std::string& symbol : options.symbols) {
    elements.push_back(element_named(symbol));
    static_cast<void>(parameters.at(elements.back()));
  }
  if (!elements.empty()) return elements;
  for (const auto& [atomic_number, unused] : parameters.elements()) {
    elements.push_back(atomic_number);
  }
  return elements;
}

std::string written(const ParameterSet& parameters, const std::vector<int>& elements,
                    const OutputOptions& options) {
  switch (chosen_format(options)) {
    case Format::Json:
      return parameters_json(parameters, elements);
    case Format::Csv:
      return parameters_csv(parameters, elements);
    case Format::Yaml:
      return parameters_yaml(parameters, elements);
    case Format::Text:
    case Format::Markdown:
    case Format::Latex:
    case Format::Html:
      break;
  }
  return written_report(parameters_report(parameters, elements), options);
}

void run(const ParametersOptions& options) {
  const ParameterSet parameters =
      options.file.empty() ? published_parameters() : read_parameters(options.file);
  if (!options.file.empty()) refuse_to_overwrite(options.output, {options.file});
  const std::vector<int> elements = chosen_elements(options, parameters);
  emit(options.output, written(parameters, elements, options.output));
}

}  // namespace

Command add_parameters(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "parameters", "The parameters that would be used for each element, with their sources");
  const auto options = std::make_shared<ParametersOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  app->add_option("elements", options->symbols, "Symbols of elements; all of the set without any")
      ->option_text("ELEMENT ...");
  app->add_option("-p,--parameters", options->file,
                  "Parameter file (YAML) that replaces or extends the set in the program")
      ->option_text("FILE")
      ->group("Method");
  add_output_options(*app, options->output,
                     {"text", "json", "csv", "markdown", "latex", "html", "yaml"});
  app->footer(
      "Examples:\n"
      "  irrepwise parameters Pt Cl\n"
      "  irrepwise parameters Fe --format yaml --output mine.yaml   then change it, and\n"
      "  irrepwise levels complex.xyz --parameters mine.yaml");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
