"""
Values that SciPy gives for what shared/statistics and shared/mechanics/signal compute, as JSON on the standard output.

    /usr/bin/python3 tests/reference/scipy/make-golden.py | npx prettier --parser json > tests/reference/scipy/golden.json

Run with Debian's python3-scipy. Input signals stand in the output beside the results, so that both sides compute on the
same numbers. golden.test.ts compares our functions with golden.json; fresh-golden.test.ts makes it anew and compares.
"""

import json
import platform

import numpy
import scipy
from scipy import integrate, signal, stats


def jump_like_force(rate_hz, duration_s):
    """Standing, a dip, a push, flight and a landing peak, in newtons: smooth pieces, and steps where feet leave."""
    t = numpy.arange(round(rate_hz * duration_s)) / rate_hz
    weight = 784.532
    force = numpy.full(t.size, weight)
    dip = (t >= 0.30) & (t < 0.55)
    force[dip] -= 420 * numpy.sin(numpy.pi * (t[dip] - 0.30) / 0.25) ** 2
    push = (t >= 0.55) & (t < 0.85)
    force[push] += 1250 * numpy.sin(numpy.pi * (t[push] - 0.55) / 0.30) ** 2
    force[(t >= 0.85) & (t < 1.05)] = 0
    landing = (t >= 1.05) & (t < 1.17)
    force[landing] = weight + 2300 * numpy.sin(numpy.pi * (t[landing] - 1.05) / 0.12)
    # A ripple of no special frequency, so that no sample repeats.
    return force + 3 * numpy.sin(2 * numpy.pi * 17.3 * t + 0.4)


def quantile(distribution, p):
    """ppf, polished by Newton's method on SciPy's own cdf: t.ppf of SciPy 1.10 is good to 1e-9 only, its cdf to 1e-14."""
    x = distribution.ppf(p)
    for _ in range(3):
        excess = distribution.cdf(x) - p if p <= 0.5 else (1 - p) - distribution.sf(x)
        x -= excess / distribution.pdf(x)
    return x


def quantiles():
    shares = [1e-6, 0.001, 0.005, 0.025, 0.05, 0.1, 0.3, 0.5, 0.7, 0.9, 0.95, 0.975, 0.995, 0.999, 1 - 1e-6]
    degrees = [1, 1.5, 2, 3, 4.785144, 7, 16, 30.5, 120, 1000, 25000]
    pairs = [[1, 1], [1, 7], [3, 15], [5, 4.785144], [15, 5], [4.2, 300], [18, 5], [120, 120], [1000, 3], [2, 25000]]
    return {
        "shares": shares,
        "normal": [quantile(stats.norm(), p) for p in shares],
        "t": [{"dof": d, "values": [quantile(stats.t(d), p) for p in shares]} for d in degrees],
        "chiSquared": [{"dof": d, "values": [quantile(stats.chi2(d), p) for p in shares]} for d in degrees],
        "f": [{"dof": pair, "values": [quantile(stats.f(*pair), p) for p in shares]} for pair in pairs],
    }


def regression(name, x, y, coverage):
    fit = stats.linregress(x, y)
    dof = len(x) - 2
    t = quantile(stats.t(dof), (1 + coverage) / 2)
    residuals = numpy.array(y) - (fit.intercept + fit.slope * numpy.array(x))

    def around(value, error):
        return {"value": value, "standardError": error, "low": value - t * error, "high": value + t * error}

    return {
        "name": name,
        "x": list(x),
        "y": list(y),
        "coverage": coverage,
        "slope": around(fit.slope, fit.stderr),
        "intercept": around(fit.intercept, fit.intercept_stderr),
        "residualSd": float(numpy.sqrt(residuals @ residuals / dof)),
        "rSquared": fit.rvalue**2,
    }


def regressions():
    return [
        regression("velocity against load", [0, 10, 20, 30, 40, 60], [2.61, 2.44, 2.27, 2.05, 1.93, 1.58], 0.95),
        regression("height over weeks", [0, 7, 15, 21, 30, 35, 43], [33.1, 33.9, 33.2, 34.4, 35.0, 34.6, 35.7], 0.90),
        regression("no relation", [1, 2, 3, 4, 5], [2.2, 1.9, 2.4, 2.0, 2.3], 0.99),
        regression("three points", [1, 2, 4], [-3, 0.5, 2], 0.95),
    ]


def trapezoid():
    rate_hz = 250
    force = jump_like_force(rate_hz, 1.3)
    weight = 784.532
    gravity = 9.80665
    acceleration = (force - weight) * gravity / weight
    return {
        "sampleRateHz": rate_hz,
        "weight": weight,
        "gravity": gravity,
        "force": force.tolist(),
        # m/s at each sample, from rest at the first.
        "velocity": integrate.cumulative_trapezoid(acceleration, dx=1 / rate_hz, initial=0).tolist(),
        # N·s over samples [from, to], ends between samples taken on the straight line between their neighbours.
        "impulses": [gross_impulse(force, rate_hz, *ends) for ends in [(0, 324), (75, 212), (40.25, 150.75), (40.2, 40.7)]],
    }


