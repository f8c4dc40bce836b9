#!/usr/bin/env python3
"""Steady axisymmetric inflow of a ring in a Gardner soil by finite elements.

Unknown: phi = alpha Phi / Ks, Phi the Kirchhoff potential (int K dh, continued by Ks/alpha + Ks h
for h > 0).  Lengths in ring radii, y depth (down), g = alpha a:

    flux  q = -grad phi + g k(phi) e_y,   k = K/Ks = min(phi, 1),   div q = 0.

phi = 1 + alpha H under the pond (r < 1, y = 0); no flow through the wall (r = 1, y < d), a line of
doubled nodes; no flow through the surface outside.  At the outer edges the point-source field
exp(g (y - rho)/2)/rho gives q.n = phi [g (n_y + e_rho.n)/2 + e_rho.n/rho].

Lagrange elements of degree p on rectangles, graded geometrically towards the tip of the wall
(gradient like rho^-1/2).  The inflow is the sum of the weak-form residuals of the pond's nodes, so
it equals the outflow to rounding and converges at twice the order of the field.  Newton's method
with the one-sided slope of k and a line search.  Nothing is shared with the finite volumes of the
program.
"""
import argparse
import json
import os

import numpy as np
import scipy.sparse as sp
import scipy.sparse.linalg as spla

HERE = os.path.dirname(os.path.abspath(__file__))


def graded(start, end, origin, tip, growth, widest):
    """Break points from start to end; spacing growth*(distance to origin), in [tip, widest(s)].

    origin is one of the two ends or lies outside.
    """
    reverse = abs(end - origin) < abs(start - origin)
    near, far = (end, start) if reverse else (start, end)
    length = abs(far - near)
    points, s = [0.0], 0.0
    while s < length:
        s += min(max(tip, growth * s), widest(s))
        points.append(s)
    points = np.array(points) * (length / points[-1])
    line = near + np.sign(far - near) * points
    return np.sort(line)


def lagrange(p):
    """Nodes on [-1, 1] (Gauss-Lobatto), shape values and slopes at Gauss points, weights."""
    inner = np.polynomial.legendre.Legendre.basis(p).deriv().roots()
    nodes = np.concatenate(([-1.0], np.sort(inner.real), [1.0]))
    x, w = np.polynomial.legendre.leggauss(p + 2)
    coefficients = np.linalg.inv(np.vander(nodes, increasing=True))
    powers = np.arange(p + 1)
    value = x[:, None] ** powers @ coefficients
    slope = (powers * x[:, None] ** np.maximum(powers - 1, 0)) @ coefficients
    return nodes, value, slope, w


def fill(breaks, nodes):
    """All node coordinates along one direction."""
    left, size = breaks[:-1], np.diff(breaks)
    inside = left[:, None] + 0.5 * size[:, None] * (nodes[None, :-1] + 1)
    return np.append(inside.ravel(), breaks[-1])


