#!/usr/bin/env python3
"""Writes the declarations of the reference cases from their case.json: python3 tests/reference/make_declarations.py

For every case
  declaration.yaml                 the final model and its left-out groups, columns as they stand in data.csv
  declaration-largest.yaml         the largest model as the final one, nothing left out
and for the polynomial cases, where the tool is to form the powers of x itself,
  declaration-powers.yaml          as declaration.yaml, with polynomial and power terms of x
  declaration-largest-powers.yaml  as declaration-largest.yaml, likewise
"""
import json
from pathlib import Path

HERE = Path(__file__).resolve().parent
POLYNOMIALS = {"nist_norris", "nist_noint1", "nist_wampler1", "nist_wampler4", "nist_filip"}


def quoted(text):
    """A double-quoted YAML scalar: a JSON string is one."""
    return json.dumps(text, ensure_ascii=False)


def column_term(term):
    parts = term.split(":")
    return parts[0] if len(parts) == 1 else "{product: [%s]}" % ", ".join(parts)


def exponent(term):
    return int(term[1:] or "1")


def power_terms(terms):
    """x, x2, x3 in a row from the first power on is one polynomial; other powers stand alone."""
    powers = [exponent(term) for term in terms]
    if len(powers) > 1 and powers == list(range(1, len(powers) + 1)):
        return ["{polynomial: {of: x, degree: %d}}" % len(powers)]
    return ["x" if k == 1 else "{power: {of: x, exponent: %d}}" % k for k in powers]


def columns_block(case):
    lines = ["    %s: {kind: levels, levels: [%s]}" % (f["column"], ", ".join(quoted(level) for level in f["levels"])) for f in case["factors"]]
    return ["  columns:"] + lines if lines else []


def terms_block(terms, indent, spell):
    return [indent + "terms:"] + [indent + "  - " + term for term in spell(terms)]


def declaration(case, suffix, final, groups, spell):
    lines = [
        "# Written by make_declarations.py from case.json.",
        "audit: 1",
        "model:",
        "  id: " + case["name"].replace("_", "-") + suffix,
        "  title: " + quoted(case["title"]),
        '  version: "1"',
        "data:",
        "  source: data.csv",
        *columns_block(case),
    ]
    if case["weights_column"]:
        lines.append("  weights: {column: %s, kind: precision}" % case["weights_column"])
    lines += ["response: " + case["response"], "final_model:"]
    if not case["intercept"]:
        lines.append("  intercept: false")
    lines += terms_block(final, "  ", spell)
    if groups:
        lines.append("left_out:")
    for group in groups:
        lines += ["  - group: " + group["name"], *terms_block(group["terms"], "    ", spell), "    because: Left out to be tested; the reference values are of this comparison."]
    return "\n".join(lines) + "\n"


def write(case, suffix, final, groups, spell):
    path = HERE / case["name"] / ("declaration" + suffix + ".yaml")
    path.write_text(declaration(case, suffix, final, groups, spell), encoding="utf-8", newline="\n")


def all_terms(case):
    return case["final_terms"] + [term for group in case["groups"] for term in group["terms"]]


def as_columns(terms):
    return [column_term(term) for term in terms]


def main():
    for path in sorted(HERE.glob("*/case.json")):
        case = json.loads(path.read_text(encoding="utf-8"))
        write(case, "", case["final_terms"], case["groups"], as_columns)
        write(case, "-largest", all_terms(case), [], as_columns)
        if case["name"] in POLYNOMIALS:
            write(case, "-powers", case["final_terms"], case["groups"], power_terms)
            write(case, "-largest-powers", all_terms(case), [], power_terms)


if __name__ == "__main__":
    main()