def gross_impulse(force, rate_hz, start, end):
    inner = numpy.arange(numpy.ceil(start), numpy.floor(end) + 1)
    places = numpy.unique(numpy.concatenate([[start], inner, [end]]))
    values = numpy.interp(places, numpy.arange(force.size), force)
    return {"from": start, "to": end, "impulse": integrate.trapezoid(values, places / rate_hz)}


# The cut-off of one pass for which p passes have theirs at the one asked for: tan(pi f/fs) over (2^(1/p) - 1)^(1/4)
# (Winter, Biomechanics and Motor Control of Human Movement, 4th ed., p. 69).
TWO_PASSES = (2 ** (1 / 2) - 1) ** 0.25


def corrected(cutoff_hz, rate_hz):
    return rate_hz / numpy.pi * numpy.arctan(numpy.tan(numpy.pi * cutoff_hz / rate_hz) / TWO_PASSES)


def butterworth():
    def design(rate_hz, cutoff_hz):
        one_b, one_a = signal.butter(2, cutoff_hz, fs=rate_hz)
        two_b, two_a = signal.butter(2, corrected(cutoff_hz, rate_hz), fs=rate_hz)
        # Gain of both passes together at the cut-off asked for.
        _, response = signal.freqz(two_b, two_a, worN=[cutoff_hz], fs=rate_hz)
        return {
            "sampleRateHz": rate_hz,
            "cutoffHz": cutoff_hz,
            "onePass": {"b": one_b.tolist(), "a": one_a.tolist()},
            "twoPasses": {"b": two_b.tolist(), "a": two_a.tolist()},
            "gainOfTwoPasses": float(abs(response[0]) ** 2),
        }

    return [design(*pair) for pair in [(1000, 10), (1000, 50), (1000, 100), (500, 50), (2000, 50), (100, 6)]]


def zero_lag():
    """filtfilt, padtype 'odd', padlen 60 or what the stretch has: each pass begins as if its first value had always been."""

    def filtered(rate_hz, cutoff_hz, start, end):
        force = jump_like_force(rate_hz, 1.3)
        b, a = signal.butter(2, corrected(cutoff_hz, rate_hz), fs=rate_hz)
        stretch = force[start:end]
        pad = min(60, stretch.size - 1)
        smooth = signal.filtfilt(b, a, stretch, padtype="odd", padlen=pad)
        return {
            "sampleRateHz": rate_hz,
            "cutoffHz": cutoff_hz,
            "from": start,
            "to": end,
            "padding": {"type": "odd", "samples": pad},
            "force": force.tolist(),
            "filtered": smooth.tolist(),
        }

    return [filtered(250, 50, 0, 325), filtered(250, 20, 70, 212), filtered(250, 20, 100, 130)]


def peak_crossings():
    """peak_widths: where force last rose through a share of its peak, by straight lines between samples."""

    def rise(name, rate_hz, force, share):
        peak = int(numpy.argmax(force))
        # A share s of the peak is a relative height 1 - s below it; prominence counts from zero force.
        prominences = (numpy.array([force[peak]]), numpy.array([0]), numpy.array([force.size - 1]))
        _, _, left, _ = signal.peak_widths(force, [peak], rel_height=1 - share, prominence_data=prominences)
        return {"name": name, "sampleRateHz": rate_hz, "force": force.tolist(), "peak": peak, "share": share, "position": left[0]}

    ramp = numpy.concatenate([numpy.zeros(20), numpy.linspace(0, 2400, 61), numpy.linspace(2400, 800, 41)[1:]])
    t = numpy.arange(0, 130) / 1000
    pulse = numpy.where((t >= 0.02) & (t <= 0.12), 2400 * numpy.sin(numpy.pi * (t - 0.02) / 0.1), 0).clip(0)
    u = numpy.arange(0, 160) / 1000
    first = 1100 * numpy.exp(-(((u - 0.045) / 0.010) ** 2))
    second = 2600 * numpy.exp(-(((u - 0.095) / 0.018) ** 2))
    shapes = [("ramp", 1000, ramp), ("half sine", 1000, pulse), ("two peaks", 1000, first + second)]
    return [rise(*shape, share) for shape in shapes for share in (0.2, 0.8)]


def main():
    golden = {
        "madeWith": {"scipy": scipy.__version__, "numpy": numpy.__version__, "python": platform.python_version()},
        "quantiles": quantiles(),
        "regressions": regressions(),
        "trapezoid": trapezoid(),
        "butterworth": butterworth(),
        "zeroLag": zero_lag(),
        "peakCrossings": peak_crossings(),
    }
    print(json.dumps(golden, allow_nan=False))


if __name__ == "__main__":
    main()
