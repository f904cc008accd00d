#!/usr/bin/python3
"""Checks what `irrepwise levels` prints by computing it again by another road.

Usage: scripts/check-levels.py PROGRAM INPUT...

For each input (an .xyz file or a job) the program is run with --format json --matrices
--coefficients. From its overlap and Hamiltonian matrices over atomic orbitals alone, SciPy solves the
whole generalised eigenproblem with no symmetry and NumPy forms the density matrix; the levels,
populations and sums printed must agree to 1e-9 (eV, electrons or Å; measured from the matrices that
the program states, so an error in those is not found here).

Needs Debian's python3-scipy. Exit status: 0 all passed, 1 a check failed, 2 wrong usage.
"""
import json
import re
import subprocess
import sys

import numpy as np
import scipy.linalg

LIMIT = 1e-9


class Checks:
    """Counts checks and prints those that fail."""

    def __init__(self, name):
        self.name = name
        self.passed = 0
        self.failed = 0

    def true(self, what, condition, detail=""):
        if condition:
            self.passed += 1
        else:
            self.failed += 1
            print(f"{self.name}: {what}: FAILED {detail}")

    def equal(self, what, found, expected, limit=LIMIT):
        found, expected = np.atleast_1d(np.asarray(found, float), np.asarray(expected, float))
        if found.shape != expected.shape:
            self.true(what, False, f"{found.shape} numbers found, {expected.shape} expected")
            return
        error = np.abs(found - expected).max(initial=0.0)
        self.true(what, bool(error <= limit), f"largest difference {error:.3g}, limit {limit:g}")


def run(program, path):
    command = [program, "levels", path, "--format", "json", "--matrices", "--coefficients"]
    done = subprocess.run(command, capture_output=True, text=True, check=False)
    if done.returncode != 0:
        raise RuntimeError(f"exit status {done.returncode}: {done.stderr.strip()}")
    return json.loads(done.stdout)


def atoms_of_orbitals(titles):
    """'Pt1 6s' -> 0: the atom of each atomic orbital, from 0."""
    return np.array([int(re.match(r"[A-Z][a-z]?(\d+) ", title).group(1)) - 1 for title in titles])


def check_levels(checks, levels, overlap, hamiltonian):
    energies = np.repeat([v["energy_ev"] for v in levels], [v["degeneracy"] for v in levels])
    dense = scipy.linalg.eigh(hamiltonian, overlap, eigvals_only=True)
    checks.equal("levels against the dense problem", energies, dense)
    checks.true("levels in order of energy", bool((np.diff(energies) >= -LIMIT).all()))


def check_orbitals(checks, levels, overlap, hamiltonian):
    """@returns the coefficients, orbitals in columns, or None where they cannot be used."""
    shapes = [(len(v["coefficients"]), v["degeneracy"]) for v in levels]
    checks.true("coefficients of every partner", all(a == b for a, b in shapes))
    columns = np.array([row for v in levels for row in v["coefficients"]], float).T
    if columns.shape != overlap.shape:
        checks.true("a coefficient for every orbital", False, f"shape {columns.shape}")
        return None
    energies = np.repeat([v["energy_ev"] for v in levels], [v["degeneracy"] for v in levels])
    checks.equal("orbitals orthonormal", columns.T @ overlap @ columns, np.eye(len(overlap)))
    checks.equal("orbitals solve H c = E S c", hamiltonian @ columns,
                 overlap @ columns @ np.diag(energies), 1e-8)
    return columns


def in_standard_frame(rows, titles, rotation):
    """The rows of p orbitals turned as vectors turn; s does not change, d and f are left."""
    turned = rows.copy()
    for i, title in enumerate(titles):
        if title.endswith("px"):
            turned[i:i + 3] = rotation @ rows[i:i + 3]
    return turned


def check_composition(checks, levels, columns, overlap, titles, rotation):
    """Shares refer to the standard frame, matrices and coefficients to that of the input. Shares of
    single d and f orbitals are compared where the two frames agree, otherwise their sum over a shell,
    which does not depend on the frame (the program leaves out shares below 1e-4)."""
    same_frame = np.allclose(rotation, np.eye(3))
    start = 0
    for level in levels:
        partners = columns[:, start:start + level["degeneracy"]]
        start += level["degeneracy"]
        products = [in_standard_frame(m, titles, rotation) for m in (partners, overlap @ partners)]
        shares = (products[0] * products[1]).mean(axis=1)
        sums = {}
        for entry in level["composition"]:
            title = f"{entry['element']}{entry['atom']} {entry['orbital']}"
            if title not in titles:
                checks.true(f"composition of {level['label']}", False, f"no orbital {title}")
            elif same_frame or "s" in title.split()[1][:2] or "p" in title.split()[1][:2]:
                checks.equal(f"share of {title} in {level['label']}", entry["share"],
                             shares[titles.index(title)])
            else:
                shell = title.split()[0] + " " + title.split()[1][:2]
                sums[shell] = sums.get(shell, 0.0) + entry["share"]
        for shell, found in sums.items():
            expected = sum(s for s, t in zip(shares, titles) if t.startswith(shell))
            checks.equal(f"share of {shell} in {level['label']}", found, expected, 7e-4)


