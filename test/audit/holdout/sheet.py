"""A workbook held as plain cells, with the truth about its formulas noted while it is written."""
import re

REF = re.compile(r"(?<![A-Za-z0-9_.\[])(\$?)([A-Z]{1,3})(\$?)(\d+)(?![\d(A-Za-z_\]!])")


def col(name):
    n = 0
    for ch in name:
        n = n * 26 + ord(ch) - 64
    return n


def letters(n):
    s = ""
    while n:
        n, k = divmod(n - 1, 26)
        s = chr(65 + k) + s
    return s


def key(ref):
    m = re.fullmatch(r"\$?([A-Z]+)\$?(\d+)", ref)
    return int(m[2]), col(m[1])


def name(k):
    return f"{letters(k[1])}{k[0]}"


def cells(ref):
    """The cells of "C4:C6,C8" in order, row by row."""
    out = []
    for part in ref.replace("$", "").split(","):
        a, _, b = part.partition(":")
        (r0, c0), (r1, c1) = key(a), key(b or a)
        out += [(r, c) for r in range(r0, r1 + 1) for c in range(c0, c1 + 1)]
    return out


def ranges(keys):
    """Cells back to text: runs down one column, runs along one row, or a full rectangle."""
    rows, cols = sorted({r for r, _ in keys}), sorted({c for _, c in keys})
    if len(keys) == len(rows) * len(cols) == (rows[-1] - rows[0] + 1) * (cols[-1] - cols[0] + 1):
        a, b = name((rows[0], cols[0])), name((rows[-1], cols[-1]))
        return a if a == b else f"{a}:{b}"
    out, left = [], sorted(keys, key=lambda k: (k[1], k[0])) if len(rows) > 1 else sorted(keys)
    while left:
        run = [left.pop(0)]
        step = (1, 0) if len(rows) > 1 else (0, 1)
        while left and left[0] == (run[-1][0] + step[0], run[-1][1] + step[1]):
            run.append(left.pop(0))
        out.append(name(run[0]) if len(run) == 1 else f"{name(run[0])}:{name(run[-1])}")
    return ",".join(out)


def shift(formula, dr, dc):
    """The formula as it reads when it is filled dr rows down and dc columns right."""

    def move(m):
        c = m[2] if m[1] else letters(col(m[2]) + dc)
        r = m[4] if m[3] else str(int(m[4]) + dr)
        return f"{m[1]}{c}{m[3]}{r}"

    parts = re.split(r'("[^"]*")', formula)
    return "".join(p if p.startswith('"') else REF.sub(move, p) for p in parts)


class Sheet:
    def __init__(self, book, title):
        self.book, self.title = book, title
        self.cell, self.fmt, self.filled, self.merged, self.widths, self.table = {}, {}, [], [], {}, None

    def __setitem__(self, ref, v):
        self.cell[key(ref)] = v

    def across(self, ref, *values):
        r, c = key(ref)
        for i, v in enumerate(values):
            if v is not None:
                self.cell[(r, c + i)] = v

    def down(self, ref, *values):
        r, c = key(ref)
        for i, v in enumerate(values):
            if v is not None:
                self.cell[(r + i, c)] = v

    def grid(self, ref, *rows):
        r, c = key(ref)
        for i, row in enumerate(rows):
            self.across(name((r + i, c)), *row)

    def number(self, ref, code):
        for k in cells(ref):
            self.fmt[k] = code

    def fill(self, ref, formula):
        ks = cells(ref)
        for k in ks:
            self.cell[k] = shift(formula, k[0] - ks[0][0], k[1] - ks[0][1])
        if len(ks) > 1 and "," not in ref and len({c for _, c in ks}) == 1:
            self.filled.append(ref)

    def ignore(self, ref, formula=None):
        if formula is not None:
            self.fill(ref, formula)
        self.book.ignored.append({"sheet": self.title, "cells": ref})

    def f(self, ref, formula, quantity, mistake=None, out="1", **kw):
        """Fill a formula and note what it is. mistake: None for a right one, "?" for wrong with no fitting id."""
        if formula is not None:
            self.fill(ref, formula)
        return Group(self, ref, quantity, mistake, out, **kw)


class Group:
    def __init__(self, sheet, ref, quantity, mistake, out, note="", model=None, tol=1e-3, alsoQ=(), alsoM=(), inherits=None, noerr=False, **inputs):
        self.sheet, self.keys, self.quantity, self.mistake, self.out = sheet, cells(ref), quantity, mistake, out
        self.note, self.model, self.tol, self.alsoQ, self.alsoM = note, model, tol, list(alsoQ), list(alsoM)
        self.inherits, self.noerr = inherits, noerr
        self.inputs = {}
        shape = (len({k[0] for k in self.keys}), len({k[1] for k in self.keys}))
        for role, text in inputs.items():
            where, _, unit = text.rpartition("|")
            self.inputs[role] = (self.spread(where, shape), unit)
        sheet.book.groups.append(self)

    def spread(self, where, shape):
        """One source per cell of the group: a number, or (sheet, cell); a row or column spreads over a rectangle."""
        n = len(self.keys)
        try:
            return [float(where)] * n
        except ValueError:
            pass
        title, _, ref = where.rpartition("!")
        title = title or self.sheet.title
        if ref.endswith("[]"):
            return [[(title, k) for k in cells(ref[:-2])]] * n
        ks = [(title, k) for k in cells(ref)]
        if len(ks) == 1:
            return ks * n
        if len(ks) == n:
            return ks
        rows, cols = len({k[0] for _, k in ks}), len({k[1] for _, k in ks})
        r0, c0 = self.keys[0]
        if cols == 1 and rows == shape[0]:
            return [ks[r - r0] for r, _ in self.keys]
        if rows == 1 and cols == shape[1]:
            return [ks[c - c0] for _, c in self.keys]
        raise ValueError(f"{self.sheet.title}!{name(self.keys[0])}: {where} does not fit")

    def over(self, ref, formula, mistake, **kw):
        """Replace some cells of the run: they become a group of their own."""
        new = Group.__new__(Group)
        new.__dict__.update(self.__dict__)
        ks = cells(ref)
        at = [self.keys.index(k) for k in ks]
        new.keys, new.mistake, new.note, new.alsoM, new.alsoQ = ks, mistake, kw.get("note", ""), list(kw.get("alsoM", [])), self.alsoQ
        new.tol, new.noerr, new.inherits = kw.get("tol", self.tol), kw.get("noerr", False), kw.get("inherits")
        new.model = kw.get("model", self.model)
        new.inputs = {r: ([s[i] for i in at], u) for r, (s, u) in self.inputs.items()}
        keep = [i for i, k in enumerate(self.keys) if k not in ks]
        self.inputs = {r: ([s[i] for i in keep], u) for r, (s, u) in self.inputs.items()}
        self.keys = [self.keys[i] for i in keep]
        for k in ks:
            if isinstance(formula, str):
                self.sheet.cell[k] = shift(formula, k[0] - ks[0][0], k[1] - ks[0][1])
            elif formula is not None:
                self.sheet.cell[k] = formula
        self.sheet.book.groups.append(new)
        return new


class Book:
    def __init__(self, file, about, stored="strings", ):
        self.file, self.about, self.stored = file, about, stored
        self.sheets, self.groups, self.ignored, self.names = [], [], [], {}

    def sheet(self, title):
        s = Sheet(self, title)
        self.sheets.append(s)
        return s
