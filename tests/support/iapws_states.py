"""Random states of water and steam by Debian's python3-iapws, one JSON array a line.

Usage: iapws_states.py SEED COUNT
A line is [kind, pressure bar a, temperature degC, dryness or null, enthalpy kJ/kg, specific volume m3/kg].
Kinds in turn: saturated (liquid and vapour), wet, superheated to 350 degC, subcooled; 0 to 16 bar g.
"""

import json
import random
import sys

from iapws import IAPWS97

ATMOSPHERE_BAR = 1.01325
HIGHEST_BAR_G = 16.0
HOTTEST_C = 350.0
KINDS = ("saturated", "wet", "superheated", "subcooled")


def saturated(pressure, dryness):
    return IAPWS97(P=pressure / 10, x=dryness), dryness


def single(pressure, celsius):
    return IAPWS97(P=pressure / 10, T=celsius + 273.15), None


def state(kind, rnd):
    # every kind takes the same three numbers, so that a longer run begins as a shorter one does
    first, second, third = rnd.random(), rnd.random(), rnd.random()
    pressure = ATMOSPHERE_BAR + HIGHEST_BAR_G * first
    if kind == "saturated":
        return pressure, *saturated(pressure, float(round(third)))
    if kind == "wet":
        return pressure, *saturated(pressure, 0.5 + 0.5 * second)
    boiling = IAPWS97(P=pressure / 10, x=0).T - 273.15
    if kind == "superheated":
        return pressure, *single(pressure, boiling + 1e-3 + (HOTTEST_C - boiling - 1e-3) * second)
    return pressure, *single(pressure, 0.01 + (boiling - 1e-3 - 0.01) * second)


def main(seed, count):
    rnd = random.Random(seed)
    for index in range(count):
        kind = KINDS[index % len(KINDS)]
        pressure, found, dryness = state(kind, rnd)
        print(json.dumps([kind, pressure, found.T - 273.15, dryness, found.h, found.v]))


if __name__ == "__main__":
    main(int(sys.argv[1]), int(sys.argv[2]))
