#!/usr/bin/env python3
"""Draws one result folder of `ringwright simulate` as a PNG: the wetted ground at the stop, and what
the form would say: against when you stop for one constant head, rate and level against time for any
other test.

    cases/examples/draw_result.py out/alderwick/carsel-parrish-1988 picture.png

Needs python3-h5py and python3-matplotlib. It reads fields.h5 only (postprocess/results/LAYOUT.md).
A folder of a case with several tests is drawn by the first test of that name in the case.
"""
import json
import sys
from pathlib import Path

import h5py
import matplotlib
import numpy as np

matplotlib.use("Agg")
import matplotlib.pyplot as plt
from matplotlib.collections import PolyCollection

MM_PER_H = 3.6e6


def test_of(file, folder):
    """The test of the resolved case whose results the folder holds."""
    tests = json.loads(file["provenance/resolved_case"][()])["tests"]
    parts = Path(folder).resolve().parts
    for test in tests:
        if test["name"].replace(" ", "-").lower() in parts:
            return test
    return tests[0]


def centimetres(test, key):
    return 100 * test[key]["value"]


def stop_of(file):
    """Time at which the test ends [s]."""
    stops = file["ladder/time"][:][file["ladder/stops_here"][:] == 1]
    return stops[0] if len(stops) else file["stages/to"][-1]


def head_at(file, test, stop):
    """Head of the water in the ring at the stop [cm]; under a lid that is not its level."""
    heads = file["record/head"][:]
    return 100 * heads[-1] if len(heads) else centimetres(test, "head")


def draw_walls(axes, test, head):
    """Water and walls of the ring, or of both rings, to scale; a lid lies on the ring."""
    rings = [(centimetres(test, "ring_radius"), centimetres(test, "insertion"))]
    if "outer" in test:
        rings.append((centimetres(test["outer"], "ring_radius"),
                      centimetres(test["outer"], "insertion")))
    lid = test.get("lid")
    level = 100 * lid["underside"]["value"] if lid else head
    reach = rings[-1][0]
    axes.fill_between([-reach, reach], 0, level, color="#9ecae1", zorder=2)
    for radius, insertion in rings:
        for side in (1, -1):
            axes.plot([side * radius] * 2, [-insertion, level + (0 if lid else 5)], color="black",
                      lw=2.5, zorder=3)
    if lid:
        axes.plot([-reach, reach], [level, level], color="black", lw=4, zorder=3)
    axes.axhline(0, color="black", lw=0.8)
    return reach, level, max(insertion for _, insertion in rings)


def draw_layers(axes, file):
    """Where the soil changes downwards along the edge of what is drawn."""
    soil, r, z = (file[f"fields/{key}"][:] for key in ("soil", "centre_r", "centre_z"))
    edge = r > 0.999 * r.max()
    order = np.argsort(-z[edge])
    depths, soils = z[edge][order], soil[edge][order]
    for i in np.flatnonzero(np.diff(soils)):
        axes.axhline(100 * (depths[i] + depths[i + 1]) / 2, color="saddlebrown", ls=":", lw=1.5)


def draw_ground(axes, file, test, stop):
    """Water content in the section through the ring at the snapshot nearest the stop."""
    times = file["fields/time"][:]
    k = int(np.argmin(np.abs(times - stop)))
    corners = file["fields/points"][:][file["fields/cells"][:]] * 100
    theta = file["fields/water_content"][k]
    limits = (file["fields/water_content"][0].min(), theta.max())
    for side in (1, -1):
        cells = PolyCollection(corners * [side, 1], array=theta, cmap="viridis_r", edgecolors="face",
                               linewidths=0.2)
        cells.set_clim(*limits)
        axes.add_collection(cells)
    radius, level, insertion = draw_walls(axes, test, head_at(file, test, stop))
    draw_layers(axes, file)
    wetted = 100 * file["figures/wetted_depth"][()]
    deep = max(35, 1.3 * wetted, 2 * insertion)
    reach = max(45, 1.5 * radius, radius + 1.5 * 100 * file["figures/wetted_beyond_wall"][()])
    axes.set(xlim=(-reach, reach), ylim=(-deep, level + 9), aspect="equal",
             xlabel="cm from the axis", ylabel="cm above the ground",
             title=f"Water in the ground after {time_text(times[k])}")
    axes.figure.colorbar(cells, ax=axes, label="water content", shrink=0.7)


def time_text(seconds):
    if seconds < 3 * 3600:
        return f"{seconds / 60:.0f} min"
    return f"{seconds / 3600:.3g} h" if seconds < 96 * 3600 else f"{seconds / 86400:.3g} days"


