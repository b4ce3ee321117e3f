"""A small workbook and truth writer: cells, filled formulas, groups judged against an exact expression in SI units.

Book -> Sheet -> put/row/col (typed values), g (a judged group), slip (one cell of a group that departs),
other (an unrelated formula).  A formula is written for the first cell of its range and filled like in a spreadsheet.
Inputs are `alias="REF|unit"`: REF is a column (same row), a row number (same column), a fixed cell, a range (a list),
or `#number`; a column or row may carry an offset (`B-1`, `5+1`).  The expression sees every input in SI."""
import math
import re
import zipfile
from xml.sax.saxutils import escape, quoteattr

G0 = 9.80665
LB = 0.45359237
IN = 0.0254
LBF = LB * G0
UNITS = {
    "1": 1, "%": 0.01, "dB": 1, "Hz": 1, "rpm": 1 / 60, "cpm": 1 / 60, "rad/s": 1 / (2 * math.pi),
    "kg": 1, "t": 1000, "g(mass)": 1e-3, "lb": LB, "slug": LBF / 0.3048, "N": 1, "kN": 1000, "lbf": LBF, "kgf": G0,
    "m": 1, "mm": 1e-3, "cm": 1e-2, "um": 1e-6, "nm": 1e-9, "in": IN, "mil": IN / 1000, "ft": 0.3048,
    "N/m": 1, "N/mm": 1e3, "kN/m": 1e3, "kN/mm": 1e6, "MN/m": 1e6, "lbf/in": LBF / IN, "kgf/mm": G0 * 1e3,
    "N/cm": 100, "N.s/m": 1, "kN.s/m": 1e3, "N.s/mm": 1e3, "lbf.s/in": LBF / IN,
    "m/s2": 1, "g": G0, "mm/s2": 1e-3, "in/s2": IN, "m/s": 1, "mm/s": 1e-3, "um/s": 1e-6, "in/s": IN,
    "g2/Hz": G0 ** 2, "(m/s2)2/Hz": 1, "MPa": 1e6, "N/mm2": 1e6, "psi": LBF / IN ** 2, "mm2": 1e-6, "cm2": 1e-4,
    "in2": IN ** 2, "s": 1, "ms": 1e-3, "rad": 1, "deg": math.pi / 180, "circ.rad/s": 1, "(um/s)2": 1e-12, "(m/s2)2": 1, "g2": G0 ** 2,
}
ROLES = dict(
    f="frequency", fn="natural_frequency", z="damping_ratio", k="mount_stiffness", K="total_stiffness", m="mass",
    W="weight", w="mount_load", n="mount_count", d="static_deflection", T="transmissibility",
    R="relative_transmissibility", E="isolation_efficiency", r="frequency_ratio", eta="loss_factor",
    Q="quality_factor", c="damping_coefficient", cc="critical_damping", L="log_decrement", Y="displacement",
    A="acceleration", V="velocity", S="spectral_density", u="stiffness_ratio", h="drop_height")


def T(r, z):
    return math.sqrt((1 + (2 * z * r) ** 2) / ((1 - r * r) ** 2 + (2 * z * r) ** 2))


def R(r, z):
    return r * r / math.sqrt((1 - r * r) ** 2 + (2 * z * r) ** 2)


def Tu(r):
    return 1 / abs(1 - r * r)


def Th(r, e):
    return math.sqrt((1 + e * e) / ((1 - r * r) ** 2 + e * e))


def Tpeak(z):
    x = (math.sqrt(1 + 8 * z * z) - 1) / (4 * z * z)
    return T(math.sqrt(x), z)


def rneed(t, z):
    b = t * t * (4 * z * z - 2) - 4 * z * z
    return math.sqrt((-b + math.sqrt(b * b - 4 * t * t * (t * t - 1))) / (2 * t * t))


def phase(r, z):
    return math.atan2(2 * z * r ** 3, 1 - r * r + (2 * z * r) ** 2)


def relphase(r, z):
    return math.atan2(2 * z * r, 1 - r * r)


def psdarea(f, s):
    """Area under a spectrum that is straight on log-log axes."""
    a = 0
    for f1, f2, s1, s2 in zip(f, f[1:], s, s[1:]):
        n = math.log(s2 / s1) / math.log(f2 / f1)
        a += s1 * f1 * math.log(f2 / f1) if abs(n + 1) < 1e-9 else s1 * f1 / (n + 1) * ((f2 / f1) ** (n + 1) - 1)
    return a


