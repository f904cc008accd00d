// The turnable view: balls, sticks and the two phases of an orbital, drawn pixel by pixel with a
// depth buffer, so that it needs no graphics hardware and prints as it is seen.
"use strict";

const LIGHT = [-0.41, 0.52, 0.75];  // in the frame of the eye: x right, y up, z towards it
const SURFACE_OPACITY = 0.8;

// A stick as a mesh, its ends inside the balls.
function stickBetween(a, b, radius, colour) {
  const sectors = 12;
  const axis = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
  const length = Math.hypot(...axis);
  const w = axis.map(x => x / length);
  const aside = Math.abs(w[0]) < 0.7 ? [1, 0, 0] : [0, 1, 0];
  const u = normalised(cross(w, aside));
  const v = cross(w, u);
  const vertices = [], normals = [], triangles = [];
  for (let j = 0; j < sectors; ++j) {
    const phi = 2 * Math.PI * j / sectors;
    const n = u.map((x, i) => Math.cos(phi) * x + Math.sin(phi) * v[i]);
    for (const end of [a, b]) {
      vertices.push(...end.map((x, i) => x + radius * n[i]));
      normals.push(...n);
    }
    const p = 2 * j, q = 2 * ((j + 1) % sectors);
    triangles.push(p, q, p + 1, q, q + 1, p + 1);
  }
  return {vertices: new Float32Array(vertices), normals: new Float32Array(normals),
          triangles: new Uint16Array(triangles), colour};
}

function cross(a, b) {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}

function normalised(a) {
  const length = Math.hypot(...a);
  return a.map(x => x / length);
}

// Rows: right, up, towards the eye.
function frameFrom(towards) {
  const w = normalised(towards);
  const upright = Math.abs(w[2]) > 0.999 ? [0, 1, 0] : [0, 0, 1];
  const right = normalised(cross(upright, w));
  return [right, cross(w, right), w];
}

function turnedBy(frame, aboutUp, aboutRight) {
  const turn = (a, b, angle) => [
    a.map((x, i) => Math.cos(angle) * x + Math.sin(angle) * b[i]),
    b.map((x, i) => Math.cos(angle) * x - Math.sin(angle) * a[i]),
  ];
  let [right, up, towards] = frame;
  [right, towards] = turn(right, towards, aboutUp);
  [up, towards] = turn(up, towards, aboutRight);
  const w = normalised(towards);
  const r = normalised(cross(up, w));
  return [r, cross(w, r), w];
}

// Pixels with depth. Colours are written in full; what is nearer wins.
class Canvas3D {
  constructor(size) {
    this.size = size;
    this.depth = new Float32Array(size * size);
    this.colour = new Uint8ClampedArray(4 * size * size);
  }

  clear() {
    this.depth.fill(-Infinity);
    this.colour.fill(0);
  }

  // Diffuse light, a soft highlight, darker towards the edge so that shapes part in grey print.
  put(at, z, nx, ny, nz, colour) {
    this.depth[at] = z;
    const facing = Math.max(0, nz);
    const diffuse = Math.max(0, nx * LIGHT[0] + ny * LIGHT[1] + nz * LIGHT[2]);
    const half = Math.max(0, (nx * LIGHT[0] + ny * LIGHT[1] + nz * (LIGHT[2] + 1)) / 1.87);
    const highlight = 70 * Math.pow(half, 28);
    const shade = (0.42 + 0.58 * diffuse) * (0.62 + 0.38 * Math.min(1, 2.2 * facing));
    this.colour[4 * at] = colour[0] * shade + highlight;
    this.colour[4 * at + 1] = colour[1] * shade + highlight;
    this.colour[4 * at + 2] = colour[2] * shade + highlight;
    this.colour[4 * at + 3] = 255;
  }

  ball(x, y, z, radius, scale, colour) {
    const r = radius * scale;
    const top = Math.max(0, Math.ceil(y - r)), bottom = Math.min(this.size - 1, Math.floor(y + r));
    for (let j = top; j <= bottom; ++j) {
      const dy = (j - y) / r;
      const width = r * Math.sqrt(Math.max(0, 1 - dy * dy));
      const first = Math.max(0, Math.ceil(x - width));
      const last = Math.min(this.size - 1, Math.floor(x + width));
      for (let i = first; i <= last; ++i) {
        const dx = (i - x) / r;
        const nz = Math.sqrt(Math.max(0, 1 - dx * dx - dy * dy));
        const at = j * this.size + i;
        const here = z + radius * nz;
        if (here > this.depth[at]) this.put(at, here, dx, -dy, nz, colour);
      }
    }
  }

