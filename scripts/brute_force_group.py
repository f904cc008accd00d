"""Point group of a molecule by trying every mapping of a pair of atoms: slow, and by another road
than the library, for use as a second opinion in scripts.

The group is named from counts of operations (proper rotations by angle, mirrors, inversion), with no
search for axes and no tables.
"""
import numpy as np


def operations(symbols, positions, tolerance):
    """All orthogonal matrices about the centroid that map each atom on one of its element."""
    r = np.array(positions, float)
    r = r - r.mean(axis=0)
    shells = {}  # (element, distance from the centre) -> atoms
    for i, (s, p) in enumerate(zip(symbols, r)):
        d = np.linalg.norm(p)
        if d < tolerance:
            continue
        for key in shells:
            if key[0] == s and abs(key[1] - d) < tolerance:
                shells[key].append(i)
                break
        else:
            shells[(s, d)] = [i]
    groups = sorted(shells.values(), key=len)

    def frame(a, b):
        x = a / np.linalg.norm(a)
        y = b - x * (b @ x)
        y = y / np.linalg.norm(y)
        return np.column_stack([x, y, np.cross(x, y)])

    def angle(a, b):
        return np.linalg.norm(np.cross(a, b)) / np.linalg.norm(a) / np.linalg.norm(b)

    first = groups[0][0]
    second = next(i for g in groups for i in g if angle(r[first], r[i]) > 0.05)
    candidates_1 = groups[0]
    candidates_2 = next(g for g in groups if second in g)
    reference = frame(r[first], r[second])
    symbols = np.array(symbols)
    found = []
    for i in candidates_1:
        for j in candidates_2:
            if i == j or abs(np.linalg.norm(r[i] - r[j]) -
                             np.linalg.norm(r[first] - r[second])) > 2 * tolerance:
                continue
            turned = frame(r[i], r[j])
            for sign in (1.0, -1.0):
                m = turned @ np.diag([1.0, 1.0, sign]) @ reference.T
                images = r @ m.T
                d = np.linalg.norm(images[:, None, :] - r[None, :, :], axis=2)
                nearest = d.argmin(axis=1)
                if (d[np.arange(len(r)), nearest].max() < tolerance
                        and len(set(nearest)) == len(r)
                        and (symbols[nearest] == symbols).all()):
                    found.append(m)
    # A planar molecule is mapped in the same way by two matrices; near-equal ones are one.
    unique = []
    for m in found:
        if all(np.abs(m - u).max() > 0.02 for u in unique):
            unique.append(m)
    return unique


def rotation_order(m):
    """Order of a proper rotation, found as the smallest k with k times the angle whole."""
    angle = np.arccos(np.clip((np.trace(m) - 1) / 2, -1, 1)) / (2 * np.pi)
    for k in range(1, 200):
        if abs(k * angle - round(k * angle)) < 2e-3 * k:
            return k
    raise ValueError("no rotation of finite order")


def rotation_axis(m):
    return np.linalg.svd(m - np.eye(3))[2][2]


def point_group(symbols, positions, tolerance):
    r = np.array(positions, float)
    if len(r) == 1:
        return "Kh"
    spread = np.linalg.svd(r - r.mean(axis=0))[1]
    if spread[1] < tolerance:
        c = r - r.mean(axis=0)
        image = all(any(s == t and np.linalg.norm(p + q) < tolerance
                        for t, q in zip(symbols, c)) for s, p in zip(symbols, c))
        return "Dinfh" if image else "Cinfv"
    found = operations(symbols, r, tolerance)
    proper = [m for m in found if np.linalg.det(m) > 0]
    improper = [m for m in found if np.linalg.det(m) < 0]
    if len(found) not in (len(proper), 2 * len(proper)):
        raise ValueError("the operations found are no group")
    orders = [rotation_order(m) for m in proper]
    inversion = any(np.abs(m + np.eye(3)).max() < 0.05 for m in improper)
    mirrors = [m for m in improper if abs(np.trace(m) - 1) < 0.05]
    threefold = orders.count(3)
    if (len(proper), threefold) == (12, 8):
        return "T" if not improper else "Th" if inversion else "Td"
    if (len(proper), threefold) == (24, 8):
        return "Oh" if improper else "O"
    if (len(proper), threefold) == (60, 20):
        return "Ih" if improper else "I"
    n = max(orders)
    dihedral = len(proper) == 2 * n
    if not dihedral and len(proper) != n:
        raise ValueError("the proper rotations found are no group")
    if not improper:
        return ("D" if dihedral else "C") + str(n)
    if dihedral:
        # D_nd has n mirrors, D_nh one more; D_2h has three and D_2d two in the same way.
        return f"D{n}h" if len(mirrors) == n + 1 else f"D{n}d"
    if n == 1:
        return "Ci" if inversion else "Cs"
    axis = rotation_axis(next(m for m, o in zip(proper, orders) if o == n))
    if any(np.abs(m @ axis + axis).max() < 0.05 for m in mirrors):
        return f"C{n}h"
    return f"C{n}v" if mirrors else f"S{2 * n}"
