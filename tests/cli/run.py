#!/usr/bin/python3
"""Repeats recorded runs of the program and compares what it prints.

    run.py --program DIR --inputs DIR [--rewrite] RECORDING...

A recording is text. A line that starts with "$ " is a bash command, lines right after it that
start with "> " go on with it, lines that start with "%%" are comment, and every other line up to
the next command or comment is what the command prints, standard error included. A last line
"[exit 1]" states an exit code other than 0. Each recording runs in an empty folder of its own that
holds a link `inputs` to the shipped inputs; the folder of the program stands first in PATH.

Of a Markdown file, the blocks that start with "```console" are the recording, one after another.

--rewrite puts what was printed in place of what was expected. Review the difference before you
commit it: it is the specification.
"""

import argparse
import difflib
import os
import pathlib
import re
import subprocess
import sys
import tempfile


class Step:
    def __init__(self):
        self.comment, self.command, self.output = [], [], []


def parse(text):
    steps = [Step()]
    for line in text.splitlines():
        step = steps[-1]
        if line.startswith("%%") or line.startswith("$ "):
            if step.command:
                step = Step()
                steps.append(step)
            if line.startswith("$ "):
                step.command.append(line[2:])
            else:
                step.comment.append(line)
        elif step.command and not step.output and (line == ">" or line.startswith("> ")):
            step.command.append(line[2:])
        elif step.command:
            step.output.append(line)
        else:
            sys.exit(f"no command before the line: {line}")
    return steps


def run(command, folder, environment):
    done = subprocess.run(["bash", "-c", command], cwd=folder, env=environment, text=True,
                          encoding="utf-8", errors="replace", timeout=120,
                          stdin=subprocess.DEVNULL, stdout=subprocess.PIPE,
                          stderr=subprocess.STDOUT)
    lines = done.stdout.replace("\r", "\\r").splitlines()
    return lines + ([f"[exit {done.returncode}]"] if done.returncode else [])


def render(steps):
    lines = []
    for step in steps:
        lines += step.comment
        if step.command:
            lines.append("$ " + step.command[0])
            lines += [("> " + line).rstrip() for line in step.command[1:]]
        lines += step.output
    return "\n".join(lines) + "\n"


def recordings_in(path):
    """Splits a file into text to keep and recordings, in turn, starting with text."""
    text = path.read_text(encoding="utf-8")
    if path.suffix != ".md":
        return ["", text]
    return re.split(r"(?<=^```console\n)(.*?)(?=^```$)", text, flags=re.MULTILINE | re.DOTALL)


def replay(path, options):
    """Runs what one file holds; returns whether it came out as written."""
    environment = {"PATH": f"{options.program.resolve()}:{os.environ['PATH']}",
                   "LC_ALL": "C.UTF-8", "HOME": "/nonexistent"}
    for name in ("ASAN_OPTIONS", "UBSAN_OPTIONS"):
        if name in os.environ:
            environment[name] = os.environ[name]
    parts = recordings_in(path)
    expected = "".join(parts)
    with tempfile.TemporaryDirectory() as folder:
        os.symlink(options.inputs.resolve(), os.path.join(folder, "inputs"))
        for index in range(1, len(parts), 2):
            steps = parse(parts[index])
            for step in steps:
                if step.command:
                    step.output = run("\n".join(step.command), folder, environment)
            parts[index] = render(steps)
    found = "".join(parts)
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
    parser.add_argument("recordings", type=pathlib.Path, nargs="+")
    options = parser.parse_args()
    if not (options.program / "irrepwise").is_file():
        parser.error(f"no program in {options.program}")
    failed = [path.name for path in options.recordings if not replay(path, options)]
    print(f"{len(options.recordings) - len(failed)} passed, {len(failed)} failed")
    return 1 if failed else 0


if __name__ == "__main__":
    sys.exit(main())
