// A sheet of drawings: cells in rows, each with a caption, under one title and over one legend.
#pragma once

#include <string>
#include <vector>

#include "figure/figure.hpp"

namespace irrepwise {

struct SheetCell {
  std::string name;               // ASCII, "2e1g:1"
  std::string title;              // what a pointer over it is told
  std::vector<Element> elements;  // with the upper left corner of the cell as origin
  std::vector<RichText> caption;  // the first line larger
};

struct LegendItem {
  std::string words;
  Colour fill;
  bool dashed = false;  // drawn as a line beside the colour
  bool line = false;
};

struct Sheet {
  std::string title;
  RichText method;
  std::string description;   // for screen readers
  double cell_size = 260.0;  // px, cells are square
  std::vector<SheetCell> cells;
  std::vector<LegendItem> legend;
  std::vector<Element> corner;  // drawn at the right of the legend, 60 px square; may be empty
  std::vector<RichText> notes;
};

/// Up to four cells in a row; long lines are broken between words.
[[nodiscard]] Figure sheet_figure(const Sheet& sheet);

}  // namespace irrepwise
