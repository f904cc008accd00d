#include "page/molecule_page.hpp"

#include <regex>
#include <set>
#include <string>

#include <doctest/doctest.h>
#include <nlohmann/json.hpp>

#include "analysis/symmetry_result.hpp"
#include "basis/atom_kinds.hpp"
#include "core/error.hpp"
#include "page/page_data.hpp"
#include "support/result.hpp"

using namespace irrepwise;
using nlohmann::json;

namespace {

std::string page_of(const LevelsResult& result, const PageOptions& options = {}) {
  SymmetryOptions symmetry_options;
  symmetry_options.kinds = atom_kinds(result.basis);
  const SymmetryResult symmetry = symmetry_of(result.molecule, symmetry_options, result.basis);
  return molecule_page(result, symmetry,
                       {"irrepwise report a.xyz", "1.2.3", {{"a.xyz", "2\n<b> & co\n"}}}, options);
}

json data_of(const std::string& page) {
  const std::string open = "id=\"page-data\">";
  const std::size_t first = page.find(open) + open.size();
  return json::parse(page.substr(first, page.find("</script>", first) - first));
}

}  // namespace

TEST_CASE("a page asks for nothing outside itself") {
  const std::string page = page_of(input_result("square_ptcl4.xyz"));
  // Attributes and functions that load; the names of XML namespaces load nothing.
  const std::regex loads(R"re((?:src|href|action|poster)="([^"]*)"|url\(([^)]*)\)|@import|fetch\()re");
  for (auto it = std::sregex_iterator(page.begin(), page.end(), loads);
       it != std::sregex_iterator(); ++it) {
    const std::string target = (*it)[1].str() + (*it)[2].str();
    CAPTURE(it->str());
    CHECK((target.starts_with("#") || target.starts_with("data:")));
  }
}

TEST_CASE("what a file or a title says cannot become part of the page's code") {
  LevelsResult result = input_result("square_ptcl4.xyz");
  result.title = "</script><script>alert(1)</script><!-- \" ' &";
  const std::string page = page_of(result);
  CHECK(page.find("alert(1)</script>") == std::string::npos);
  CHECK(page.find("&lt;script&gt;alert(1)") != std::string::npos);
  CHECK(page.find("&lt;b&gt; &amp; co") != std::string::npos);
  CHECK(data_of(page)["molecules"].size() == 1);

  PageMolecule molecule{"</script><!--", &result, {}};
  const std::string data = page_data({molecule}, Eigen::Vector3d::UnitZ());
  CHECK(data.find("</") == std::string::npos);
  CHECK(data.find("<!") == std::string::npos);
  CHECK(json::parse(data)["molecules"][0]["name"] == "</script><!--");
}

TEST_CASE("the levels of the diagram are those whose numbers the page carries") {
  const LevelsResult result = input_result("hexacarbonyl_cr.xyz");
  const std::string page = page_of(result);
  std::set<std::string> drawn;
  const std::regex level(R"re(<g class="level" data-name="([^"]*)")re");
  for (auto it = std::sregex_iterator(page.begin(), page.end(), level);
       it != std::sregex_iterator(); ++it) {
    CHECK(drawn.insert((*it)[1].str()).second);
  }
  const json data = data_of(page);
  std::set<std::string> carried;
  for (const auto& [name, found] : data["molecules"][0]["levels"].items()) {
    carried.insert(name);
    CAPTURE(name);
    // Shares of one level add up to all of it (conservation of the norm).
    double sum = 0.0;
    for (const json& share : found["shares"]) sum += share.get<double>();
    CHECK(std::abs(sum - 1.0) < 57 * 0.5e-5);  // 57 orbitals, each rounded to five decimals
    CHECK(found["coefficients"].size() == found["degeneracy"].get<std::size_t>());
  }
  CHECK(drawn == carried);
  CHECK(drawn.size() > 8);
}

TEST_CASE("a window without levels is refused") {
  const LevelsResult result = input_result("square_ptcl4.xyz");
  PageOptions options;
  options.from_ev = 100.0;
  options.to_ev = 110.0;
  CHECK_THROWS_AS(page_of(result, options), Error);
}
