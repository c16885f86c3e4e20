"""What a sports scientist would write today: a countermovement jump's figures from a two-plate CSV by pandas or
numpy and SciPy. The benchmark `ingest` times it beside the product in one run.

    python3 -I ingest-baseline.py FOLDER

reads the name of a parser (`pandas` or `numpy`) from each line of its input, works through all files of the folder,
and prints a line of JSON: seconds by the clock and of the processor, and the mean takeoff velocity.
Needs Debian's python3-numpy, python3-pandas and python3-scipy.
"""

import glob
import json
import sys
import time

import numpy as np
import pandas as pd
from scipy.integrate import cumulative_trapezoid, trapezoid
from scipy.signal import butter, filtfilt

GRAVITY = 9.80665
RATE = 1000.0
STEP = 1.0 / RATE
# Two passes of second order: 50 Hz without delay, the cut-off corrected for both passes (Winter).
LOW_PASS = butter(2, (50 / 0.802) / (RATE / 2))


def read_pandas(path):
    values = pd.read_csv(path, engine="c").to_numpy()
    return values[:, 1], values[:, 2]


def read_numpy(path):
    values = np.loadtxt(path, delimiter=",", skiprows=1)
    return values[:, 1], values[:, 2]


def longest_below(force, limit):
    edges = np.flatnonzero(np.diff(np.concatenate(([0], (force < limit).view(np.int8), [0]))))
    starts, ends = edges[::2], edges[1::2]
    best = np.argmax(ends - starts)
    return int(starts[best]), int(ends[best])


def steadiest_second(force):
    n = int(RATE)
    moved = force - force[0]
    first = np.concatenate(([0.0], np.cumsum(moved)))
    second = np.concatenate(([0.0], np.cumsum(moved * moved)))
    mean = (first[n:] - first[:-n]) / n
    spread = (second[n:] - second[:-n]) / n - mean * mean
    return int(np.argmin(spread)), n


def figures(left, right):
    total = left + right
    begin, end = longest_below(total, 30.0)
    quarter = (end - begin) // 4
    empty = total[begin + quarter : end - quarter]
    threshold = empty.mean() + 5 * empty.std(ddof=1)
    middle = (begin + end) // 2
    takeoff = int(np.flatnonzero(total[:middle] >= threshold)[-1]) + 1
    touchdown = middle + int(np.argmax(total[middle:] >= threshold))

    quiet, n = steadiest_second(total[:takeoff])
    weighing = total[quiet : quiet + n]
    weight, spread = weighing.mean(), weighing.std(ddof=1)
    mass = weight / GRAVITY
    moved = np.abs(total[quiet + n : takeoff] - weight) > 5 * spread
    onset = max(0, quiet + n + int(np.argmax(moved)) - 30)

    push = total[onset : takeoff + 1]
    velocity = cumulative_trapezoid((push - weight) / mass, dx=STEP, initial=0)
    depth = cumulative_trapezoid(velocity, dx=STEP, initial=0)
    power = push * velocity
    slowest = int(np.argmin(velocity))
    deepest = slowest + int(np.argmax(velocity[slowest:] >= 0))
    braking, propulsion = slice(slowest, deepest + 1), slice(deepest, push.size)
    flight = (touchdown - takeoff) * STEP
    contact = (takeoff - onset) * STEP
    height = velocity[-1] ** 2 / (2 * GRAVITY)

    smooth = filtfilt(*LOW_PASS, total)
    peak = touchdown + int(np.argmax(smooth[touchdown : touchdown + 200]))
    rise = smooth[touchdown : peak + 1]
    at20, at80 = int(np.argmax(rise >= 0.2 * rise[-1])), int(np.argmax(rise >= 0.8 * rise[-1]))
    settled = np.flatnonzero(np.abs(smooth[touchdown : touchdown + 3000] - weight) > 0.05 * weight)

    def feet(begin_at, end_at):
        return trapezoid(left[begin_at:end_at], dx=STEP), trapezoid(right[begin_at:end_at], dx=STEP)

    pushed, landed = feet(onset + deepest, takeoff + 1), feet(touchdown, touchdown + 101)
    return (
        weight, mass, onset * STEP, takeoff * STEP, touchdown * STEP, contact, flight, velocity[-1],
        height, GRAVITY * flight * flight / 8, height / contact, flight / contact, depth.min(), velocity[slowest],
        slowest * STEP, (deepest - slowest) * STEP, (push.size - 1 - deepest) * STEP,
        trapezoid(push[braking] - weight, dx=STEP), trapezoid(push[propulsion] - weight, dx=STEP),
        push[braking].mean(), push[propulsion].mean(), push[propulsion].max(), push[deepest],
        (push[deepest] - push[slowest]) / ((deepest - slowest) * STEP), power.max(), power.max() / mass,
        power[propulsion].mean(), total[touchdown : touchdown + 500].max(),
        (rise[at80] - rise[at20]) / (max(at80 - at20, 1) * STEP), np.gradient(rise).max() * RATE,
        200 * (pushed[1] - pushed[0]) / (pushed[0] + pushed[1]),
        200 * (landed[1] - landed[0]) / (landed[0] + landed[1]),
        (settled[-1] + 1) * STEP,
    )  # fmt: skip


def main():
    files = sorted(glob.glob(sys.argv[1] + "/*.csv"))
    parsers = {"pandas": read_pandas, "numpy": read_numpy}
    for line in sys.stdin:
        read = parsers[line.strip()]
        clock, processor = time.perf_counter(), time.process_time()
        velocities = [figures(*read(path))[7] for path in files]
        spent = {"clockS": time.perf_counter() - clock, "processorS": time.process_time() - processor}
        print(json.dumps({**spent, "meanVelocity": float(np.mean(velocities)), "files": len(files)}), flush=True)


main()
