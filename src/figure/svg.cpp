#include "figure/svg.hpp"

#include <cmath>
#include <cstddef>
#include <cstdint>

#include <fmt/format.h>

#include "core/parse.hpp"
#include "figure/font.hpp"

namespace irrepwise {
namespace {

// Hundredths of a pixel, without needless zeros.
std::string px(double value) {
  std::string text = fmt::format("{:.2f}", value);
  while (text.back() == '0') text.pop_back();
  if (text.back() == '.') text.pop_back();
  return text == "-0" ? "0" : text;
}

std::string escaped(std::string_view text) {
  std::string out;
  for (const char c : valid_utf8(text)) {
    switch (c) {
      case '&':
        out += "&amp;";
        break;
      case '<':
        out += "&lt;";
        break;
      case '>':
        out += "&gt;";
        break;
      case '"':
        out += "&quot;";
        break;
      default:  // control characters are not allowed in XML at all
        out += static_cast<unsigned char>(c) < 0x20 ? ' ' : c;
    }
  }
  return out;
}

std::string paint(const std::optional<Colour>& fill, const std::optional<Stroke>& stroke) {
  std::string text = fmt::format(" fill=\"{}\"", fill ? colour_code(*fill) : "none");
  if (fill) text += " fill-rule=\"evenodd\"";
  if (!stroke) return text;
  text += fmt::format(" stroke=\"{}\" stroke-width=\"{}\" stroke-linejoin=\"round\"",
                      colour_code(stroke->colour), px(stroke->width));
  if (!stroke->dashes.empty()) {
    text += " stroke-dasharray=\"";
    for (std::size_t i = 0; i < stroke->dashes.size(); ++i) {
      text += (i == 0 ? "" : " ") + px(stroke->dashes[i]);
    }
    text += "\"";
  } else {
    text += " stroke-linecap=\"round\"";
  }
  return text;
}

std::string written(const Path& path) {
  std::string d;
  for (const std::vector<Point2>& line : path.lines) {
    for (std::size_t i = 0; i < line.size(); ++i) {
      d += (i == 0 ? "M" : i == 1 ? "L" : " ") + px(line[i].x) + " " + px(line[i].y);
    }
    if (path.closed) d += "Z";
  }
  return fmt::format("<path d=\"{}\"{}/>\n", d, paint(path.fill, path.stroke));
}

std::string written(const Disc& disc) {
  return fmt::format("<circle cx=\"{}\" cy=\"{}\" r=\"{}\"{}/>\n", px(disc.centre.x),
                     px(disc.centre.y), px(disc.radius), paint(disc.fill, disc.stroke));
}

double rise(Script script, double size) {
  switch (script) {
    case Script::Normal:
      return 0.0;
    case Script::Sub:
      return -sub_drop * size;
    case Script::Super:
      return super_rise * size;
  }
  return 0.0;
}

std::string_view anchor_word(Anchor anchor) {
  switch (anchor) {
    case Anchor::Start:
      return "start";
    case Anchor::Middle:
      return "middle";
    case Anchor::End:
      return "end";
  }
  return "start";
}

// Scripts are shifted by dy: baseline-shift is not understood everywhere.
std::string written(const Text& text) {
  std::string out =
      fmt::format("<text x=\"{}\" y=\"{}\" font-size=\"{}\" fill=\"{}\"", px(text.at.x),
                  px(text.at.y), px(text.size), colour_code(text.colour));
  if (text.anchor != Anchor::Start) {
    out += fmt::format(" text-anchor=\"{}\"", anchor_word(text.anchor));
  }
  if (text.upwards) {
    out += fmt::format(" transform=\"rotate(-90 {} {})\"", px(text.at.x), px(text.at.y));
  }
  out += ">";
  double height = 0.0;
  for (const TextRun& run : text.runs) {
    const double wanted = rise(run.script, text.size);
    std::string attributes;
    if (wanted != height) attributes += fmt::format(" dy=\"{}\"", px(height - wanted));
    if (run.script != Script::Normal) {
      attributes += fmt::format(" font-size=\"{}\"", px(text.size * script_scale));
    }
    height = wanted;
    out += attributes.empty() ? escaped(run.text)
                              : "<tspan" + attributes + ">" + escaped(run.text) + "</tspan>";
  }
  return out + "</text>\n";
}

std::string written(const Picture& picture) {
  return fmt::format(
      "<image x=\"{}\" y=\"{}\" width=\"{}\" height=\"{}\" role=\"img\" aria-label=\"{}\" "
      "href=\"data:image/png;base64,{}\"/>\n",
      px(picture.corner.x), px(picture.corner.y), px(picture.width), px(picture.height),
      escaped(picture.description), base64(png_bytes(*picture.raster)));
}

}  // namespace

std::string svg_element(const Figure& figure, std::string_view id) {
  std::string out = fmt::format(
      "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"{0}\" height=\"{1}\" "
      "viewBox=\"0 0 {0} {1}\" role=\"img\" aria-labelledby=\"{5}-title {5}-description\" "
      "font-family=\"{2}\" xml:space=\"preserve\">\n"
      "<title id=\"{5}-title\">{3}</title>\n"
      "<desc id=\"{5}-description\">{4}</desc>\n",
      px(figure.width), px(figure.height), font_families, escaped(figure.title),
      escaped(figure.description), id);
  for (const Group& group : figure.groups) {
    out += "<g";
    if (!group.kind.empty()) out += fmt::format(" class=\"{}\"", escaped(group.kind));
    if (!group.name.empty()) out += fmt::format(" data-name=\"{}\"", escaped(group.name));
    for (const auto& [key, value] : group.facts) {
      out += fmt::format(" data-{}=\"{}\"", key, escaped(value));
    }
    out += ">\n";
    if (!group.title.empty()) out += "<title>" + escaped(group.title) + "</title>\n";
    for (const Element& element : group.elements) {
      out += std::visit([](const auto& shape) { return written(shape); }, element);
    }
    out += "</g>\n";
  }
  return out + "</svg>\n";
}

std::string svg_document(const Figure& figure) {
  Figure on_paper = figure;
  Path paper;
  paper.lines = {
      {{0.0, 0.0}, {figure.width, 0.0}, {figure.width, figure.height}, {0.0, figure.height}}};
  paper.closed = true;
  paper.fill = Colour{0xff, 0xff, 0xff};
  on_paper.groups.insert(on_paper.groups.begin(), Group{"paper", "", "", {paper}});
  return "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n" + svg_element(on_paper, "figure");
}

std::string colour_code(const Colour& colour) {
  return fmt::format("#{:02x}{:02x}{:02x}", colour.red, colour.green, colour.blue);
}

std::string base64(std::string_view bytes) {
  constexpr std::string_view letters =
      "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";
  std::string out;
  out.reserve((bytes.size() + 2) / 3 * 4);
  for (std::size_t i = 0; i < bytes.size(); i += 3) {
    std::uint32_t three = 0;
    for (std::size_t k = 0; k < 3; ++k) {
      three = (three << 8) | (i + k < bytes.size() ? static_cast<unsigned char>(bytes[i + k]) : 0u);
    }
    for (std::size_t k = 0; k < 4; ++k) {
      const bool padding = i + k > bytes.size();  // letter k needs k bytes, letter 0 one
      out += padding ? '=' : letters[(three >> (18 - 6 * k)) & 63u];
    }
  }
  return out;
}

}  // namespace irrepwise
