// Tables that sort by a click on a column's head, and copy as they stand.
"use strict";

function exactValue(cell) {
  return cell ? cell.dataset.value ?? cell.textContent.trim() : "";
}

// Numbers by size, words by the alphabet, what is empty last.
function compareValues(a, b) {
  if (a === "" || b === "") return (a === "") - (b === "");
  const x = Number(a), y = Number(b);
  return Number.isFinite(x) && Number.isFinite(y) ? x - y : a.localeCompare(b, "en", {numeric: true});
}

// A first column that names things only where they begin: every row is told its own, for sorting and
// copying.
function fillDown(table) {
  if (exactValue(table.tHead?.rows[0]?.cells[0]) === "") return;
  for (const body of table.tBodies) {
    let last = "";
    for (const row of body.rows) {
      const cell = row.cells[0];
      if (row.classList.contains("separator")) continue;
      if (exactValue(cell) === "") cell.dataset.value = last;
      else last = exactValue(cell);
    }
  }
}

// Rows between two headings of a table are sorted among themselves.
function sortTable(table, column, descending) {
  for (const body of table.tBodies) {
    let block = [];
    const settle = before => {
      block.sort((a, b) => {
        const x = exactValue(a.cells[column]), y = exactValue(b.cells[column]);
        const order = compareValues(x, y);
        return descending && x !== "" && y !== "" ? -order : order;
      });
      for (const row of block) {
        if (row.cells[0].textContent === "") row.cells[0].textContent = exactValue(row.cells[0]);
        body.insertBefore(row, before);
      }
      block = [];
    };
    for (const row of [...body.rows]) {
      if (row.classList.contains("separator")) settle(row);
      else block.push(row);
    }
    settle(null);
  }
}

// Tab-separated, numbers in full: what spreadsheets take.
function tableText(table) {
  return [...table.rows]
    .map(row => [...row.cells].map(cell => row.parentElement.tagName === "THEAD"
      ? (cell.dataset.title ?? cell.textContent).trim() : exactValue(cell)).join("\t"))
    .join("\n");
}

async function copied(text) {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {  // not every browser grants this to a file; the old way asks nobody
    const area = document.createElement("textarea");
    area.value = text;
    area.style.position = "fixed";
    area.style.opacity = "0";
    document.body.append(area);
    area.select();
    const done = document.execCommand("copy");
    area.remove();
    return done;
  }
}

function copyButton(text) {
  const button = document.createElement("button");
  button.type = "button";
  button.className = "copy";
  button.textContent = "Copy";
  button.addEventListener("click", async () => {
    button.textContent = await copied(text()) ? "Copied" : "Not copied";
    setTimeout(() => button.textContent = "Copy", 1500);
  });
  return button;
}

function makeSortable(table) {
  const heads = table.tHead ? [...table.tHead.rows[table.tHead.rows.length - 1].cells] : [];
  if (table.tBodies[0]?.rows.length < 2) return;
  heads.forEach((head, column) => {
    const words = head.textContent.trim();
    if (words === "") return;
    head.dataset.title = words;
    const button = document.createElement("button");
    button.type = "button";
    button.className = "sort";
    button.append(...head.childNodes);
    head.append(button);
    button.addEventListener("click", () => {
      const descending = head.getAttribute("aria-sort") === "ascending";
      for (const other of heads) other.removeAttribute("aria-sort");
      head.setAttribute("aria-sort", descending ? "descending" : "ascending");
      sortTable(table, column, descending);
    });
  });
}

function prepareTables() {
  for (const table of document.querySelectorAll(".table table")) {
    fillDown(table);
    makeSortable(table);
    table.closest(".table").prepend(copyButton(() => tableText(table)));
  }
  for (const text of document.querySelectorAll(".source")) {
    text.prepend(copyButton(() => text.querySelector("pre").textContent));
  }
}
