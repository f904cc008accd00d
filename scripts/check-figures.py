#!/usr/bin/env python3
"""Reads what `irrepwise draw` writes by another road, and holds the files against each other.

    check-figures.py PROGRAM INPUT...

For each input: the level diagram and the contour drawing are well-formed SVG with title and
description; the PNG decodes; of the HOMO, the density on the VTK grid integrates to 1 within 1 %,
the isovalue encloses half of it, and the vertices of the glTF mesh lie on that value as interpolated
from the grid. The values themselves are those of the Slater functions, evaluated here from the
coefficients and exponents that `levels` and `parameters` print. Of a job with variants, the diagram
has the levels of every variant once. Two runs give the same bytes. Only Python's standard library is
needed; where python3-vtk9 is installed, VTK itself reads the grid and the mesh too.
"""
import base64
import json
import math
import os
import struct
import subprocess
import sys
import xml.etree.ElementTree as ElementTree
import zlib

from checking import check_each, expect

BOHR = 0.529177210544  # angstrom, CODATA 2022
SVG = "{http://www.w3.org/2000/svg}"


def draw(program, arguments, output):
    done = subprocess.run([program, "draw", *arguments, "--output", output], capture_output=True,
                          text=True)
    expect(done.returncode == 0, f"draw {arguments}: exit code {done.returncode}: {done.stderr}")
    with open(output, "rb") as file:
        return file.read(), done.stdout


def check_svg(data, what):
    root = ElementTree.fromstring(data)
    expect(root.tag == SVG + "svg", f"{what}: no svg element")
    for tag in ("title", "desc"):
        element = root.find(SVG + tag)
        expect(element is not None and element.text and element.text.strip(),
               f"{what}: no <{tag}>")
    return root


def check_png(data):
    expect(data[:8] == b"\x89PNG\r\n\x1a\n", "PNG: wrong signature")
    at, pixels, size = 8, b"", None
    while at < len(data):
        (length,) = struct.unpack(">I", data[at:at + 4])
        kind = data[at + 4:at + 8]
        body = data[at + 8:at + 8 + length]
        (crc,) = struct.unpack(">I", data[at + 8 + length:at + 12 + length])
        expect(crc == zlib.crc32(kind + body), f"PNG: wrong checksum of {kind}")
        if kind == b"IHDR":
            size = struct.unpack(">IIBBBBB", body)
        if kind == b"IDAT":
            pixels += body
        at += 12 + length
    width, height, depth, colour = size[:4]
    expect((depth, colour) == (8, 6), f"PNG: depth {depth}, colour type {colour}")
    expect(len(zlib.decompress(pixels)) == height * (4 * width + 1), "PNG: wrong amount of pixels")


class Grid:
    """The first array of a .vti file."""

    def __init__(self, data):
        root = ElementTree.fromstring(data)
        expect(root.tag == "VTKFile" and root.get("type") == "ImageData", "VTI: no image data")
        expect(root.get("byte_order") == "LittleEndian", "VTI: byte order")
        image = root.find("ImageData")
        extent = [int(word) for word in image.get("WholeExtent").split()]
        self.size = [extent[2 * i + 1] - extent[2 * i] + 1 for i in range(3)]
        self.origin = [float(word) for word in image.get("Origin").split()]
        self.spacing = [float(word) for word in image.get("Spacing").split()]
        arrays = image.findall("Piece/PointData/DataArray")
        self.names = [array.get("Name") for array in arrays]
        self.arrays = [self.numbers(array) for array in arrays]
        self.values = self.arrays[0]
        points = self.size[0] * self.size[1] * self.size[2]
        expect(all(len(values) == points for values in self.arrays), "VTI: wrong number of values")

    @staticmethod
    def numbers(array):
        data = base64.b64decode(array.text.strip())
        (length,) = struct.unpack("<I", data[:4])
        expect(length == len(data) - 4, "VTI: the length of an array is not what its header says")
        return struct.unpack(f"<{length // 4}f", data[4:])

    def integral(self, values):
        cell = self.spacing[0] * self.spacing[1] * self.spacing[2] / BOHR**3
        return sum(value * value for value in values) * cell

    def interpolated(self, place):
        """By cubics through four points along each axis (Lagrange)."""
        low, weights = [], []
        for i in range(3):
            at = (place[i] - self.origin[i]) / self.spacing[i]
            first = max(0, min(int(at) - 1, self.size[i] - 4))
            t = at - first
            low.append(first)
            weights.append((-(t - 1) * (t - 2) * (t - 3) / 6, t * (t - 2) * (t - 3) / 2,
                            -t * (t - 1) * (t - 3) / 2, t * (t - 1) * (t - 2) / 6))
        total = 0.0
        for k in range(4):
            for j in range(4):
                row = ((low[2] + k) * self.size[1] + low[1] + j) * self.size[0] + low[0]
                line = sum(weights[0][i] * self.values[row + i] for i in range(4))
                total += weights[2][k] * weights[1][j] * line
        return total

    def share_inside(self, isovalue):
        """Of the density, where the value is at least so large."""
        inside = sum(value * value for value in self.values if abs(value) >= isovalue)
        return inside / sum(value * value for value in self.values)


