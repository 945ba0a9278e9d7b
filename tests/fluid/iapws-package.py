# SPDX-License-Identifier: GPL-3.0-or-later
"""Answers lines "pair a b" (SI) from the file named by the first argument with
the states that python3-iapws computes, one line each: p T h s v cp cv w x, or
the word "none" where it refuses.  Exit status 77: the package is not there."""
import sys
import warnings

warnings.filterwarnings("ignore")
try:
    from iapws import IAPWS97
    from iapws.iapws97 import _Region3
except ImportError:
    sys.exit(77)


def show(*values):
    print(" ".join(repr(float("nan") if v is None else float(v)) for v in values))


def answer(pair, a, b):
    if pair == "dT":
        # Region 3 by its own equation: the package's way from (p,T) stops at the backward equation v(p,T).
        r = _Region3(a, b)
        show(r["P"] * 1e6, b, r["h"] * 1e3, r["s"] * 1e3, 1.0 / a, r["cp"] * 1e3, r["cv"] * 1e3, r["w"], None)
        return
    arguments = {"pT": {"P": a / 1e6, "T": b}, "ph": {"P": a / 1e6, "h": b / 1e3}, "ps": {"P": a / 1e6, "s": b / 1e3},
                 "hs": {"h": a / 1e3, "s": b / 1e3}, "px": {"P": a / 1e6, "x": b}, "Tx": {"T": a, "x": b}}[pair]
    try:
        state = IAPWS97(**arguments)
        has_state = state.status == 1
    except NotImplementedError:
        has_state = False
    if not has_state:
        print("none")
        return
    one_phase = state.x in (0, 1)
    show(state.P * 1e6, state.T, state.h * 1e3, state.s * 1e3, state.v,
         *((state.cp * 1e3, state.cv * 1e3, state.w) if one_phase else (None, None, None)), state.x)


for line in open(sys.argv[1]):
    kind, first, second = line.split()
    answer(kind, float(first), float(second))
