// A click on a level, or the arrow keys, shows what it is made of and its picture.
"use strict";

const page = JSON.parse(document.getElementById("page-data").textContent);
const levelHeading = document.getElementById("level-heading");
const chosen = {molecule: 0, level: null, partner: 0};
let view = null;

function readMolecule(raw) {
  return {
    ...raw,
    atoms: raw.atoms.map(([name, x, y, z, radius, colour]) =>
      ({name, place: [x, y, z], radius, colour})),
  };
}
const molecules = page.molecules.map(readMolecule);

function levelElements() {
  return [...document.querySelectorAll(".diagram g.level")];
}

// Columns of a diagram are named after the molecules.
function moleculeOf(element) {
  return Math.max(0, molecules.findIndex(molecule => molecule.name === element.dataset.column));
}

function element(tag, attributes, ...children) {
  const made = document.createElement(tag);
  for (const [name, value] of Object.entries(attributes)) made.setAttribute(name, value);
  made.append(...children);
  return made;
}

function labelled(html) {
  const span = document.createElement("span");
  span.className = "label";
  span.innerHTML = html;
  return span;
}

function fixed(value, digits) {
  const text = Math.abs(value).toFixed(digits);
  return (value < 0 && Number(text) !== 0 ? "\u2212" : "") + text;
}

// Orbitals with a coefficient or a share worth showing, in the order of the basis.
function coefficientTable(molecule, level) {
  const several = level.coefficients.length > 1;
  const titles = ["atom", "orbital",
    ...level.coefficients.map((_, i) => several ? `partner ${i + 1}` : "coefficient"), "share / %"];
  const head = element("tr", {}, ...titles.map((title, i) =>
    element("th", {scope: "col", class: i < 2 ? "" : "number"}, title)));
  const body = document.createElement("tbody");
  molecule.orbitals.forEach(([atom, orbital], i) => {
    const values = level.coefficients.map(partner => partner[i]);
    if (values.every(value => Math.abs(value) < 0.05) && Math.abs(level.shares[i]) < 0.01) return;
    body.append(element("tr", {},
      element("td", {}, atom), element("td", {}, labelled(orbital)),
      ...values.map(value => element("td", {class: "number", "data-value": value}, fixed(value, 3))),
      element("td", {class: "number", "data-value": 100 * level.shares[i]},
              fixed(100 * level.shares[i], 1))));
  });
  return element("table", {}, element("thead", {}, head), body);
}

function partnerButtons(level) {
  const box = element("div", {class: "buttons", role: "group", "aria-label": "Partner shown"});
  if (level.degeneracy < 2 || level.orbitals.length < 2) return box;
  level.orbitals.forEach((_, i) => {
    const button = element("button", {type: "button", class: "choice",
                                      "aria-pressed": i === chosen.partner}, `partner ${i + 1}`);
    button.addEventListener("click", () => {
      chosen.partner = i;
      fillPanel();
      document.querySelectorAll("#level-facts .buttons button")[i]?.focus();
    });
    box.append(button);
  });
  return box;
}

function fillPanel() {
  const molecule = molecules[chosen.molecule];
  const level = molecule.levels[chosen.level];
  const facts = document.getElementById("level-facts");
  if (!level) {
    levelHeading.replaceChildren(molecule.name || "Molecule");
    facts.replaceChildren(element("p", {}, "Choose a level of the diagram."));
    view.show(molecule, null);
    return;
  }
  levelHeading.replaceChildren(labelled(level.label));
  if (molecules.length > 1) levelHeading.append(` of ${molecule.name}`);
  const electrons = `${level.occupation} electron${level.occupation === 1 ? "" : "s"}`;
  const words = [`${fixed(level.energy_ev, 3)} eV`, electrons];
  if (level.degeneracy > 1) words.push(`${level.degeneracy} partners`);
  if (level.mark) words.unshift(level.mark);
  const box = element("div", {class: "table"},
    element("div", {class: "scroll"}, coefficientTable(molecule, level)));
  box.prepend(copyButton(() => tableText(box.querySelector("table"))));
  const orbital = level.orbitals[chosen.partner] ?? null;
  const picture = labelled(orbital
    ? `Surface at ${orbital.isovalue.toPrecision(3)} bohr<sup>\u22123/2</sup>, which encloses half `
      + "of the density; blue is the positive phase, amber the negative."
    : page.no_surface);
  facts.replaceChildren(
    element("p", {class: "lead"}, words.join(" \u00B7 ")), partnerButtons(level),
    element("p", {}, labelled(level.made_of)),
    element("p", {class: "small"}, picture), box,
    element("p", {class: "small"}, page.coefficient_note));
  view.show(molecule, orbital);
  view.canvas.setAttribute("aria-label", `Level ${chosen.level} of ${molecule.name}, `
    + `partner ${chosen.partner + 1}. Turn with the arrow keys, magnify with plus and minus; `
    + "x, y and z look along an axis.");
}

function choose(element) {
  for (const other of levelElements()) {
    const is = other === element;
    other.setAttribute("aria-pressed", is);
    other.setAttribute("tabindex", is ? 0 : -1);
  }
  chosen.molecule = moleculeOf(element);
  chosen.level = element.dataset.name;
  chosen.partner = 0;
  fillPanel();
}