def read_glb(data):
    """Extras of the scene, and of each mesh by name its vertices, normals and indices."""
    magic, version, length = struct.unpack("<4sII", data[:12])
    expect((magic, version, length) == (b"glTF", 2, len(data)), "glb: wrong header")
    json_length, kind = struct.unpack("<I4s", data[12:20])
    expect(kind == b"JSON" and json_length % 4 == 0, "glb: no JSON chunk")
    document = json.loads(data[20:20 + json_length])
    at = 20 + json_length
    binary_length, kind = struct.unpack("<I4s", data[at:at + 8])
    binary = data[at + 8:]
    expect(kind == b"BIN\0" and len(binary) == binary_length, "glb: no binary chunk")

    def accessor(number):
        it = document["accessors"][number]
        view = document["bufferViews"][it["bufferView"]]
        width = {"VEC3": 3, "SCALAR": 1}[it["type"]]
        letter = {5126: "f", 5125: "I"}[it["componentType"]]
        count = it["count"] * width
        expect(view["byteOffset"] % 4 == 0, "glb: a view is not aligned")
        expect(view["byteLength"] == 4 * count, "glb: a view has another length than its accessor")
        raw = binary[view["byteOffset"]:view["byteOffset"] + view["byteLength"]]
        numbers = struct.unpack(f"<{count}{letter}", raw)
        if width == 1:
            return numbers
        rows = [numbers[i:i + 3] for i in range(0, count, 3)]
        for bound, choose in (("min", min), ("max", max)):
            if bound in it:
                expect(all(it[bound][k] == choose(row[k] for row in rows) or
                           abs(it[bound][k] - choose(row[k] for row in rows)) < 1e-5
                           for k in range(3)), f"glb: {bound} does not hold")
        return rows

    meshes = {}
    for mesh in document["meshes"]:
        primitive = mesh["primitives"][0]
        meshes[mesh["name"]] = (accessor(primitive["attributes"]["POSITION"]),
                                accessor(primitive["attributes"]["NORMAL"]),
                                accessor(primitive["indices"]))
    return document["scenes"][0]["extras"], meshes


