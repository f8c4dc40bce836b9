#!/usr/bin/env python3
"""Points of three exact transient solutions, each evaluated by two routes.

Gardner soil K = Ks exp(alpha h), theta = theta_r + (theta_s - theta_r) exp(alpha h), so that K
obeys a linear equation.  Written values come from the first route, uncertainties from the
difference to the second:

linear_column  Philip 1969 (Adv. Hydrosci. 5:215): h = 0 on a deep column at h_i.
               1. Laplace transform on Talbot's contour   2. error functions
tracy_axisymmetric  Tracy 2006 (Water Resour. Res. 42:W08503), J0(k1 r) for the sine, k1 = j01/R.
               1. images, each with error functions       2. Fourier series
srivastava_yeh  Srivastava & Yeh 1991 (Water Resour. Res. 27:753), homogeneous column.
               1. Laplace transform on Talbot's contour   2. series over roots of tan(l L) + 2 l = 0
Talbot's contour with the weights of Weideman 2006 (SIAM J. Numer. Anal. 44:2342).
"""
import json
import os

import numpy as np
from scipy.integrate import quad
from scipy.optimize import brentq
from scipy.special import erf, erfc, erfcx, j0, j1, jn_zeros

HERE = os.path.dirname(os.path.abspath(__file__))


def invert(transform, t, n=24):
    """Inverse Laplace transform; singularities on the negative real axis only."""
    theta = (2 * np.arange(n) + 1) * np.pi / n - np.pi
    p = n / t * (0.5017 * theta / np.tan(0.6407 * theta) - 0.6122 + 0.2645j * theta)
    slope = n / t * (0.5017 / np.tan(0.6407 * theta)
                     - 0.5017 * 0.6407 * theta / np.sin(0.6407 * theta) ** 2 + 0.2645j)
    return (np.sum(np.exp(p * t) * transform(p) * slope) / (1j * n)).real


def number(value):
    return float("%.12g" % value)


def spread(pairs, floor):
    """Largest difference of the two routes, rounded up, at least floor."""
    worst = max(abs(first - second) for first, second in pairs)
    return float("%.0e" % max(2 * worst, floor))


class LinearColumn:
    """Depth z [cm], t [d]; (K - Ki)/(Ks - Ki) has the transform exp((k/2D - s) z)/p."""

    alpha, ks, theta_r, theta_s, h_i = 0.05, 10.0, 0.05, 0.40, -200.0

    def __init__(self):
        self.k = self.ks / (self.theta_s - self.theta_r)
        self.d = self.k / self.alpha
        self.k_i = self.ks * np.exp(self.alpha * self.h_i)
        self.jump = self.ks - self.k_i

    def root(self, p):
        return np.sqrt(self.k**2 / (4 * self.d**2) + p / self.d)

    def head(self, share):
        return np.log((self.k_i + self.jump * share) / self.ks) / self.alpha

    def head_by_transform(self, z, t):
        half = self.k / (2 * self.d)
        return self.head(invert(lambda p: np.exp((half - self.root(p)) * z) / p, t))

    def head_by_erfc(self, z, t):
        width, drift = 2 * np.sqrt(self.d * t), self.k * t
        x = (z - drift) / width
        share = 0.5 * (erfc(x) + np.exp(-x**2) * erfcx((z + drift) / width))
        return self.head(share)

    def flux_by_transform(self, t):
        # q = K - D' dK/dz with K/alpha as potential: (half + root)/alpha for unit K
        half = self.k / (2 * self.d)
        share = invert(lambda p: (half + self.root(p)) / p, t) / self.alpha
        return self.k_i + self.jump * share

    def intake_by_transform(self, t):
        half = self.k / (2 * self.d)
        share = invert(lambda p: (half + self.root(p)) / p**2, t) / self.alpha
        return self.k_i * t + self.jump * share

    def intake_closed(self, t):
        tau = 0.5 * self.k * np.sqrt(t / self.d)
        return self.k_i * t + self.jump * (0.5 * t * (1 + erf(tau))
                                           + t * np.exp(-tau**2) / (2 * np.sqrt(np.pi) * tau)
                                           + self.d / self.k**2 * erf(tau))

    def flux_closed(self, t):
        tau = 0.5 * self.k * np.sqrt(t / self.d)
        return self.k_i + self.jump * (0.5 * (1 + erf(tau))
                                       + np.exp(-tau**2) / (2 * np.sqrt(np.pi) * tau))

    def table(self):
        heads, flows, pairs, flow_pairs = [], [], [], []
        for t in (0.01, 0.05, 0.1, 0.25, 0.5, 1.0, 2.0):
            for z in (1.0, 2.0, 5.0, 10.0, 20.0, 40.0):
                value, other = self.head_by_transform(z, t), self.head_by_erfc(z, t)
                pairs.append((value, other))
                heads.append(dict(time_d=t, depth_cm=z, h_cm=number(value)))
            row = self.flux_by_transform(t), self.intake_by_transform(t)
            flow_pairs += [(row[0] / self.flux_closed(t), 1), (row[1] / self.intake_closed(t), 1)]
            flows.append(dict(time_d=t, flux_cm_per_d=number(row[0]), intake_cm=number(row[1])))
        return dict(alpha_per_cm=self.alpha, Ks_cm_per_d=self.ks, theta_r=self.theta_r,
                    theta_s=self.theta_s, h_initial_cm=self.h_i, h_surface_cm=0.0,
                    heads=heads, heads_uncertainty_cm=spread(pairs, 1e-10),
                    surface=flows, surface_uncertainty_relative=spread(flow_pairs, 1e-10))


