#!/usr/bin/python3
"""The benchmark's semi-discrete problems integrated in time with NumPy and SciPy.

    scipy_reference.py PROBLEM.json ...

Reads what `ringwright_benchmark --export` writes: cells, faces, conditions, soil. The equations in
space are the same, only the integration in time is another:

  mixed   variable-step BDF2 of the water content, Newton in the pressure head, the LU of the sparse
          analytic Jacobian kept while it converges well (scipy.sparse.linalg.splu)
  Euler   the same with backward Euler steps
  BDF     scipy.integrate.solve_ivp in the pressure head, sparse analytic Jacobian; where the soil is
          saturated it needs a specific storage, 1e-3 per m
  Radau   the same with Radau IIA

Curves in closed form, flux potential from a fine table, everything vectorised. Errors are relative
differences from the volumes of the same problem integrated with a very small tolerance, the worst of
all from 5 % of the duration; the tolerance is loosened until that error equals ours.
"""
import argparse
import json
import time

import numpy as np
from scipy.integrate import solve_ivp
from scipy.sparse import csc_matrix
from scipy.sparse.linalg import splu

SATURATED_STORAGE = 1e-3  # 1/m, for solve_ivp only


class Soil:
    def __init__(self, p):
        self.alpha, self.n, self.l, self.h_s = p["alpha"], p["n"], p["l"], p["h_s"]
        self.m = 1 - 1 / self.n
        self.fillable = p["theta_s"] - p["theta_r"]
        self.Ks = p["Ks"]
        x_s = (self.alpha * -self.h_s) ** self.n
        self.S_s = (1 + x_s) ** -self.m
        self.F_s = 1 - (x_s / (1 + x_s)) ** self.m
        self.log_suction = np.linspace(np.log(1e-7), np.log(1e3), 40001)
        h = -np.exp(self.log_suction)
        K = self.curves(h)[2]
        # integral of K over h, from dry to wet
        step = 0.5 * (K[1:] + K[:-1]) * -np.diff(h)
        self.Phi_table = np.append(np.cumsum(step[::-1])[::-1], 0.0)
        self.Phi_s = np.interp(np.log(max(-self.h_s, 1e-7)), self.log_suction, self.Phi_table)

    def curves(self, h):
        """theta - theta_r, dtheta/dh, K/Ks, dK/dh / Ks, d(ln dtheta/dh)/dh."""
        dry = h < min(self.h_s, -1e-9)
        s = np.where(dry, -h, 1.0)
        x = (self.alpha * s) ** self.n
        w = x / (1 + x)
        w_m = w ** self.m
        S = (1 + x) ** -self.m / self.S_s
        F = (1 - w_m) / self.F_s
        K = S ** self.l * F * F
        per_log = self.m * self.n * (self.l * w + 2 * w_m / (1 + x) / (1 - w_m))
        theta = self.fillable * np.where(dry, S, 1.0)
        C = np.where(dry, self.fillable * S * self.m * self.n * w / s, 0.0)
        return (theta, C, np.where(dry, K, 1.0), np.where(dry, K * per_log / s, 0.0),
                np.where(dry, ((self.m + 1) * self.n * w - (self.n - 1)) / s, 0.0))

    def potential(self, h):
        suction = np.maximum(-h, 1e-7)
        dry = np.interp(np.log(suction), self.log_suction, self.Phi_table)
        return np.where(h < self.h_s, dry, self.Phi_s + np.maximum(h - self.h_s, 0.0))


