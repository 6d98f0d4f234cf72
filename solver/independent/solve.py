#!/usr/bin/python3
"""Modes of three odd chambers by a general-purpose finite-element library: DOLFINx, second-order elements.

    solve.py CHAMBER MESH.msh        chamber: reverse-flow | ring | cross-section

The mesh is the one `annulet mesh solver/independent/CHAMBER.yaml` writes; nothing else is shared. Prints JSON: with rigid
walls (K x = w^2 M x by SLEPc) and with the walls of complex impedance ((K + s C + s^2 M) x = 0, linearised, by SciPy's
ARPACK). Needs Debian's python3-dolfinx, python3-slepc4py, python3-scipy and python3-meshio.

p' = Re(p exp(st)); growth rate = Re s in 1/s, positive grows; frequency = Im s / 2 pi in Hz.
"""
import json
import sys

import dolfinx
import meshio
import numpy as np
import petsc4py
import scipy
import scipy.sparse as sp
import scipy.sparse.linalg as spl
import slepc4py
import ufl
from dolfinx import fem
from mpi4py import MPI
from petsc4py import PETSc
from slepc4py import SLEPc

COLD = (500.0, 6.4)  # sound speed m/s, density kg/m3
HOT = (810.0, 2.3)
CHAMBERS = {
    "reverse-flow": {
        "kind": "section",
        "gas": {"plenum": COLD, "burners": COLD, "chamber": HOT},
        "share": {"burners": 0.276},  # separate ducts: open share of the annulus, no azimuthal term
        "impedance": {"air_inlet": 6 + 2j, "turbine_inlet": 12 - 4j},
        "orders": [0, 1, 2],
        "range": (60.0, 700.0),
    },
    "ring": {
        "kind": "ring",
        "gas": {"plenum": COLD, "burners": COLD, "chamber": HOT},
        # mean radius and height in m; a round duct of bore d is a strip d wide and pi d / 4 high
        "zones": {"plenum": (0.330, 0.060), "burners": (0.315, np.pi / 4 * 0.080), "chamber": (0.300, 0.090)},
        "unrolled": 0.300,
        "impedance": {"chamber.downstream": 10 + 3j},
        "orders": [0],
        "range": (60.0, 900.0),
    },
    "cross-section": {
        "kind": "cross_section",
        "gas": {"gas": (800.0, 2.4)},
        "axial_wavenumber": 3.0,
        "impedance": {"shell_top": 8 + 2j},
        "orders": [0],
        "range": (100.0, 1400.0),
    },
}


def read(path):
    """Nodes, triangles with their zone, sides with their edge; a ring is cut open along its seam."""
    m = meshio.read(path)
    x = m.points[:, :2].copy()
    zones, edges, zone_of = {}, {}, []
    triangles = []
    for name, (number, dimension) in m.field_data.items():
        (edges if dimension == 1 else zones)[name] = number
    sides = {}
    for block, physical in zip(m.cells, m.cell_data["gmsh:physical"]):
        if block.type == "triangle":
            triangles.append(block.data)
            zone_of.append(physical)
        elif block.type == "line":
            for (a, b), tag in zip(block.data, physical):
                sides.setdefault(tag, []).append((a, b))
    return x, np.vstack(triangles), np.concatenate(zone_of), zones, edges, sides


def open_seam(x, triangles, period):
    """Triangles across the seam get shifted copies of their low nodes; periodicity comes back through the unknowns."""
    x = [tuple(p) for p in x]
    shifted = {}
    out = triangles.copy()
    for t, corner in enumerate(triangles):
        y = np.array([x[k][1] for k in corner])
        if y.max() - y.min() > period / 2:
            for k in range(3):
                if y[k] < y.max() - period / 2:
                    node = corner[k]
                    if node not in shifted:
                        shifted[node] = len(x)
                        x.append((x[node][0], x[node][1] + period))
                    out[t, k] = shifted[node]
    return np.array(x), out


