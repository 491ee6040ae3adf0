"""Writes random-stream.json: uniforms of Python's own Mersenne Twister, whose seeding of an integer seed + block * 2**32
is initialisation by the array [seed, block] (for block > 0), and whose random() takes 53 bits of two outputs.

Run: python3 random-stream.py (Python 3.11.7, standard library only).
"""

import json
import random
from pathlib import Path

CASES = [(0, 1), (1, 1), (1, 2), (20240101, 7), (2**32 - 1, 12345), (42, 2**32 - 1)]


def first(seed, block):
    random.seed(seed + (block << 32))
    uniforms = [random.random() for _ in range(2000)]
    return {"seed": seed, "block": block, "first": uniforms[:5], "last": uniforms[-5:], "count": len(uniforms)}


Path(__file__).with_suffix(".json").write_text(json.dumps([first(*case) for case in CASES], indent=1) + "\n")
