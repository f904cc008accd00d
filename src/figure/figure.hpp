// The figure model: what every drawing is made of, and what the writers of SVG and PNG read.
#pragma once

#include <cstdint>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <variant>
#include <vector>

#include "figure/raster.hpp"

namespace irrepwise {

/// A place on the figure in pixels, x to the right, y down.
struct Point2 {
  double x = 0.0;
  double y = 0.0;
};

struct Colour {
  std::uint8_t red = 0;
  std::uint8_t green = 0;
  std::uint8_t blue = 0;
};

struct Stroke {
  Colour colour;
  double width = 1.0;          // px
  std::vector<double> dashes;  // lengths on, off, on … in px; empty: solid
};

/// Polylines drawn as one shape; where they enclose each other, the inner one is a hole.
struct Path {
  std::vector<std::vector<Point2>> lines;
  bool closed = false;
  std::optional<Colour> fill;
  std::optional<Stroke> stroke;
};

struct Disc {
  Point2 centre;
  double radius = 1.0;  // px
  std::optional<Colour> fill;
  std::optional<Stroke> stroke;
};

enum class Script { Normal, Sub, Super };

struct TextRun {
  std::string text;  // UTF-8
  Script script = Script::Normal;
};

using RichText = std::vector<TextRun>;

enum class Anchor { Start, Middle, End };

struct Text {
  Point2 at;  // on the base line, at its start, middle or end
  RichText runs;
  double size = 12.0;  // px, of the letters in line
  Colour colour;
  Anchor anchor = Anchor::Start;
  bool upwards = false;  // reads from bottom to top
};

/// A picture made of pixels, shown at this size whatever the number of its pixels.
struct Picture {
  Point2 corner;  // upper left
  double width = 0.0;
  double height = 0.0;
  std::shared_ptr<const Raster> raster;
  std::string description;  // for those who cannot see it
};

using Element = std::variant<Path, Disc, Text, Picture>;

/// Elements that belong together, drawn in their order: one level, one contour, the axis.
struct Group {
  std::string kind;   // "level": one word, a class in SVG; empty where nobody asks
  std::string name;   // "2e1g": which one, in ASCII; in SVG `data-name`
  std::string title;  // what a pointer over it is told; may be empty
  std::vector<Element> elements;
  std::vector<std::pair<std::string, std::string>> facts = {};  // "column", "chloride": for
                                                                // scripts; in SVG `data-column`
};

struct Figure {
  double width = 0.0;  // px
  double height = 0.0;
  std::string title;        // for screen readers
  std::string description;  // the same, a few sentences
  std::vector<Group> groups;
};

/// The smallest upright rectangle around something.
struct Box {
  double left = 0.0;
  double top = 0.0;
  double right = 0.0;
  double bottom = 0.0;
};

}  // namespace irrepwise