class Tracy:
    """z up from the bottom [cm], t [d]; radius R, height L, h_r at bottom, side and start."""

    radius, height, alpha, h_r, ks, theta_r, theta_s = 10.0, 30.0, 0.1, -100.0, 10.0, 0.05, 0.40

    def __init__(self):
        self.k1 = jn_zeros(0, 1)[0] / self.radius
        self.b = np.sqrt(self.alpha**2 / 4 + self.k1**2)
        self.c = self.alpha * (self.theta_s - self.theta_r) / self.ks
        self.dry = np.exp(self.alpha * self.h_r)

    def image(self, x, t):
        """Inverse transform of exp(-beta x)/p, beta^2 = b^2 + c p."""
        u, v = x * np.sqrt(self.c / t) / 2, self.b * np.sqrt(t / self.c)
        return 0.5 * (np.exp(-self.b * x) * erfc(u - v) + np.exp(-(u**2) - v**2) * erfcx(u + v))

    def image_slope(self, x, t):
        """Inverse transform of beta exp(-beta x)/p = -d/dx of image; x = 0 allowed."""
        u, v = x * np.sqrt(self.c / t) / 2, self.b * np.sqrt(t / self.c)
        bell = np.exp(-(u**2) - v**2)
        return (0.5 * self.b * (np.exp(-self.b * x) * erfc(u - v) - bell * erfcx(u + v))
                + np.sqrt(self.c / (np.pi * t)) * bell)

    def depth_by_images(self, z, t):
        return sum(self.image((2 * n + 1) * self.height - z, t)
                   - self.image((2 * n + 1) * self.height + z, t) for n in range(40))

    def depth_by_series(self, z, t):
        k = np.arange(1, 4001)
        l = k * np.pi / self.height
        g = (self.b**2 + l**2) / self.c
        steady = np.sinh(self.b * z) / np.sinh(self.b * self.height)
        return steady + 2 / (self.height * self.c) * np.sum(
            (-1.0) ** k * l / g * np.sin(l * z) * np.exp(-g * t))

    def head(self, depth, r, z):
        bar = (1 - self.dry) * j0(self.k1 * r) * np.exp(self.alpha * (self.height - z) / 2) * depth
        return np.log(bar + self.dry) / self.alpha

    def inflow(self, slope):
        """Downward flow through the top from dW/dz at the top."""
        area = np.pi * self.radius**2
        bell = 2 * np.pi * self.radius * j1(self.k1 * self.radius) / self.k1 * (1 - self.dry)
        return self.ks * (self.dry * area + bell * (0.5 + slope / self.alpha))

    def inflow_by_images(self, t):
        slope = self.image_slope(0.0, t)
        slope += 2 * sum(self.image_slope(2 * n * self.height, t) for n in range(1, 40))
        return self.inflow(slope)

    def inflow_by_transform(self, t):
        def slope(p):
            beta = np.sqrt(self.b**2 + self.c * p)
            return beta / np.tanh(beta * self.height) / p
        return self.inflow(invert(slope, t))

    def volume_by_images(self, t):
        value, _ = quad(lambda s: 2 * s * self.inflow_by_images(s * s), 0, np.sqrt(t),
                        epsabs=0, epsrel=1e-12, limit=200)
        return value

    def volume_by_transform(self, t):
        def slope(p):
            beta = np.sqrt(self.b**2 + self.c * p)
            return beta / np.tanh(beta * self.height) / p**2
        area = np.pi * self.radius**2
        bell = 2 * np.pi * self.radius * j1(self.k1 * self.radius) / self.k1 * (1 - self.dry)
        return self.ks * (t * (self.dry * area + 0.5 * bell)
                          + bell * invert(slope, t) / self.alpha)

    def table(self):
        heads, flows, pairs, flow_pairs = [], [], [], []
        for t in (0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 2.0, 10.0):
            for r in (0.0, 2.5, 5.0, 8.0):
                for z in (5.0, 15.0, 20.0, 25.0, 28.0):
                    value = self.head(self.depth_by_images(z, t), r, z)
                    pairs.append((value, self.head(self.depth_by_series(z, t), r, z)))
                    heads.append(dict(time_d=t, r_cm=r, z_cm=z, h_cm=number(value)))
            row = self.inflow_by_images(t), self.volume_by_images(t)
            flow_pairs += [(row[0] / self.inflow_by_transform(t), 1),
                           (row[1] / self.volume_by_transform(t), 1)]
            flows.append(dict(time_d=t, flow_cm3_per_d=number(row[0]), volume_cm3=number(row[1])))
        return dict(radius_cm=self.radius, height_cm=self.height, alpha_per_cm=self.alpha,
                    Ks_cm_per_d=self.ks, theta_r=self.theta_r, theta_s=self.theta_s,
                    h_bottom_side_initial_cm=self.h_r,
                    heads=heads, heads_uncertainty_cm=spread(pairs, 1e-10),
                    top=flows, top_uncertainty_relative=spread(flow_pairs, 1e-10))


