#include "page/molecule_page.hpp"

#include <cmath>
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
  for (const std::string loads : {" src=\"", "href=\"", " action=\"", "url(", "@import", "fetch(",
                                  "XMLHttpRequest", "import("}) {
    for (std::size_t at = page.find(loads); at != std::string::npos;
         at = page.find(loads, at + 1)) {
      const std::string target = page.substr(at + loads.size(), 40);
      CAPTURE(loads + target);
      CHECK((target.starts_with("#") || target.starts_with("data:")));
    }
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
  const std::string level = "<g class=\"level\" data-name=\"";
  for (std::size_t at = page.find(level); at != std::string::npos; at = page.find(level, at + 1)) {
    const std::size_t name = at + level.size();
    CHECK(drawn.insert(page.substr(name, page.find('"', name) - name)).second);
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
  CHECK_THROWS_WITH_AS(page_of(result, options),
                       "no level lies between 100 and 110 eV; they run from -27.113 to 12.881 eV",
                       Error);
}
