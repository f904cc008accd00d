// irrepwise compare: several molecules, or variants of one, side by side.
#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "cli/commands.hpp"
#include "cli/compared.hpp"
#include "cli/output_options.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "output/compare_columns.hpp"
#include "output/compare_json.hpp"
#include "output/compare_report.hpp"

namespace irrepwise::cli {
namespace {

struct CompareOptions {
  std::vector<std::string> files;
  std::string reference;
  std::vector<std::string> variants;
  CompareParts parts;
  std::optional<int> threads;
  OutputOptions output;
};

std::string written(const Comparison& comparison, const CompareOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return compare_json(comparison);
    case Format::Csv: {
      SummaryChoice choice = options.parts.summary;
      choice.differences = options.parts.differences;
      return compare_csv(comparison, choice);
    }
    case Format::Text:
    case Format::Markdown:
    case Format::Latex:
    case Format::Html:
    case Format::Yaml:
      break;
  }
  return written_report(compare_report(comparison, options.parts), options.output);
}

void run(CompareOptions options) {
  options.parts.differences = !options.reference.empty();
  const Compared result =
      compared(options.files, options.reference, options.threads, options.variants);
  refuse_to_overwrite(options.output, result.files_read);
  at_place("--columns", [&] { check_columns(result.comparison, options.parts.summary.columns); });
  if (const std::string& key = options.parts.summary.sort_by; !key.empty()) {
    at_place("--sort", [&] { check_columns(result.comparison, {key}); });
  }
  const std::string text = written(result.comparison, options);
  print_warnings(options.output, warnings_of(result.comparison));
  emit(options.output, text);
}

}  // namespace

Command add_compare(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "compare",
      "Several molecules, or variants of one, side by side: frontier, d block, robustness");
  const auto options = std::make_shared<CompareOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  app->add_option("files", options->files,
                  "Coordinates (XYZ) or job files; a job with `variants:` stands for all of them")
      ->required()
      ->option_text("FILE...");
  app->add_option("-r,--reference", options->reference,
                  "Variant that the others are matched with (the first by default); adds "
                  "differences from it")
      ->option_text("NAME");
  app->add_option("--variants", options->variants,
                  "Which to compare, in this order, with commas; all by default. The first of them "
                  "is the reference unless --reference names one")
      ->delimiter(',')
      ->option_text("NAMES");
  app->add_option("--columns", options->parts.summary.columns,
                  "Columns of the summary by their keys, with commas: name,homo_ev,gap_ev")
      ->delimiter(',')
      ->option_text("KEYS")
      ->group("Output");
  app->add_option("--sort", options->parts.summary.sort_by, "Sort the summary by this column")
      ->option_text("KEY")
      ->group("Output");
  app->add_flag("--descending", options->parts.summary.descending, "Largest first")
      ->needs("--sort")
      ->group("Output");
  app->add_flag("--slopes", options->parts.slopes,
                "Add derivatives of HOMO, LUMO and gap by every parameter (json always has them)")
      ->group("Output");
  app->add_option("-j,--threads", options->threads,
                  "Variants computed at once; by default as many as there are cores. The result is "
                  "the same for any number")
      ->check(CLI::Range(1, 256))
      ->option_text("N");
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown", "latex", "html"});
  app->footer(
      "CSV holds the summary alone.\n\n"
      "Examples:\n"
      "  irrepwise compare chloride.xyz hydride.xyz\n"
      "  irrepwise compare family.yaml --reference chloride --sort gap_ev --descending\n"
      "  irrepwise compare family.yaml --format json --output family.json");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
