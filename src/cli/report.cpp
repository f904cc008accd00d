// irrepwise report: one HTML file for a molecule or a comparison, to read, print and pass on.
#include <algorithm>
#include <fstream>
#include <memory>
#include <optional>
#include <sstream>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "basis/atom_kinds.hpp"
#include "cli/commands.hpp"
#include "cli/compared.hpp"
#include "cli/computed.hpp"
#include "cli/draw_variants.hpp"
#include "cli/job_options.hpp"
#include "cli/output_options.hpp"
#include "core/error.hpp"
#include "core/output_file.hpp"
#include "core/parallel.hpp"
#include "job/variants.hpp"
#include "page/comparison_page.hpp"
#include "page/molecule_page.hpp"

namespace irrepwise::cli {
namespace {

struct ReportOptions {
  std::vector<std::string> files;
  JobOptions job;
  std::string reference;
  std::vector<std::string> variants;
  PageOptions page;
  std::optional<int> threads;
  OutputOptions output;
};

std::string contents(const std::string& path) {
  std::ifstream file(path, std::ios::binary);
  std::ostringstream text;
  text << file.rdbuf();
  if (!file) throw Error(path + ": cannot be read again for the page");
  return text.str();
}

Provenance provenance(const std::string& command, const std::vector<std::string>& files_read) {
  Provenance out{command, IRREPWISE_VERSION, {}};
  for (const std::string& file : files_read) {
    const bool known = std::any_of(out.files.begin(), out.files.end(),
                                   [&](const SourceText& text) { return text.name == file; });
    if (!known) out.files.push_back({file, contents(file)});
  }
  return out;
}

SymmetryResult symmetry_answer(const Job& job, const Basis& basis) {
  SymmetryOptions options = job.symmetry;
  options.kinds = atom_kinds(basis);
  return symmetry_of(job.molecule, options, basis);
}

struct Written {
  std::string html;
  std::vector<std::string> warnings;
};

Written molecule(const ReportOptions& options, const std::string& command) {
  JobOptions job_options = options.job;
  job_options.file = options.files.front();
  const Job job = read_job_with(job_options);
  refuse_to_overwrite(options.output, job.source_files);
  const LevelsResult result = computed(job, job_place(job_options));
  const SymmetryResult symmetry = symmetry_answer(job, result.basis);
  return {molecule_page(result, symmetry, provenance(command, job.source_files), options.page),
          result.warnings};
}

Written comparison(const ReportOptions& options, const std::string& command) {
  const Compared result = compared(options.files, options.reference, options.threads);
  refuse_to_overwrite(options.output, result.files_read);
  PageOptions page = options.page;
  page.variants = chosen_variants(result.comparison, options.variants);
  return {comparison_page(result.comparison, provenance(command, result.files_read), page),
          warnings_of(result.comparison)};
}

void run(ReportOptions options, const std::string& command) {
  if (!options.output.output.ends_with(".html")) {
    throw Error(fmt::format("--output {}: a page is an HTML file; let the name end in .html",
                            options.output.output));
  }
  options.page.threads = options.threads.value_or(hardware_threads());
  if (options.files.size() > 1 && !options.job.variant.empty()) {
    throw CLI::ValidationError(
        "--variant takes one molecule of one job; leave the other files out");
  }
  const bool several = options.files.size() > 1 ||
                       (options.job.variant.empty() && has_variants(options.files.front()));
  if (several && options.job.is_used()) {
    throw CLI::ValidationError(
        "options of a single job (charge, method, symmetry) cannot hold for a comparison; write "
        "them into the job file");
  }
  if (!several && !options.reference.empty()) {
    throw CLI::ValidationError("--reference needs variants; there is one molecule");
  }
  if (!several && !options.variants.empty()) {
    throw CLI::ValidationError("--variants needs variants; there is one molecule");
  }
  const Written page = several ? comparison(options, command) : molecule(options, command);
  print_warnings({"text", options.output.output, {}}, page.warnings);
  write_file(options.output.output, page.html);
}

}  // namespace

Command add_report(CLI::App& program, const std::string& command) {
  CLI::App* app = program.add_subcommand(
      "report", "One self-contained HTML page for a molecule or a comparison");
  const auto options = std::make_shared<ReportOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  app->add_option(
         "files", options->files,
         "Coordinates (XYZ) or job files; several, or a job with `variants:`, are compared")
      ->required()
      ->option_text("FILE...");
  add_job_options(*app, options->job, FileOption::None);
  app->add_option("-o,--output", options->output.output, "Page to write, such as report.html")
      ->required()
      ->option_text("FILE")
      ->group("Output");
  app->add_option("-r,--reference", options->reference,
                  "Variant that the others are matched with (the first by default)")
      ->option_text("NAME")
      ->group("Comparison");
  app->add_option("--variants", options->variants,
                  "Those in the diagram, in this order, with commas; by default the first 12. The "
                  "tables have all")
      ->delimiter(',')
      ->option_text("NAMES")
      ->group("Comparison");
  app->add_option("--from", options->page.from_ev, "Lowest energy of the level diagram")
      ->option_text("eV")
      ->group("Level diagram");
  app->add_option("--to", options->page.to_ev, "Highest energy of the level diagram")
      ->option_text("eV")
      ->group("Level diagram");
  app->add_option("-j,--threads", options->threads,
                  "Computed at once; by default as many as there are cores. The page is the same "
                  "for any number")
      ->check(CLI::Range(1, 256))
      ->option_text("N");
  app->footer(
      "The page needs no network and no other file. Its levels can be chosen, its tables sort and "
      "copy.\n\n"
      "Examples:\n"
      "  irrepwise report complex.xyz --charge -2 --output report.html\n"
      "  irrepwise report family.yaml --reference chloride --output family.html\n"
      "  irrepwise report family.yaml --variant carbonyl --output carbonyl.html");
  return {app, [options, command] { run(*options, command); }};
}

}  // namespace irrepwise::cli
