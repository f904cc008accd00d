#!/usr/bin/env python3
"""Reads the tables that irrepwise writes by other programs, and holds the formats against each other.

    check-tables.py PROGRAM INPUT...

For each input: the numbers in the CSV of `irrepwise table` are those of its JSON to the last bit, and
those of the cells of its HTML; shares add up to 100 %. In the Markdown of every command each table
renders as one, and no row loses a cell (python3-markdown-it). The LaTeX of every command goes through
pdflatex without an error, and no line runs far into the margin. What is not installed is skipped with a
word.
"""
import csv
import html.parser
import io
import json
import os
import re
import shutil
import subprocess
import sys
import tempfile

from checking import Failed, expect

FARTHEST_INTO_MARGIN = 40.0  # pt; the outer margin of a page has twice that and more
VOID = {"meta", "br", "hr", "img", "link", "input", "col"}


def written(program, *arguments):
    done = subprocess.run([program, *arguments], capture_output=True)
    expect(done.returncode == 0, f"{arguments}: exit code {done.returncode}: {done.stderr.decode()}")
    return done.stdout.decode()


class Page(html.parser.HTMLParser):
    """Tables of a page: head keys and, per row, the exact values. Refuses tags that do not match."""

    def __init__(self):
        super().__init__()
        self.open, self.tables, self.fetches = [], [], []

    def handle_starttag(self, tag, attributes):
        attributes = dict(attributes)
        self.fetches += [value for key, value in attributes.items() if key in ("src", "href")]
        if tag not in VOID:
            self.open.append(tag)
        if tag == "table":
            self.tables.append({"keys": [], "rows": []})
        elif tag == "tr" and "tbody" in self.open:
            self.tables[-1]["rows"].append([])
        elif "data-key" in attributes:
            self.tables[-1]["keys"].append(attributes["data-key"])
        elif "data-value" in attributes:
            self.tables[-1]["rows"][-1].append(attributes["data-value"])

    def handle_endtag(self, tag):
        expect(self.open and self.open[-1] == tag, f"HTML: </{tag}> closes <{self.open[-1:]}>")
        self.open.pop()


def page_of(text):
    page = Page()
    page.feed(text)
    page.close()
    expect(not page.open, f"HTML: {page.open} is not closed")
    expect(not page.fetches, f"HTML: the page wants {page.fetches}")
    for table in page.tables:
        for row in table["rows"]:
            expect(len(row) in (0, len(table["keys"])), "HTML: a row lacks cells")
    return page


def check_numbers(program, path, options):
    arguments = ["table", path, "frontier+2", *options]
    rows = list(csv.DictReader(io.StringIO(written(program, *arguments, "--format", "csv"), newline="")))
    document = json.loads(written(program, *arguments, "--format", "json"))
    names = [orbital["name"] for orbital in document["orbitals"]]
    quantity = "share_percent" if document["of"] == "shares" else "coefficient"
    body = [row for row in rows if row["quantity"] == quantity]
    expect(len(body) == len(document["rows"]) > 0, f"{arguments}: {len(body)} rows in CSV")
    for row, same in zip(body, document["rows"]):
        for name in names:
            found = float(row[name]) if row[name] else None
            expect(found == same["values"][name], f"{arguments}: {name}: {found} in CSV, "
                                                  f"{same['values'][name]} in JSON")
    for orbital in document["orbitals"]:
        energy = next(row for row in rows if row["quantity"] == "energy_ev")[orbital["name"]]
        expect(float(energy) == orbital["energy_ev"], f"{arguments}: energy of {orbital['name']}")
        if quantity == "share_percent":
            total = sum(row["values"][orbital["name"]] or 0.0 for row in document["rows"])
            expect(abs(total - 100.0) < 1e-8, f"{arguments}: shares of {orbital['name']}: {total}")

    # The page has the same numbers, blank where they are small, in parts that follow each other.
    page = page_of(written(program, *arguments, "--threshold", "0", "--format", "html"))
    seen = set()
    for table in page.tables:
        for row in table["rows"]:
            for key, value in zip(table["keys"], row):
                if key in names and value and re.fullmatch(r"[-+.0-9e]+", value):
                    seen.add((key, float(value)))
    for row in document["rows"]:
        for name, value in row["values"].items():
            if value is not None and abs(value) > 1e-9:
                expect((name, value) in seen, f"{arguments}: {name} {value} is not in the HTML")


