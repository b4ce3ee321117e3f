"""Write workbooks/*.xlsx, truth/*.json and split.json from the authors' sheets.

python3 make.py            (needs soffice on the path: it calculates the values the sheets show)

Every group is recomputed from the inputs shown by the exact model: a right one must agree within the rounding of its
constants, a wrong one must not, unless it is marked as one whose error the sheet cannot show."""
import importlib
import json
import os
import subprocess
import sys
import tempfile

sys.dont_write_bytecode = True

import model
import xlsx
from sheet import name, ranges

HERE = os.path.dirname(os.path.abspath(__file__))
AUTHORS = ["books_a", "books_b", "books_c", "books_d", "books_e", "books_f", "books_g"]


def calculate(books, folder):
    """Let a spreadsheet program calculate the books. Files come back beside their own values."""
    src, out = os.path.join(folder, "src"), os.path.join(folder, "out")
    os.makedirs(src)
    for b in books:
        open(os.path.join(src, b.file + ".xlsx"), "wb").write(xlsx.write(b, plain=True))
    paths = [os.path.join(src, b.file + ".xlsx") for b in books]
    profile = "-env:UserInstallation=file://" + os.path.join(folder, "profile")
    subprocess.run(["soffice", profile, "--headless", "--convert-to", "xlsx", "--outdir", out, *paths], check=True, capture_output=True, timeout=300)
    files = {b.file: open(os.path.join(out, b.file + ".xlsx"), "rb").read() for b in books}
    return files, {b.file: xlsx.read_values(files[b.file]) for b in books}


def si(source, unit, values):
    if isinstance(source, list):
        return [si(s, unit, values) for s in source]
    return (source if isinstance(source, float) else values[source]) * model.UNIT[unit]


def check(book, values):
    """The group entries of one book's truth; raises where a group is not what it says."""
    out, bad = [], []
    for g in book.groups:
        where = f"{book.file} {g.sheet.title}!{ranges(g.keys)}"
        f = g.model or model.MODEL.get(g.quantity)
        worst, off, text = None, 0, {}
        if f and not g.noerr:
            errs = []
            for i, k in enumerate(g.keys):
                try:
                    case = model.Case({r: si(s[i], u, values) for r, (s, u) in g.inputs.items()})
                    true = f(case) / model.UNIT[g.out]
                    got = values[(g.sheet.title, k)]
                    got, true = (abs(got), abs(true)) if "phase" in g.quantity else (got, true)
                    errs.append(abs(got - true) / abs(true))
                except Exception as e:  # name the cell, then say what went wrong
                    raise RuntimeError(f"{where} {name(k)} {g.inputs.keys()}: {e!r}") from e
            worst, off = max(errs), sum(e > 1e-3 for e in errs)
            if g.mistake is None and not g.inherits and worst > g.tol:
                bad.append(f"{where} {g.quantity}: said right, off by {worst:.3g}")
            if (g.mistake or g.inherits) and worst <= 1e-3:
                bad.append(f"{where} {g.quantity}: said wrong, off by only {worst:.3g}")
        for r, (s, _) in g.inputs.items():
            first = s[0]
            if isinstance(first, float):
                text[model.ROLE[r]] = first
            else:
                ks = list(dict.fromkeys(x for y in s for x in (y if isinstance(y, list) else [y])))
                pre = "" if ks[0][0] == g.sheet.title else ks[0][0] + "!"
                text[model.ROLE[r]] = pre + ranges([k for _, k in ks])
        e = dict(
            sheet=g.sheet.title, cells=ranges(g.keys), quantity=g.quantity, correct=g.mistake is None, mistake=None if g.mistake == "?" else g.mistake,
            inputs=text, inputUnits={model.ROLE[r]: u for r, (_, u) in g.inputs.items()}, outputUnit=g.out, note=g.note,
            maxRelativeErrorOnSheet=None if worst is None else float(f"{worst:.4g}"), cellsEvaluated=0 if worst is None else len(g.keys), cellsOffByMoreThan0_1pct=off,
        )
        if g.alsoQ:
            e["alsoAcceptQuantity"] = g.alsoQ
        if g.alsoM:
            e["alsoAcceptMistake"] = g.alsoM
        if g.inherits:
            e["inheritsFrom"] = g.inherits if "!" in g.inherits else f"{g.sheet.title}!{g.inherits}"
        out.append(e)
    said = {(e["sheet"], e["cells"]) for e in out}
    owner = {}
    for g in book.groups:
        for k in g.keys:
            if owner.setdefault((g.sheet.title, k), g) is not g:
                bad.append(f"{book.file} {g.sheet.title}!{name(k)} is in two groups")
    for i in book.ignored:
        for k in xlsx.cells(i["cells"]):
            if (i["sheet"], k) in owner:
                bad.append(f"{book.file} {i['sheet']}!{name(k)} is ignored and in a group")
            owner[(i["sheet"], k)] = None
    for e in out:
        for ref in e.get("inheritsFrom", "").split(";"):
            if ref and tuple(ref.rsplit("!", 1)) not in said:
                bad.append(f"{book.file} {e['sheet']}!{e['cells']} inherits from {ref}, which is no group")
    for s in book.sheets:
        for k, v in s.cell.items():
            if isinstance(v, str) and v.startswith("="):
                if (s.title, k) not in owner:
                    bad.append(f"{book.file} {s.title}!{name(k)} {v}: formula without truth")
                if (s.title, k) not in values:
                    bad.append(f"{book.file} {s.title}!{name(k)} {v}: no value")
    return out, bad


def main():
    only = sys.argv[1:]
    books = [b for a in AUTHORS if os.path.exists(os.path.join(HERE, a + ".py")) for b in importlib.import_module(a).BOOKS]
    books = [make() for make in books]
    books = [b for b in books if not only or b.file in only]
    with tempfile.TemporaryDirectory() as folder:
        files, values = calculate(books, folder)
    faults = []
    for d in ("workbooks", "truth"):
        os.makedirs(os.path.join(HERE, d), exist_ok=True)
    for b in books:
        groups, bad = check(b, values[b.file])
        faults += bad
        data = xlsx.repack(files[b.file]) if b.stored == "resaved" else xlsx.write(b, values[b.file])
        open(os.path.join(HERE, "workbooks", b.file + ".xlsx"), "wb").write(data)
        truth = dict(workbook=b.file + ".xlsx", about=b.about, stored=b.stored, groups=groups, ignore=b.ignored)
        json.dump(truth, open(os.path.join(HERE, "truth", b.file + ".json"), "w", encoding="utf8"), indent=1, ensure_ascii=False)
    if not only:
        json.dump({"sample": [], "hidden": sorted(b.file for b in books)}, open(os.path.join(HERE, "split.json"), "w"), indent=1)
    print("\n".join(faults))
    n = sum(len(b.groups) for b in books)
    wrong = sum(g.mistake is not None for b in books for g in b.groups)
    print(f"{len(books)} books, {n} groups, {wrong} wrong, {len(faults)} faults")
    sys.exit(bool(faults))


if __name__ == "__main__":
    main()
