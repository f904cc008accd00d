#include "cli/variant_option.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "job/variants.hpp"

namespace irrepwise::cli {
namespace {

// "chloride, fluoride, water", of many the first ones; "1 more" would be as long as the name.
std::string listed(const std::vector<std::string>& names) {
  constexpr std::size_t most = 12;
  if (names.size() <= most + 1) return joined(names);
  std::vector<std::string> shown(names.begin(), names.begin() + static_cast<std::ptrdiff_t>(most));
  shown.push_back(fmt::format("{} more", names.size() - most));
  return joined(shown);
}

}  // namespace

void add_variant_option(CLI::App& command, std::string& name) {
  command
      .add_option("--variant", name,
                  "Of a job with `variants:` this one; without it the job as it is")
      ->option_text("NAME");
}

int find_variant(const char* option, const std::vector<std::string>& names,
                 const std::string& name) {
  const auto found = std::find(names.begin(), names.end(), name);
  if (found != names.end()) return static_cast<int>(found - names.begin());
  const std::string nearest = nearest_word(name, names);
  throw Error(fmt::format("{}: there is no variant {}{}; there {} {}", option,
                          irrepwise::quoted(name),
                          nearest.empty() ? "" : " (did you mean '" + nearest + "'?)",
                          names.size() == 1 ? "is" : "are", listed(names)));
}

Job read_job_or_variant(const std::string& file, const std::string& variant) {
  if (variant.empty()) return read_job(file);
  if (!has_variants(file)) {
    throw Error(fmt::format(
        "--variant: {} has no variants; leave the option out, or list them under `variants:`",
        file));
  }
  const std::vector<VariantJob> jobs = variant_jobs(file);
  std::vector<std::string> names;
  for (const VariantJob& job : jobs) names.push_back(job.name);
  const int index = find_variant("--variant", names, variant);
  Job job = jobs[static_cast<std::size_t>(index)].read();
  job.title += (job.title.empty() ? "variant " : ", variant ") + variant;
  return job;
}

std::string job_place(const std::string& file, const std::string& variant) {
  return variant.empty() ? file : fmt::format("{}: variant '{}'", file, variant);
}

std::string words_on_variants(const std::string& file, const std::string& variant) {
  if (!variant.empty() || !has_variants(file)) return {};
  std::vector<std::string> names;
  for (VariantJob& job : variant_jobs(file)) names.push_back(std::move(job.name));
  const std::string which =
      names.size() == 1 ? "the only one" : fmt::format("one of {}", names.size());
  return fmt::format("none, the job as it is; --variant NAME takes {}: {}", which, listed(names));
}

void add_variants_fact(Report& report, const std::string& file, const std::string& variant) {
  std::string words = words_on_variants(file, variant);
  if (!words.empty()) report.facts.push_back({"variant", {std::move(words)}});
}

}  // namespace irrepwise::cli
