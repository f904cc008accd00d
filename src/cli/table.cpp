// irrepwise table: orbital coefficients, shares and populations, ready for a report.
#include <algorithm>
#include <cmath>
#include <memory>

#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/computed.hpp"
#include "cli/job_options.hpp"
#include "cli/orbital_choice.hpp"
#include "cli/output_options.hpp"
#include "cli/variant_option.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "output/caption_words.hpp"
#include "output/orbital_table_data.hpp"
#include "output/orbital_table_layout.hpp"
#include "output/population_document.hpp"

namespace irrepwise::cli {
namespace {

struct TableOptions {
  JobOptions job;
  OutputOptions output;
  std::vector<std::string> orbitals;
  std::string of = "coefficients";
  std::string over = "orbitals";
  std::string frame = "standard";
  std::optional<double> threshold;
  bool all = false;

  [[nodiscard]] bool of_populations() const { return of == "populations"; }
};

const std::vector<std::string> default_orbitals = {"frontier+3"};

CLI::Validator one_of(const std::vector<std::string>& names) {
  return CLI::Validator(
      [names](const std::string& given) {
        if (std::find(names.begin(), names.end(), given) != names.end()) return std::string();
        const std::string nearest = nearest_word(given, names);
        return fmt::format("{} is none of {}{}", irrepwise::quoted(given), joined(names, "and"),
                           nearest.empty() ? "" : "; did you mean '" + nearest + "'?");
      },
      "");
}

bool for_programs(const TableOptions& options) {
  const Format format = chosen_format(options.output);
  return format == Format::Json || format == Format::Csv;
}

void check_usage(const TableOptions& options) {
  if (options.threshold && !(std::isfinite(*options.threshold) && *options.threshold >= 0.0)) {
    throw CLI::ValidationError(
        "--threshold: expected 0 or more: a coefficient, or with --of shares per cent");
  }
  if (!options.of_populations()) {
    if (options.all) {
      throw CLI::ValidationError(
          "--all is for --of populations; for every level name `all` after the file");
    }
    return;
  }
  if (!options.orbitals.empty() || options.over != "orbitals" || options.frame != "standard" ||
      options.threshold) {
    throw CLI::ValidationError(
        "--of populations is about atoms and pairs of atoms: leave out levels, --over, --frame and "
        "--threshold");
  }
  if (options.all && for_programs(options)) {
    throw CLI::ValidationError(
        "--all is for text, markdown, latex and html; json and csv always hold every atom and "
        "pair");
  }
}

// A report of tables alone: their legends say what other reports say on top.
Report report_of(const LevelsResult& result, std::vector<Table> tables,
                 const TableOptions& options) {
  Report report;
  if (chosen_format(options.output) == Format::Html) {  // a page has a title
    report.title = result.title.empty() ? readable_formula(result.molecule) : result.title;
  }
  report.tables = std::move(tables);
  report.warnings = result.warnings;
  const std::string variants = words_on_variants(options.job.file, options.job.variant);
  if (!variants.empty()) report.remarks.push_back("Variant: " + variants + ".");
  return report;
}

// As columns of text; a page of paper and a screen hold so much at a readable size.
int width_of_tables(const OutputOptions& output) {
  constexpr int latex_page = 84;
  constexpr int markdown_page = 110;
  constexpr int web_page = 130;
  switch (chosen_format(output)) {
    case Format::Latex:
      return latex_page;
    case Format::Markdown:
      return markdown_page;
    case Format::Html:
      return web_page;
    case Format::Text:
    case Format::Json:
    case Format::Csv:
    case Format::Yaml:
      break;
  }
  return text_width(output);
}

std::string written_populations(const LevelsResult& result, const TableOptions& options) {
  const std::string source = file_name(options.job.file);
  const Format format = chosen_format(options.output);
  if (format == Format::Json) return populations_json(result, source);
  if (format == Format::Csv) return populations_csv(result);
  const Grouping grouping = options.all ? Grouping::Single : Grouping::Equivalent;
  return written_report(report_of(result, population_tables(result, grouping, source), options),
                        options.output);
}

OrbitalTable table_asked_for(const LevelsResult& result, const TableOptions& options) {
  OrbitalTableOptions table;
  if (options.of == "shares") table.entries = TableEntries::Shares;
  if (options.over == "salcs") table.functions = TableFunctions::Salcs;
  if (options.frame == "local") table.frame = OrbitalFrame::Local;
  const std::vector<OrbitalChoice> choices =
      choose_orbitals(options.orbitals.empty() ? default_orbitals : options.orbitals, result);
  return at_place(job_place(options.job), [&] { return orbital_table(result, choices, table); });
}

std::string written(const LevelsResult& result, const TableOptions& options) {
  if (options.of_populations()) return written_populations(result, options);
  const OrbitalTable table = table_asked_for(result, options);
  const std::string source = file_name(options.job.file);
  const Format format = chosen_format(options.output);
  if (for_programs(options)) {
    const OrbitalTableData data{options.threshold.value_or(0.0), source};
    return format == Format::Json ? orbital_table_json(result, table, data)
                                  : orbital_table_csv(result, table, data);
  }
  constexpr double smallest_coefficient = 0.05;
  constexpr double smallest_share_percent = 1.0;
  OrbitalTableLayout layout;
  layout.threshold = options.threshold.value_or(options.of == "shares" ? smallest_share_percent
                                                                       : smallest_coefficient);
  layout.width = width_of_tables(options.output);
  layout.source = source;
  return written_report(report_of(result, orbital_tables(result, table, layout), options),
                        options.output);
}

void run(const TableOptions& options) {
  check_usage(options);
  const Job job = read_job_with(options.job);
  refuse_to_overwrite(options.output, job.source_files);
  const LevelsResult result = computed(job, job_place(options.job));
  const std::string text = written(result, options);
  print_warnings(options.output, result.warnings);
  emit(options.output, text);
}

}  // namespace

Command add_table(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "table", "Orbital coefficients, shares and populations as tables for a report");
  const auto options = std::make_shared<TableOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  add_job_options(*app, options->job);
  app->add_option("levels", options->orbitals,
                  std::string("Which: ") + orbital_words_help + ". frontier+3 without any")
      ->option_text("LEVEL ...");
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown", "latex", "html"});
  const auto add = [&](const char* name, auto& value, const char* text, const std::string& help) {
    return app->add_option(name, value, help)->option_text(text)->group("Table");
  };
  add("--of", options->of, "WHAT",
      "coefficients (default), shares (Mulliken's, in per cent), or populations: charges, gross "
      "populations by orbital type, overlap populations")
      ->check(one_of({"coefficients", "shares", "populations"}));
  add("--over", options->over, "FUNCTIONS",
      "orbitals (default), or salcs: those of `irrepwise symmetry --salcs`")
      ->check(one_of({"orbitals", "salcs"}));
  add("--frame", options->frame, "FRAME",
      "standard (default), or local: σ and π of each atom, z along its bond towards the metal or "
      "centre")
      ->check(one_of({"standard", "local"}));
  add("--threshold", options->threshold, "X",
      "Leave smaller entries blank: 0.05 by default, 1 % for shares, 0 in json and csv");
  app->add_flag("-a,--all", options->all, "With --of populations: every atom and every pair")
      ->group("Table");
  app->footer(
      "Exit code: 0 done, 1 something is wrong with input or computation, 2 with the options.\n\n"
      "Examples:\n"
      "  irrepwise table complex.xyz --charge -2\n"
      "  irrepwise table complex.xyz d --frame local --of shares\n"
      "  irrepwise table complex.xyz eg --over salcs --format latex --output eg.tex\n"
      "  irrepwise table complex.xyz -14..-8 --format csv --output levels.csv\n"
      "  irrepwise table complex.xyz --of populations --format html --output charges.html");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
