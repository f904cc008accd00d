#include "cli/compared.hpp"

#include <algorithm>
#include <cstdio>
#include <functional>
#include <utility>

#include <unistd.h>

#include <fmt/format.h>

#include "cli/computed.hpp"
#include "cli/variant_option.hpp"
#include "core/error.hpp"
#include "core/parallel.hpp"
#include "job/variants.hpp"
#include "output/varied_bonds.hpp"

namespace irrepwise::cli {
namespace {

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

std::vector<std::string> names_of(const std::vector<VariantJob>& variants) {
  std::vector<std::string> names;
  for (const VariantJob& variant : variants) names.push_back(variant.name);
  return names;
}

int find_reference(const std::vector<VariantJob>& variants, const std::string& name) {
  return name.empty() ? 0 : find_variant("--reference", names_of(variants), name);
}

std::vector<VariantJob> wanted_variants(std::vector<VariantJob> all, const std::string& reference,
                                        const std::vector<std::string>& chosen) {
  if (chosen.empty()) return all;
  std::vector<int> wanted = find_variants("--variants", names_of(all), chosen);
  const int first = reference.empty() ? wanted.front() : find_reference(all, reference);
  if (std::find(wanted.begin(), wanted.end(), first) == wanted.end()) {
    wanted.insert(wanted.begin(), first);
  }
  std::vector<VariantJob> variants;
  for (const int i : wanted) variants.push_back(std::move(all[static_cast<std::size_t>(i)]));
  return variants;
}

// A line that counts, on a terminal only: a pipe or a log gets nothing. It is gone at the end, also
// where that is an error.
class Progress {
 public:
  explicit Progress(std::size_t count)
      : count_(count), is_shown_(::isatty(STDERR_FILENO) == 1 && count > 1) {}
  Progress(const Progress&) = delete;
  Progress& operator=(const Progress&) = delete;
  ~Progress() {
    if (is_shown_) std::fputs("\r\x1b[K", stderr);
  }

  [[nodiscard]] std::function<void(int)> callback() const {
    if (!is_shown_) return {};
    return [count = count_](int done) {
      std::fprintf(stderr, "\r%d of %zu variants", done, count);
      std::fflush(stderr);
    };
  }

 private:
  std::size_t count_;
  bool is_shown_;
};

}  // namespace

Compared compared(const std::vector<std::string>& files, const std::string& reference_name,
                  std::optional<int> wanted_threads, const std::vector<std::string>& chosen) {
  const std::vector<VariantJob> jobs = wanted_variants(all_variants(files), reference_name, chosen);
  const int count = static_cast<int>(jobs.size());
  const int threads = wanted_threads.value_or(hardware_threads());
  Compared result;
  result.comparison.reference = find_reference(jobs, reference_name);

  std::vector<std::optional<VariantResult>> found(jobs.size());
  std::vector<std::vector<std::string>> files_read(jobs.size());
  {
    const Progress progress(jobs.size());
    run_parallel(
        count, threads,
        [&](int i) {
          const VariantJob& variant = jobs[static_cast<std::size_t>(i)];
          const Job job = variant.read();
          files_read[static_cast<std::size_t>(i)] = job.source_files;
          try {
            found[static_cast<std::size_t>(i)] =
                analysed(variant.name, computed(job, variant.place));
          } catch (const Error& error) {
            throw variant.named(error);
          }
        },
        progress.callback());
  }
  for (std::optional<VariantResult>& variant : found) {
    result.comparison.variants.push_back(std::move(*variant));
  }
  for (const std::vector<std::string>& read : files_read) {
    result.files_read.insert(result.files_read.end(), read.begin(), read.end());
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
  find_varied_bonds(result.comparison);
  return result;
}

std::vector<std::string> warnings_of(const Comparison& comparison) {
  std::vector<std::string> warnings;
  for (const VariantResult& variant : comparison.variants) {
    for (const std::string& warning : variant.levels.warnings) {
      warnings.push_back(variant.name + ": " + warning);
    }
  }
  return warnings;
}

}  // namespace irrepwise::cli