def matrices(chamber, path):
    """For each order K, M and {impedance: B}, as SciPy matrices on second-order elements."""
    c = CHAMBERS[chamber]
    x, triangles, zone_of, zones, edges, sides = read(path)
    period = None
    plain = x
    if c["kind"] == "ring":
        period = 2 * np.pi * c["unrolled"]
        x, triangles = open_seam(x, triangles, period)
    domain = ufl.Mesh(ufl.VectorElement("Lagrange", ufl.triangle, 1))
    mesh = dolfinx.mesh.create_mesh(MPI.COMM_WORLD, triangles, x, domain)
    back = mesh.topology.original_cell_index
    dg = fem.FunctionSpace(mesh, ("DG", 0))

    def by_zone(value):
        f = fem.Function(dg)
        table = {number: value(name) for name, number in zones.items()}
        f.x.array[:] = [table[z] for z in zone_of[back]]
        return f

    density = by_zone(lambda z: c["gas"][z][1])
    modulus = by_zone(lambda z: c["gas"][z][1] * c["gas"][z][0] ** 2)
    characteristic = by_zone(lambda z: c["gas"][z][1] * c["gas"][z][0])
    mesh.topology.create_connectivity(1, 2)
    mesh.topology.create_connectivity(1, 0)
    tags = boundary_tags(mesh, plain, sides, edges, list(c["impedance"]), period)
    v = fem.FunctionSpace(mesh, ("Lagrange", 2))
    p, q = ufl.TrialFunction(v), ufl.TestFunction(v)
    r = ufl.SpatialCoordinate(mesh)[1]
    ds = ufl.Measure("ds", domain=mesh, subdomain_data=tags)
    fold = fold_seam(v, period)

    def csr(form):
        a = fem.petsc.assemble_matrix(fem.form(form))
        a.assemble()
        i, j, d = a.getValuesCSR()
        m = sp.csr_matrix((d, j, i), shape=a.getSize())
        return (fold.T @ m @ fold).tocsr()

    for order in c["orders"]:
        if c["kind"] == "section":
            w = 2 * ufl.pi * r * by_zone(lambda z: c["share"].get(z, 1.0))
            joined = by_zone(lambda z: 0.0 if z in c["share"] else 1.0)
            k = w / density * (ufl.inner(ufl.grad(p), ufl.grad(q)) + joined * order**2 / r**2 * p * q) * ufl.dx
            m = w / modulus * p * q * ufl.dx
        elif c["kind"] == "ring":
            ratio = by_zone(lambda z: c["zones"][z][0] / c["unrolled"])
            w = by_zone(lambda z: c["zones"][z][1])
            k = w / density * (ratio * p.dx(0) * q.dx(0) + p.dx(1) * q.dx(1) / ratio) * ufl.dx
            m = w / modulus * ratio * p * q * ufl.dx
            w = w * ratio
        else:
            w = 1.0
            k = 1 / density * (ufl.inner(ufl.grad(p), ufl.grad(q)) + c["axial_wavenumber"] ** 2 * p * q) * ufl.dx
            m = 1 / modulus * p * q * ufl.dx
        b = {z: csr(w / characteristic * p * q * ds(n)) for n, z in enumerate(c["impedance"].values(), 1)}
        yield order, csr(k), csr(m), b


def boundary_tags(mesh, plain, sides, edges, names, period):
    """Facets of the named edges, found by their end points."""
    def key(a):
        y = a[1] % period if period else a[1]
        if period and abs(y - period) < 1e-9:
            y = 0.0
        return (round(a[0], 9), round(y, 9))

    wanted = {}
    for number, name in enumerate(names, 1):
        for a, b in sides[edges[name]]:
            wanted[frozenset((key(plain[a]), key(plain[b])))] = number
    corners = mesh.topology.connectivity(1, 0)
    cells = mesh.topology.connectivity(2, 0)
    place = {}
    for cell in range(cells.num_nodes):
        for vertex, node in zip(cells.links(cell), mesh.geometry.dofmap.links(cell)):
            place[vertex] = mesh.geometry.x[node]
    found, values = [], []
    for f in range(corners.num_nodes):
        number = wanted.get(frozenset(key(place[n]) for n in corners.links(f)))
        if number:
            found.append(f)
            values.append(number)
    if len(found) != len(wanted):
        raise SystemExit(f"{len(wanted)} sides of walls wanted, {len(found)} found")
    order = np.argsort(found)
    return dolfinx.mesh.meshtags(
        mesh, 1, np.array(found, dtype=np.int32)[order], np.array(values, dtype=np.int32)[order]
    )


