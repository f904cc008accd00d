#include "figure/orbital_scene.hpp"

#include "figure/ball_and_stick.hpp"
#include "figure/palette.hpp"

namespace irrepwise {

OrbitalScene orbital_scene(const Molecule& molecule, const OrbitalField& field,
                           const OrbitalGrid& grid, int orbital, double share) {
  constexpr double lobe_opacity = 0.82;  // the molecule shows through, the shape stays clear
  OrbitalScene out;
  out.share = share;
  out.isovalue = enclosing_isovalue(field, grid, orbital, share);
  out.integral = grid.integrals[static_cast<std::size_t>(orbital)];
  out.scene.bodies.push_back({"positive phase", isosurface(field, grid, orbital, out.isovalue),
                              palette::positive, lobe_opacity});
  out.scene.bodies.push_back({"negative phase", isosurface(field, grid, orbital, -out.isovalue),
                              palette::negative, lobe_opacity});
  for (SceneBody& body : ball_and_stick(molecule)) out.scene.bodies.push_back(std::move(body));
  return out;
}

}  // namespace irrepwise
