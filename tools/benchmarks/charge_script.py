# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later
"""What a chemist's own script does for a charge: reads the plan, sums atomic weights, divides.

Plain arithmetic without uncertainties, units checks, structures or messages: the least that replaces
the program, and so the hardest to beat. `charge_script.py PLAN [COUNT]`.
"""
import re
import sys
import tomllib

WEIGHTS = {"H": 1.008, "C": 12.011, "N": 14.007, "O": 15.999, "Br": 79.904, "Ni": 58.693, "Pd": 106.42,
           "F": 18.998, "Cl": 35.45, "S": 32.06, "P": 30.974, "B": 10.81}
SCALE = {"mmol": 1e-3, "umol": 1e-6, "mg": 1e-3, "g": 1.0, "mL": 1e-3, "uL": 1e-6, "mM": 1e-3,
         "mol/L": 1.0, "M": 1.0, "g/mL": 1e3}
# The script's author looked these up once, in place of reading a structure.
FORMULAS = {"indoline": "C8H9N", "4CzIPN": "C56H32N6", "pivalic acid": "C5H10O2", "acetonitrile": "C2H3N",
            "water": "H2O"}
DENSITIES = {"acetonitrile": 782.0, "water": 998.2}


def quantity(text):
    number, unit = text.split()
    return float(number) * SCALE[unit]


def molar_mass(formula):
    return sum(WEIGHTS[element] * int(count or 1)
               for element, count in re.findall(r"([A-Z][a-z]?)(\d*)", formula))


def charge(text):
    plan = tomllib.loads(text)
    total = quantity(plan["liquid"]["total"])
    parts = {c["key"]: c for c in plan["component"]}
    limiting = quantity(parts[plan["reaction"]["limiting"]]["amount"])
    shared, brought, targets = total, {}, {}
    for key, c in parts.items():
        if "share" in c:
            continue
        amount = quantity(c["amount"]) if "amount" in c else limiting * (
            c["equiv"] if "equiv" in c else c["mol_percent"] / 100)
        supply = c.get("supply", {"kind": "solid"})
        if supply["kind"] == "stock":
            volume = amount / quantity(supply["concentration"])
            brought[supply["solvent"]] = brought.get(supply["solvent"], 0.0) + volume
            targets[key] = volume
            continue
        mass = amount * molar_mass(c.get("formula") or FORMULAS[c["name"]]) / supply.get("assay", 1.0)
        targets[key] = mass
        if supply["kind"] == "liquid":
            shared -= mass / quantity(supply["density"])
    share_sum = sum(c["share"] for c in parts.values() if "share" in c)
    for key, c in parts.items():
        if "share" in c:
            targets[key] = shared * c["share"] / share_sum - brought.get(key, 0.0)
    return targets


if __name__ == "__main__":
    with open(sys.argv[1], encoding="utf-8") as plan_file:
        plan_text = plan_file.read()
    total_of_targets = 0.0
    for _ in range(int(sys.argv[2]) if len(sys.argv) > 2 else 1):
        total_of_targets += sum(charge(plan_text).values())
    print(total_of_targets)