class SrivastavaYeh:
    """K* = K/Ks; z* up from the water table, t*, L* scaled; flux q_a before, q_b after t* = 0."""

    length, q_a, q_b = 10.0, 0.1, 0.9

    def by_transform(self, z, t):
        def transform(p):
            beta, l = np.sqrt(p + 0.25), self.length
            top = np.exp(-beta * (l - z)) * (1 - np.exp(-2 * beta * z))
            low = np.exp(-2 * beta * l)
            return top / (beta * (1 + low) + 0.5 * (1 - low)) / p
        before = self.q_a - (self.q_a - 1) * np.exp(-z)
        change = (self.q_b - self.q_a) * np.exp((self.length - z) / 2)
        return before + change * invert(transform, t)

    def by_series(self, z, t):
        def f(l):
            return np.sin(l * self.length) + 2 * l * np.cos(l * self.length)
        half = np.pi / self.length
        total = 0.0
        for k in range(1, 400):
            l = brentq(f, (k - 0.5) * half, k * half, xtol=1e-15, rtol=1e-15)
            total += (np.sin(l * z) * np.sin(l * self.length) * np.exp(-l * l * t)
                      / (1 + self.length / 2 + 2 * l * l * self.length))
        return (self.q_b - (self.q_b - 1) * np.exp(-z) - 4 * (self.q_b - self.q_a)
                * np.exp((self.length - z) / 2 - t / 4) * total)

    def table(self):
        rows, pairs = [], []
        for t in (0.2, 0.5, 1.0, 2.0, 5.0, 10.0, 20.0):
            for z in (1.0, 3.0, 5.0, 7.0, 8.0, 9.0, 9.5, 10.0):
                value = self.by_transform(z, t)
                pairs.append((value, self.by_series(z, t)))
                rows.append(dict(t_star=t, z_star=z, K_star=number(value)))
        return dict(L_star=self.length, q_A_star=self.q_a, q_B_star=self.q_b, points=rows,
                    uncertainty=spread(pairs, 1e-10))


def main():
    column, tracy, rain = LinearColumn(), Tracy(), SrivastavaYeh()
    # Values known beforehand, from the formulas of the second routes evaluated elsewhere.
    for t, known in ((0.01, 0.995153), (0.1, 3.520711), (0.5, 9.565811), (2.0, 26.323727)):
        print(f"column intake({t}) {column.intake_by_transform(t):.6f} known {known}")
    for r, z, t, known in ((0.0, 25.0, 0.05, -12.134018), (5.0, 20.0, 10.0, -23.564567)):
        value = tracy.head(tracy.depth_by_images(z, t), r, z)
        print(f"tracy h({r},{z},{t}) {value:.6f} known {known}")
    print(f"rain K*(9,5) {rain.by_transform(9.0, 5.0):.6f} known 0.831465")
    out = dict(about="points of exact transient solutions in a Gardner soil; see README.md",
               generator="reference_points.py", linear_column=column.table(),
               tracy_axisymmetric=tracy.table(), srivastava_yeh=rain.table())
    for name, table in out.items():
        if isinstance(table, dict):
            print(name, {k: v for k, v in table.items() if "uncertainty" in k})
    with open(os.path.join(HERE, "reference.json"), "w") as file:
        json.dump(out, file, indent=1)
        file.write("\n")


if __name__ == "__main__":
    main()