def check_populations(checks, document, columns, overlap, owners):
    levels, atoms = document["orbitals"], document["atoms"]
    occupations = np.repeat([v["occupation"] / v["degeneracy"] for v in levels],
                            [v["degeneracy"] for v in levels])
    products = ((columns * occupations) @ columns.T) * overlap  # Mulliken's P_ij S_ij
    n = len(atoms)
    by_atoms = np.zeros((n, n))
    np.add.at(by_atoms, np.ix_(owners, owners), products)
    gross = by_atoms.sum(axis=1)

    checks.equal("gross populations", [a["gross_population"] for a in atoms], gross)
    charges = np.array([a["charge"] for a in atoms])
    # The valence electrons are whole, and the same for each atom of an element.
    valence = np.round(charges + gross)
    checks.equal("charges", charges, valence - gross)
    by_element = {(a["element"], v) for a, v in zip(atoms, valence)}
    checks.true("valence electrons by element", len(by_element) == len({e for e, _ in by_element}))
    checks.equal("sum of charges", charges.sum(), document["charge"])
    checks.equal("number of electrons", valence.sum() - document["charge"], document["electrons"])
    checks.equal("sum of occupations", sum(v["occupation"] for v in levels), document["electrons"])
    checks.true("occupations within bounds", all(-LIMIT <= v["occupation"] <= 2 * v["degeneracy"] + LIMIT
                                                for v in levels))
    checks.equal("sum of occupied energies", document["sum_of_occupied_ev"],
                 sum(v["occupation"] * v["energy_ev"] for v in levels))

    pairs = [tuple(sorted(i - 1 for i in p["atoms"])) for p in document["overlap_populations"]]
    checks.true("overlap population of each pair, once",
                sorted(pairs) == [(i, j) for i in range(n) for j in range(i + 1, n)])
    positions = np.array([[a["x"], a["y"], a["z"]] for a in atoms])
    for pair, entry in zip(pairs, document["overlap_populations"]):
        i, j = pair
        name = f"atoms {i + 1} and {j + 1}"
        checks.equal(f"overlap population of {name}", entry["value"], 2 * by_atoms[i, j])
        checks.equal(f"distance of {name}", entry["distance_angstrom"],
                     np.linalg.norm(positions[i] - positions[j]))


def check(program, path):
    checks = Checks(path)
    try:
        document = run(program, path)
        matrices, levels = document["matrices"], document["orbitals"]
        overlap = np.array(matrices["overlap"], float)
        hamiltonian = np.array(matrices["hamiltonian_ev"], float)
        titles = matrices["orbitals"]
        checks.equal("overlap matrix symmetric", overlap, overlap.T, 1e-14)
        checks.equal("Hamiltonian symmetric", hamiltonian, hamiltonian.T, 1e-12)
        checks.equal("orbitals normalised", np.diag(overlap), np.ones(len(titles)), 1e-14)
        check_levels(checks, levels, overlap, hamiltonian)
        columns = check_orbitals(checks, levels, overlap, hamiltonian)
        if columns is not None:
            check_composition(checks, levels, columns, overlap, titles,
                              np.array(document["symmetry"]["rotation"], float))
            check_populations(checks, document, columns, overlap, atoms_of_orbitals(titles))
    except (RuntimeError, OSError, ValueError, KeyError, AttributeError, np.linalg.LinAlgError) as e:
        checks.true("runs and prints what it should", False, f"{type(e).__name__}: {e}")
    print(f"{path}: {checks.passed} passed, {checks.failed} failed")
    return checks


def main(arguments):
    if len(arguments) < 2:
        print("usage: check-levels.py PROGRAM INPUT...", file=sys.stderr)
        return 2
    program, *paths = arguments
    results = [check(program, path) for path in paths]
    failed = sum(c.failed > 0 for c in results)
    print(f"{len(results) - failed} passed, {failed} failed")
    return 1 if failed else 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
