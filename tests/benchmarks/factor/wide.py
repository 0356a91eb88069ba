#!/usr/bin/env python3
"""Writes a wide case for timing whole audits: wide.py FOLDER ROWS GROUPS TERMS

GROUPS left-out groups of TERMS numeric columns each, a final model of five, standard normal numbers of seed 1. The response depends on the final
model and on the first column of every fiftieth group.
"""
import random
import sys
from pathlib import Path

FINAL = 5


def main(folder: str, rows: int, groups: int, terms: int) -> None:
    numbers = random.Random(1)
    final = [f"x{j}" for j in range(1, FINAL + 1)]
    left_out = [[f"z{g}_{t}" for t in range(1, terms + 1)] for g in range(1, groups + 1)]
    path = Path(folder)
    path.mkdir(parents=True, exist_ok=True)
    with (path / "wide.csv").open("w") as file:
        print("y", *final, *(name for group in left_out for name in group), sep=",", file=file)
        for _ in range(rows):
            x = [numbers.gauss(0, 1) for _ in final]
            z = [numbers.gauss(0, 1) for _ in range(groups * terms)]
            y = 1 + sum(x) + 0.02 * sum(z[:: 50 * terms]) + numbers.gauss(0, 1)
            print(*(f"{value:.9g}" for value in [y, *x, *z]), sep=",", file=file)
    with (path / "wide.yaml").open("w") as file:
        print("audit: 1\nmodel: {id: wide}\ndata: {source: wide.csv}\nresponse: y", file=file)
        print(f"final_model: {{terms: [{', '.join(final)}]}}\nleft_out:", file=file)
        for g, group in enumerate(left_out, 1):
            print(f"  - {{group: group {g}, terms: [{', '.join(group)}]}}", file=file)


if __name__ == "__main__":
    main(sys.argv[1], *map(int, sys.argv[2:5]))
