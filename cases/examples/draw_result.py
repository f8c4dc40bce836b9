#!/usr/bin/env python3
"""Draws one result folder of `ringwright simulate` as a PNG: the wetted ground at the stop and
what the form would say against when you stop.

    cases/examples/draw_result.py out/alderwick/carsel-parrish-1988 picture.png

Needs python3-h5py and python3-matplotlib. It reads fields.h5 only (postprocess/results/LAYOUT.md).
"""
import json
import sys

import h5py
import matplotlib
import numpy as np

matplotlib.use("Agg")
import matplotlib.pyplot as plt
from matplotlib.collections import PolyCollection


def draw_ground(axes, file, stop):
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
    case = json.loads(file["provenance/resolved_case"][()])
    test = case["tests"][0]
    radius, insertion, head = (
        100 * test[key]["value"] for key in ("ring_radius", "insertion", "head"))
    axes.fill_between([-radius, radius], 0, head, color="#9ecae1", zorder=2)
    for side in (1, -1):
        axes.plot([side * radius] * 2, [-insertion, head + 5], color="black", lw=2.5, zorder=3)
    axes.axhline(0, color="black", lw=0.8)
    reach = 45
    axes.set(xlim=(-reach, reach), ylim=(-35, 14), aspect="equal", xlabel="cm from the axis",
             ylabel="cm above the ground", title=f"Water in the ground after {times[k] / 60:.0f} min")
    axes.figure.colorbar(cells, ax=axes, label="water content", shrink=0.7)


def draw_ladder(axes, file, stop):
    """Reported over true Kfs against the time of stopping."""
    hours = file["ladder/time"][:] / 3600
    for key, label, style in (("reads_rate_as_kfs", "rate read as Kfs", "o-"),
                              ("reads_one_head", "one-head formula, assumed alpha*", "s-"),
                              ("reads_one_head_own_lambda", "the same, soil's own capillary length", "^:")):
        axes.plot(hours, file[f"ladder/{key}"][:], style, ms=5, label=label)
    axes.axhline(1, color="black", lw=2)
    axes.axvline(stop / 3600, color="gray", ls="--", lw=1)
    axes.annotate("stop rule", (stop / 3600, 0.83), textcoords="offset points", xytext=(5, 0),
                  color="gray")
    ticks = [0.5, 1, 2, 4, 8]
    axes.set(xscale="log", yscale="log", xlabel="stop after (h)", ylabel="reported Kfs / true Kfs",
             title="What the form would say")
    axes.set_xticks(ticks, [f"{t:g}" for t in ticks])
    axes.set_yticks([0.8, 1, 1.5, 2, 3, 4], ["0.8", "1", "1.5", "2", "3", "4"])
    axes.minorticks_off()
    axes.legend(frameon=False, fontsize=9)


def main():
    folder, picture = sys.argv[1:3]
    with h5py.File(f"{folder}/fields.h5") as file:
        stop = file["ladder/time"][:][file["ladder/stops_here"][:] == 1][0]
        figure, (left, right) = plt.subplots(1, 2, figsize=(11, 4.6), layout="constrained")
        draw_ground(left, file, stop)
        draw_ladder(right, file, stop)
        figure.savefig(picture, dpi=110)


if __name__ == "__main__":
    main()
