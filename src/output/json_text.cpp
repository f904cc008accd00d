#include "output/json_text.hpp"

#include <cmath>

#include "core/error.hpp"

namespace irrepwise {
namespace {

std::string on_one_line(const Json& value) {
  return value.dump(-1, ' ', false, Json::error_handler_t::replace);
}

bool is_list_of_containers(const Json& value) {
  return value.is_array() && !value.empty() && value.front().is_structured();
}

void write(std::string& out, const Json& value, int depth) {
  const bool opens = (value.is_object() && depth < 2 && !value.empty()) ||
                     (is_list_of_containers(value) && depth < 3);
  if (!opens) {
    out += on_one_line(value);
    return;
  }
  const std::string inner(static_cast<std::size_t>(depth + 1), ' ');
  out += value.is_object() ? "{\n" : "[\n";
  bool first = true;
  for (auto item = value.begin(); item != value.end(); ++item) {
    if (!first) out += ",\n";
    first = false;
    out += inner;
    if (value.is_object()) out += on_one_line(Json(item.key())) + ": ";
    write(out, *item, value.is_object() ? depth + 1 : 3);
  }
  out += '\n' + std::string(static_cast<std::size_t>(depth), ' ');
  out += value.is_object() ? "}" : "]";
}

}  // namespace

double finite_number(double value) {
  if (!std::isfinite(value)) {
    throw Error("a result is not a finite number; check the geometry and the parameters");
  }
  return value + 0.0;
}

std::string json_text(const Json& document) {
  std::string out;
  write(out, document, 0);
  return out + '\n';
}

}  // namespace irrepwise
