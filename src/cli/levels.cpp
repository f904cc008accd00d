// irrepwise levels: from a geometry to orbital energies labelled by symmetry.
#include <cmath>
#include <memory>

#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/computed.hpp"
#include "cli/job_options.hpp"
#include "cli/output_options.hpp"
#include "cli/variant_option.hpp"
#include "output/levels_json.hpp"
#include "output/levels_report.hpp"

namespace irrepwise::cli {
namespace {

struct LevelsOptions {
  JobOptions job;
  OutputOptions output;
  LevelWindow window;
  LevelsJsonParts parts;
};

void check_usage(const LevelsOptions& options) {
  const Format format = chosen_format(options.output);
  const bool needs_json = options.parts.matrices || options.parts.coefficients;
  if (needs_json && format != Format::Json) {
    throw CLI::ValidationError("--matrices and --coefficients need --format json");
  }
  for (const std::optional<double>& limit : {options.window.from_ev, options.window.to_ev}) {
    if (limit && !std::isfinite(*limit)) {
      throw CLI::ValidationError("--from and --to need a finite energy in eV");
    }
  }
  const LevelWindow& window = options.window;
  if (window.from_ev && window.to_ev && *window.from_ev > *window.to_ev) {
    throw CLI::ValidationError("--from lies above --to; exchange the two");
  }
  const bool has_range = options.window.from_ev || options.window.to_ev;
  if (has_range && (format == Format::Json || format == Format::Csv)) {
    throw CLI::ValidationError(
        "--from and --to are for text, markdown, latex and html; json and csv "
        "always hold every level");
  }
}

std::string written(const LevelsResult& result, const LevelsOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return levels_json(result, options.parts);
    case Format::Csv:
      return levels_csv(result);
    case Format::Text:
    case Format::Markdown:
    case Format::Latex:
    case Format::Html:
    case Format::Yaml:
      break;
  }
  LevelWindow window = options.window;
  if (chosen_format(options.output) == Format::Text) window.hint = LevelsHint::NameAllOption;
  Report report = levels_report(result, window);
  add_variants_fact(report, options.job.file, options.job.variant);
  return written_report(report, options.output);
}

void run(const LevelsOptions& options) {
  check_usage(options);
  const Job job = read_job_with(options.job);
  refuse_to_overwrite(options.output, job.source_files);
  const LevelsResult result = computed(job, job_place(options.job));
  const std::string text = written(result, options);
  print_warnings(options.output, result.warnings);
  emit(options.output, text);
}

}  // namespace

Command add_levels(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "levels", "Orbital energies with symmetry labels, compositions, charges and bonds");
  const auto options = std::make_shared<LevelsOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  add_job_options(*app, options->job);
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown", "latex", "html"});
  app->add_flag("-a,--all", options->window.all, "Every level, every atom and every pair of atoms")
      ->group("Output");
  app->add_option("--from", options->window.from_ev, "Show levels from this energy on")
      ->option_text("eV")
      ->group("Output");
  app->add_option("--to", options->window.to_ev, "Show levels up to this energy")
      ->option_text("eV")
      ->group("Output");
  app->add_flag("--matrices", options->parts.matrices,
                "Add overlap and Hamiltonian over atomic orbitals (json)")
      ->group("Output");
  app->add_flag("--coefficients", options->parts.coefficients,
                "Add orbital coefficients over atomic orbitals (json)")
      ->group("Output");
  app->footer(
      "Options win over what a job file says.\n"
      "Exit code: 0 done, 1 something is wrong with input or computation, 2 with the options.\n\n"
      "Examples:\n"
      "  irrepwise levels complex.xyz --charge -2\n"
      "  irrepwise levels complex.xyz --from -14 --to -8 --width 80\n"
      "  irrepwise levels complex.xyz --z Pt1,Cl2 --subgroup C2v\n"
      "  irrepwise levels job.yaml --format json --matrices --output levels.json");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
