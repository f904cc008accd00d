#include <span>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "figure/collisions.hpp"
#include "figure/orbital_sheets.hpp"
#include "figure/rich_text.hpp"
#include "figure/sheet.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

struct Prepared {
  Run r;
  std::vector<OrbitalCaption> captions;
  Eigen::MatrixXd coefficients;
};

Prepared frontier_of(const std::string& name) {
  Prepared out{run(test_molecule(name).molecule), {}, {}};
  const int homo = *out.r.levels.frontier.homo;
  for (const int level : {homo, homo + 1}) {
    const Eigen::MatrixXd c = level_orbitals(out.r.symmetry, out.r.basis, out.r.levels, level);
    const Level& l = out.r.levels.levels[std::size_t(level)];
    for (int partner = 0; partner < l.degeneracy; ++partner) {
      out.captions.push_back({level_name(out.r.symmetry.group, l), partner + 1, l.degeneracy,
                              l.energy_ev, l.occupation, level == homo ? "HOMO" : "LUMO"});
    }
    const Eigen::Index before = out.coefficients.cols();
    out.coefficients.conservativeResize(out.r.basis.n_orbitals, before + c.cols());
    out.coefficients.rightCols(c.cols()) = c;
  }
  return out;
}

}  // namespace

TEST_CASE("texts on contour sheets never overlap and stay inside; each partner has one cell") {
  for (const char* name :
       {"borazine", "hydrogen cyanide", "bromochlorofluoromethane", "tetrachloroplatinate(II)"}) {
    const Prepared p = frontier_of(name);
    std::vector<Plane> planes;
    std::vector<ContourMap> maps;
    for (Eigen::Index i = 0; i < p.coefficients.cols(); ++i) {
      const OrbitalField field(p.r.symmetry.molecule, p.r.basis, p.coefficients.col(i));
      planes.push_back(axes_plane("xz"));
      maps.push_back(contour_map(field, 0, planes.back(), contour_levels()));
    }
    const SheetWords words = {
        std::string(name) +
            ", with a title that is far too long for one line above cells of this width",
        plain_text("the method in a line of its own that is long enough to be broken too, as it "
                   "names rule, constant and parameters")};
    const Figure figure = contour_sheet(words, p.r.symmetry.molecule, p.captions, maps, planes);
    CAPTURE(name);
    CHECK(first_text_collision(figure) == "");
    std::size_t cells = 0;
    for (const Group& group : figure.groups) cells += group.kind == "orbital" ? 1 : 0;
    CHECK(cells == p.captions.size());
  }
}

TEST_CASE("texts on sheets of surfaces never overlap, with the axes seen from any side") {
  const Prepared p = frontier_of("methyl cation");
  const Molecule& molecule = p.r.symmetry.molecule;
  std::vector<OrbitalScene> scenes;
  const OrbitalField field(molecule, p.r.basis, p.coefficients);
  const OrbitalGrid grid = sample(field, 0.3);
  for (int i = 0; i < field.count(); ++i) {
    scenes.push_back(orbital_scene(molecule, field, grid, i, 0.5));
  }
  for (const Eigen::Vector3d& from : {Eigen::Vector3d(0, 0, 1), Eigen::Vector3d(1, 0, 0),
                                      Eigen::Vector3d(1, 1, 1), Eigen::Vector3d(0.3, -0.9, 0.2)}) {
    const Figure figure = surface_sheet({"title", plain_text("method")}, molecule, p.captions,
                                        scenes, camera_from(from));
    CHECK(first_text_collision(figure) == "");
  }
}

TEST_CASE("a sheet of any number of cells has them all, in rows that do not overlap") {
  for (const std::size_t n : {1u, 2u, 3u, 4u, 5u, 6u, 7u, 9u, 12u}) {
    Sheet sheet;
    sheet.title = "t";
    sheet.cell_size = 100.0;
    for (std::size_t i = 0; i < n; ++i) {
      SheetCell cell;
      cell.caption = {{{"first", Script::Normal}}, {{"second", Script::Normal}}};
      sheet.cells.push_back(cell);
    }
    const Figure figure = sheet_figure(sheet);
    CAPTURE(n);
    CHECK(first_text_collision(figure) == "");
    CHECK(text_boxes(figure).size() == 1 + 2 * n);
  }
}

TEST_CASE("a contour drawing says where the axes of its plane run") {
  const Prepared p = frontier_of("tetrachloroplatinate(II)");
  const Molecule& molecule = p.r.symmetry.molecule;
  const OrbitalField field(molecule, p.r.basis, p.coefficients.col(0));
  const auto captions_in = [&](const Plane& plane) {
    const Figure figure = contour_sheet(
        {"", plain_text("")}, molecule, std::span(p.captions).first(1),
        std::vector{contour_map(field, 0, plane, contour_levels())}, std::vector{plane});
    std::string captions;
    for (const NamedBox& text : text_boxes(figure)) captions += text.name + '\n';
    return captions;
  };
  const auto says = [](const std::string& captions, const std::string& words) {
    CAPTURE(captions);
    CHECK(captions.find(":" + words + '\n') != std::string::npos);
  };
  says(captions_in(axes_plane("xy")), "x to the right, y upwards");
  says(captions_in(axes_plane("zx")), "x to the right, z upwards");
  says(captions_in(axes_plane("yz", 0.5)), "y to the right, z upwards");
  Plane tilted;  // turned about x by the angle of a 3-4-5 triangle
  tilted.up = {0.0, -0.6, 0.8};
  says(captions_in(tilted), "x to the right, (0.00, −0.60, 0.80) upwards");
}
