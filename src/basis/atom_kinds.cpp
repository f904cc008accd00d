#include "basis/atom_kinds.hpp"

#include <algorithm>
#include <span>

namespace irrepwise {
namespace {

bool same_radial(const ContractedRadial& a, const ContractedRadial& b) {
  using Term = ContractedRadial::Term;
  return a.n() == b.n() && std::equal(a.terms().begin(), a.terms().end(), b.terms().begin(),
                                      b.terms().end(), [](const Term& s, const Term& t) {
                                        return s.function.zeta() == t.function.zeta() &&
                                               s.coefficient == t.coefficient;
                                      });
}

bool alike(const Basis& basis, std::size_t a, std::size_t b) {
  const auto shells = [&](std::size_t atom) {
    const auto first = static_cast<std::size_t>(basis.first_shell[atom]);
    const auto end = static_cast<std::size_t>(basis.first_shell[atom + 1]);
    return std::span<const Shell>(basis.shells).subspan(first, end - first);
  };
  const auto of_a = shells(a);
  const auto of_b = shells(b);
  return basis.valence_electrons[a] == basis.valence_electrons[b] &&
         std::equal(of_a.begin(), of_a.end(), of_b.begin(), of_b.end(),
                    [](const Shell& s, const Shell& t) {
                      return s.l == t.l && s.h_ii_ev == t.h_ii_ev &&
                             same_radial(s.radial, t.radial);
                    });
}

}  // namespace

std::vector<int> atom_kinds(const Basis& basis) {
  const std::size_t n_atoms = basis.valence_electrons.size();
  std::vector<int> kinds(n_atoms, 0);
  std::vector<std::size_t> firsts;
  for (std::size_t atom = 0; atom < n_atoms; ++atom) {
    const auto first = std::find_if(firsts.begin(), firsts.end(),
                                    [&](std::size_t other) { return alike(basis, other, atom); });
    kinds[atom] = static_cast<int>(first == firsts.end() ? atom : *first);
    if (first == firsts.end()) firsts.push_back(atom);
  }
  return kinds;
}

}  // namespace irrepwise