  // `place` turns a point into pixels and depth, `frame` turns normals.
  mesh(mesh, place, frame) {
    const {vertices, normals, triangles, colour} = mesh;
    const count = vertices.length / 3;
    const p = new Float32Array(3 * count), n = new Float32Array(3 * count);
    for (let i = 0; i < count; ++i) {
      const [x, y, z] = place(vertices[3 * i], vertices[3 * i + 1], vertices[3 * i + 2]);
      p[3 * i] = x;
      p[3 * i + 1] = y;
      p[3 * i + 2] = z;
      for (let k = 0; k < 3; ++k) {
        n[3 * i + k] = frame[k][0] * normals[3 * i] + frame[k][1] * normals[3 * i + 1] +
                       frame[k][2] * normals[3 * i + 2];
      }
    }
    for (let t = 0; t < triangles.length; t += 3) {
      this.triangle(p, n, 3 * triangles[t], 3 * triangles[t + 1], 3 * triangles[t + 2], colour);
    }
  }

  triangle(p, n, a, b, c, colour) {
    const ax = p[a], ay = p[a + 1], bx = p[b], by = p[b + 1], cx = p[c], cy = p[c + 1];
    const area = (bx - ax) * (cy - ay) - (cx - ax) * (by - ay);
    if (area === 0) return;
    const last = this.size - 1;
    const left = Math.max(0, Math.ceil(Math.min(ax, bx, cx)));
    const right = Math.min(last, Math.floor(Math.max(ax, bx, cx)));
    const top = Math.max(0, Math.ceil(Math.min(ay, by, cy)));
    const bottom = Math.min(last, Math.floor(Math.max(ay, by, cy)));
    for (let y = top; y <= bottom; ++y) {
      for (let x = left; x <= right; ++x) {
        const u = ((cx - bx) * (y - by) - (cy - by) * (x - bx)) / area;
        const v = ((ax - cx) * (y - cy) - (ay - cy) * (x - cx)) / area;
        const w = 1 - u - v;
        if (u < 0 || v < 0 || w < 0) continue;
        const z = u * p[a + 2] + v * p[b + 2] + w * p[c + 2];
        const at = y * this.size + x;
        if (z <= this.depth[at]) continue;
        let nx = u * n[a] + v * n[b] + w * n[c];
        let ny = u * n[a + 1] + v * n[b + 1] + w * n[c + 1];
        let nz = u * n[a + 2] + v * n[b + 2] + w * n[c + 2];
        const length = Math.hypot(nx, ny, nz) || 1;
        nx /= length;
        ny /= length;
        nz /= length;
        if (nz < 0) {  // seen from within, where a lobe is cut off by the end of the view
          nx = -nx;
          ny = -ny;
          nz = -nz;
        }
        this.put(at, z, nx, ny, nz, colour);
      }
    }
  }
}

// What is behind the surface shows through it.
function laidOver(solid, surface) {
  const {colour} = solid;
  for (let at = 0; at < surface.depth.length; ++at) {
    if (surface.depth[at] <= solid.depth[at] || surface.depth[at] === -Infinity) continue;
    const behind = colour[4 * at + 3] / 255;
    const opacity = SURFACE_OPACITY + (1 - SURFACE_OPACITY) * behind;
    for (let k = 0; k < 3; ++k) {
      colour[4 * at + k] = (SURFACE_OPACITY * surface.colour[4 * at + k] +
                            (1 - SURFACE_OPACITY) * behind * colour[4 * at + k]) / opacity;
    }
    colour[4 * at + 3] = 255 * Math.max(opacity, 0.9);
  }
}

// A view in a <canvas>. `show(molecule, orbital)` changes what is seen, not from where.
class View {
  // look: colours of the phases and sticks, and how thick those are, angstrom
  constructor(canvas, look) {
    this.canvas = canvas;
    this.look = look;
    this.molecule = null;
    this.surfaces = [];
    this.frame = frameFrom([0.45, -0.8, 0.4]);
    this.zoom = 1;
    this.names = false;
    this.pending = false;
    this.idle = 0;
    this.listen();
  }

  show(molecule, orbital) {
    if (molecule !== this.molecule) {
      this.molecule = molecule;
      this.sticks = molecule.bonds.map(
          ([a, b]) => stickBetween(molecule.atoms[a].place, molecule.atoms[b].place,
                                    this.look.stick_radius, this.look.stick));
      this.centre = [0, 1, 2].map(k => {
        const along = molecule.atoms.map(atom => atom.place[k]);
        return (Math.min(...along) + Math.max(...along)) / 2;
      });
      this.reach = 1.0 + Math.max(0.6, ...molecule.atoms.map(
          atom => Math.hypot(...atom.place.map((x, k) => x - this.centre[k]))));
    }
    this.surfaces = !orbital ? [] : [
      roundedSurface(orbital.positive, this.look.positive),
      roundedSurface(orbital.negative, this.look.negative),
    ].filter(surface => surface);
    this.draw();
  }

  lookFrom(towards) {
    this.frame = frameFrom(towards);
    this.draw();
  }

  turn(aboutUp, aboutRight) {
    this.frame = turnedBy(this.frame, aboutUp, aboutRight);
    this.draw();
  }

  magnify(factor) {
    this.zoom = Math.min(6, Math.max(0.4, this.zoom * factor));
    this.draw();
  }

