#!/usr/bin/env python3
"""make.py: writes workbooks/, truth/ and split.json of this folder, then checks them.

The books are invented sizing sheets in many styles (books_*.py), written apart from the auditor and kept so: they score it,
it is not fitted to them; change a truth only where it contradicts what the sheet says.  Cached values come from LibreOffice (headless), the
truth from exact expressions in SI units (engine.py), so the two check each other: a right group agrees with its
expression to the rounding of its constants, a wrong one does not.  Standard library only; needs `soffice` on the path."""
import sys
sys.dont_write_bytecode = True
import collections
import json
import os
import re
import shutil
import subprocess
import tempfile
import xml.etree.ElementTree as ET
import zipfile
import books_building
import books_lab
import books_moving
from engine import MAIN, cell, cells, cname

HERE = os.path.dirname(os.path.abspath(__file__))
QUANTITIES = """frequency-conversion natural-frequency frequency-ratio damping-ratio damping-coefficient critical-damping static-deflection required-static-deflection
required-natural-frequency required-stiffness mount-stiffness mount-load absolute-transmissibility relative-transmissibility isolation-efficiency transmissibility-db
absolute-phase relative-phase peak-transmissibility motion-conversion payload-motion relative-displacement mount-force overall-rms random-response-rms helper""".split()
MISTAKES = """undamped-form numerator-damping-missing damping-not-squared ratio-not-squared square-root-missing ratio-inverted absolute-value-missing
absolute-used-for-relative relative-used-for-absolute angular-cyclic-mixup speed-unit length-unit mass-weight-mixup percent-as-ratio loss-factor-as-damping-ratio
amplitude-kind decibel-factor constant-wrong sign-precedence mount-count-missing total-for-per-mount half-pi-missing fill-break value-typed-over reference-slip
static-stiffness-for-dynamic efficiency-not-of-motion""".split()


def read_values(path):
    """{sheet name: {(col, row): number or text}} of a workbook as LibreOffice saved it."""
    n = {"m": MAIN}
    with zipfile.ZipFile(path) as z:
        strings = []
        if "xl/sharedStrings.xml" in z.namelist():
            strings = ["".join(t.text or "" for t in si.iter(f"{{{MAIN}}}t")) for si in ET.fromstring(z.read("xl/sharedStrings.xml")).findall("m:si", n)]
        names = [s.get("name") for s in ET.fromstring(z.read("xl/workbook.xml")).find("m:sheets", n)]
        out = {}
        for i, name in enumerate(names, 1):
            d = out[name] = {}
            for c in ET.fromstring(z.read(f"xl/worksheets/sheet{i}.xml")).iter(f"{{{MAIN}}}c"):
                v = c.find("m:v", n)
                if v is None:
                    continue
                t = c.get("t", "n")
                d[cell(c.get("r"))] = strings[int(v.text)] if t == "s" else float(v.text) if t in ("n", "b") else ("#ERROR " + v.text if t == "e" else v.text)
    return out


def calculate(books):
    with tempfile.TemporaryDirectory() as tmp:
        for b in books:
            b.write(os.path.join(tmp, b.name + ".xlsx"), values=False)
        subprocess.run(["soffice", "--headless", f"-env:UserInstallation=file://{tmp}/profile", "--convert-to", "xlsx", "--outdir", os.path.join(tmp, "out"),
                        *(os.path.join(tmp, b.name + ".xlsx") for b in books)], check=True, stdout=subprocess.DEVNULL, stderr=subprocess.DEVNULL)
        for b in books:
            v = read_values(os.path.join(tmp, "out", b.name + ".xlsx"))
            for s in b.sheets.values():
                s.cached = {k: v[s.name].get(k) for k, x in s.data.items() if isinstance(x, str) and x.startswith("=")}


def check(books):
    bad, where = [], collections.Counter()
    seen = {"quantity": collections.Counter(), "mistake": collections.Counter()}
    for b in books:
        covered = collections.Counter()
        for s in b.sheets.values():
            for k, v in s.cached.items():
                if v is None or isinstance(v, str) and v.startswith("#"):
                    bad.append(f"{b.name} {s.name}!{cname(k[0])}{k[1]} {s.data[k]} gives {v}")
            for rng in s.ignore:
                covered.update((s.name, k) for part in rng.split(",") for k in cells(part))
        for g in b.groups:
            covered.update((g.sheet.name, k) for k in g.cs)
            where["neutral" if g.inherits else "correct" if g.mistake is None else "wrong"] += 1
            seen["quantity"][g.q] += 1
            if g.mistake:
                seen["mistake"][g.mistake] += 1
            try:
                e = g.truth()["maxRelativeErrorOnSheet"]
            except Exception as x:
                bad.append(f"{b.name} {g.key()}: {type(x).__name__} {x}")
                continue
            if g.inherits:
                continue
            if e is None:
                if g.mistake is None:
                    bad.append(f"{b.name} {g.key()}: correct without an expression")
            elif g.mistake is None and e > g.tol:
                bad.append(f"{b.name} {g.key()} {g.q}: correct but off by {e}: {g.sheet.data[g.cs[0]]}")
            elif g.mistake and e < 2e-3:
                bad.append(f"{b.name} {g.key()} {g.q}: {g.mistake} but off by only {e}: {g.sheet.data[g.cs[0]]}")
        for s in b.sheets.values():
            for k in s.cached:
                if covered[(s.name, k)] != 1:
                    bad.append(f"{b.name} {s.name}!{cname(k[0])}{k[1]} accounted for {covered[(s.name, k)]} times")
        bad += [f"{b.name} {x}: typed value listed twice" for x, n in covered.items() if n > 1]
    for kind, ids in (("quantity", QUANTITIES), ("mistake", MISTAKES)):
        bad += [f"no such {kind}: {x}" for x in seen[kind] if x not in ids and x != "none"]
        bad += [f"{kind} {x} only {seen[kind][x]} times" for x in ids if seen[kind][x] < 3]
    return bad, where, seen


def main():
    books = [f() for m in (books_building, books_lab, books_moving) for f in m.BOOKS]
    calculate(books)
    bad, where, seen = check(books)
    for x in bad:
        print("PROBLEM", x)
    print(len(books), "books", sum(len(b.groups) for b in books), "groups", dict(where))
    for kind, c in seen.items():
        print(kind, ", ".join(f"{k} {n}" for k, n in sorted(c.items())))
    if bad:
        sys.exit(1)
    for d in ("workbooks", "truth"):
        shutil.rmtree(os.path.join(HERE, d), ignore_errors=True)
        os.makedirs(os.path.join(HERE, d))
    for b in books:
        b.write(os.path.join(HERE, "workbooks", b.name + ".xlsx"))
        with open(os.path.join(HERE, "truth", b.name + ".json"), "w", encoding="utf8") as f:
            json.dump(b.truth(), f, indent=1, ensure_ascii=False)
            f.write("\n")
    with open(os.path.join(HERE, "split.json"), "w", encoding="utf8") as f:
        json.dump({"sample": [], "hidden": sorted(b.name for b in books)}, f, indent=1)
        f.write("\n")


if __name__ == "__main__":
    main()
