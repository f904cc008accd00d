#!/usr/bin/env python3
"""Reads what `irrepwise draw` writes by another road, and holds the files against each other.

    check-figures.py PROGRAM INPUT...

For each input: the level diagram and the contour drawing are well-formed SVG with title and
description; the PNG decodes; of the HOMO, the density on the VTK grid integrates to 1 within 1 %,
the isovalue encloses half of it, and the vertices of the glTF mesh lie on that value as interpolated
from the grid. Two runs give the same bytes. Only Python's standard library is needed; where python3-vtk9 is installed, VTK itself
reads the grid too.
"""
import base64
import json
import os
import struct
import subprocess
import sys
import tempfile
import xml.etree.ElementTree as ElementTree
import zlib

BOHR = 0.529177210544  # angstrom, CODATA 2022
SVG = "{http://www.w3.org/2000/svg}"


class Failed(Exception):
    pass


def expect(condition, words):
    if not condition:
        raise Failed(words)


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


def check_with_vtk(path, grid):
    try:
        from vtkmodules.vtkIOXML import vtkXMLImageDataReader
    except ImportError:
        return "VTK not installed"
    reader = vtkXMLImageDataReader()
    reader.SetFileName(path)
    reader.Update()
    image = reader.GetOutput()
    expect(list(image.GetDimensions()) == grid.size, "VTK: other dimensions")
    array = image.GetPointData().GetArray(0)
    expect(array.GetName() == grid.names[0], "VTK: other name")
    step = max(1, array.GetNumberOfTuples() // 1000)
    expect(all(array.GetTuple1(i) == grid.values[i]
               for i in range(0, array.GetNumberOfTuples(), step)), "VTK: other values")
    return "VTK agrees"


def check(program, job, folder):
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
    return check_with_vtk(path("homo.vti"), grid)


def main():
    program, jobs = sys.argv[1], sys.argv[2:]
    failures = 0
    for job in jobs:
        with tempfile.TemporaryDirectory() as folder:
            try:
                print(f"{os.path.basename(job)}: as it should be ({check(program, job, folder)})")
            except Failed as failure:
                failures += 1
                print(f"{os.path.basename(job)}: {failure}")
    return 1 if failures or not jobs else 0


if __name__ == "__main__":
    sys.exit(main())
