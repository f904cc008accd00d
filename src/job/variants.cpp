#include "job/variants.hpp"

#include <cstddef>
#include <filesystem>
#include <memory>
#include <span>

#include <fmt/format.h>

#include "core/file.hpp"
#include "core/yaml.hpp"
#include "job/job_file.hpp"

namespace irrepwise {
namespace {

void check_keys(const YamlNode& variant) {
  variant.expect_keys(
      "a variant", {"name", "title", "geometry", "replace", "charge", "multiplicity", "occupations",
                    "parameters", "overrides", "rule", "k", "symmetry"});
}

const YamlNode* find_list(const YamlNode& job) {
  return job.kind() == YamlNode::Kind::Map ? job.find("variants") : nullptr;
}

}  // namespace

bool has_variants(const std::string& path) {
  return is_job_file(path) && find_list(YamlNode::parse(read_text_file(path), path)) != nullptr;
}

std::vector<VariantJob> variant_jobs(const std::string& path) {
  const auto whole = [&] {
    return std::vector<VariantJob>{
        {std::filesystem::path(path).stem().string(), path, [path] { return read_job(path); }}};
  };
  if (!is_job_file(path)) return whole();
  const auto node = std::make_shared<const YamlNode>(YamlNode::parse(read_text_file(path), path));
  const YamlNode* const list = find_list(*node);
  if (!list) return whole();
  const std::span<const YamlNode> items = list->list("a list of variants");
  if (items.empty()) list->fail("found no variant, expected at least one");
  std::vector<VariantJob> jobs;
  for (const YamlNode& item : items) {
    check_keys(item);
    const std::string& name = item.at("name").word("a name");
    for (const VariantJob& other : jobs) {
      if (other.name == name) {
        item.at("name").fail(fmt::format("the name '{}' is used already at {}; names must differ",
                                         name, other.place));
      }
    }
    // The tree is kept alive by `node`, of which the item is a part.
    jobs.push_back({name, item.place(), [node, &item, path] {
                      FileChain files;
                      return read_job_node(*node, &item, path, files);
                    }});
  }
  return jobs;
}

}  // namespace irrepwise
