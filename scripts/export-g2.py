#!/usr/bin/python3
"""Writes tests/reference/g2.txt from the G2 set in ASE (Debian: python3-ase).

Usage: scripts/export-g2.py > tests/reference/g2.txt

The expected group of a molecule is the one stated in ASE's description, except where CORRECTED says
why not. A search by brute force confirms each at the three tolerances below; where it does not,
nothing is written.
"""
import re
import sys

import ase
from ase.data.g2 import data
from ase.symbols import string2symbols

sys.dont_write_bytecode = True  # leaves no cache folder beside the scripts
from brute_force_group import point_group  # noqa: E402

TOLERANCES_ANGSTROM = (0.0001, 0.01, 0.05)

CORRECTED = {
    "BeH": ("Cinfv", "stated Dinfh: the two atoms differ, so no inversion"),
    "CH2NHCH2": ("Cs", "stated C2v: aziridine's N-H points out of the plane of the ring, in these "
                       "coordinates and by every textbook"),
    "N2O": ("Cinfv", "stated Cs: linear in these coordinates and by every textbook"),
}

HEADER = """\
# Molecules of the G2/97 set, geometries that nobody here made.
# Source: ASE {version}, module ase.data.g2 (Debian's python3-ase), which states: coordinates are
#   MP2(full)/6-31G(d) optimised; data from Raghavachari, Redfern and Pople, J. Chem. Phys. 106, 1063
#   (1997); about the sets see doi:10.1063/1.477422.
# Rewrite: scripts/export-g2.py > tests/reference/g2.txt
# group: the point group stated in ASE's description of the molecule, or, where a note is given, the
#   right one by common knowledge (from memory). Confirmed by brute force at 0.0001, 0.01 and 0.05 Å.
# unpaired: number of unpaired electrons, from ASE's magnetic moments. All molecules are neutral. All
#   elements here (H Li Be B C N O F Na Al Si P S Cl) have published parameters.
# Each molecule: "molecule NAME", "group SYMBOL", "unpaired N", perhaps "note TEXT", "atoms N", then
#   a line per atom: element, x, y, z in Å.
"""


def stated_group(description):
    if re.fullmatch(r"\w+ atom", description):
        return "Kh"
    word = re.search(r"(\S+) symm", description).group(1)
    return word.replace("*", "inf").replace("D2H", "D2h")


def main():
    lines = []
    for name, entry in data.items():
        if entry["charges"] is not None:
            sys.exit(f"export-g2: {name} has charges, which this script does not export")
        symbols = string2symbols(entry["symbols"])
        group, note = CORRECTED.get(name, (stated_group(entry["description"]), None))
        for tolerance in TOLERANCES_ANGSTROM:
            found = point_group(symbols, entry["positions"], tolerance)
            if found != group:
                sys.exit(f"export-g2: {name} is {found} at {tolerance} Å, but stated {group}")
        lines += [f"molecule {name}", f"group {group}",
                  f"unpaired {round(sum(entry['magmoms'] or [0]))}"]
        lines += [f"note {note}"] if note else []
        lines.append(f"atoms {len(symbols)}")
        for symbol, position in zip(symbols, entry["positions"]):
            lines.append(" ".join([symbol, *(repr(float(x)) for x in position)]))
    sys.stdout.write(HEADER.format(version=ase.__version__))
    print("\n".join(lines))


if __name__ == "__main__":
    main()
