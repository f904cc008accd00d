#!/usr/bin/python3
"""Runs the commands of transcripts and compares what they print.

    run.py --program DIR --inputs DIR [--rewrite] TRANSCRIPT...

A transcript is text. A line that starts with "$ " is a bash command, lines after it that start
with "> " go on with it, and every other line up to the next command is what it prints, standard
error included. A last line "[exit 1]" states an exit code other than 0. Lines before the first
command are comment. Each transcript runs in an empty folder of its own that holds a link `inputs`
to the shipped inputs; the folder of the program stands first in PATH.

--rewrite puts what was printed in place of what was expected. Review the difference before you
commit it: it is the specification.
"""

import argparse
import difflib
import os
import pathlib
import subprocess
import sys
import tempfile


def parse(text):
    """Returns the comment lines and a list of (command lines, expected lines)."""
    comment, steps = [], []
    for line in text.splitlines():
        if line.startswith("$ "):
            steps.append(([line[2:]], []))
        elif steps and line.startswith("> ") or line == ">":
            steps[-1][0].append(line[2:])
        elif steps:
            steps[-1][1].append(line)
        else:
            comment.append(line)
    return comment, steps


def run(command, folder, environment):
    done = subprocess.run(["bash", "-c", command], cwd=folder, env=environment, text=True,
                          encoding="utf-8", errors="replace", timeout=120,
                          stdin=subprocess.DEVNULL, stdout=subprocess.PIPE,
                          stderr=subprocess.STDOUT)
    lines = done.stdout.replace("\r", "\\r").splitlines()
    return lines + ([f"[exit {done.returncode}]"] if done.returncode else [])


def render(comment, steps):
    lines = list(comment)
    for command, output in steps:
        lines.append("$ " + command[0])
        lines += [("> " + line).rstrip() for line in command[1:]]
        lines += output
    return "\n".join(lines) + "\n"


def replay(path, options):
    """Runs one transcript; returns whether it came out as written."""
    expected = path.read_text(encoding="utf-8")
    comment, steps = parse(expected)
    environment = {"PATH": f"{options.program.resolve()}:{os.environ['PATH']}",
                   "LC_ALL": "C.UTF-8", "HOME": "/nonexistent"}
    for name in ("ASAN_OPTIONS", "UBSAN_OPTIONS"):
        if name in os.environ:
            environment[name] = os.environ[name]
    with tempfile.TemporaryDirectory() as folder:
        os.symlink(options.inputs.resolve(), os.path.join(folder, "inputs"))
        steps = [(command, run("\n".join(command), folder, environment))
                 for command, _ in steps]
    found = render(comment, steps)
    if found == expected:
        return True
    if options.rewrite:
        path.write_text(found, encoding="utf-8")
        print(f"rewrote {path}")
        return True
    sys.stdout.writelines(difflib.unified_diff(expected.splitlines(True), found.splitlines(True),
                                               f"{path.name}: expected", "printed"))
    return False


def main():
    parser = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    parser.add_argument("--program", type=pathlib.Path, required=True)
    parser.add_argument("--inputs", type=pathlib.Path, required=True)
    parser.add_argument("--rewrite", action="store_true")
    parser.add_argument("transcripts", type=pathlib.Path, nargs="+")
    options = parser.parse_args()
    if not (options.program / "irrepwise").is_file():
        parser.error(f"no program in {options.program}")
    failed = [path.name for path in options.transcripts if not replay(path, options)]
    print(f"{len(options.transcripts) - len(failed)} passed, {len(failed)} failed")
    return 1 if failed else 0


if __name__ == "__main__":
    sys.exit(main())
