#include "output/bond_columns.hpp"

#include <algorithm>
#include <set>
#include <tuple>
#include <utility>

namespace irrepwise {
namespace {

// Which properties tell bonds to one element apart, somewhere within one variant.
struct Differs {
  bool bridging = false;
  bool ligand = false;
  bool opposite = false;
  bool length = false;
};

// A type without the properties that do not differ.
struct Key {
  bool bridging = false;
  std::string ligand;
  Opposite opposite = Opposite::None;
  BondLength length = BondLength::Alike;

  auto operator<=>(const Key&) const = default;
};

Key key_of(const BondType& type, const Differs& differs) {
  return {differs.bridging && type.bridging, differs.ligand ? type.ligand : "",
          differs.opposite ? type.opposite : Opposite::None,
          differs.length ? type.length : BondLength::Alike};
}

const std::vector<BondType>& bonds_of(const VariantResult& variant) {
  static const std::vector<BondType> none;
  return variant.metal() ? variant.metal()->bonds : none;
}

Differs differences(const Comparison& comparison, const std::string& element) {
  Differs differs;
  for (const VariantResult& variant : comparison.variants) {
    const BondType* first = nullptr;
    for (const BondType& type : bonds_of(variant)) {
      if (type.element != element) continue;
      if (!first) first = &type;
      differs.bridging = differs.bridging || type.bridging != first->bridging;
      differs.ligand = differs.ligand || type.ligand != first->ligand;
      differs.opposite = differs.opposite || type.opposite != first->opposite;
      differs.length = differs.length || type.length != BondLength::Alike;
    }
  }
  return differs;
}

std::vector<std::string> donor_elements(const Comparison& comparison) {
  std::vector<std::string> elements;
  for (const VariantResult& variant : comparison.variants) {
    for (const BondType& type : bonds_of(variant)) {
      if (std::find(elements.begin(), elements.end(), type.element) == elements.end()) {
        elements.push_back(type.element);
      }
    }
  }
  return elements;
}

std::optional<double> mean_of(const VariantResult& variant,
                              const std::function<bool(const BondType&)>& belongs) {
  double sum = 0.0;
  int count = 0;
  for (const BondType& type : bonds_of(variant)) {
    if (!belongs(type)) continue;
    for (const MetalBond& bond : type.bonds) sum += bond.overlap_population;
    count += static_cast<int>(type.bonds.size());
  }
  return count > 0 ? std::optional<double>(sum / count) : std::nullopt;
}

bool varies(const VariantResult& variant, const MetalBond& bond) {
  return std::any_of(variant.varied_bonds.begin(), variant.varied_bonds.end(),
                     [&](const MetalBond& varied) { return varied.donor == bond.donor; });
}

// Some bonds vary, in each variant those to one element: a mean over several would say little.
bool has_varied_column(const Comparison& comparison) {
  bool some = false;
  for (const VariantResult& variant : comparison.variants) {
    std::set<std::string> elements;
    for (const BondType& type : bonds_of(variant)) {
      if (std::any_of(type.bonds.begin(), type.bonds.end(),
                      [&](const MetalBond& bond) { return varies(variant, bond); })) {
        elements.insert(type.element);
      }
    }
    if (elements.size() > 1) return false;
    some = some || !elements.empty();
  }
  return some;
}

// Whether the column of varied bonds does not say it all.
bool is_needed(const Comparison& comparison, const std::function<bool(const BondType&)>& belongs) {
  if (!has_varied_column(comparison)) return true;
  for (const VariantResult& variant : comparison.variants) {
    for (const BondType& type : bonds_of(variant)) {
      if (!belongs(type)) continue;
      if (std::any_of(type.bonds.begin(), type.bonds.end(),
                      [&](const MetalBond& bond) { return !varies(variant, bond); })) {
        return true;
      }
    }
  }
  return false;
}

// "N" where all bonds of the column have nitrogen opposite, otherwise empty.
std::string one_opposite(const Comparison& comparison,
                         const std::function<bool(const BondType&)>& belongs) {
  std::set<std::string> elements;
  for (const VariantResult& variant : comparison.variants) {
    for (const BondType& type : bonds_of(variant)) {
      if (belongs(type)) elements.insert(type.opposite_element);
    }
  }
  const bool one = elements.size() == 1 && elements.begin()->find(',') == std::string::npos;
  return one ? *elements.begin() : std::string();
}

std::string key_text(const std::string& element, const Key& key, const Differs& differs) {
  std::string text = "bond_" + element;
  if (differs.bridging) text += key.bridging ? "_bridging" : "_terminal";
  if (differs.ligand) text += "_" + key.ligand;
  if (differs.opposite) text += std::string("_") + opposite_word(key.opposite);
  if (differs.length) text += std::string("_") + length_word(key.length);
  return text;
}

std::string title_text(const std::string& element, const Key& key, const Differs& differs,
                       const std::string& across) {
  std::string text = (key.bridging ? "M–μ" : "M–") + element;
  if (differs.ligand) text += " of " + key.ligand;
  if (differs.opposite) {
    text += key.opposite == Opposite::None ? ", none trans"
            : across.empty()               ? " trans other"
                                           : " trans " + across;
  }
  if (differs.length) text += std::string(", ") + length_word(key.length);
  return text;
}

void add_types(const Comparison& comparison, const std::string& element, const Differs& differs,
               std::vector<BondColumn>& columns) {
  std::vector<Key> keys;
  for (const VariantResult& variant : comparison.variants) {
    for (const BondType& type : bonds_of(variant)) {
      if (type.element != element) continue;
      const Key key = key_of(type, differs);
      if (std::find(keys.begin(), keys.end(), key) == keys.end()) keys.push_back(key);
    }
  }
  std::stable_sort(keys.begin(), keys.end(), [](const Key& a, const Key& b) {
    return std::tie(a.bridging, a.opposite, a.length) < std::tie(b.bridging, b.opposite, b.length);
  });
  const auto belongs_to = [&](const Key& key) {
    return [element, key, differs](const BondType& type) {
      return type.element == element && key_of(type, differs) == key;
    };
  };
  // The ligand is named only where columns of several are shown.
  std::set<std::string> shown_ligands;
  for (const Key& key : keys) {
    if (is_needed(comparison, belongs_to(key))) shown_ligands.insert(key.ligand);
  }
  for (const Key& key : keys) {
    const auto belongs = belongs_to(key);
    Differs named = differs;
    named.ligand =
        differs.ligand && (shown_ligands.size() > 1 || !shown_ligands.contains(key.ligand));
    std::string across = one_opposite(comparison, belongs);
    // Another ligand of the same element: its element would not tell it from the like.
    if (key.opposite == Opposite::Other && across == element) across.clear();
    columns.push_back({key_text(element, key, differs), title_text(element, key, named, across),
                       is_needed(comparison, belongs),
                       [belongs](const VariantResult& v) { return mean_of(v, belongs); }});
  }
}

std::optional<double> varied_mean(const VariantResult& variant) {
  if (variant.varied_bonds.empty()) return {};
  double sum = 0.0;
  for (const MetalBond& bond : variant.varied_bonds) sum += bond.overlap_population;
  return sum / static_cast<double>(variant.varied_bonds.size());
}

}  // namespace

std::vector<BondColumn> bond_columns(const Comparison& comparison) {
  std::vector<BondColumn> columns;
  if (has_varied_column(comparison)) {
    columns.push_back({"bond_varied", "M–varied", true, varied_mean});
  }
  for (const std::string& element : donor_elements(comparison)) {
    const auto belongs = [element](const BondType& type) { return type.element == element; };
    const Differs differs = differences(comparison, element);
    const bool splits = differs.bridging || differs.ligand || differs.opposite || differs.length;
    columns.push_back({"bond_" + element, "M–" + element, !splits && is_needed(comparison, belongs),
                       [belongs](const VariantResult& v) { return mean_of(v, belongs); }});
    if (splits) add_types(comparison, element, differs, columns);
  }
  return columns;
}

std::string bond_words(const std::vector<std::string>& titles) {
  const auto any = [&](const char* words) {
    return std::any_of(titles.begin(), titles.end(), [&](const std::string& title) {
      return title.find(words) != std::string::npos;
    });
  };
  std::string text = "M–X: mean overlap population of the bonds from the metal to donor atoms X";
  if (any("varied")) text += "; M–varied: to donors that not all variants have";
  if (any("μ")) text += "; μ: bridging";
  if (any("trans")) text += "; trans: what stands opposite";
  if (any("trans other")) text += ", other: another ligand";
  return text + ".";
}

}  // namespace irrepwise
