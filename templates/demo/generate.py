#!/usr/bin/env python3
"""Writes tractor-leases.csv, the data of the demo: python3 templates/demo/generate.py

Quernfield Machinery Leasing, its dealers and its tractors are invented. A lease is one tractor; at its end the tractor is resold,
and the shortfall is what the resale missed the booked residual value by, in per cent of the list price.

What is built in, so that the audit has something to find (the seed was chosen so that each shows in this sample):
  wear                        four records of use, nearly copies of one another; use matters much, none of the four does beside the others
  steep ground                a slight effect, and far more scatter on steep farms: a plain F test is too sure of it
  running gear                a dozen crawlers with wild results: many rows, little to learn
  delivery distance, quarter  no effect, and enough rows to show it
  dealer size                 an effect that is there and too small to matter
  lease years                 the term in months, divided by twelve
Some cells are empty, and leases that the customer bought out have no resale.

Only the standard library; random() of a seeded generator and the normal by the polar method, values rounded, so that the file comes out
the same again.
"""
import csv
import math
import random
from datetime import date, timedelta
from pathlib import Path

SEED = 20260207
LEASES = 3420
TRACKS_EVERY = 203

# Effects in per cent of the list price: of one standard deviation of use, of a factor e in dealer staff, of one per cent of gradient.
USE_EFFECT = 1.3
DEALER_EFFECT = -0.82
SLOPE_EFFECT = 0.03

# The scatter on ground of this slope is twice that on the flat; on tracks it is this many times that on wheels.
SLOPE_SCALE = 17.0
TRACK_SCATTER = 5.0

HEADER = [
    "lease_no", "status", "returned_on", "region", "tractor_class", "list_price", "term_months", "term_years", "booked_residual",
    "front_loader", "engine_hours", "field_days", "service_visits", "fuel_used", "slope", "running_gear", "delivery_km", "dealer_staff", "shortfall",
]
CLASSES = [("compact", 42, 0.0), ("utility", 78, -0.8), ("row_crop", 134, 0.9), ("articulated", 265, 2.4)]
REGIONS = [("river plain", 0.0), ("coast", 1.6), ("heath", -0.9), ("upland", 0.7)]
TERMS = [24, 30, 36, 42, 48, 54, 60, 72]

source = random.Random(SEED)


def normal():
    """Standard normal, Marsaglia's polar method."""
    while True:
        u, v = 2 * source.random() - 1, 2 * source.random() - 1
        s = u * u + v * v
        if 0 < s < 1:
            return u * math.sqrt(-2 * math.log(s) / s)


def one_of(items, weights):
    x = source.random() * sum(weights)
    for item, weight in zip(items, weights):
        x -= weight
        if x < 0:
            return item
    return items[-1]


def sometimes_missing(value, share):
    return "" if source.random() < share else value


def lease(number):
    bought_out = source.random() < 0.10
    name, price, class_effect = one_of(CLASSES, [0.24, 0.36, 0.29, 0.11])
    region, region_effect = one_of(REGIONS, [0.38, 0.22, 0.17, 0.23])
    list_price = round(price * math.exp(0.16 * normal()), 1)
    months = one_of(TERMS, [6, 5, 18, 9, 26, 10, 20, 6])
    residual = round(min(72.0, max(18.0, 66 - 0.48 * months + 4.2 * normal())), 1)
    loader = source.random() < 0.37

    use = normal()
    hours = max(60, months / 12 * (520 + 150 * use + 20 * normal()))
    typical = months / 12 * 520
    spread = months / 12 * 150
    days = max(5, round((hours + 0.22 * spread * normal()) / 8.2))
    visits = max(1, round((hours + 0.20 * spread * normal()) / 125))
    fuel = max(300, round((hours + 0.21 * spread * normal()) * 13.4, -1))

    slope = round(min(38.0, -7.5 * math.log(1 - source.random())), 1)
    tracks = number % TRACKS_EVERY == 0
    delivery = round(math.exp(3.6 + 0.7 * normal()), 1)
    staff = max(3, round(math.exp(2.75 + 0.55 * normal())))
    returned = date(2018, 1, 8) + timedelta(days=math.floor(source.random() * 2830))

    scatter = 4.6 * (1 + (slope / SLOPE_SCALE) ** 2) * (TRACK_SCATTER if tracks else 1)
    shortfall = (
        -9.5 + 1.7 * math.log(list_price) + 0.062 * months + 0.21 * residual + class_effect + region_effect + (-1.1 if loader else 0)
        + USE_EFFECT * (hours - typical) / spread + DEALER_EFFECT * (math.log(staff) - 2.75) + SLOPE_EFFECT * slope + scatter * normal()
    )
    return [
        "QL-%05d" % (10000 + number), "bought out" if bought_out else "resold", returned.isoformat(), region, name, list_price, months,
        months / 12, residual, "yes" if loader else "no", round(hours), days, visits, sometimes_missing(int(fuel), 0.021), slope,
        "tracks" if tracks else "wheels", sometimes_missing(delivery, 0.013), staff, "" if bought_out else round(shortfall, 2),
    ]


def main():
    path = Path(__file__).resolve().parent / "tractor-leases.csv"
    with path.open("w", newline="", encoding="utf-8") as file:
        writer = csv.writer(file, lineterminator="\n")
        writer.writerow(HEADER)
        writer.writerows(lease(number) for number in range(1, LEASES + 1))


if __name__ == "__main__":
    main()