// Up and down go through a column by energy, left and right to the nearest level of the next.
function neighbour(from, key) {
  const left = g => Number(g.querySelector(".hit").getAttribute("x"));
  const column = moleculeOf(from);
  const y = energyOf(from);
  const wanted = key === "ArrowLeft" ? column - 1 : key === "ArrowRight" ? column + 1 : column;
  const others = levelElements().filter(g => g !== from && moleculeOf(g) === wanted);
  if (wanted !== column) {
    return others.sort((a, b) => Math.abs(energyOf(a) - y) - Math.abs(energyOf(b) - y))[0];
  }
  const up = key === "ArrowUp";
  const order = levelElements().filter(g => moleculeOf(g) === column)
    .sort((a, b) => energyOf(a) - energyOf(b) || left(a) - left(b));
  return order[order.indexOf(from) + (up ? 1 : -1)];
}

function energyOf(g) {
  return molecules[moleculeOf(g)].levels[g.dataset.name]?.energy_ev ?? 0;
}

function prepareLevels() {
  // What stands inside an image is hidden from readers of screens; here it can be chosen.
  document.querySelector(".diagram svg").setAttribute("role", "group");
  for (const g of levelElements()) {
    // Around each bar and word, not around all of them: a label may stand far from its level.
    for (const part of [...g.children].reverse()) {
      const thick = Number(part.getAttribute("stroke-width") ?? 0) >= 2;
      if (part.tagName !== "text" && !thick) continue;
      const box = part.getBBox();
      const hit = document.createElementNS("http://www.w3.org/2000/svg", "rect");
      hit.setAttribute("class", "hit");
      hit.setAttribute("x", box.x - 5);
      hit.setAttribute("y", box.y + box.height / 2 - Math.max(7, box.height / 2 + 2));
      hit.setAttribute("width", box.width + 10);
      hit.setAttribute("height", Math.max(14, box.height + 4));
      g.prepend(hit);
    }
    g.setAttribute("role", "button");
    g.setAttribute("tabindex", -1);
    g.setAttribute("aria-label", g.querySelector("title")?.textContent ?? g.dataset.name);
    g.addEventListener("click", () => {
      choose(g);
      g.focus({preventScroll: true});
    });
    g.addEventListener("keydown", event => {
      if (event.key === "Enter" || event.key === " ") {
        event.preventDefault();
        choose(g);
      } else if (event.key.startsWith("Arrow")) {
        event.preventDefault();
        const next = neighbour(g, event.key);
        if (!next) return;
        choose(next);
        next.focus();
      }
    });
  }
}

function prepareView() {
  view = new View(document.getElementById("view"), page.look);
  const tools = document.getElementById("view-tools");
  const add = (words, title, action) => {
    const button = element("button", {type: "button", class: "choice", title}, words);
    button.addEventListener("click", () => action(button));
    tools.append(button);
  };
  add("x", "Look along x", () => view.lookFrom([1, 0, 0]));
  add("y", "Look along y", () => view.lookFrom([0, 1, 0]));
  add("z", "Look along z", () => view.lookFrom([0, 0, 1]));
  add("+", "Magnify", () => view.magnify(1.2));
  add("\u2212", "Reduce", () => view.magnify(1 / 1.2));
  add("names", "Names of atoms", button => {
    view.names = !view.names;
    button.setAttribute("aria-pressed", view.names);
    view.draw();
  });
  if (page.eye) view.frame = frameFrom(page.eye);
}

function prepareTheme() {
  const button = document.getElementById("theme");
  const dark = () => document.documentElement.dataset.theme
    ? document.documentElement.dataset.theme === "dark"
    : matchMedia("(prefers-color-scheme: dark)").matches;
  const settle = () => {
    button.textContent = dark() ? "Light" : "Dark";
    view.draw();
  };
  button.addEventListener("click", () => {
    document.documentElement.dataset.theme = dark() ? "light" : "dark";
    settle();
  });
  matchMedia("(prefers-color-scheme: dark)").addEventListener("change", settle);
  settle();
}

prepareTables();
prepareView();
prepareLevels();
const first = levelElements().find(g =>
  moleculeOf(g) === page.first.molecule && g.dataset.name === page.first.level);
if (first) {
  choose(first);
} else {
  levelElements()[0]?.setAttribute("tabindex", 0);
  fillPanel();
}
prepareTheme();
// Paper does not scroll: a table that is too wide gets smaller as a whole.
const PAPER_WIDTH = 660;  // CSS pixels between the margins of the narrower of A4 and Letter
function fitTables() {
  for (const table of document.querySelectorAll("table")) {
    // Letters do not shrink quite as their size does, so one step may leave a table too wide.
    let zoom = 0.85;
    for (let step = 0; step < 4; ++step) {
      table.style.zoom = zoom;
      const width = table.getBoundingClientRect().width;
      if (width <= PAPER_WIDTH) break;
      zoom *= PAPER_WIDTH / width;
    }
  }
}
function unfitTables() {
  for (const table of document.querySelectorAll("table")) table.style.zoom = "";
}
addEventListener("beforeprint", () => {
  view.paint(2);
  fitTables();
});
addEventListener("afterprint", unfitTables);
document.documentElement.dataset.ready = "true";