  // At once and coarse while it moves, finer when it rests.
  draw() {
    if (this.pending) return;
    this.pending = true;
    requestAnimationFrame(() => {
      this.pending = false;
      this.paint(1);
      clearTimeout(this.idle);
      this.idle = setTimeout(() => this.paint(2), 120);
    });
  }

  paint(fineness) {
    const width = this.canvas.clientWidth || 360;
    const size = Math.min(1400, Math.round(width * fineness * Math.min(2, window.devicePixelRatio || 1)));
    if (!this.molecule) return;
    const {frame, centre} = this;
    const scale = this.zoom * size / (2 * this.reach);
    const place = (x, y, z) => {
      const d = [x - centre[0], y - centre[1], z - centre[2]];
      const along = axis => axis[0] * d[0] + axis[1] * d[1] + axis[2] * d[2];
      return [size / 2 + scale * along(frame[0]), size / 2 - scale * along(frame[1]), along(frame[2])];
    };
    const solid = new Canvas3D(size);
    solid.clear();
    for (const atom of this.molecule.atoms) {
      solid.ball(...place(...atom.place), atom.radius, scale, atom.colour);
    }
    for (const stick of this.sticks) solid.mesh(stick, place, frame);
    if (this.surfaces.length > 0) {
      const surface = new Canvas3D(size);
      surface.clear();
      for (const mesh of this.surfaces) surface.mesh(mesh, place, frame);
      laidOver(solid, surface);
    }
    this.canvas.width = size;
    this.canvas.height = size;
    const context = this.canvas.getContext("2d");
    context.putImageData(new ImageData(solid.colour, size, size), 0, 0);
    this.letter(context, place, size, size / width);
  }

  // Names of atoms where wanted, and the axes in a corner.
  letter(context, place, size, unit) {
    const style = getComputedStyle(this.canvas);
    context.fillStyle = style.color;
    context.strokeStyle = style.color;
    context.textAlign = "center";
    context.textBaseline = "middle";
    context.font = `${12 * unit}px ${style.fontFamily}`;
    if (this.names) {
      const paper = style.getPropertyValue("--paper").trim() || "#fff";
      context.lineWidth = 3 * unit;
      context.lineJoin = "round";
      context.strokeStyle = paper;
      for (const atom of this.molecule.atoms) {
        const [x, y] = place(...atom.place);
        context.strokeText(atom.name, x, y);
        context.fillText(atom.name, x, y);
      }
      context.strokeStyle = style.color;
    }
    const corner = [34 * unit, size - 34 * unit];
    const length = 20 * unit;
    context.lineWidth = 1.2 * unit;
    ["x", "y", "z"].forEach((name, k) => {
      const dx = this.frame[0][k], dy = -this.frame[1][k];
      context.beginPath();
      context.moveTo(...corner);
      context.lineTo(corner[0] + length * dx, corner[1] + length * dy);
      context.stroke();
      if (Math.hypot(dx, dy) > 0.15) {
        context.fillText(name, corner[0] + (length + 8 * unit) * dx, corner[1] + (length + 8 * unit) * dy);
      }
    });
  }

  listen() {
    const {canvas} = this;
    const fingers = new Map();
    let spread = 0;
    canvas.addEventListener("pointerdown", event => {
      canvas.setPointerCapture(event.pointerId);
      fingers.set(event.pointerId, [event.clientX, event.clientY]);
      spread = 0;
    });
    canvas.addEventListener("pointermove", event => {
      const before = fingers.get(event.pointerId);
      if (!before) return;
      const now = [event.clientX, event.clientY];
      fingers.set(event.pointerId, now);
      if (fingers.size === 2) {
        const [a, b] = [...fingers.values()];
        const apart = Math.hypot(a[0] - b[0], a[1] - b[1]);
        if (spread > 0 && apart > 0) this.magnify(apart / spread);
        spread = apart;
        return;
      }
      this.turn(-(now[0] - before[0]) / 120, (now[1] - before[1]) / 120);
    });
    for (const end of ["pointerup", "pointercancel"]) {
      canvas.addEventListener(end, event => {
        fingers.delete(event.pointerId);
        spread = 0;
      });
    }
    const keys = {
      ArrowLeft: () => this.turn(0.12, 0), ArrowRight: () => this.turn(-0.12, 0),
      ArrowUp: () => this.turn(0, -0.12), ArrowDown: () => this.turn(0, 0.12),
      "+": () => this.magnify(1.15), "=": () => this.magnify(1.15), "-": () => this.magnify(1 / 1.15),
      x: () => this.lookFrom([1, 0, 0]), y: () => this.lookFrom([0, 1, 0]),
      z: () => this.lookFrom([0, 0, 1]),
    };
    canvas.addEventListener("keydown", event => {
      if (event.ctrlKey || event.metaKey || event.altKey || !keys[event.key]) return;
      event.preventDefault();
      keys[event.key]();
    });
    new ResizeObserver(() => this.draw()).observe(canvas);
  }
}
