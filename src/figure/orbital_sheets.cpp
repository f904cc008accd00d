#include "figure/orbital_sheets.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <memory>

#include <fmt/format.h>

#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/sheet.hpp"

namespace irrepwise {
namespace {

std::string cell_name(const OrbitalCaption& caption) {
  return caption.degeneracy == 1 ? caption.label
                                 : fmt::format("{}:{}", caption.label, caption.partner);
}

std::string spoken(const OrbitalCaption& caption) {
  std::string words = caption.label;
  if (caption.degeneracy > 1) {
    words += fmt::format(", partner {} of {}", caption.partner, caption.degeneracy);
  }
  words += fmt::format(", {}, {:g} electrons", energy_words(caption.energy_ev), caption.occupation);
  return caption.mark.empty() ? words : words + ", " + caption.mark;
}

std::string share_words(double share) { return fmt::format("{:g} %", 100.0 * share); }

Frame joint_frame(std::span<const OrbitalScene> scenes, const Camera& camera) {
  Frame joint;
  double low[2] = {1e9, 1e9};
  double high[2] = {-1e9, -1e9};
  for (const OrbitalScene& scene : scenes) {
    const Frame frame = frame_of(scene.scene, camera);
    const double at[2] = {camera.right.dot(frame.centre), camera.up.dot(frame.centre)};
    for (int i = 0; i < 2; ++i) {
      low[i] = std::min(low[i], at[i] - frame.half_width);
      high[i] = std::max(high[i], at[i] + frame.half_width);
    }
  }
  joint.centre = 0.5 * (low[0] + high[0]) * camera.right + 0.5 * (low[1] + high[1]) * camera.up;
  joint.half_width = 0.5 * std::max(high[0] - low[0], high[1] - low[1]);
  return joint;
}

// The axes as the camera sees them, in a square of 60 px.
std::vector<Element> axes_corner(const Camera& camera) {
  constexpr double length = 20.0;
  constexpr double least_between_names = 13.0;
  constexpr Point2 centre = {28.0, 32.0};
  std::vector<Element> elements;
  std::vector<Point2> names;
  const auto is_free = [&](const Point2& at) {
    return std::none_of(names.begin(), names.end(), [&](const Point2& other) {
      return std::hypot(at.x - other.x, at.y - other.y) < least_between_names;
    });
  };
  for (int axis = 0; axis < 3; ++axis) {
    const double dx = camera.right(axis);
    const double dy = -camera.up(axis);
    const double size = std::hypot(dx, dy);
    Text text;
    text.runs = plain_text(std::string(1, "xyz"[axis]));
    text.size = 11.5;
    text.colour = palette::muted;
    text.anchor = Anchor::Middle;
    if (size < 0.12) {  // towards the eye or away from it
      elements.emplace_back(Disc{centre, 2.5, palette::muted, {}});
      text.at = {centre.x - 10.0, centre.y + 12.0};
    } else {
      Path path;
      path.lines = {{centre, {centre.x + length * dx, centre.y + length * dy}}};
      path.stroke = Stroke{palette::muted, 1.4, {}};
      elements.emplace_back(std::move(path));
      double reach = length * size + 8.0;
      do {  // the name of an axis just beside another steps outwards
        text.at = {centre.x + reach * dx / size, centre.y + reach * dy / size + 4.0};
        reach += 3.0;
      } while (!is_free(text.at));
    }
    names.push_back(text.at);
    elements.emplace_back(std::move(text));
  }
  return elements;
}

std::string heading_words(std::span<const OrbitalCaption> captions) {
  std::string words;
  for (const OrbitalCaption& caption : captions) words += spoken(caption) + ". ";
  return words;
}

}  // namespace

std::vector<RichText> caption_lines(const OrbitalCaption& caption) {
  RichText first = label_text(caption.label);
  if (caption.degeneracy > 1) {
    first = first + plain_text(fmt::format("\u00A0\u00A0 partner {} of {}", caption.partner,
                                           caption.degeneracy));
  }
  std::string second = energy_words(caption.energy_ev);
  if (caption.occupation > 0.0) {
    second +=
        caption.degeneracy > 1
            ? fmt::format(" · {:g} of {} electrons", caption.occupation, 2 * caption.degeneracy)
            : fmt::format(" · {:g} {}", caption.occupation,
                          caption.occupation == 1.0 ? "electron" : "electrons");
  } else {
    second += " · empty";
  }
  if (!caption.mark.empty()) second += " · " + caption.mark;
  return {first, plain_text(second)};
}

Raster surface_picture(const OrbitalScene& scene, const Camera& camera, int size_px) {
  return rendered(scene.scene, camera, frame_of(scene.scene, camera), size_px);
}

Figure surface_sheet(const SheetWords& words, const Molecule& molecule,
                     std::span<const OrbitalCaption> captions, std::span<const OrbitalScene> scenes,
                     const Camera& camera, double raster_scale) {
  assert(captions.size() == scenes.size() && !scenes.empty());
  Sheet sheet;
  sheet.title = words.title;
  sheet.method = words.method;
  sheet.cell_size = scenes.size() == 1 ? 420.0 : 250.0;
  const Frame frame = joint_frame(scenes, camera);
  for (std::size_t i = 0; i < scenes.size(); ++i) {
    SheetCell cell;
    cell.name = cell_name(captions[i]);
    cell.title = spoken(captions[i]);
    const int size = static_cast<int>(std::lround(sheet.cell_size * raster_scale));
    cell.elements.emplace_back(
        Picture{{0.0, 0.0},
                sheet.cell_size,
                sheet.cell_size,
                std::make_shared<const Raster>(rendered(scenes[i].scene, camera, frame, size)),
                spoken(captions[i])});
    cell.caption = caption_lines(captions[i]);
    cell.caption.push_back(
        RichText{{fmt::format("isovalue {:.4f} bohr", scenes[i].isovalue), Script::Normal},
                 {"−3/2", Script::Super}});
    sheet.cells.push_back(std::move(cell));
  }
  sheet.legend = {{"positive phase", palette::positive, false, false},
                  {"negative phase", palette::negative, false, false}};
  for (const SceneBody& body : scenes.front().scene.bodies) {
    if (body.opacity < 1.0 || body.name == "bonds") continue;
    sheet.legend.push_back({body.name, body.colour, false, false});
  }
  sheet.notes = {plain_text(fmt::format("Surfaces enclose {} of the density; {}.",
                                        share_words(scenes.front().share), camera_words(camera)))};
  sheet.corner = axes_corner(camera);
  sheet.description =
      fmt::format("Orbital surfaces of {}. {}", hill_formula(molecule), heading_words(captions));
  return sheet_figure(sheet);
}

}  // namespace irrepwise