def trapz(f, s):
    """Area under a spectrum that is straight on plain axes."""
    return sum((b - a) * (p + q) / 2 for a, b, p, q in zip(f, f[1:], s, s[1:]))


MODEL = {**{k: getattr(math, k) for k in ("sqrt", "pi", "log10", "log", "exp", "atan", "hypot", "ceil")},
         "abs": abs, "sum": sum, "max": max, "min": min, "G0": G0, "T_": T, "R_": R, "Tu": Tu, "Th": Th, "Tpeak": Tpeak,
         "rneed": rneed, "phase": phase, "relphase": relphase, "psdarea": psdarea, "trapz": trapz}


def cnum(s):
    n = 0
    for ch in s:
        n = n * 26 + ord(ch) - 64
    return n


def cname(n):
    s = ""
    while n:
        n, k = divmod(n - 1, 26)
        s = chr(65 + k) + s
    return s


def cell(ref):
    m = re.fullmatch(r"\$?([A-Z]+)\$?(\d+)", ref)
    return cnum(m[1]), int(m[2])


def cells(rng):
    a, _, b = rng.partition(":")
    (c0, r0), (c1, r1) = cell(a), cell(b or a)
    return [(c, r) for r in range(r0, r1 + 1) for c in range(c0, c1 + 1)]


REF = re.compile(r"(?<![A-Za-z0-9_.\[])(\$?)([A-Z]{1,3})(\$?)(\d+)(?![\w(\[.!])")


def shift(formula, dc, dr):
    def one(m):
        c = m[2] if m[1] else cname(cnum(m[2]) + dc)
        r = m[4] if m[3] else str(int(m[4]) + dr)
        return m[1] + c + m[3] + r
    parts = re.split(r"(\"[^\"]*\"|'[^']*'|\w+\[(?:[^\[\]]|\[[^\]]*\])*\])", formula)
    return "".join(p if i % 2 else REF.sub(one, p) for i, p in enumerate(parts))


def compress(cs):
    """Cells as a comma list of rectangles: runs along a row, equal runs in following rows joined."""
    rows = {}
    for c, r in sorted(set(cs), key=lambda x: (x[1], x[0])):
        runs = rows.setdefault(r, [])
        if runs and runs[-1][1] == c - 1:
            runs[-1][1] = c
        else:
            runs.append([c, c])
    out = []
    for r in sorted(rows):
        for c0, c1 in rows[r]:
            for o in out:
                if o[0] == c0 and o[1] == c1 and o[3] == r - 1:
                    o[3] = r
                    break
            else:
                out.append([c0, c1, r, r])
    name = lambda c, r: f"{cname(c)}{r}"
    return ",".join(name(a, c) if (a, c) == (b, d) else f"{name(a, c)}:{name(b, d)}" for a, b, c, d in out)


