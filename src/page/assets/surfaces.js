// Surfaces of orbitals: from the numbers that the page carries to a mesh that looks round.
"use strict";

const ENOUGH_TRIANGLES = 20000;  // of one phase

// Little-endian numbers of one kind, as the page carries them.
function unpacked(base64, ArrayType) {
  const text = atob(base64);
  const bytes = new Uint8Array(text.length);
  for (let i = 0; i < text.length; ++i) bytes[i] = text.charCodeAt(i);
  return new ArrayType(bytes.buffer);
}

function unpackedSurface(packed, colour) {
  if (!packed) return null;
  const places = unpacked(packed.places, Int16Array);
  const directions = unpacked(packed.normals, Int8Array);
  const vertices = new Float32Array(places.length);
  const normals = new Float32Array(directions.length);
  for (let i = 0; i < places.length; ++i) {
    vertices[i] = packed.middle[i % 3] + packed.scale * places[i];
    normals[i] = directions[i] / 127;
  }
  const triangles = unpacked(packed.triangles, packed.wide ? Uint32Array : Uint16Array);
  return {vertices, normals, triangles, colour};
}

// The mesh with every triangle parted into four. The middle of an edge moves onto the cubic through
// its ends that is upright to their normals (curved point-normal triangles: Vlachos, Peters, Boyd and
// Mitchell, Proc. Symp. Interactive 3D Graphics 2001, 159, from memory), so outlines become round; as
// it depends on the ends alone, neighbours still meet.
function parted({vertices, normals, triangles, colour}) {
  const places = [...vertices], directions = [...normals], parts = [];
  const middles = new Map();
  const middle = (a, b) => {
    const key = Math.min(a, b) * (vertices.length / 3) + Math.max(a, b);
    if (middles.has(key)) return middles.get(key);
    const at = i => [0, 1, 2].map(k => vertices[3 * i + k]);
    const normal = i => [0, 1, 2].map(k => normals[3 * i + k]);
    const [p, q, m, n] = [at(a), at(b), normal(a), normal(b)];
    const along = [0, 1, 2].map(k => q[k] - p[k]);
    const rise = [0, 1, 2].reduce((sum, k) => sum + along[k] * m[k], 0);
    const fall = [0, 1, 2].reduce((sum, k) => sum - along[k] * n[k], 0);
    places.push(...[0, 1, 2].map(k => (p[k] + q[k]) / 2 - (rise * m[k] + fall * n[k]) / 8));
    const sum = [0, 1, 2].map(k => m[k] + n[k]);
    directions.push(...(Math.hypot(...sum) > 1e-6 ? normalised(sum) : m));
    middles.set(key, places.length / 3 - 1);
    return places.length / 3 - 1;
  };
  for (let i = 0; i < triangles.length; i += 3) {
    const [a, b, c] = triangles.slice(i, i + 3);
    const [ab, bc, ca] = [middle(a, b), middle(b, c), middle(c, a)];
    parts.push(a, ab, ca, ab, b, bc, ca, bc, c, ab, bc, ca);
  }
  return {vertices: new Float32Array(places), normals: new Float32Array(directions),
          triangles: new Uint32Array(parts), colour};
}

function roundedSurface(packed, colour) {
  let surface = unpackedSurface(packed, colour);
  while (surface?.triangles.length && 4 * surface.triangles.length / 3 <= ENOUGH_TRIANGLES) surface = parted(surface);
  return surface;
}
