#include "figure/font.hpp"

#include <algorithm>
#include <cassert>
#include <cstdint>

#include <ft2build.h>  // names the headers below
#include FT_FREETYPE_H
#include FT_OUTLINE_H

#include "figure/utf8.hpp"

// The font file as it is, between two symbols; the build says where it is.
asm(R"(
  .pushsection .rodata, "a"
  .global irrepwise_font_begin
  .hidden irrepwise_font_begin
  .global irrepwise_font_end
  .hidden irrepwise_font_end
  irrepwise_font_begin:
  .incbin ")" IRREPWISE_FONT_FILE R"("
  irrepwise_font_end:
  .byte 0
  .popsection
)");
extern "C" const unsigned char irrepwise_font_begin[] __attribute__((visibility("hidden")));
extern "C" const unsigned char irrepwise_font_end[] __attribute__((visibility("hidden")));

namespace irrepwise {

struct Font::Face {
  FT_Library library = nullptr;
  FT_Face face = nullptr;
  double units = 1.0;  // font units in one em

  Face() {
    [[maybe_unused]] FT_Error error = FT_Init_FreeType(&library);
    assert(error == 0);
    error = FT_New_Memory_Face(library, irrepwise_font_begin,
                               static_cast<FT_Long>(irrepwise_font_end - irrepwise_font_begin), 0,
                               &face);
    assert(error == 0 && face != nullptr);
    units = static_cast<double>(face->units_per_EM);
  }
  ~Face() {
    FT_Done_Face(face);
    FT_Done_FreeType(library);
  }
  Face(const Face&) = delete;
  Face& operator=(const Face&) = delete;

  void load(char32_t character) const {
    const FT_UInt glyph = FT_Get_Char_Index(face, character);  // 0 shows as an empty box
    [[maybe_unused]] const FT_Error error =
        FT_Load_Glyph(face, glyph, FT_LOAD_NO_SCALE | FT_LOAD_NO_BITMAP);
    assert(error == 0);
  }
};

Font::Font() : face_(std::make_unique<Face>()) {}
Font::~Font() = default;
Font::Font(Font&&) noexcept = default;
Font& Font::operator=(Font&&) noexcept = default;

namespace {

double run_size(const TextRun& run, double size) {
  return run.script == Script::Normal ? size : size * script_scale;
}

double run_rise(const TextRun& run, double size) {
  switch (run.script) {
    case Script::Normal:
      return 0.0;
    case Script::Sub:
      return -sub_drop * size;
    case Script::Super:
      return super_rise * size;
  }
  return 0.0;
}

double anchored(Anchor anchor, double width) {
  switch (anchor) {
    case Anchor::Start:
      return 0.0;
    case Anchor::Middle:
      return -0.5 * width;
    case Anchor::End:
      return -width;
  }
  return 0.0;
}

// Outline of one glyph as polygons, in font units with y up.
struct Pen {
  std::vector<std::vector<Point2>> polygons;

  static Point2 point(const FT_Vector* v) {
    return {static_cast<double>(v->x), static_cast<double>(v->y)};
  }
  static Pen& self(void* pen) { return *static_cast<Pen*>(pen); }

  static int move(const FT_Vector* to, void* pen) {
    self(pen).polygons.push_back({point(to)});
    return 0;
  }
  static int line(const FT_Vector* to, void* pen) {
    self(pen).polygons.back().push_back(point(to));
    return 0;
  }
  static int conic(const FT_Vector* control, const FT_Vector* to, void* pen) {
    std::vector<Point2>& polygon = self(pen).polygons.back();
    const Point2 a = polygon.back();
    const Point2 b = point(control);
    const Point2 c = point(to);
    constexpr int steps = 6;
    for (int i = 1; i <= steps; ++i) {
      const double t = static_cast<double>(i) / steps;
      const double u = 1.0 - t;
      polygon.push_back({u * u * a.x + 2.0 * u * t * b.x + t * t * c.x,
                         u * u * a.y + 2.0 * u * t * b.y + t * t * c.y});
    }
    return 0;
  }
  static int cubic(const FT_Vector* control_a, const FT_Vector* control_b, const FT_Vector* to,
                   void* pen) {
    std::vector<Point2>& polygon = self(pen).polygons.back();
    const Point2 a = polygon.back();
    const Point2 b = point(control_a);
    const Point2 c = point(control_b);
    const Point2 d = point(to);
    constexpr int steps = 8;
    for (int i = 1; i <= steps; ++i) {
      const double t = static_cast<double>(i) / steps;
      const double u = 1.0 - t;
      const double wa = u * u * u;
      const double wb = 3.0 * u * u * t;
      const double wc = 3.0 * u * t * t;
      const double wd = t * t * t;
      polygon.push_back(
          {wa * a.x + wb * b.x + wc * c.x + wd * d.x, wa * a.y + wb * b.y + wc * c.y + wd * d.y});
    }
    return 0;
  }
};

}  // namespace

double Font::width(const RichText& runs, double size) const {
  double width = 0.0;
  for (const TextRun& run : runs) {
    const double scale = run_size(run, size) / face_->units;
    for (const char32_t character : code_points(run.text)) {
      face_->load(character);
      width += scale * static_cast<double>(face_->face->glyph->metrics.horiAdvance);
    }
  }
  return width;
}

Box Font::box(const Text& text) const {
  constexpr double ascent = 0.88;   // in em; even the ring of Å stays below
  constexpr double descent = 0.22;  // of letters such as g
  double top = ascent * text.size;
  double bottom = descent * text.size;
  for (const TextRun& run : text.runs) {
    const double rise = run_rise(run, text.size);
    top = std::max(top, rise + ascent * run_size(run, text.size));
    bottom = std::max(bottom, -rise + descent * run_size(run, text.size));
  }
  const double length = width(text.runs, text.size);
  const double start = anchored(text.anchor, length);
  if (text.upwards) {
    return {text.at.x - top, text.at.y - start - length, text.at.x + bottom, text.at.y - start};
  }
  return {text.at.x + start, text.at.y - top, text.at.x + start + length, text.at.y + bottom};
}

std::vector<std::vector<Point2>> Font::outlines(const Text& text) const {
  std::vector<std::vector<Point2>> all;
  double along = anchored(text.anchor, width(text.runs, text.size));
  FT_Outline_Funcs functions{};
  functions.move_to = &Pen::move;
  functions.line_to = &Pen::line;
  functions.conic_to = &Pen::conic;
  functions.cubic_to = &Pen::cubic;
  for (const TextRun& run : text.runs) {
    const double scale = run_size(run, text.size) / face_->units;
    const double rise = run_rise(run, text.size);
    for (const char32_t character : code_points(run.text)) {
      face_->load(character);
      Pen pen;
      FT_Outline_Decompose(&face_->face->glyph->outline, &functions, &pen);
      for (std::vector<Point2>& polygon : pen.polygons) {
        for (Point2& p : polygon) {
          const double forward = along + scale * p.x;
          const double up = rise + scale * p.y;
          p = text.upwards ? Point2{text.at.x - up, text.at.y - forward}
                           : Point2{text.at.x + forward, text.at.y - up};
        }
        all.push_back(std::move(polygon));
      }
      along += scale * static_cast<double>(face_->face->glyph->metrics.horiAdvance);
    }
  }
  return all;
}

}  // namespace irrepwise
