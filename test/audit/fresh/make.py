#!/usr/bin/env python3
"""Writes workbooks/*.xlsx, truth/*.json and split.json, and checks every group against exact.py.

python3 make.py [--out DIR]    standard library; LibreOffice (soffice) computes the stored values
Invented scenarios.  Fails when a right group departs from the exact model by more than the rounding of its constants, when a wrong
group does not depart from it, when a cell shows an error value, or when two groups share a cell."""
import argparse
import collections
import json
import math
import os
import re
import subprocess
import sys
import tempfile
import zipfile

sys.dont_write_bytecode = True
HERE = os.path.dirname(os.path.abspath(__file__))
sys.path.insert(0, HERE)
import book as B
import authors_1, authors_2, authors_3, authors_4, authors_5, authors_6

MODULES = (authors_1, authors_2, authors_3, authors_4, authors_5, authors_6)


def pick(ref, here, at, values, cells, index):
    """The value of an input beside one cell of a group: by row, by column, by order, or the whole list."""
    whole, ref = ref.startswith("@"), ref.lstrip("@")
    sheet, _, area = ref.rpartition("!")
    where = B.expand(area)
    get = lambda c, r: values.get((sheet.strip("'") or here, c, r), 0.0)
    if whole:
        return [get(*w) for w in where]
    if len(where) == 1:
        return get(*where[0])
    if not sheet:
        same_row = [w for w in where if w[1] == at[1]]
        same_col = [w for w in where if w[0] == at[0]]
        if len({w[0] for w in where}) == 1 and same_row:
            return get(*same_row[0])
        if len({w[1] for w in where}) == 1 and same_col:
            return get(*same_col[0])
    assert len(where) == len(cells), (ref, here, at)
    return get(*where[index])


def check(book, values):
    """The truth of one book, with the largest error of each group, and a list of complaints."""
    bad, seen, out = [], {}, []
    formulas = {(s.name, *k): v[0] for s in book.sheets for k, v in s.cells.items() if isinstance(v[0], str) and v[0].startswith("=")}
    for t, roles, model, tol in book.groups:
        cells, worst, off, n = B.expand(t["cells"]), 0.0, 0, 0
        tag = f"{book.name} {t['sheet']}!{t['cells']} {t['quantity']}"
        for i, at in enumerate(cells):
            key = (t["sheet"], *at)
            if key in seen:
                bad.append(f"{tag}: shares a cell with {seen[key]}")
            seen[key] = tag
            if key not in formulas and t["mistake"] != "value-typed-over":
                bad.append(f"{tag}: no formula at {key}")
            if model is None:
                continue
            want = model(*(pick(r, t["sheet"], at, values, cells, i) for r in roles.values()))
            got = values.get(key)
            if want is None or not isinstance(got, float):
                bad.append(f"{tag}: value {got!r}")
                continue
            if t["quantity"].endswith("phase"):
                err = abs(abs(got) - abs(want)) / max(abs(want), 1e-12)
            else:
                err = abs(got - want) / abs(want) if want else (0.0 if abs(got) < 1e-9 else math.inf)
            worst, off, n = max(worst, err), off + (err > 1e-3), n + 1
        if model is not None and "inheritsFrom" not in t:
            if t["correct"] and worst > tol:
                bad.append(f"{tag}: right but off by {worst:.4g}")
            if not t["correct"] and worst < 2e-3:
                bad.append(f"{tag}: wrong but off by only {worst:.4g}")
        t = dict(t, maxRelativeErrorOnSheet=float(f"{worst:.4g}") if model else None, cellsEvaluated=n, cellsOffByMoreThan0_1pct=off)
        out.append(t)
    for g in book.ignore:
        for at in B.expand(g["cells"]):
            seen[(g["sheet"], *at)] = "ignore"
    bad += [f"{book.name} {k}: formula without truth {formulas[k]}" for k in formulas if k not in seen]
    bad += [f"{book.name} {k}: {v}" for k, v in values.items() if isinstance(v, str) and v.startswith("#") and k in formulas]
    bad += [f"{book.name} {k}: no value {formulas[k]}" for k in formulas if k not in values]
    return dict(workbook=book.name + ".xlsx", about=book.about, stored="saved by LibreOffice" if book.resave else "written directly, values by LibreOffice", groups=out, ignore=book.ignore), bad


def resave(source, target):
    """LibreOffice's own file, with the date and the dates of its parts taken out so that a second run gives the same bytes."""
    with zipfile.ZipFile(source) as z:
        B.pack(target, {n: z.read(n) for n in z.namelist() if not n.startswith("docProps") and n not in ("_rels/.rels", "[Content_Types].xml")} | {n: strip(z.read(n).decode()) for n in ("_rels/.rels", "[Content_Types].xml")})


def strip(text):
    return re.sub(r'<(Override|Relationship) [^>]*docProps[^>]*/>', "", text)


def main():
    ap = argparse.ArgumentParser(description=__doc__)
    ap.add_argument("--out", default=HERE)
    out = ap.parse_args().out
    books = [b for m in MODULES for b in m.books()]
    for d in ("workbooks", "truth"):
        os.makedirs(os.path.join(out, d), exist_ok=True)
    complaints, tally = [], collections.Counter()
    with tempfile.TemporaryDirectory() as tmp:
        raw, done = os.path.join(tmp, "raw"), os.path.join(tmp, "done")
        os.makedirs(raw)
        for b in books:
            B.write(b, os.path.join(raw, b.name + ".xlsx"))
        subprocess.run(["soffice", f"-env:UserInstallation=file://{tmp}/profile", "--headless", "--convert-to", "xlsx", "--outdir", done,
                        *(os.path.join(raw, b.name + ".xlsx") for b in books)], check=True, stdout=subprocess.DEVNULL, stderr=subprocess.DEVNULL)
        for b in books:
            values = B.read_values(os.path.join(done, b.name + ".xlsx"))
            truth, bad = check(b, values)
            complaints += bad
            path = os.path.join(out, "workbooks", b.name + ".xlsx")
            if b.resave:
                resave(os.path.join(done, b.name + ".xlsx"), path)
            else:
                B.write(b, path, values)
            with open(os.path.join(out, "truth", b.name + ".json"), "w", encoding="utf8") as f:
                json.dump(truth, f, indent=1, ensure_ascii=False)
                f.write("\n")
            for g in truth["groups"]:
                tally["groups"] += 1
                tally["neutral" if "inheritsFrom" in g else "right" if g["correct"] else "wrong"] += 1
                tally["q " + g["quantity"]] += 1
                if not g["correct"]:
                    tally[f"m {g['mistake']}"] += 1
            tally["books"] += 1
            tally["ignored ranges"] += len(truth["ignore"])
    with open(os.path.join(out, "split.json"), "w") as f:
        json.dump(dict(sample=[], hidden=[b.name for b in books]), f, indent=1)
        f.write("\n")
    for k, v in sorted(tally.items()):
        print(f"{v:5d}  {k}")
    print(*complaints, sep="\n")
    sys.exit(bool(complaints))


if __name__ == "__main__":
    main()