def draw_ladder(axes, file, stop):
    """Reported over true Kfs against the time of stopping."""
    hours = file["ladder/time"][:] / 3600
    for key, label, style in (("reads_rate_as_kfs", "rate read as Kfs", "o-"),
                              ("reads_one_head", "one-head formula, assumed alpha*", "s-"),
                              ("reads_one_head_own_lambda", "the same, soil's own capillary length", "^:")):
        axes.plot(hours, file[f"ladder/{key}"][:], style, ms=5, label=label)
    axes.axhline(1, color="black", lw=2)
    axes.axvline(stop / 3600, color="gray", ls="--", lw=1)
    axes.annotate("stop", (stop / 3600, 0.83), textcoords="offset points", xytext=(5, 0),
                  color="gray")
    axes.set(xscale="log", yscale="log", xlabel="stop after (h)", ylabel="reported Kfs / true Kfs",
             title="What the form would say")
    label_ticks(axes.xaxis, [0.25, 0.5, 1, 2, 4, 8, 24, 48, 96, 240, 720], hours)
    values = np.concatenate([file[f"ladder/{key}"][:] for key in
                             ("reads_rate_as_kfs", "reads_one_head", "reads_one_head_own_lambda")])
    label_ticks(axes.yaxis, [0.5, 0.8, 1, 1.5, 2, 3, 4, 6, 8, 12, 16], np.append(values, [0.8, 1]))
    axes.minorticks_off()
    axes.legend(frameon=False, fontsize=9)


def label_ticks(axis, ticks, values):
    """Those ticks that lie within reach of the values."""
    low, high = 0.8 * values.min(), 1.25 * values.max()
    kept = [t for t in ticks if low <= t <= high]
    axis.set_ticks(kept, [f"{t:g}" for t in kept])


def draw_stages(axes, file, stop):
    """Rate against time, true and as the crew reads it, with stages and what pairs of heads give."""
    truth = file["figures/true_kfs"][()] * MM_PER_H
    for group, label, style in (("record", "into the ground", "o-"), ("as_read", "as read", "x")):
        axes.plot(file[f"{group}/time"][:] / 3600, file[f"{group}/rate"][:] * MM_PER_H, style, ms=4,
                  lw=1, label=label)
    stages = file["stages"]
    for start, end, soak, steady, head in zip(*(stages[key][:] for key in
                                                ("from", "to", "soak", "steady_rate", "head_from"))):
        falls = steady == 0 and not soak
        axes.axvspan(start / 3600, end / 3600, color="C0" if soak else "C1", alpha=0.07 + 0.15 * soak)
        axes.axvline(start / 3600, color="gray", lw=0.5)
        if end - start < 0.1 * stop:
            continue  # no room for words
        words = "soak " if soak else "falls from " if falls else ""
        axes.annotate(f"{words}{100 * head:.3g} cm", ((start + end) / 7200, 1),
                      xycoords=("data", "axes fraction"), textcoords="offset points",
                      xytext=(0, -12), ha="center", fontsize=8)
    for start, end, steady in zip(stages["from"][:], stages["to"][:], stages["steady_rate"][:]):
        if steady > 0:
            axes.plot([start / 3600, end / 3600], [steady * MM_PER_H] * 2, color="gray", ls="--", lw=1)
    axes.axhline(truth, color="black", lw=2, label=f"true Kfs {truth:.2g} mm/h")
    for second, kfs in zip(file["pairs/second"][:], file["pairs/kfs"][:]):
        axes.plot(stages["to"][second] / 3600, kfs * MM_PER_H, "D", color="C3", ms=7,
                  label=f"two-head Kfs {kfs * MM_PER_H:.2g} mm/h", zorder=4, clip_on=False)
    axes.set(xlim=(0, stop / 3600), ylim=(0, None), xlabel="h", ylabel="mm/h",
             title="Rate against time (dashed: steady)")
    axes.margins(y=0.15)
    axes.legend(frameon=False, fontsize=9)


def main():
    folder, picture = sys.argv[1:3]
    with h5py.File(f"{folder}/fields.h5") as file:
        stop = stop_of(file)
        figure, (left, right) = plt.subplots(1, 2, figsize=(11, 4.6), layout="constrained")
        draw_ground(left, file, test_of(file, folder), stop)
        (draw_ladder if len(file["ladder/time"]) else draw_stages)(right, file, stop)
        figure.savefig(picture, dpi=110)


if __name__ == "__main__":
    main()