class Problem:
    def __init__(self, p):
        self.soil = soil = Soil(p["soil"])
        self.V = np.array(p["cell_volume"])
        self.n = len(self.V)
        f = {k: np.array(v) for k, v in p["faces"].items()}
        self.a, self.b = f["a"], f["b"]
        self.T = soil.Ks * f["transmissibility"]
        self.rise_a, self.rise_b = f["weight_a"] * f["rise"], (1 - f["weight_a"]) * f["rise"]
        groups = {}
        for face in p["boundary"]:
            groups.setdefault(face["kind"], []).append(face)
        pond, air = groups["head"], groups["seepage"]
        column = lambda faces, key: np.array([x[key] for x in faces])
        both = pond + air
        self.top = column(both, "cell")
        self.ring = np.arange(len(both)) < len(pond)
        head = np.where(self.ring, p["pond_head"], 0.0)
        self.top_T = soil.Ks * column(both, "transmissibility")
        rise, weight = column(both, "rise"), column(both, "weight_cell")
        self.top_rise = weight * rise
        self.top_fixed = -soil.potential(head) + (1 - weight) * rise
        drain = groups["free drainage"]
        self.bottom = column(drain, "cell")
        self.bottom_T = soil.Ks * column(drain, "area") * column(drain, "normal_down")
        self.h0 = np.full(self.n, p["initial_head"])
        self.duration, self.times = p["duration"], np.array(p["times"])
        self.converged = np.array(p["converged_volume"])
        self.promised = self.times >= 0.05 * self.duration * (1 - 1e-9)
        self.own_error = self.error(np.array(p["own_volume"]))
        self._pattern()

    def error(self, volumes):
        return np.max(np.abs(volumes / self.converged - 1)[self.promised])

    def _pattern(self):
        d = np.arange(self.n)
        rows = np.concatenate([self.a, self.b, self.a, self.b, self.top, self.bottom, d])
        cols = np.concatenate([self.a, self.a, self.b, self.b, self.top, self.bottom, d])
        key = cols * self.n + rows
        unique, self.slot = np.unique(key, return_inverse=True)
        self.indices = (unique % self.n).astype(np.int32)
        self.indptr = np.searchsorted(unique // self.n, np.arange(self.n + 1)).astype(np.int32)
        self.nnz = len(unique)

    def outflow(self, h, K):
        """Net outflow of each cell, inflow through the ring, which seepage faces are open."""
        Phi = self.soil.potential(h)
        q = self.T * (Phi[self.a] - Phi[self.b] + K[self.a] * self.rise_a + K[self.b] * self.rise_b)
        top = self.top_T * (Phi[self.top] + K[self.top] * self.top_rise + self.top_fixed)
        open_ = self.ring | (top > 0)
        top = np.where(open_, top, 0.0)
        n = self.n
        out = np.bincount(self.a, q, n) - np.bincount(self.b, q, n)
        out += np.bincount(self.top, top, n)
        out += np.bincount(self.bottom, self.bottom_T * K[self.bottom], n)
        return out, -top[self.ring].sum(), open_

    def jacobian(self, K, dK, open_, diagonal):
        """Matrix of d(outflow)/dh + diagonal."""
        da = self.T * (K[self.a] + dK[self.a] * self.rise_a)
        db = self.T * (dK[self.b] * self.rise_b - K[self.b])
        top = np.where(open_, self.top_T * (K[self.top] + dK[self.top] * self.top_rise), 0.0)
        values = np.concatenate([da, -da, db, -db, top, self.bottom_T * dK[self.bottom], diagonal])
        data = np.bincount(self.slot, values, self.nnz)
        return csc_matrix((data, self.indices, self.indptr), shape=(self.n, self.n))


class Mixed:
    """One integration; `volumes` at the problem's times, and what it took."""

    def __init__(self, problem, tolerance, order=2):
        self.p, self.tol, self.order = problem, tolerance, order
        self.steps = self.iterations = self.factorisations = 0
        self.lu, self.lu_c = None, 0.0
        self.volumes = self._run()

    def _newton(self, h, c, history):
        """Solves V (c theta(h) + history) + outflow(h) = 0; None when it does not converge."""
        p, best, change = self.p, np.inf, np.inf
        for k in range(12):
            theta, C, K, dK, _ = p.soil.curves(h)
            out, inflow, open_ = p.outflow(h, K)
            r = p.V * (c * theta + history) + out
            defect = np.max(np.abs(r) / p.V) / c
            if k and defect < 0.01 * self.tol and change < 1e-3:
                return h, theta, inflow
            if not np.isfinite(defect):
                return None
            if self.lu is None or not 0.6 < c / self.lu_c < 1.67 or defect > 0.3 * best:
                self.lu = splu(p.jacobian(K, dK, open_, c * p.V * C), permc_spec="MMD_AT_PLUS_A",
                               diag_pivot_thresh=0.001, options={"SymmetricMode": True})
                self.lu_c = c
                self.factorisations += 1
            step = self.lu.solve(r)
            self.iterations += 1
            limit = 0.5 * np.abs(h) + 0.2
            change = np.max(np.abs(step))
            h = h - np.clip(step, -limit, limit)
            best = min(best, defect)
        return None

    def _error(self, theta, dt, T, W):
        """Of the step over the tolerance, from the difference to an extrapolation."""
        d1 = T[-1] - T[-2]
        slope = (W[-1] - W[-2]) / d1
        predicted = W[-1] + dt * slope
        if self.order == 1:
            share = dt / (2 * dt + d1)
        else:
            d2 = T[-2] - T[-3]
            predicted += dt * (dt + d1) * (slope - (W[-2] - W[-3]) / d2) / (d1 + d2)
            bdf = dt * (dt + d1) / (2 * dt + d1)
            share = bdf / (bdf + dt + d1 + d2)
        return share * np.sqrt(np.mean((theta - predicted) ** 2)) / self.tol

    def _run(self):
        p, t, dt = self.p, 0.0, 1e-7 * self.p.duration
        h, h_old = p.h0, p.h0
        theta, _, K, _, _ = p.soil.curves(h)
        _, q, _ = p.outflow(h, K)
        T, W, Q, H = [0.0], [theta], [0.0], [q]  # times, contents, volumes, flows
        while t < p.duration:
            dt = min(dt, p.duration - t)
            order = min(self.order, len(T))
            w = dt / (T[-1] - T[-2]) if len(T) > 1 else 0.0
            if order == 1:
                c, history = 1 / dt, -W[-1] / dt
            else:
                c = (1 + 2 * w) / (1 + w) / dt
                history = (-(1 + w) * W[-1] + w * w / (1 + w) * W[-2]) / dt
            start = h + np.clip((h - h_old) * w, -0.2, 0.2) * (h > -0.5)
            found = self._newton(start, c, history)
            if found is None:
                self.lu = None
                dt *= 0.3
                if dt < 1e-14 * p.duration:
                    raise RuntimeError("the time step became too small")
                continue
            h_new, theta, q = found
            factor = 2.0
            if len(T) > self.order:
                error = self._error(theta, dt, T, W)
                factor = np.clip(0.85 * max(error, 1e-6) ** (-1 / (1 + self.order)), 0.3, 2.0)
                if error > 1:
                    dt *= factor
                    continue
            if order == 1:
                Q.append(Q[-1] + q * dt)
            else:
                past = (1 + w) * Q[-1] - w * w / (1 + w) * Q[-2]
                Q.append((past + dt * q) * (1 + w) / (1 + 2 * w))
            t += dt
            T.append(t), W.append(theta), H.append(q)
            h_old, h = h, h_new
            self.steps += 1
            if factor > 1.2 or factor < 1:  # else the matrix can be kept
                dt *= factor
            W[:-3] = [None] * (len(W) - 3)
        return hermite(p.times, np.array(T), np.array(Q), np.array(H))


def hermite(x, t, y, slope):
    i = np.clip(np.searchsorted(t, x) - 1, 0, len(t) - 2)
    w = t[i + 1] - t[i]
    s = (x - t[i]) / w
    return (y[i] * (1 + 2 * s) * (1 - s) ** 2 + y[i + 1] * s * s * (3 - 2 * s)
            + w * (slope[i] * s * (1 - s) ** 2 - slope[i + 1] * s * s * (1 - s)))


class Ivp:
    """solve_ivp on (h of each cell, volume)."""

    def __init__(self, problem, tolerance, method, limit):
        self.p, n = problem, problem.n
        started = time.process_time()

        def rate(_, y):
            if time.process_time() - started > limit:
                raise TimeoutError
            _, C, K, _, _ = self.p.soil.curves(y[:n])
            out, inflow, _ = self.p.outflow(y[:n], K)
            return np.append(-out / (self.p.V * (C + SATURATED_STORAGE)), inflow)

        def jacobian(_, y):
            p, (_, C, K, dK, log_C) = self.p, self.p.soil.curves(y[:n])
            out, _, open_ = p.outflow(y[:n], K)
            total = C + SATURATED_STORAGE
            A = p.jacobian(K, dK, open_, -out * C * log_C / total).tocoo()
            c = p.top[p.ring]
            ring = -p.top_T[p.ring] * (K[c] + dK[c] * p.top_rise[p.ring])
            return csc_matrix((np.append(-A.data / (p.V * total)[A.row], ring),
                               (np.append(A.row, np.full(len(c), n)), np.append(A.col, c))),
                              shape=(n + 1, n + 1))

        y0 = np.append(problem.h0, 0.0)
        atol = np.append(np.full(n, tolerance), tolerance * 1e-2)
        found = solve_ivp(rate, (0, problem.duration), y0, method=method, jac=jacobian,
                          t_eval=problem.times, rtol=tolerance, atol=atol)
        if found.status != 0:
            raise RuntimeError(found.message)
        self.volumes = found.y[n]
        self.steps, self.iterations, self.factorisations = found.nfev, found.njev, found.nlu


def cpu_time(work, repeats):
    times = []
    for _ in range(repeats):
        start = time.process_time()
        result = work()
        times.append(time.process_time() - start)
    return result, float(np.median(times))


def loosest(problem, integrate, tolerances, allowed):
    """The first of the falling tolerances whose error is not above what is allowed."""
    for tolerance in tolerances:
        try:
            run = integrate(tolerance)
        except TimeoutError:
            return None
        except (RuntimeError, ValueError):
            continue
        if problem.error(run.volumes) <= allowed:
            return tolerance
    return None


def compare(file, methods, limit):
    with open(file) as f:
        data = json.load(f)
    p = Problem(data)
    allowed = {"ours": p.own_error, "asked": data["accuracy"]}
    for method in methods:
        def integrate(tolerance):
            if method in ("mixed", "Euler"):
                return Mixed(p, tolerance, 2 if method == "mixed" else 1)
            return Ivp(p, tolerance, method, limit)

        for name, error in allowed.items():
            tolerances = (3e-2 if method in ("mixed", "Euler") else 0.1) * 0.6 ** np.arange(26)
            tolerance = loosest(p, integrate, tolerances, error)
            head = f'{data["case"]:<11}{100 * data["accuracy"]:>5.1f}%{p.n:>7}  {method:<6}{name:<6}'
            if tolerance is None:
                print(f"{head}  not reached within {limit:g} s", flush=True)
                continue
            run, seconds = cpu_time(lambda: integrate(tolerance), 5)
            print(f"{head}{100 * error:>9.4f}{100 * p.error(run.volumes):>9.4f}{run.steps:>7}"
                  f"{run.iterations:>8}{run.factorisations:>7}{1e3 * seconds:>10.1f}"
                  f'{1e3 * seconds / data["cpu_ms_cached"]:>8.0f}'
                  f'{1e3 * seconds / data["cpu_ms_cold"]:>8.0f}', flush=True)


def main():
    parser = argparse.ArgumentParser(description=__doc__.split("\n\n")[0])
    parser.add_argument("problems", nargs="+")
    parser.add_argument("--methods", default="mixed,Euler,BDF")
    parser.add_argument("--limit", type=float, default=5.0, help="CPU seconds for one solve_ivp")
    options = parser.parse_args()
    np.seterr(all="ignore")  # solve_ivp tries absurd heads and takes them back
    print(f'{"case":<11}{"asked":>6}{"cells":>7}  {"method":<6}{"error":<6}{"allowed%":>9}'
          f'{"got%":>9}{"steps":>7}{"Newton":>8}{"facto":>7}{"ms":>10}{"x cached":>8}{"x cold":>8}')
    for file in options.problems:
        compare(file, options.methods.split(","), options.limit)


if __name__ == "__main__":
    main()