class Ring:
    """Mesh and operators of one problem.

    g = alpha a, d = insertion/radius, width and depth of the domain in radii, pond = H/a; fine
    divides every spacing (that at the tip by its square).
    """

    def __init__(self, g, d, width, depth, fine=1.0, p=2, tip=1e-5, pond=0.0):
        self.g, self.d, self.p = g, d, p
        growth = 0.35 / fine
        near = min(0.25, 0.8 / g) if g > 0 else 0.25
        far = 1.6 / g if g > 0 else np.inf
        bulb = 2.0 + d + 0.5 * pond  # finest near the saturated bulb

        def widest(s):
            return max(near, min(near + 0.35 * max(s - bulb, 0.0), far)) / fine

        tip = tip / fine**2
        r_in = graded(0, 1, 1, tip, growth, widest)
        r_out = graded(1, width, 1, tip, growth, widest)
        y_low = graded(d, depth, d, tip, growth, widest)
        if d > 0:
            y_up = graded(0, d, d, tip, growth, widest)
            y_breaks = np.concatenate((y_up, y_low[1:]))
        else:
            y_up, y_breaks = np.array([0.0]), y_low
        r_breaks = np.concatenate((r_in, r_out[1:]))
        nodes, value, slope, weight = lagrange(p)
        self.value, self.slope, self.weight = value, slope, weight
        r, y = fill(r_breaks, nodes), fill(y_breaks, nodes)
        n_r, n_y = len(r), len(y)
        wall = p * (len(r_in) - 1)          # column of nodes on r = 1
        above = p * (len(y_up) - 1)         # rows strictly above the tip
        number = np.arange(n_r * n_y).reshape(n_r, n_y)
        outside = number[wall].copy()
        outside[:above] = n_r * n_y + np.arange(above)
        self.count = n_r * n_y + above
        e_r, e_y = np.meshgrid(np.arange(len(r_breaks) - 1), np.arange(len(y_breaks) - 1),
                               indexing="ij")
        e_r, e_y = e_r.ravel(), e_y.ravel()
        local = np.arange(p + 1)
        columns = (p * e_r)[:, None, None] + local[None, :, None]
        rows = (p * e_y)[:, None, None] + local[None, None, :]
        table = number[columns, rows]
        cut = (columns == wall) & (e_r >= len(r_in) - 1)[:, None, None]
        table = np.where(cut, outside[np.broadcast_to(rows, table.shape)], table)
        self.table = table.reshape(len(e_r), -1)
        self.h_r, self.h_y = np.diff(r_breaks)[e_r], np.diff(y_breaks)[e_y]
        x, _ = np.polynomial.legendre.leggauss(p + 2)
        self.r_q = r_breaks[e_r][:, None] + 0.5 * self.h_r[:, None] * (x + 1)
        self.ponded = number[: wall + 1, 0]
        dry = number[wall:, 0] if d == 0 else np.append(outside[0], number[wall + 1:, 0])
        self.edge = np.concatenate((number[:, -1], number[-1, :]))
        self.surface = dry[1:] if d == 0 else dry
        self._shapes()
        self._assemble_linear(r_breaks, y_breaks, number, n_r, n_y)

    def _shapes(self):
        q, m = len(self.weight), self.p + 1
        v, s = self.value, self.slope
        self.n = np.einsum("ai,bj->abij", v, v).reshape(q * q, m * m)
        self.n_r = np.einsum("ai,bj->abij", s, v).reshape(q * q, m * m)
        self.n_y = np.einsum("ai,bj->abij", v, s).reshape(q * q, m * m)
        w = np.outer(self.weight, self.weight)
        # r dr dy at the Gauss points, times the 2/h of a y derivative where needed later
        self.measure = (0.25 * (self.h_r * self.h_y)[:, None, None] * w[None]
                        * self.r_q[:, :, None]).reshape(len(self.h_r), -1)

    def _assemble_linear(self, r_breaks, y_breaks, number, n_r, n_y):
        m = self.measure
        k_r = np.einsum("eq,qi,qj->eij", m, self.n_r, self.n_r, optimize=True)
        k_y = np.einsum("eq,qi,qj->eij", m, self.n_y, self.n_y, optimize=True)
        local = (k_r * (2 / self.h_r)[:, None, None] ** 2
                 + k_y * (2 / self.h_y)[:, None, None] ** 2)
        size = self.table.shape[1]
        self.row = np.repeat(self.table, size, axis=1).ravel()
        self.col = np.tile(self.table, (1, size)).ravel()
        stiff = sp.csr_matrix((local.ravel(), (self.row, self.col)), shape=(self.count,) * 2)
        self.linear = stiff + self._outer_edge(r_breaks, y_breaks, number, n_r, n_y)

    def _outer_edge(self, r_breaks, y_breaks, number, n_r, n_y):
        x, w = np.polynomial.legendre.leggauss(self.p + 2)
        rows, cols, data = [], [], []
        for breaks, line, at, bottom in ((r_breaks, number[:, n_y - 1], y_breaks[-1], True),
                                         (y_breaks, number[n_r - 1, :], r_breaks[-1], False)):
            h = np.diff(breaks)
            s = breaks[:-1, None] + 0.5 * h[:, None] * (x + 1)
            rho = np.hypot(s, at)
            normal = at / rho
            if bottom:
                factor = (self.g * (1 + normal) / 2 + normal / rho) * s
            else:
                factor = (self.g * normal / 2 + normal / rho) * at
            local = np.einsum("eq,qi,qj->eij", factor * 0.5 * h[:, None] * w, self.value,
                              self.value)
            ids = line[self.p * np.arange(len(h))[:, None] + np.arange(self.p + 1)]
            rows.append(np.repeat(ids, self.p + 1, axis=1).ravel())
            cols.append(np.tile(ids, (1, self.p + 1)).ravel())
            data.append(local.ravel())
        entries = (np.concatenate(data), (np.concatenate(rows), np.concatenate(cols)))
        return sp.csr_matrix(entries, shape=(self.count,) * 2)

    def residual(self, phi):
        """Weak-form residual: integral of q.(-grad v) plus the outer edge, node by node."""
        out = self.linear @ phi
        if self.g > 0:
            k = np.minimum(phi[self.table] @ self.n.T, 1.0)
            part = -self.g * ((self.measure * k) * (2 / self.h_y)[:, None]) @ self.n_y
            out = out + np.bincount(self.table.ravel(), part.ravel(), minlength=self.count)
        return out

    def jacobian(self, phi):
        if self.g == 0:
            return self.linear
        slope = (phi[self.table] @ self.n.T < 1.0) * self.measure * (2 / self.h_y)[:, None]
        size = self.table.shape[1]
        pairs = np.einsum("qi,qj->qij", self.n_y, self.n).reshape(-1, size * size)
        local = -self.g * slope @ pairs
        return self.linear + sp.csr_matrix((local.ravel(), (self.row, self.col)),
                                           shape=(self.count,) * 2)

    def solve(self, top):
        """Field for phi = top under the pond; returns the sum of the pond's residuals."""
        free = np.ones(self.count, bool)
        free[self.ponded] = False
        free = np.flatnonzero(free)
        phi = np.zeros(self.count)
        phi[self.ponded] = top
        res = self.residual(phi)
        for self.steps in range(1, 60):
            matrix = self.jacobian(phi).tocsc()[free][:, free].tocsc()
            factor = spla.splu(matrix, permc_spec="MMD_AT_PLUS_A", diag_pivot_thresh=1e-3,
                               options=dict(SymmetricMode=True))
            step = factor.solve(-res[free])
            before, share = np.linalg.norm(res[free]), 1.0
            while True:
                trial = phi.copy()
                trial[free] += share * step
                new = self.residual(trial)
                if np.linalg.norm(new[free]) < (1 - 1e-4 * share) * before or share < 1e-3:
                    break
                share *= 0.5
            phi, res = trial, new
            scale = np.abs(res[self.ponded]).sum()
            change = share * np.abs(step).max() / top
            if np.linalg.norm(res[free]) < 1e-9 * scale or change < 1e-10:
                break
        else:
            raise RuntimeError("Newton did not end")
        self.phi = phi
        return res[self.ponded].sum()

    def surface_maximum(self):
        """Largest phi at the open surface outside; below 1 the surface stays unsaturated."""
        return self.phi[self.surface].max()


