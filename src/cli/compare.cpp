// irrepwise compare: several molecules, or variants of one, side by side.
#include <algorithm>
#include <cstdio>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <unistd.h>

#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/computed.hpp"
#include "cli/output_options.hpp"
#include "core/error.hpp"
#include "core/parallel.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "job/variants.hpp"
#include "output/compare_json.hpp"
#include "output/compare_report.hpp"

namespace irrepwise::cli {
namespace {

struct CompareOptions {
  std::vector<std::string> files;
  std::string reference;
  CompareParts parts;
  std::optional<int> threads;
  OutputOptions output;
};

std::vector<VariantJob> all_variants(const std::vector<std::string>& files) {
  std::vector<VariantJob> variants;
  for (const std::string& file : files) {
    for (VariantJob& variant : variant_jobs(file)) variants.push_back(std::move(variant));
  }
  for (std::size_t i = 0; i < variants.size(); ++i) {
    for (std::size_t j = 0; j < i; ++j) {
      if (variants[i].name != variants[j].name) continue;
      throw Error(fmt::format("{}: the name '{}' is used already by {}; names must differ",
                              variants[i].place, variants[i].name, variants[j].place));
    }
  }
  return variants;
}

int find_reference(const std::vector<VariantJob>& variants, const std::string& name) {
  if (name.empty()) return 0;
  std::vector<std::string> names;
  for (std::size_t i = 0; i < variants.size(); ++i) {
    if (variants[i].name == name) return static_cast<int>(i);
    names.push_back(variants[i].name);
  }
  const std::string nearest = nearest_word(name, names);
  throw Error(fmt::format("--reference: there is no variant {}{}; the first is '{}'", irrepwise::quoted(name),
                          nearest.empty() ? "" : ", did you mean '" + nearest + "'?",
                          names.front()));
}

// On a terminal only: a pipe or a log gets nothing.
std::function<void(int)> progress(std::size_t count) {
  if (::isatty(STDERR_FILENO) != 1) return {};
  return [count](int done) {
    const bool last = done == static_cast<int>(count);
    std::fprintf(stderr, last ? "\r\x1b[K" : "\r%d of %zu variants", done, count);
    std::fflush(stderr);
  };
}

struct Computed {
  Comparison comparison;
  std::vector<std::string> files_read;
};

Computed compute(const CompareOptions& options) {
  const std::vector<VariantJob> jobs = all_variants(options.files);
  const int count = static_cast<int>(jobs.size());
  const int threads = options.threads.value_or(hardware_threads());
  Computed result;
  result.comparison.reference = find_reference(jobs, options.reference);

  std::vector<std::optional<VariantResult>> found(jobs.size());
  std::vector<std::vector<std::string>> files_read(jobs.size());
  run_parallel(
      count, threads,
      [&](int i) {
        const VariantJob& variant = jobs[static_cast<std::size_t>(i)];
        const Job job = variant.read();
        files_read[static_cast<std::size_t>(i)] = job.source_files;
        found[static_cast<std::size_t>(i)] = analysed(variant.name, computed(job, variant.place));
      },
      progress(jobs.size()));
  for (std::optional<VariantResult>& variant : found) {
    result.comparison.variants.push_back(std::move(*variant));
  }
  for (const std::vector<std::string>& files : files_read) {
    result.files_read.insert(result.files_read.end(), files.begin(), files.end());
  }

  const LevelsResult& reference =
      result.comparison.variants[static_cast<std::size_t>(result.comparison.reference)].levels;
  const MatchReference match =
      make_match_reference(reference.symmetry, reference.basis, reference.levels);
  result.comparison.matchings.resize(jobs.size());
  run_parallel(count, threads, [&](int i) {
    const auto at = static_cast<std::size_t>(i);
    const LevelsResult& levels = result.comparison.variants[at].levels;
    result.comparison.matchings[at] =
        match_levels(match, levels.symmetry, levels.basis, levels.levels);
  });
  return result;
}

std::string written(const Comparison& comparison, const CompareOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return compare_json(comparison);
    case Format::Csv: {
      SummaryChoice choice = options.parts.summary;
      choice.differences = options.parts.differences;
      return compare_csv(comparison, choice);
    }
    case Format::Markdown:
      return report_markdown(compare_report(comparison, options.parts));
    case Format::Latex:
      return report_latex(compare_report(comparison, options.parts));
    case Format::Text:
    case Format::Yaml:
      break;
  }
  return report_text(compare_report(comparison, options.parts), text_width(options.output));
}

void run(CompareOptions options) {
  options.parts.differences = !options.reference.empty();
  const Computed computed = compute(options);
  refuse_to_overwrite(options.output, computed.files_read);
  const std::string text = written(computed.comparison, options);
  std::vector<std::string> warnings;
  for (const VariantResult& variant : computed.comparison.variants) {
    for (const std::string& warning : variant.levels.warnings) {
      warnings.push_back(variant.name + ": " + warning);
    }
  }
  print_warnings(options.output, warnings);
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
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown", "latex"});
  app->footer(
      "CSV holds the summary alone.\n\n"
      "Examples:\n"
      "  irrepwise compare chloride.xyz hydride.xyz\n"
      "  irrepwise compare family.yaml --reference chloride --sort gap_ev --descending\n"
      "  irrepwise compare family.yaml --format json --output family.json");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
