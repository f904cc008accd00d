// Nanoseconds per pair of shells: our overlaps of Slater functions beside those of the same shells
// as STO-6G by libint2, in one run.
//
//   cmake -S . -B build -DIRREPWISE_BENCH=ON && cmake --build build &&
//   build/tests/bench/overlap_bench
//
// "ours" is everything one pair of shells needs: overlaps in the diatomic frame, and their turn
// into the molecular frame, itself made once per pair of atoms as the program does. "ours, diatomic
// frame" is the first part alone. Distances change from pair to pair, so that nothing
// is remembered from one to the next.
#include <array>
#include <cmath>
#include <string>
#include <vector>

#include <benchmark/benchmark.h>

#include "overlap/two_centre.hpp"

#ifdef IRREPWISE_HAVE_LIBINT2
#include <libint2.hpp>
#endif

namespace {

using irrepwise::ContractedRadial, irrepwise::DiatomicFrame, irrepwise::Shell;

struct Atoms {
  std::string name;
  std::vector<Shell> first, second;
  double distance;  // bohr
};

Shell shell(int n, int l, double zeta) {
  return {0, l, -10.0, ContractedRadial({{{n, zeta}, 1.0}}), 0};
}

Shell shell(int n, int l, double zeta1, double c1, double zeta2, double c2) {
  return {0, l, -10.0, ContractedRadial({{{n, zeta1}, c1}, {{n, zeta2}, c2}}), 0};
}

// Exponents of the usual size for such shells; nothing here depends on their exact values.
const Shell h1s = shell(1, 0, 1.3);
const Shell c2s = shell(2, 0, 1.625), c2p = shell(2, 1, 1.625);
const Shell o2p = shell(2, 1, 2.275);
const Shell cl3s = shell(3, 0, 2.183), cl3p = shell(3, 1, 1.733);
const Shell fe4s = shell(4, 0, 1.9), fe4p = shell(4, 1, 1.9);
const Shell fe3d = shell(3, 2, 5.35, 0.5505, 2.0, 0.6260);
const Shell pt6s = shell(6, 0, 2.554), pt6p = shell(6, 1, 2.554);
const Shell pt5d = shell(5, 2, 6.013, 0.6334, 2.696, 0.5513);
const Shell u5f = shell(5, 3, 4.943, 0.7844, 2.106, 0.3908);

const std::vector<Atoms>& cases() {
  static const std::vector<Atoms> all = {
      {"s-s", {h1s}, {c2s}, 2.06},
      {"p-p", {c2p}, {c2p}, 2.70},
      {"p-p, unequal", {c2p}, {o2p}, 2.30},
      {"d-p, double zeta", {fe3d}, {c2p}, 3.85},
      {"d-d, double zeta", {fe3d}, {fe3d}, 4.80},
      {"d-d 5d, double zeta", {pt5d}, {pt5d}, 5.20},
      {"f-d, double zeta", {u5f}, {fe3d}, 5.60},
      {"atoms C-H", {c2s, c2p}, {h1s}, 2.06},
      {"atoms C-C", {c2s, c2p}, {c2s, c2p}, 2.65},
      {"atoms Fe-C", {fe4s, fe4p, fe3d}, {c2s, c2p}, 3.85},
      {"atoms Pt-Cl", {pt6s, pt6p, pt5d}, {cl3s, cl3p}, 4.40},
  };
  return all;
}

// A different place of the second atom at every call, by less than the last digit shown.
Eigen::Vector3d place(const Atoms& atoms, int call) {
  const Eigen::Vector3d direction = Eigen::Vector3d(0.36, -0.48, 0.8);
  return (atoms.distance + 1e-6 * (call % 1024)) * direction;
}

int largest_l(const Atoms& atoms) {
  int largest = 0;
  for (const Shell& a : atoms.first) largest = std::max(largest, a.l);
  for (const Shell& b : atoms.second) largest = std::max(largest, b.l);
  return largest;
}

void count_pairs(benchmark::State& state, const Atoms& atoms) {
  const auto pairs = static_cast<double>(atoms.first.size() * atoms.second.size());
  state.counters["per_pair"] = benchmark::Counter(
      pairs, benchmark::Counter::kIsIterationInvariantRate | benchmark::Counter::kInvert);
}

void ours(benchmark::State& state, const Atoms& atoms) {
  const int l = largest_l(atoms);
  int call = 0;
  for ([[maybe_unused]] auto _ : state) {
    const Eigen::Vector3d displacement = place(atoms, ++call);
    const double distance = displacement.norm();
    const DiatomicFrame frame(displacement, l);
    for (const Shell& a : atoms.first) {
      for (const Shell& b : atoms.second) {
        irrepwise::OverlapBlock block =
            frame.block(diatomic_overlaps(a.radial, a.l, b.radial, b.l, distance), a.l, b.l);
        benchmark::DoNotOptimize(block.data());
        benchmark::ClobberMemory();
      }
    }
  }
  count_pairs(state, atoms);
}

void ours_diatomic(benchmark::State& state, const Atoms& atoms) {
  int call = 0;
  for ([[maybe_unused]] auto _ : state) {
    const double distance = place(atoms, ++call).norm();
    for (const Shell& a : atoms.first) {
      for (const Shell& b : atoms.second) {
        benchmark::DoNotOptimize(diatomic_overlaps(a.radial, a.l, b.radial, b.l, distance));
      }
    }
  }
  count_pairs(state, atoms);
}

#ifdef IRREPWISE_HAVE_LIBINT2
// Six Gaussians for each Slater function. Their number and l decide the cost, their exponents and
// coefficients do not, so an even-tempered series round zeta^2 serves as well as a fit.
libint2::Shell as_sto_6g(const Shell& shell) {
  libint2::svector<double> exponents, coefficients;
  for (const ContractedRadial::Term& term : shell.radial.terms()) {
    for (int i = -2; i <= 3; ++i) {
      exponents.push_back(term.function.zeta() * term.function.zeta() / shell.n() *
                          std::pow(2.5, i));
      coefficients.push_back(term.coefficient / 6);
    }
  }
  const bool pure = shell.l > 1;
  return {exponents, {{shell.l, pure, coefficients}}, {{0.0, 0.0, 0.0}}};
}

void libint(benchmark::State& state, const Atoms& atoms) {
  std::vector<libint2::Shell> first, second;
  std::size_t primitives = 0;
  for (const Shell& a : atoms.first) first.push_back(as_sto_6g(a));
  for (const Shell& b : atoms.second) second.push_back(as_sto_6g(b));
  for (const libint2::Shell& s : first) primitives = std::max(primitives, s.nprim());
  for (const libint2::Shell& s : second) primitives = std::max(primitives, s.nprim());
  libint2::Engine engine(libint2::Operator::overlap, primitives, largest_l(atoms));
  int call = 0;
  for ([[maybe_unused]] auto _ : state) {
    const Eigen::Vector3d at = place(atoms, ++call);
    for (libint2::Shell& b : second) b.move({{at.x(), at.y(), at.z()}});
    for (const libint2::Shell& a : first) {
      for (const libint2::Shell& b : second) {
        engine.compute(a, b);
        benchmark::DoNotOptimize(engine.results()[0]);
        benchmark::ClobberMemory();
      }
    }
  }
  count_pairs(state, atoms);
}
#endif

}  // namespace

int main(int argc, char** argv) {
  benchmark::Initialize(&argc, argv);
  if (benchmark::ReportUnrecognizedArguments(argc, argv)) return 2;
#ifdef IRREPWISE_HAVE_LIBINT2
  libint2::initialize();
#endif
  for (const Atoms& atoms : cases()) {
    benchmark::RegisterBenchmark(("ours, diatomic frame/" + atoms.name).c_str(), ours_diatomic,
                                 atoms);
    benchmark::RegisterBenchmark(("ours/" + atoms.name).c_str(), ours, atoms);
#ifdef IRREPWISE_HAVE_LIBINT2
    benchmark::RegisterBenchmark(("libint2 STO-6G/" + atoms.name).c_str(), libint, atoms);
#endif
  }
  benchmark::RunSpecifiedBenchmarks();
#ifdef IRREPWISE_HAVE_LIBINT2
  libint2::finalize();
#endif
  benchmark::Shutdown();
}