def domain(g, d, pond, factor=1.0):
    """(width, depth) in radii.

    Without gravity the edge's condition leaves an error of the third power of the width.  With
    gravity errors at the edge die out upstream like exp(-g distance) once it lies outside the
    saturated bulb, whose depth is at most about (i/Ks) g/2 (axis of a point source).
    """
    if g == 0:
        return 300.0 * factor, 300.0 * factor
    flow = 1.0 + (pond + 1.0 / g) / (np.pi * (0.316 * d + 0.184))
    return (factor * (4.0 + 0.5 * pond + 20.0 / g),
            factor * (3.0 + d + 0.6 * flow * g + 20.0 / g))


def saturated(d, fine=1.0, p=2, factor=1.0):
    """Q/(Ks a H) of the saturated ring without gravity, head 0 at infinity."""
    ring = Ring(0.0, d, *domain(0.0, d, 0.0, factor), fine, p)
    return 2 * np.pi * ring.solve(1.0)


def gardner(g, d, pond, fine=1.0, p=2, factor=1.0):
    """i/Ks and the solved ring; pond = H/a."""
    ring = Ring(g, d, *domain(g, d, pond, factor), fine, p, pond=pond)
    return 2 * ring.solve(1.0 + g * pond) / g, ring


# Saturated ring without gravity, Q/(Ks a H) by insertion/radius.  d = 0: 4, exact (disc electrode).
# Others: this project's own Richardson-extrapolated finite volumes, +-0.05 %.
SATURATED = ((0.0, 4.0), (0.25, 3.165), (1.0, 1.864))
# Gardner disc without ponding, Q = Ks a/alpha f(alpha a); this project's dual integral equations.
DISC = ((0.1, 4.51107), (1.0, 7.53378), (4.0, 16.80567))
# G of Q = pi a^2 Ks + (a/G)(Ks H + Ks/alpha) (Reynolds & Elrick 1990 Soil Sci. Soc. Am. J. 54:1233
# for the form) with H = a; rows alpha a, columns d/a; this project's finite volumes, +-0.3 %.
SHAPE_D = (0.0, 0.1, 0.25, 0.3, 0.5, 0.75, 1.0, 2.0)
SHAPE = {0.1: (.2367, .2649, .3093, .3246, .3881, .4713, .5579, .9291),
         0.4: (.2154, .2477, .2982, .3156, .3881, .4841, .5854, 1.0354),
         1.2: (.1803, .2138, .2661, .2840, .3575, .4536, .5534, .9803),
         3.6: (.1498, .1804, .2293, .2457, .3124, .3977, .4850, .8472)}


def percent(value, other):
    return 100.0 * (value / other - 1.0)


def scaled(alpha, a, d, head, **options):
    return gardner(alpha * a, d / a, head / a, **options)


