#!/usr/bin/env python3
"""Exact inflow of a disc (ponded at head 0) on a deep dry Gardner soil: f(alpha a) with
Q = (Ks a / alpha) f.

Lengths in radii, y down, g = alpha a, c = g/2, s = sqrt(k^2 + c^2), phi = alpha Phi / Ks:

    phi = int B(k)/(s + c) J0(k r) exp((c - s) y) dk,   flux at y = 0:  int B J0 dk = 0 for r > 1,
    phi(r, 0) = 1 for r < 1.

B = k int_0^1 G(t) cos(k t) dt meets the first condition; Abel's transform of the second leaves the
integral equation of the second kind (G even)

    G(t) + (c/pi) int_-1^1 F(c |t - u|) G(u) du = 2/pi,
    F(z) = -E1(z) + int_0^1 (sqrt(1 - v^2) - 1)/v exp(-v z) dv,

where F is the cosine transform of k/(s + c) - 1 turned onto its branch cut, and
f = 2 pi int_0^1 G dt (f(0) = 4, the saturated disc).  Solved by collocation with piecewise
polynomials on panels graded to t = 1; the logarithm of F by quadrature refined towards u = t.
Wooding 1968 (Water Resour. Res. 4:1259) approximates f by pi g + 4.
"""
import json
import os

import numpy as np
from scipy.special import exp1

HERE = os.path.dirname(os.path.abspath(__file__))
ALPHA_A = (0.05, 0.1, 0.2, 0.5, 1.0, 2.0, 4.0, 8.0)
# This project's spectral Galerkin solution of the same problem, 10 and 16 terms equal to 1e-7.
KNOWN = {0.1: 4.51107, 1.0: 7.53378, 4.0: 16.80567}


def kernel(z):
    """F(z); v = sin(theta) makes the second integrand smooth."""
    x, w = np.polynomial.legendre.leggauss(40)
    theta, w = np.pi / 4 * (x + 1), np.pi / 4 * w
    smooth = -np.sin(theta) / (1 + np.cos(theta)) * np.cos(theta)
    z = np.asarray(z)
    return -exp1(z) + np.exp(-z[..., None] * np.sin(theta)) @ (w * smooth)


def pieces(left, right, t, ratio=0.2, smallest=1e-17):
    """Break points of [left, right] shrinking towards t where it lies in or near the interval."""
    if t <= left or t >= right:
        near = left if t <= left else right
        gap, length = abs(t - near), right - left
        offsets = [length]
        while offsets[-1] > max(gap, smallest) and offsets[-1] > 1e-16 * length:
            offsets.append(offsets[-1] * ratio)
        offsets = np.array(offsets[::-1])
        points = near + offsets if near == left else near - offsets
        return np.unique(np.concatenate((points, [left, right])))
    return np.unique(np.concatenate((pieces(left, t, t, ratio), pieces(t, right, t, ratio))))


def rule(breaks, order):
    x, w = np.polynomial.legendre.leggauss(order)
    h = np.diff(breaks)
    points = breaks[:-1, None] + 0.5 * h[:, None] * (x + 1)
    return points.ravel(), (0.5 * h[:, None] * w).ravel()


def disc(g, order=8, panels=14, ratio=0.3, quadrature=12):
    """f(alpha a)."""
    c = g / 2
    breaks = np.concatenate(([0.0], 1 - ratio ** np.arange(1, panels), [1.0]))
    breaks = np.unique(np.concatenate((breaks, np.linspace(0, breaks[1], 1 + int(2 + g)))))
    x, w = np.polynomial.legendre.leggauss(order)
    h = np.diff(breaks)
    nodes = (breaks[:-1, None] + 0.5 * h[:, None] * (x + 1)).ravel()
    weights = (0.5 * h[:, None] * w).ravel()
    to_coefficients = np.linalg.inv(np.polynomial.legendre.legvander(x, order - 1))
    matrix = np.eye(len(nodes))
    for row, t in enumerate(nodes):
        for j in range(len(h)):
            u, du = rule(pieces(breaks[j], breaks[j + 1], t), quadrature)
            shape = np.polynomial.legendre.legvander(
                2 * (u - breaks[j]) / h[j] - 1, order - 1) @ to_coefficients
            both = kernel(c * np.maximum(np.abs(t - u), 1e-300)) + kernel(c * (t + u))
            matrix[row, order * j:order * (j + 1)] += c / np.pi * (du * both) @ shape
    density = np.linalg.solve(matrix, np.full(len(nodes), 2 / np.pi))
    return 2 * np.pi * weights @ density


def main():
    rows = []
    for g in ALPHA_A:
        value = disc(g)
        coarse = disc(g, order=6, panels=10, quadrature=10)
        wooding = 100 * ((np.pi * g + 4) / value - 1)
        known = KNOWN.get(g)
        rows.append(dict(alpha_a=g, f=round(value, 8),
                         uncertainty=float("%.1e" % max(2 * abs(value - coarse), 1e-8)),
                         wooding_error_percent=round(wooding, 3)))
        print(f"alpha a {g:<5} f {value:.9f} coarser {value - coarse:+.1e} Wooding {wooding:+.2f} %"
              + (f"  known {known} {value - known:+.1e}" if known else ""))
    about = ("steady inflow of a disc at head 0 on a deep dry Gardner soil, "
             "Q = Ks a/alpha f(alpha a); integral equation of the second kind, see README.md")
    with open(os.path.join(HERE, "reference.json"), "w") as file:
        json.dump(dict(about=about, generator="reference_disc.py", rows=rows), file, indent=1)
        file.write("\n")


if __name__ == "__main__":
    main()
