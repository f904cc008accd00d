// Whether texts of a figure overlap, by the boxes that the font gives them.
#pragma once

#include <string>
#include <vector>

#include "figure/figure.hpp"
#include "figure/font.hpp"

struct NamedBox {
  std::string name;
  irrepwise::Box box;
};

inline bool overlap(const irrepwise::Box& a, const irrepwise::Box& b) {
  constexpr double touch = 0.01;  // px
  return a.left < b.right - touch && b.left < a.right - touch && a.top < b.bottom - touch &&
         b.top < a.bottom - touch;
}

inline std::vector<NamedBox> text_boxes(const irrepwise::Figure& figure) {
  const irrepwise::Font font;
  std::vector<NamedBox> boxes;
  for (const irrepwise::Group& group : figure.groups) {
    for (const irrepwise::Element& element : group.elements) {
      const auto* text = std::get_if<irrepwise::Text>(&element);
      if (text == nullptr) continue;
      std::string words = group.kind + " " + group.name + ":";
      for (const irrepwise::TextRun& run : text->runs) words += run.text;
      boxes.push_back({words, font.box(*text)});
    }
  }
  return boxes;
}

/// @returns  "one over other" for the first pair of texts that overlap, or "... outside the figure"
inline std::string first_text_collision(const irrepwise::Figure& figure) {
  const std::vector<NamedBox> texts = text_boxes(figure);
  for (std::size_t i = 0; i < texts.size(); ++i) {
    const irrepwise::Box& box = texts[i].box;
    if (box.left < 0 || box.top < 0 || box.right > figure.width || box.bottom > figure.height) {
      return texts[i].name + " outside the figure";
    }
    for (std::size_t j = 0; j < i; ++j) {
      if (overlap(box, texts[j].box)) return texts[i].name + " over " + texts[j].name;
    }
  }
  return {};
}
