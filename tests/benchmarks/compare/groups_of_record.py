"""The same lines from the tool's own record: python3 groups_of_record.py RECORD.json"""
import json
import sys

with open(sys.argv[1], encoding="utf-8") as file:
    record = json.load(file)
for group in record["exclusions"]:
    classical, hc3 = group["tests"]["classical"], group["tests"]["hc3"]
    print(f"{group['group']} rows {group['rows']} F {classical['f']:.15g} p {classical['p']:.15g} HC3 F {hc3['f']:.15g} p {hc3['p']:.15g}")
