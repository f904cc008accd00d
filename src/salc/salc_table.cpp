#include "salc/salc_table.hpp"

#include <array>
#include <cmath>

#include <fmt/format.h>

#include "harmonics/real_harmonics.hpp"

namespace irrepwise {
namespace {

constexpr double tie = 1e-6;

constexpr double nothing = 1e-13;

// Rounding leaves 1e-16 where theory has 0.
Eigen::MatrixXd tidy(const Eigen::MatrixXd& x) {
  return x.unaryExpr([](double value) { return std::abs(value) < nothing ? 0.0 : value; });
}

double phase(const Eigen::MatrixXd& first_partner) {
  const double largest = first_partner.cwiseAbs().maxCoeff();
  for (Eigen::Index atom = 0; atom < first_partner.rows(); ++atom) {
    for (Eigen::Index i = 0; i < first_partner.cols(); ++i) {
      if (std::abs(first_partner(atom, i)) > largest - tie) {
        return first_partner(atom, i) < 0.0 ? -1.0 : 1.0;
      }
    }
  }
  return 1.0;
}

class Writer {
 public:
  Writer(const MolecularSymmetry& symmetry, const EquivalentAtoms& set, const LocalFrames* frames)
      : group_(symmetry.group), set_(set), frames_(frames) {}

  // All partners of the SALCs of one part of a shell.
  void add(std::vector<SalcFunction>& list, SalcFunction blank, int l) const {
    const bool spherical = group_.symbol().family == Family::Kh;
    const SiteFunctions functions = blank.frame != OrbitalFrame::Standard
                                        ? part_functions(group_, set_, *frames_, blank.part, l)
                                        : whole_shell(group_, set_, l);
    blank.components = part_components(blank.part, l);
    for (int i = 0; i < static_cast<int>(group_.irreps().size()); ++i) {
      const Irrep& irrep = group_.irreps()[i];
      std::vector<Eigen::MatrixXd> found;
      if (!spherical) {
        found = site_invariants(irrep, set_, functions, multiplicity(irrep, set_, functions));
      } else if (i == l) {
        found = {Eigen::MatrixXd::Identity(2 * l + 1, 2 * l + 1)};
      }
      blank.irrep = i;
      blank.number = 0;
      for (const Eigen::MatrixXd& x : found) {
        ++blank.number;
        const double scale = std::sqrt(static_cast<double>(irrep.dimension) / set_.size());
        add_partners(list, blank, l, scale * x.normalized());
      }
    }
  }

 private:
  void add_partners(std::vector<SalcFunction>& list, const SalcFunction& blank, int l,
                    const Eigen::MatrixXd& representative) const {
    const auto columns = static_cast<Eigen::Index>(blank.components.size());
    std::vector<Eigen::MatrixXd> partners(static_cast<std::size_t>(representative.rows()),
                                          Eigen::MatrixXd(set_.size(), columns));
    for (int position = 0; position < set_.size(); ++position) {
      const int g = set_.from_representative[position];
      Eigen::MatrixXd on_atom = group_.irreps()[blank.irrep].matrices[g] * representative *
                                harmonic_rotation(l, group_.operations()[g]).transpose();
      if (blank.frame != OrbitalFrame::Standard)
        on_atom = (on_atom * harmonic_rotation(l, frames_->frames[position])).eval();
      for (std::size_t r = 0; r < partners.size(); ++r) {
        for (Eigen::Index i = 0; i < columns; ++i) {
          partners[r](position, i) =
              on_atom(static_cast<Eigen::Index>(r), blank.components[static_cast<std::size_t>(i)]);
        }
      }
    }
    const double sign = phase(partners.front());
    SalcFunction salc = blank;
    for (std::size_t r = 0; r < partners.size(); ++r) {
      salc.partner = static_cast<int>(r) + 1;
      salc.coefficients = tidy(sign * partners[r]);
      list.push_back(salc);
    }
  }

  const PointGroup& group_;
  const EquivalentAtoms& set_;
  const LocalFrames* frames_;
};

}  // namespace

std::vector<SalcFunction> salc_table(const MolecularSymmetry& symmetry, const Basis& basis,
                                     const std::vector<EquivalentAtoms>& sets,
                                     const std::vector<std::optional<LocalFrames>>& frames) {
  std::vector<SalcFunction> list;
  for (int s = 0; s < static_cast<int>(sets.size()); ++s) {
    const LocalFrames* local = !frames.empty() && frames[s] ? &*frames[s] : nullptr;
    const Writer writer(symmetry, sets[s], local);
    const int first = basis.first_shell[sets[s].representative()];
    const int end = basis.first_shell[sets[s].representative() + 1];
    for (int shell = first; shell < end; ++shell) {
      const int l = basis.shells[shell].l;
      SalcFunction blank;
      blank.set = s;
      blank.shell = shell;
      blank.frame = frames.empty() ? OrbitalFrame::Standard : orbital_frame(frames[s]);
      if (!local) {
        writer.add(list, blank, l);
        continue;
      }
      for (const Part part : parts_of_shell(*local, l)) {
        blank.part = part;
        writer.add(list, blank, l);
      }
    }
  }
  return list;
}

OrbitalFrame orbital_frame(const std::optional<LocalFrames>& frames) {
  if (!frames) return OrbitalFrame::Standard;
  return frames->side_on ? OrbitalFrame::SideOn : OrbitalFrame::Local;
}

std::string side_on_name(int l, int component) {
  std::string name(orbital_name(l, component));
  if (name == "pz") return "pπ";
  for (char& letter : name) {
    letter = letter == 'x' ? 'r' : letter == 'y' ? 't' : letter == 'z' ? 'n' : letter;
  }
  return name;
}

std::string salc_orbital_name(const Shell& shell, int component, OrbitalFrame frame) {
  if (frame == OrbitalFrame::Standard)
    return fmt::format("{}{}", shell.n(), orbital_name(shell.l, component));
  if (frame == OrbitalFrame::SideOn)
    return fmt::format("{}{}", shell.n(), side_on_name(shell.l, component));
  static constexpr std::array<std::array<const char*, 7>, 4> names = {
      {{""},
       {"πx", "πy", "σ"},
       {"σ", "δx2-y2", "δxy", "πx", "πy"},
       {"σ", "πx", "πy", "δx2-y2", "δxy", "φx", "φy"}}};
  return fmt::format("{}{}{}", shell.n(), shell_letter(shell.l), names[shell.l][component]);
}

}  // namespace irrepwise