def check_mesh(meshes, extras, grid):
    isovalue = float(extras["isovalue_bohr"])
    expect(abs(float(extras["density_integral"]) - 1.0) < 0.01, "glb: integral of the density")
    for name, sign in (("positive phase", 1.0), ("negative phase", -1.0)):
        if name not in meshes:
            continue
        vertices, normals, indices = meshes[name]
        expect(len(vertices) == len(normals), "glb: a normal for each vertex")
        expect(max(indices) < len(vertices), "glb: an index points beyond the vertices")
        expect(all(abs(sum(x * x for x in normal) - 1.0) < 1e-4 for normal in normals),
               "glb: normals of length 1")
        sample = vertices[::max(1, len(vertices) // 500)]
        errors = sorted(abs(grid.interpolated(v) - sign * isovalue) / isovalue for v in sample)
        # A cubic through points h apart errs by about (h zeta)^4 / 40 of e^(-zeta r): 0.3 % for the
        # most compact d orbital here (zeta 3.2 per bohr, h 0.19 bohr).
        expect(errors[len(errors) // 2] < 0.005 and errors[9 * len(errors) // 10] < 0.03,
               f"glb: {name} does not lie on the isovalue of the grid: median error "
               f"{errors[len(errors) // 2]:.4f}, nine in ten below {errors[9 * len(errors) // 10]:.4f}")
    share = grid.share_inside(isovalue)
    # Each point of the grid stands for its cell, those that the surface cuts included.
    expect(abs(share - 0.5) < 0.02, f"glb: the isovalue encloses {share:.3f} of the density")
    expect("positive phase" in meshes, "glb: no surface")


def printed(program, *arguments):
    done = subprocess.run([program, *arguments, "--format", "json"], capture_output=True, text=True)
    expect(done.returncode == 0, f"{arguments}: exit code {done.returncode}: {done.stderr}")
    return json.loads(done.stdout)


ANGULAR = {  # real spherical harmonics times sqrt(4 pi), of a unit vector
    "s": lambda x, y, z: 1.0,
    "px": lambda x, y, z: math.sqrt(3) * x,
    "py": lambda x, y, z: math.sqrt(3) * y,
    "pz": lambda x, y, z: math.sqrt(3) * z,
    "dz2": lambda x, y, z: math.sqrt(5) / 2 * (3 * z * z - 1),
    "dx2-y2": lambda x, y, z: math.sqrt(15) / 2 * (x * x - y * y),
    "dxy": lambda x, y, z: math.sqrt(15) * x * y,
    "dxz": lambda x, y, z: math.sqrt(15) * x * z,
    "dyz": lambda x, y, z: math.sqrt(15) * y * z,
}


class Orbital:
    """One molecular orbital, evaluated from what `levels` and `parameters` print."""

    def __init__(self, program, job, name):
        levels = printed(program, "levels", job, "--coefficients", "--all")
        label, _, partner = name.partition(":")
        level = next(level for level in levels["orbitals"] if level["label"] == label)
        self.rotation = levels["symmetry"]["rotation"]
        self.origin = levels["symmetry"]["origin"]
        elements = sorted({atom["element"] for atom in levels["atoms"]})
        shells = {}
        for element in printed(program, "parameters", *elements)["elements"]:
            for shell in element["shells"]:
                shells[element["element"], shell["shell"]] = shell
        self.terms = []  # place, angular part, n - 1, [(factor, exponent)]
        coefficients = level["coefficients"][int(partner or 1) - 1]
        for words, coefficient in zip(levels["matrices"]["orbitals"], coefficients):
            atom_name, function = words.split()
            atom = next(atom for atom in levels["atoms"]
                        if f"{atom['element']}{atom['index']}" == atom_name)
            shell = shells[atom["element"], function[:2]]
            n = shell["n"]
            radial = [(coefficient * term["coefficient"] / math.sqrt(4 * math.pi) *
                       (2 * term["exponent"])**(n + 0.5) / math.sqrt(math.factorial(2 * n)),
                       term["exponent"]) for term in shell["terms"]]
            self.terms.append(((atom["x"], atom["y"], atom["z"]), ANGULAR[function[1:]], n - 1,
                               radial))

    def value(self, place):
        """At a place in the standard frame, Å; coefficients and atoms are in that of the input."""
        here = [sum(self.rotation[k][i] * place[k] for k in range(3)) + self.origin[i]
                for i in range(3)]
        total = 0.0
        for atom, angular, power, radial in self.terms:
            d = [(here[i] - atom[i]) / BOHR for i in range(3)]
            r = math.hypot(*d)
            if r < 1e-9:
                continue  # none of the points tried lies on an atom
            factor = sum(c * math.exp(-zeta * r) for c, zeta in radial) * r**power
            total += factor * angular(d[0] / r, d[1] / r, d[2] / r)
        return total


def check_values(program, job, name, grid, isovalue, meshes):
    orbital = Orbital(program, job, name)
    largest = max(abs(value) for value in grid.values)
    index = grid.names.index(name)
    count = grid.size[0] * grid.size[1] * grid.size[2]
    for point in range(count // 5, count, max(1, count // 211)):
        i, j, k = (point % grid.size[0], point // grid.size[0] % grid.size[1],
                   point // (grid.size[0] * grid.size[1]))
        place = [grid.origin[a] + grid.spacing[a] * at for a, at in enumerate((i, j, k))]
        error = abs(orbital.value(place) - grid.arrays[index][point])
        # Single precision in the file; functions are cut off where they are below 1e-7.
        expect(error < 1e-6 * largest + 1e-6, f"grid: {name} at {place} is off by {error:.2e}")
    for mesh, sign in (("positive phase", 1.0), ("negative phase", -1.0)):
        vertices = meshes[mesh][0] if mesh in meshes else []
        for vertex in vertices[::max(1, len(vertices) // 100)]:
            error = abs(orbital.value(vertex) / (sign * isovalue) - 1.0)
            expect(error < 1e-4, f"glb: {mesh} of {name} at {vertex} is off by {error:.1e}")


def check_variants(program, job, folder):
    """The diagram of a job with variants has each level of the window once in its column."""
    path = os.path.join(folder, "variants.svg")
    data, _ = draw(program, [job, "--from", "-13", "--to", "-5"], path)
    expect(draw(program, [job, "--from", "-13", "--to", "-5"], path)[0] == data,
           "variants: two runs differ")
    root = check_svg(data, "variants")
    drawn = sorted((g.get("data-column"), g.get("data-name")) for g in root.iter(SVG + "g")
                   if g.get("class") == "level")
    compared = printed(program, "compare", job)
    expect(sorted({column for column, _ in drawn}) ==
           sorted(variant["name"] for variant in compared["variants"]), "variants: a column each")
    expect(len(set(drawn)) == len(drawn), "variants: each level once")
    for variant in compared["variants"]:
        for level in variant["metal_levels"]:
            if -13 < level["energy_ev"] < -5:
                expect((variant["name"], level["label"]) in drawn,
                       f"variants: {level['label']} of {variant['name']} is missing")
    links = [g for g in root.iter(SVG + "g") if g.get("class") == "link"]
    expect(len(links) > len(compared["variants"]), "variants: links")
    for link in links:
        for end in ("from", "to"):
            expect((link.get(f"data-{end}-column"), link.get(f"data-{end}-level")) in drawn,
                   "variants: a link to a level that is not drawn")
    check_png(draw(program, [job], os.path.join(folder, "variants.png"))[0])
    return f"{len(drawn)} levels in {len(compared['variants'])} columns, {len(links)} links"


def check_with_vtk(grid_path, grid, mesh_path, meshes):
    try:
        from vtkmodules.vtkIOGeometry import vtkGLTFReader
        from vtkmodules.vtkIOXML import vtkXMLImageDataReader
    except ImportError:
        return "VTK not installed"
    reader = vtkXMLImageDataReader()
    reader.SetFileName(grid_path)
    reader.Update()
    image = reader.GetOutput()
    expect(list(image.GetDimensions()) == grid.size, "VTK: other dimensions")
    array = image.GetPointData().GetArray(0)
    expect(array.GetName() == grid.names[0], "VTK: other name")
    step = max(1, array.GetNumberOfTuples() // 1000)
    expect(all(array.GetTuple1(i) == grid.values[i]
               for i in range(0, array.GetNumberOfTuples(), step)), "VTK: other values")
    surface = vtkGLTFReader()
    surface.SetFileName(mesh_path)
    surface.ApplyDeformationsToGeometryOn()
    surface.Update()
    cells = points = 0
    walk = surface.GetOutput().NewIterator()
    while not walk.IsDoneWithTraversal():
        part = walk.GetCurrentDataObject()
        cells += part.GetNumberOfCells()
        points += part.GetNumberOfPoints()
        walk.GoToNextItem()
    expect(points == sum(len(vertices) for vertices, _, _ in meshes.values()),
           "VTK: other vertices in the mesh")
    expect(3 * cells == sum(len(indices) for _, _, indices in meshes.values()),
           "VTK: other triangles in the mesh")
    return "VTK agrees"


def has_variants(job):
    with open(job, encoding="utf-8") as file:
        return any(line.startswith("variants:") for line in file)


def check(program, job, folder):
    if has_variants(job):
        return check_variants(program, job, folder)

    def path(name):
        return os.path.join(folder, name)

    data, _ = draw(program, [job], path("levels.svg"))
    root = check_svg(data, "level diagram")
    levels = [g for g in root.iter(SVG + "g") if g.get("class") == "level"]
    expect(levels and len({g.get("data-name") for g in levels}) == len(levels),
           "level diagram: each level once")
    again, _ = draw(program, [job], path("again.svg"))
    expect(again == data, "level diagram: two runs differ")
    check_png(draw(program, [job, "--pictures"], path("levels.png"))[0])

    grid_data, remarks = draw(program, [job, "homo", "--spacing", "0.1"], path("homo.vti"))
    expect("integral of the density" in remarks, "grid: the integral is not reported")
    grid = Grid(grid_data)
    for name, values in zip(grid.names, grid.arrays):
        integral = grid.integral(values)
        expect(abs(integral - 1.0) < 0.01, f"grid: density of {name} integrates to {integral:.4f}")
    orbital = grid.names[0]
    check_svg(draw(program, [job, orbital], path("contours.svg"))[0], "contours")
    picture, _ = draw(program, [job, orbital], path("surface.png"))
    check_png(picture)
    expect(draw(program, [job, orbital], path("again.png"))[0] == picture,
           "surface: two runs differ")
    mesh_data, _ = draw(program, [job, orbital], path("homo.glb"))
    expect(draw(program, [job, orbital], path("again.glb"))[0] == mesh_data, "mesh: two runs differ")
    extras, meshes = read_glb(mesh_data)
    expect(extras["orbital"] == orbital, "glb: another orbital")
    check_mesh(meshes, extras, grid)
    check_values(program, job, orbital, grid, float(extras["isovalue_bohr"]), meshes)
    return check_with_vtk(path("homo.vti"), grid, path("homo.glb"), meshes)


def main():
    return check_each(check, sys.argv[1], sys.argv[2:])


if __name__ == "__main__":
    sys.exit(main())