def with_uncertainty(alpha, a, d, head):
    """One row: value on the finest mesh; uncertainty = sum of all differences, at least 0.005 %."""
    value, ring = scaled(alpha, a, d, head, fine=1.4)
    coarse = scaled(alpha, a, d, head, fine=0.7)[0]
    cubic = scaled(alpha, a, d, head, fine=0.7, p=3)[0]
    middle = scaled(alpha, a, d, head, fine=1.0)[0]
    small = scaled(alpha, a, d, head, fine=1.0, factor=0.7)[0]
    parts = dict(mesh=abs(percent(coarse, value)), degree=abs(percent(cubic, value)),
                 domain=abs(percent(small, middle)))
    wet = ring.surface_maximum()
    return dict(alpha_per_cm=alpha, a_cm=a, d_cm=d, H_cm=head, i_over_Ks=float("%.7g" % value),
                uncertainty_percent=round(max(sum(parts.values()), 0.005), 4),
                coarser_mesh_percent=round(parts["mesh"], 5),
                cubic_elements_percent=round(parts["degree"], 5),
                smaller_domain_percent=round(parts["domain"], 5),
                head_at_surface_outside_cm=float("%.4g" % (np.log(max(wet, 1e-30)) / alpha)))


def draws(count, seed):
    """Random rings; redrawn when d < 0.5 cm, alpha a > 6 or the surface outside is near h = 0."""
    random = np.random.default_rng(seed)
    rows = []
    while len(rows) < count:
        alpha = float("%.3g" % np.exp(random.uniform(np.log(0.01), np.log(0.36))))
        a = float("%.3g" % np.exp(random.uniform(np.log(3.0), np.log(50.0))))
        d = float("%.3g" % (a * random.uniform(0.1, 1.5)))
        head = float("%.3g" % random.uniform(0.0, 30.0))
        if len(rows) % 5 == 4:
            head = 0.0  # every fifth ring just wetted
        if d < 0.5 or alpha * a > 6:
            continue
        wettest = scaled(alpha, a, d, head, fine=0.7)[1].surface_maximum()
        if wettest > 0.97:
            continue
        rows.append((alpha, a, d, head))
    return rows


def check(rows):
    """Compare with the values above and the open reference; prints a table."""
    for d, known in SATURATED:
        value = saturated(d, fine=1.4)
        print(f"saturated d/a={d:<5} F={value:.5f} known {known} {percent(value, known):+.4f} %")
    for g, known in DISC:
        value = np.pi * g * gardner(g, 0.0, 0.0, fine=1.4)[0]
        print(f"disc alpha a={g:<4} f={value:.5f} known {known} {percent(value, known):+.5f} %")
    for row in rows:
        value, ring = scaled(row["alpha_per_cm"], row["a_cm"], row["d_cm"], row["H_cm"], fine=1.4)
        print(f"ring alpha={row['alpha_per_cm']} d={row['d_cm']} i/Ks={value:.5f} open "
              f"{row['i_over_Ks']} {percent(value, row['i_over_Ks']):+.4f} % "
              f"phi outside {ring.surface_maximum():.3f}")
    for g, known in SHAPE.items():
        for d, shape in zip(SHAPE_D, known):
            flow, ring = gardner(g, d, 1.0)
            value = (1.0 + 1.0 / g) / (np.pi * (flow - 1.0))
            note = "  (surface outside would be wet)" if ring.surface_maximum() >= 1 else ""
            print(f"G alpha a={g:<3} d/a={d:<4} {value:.4f} known {shape:.4f} "
                  f"{percent(value, shape):+.2f} %{note}")


def main():
    parser = argparse.ArgumentParser(description=__doc__.split("\n")[0])
    parser.add_argument("--check", action="store_true", help="print the comparisons, write nothing")
    parser.add_argument("--count", type=int, default=20)
    parser.add_argument("--seed", type=int, default=20)
    options = parser.parse_args()
    if options.check:
        with open(os.path.join(HERE, "..", "open_reference", "reference.json")) as file:
            check(json.load(file)["steady_gardner_rings"]["rows"])
        return
    rows = []
    for case in draws(options.count, options.seed):
        rows.append(with_uncertainty(*case))
        print(rows[-1], flush=True)
    about = ("steady i/Ks of a ring, Gardner soil K = Ks exp(alpha h), dry far field, wall without "
             "thickness, surface outside closed; finite elements, see README.md")
    with open(os.path.join(HERE, "reference.json"), "w") as file:
        json.dump(dict(about=about, generator="reference_fem.py", seed=options.seed, rows=rows),
                  file, indent=1)
        file.write("\n")


if __name__ == "__main__":
    main()
