"""Peer of fv.Run: explicit single-point upstream, vectorised with NumPy over all cells.

Case fv-01 of testdata/independent/fv.json: the same curves, the same steps. It prints, for each
number of cells given as an argument, the cells and million cell-steps a second.
f is had in two ways, a speed each: by the power laws themselves, to rounding as in fv, and by linear
interpolation in a table of 1025 states, which is faster and right to some 1e-6.
"""
import json, os, sys, time
import numpy as np

here = os.path.dirname(os.path.abspath(__file__))
with open(os.path.join(here, "..", "independent", "fv.json")) as file:
    case = json.load(file)["cases"][0]["inputs"]
fluid, kr = case["fluid"], case["fluid"]["kr"]
low, high = kr["swc"], 1 - kr["sor"]


def power_laws(s):
    e = (s - low) / (high - low)
    w = kr["krw0"] * e ** kr["nw"] / fluid["mu_w"]
    o = kr["kro0"] * (1 - e) ** kr["no"] / fluid["mu_o"]
    return w / (w + o)


states = np.linspace(low, high, 1025)
table = power_laws(states)


def interpolated(s):
    return np.interp(s, states, table)


def run(f, cells, seconds):
    """Steps until the time is up; returns million cell-steps a second."""
    ratio = case["cfl"] / case["max_df_dS"]  # dQ/dx
    s = np.full(cells + 1, case["s_initial"])
    s[0] = case["s_injected"]
    steps, begun = 0, time.perf_counter()
    while True:
        for _ in range(20):
            flux = f(s)
            s[1:] -= ratio * (flux[1:] - flux[:-1])
        steps += 20
        spent = time.perf_counter() - begun
        if spent > seconds:
            return cells * steps / spent / 1e6


for argument in sys.argv[1:]:
    cells = int(argument)
    print(cells, run(power_laws, cells, 0.5), run(interpolated, cells, 0.5))