def check_markdown(text, what):
    from markdown_it import MarkdownIt

    tokens = MarkdownIt("commonmark").enable("table").parse(text)
    heads = len(re.findall(r"^\|[-:|]+\|$", text, flags=re.MULTILINE))
    expect(sum(token.type == "table_open" for token in tokens) == heads > 0,
           f"{what}: not every table renders")
    for token in tokens:
        if token.type == "inline" and token.map and "|" in token.content.replace("\\|", ""):
            raise Failed(f"{what}: a table renders as text: {token.content[:60]}")
    columns = cells = 0
    for token in tokens:
        if token.type == "thead_open":
            columns = 0
        elif token.type == "th_open":
            columns += 1
        elif token.type == "tr_open":
            cells = 0
        elif token.type == "td_open":
            cells += 1
        elif token.type == "tr_close" and cells:
            expect(cells == columns, f"{what}: a row has {cells} cells of {columns}")
    for line in text.splitlines():
        if line.startswith("|"):
            bars = len(re.findall(r"(?<!\\)\|", line))
            expect(bars >= 2, f"{what}: {line}")


def check_latex(parts, folder):
    with open(os.path.join(folder, "all.tex"), "w", encoding="utf-8") as document:
        document.write("\\documentclass[a4paper]{article}\n\\usepackage[margin=2.5cm]{geometry}\n"
                       "\\usepackage{array,booktabs,longtable}\n\\begin{document}\n")
        for number, (what, text) in enumerate(parts):
            with open(os.path.join(folder, f"part{number}.tex"), "w", encoding="utf-8") as part:
                part.write(text)
            document.write(f"\\typeout{{PART {number}}}\\input{{part{number}}}\\clearpage\n")
        document.write("\\end{document}\n")
    done = subprocess.run(["pdflatex", "-interaction=nonstopmode", "-halt-on-error", "all.tex"],
                          cwd=folder, capture_output=True)
    log = done.stdout.decode(errors="replace")
    number = 0
    for line in log.splitlines():
        if line.startswith("PART "):
            number = int(line[5:])
        wide = re.match(r"Overfull \\hbox \(([0-9.]+)pt", line)
        if wide and float(wide[1]) > FARTHEST_INTO_MARGIN:
            raise Failed(f"LaTeX of {parts[number][0]}: {line}")
        expect(not line.startswith("!"), f"LaTeX of {parts[number][0]}: {line}")
    expect(done.returncode == 0 and os.path.exists(os.path.join(folder, "all.pdf")),
           f"pdflatex: exit code {done.returncode}")


def commands(path):
    """Every command that writes for people, as it would be used on this input."""
    if path.endswith((".yaml", ".yml")):
        yield ["compare", path]
        return
    yield ["levels", path, "--all"]
    yield ["symmetry", path, "--all"]
    yield ["table", path, "frontier+4"]
    yield ["table", path, "frontier+4", "--over", "salcs", "--of", "shares"]
    yield ["table", path, "--of", "populations"]


# Names that LaTeX would take for arguments of the end of the row before, and Markdown for marks.
ODD_NAMES = """build: {metal: Pt, polyhedron: SP-4, oxidation: 2, ligands: [Cl, Cl, Cl, Cl]}
variants:
  - {name: "plain"}
  - {name: "[PdCl4]2-", replace: {metal: Pd}}
  - {name: "*", replace: {metal: Ni}}
"""


def main():
    program, paths = sys.argv[1], sys.argv[2:]
    with tempfile.TemporaryDirectory() as folder:
        odd = os.path.join(folder, "odd_names.yaml")
        with open(odd, "w", encoding="utf-8") as file:
            file.write(ODD_NAMES)
        return check(program, [*paths, odd])


def check(program, paths):
    skipped = []
    asked = [["parameters"], ["build", "--list", "ligands"], ["build", "--list", "polyhedra"],
             ["symmetry", "--group", "D9h"], ["symmetry", "--group", "C5h"]]
    for path in paths:
        asked += commands(path)
    try:
        for path in paths:
            if path.endswith(".yaml"):
                continue
            for options in ([], ["--of", "shares"], ["--over", "salcs"]):
                check_numbers(program, path, options)
            print(f"{os.path.basename(path)}: CSV, JSON and HTML hold the same numbers")
        for arguments in asked:
            page_of(written(program, *arguments, "--format", "html"))
        print(f"HTML of {len(asked)} runs: tags match, nothing to fetch")
        try:
            import markdown_it  # noqa: F401
            for arguments in asked:
                check_markdown(written(program, *arguments, "--format", "markdown"), arguments)
            print(f"Markdown of {len(asked)} runs: every table renders")
        except ImportError:
            skipped.append("rendering Markdown (python3-markdown-it is not installed)")
        if shutil.which("pdflatex"):
            with tempfile.TemporaryDirectory() as folder:
                check_latex([(" ".join(arguments), written(program, *arguments, "--format", "latex"))
                             for arguments in asked], folder)
            print(f"LaTeX of {len(asked)} runs: pdflatex makes pages of it")
        else:
            skipped.append("compiling LaTeX (texlive-latex-recommended is not installed)")
    except Failed as failure:
        print(f"check-tables: {failure}", file=sys.stderr)
        return 1
    for what in skipped:
        print(f"SKIPPED: {what}")
    return 0


if __name__ == "__main__":
    sys.exit(main())
