#!/usr/bin/python3
"""Compares 200 variants in one run: quicker than 200 runs, and the same bytes on one core and two.

usage: check-family.py PROGRAM

Progress is shown on a terminal (a pseudo-terminal here) and not in a pipe, and its line is gone
when an error ends the run.
"""

import os
import pathlib
import pty
import subprocess
import sys
import tempfile
import time

METALS = "Co Rh Ir Fe Ru Os Mn Re Cr Mo W V Ni Pd Pt Cu Zn Ti Ag Au".split()
LIGANDS = "F Cl Br I CN NC N2 CS O H".split()
JOB = """
build:
  metal: {metal}
  polyhedron: OC-6
  oxidation: 3
  ligands: [{{ligand: {ligand}, vertices: 1}}, {{ligand: CO, vertices: [2, 3, 4, 5, 6]}}]
"""
SAMPLE = 10  # of the 200 single runs


def run(program, *arguments):
    """Seconds and what the run wrote; nothing may come on standard error, which is a pipe."""
    start = time.monotonic()
    done = subprocess.run([program, "compare", *arguments], capture_output=True, check=True)
    assert done.stderr == b"", done.stderr
    return time.monotonic() - start, done.stdout


def on_terminal(program, *arguments):
    """What a run writes on a terminal."""
    master, slave = pty.openpty()
    with subprocess.Popen([program, "compare", *arguments], stdout=slave, stderr=slave) as process:
        os.close(slave)
        written = b""
        while True:
            try:
                piece = os.read(master, 4096)
            except OSError:  # Linux says so at the end
                break
            if not piece:
                break
            written += piece
        process.wait()
    os.close(master)
    return written


def main():
    program = sys.argv[1]
    with tempfile.TemporaryDirectory() as folder:
        family = pathlib.Path(folder, "family.yaml")
        each = f"{{metals: [{', '.join(METALS)}], ligands: [{', '.join(LIGANDS)}], vertices: 1}}"
        base = JOB.format(metal="Co", ligand="CO")
        family.write_text(base + f"variants:\n  - each: {each}\n")
        together, one = run(program, str(family), "--format", "json", "--threads", "1")
        also, two = run(program, str(family), "--format", "json", "--threads", "2")
        assert one == two, "one core and two differ"
        assert one.count(b'"sum_of_occupied_ev"') == len(METALS) * len(LIGANDS) == 200

        alone = 0.0
        for i in range(SAMPLE):
            single = pathlib.Path(folder, "single.yaml")
            single.write_text(JOB.format(metal=METALS[i], ligand=LIGANDS[i]))
            alone += run(program, str(single), "--format", "json")[0]
        all_alone = alone / SAMPLE * 200
        print(f"200 variants: {together:.2f} s on one core, {also:.2f} s on two; "
              f"200 runs: {all_alone:.1f} s")
        assert min(together, also) < all_alone

        shown = on_terminal(program, str(family), "--output", str(pathlib.Path(folder, "out.txt")))
        assert b"\r100 of 200 variants" in shown, shown[-200:]
        assert shown.endswith(b"\r\x1b[K"), shown[-200:]
        family.write_text(base + "variants:\n  - each: {ligands: [CO, CN, no such], vertices: 1}\n")
        refused = on_terminal(program, str(family))
        assert b"\r\x1b[Kirrepwise: " in refused or b"variants" not in refused, refused[-300:]
        assert b"variant 'no such'" in refused, refused[-300:]


if __name__ == "__main__":
    main()