class Group:
    def __init__(self, sheet, cs, q, ex, out, mistake, note, also, alsoq, inherits, tol, inputs):
        self.sheet, self.cs, self.q, self.ex, self.out, self.mistake = sheet, list(cs), q, ex, out, mistake
        self.note, self.also, self.alsoq, self.inherits, self.tol, self.inputs = note, also, alsoq, inherits, tol, inputs
        self.origin = cs[0]

    def key(self):
        return f"{self.sheet.name}!{compress(self.cs)}"

    def locate(self, spec, at):
        """The cells an input refers to, seen from the group's cell `at`; and the range as text for the truth file."""
        ref, _, unit = spec.partition("|")
        sheet, _, ref = ref.rpartition("!")
        book = self.sheet.book
        sh = book.sheets[sheet.strip("'")] if sheet else self.sheet
        pre = f"{sheet}!" if sheet else ""
        rows = sorted({r for _, r in self.cs})
        cols = sorted({c for c, _ in self.cs})
        m = re.fullmatch(r"([A-Z]+|\d+)([+-]\d+)?", ref)
        if ref.startswith("#"):
            return float(ref[1:]), ref[1:], unit
        if m:
            k = int(m[2] or 0)
            if m[1].isdigit():
                r = int(m[1])
                return sh.value(at[0] + k, r), f"{pre}{cname(cols[0]+k)}{r}:{cname(cols[-1]+k)}{r}", unit
            c = cnum(m[1])
            return sh.value(c, at[1] + k), f"{pre}{m[1]}{rows[0]+k}:{m[1]}{rows[-1]+k}", unit
        if ":" in ref:
            return [sh.value(*x) for x in cells(ref)], pre + ref, unit
        return sh.value(*cell(ref)), pre + ref.replace("$", ""), unit

    def exact(self, at):
        env = {}
        for a, spec in self.inputs.items():
            v, _, u = self.locate(spec, at)
            env[a] = [x * UNITS[u] for x in v] if isinstance(v, list) else v * UNITS[u]
        return eval(self.ex, dict(MODEL), env) / UNITS[self.out]

    def truth(self):
        g = dict(sheet=self.sheet.name, cells=compress(self.cs), quantity=self.q, correct=self.mistake is None, mistake=self.mistake)
        if self.mistake == "none":
            g["mistake"] = None
        if self.alsoq:
            g["alsoAcceptQuantity"] = self.alsoq
        if self.also:
            g["alsoAcceptMistake"] = self.also
        if self.inherits:
            g["inheritsFrom"] = ";".join(x.key() for x in self.inherits)
        g["inputs"] = {ROLES.get(a, a): self.locate(s, self.origin)[1] for a, s in self.inputs.items()}
        g["inputUnits"] = {ROLES.get(a, a): s.partition("|")[2] for a, s in self.inputs.items()}
        g["outputUnit"] = self.out
        g["note"] = self.note
        errs = []
        if self.ex:
            for at in self.cs:
                x, v = self.exact(at), self.sheet.value(*at)
                errs.append(abs(v - x) / abs(x))
        g["maxRelativeErrorOnSheet"] = float(f"{max(errs):.4g}") if errs else None
        g["cellsEvaluated"] = len(errs)
        g["cellsOffByMoreThan0_1pct"] = sum(e > 1e-3 for e in errs)
        return g


class Sheet:
    def __init__(self, book, name):
        self.book, self.name = book, name
        self.data, self.fmt, self.cached, self.ignore, self.tables, self.runs, self.widths = {}, {}, {}, [], [], {}, {}

    def value(self, c, r):
        v = self.data.get((c, r))
        if isinstance(v, str) and v.startswith("="):
            v = self.cached[(c, r)]
        if not isinstance(v, (int, float)):
            raise ValueError(f"{self.book.name} {self.name}!{cname(c)}{r}: no number but {v!r}")
        return v

    def put(self, ref, v):
        self.data[cell(ref)] = v

    def row(self, ref, vs):
        c, r = cell(ref)
        for i, v in enumerate(vs):
            if v not in (None, ""):
                self.data[(c + i, r)] = v

    def col(self, ref, vs):
        c, r = cell(ref)
        for i, v in enumerate(vs):
            if v not in (None, ""):
                self.data[(c, r + i)] = v

    def grid(self, ref, rows):
        c, r = cell(ref)
        for i, vs in enumerate(rows):
            self.row(f"{cname(c)}{r+i}", vs)

    def style(self, rng, fmt):
        for k in cells(rng):
            self.fmt[k] = fmt

    def fill(self, rng, formula):
        cs = cells(rng)
        for c, r in cs:
            self.data[(c, r)] = shift(formula, c - cs[0][0], r - cs[0][1])
        self.runs[cs[0]] = cs
        return cs

    def g(self, rng, formula, q, ex, out, mistake=None, note="", also=(), alsoq=(), inh=(), tol=6e-3, **inputs):
        g = Group(self, self.fill(rng, formula), q, ex, out, mistake, note, list(also), list(alsoq), list(inh), tol, inputs)
        self.book.groups.append(g)
        return g

    def slip(self, group, ref, v, mistake, note="", also=("fill-break",), **inputs):
        at = cell(ref)
        group.cs.remove(at)
        self.data[at] = v
        g = Group(self, [at], group.q, group.ex, group.out, mistake, note, [a for a in also if a != mistake], group.alsoq, [], group.tol, {**group.inputs, **inputs})
        self.book.groups.append(g)
        return g

    def other(self, rng, formula):
        self.ignore.append(compress(self.fill(rng, formula)))

    def table(self, name, rng):
        self.tables.append((name, rng))


