"""The budget of engine.mjs derived by hand for numpy, with what depends on the frequencies alone cached.

Reads the budget's numbers as one line of JSON, then the number of evaluations to time on every further line; answers with
nanoseconds an evaluation and a checksum of all curves. Twelve contributions: two mechanical baths, three ports of one
detuned cavity, four power laws, a steep one, a table, white noise; amplitude densities of each and of the total.
"""
import json
import sys
import time

import numpy as np

HBAR = 6.62607015e-34 / (2 * np.pi)
KB = 1.380649e-23


def plan(p):
    f = np.exp(np.log(p["low"]) + np.log(p["high"] / p["low"]) * np.arange(p["points"]) / (p["points"] - 1))
    table = np.array(p["table"])
    w = 2 * np.pi * f
    x = HBAR * w / (2 * KB * p["temperature"])
    return {
        "f": f,
        "w": w,
        "bath": 4 * KB * p["temperature"] * x / np.tanh(x),
        "powers": [f ** e for _, e in p["powers"]],
        "table": np.exp(np.interp(np.log(f), np.log(table[:, 0]), np.log(table[:, 1]))),
    }


def evaluate(g, p):
    w = g["w"]
    m, k, d, G, nbar = p["mass"], p["kappa"], p["detuning"], p["coupling"], p["quanta"]
    wm = 2 * np.pi * p["frequency"]
    kin, kback, kinner = p["rates"]
    out = [(m * wm / p["gas"]) * g["bath"], (m * wm ** 2 / p["wire"]) * (g["bath"] / w)]
    cc = 1 / (k / 2 - 1j * (d + w))
    cs = 1 / (k / 2 + 1j * (d - w))
    force = HBAR * G * np.sqrt(nbar)
    pull = G * np.sqrt(nbar)
    chi = 1 / (m * ((wm - w) * (wm + w)) - 1j * m * (w * (wm / p["gas"]) + wm ** 2 / p["wire"]) - 1j * HBAR * G ** 2 * nbar * (cc - cs))
    psi = np.angle((kin - k / 2) + 1j * d)
    em = np.exp(-1j * (p["angle"] + psi))
    ep = np.conj(em)
    root = np.sqrt(kin)
    pc = (root * em) * cc
    pq = (root * ep) * cs
    R = (1j * pull) * (pc - pq) * chi
    i2 = 1 / (R.real ** 2 + R.imag ** 2)
    A = pc + (force * cc) * R
    B = pq + (force * cs) * R
    S = (A.real ** 2 + A.imag ** 2 + B.real ** 2 + B.imag ** 2) * i2
    A = root * A - em
    B = root * B - ep
    out.append((A.real ** 2 + A.imag ** 2 + B.real ** 2 + B.imag ** 2) * i2)
    out += [kback * S, kinner * S]
    out += [level / 100.0 ** e * shape for (level, e), shape in zip(p["powers"], g["powers"])]
    out += [g["table"], np.full_like(w, p["white"])]
    total = out[0] + out[1]
    for o in out[2:]:
        total += o
    return [np.sqrt(o) for o in out], np.sqrt(total)


def main():
    p = json.loads(sys.stdin.readline())
    g = plan(p)
    until = time.perf_counter() + 0.5
    while time.perf_counter() < until:
        evaluate(g, p)
    for line in sys.stdin:
        runs = int(line)
        start = time.perf_counter_ns()
        for _ in range(runs):
            lines, total = evaluate(g, p)
        spent = (time.perf_counter_ns() - start) / runs
        checksum = (np.log(total).sum() + sum(np.log(a).sum() for a in lines)) / p["points"]
        print(f"{spent:.0f} {checksum:.9f}", flush=True)


main()