def fold_seam(v, period):
    """Unknowns of the opened ring as those of the closed one."""
    x = v.tabulate_dof_coordinates()
    n = len(x)
    if period is None:
        return sp.identity(n, format="csr")
    first, column = {}, []
    low = x[:, 1].min()
    for a in x:
        y = (a[1] - low) % period
        if abs(y - period) < 1e-9:
            y = 0.0
        column.append(first.setdefault((round(a[0], 9), round(y, 9)), len(first)))
    return sp.csr_matrix((np.ones(n), (np.arange(n), column)), shape=(n, len(first)))


def rigid(k, m, low, high):
    """Frequencies with rigid walls, by SLEPc."""
    def petsc(a):
        return PETSc.Mat().createAIJ(size=a.shape, csr=(a.indptr, a.indices, a.data))

    e = SLEPc.EPS().create()
    e.setOperators(petsc(k), petsc(m))
    e.setProblemType(SLEPc.EPS.ProblemType.GHEP)
    e.setDimensions(30)
    e.setTarget((2 * np.pi * low) ** 2)
    e.setWhichEigenpairs(SLEPc.EPS.Which.TARGET_MAGNITUDE)
    e.getST().setType("sinvert")
    e.setTolerances(1e-12)
    e.solve()
    f = sorted(np.sqrt(max(0.0, e.getEigenvalue(i).real)) / (2 * np.pi) for i in range(e.getConverged()))
    return [v for v in f if low < v < high]


def damped(k, m, b, low, high):
    """Eigenvalues with the walls, upper half plane: companion form, shift and invert at several points."""
    n = k.shape[0]
    c = sum(matrix / z for z, matrix in b.items())
    found = []
    for hertz in np.linspace(low, high, 6):
        shift = -100 + 2j * np.pi * hertz
        lu = spl.splu((k + shift * c + shift**2 * m).tocsc().astype(complex))

        def apply(u):
            # (A - shift B)^-1 B u with A = [0 I; -K -C], B = [I 0; 0 M]
            f, g = u[:n], m @ u[n:]
            top = lu.solve(-(g + c @ f + shift * (m @ f)))
            return np.concatenate([top, f + shift * top])

        op = spl.LinearOperator((2 * n, 2 * n), matvec=apply, dtype=complex)
        start = np.random.default_rng(1).standard_normal(2 * n)
        mu = spl.eigs(op, k=12, v0=start, tol=1e-12, return_eigenvectors=False)
        reach = np.sort(np.abs(1 / mu))[-1]
        for s in shift + 1 / mu:
            if low < s.imag / (2 * np.pi) < high and -900 < s.real < 100 and abs(s - shift) < 0.999 * reach:
                found.append((s, hertz))
    return merge(found)


def merge(found):
    """One list of what several shifts saw: the nearest shift's count of each cluster."""
    out, left = [], sorted(found, key=lambda f: (f[0].imag, f[0].real))
    while left:
        s = left[0][0]
        cluster = [f for f in left if abs(f[0] - s) < 1e-6 * abs(s)]
        left = [f for f in left if abs(f[0] - s) >= 1e-6 * abs(s)]
        counts = {}
        for value, shift in cluster:
            counts.setdefault(shift, []).append(value)
        out.extend(max(counts.values(), key=len))
    return [[s.imag / (2 * np.pi), s.real] for s in sorted(out, key=lambda s: (s.imag, s.real))]


def main():
    chamber, path = sys.argv[1:3]
    low, high = CHAMBERS[chamber]["range"]
    answer = {
        "chamber": chamber,
        "elements": "Lagrange, second order",
        "versions": {
            "dolfinx": dolfinx.__version__,
            "petsc4py": petsc4py.__version__,
            "slepc4py": slepc4py.__version__,
            "scipy": scipy.__version__,
        },
        "problems": [],
    }
    for order, k, m, b in matrices(chamber, path):
        answer["problems"].append(
            {
                "azimuthal_order": order,
                "unknowns": k.shape[0],
                "rigid_hz": rigid(k, m, low, high),
                "walls_hz_and_per_s": damped(k, m, b, low, high),
            }
        )
    json.dump(answer, sys.stdout, indent=1, default=float)
    print()


main()