class Book:
    def __init__(self, name, about, shared=False, inline=False):
        self.name, self.about, self.shared, self.inline = name, about, shared, inline
        self.sheets, self.groups, self.names = {}, [], []

    def sheet(self, name):
        s = self.sheets[name] = Sheet(self, name)
        return s

    def define(self, name, ref):
        self.names.append((name, ref))

    def truth(self):
        return dict(workbook=self.name + ".xlsx", about=self.about, stored="shared formulas" if self.shared else "plain formulas",
                    groups=[g.truth() for g in self.groups],
                    ignore=[dict(sheet=s.name, cells=c) for s in self.sheets.values() for c in s.ignore])

    # ---- the file itself ----
    def write(self, path, values=True):
        strings, formats = {}, ["General", "@bold"]
        sheets = [self._sheet(s, strings, formats, values) for s in self.sheets.values()]
        ntab, parts = 0, {}
        ct = ['<Override PartName="/xl/workbook.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml"/>',
              '<Override PartName="/xl/styles.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"/>']
        for i, (s, xml) in enumerate(zip(self.sheets.values(), sheets), 1):
            rel = ""
            for name, rng in s.tables:
                ntab += 1
                parts[f"xl/tables/table{ntab}.xml"] = self._table(s, ntab, name, rng)
                ct.append(f'<Override PartName="/xl/tables/table{ntab}.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.table+xml"/>')
                rel += f'<Relationship Id="rId{ntab}" Type="{OD}/relationships/table" Target="../tables/table{ntab}.xml"/>'
            if rel:
                parts[f"xl/worksheets/_rels/sheet{i}.xml.rels"] = RELS.format(rel)
                ids = re.findall(r'Id="(rId\d+)"', rel)
                xml = xml.replace("</worksheet>", f'<tableParts count="{len(ids)}">' + "".join(f'<tablePart r:id="{x}"/>' for x in ids) + "</tableParts></worksheet>")
            parts[f"xl/worksheets/sheet{i}.xml"] = HEAD + xml
            ct.append(f'<Override PartName="/xl/worksheets/sheet{i}.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"/>')
        k = len(sheets)
        wb = f'<workbook xmlns="{MAIN}" xmlns:r="{OD}/relationships"><sheets>' + "".join(
            f'<sheet name={quoteattr(n)} sheetId="{i}" r:id="rId{i}"/>' for i, n in enumerate(self.sheets, 1)) + "</sheets>"
        if self.names:
            wb += "<definedNames>" + "".join(f"<definedName name={quoteattr(n)}>{escape(r)}</definedName>" for n, r in sorted(self.names)) + "</definedNames>"
        parts["xl/workbook.xml"] = HEAD + wb + '<calcPr calcId="0"/></workbook>'
        rel = "".join(f'<Relationship Id="rId{i}" Type="{OD}/relationships/worksheet" Target="worksheets/sheet{i}.xml"/>' for i in range(1, k + 1))
        rel += f'<Relationship Id="rId{k+1}" Type="{OD}/relationships/styles" Target="styles.xml"/>'
        if strings:
            rel += f'<Relationship Id="rId{k+2}" Type="{OD}/relationships/sharedStrings" Target="sharedStrings.xml"/>'
            ct.append('<Override PartName="/xl/sharedStrings.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sharedStrings+xml"/>')
            parts["xl/sharedStrings.xml"] = HEAD + f'<sst xmlns="{MAIN}" count="{len(strings)}" uniqueCount="{len(strings)}">' + "".join(
                f'<si><t xml:space="preserve">{escape(t)}</t></si>' for t in strings) + "</sst>"
        parts["xl/_rels/workbook.xml.rels"] = RELS.format(rel)
        parts["xl/styles.xml"] = self._styles(formats)
        parts["_rels/.rels"] = RELS.format(f'<Relationship Id="rId1" Type="{OD}/relationships/officeDocument" Target="xl/workbook.xml"/>')
        parts["[Content_Types].xml"] = HEAD + ('<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">'
            '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/>' + "".join(ct) + "</Types>")
        with zipfile.ZipFile(path, "w", zipfile.ZIP_DEFLATED) as z:
            for n in sorted(parts):
                z.writestr(zipfile.ZipInfo(n, (2024, 1, 1, 0, 0, 0)), parts[n], zipfile.ZIP_DEFLATED)

    def _sheet(self, s, strings, formats, values):
        lead, member = {}, {}
        if self.shared:
            for i, (first, cs) in enumerate(s.runs.items()):
                f0 = s.data[first]
                ok = len(cs) > 1 and all(s.data[k] == shift(f0, k[0] - first[0], k[1] - first[1]) for k in cs)
                if ok:
                    lead[first] = (i, compress(cs))
                    member.update({k: i for k in cs if k != first})
        rows = {}
        for (c, r), v in s.data.items():
            rows.setdefault(r, {})[c] = v
        out = []
        for r in sorted(rows):
            xs = []
            for c in sorted(rows[r]):
                v, k = rows[r][c], (c, r)
                fmt = s.fmt.get(k, "General")
                if fmt not in formats:
                    formats.append(fmt)
                a = f'r="{cname(c)}{r}"' + (f' s="{formats.index(fmt)}"' if fmt != "General" else "")
                if isinstance(v, str) and v.startswith("="):
                    f = f"<f>{escape(v[1:])}</f>"
                    if k in lead:
                        f = f'<f t="shared" ref="{lead[k][1]}" si="{lead[k][0]}">{escape(v[1:])}</f>'
                    elif k in member:
                        f = f'<f t="shared" si="{member[k]}"/>'
                    x = s.cached.get(k) if values else None
                    if isinstance(x, str):
                        xs.append(f'<c {a} t="str">{f}<v>{escape(x)}</v></c>')
                    else:
                        xs.append(f"<c {a}>{f}" + (f"<v>{x!r}</v>" if x is not None else "") + "</c>")
                elif isinstance(v, str) and self.inline:
                    xs.append(f'<c {a} t="inlineStr"><is><t xml:space="preserve">{escape(v)}</t></is></c>')
                elif isinstance(v, str):
                    xs.append(f'<c {a} t="s"><v>{strings.setdefault(v, len(strings))}</v></c>')
                else:
                    xs.append(f"<c {a}><v>{v!r}</v></c>")
            out.append(f'<row r="{r}">{"".join(xs)}</row>')
        return f'<worksheet xmlns="{MAIN}" xmlns:r="{OD}/relationships"><sheetData>{"".join(out)}</sheetData></worksheet>'

    def _table(self, s, i, name, rng):
        cs = cells(rng)
        top = cs[0][1]
        cols = [s.data[k] for k in cs if k[1] == top]
        return HEAD + (f'<table xmlns="{MAIN}" id="{i}" name="{name}" displayName="{name}" ref="{rng}" totalsRowShown="0"><autoFilter ref="{rng}"/>'
            f'<tableColumns count="{len(cols)}">' + "".join(f'<tableColumn id="{j}" name={quoteattr(c)}/>' for j, c in enumerate(cols, 1)) + "</tableColumns></table>")

    def _styles(self, formats):
        custom = {f: 164 + i for i, f in enumerate(x for x in formats if x not in ("General", "@bold"))}
        nf = f'<numFmts count="{len(custom)}">' + "".join(f'<numFmt numFmtId="{i}" formatCode={quoteattr(f)}/>' for f, i in custom.items()) + "</numFmts>" if custom else ""
        xf = "".join('<xf numFmtId="0" fontId="1" fillId="0" borderId="0" xfId="0" applyFont="1"/>' if f == "@bold" else
                     f'<xf numFmtId="{custom.get(f, 0)}" fontId="0" fillId="0" borderId="0" xfId="0" applyNumberFormat="1"/>' for f in formats)
        return HEAD + (f'<styleSheet xmlns="{MAIN}">{nf}<fonts count="2"><font><sz val="11"/><name val="Calibri"/></font><font><b/><sz val="11"/><name val="Calibri"/></font></fonts>'
            '<fills count="2"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill></fills>'
            '<borders count="1"><border><left/><right/><top/><bottom/><diagonal/></border></borders><cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs>'
            f'<cellXfs count="{len(formats)}">{xf}</cellXfs></styleSheet>')


HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n'
MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main"
OD = "http://schemas.openxmlformats.org/officeDocument/2006"
RELS = HEAD + '<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">{}</Relationships>'
