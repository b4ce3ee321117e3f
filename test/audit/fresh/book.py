"""A small workbook writer and the truth that goes with each group of cells.  Standard library only."""
import re
import zipfile
import xml.etree.ElementTree as ET
from xml.sax.saxutils import escape

QUANTITIES = dict(
    FC="frequency-conversion", NF="natural-frequency", FR="frequency-ratio", DR="damping-ratio", DC="damping-coefficient",
    CD="critical-damping", SD="static-deflection", RSD="required-static-deflection", RNF="required-natural-frequency",
    RK="required-stiffness", MK="mount-stiffness", ML="mount-load", AT="absolute-transmissibility",
    RT="relative-transmissibility", IE="isolation-efficiency", DB="transmissibility-db", AP="absolute-phase",
    RP="relative-phase", PT="peak-transmissibility", MC="motion-conversion", PM="payload-motion",
    RD="relative-displacement", MF="mount-force", OR="overall-rms", RR="random-response-rms", HE="helper",
)
MISTAKES = set(
    """undamped-form numerator-damping-missing damping-not-squared ratio-not-squared square-root-missing ratio-inverted
    absolute-value-missing absolute-used-for-relative relative-used-for-absolute angular-cyclic-mixup speed-unit length-unit
    mass-weight-mixup percent-as-ratio loss-factor-as-damping-ratio amplitude-kind decibel-factor constant-wrong sign-precedence
    mount-count-missing total-for-per-mount half-pi-missing fill-break value-typed-over reference-slip
    static-stiffness-for-dynamic efficiency-not-of-motion""".split()
)
FORMATS = ["General", "0", "0.00", "0.000", "0%", "0.0%", "yyyy\\-mm\\-dd", "0.00E+00", "#,##0", '0.0" %"']


def col_number(s):
    n = 0
    for ch in s:
        n = n * 26 + ord(ch) - 64
    return n


def col_name(n):
    s = ""
    while n:
        n, d = divmod(n - 1, 26)
        s = chr(65 + d) + s
    return s


def expand(ref):
    out = []
    for part in ref.replace("$", "").split(","):
        a, b, c, d = re.fullmatch(r"([A-Z]+)(\d+)(?::([A-Z]+)(\d+))?", part.strip()).groups()
        c, d = c or a, d or b
        out += [(k, r) for r in range(int(b), int(d) + 1) for k in range(col_number(a), col_number(c) + 1)]
    return out


REF = re.compile(r'"[^"]*"|\[[^\[\]]*\]|(?<![A-Za-z0-9_.])(\$?)([A-Z]{1,2})(\$?)(\d+)(?![A-Za-z0-9_(.])')


def shift(formula, dc, dr):
    def one(m):
        if m.group(2) is None:
            return m.group(0)
        a, c, b, r = m.groups()
        return f"{a}{c if a else col_name(col_number(c) + dc)}{b}{r if b else int(r) + dr}"
    return REF.sub(one, formula)


class Sheet:
    def __init__(self, book, name):
        self.book, self.name, self.cells, self.merges, self.tables = book, name, {}, [], []

    def put(self, at, rows, fmt=None):
        """A value, a row of values, or rows of values, from the cell `at`."""
        (c, r), = expand(at)
        rows = rows if isinstance(rows, list) else [rows]
        rows = rows if rows and isinstance(rows[0], list) else [rows]
        for i, row in enumerate(rows):
            for j, v in enumerate(row):
                if v is not None:
                    self.cells[c + j, r + i] = [v, fmt]

    def down(self, at, values, fmt=None):
        self.put(at, [[v] for v in values], fmt)

    def fill(self, cells, formula, fmt=None):
        todo = expand(cells)
        for c, r in todo:
            v = shift(formula, c - todo[0][0], r - todo[0][1]) if isinstance(formula, str) else formula
            self.cells[c, r] = [v, fmt]

    def g(self, cells, formula, quantity, mistake, inputs, model, out, note="", q=(), m=(), tol=4e-3, fmt=None, heir=None):
        """One group: fill the cells and record what they are.  `inputs` is 'role=range unit; ...' in the model's order."""
        if formula is not None:
            self.fill(cells, formula, fmt)
        assert mistake is None or mistake == "other" or mistake in MISTAKES, mistake
        roles, units = {}, {}
        for part in filter(None, (p.strip() for p in inputs.split(";"))):
            role, rest = part.split("=", 1)
            ref, _, unit = rest.partition(" ")
            roles[role], units[role] = ref, unit or "1"
        t = dict(sheet=self.name, cells=cells, quantity=QUANTITIES[quantity], correct=mistake is None,
                 mistake=None if mistake == "other" else mistake, inputs={k: v.lstrip("@") for k, v in roles.items()},
                 inputUnits=units, outputUnit=out, note=note)
        if q:
            t["alsoAcceptQuantity"] = [QUANTITIES[x] for x in q]
        if m:
            assert set(m) <= MISTAKES
            t["alsoAcceptMistake"] = list(m)
        if heir:
            t["inheritsFrom"] = ";".join(f"{self.name}!{h}" for h in heir)
        self.book.groups.append((t, roles, model, tol))

    def ig(self, cells, formula=None, fmt=None):
        if formula is not None:
            self.fill(cells, formula, fmt)
        self.book.ignore.append(dict(sheet=self.name, cells=cells))

    def table(self, name, ref):
        self.tables.append((name, ref))


class Book:
    def __init__(self, name, about, shared_strings=True, shared_formulas=False, resave=False):
        self.name, self.about, self.sheets, self.names, self.groups, self.ignore = name, about, [], [], [], []
        self.shared_strings, self.shared_formulas, self.resave = shared_strings, shared_formulas, resave

    def sheet(self, name):
        self.sheets.append(Sheet(self, name))
        return self.sheets[-1]

    def name_cell(self, name, ref):
        self.names.append((name, ref))


def cell_xml(ref, v, fmt, cached, strings, formula_xml):
    s = f' s="{FORMATS.index(fmt)}"' if fmt else ""
    if isinstance(v, str) and v.startswith("="):
        if cached is None:
            return f'<c r="{ref}"{s}>{formula_xml}</c>'
        if isinstance(cached, str):
            return f'<c r="{ref}"{s} t="str">{formula_xml}<v>{escape(cached)}</v></c>'
        return f'<c r="{ref}"{s}>{formula_xml}<v>{cached!r}</v></c>'
    if isinstance(v, str):
        if strings is None:
            return f'<c r="{ref}"{s} t="inlineStr"><is><t xml:space="preserve">{escape(v)}</t></is></c>'
        return f'<c r="{ref}"{s} t="s"><v>{strings.setdefault(v, len(strings))}</v></c>'
    return f'<c r="{ref}"{s}><v>{v!r}</v></c>'


def shared_runs(sheet):
    """Column runs of one relative formula, by first cell: how desktop programs store a filled-down column."""
    runs, done = {}, set()
    for (c, r), (v, _) in sorted(sheet.cells.items()):
        if (c, r) in done or not (isinstance(v, str) and v.startswith("=")) or "[" in v:
            continue
        last = r
        while (c, last + 1) in sheet.cells and sheet.cells[c, last + 1][0] == shift(v, 0, last + 1 - r):
            last += 1
        if last > r:
            runs[c, r] = last
            done |= {(c, k) for k in range(r, last + 1)}
    return runs


NS = "http://schemas.openxmlformats.org/spreadsheetml/2006/main"
REL = "http://schemas.openxmlformats.org/officeDocument/2006/relationships"
HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n'


def sheet_xml(book, sheet, values, strings):
    runs = shared_runs(sheet) if book.shared_formulas else {}
    inside = {(c, k): i for i, ((c, r), last) in enumerate(runs.items()) for k in range(r, last + 1)}
    rows = {}
    for (c, r), (v, fmt) in sorted(sheet.cells.items(), key=lambda x: (x[0][1], x[0][0])):
        ref = f"{col_name(c)}{r}"
        f = f"<f>{escape(v[1:])}</f>" if isinstance(v, str) and v.startswith("=") else ""
        if f and (c, r) in inside:
            i = inside[c, r]
            f = f'<f t="shared" ref="{ref}:{col_name(c)}{runs[c, r]}" si="{i}">{escape(v[1:])}</f>' if (c, r) in runs else f'<f t="shared" si="{i}"/>'
        cached = values.get((sheet.name, c, r)) if values else None
        rows.setdefault(r, []).append(cell_xml(ref, v, fmt, cached, strings, f))
    body = "".join(f'<row r="{r}">{"".join(cs)}</row>' for r, cs in rows.items())
    merges = f'<mergeCells count="{len(sheet.merges)}">{"".join(f"""<mergeCell ref="{m}"/>""" for m in sheet.merges)}</mergeCells>' if sheet.merges else ""
    parts = "".join(f'<tablePart r:id="rId{i + 1}"/>' for i in range(len(sheet.tables)))
    parts = f'<tableParts count="{len(sheet.tables)}">{parts}</tableParts>' if parts else ""
    return f'{HEAD}<worksheet xmlns="{NS}" xmlns:r="{REL}"><sheetData>{body}</sheetData>{merges}{parts}</worksheet>'


def table_xml(sheet, number, name, ref):
    cells = expand(ref)
    top = cells[0][1]
    heads = [sheet.cells[c, r][0] for c, r in cells if r == top]
    columns = ""
    for i, h in enumerate(heads):
        v = sheet.cells.get((cells[0][0] + i, top + 1), [""])[0]
        calc = f"<calculatedColumnFormula>{escape(v[1:])}</calculatedColumnFormula>" if isinstance(v, str) and v.startswith("=") else ""
        columns += f'<tableColumn id="{i + 1}" name="{escape(h)}">{calc}</tableColumn>'
    return f'{HEAD}<table xmlns="{NS}" id="{number}" name="{name}" displayName="{name}" ref="{ref}"><autoFilter ref="{ref}"/><tableColumns count="{len(heads)}">{columns}</tableColumns></table>'


def write(book, path, values=None):
    strings = {} if book.shared_strings else None
    files, n_table = {}, 0
    kinds = [("/xl/workbook.xml", "sheet.main"), ("/xl/styles.xml", "styles")]
    for i, s in enumerate(book.sheets, 1):
        files[f"xl/worksheets/sheet{i}.xml"] = sheet_xml(book, s, values, strings)
        kinds.append((f"/xl/worksheets/sheet{i}.xml", "worksheet"))
        links = ""
        for j, (name, ref) in enumerate(s.tables, 1):
            n_table += 1
            files[f"xl/tables/table{n_table}.xml"] = table_xml(s, n_table, name, ref)
            kinds.append((f"/xl/tables/table{n_table}.xml", "table"))
            links += f'<Relationship Id="rId{j}" Type="{REL}/table" Target="../tables/table{n_table}.xml"/>'
        if links:
            files[f"xl/worksheets/_rels/sheet{i}.xml.rels"] = f'{HEAD}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">{links}</Relationships>'
    sheets = "".join(f'<sheet name="{escape(s.name)}" sheetId="{i}" r:id="rId{i}"/>' for i, s in enumerate(book.sheets, 1))
    names = "".join(f'<definedName name="{n}">{escape(r)}</definedName>' for n, r in book.names)
    files["xl/workbook.xml"] = f'{HEAD}<workbook xmlns="{NS}" xmlns:r="{REL}"><sheets>{sheets}</sheets>{f"<definedNames>{names}</definedNames>" if names else ""}</workbook>'
    k = len(book.sheets)
    rel = "".join(f'<Relationship Id="rId{i}" Type="{REL}/worksheet" Target="worksheets/sheet{i}.xml"/>' for i in range(1, k + 1))
    rel += f'<Relationship Id="rId{k + 1}" Type="{REL}/styles" Target="styles.xml"/>'
    if strings is not None:
        rel += f'<Relationship Id="rId{k + 2}" Type="{REL}/sharedStrings" Target="sharedStrings.xml"/>'
        kinds.append(("/xl/sharedStrings.xml", "sharedStrings"))
        files["xl/sharedStrings.xml"] = f'{HEAD}<sst xmlns="{NS}" count="{len(strings)}" uniqueCount="{len(strings)}">' + "".join(f'<si><t xml:space="preserve">{escape(t)}</t></si>' for t in strings) + "</sst>"
    files["xl/_rels/workbook.xml.rels"] = f'{HEAD}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">{rel}</Relationships>'
    files["_rels/.rels"] = f'{HEAD}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="{REL}/officeDocument" Target="xl/workbook.xml"/></Relationships>'
    fmts = "".join(f'<numFmt numFmtId="{163 + i}" formatCode="{escape(f, {chr(34): "&quot;"})}"/>' for i, f in enumerate(FORMATS) if i)
    xfs = "".join(f'<xf numFmtId="{163 + i if i else 0}" fontId="0" fillId="0" borderId="0" xfId="0" applyNumberFormat="1"/>' for i in range(len(FORMATS)))
    files["xl/styles.xml"] = f'{HEAD}<styleSheet xmlns="{NS}"><numFmts count="{len(FORMATS) - 1}">{fmts}</numFmts><fonts count="1"><font><sz val="11"/><name val="Calibri"/></font></fonts><fills count="2"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill></fills><borders count="1"><border/></borders><cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs><cellXfs count="{len(FORMATS)}">{xfs}</cellXfs></styleSheet>'
    over = "".join(f'<Override PartName="{p}" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.{t}+xml"/>' for p, t in kinds)
    types = f'{HEAD}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/>{over}</Types>'
    pack(path, {"[Content_Types].xml": types, **files})


def pack(path, files):
    with zipfile.ZipFile(path, "w", zipfile.ZIP_DEFLATED) as z:
        for name, text in files.items():
            info = zipfile.ZipInfo(name, (2021, 3, 4, 9, 0, 0))
            info.compress_type = zipfile.ZIP_DEFLATED
            z.writestr(info, text)


def read_values(path):
    """{(sheet, column, row): number or text} of a saved workbook."""
    out, n = {}, {"m": NS}
    with zipfile.ZipFile(path) as z:
        strings = []
        if "xl/sharedStrings.xml" in z.namelist():
            strings = ["".join(t.text or "" for t in si.iter(f"{{{NS}}}t")) for si in ET.fromstring(z.read("xl/sharedStrings.xml"))]
        for i, s in enumerate(ET.fromstring(z.read("xl/workbook.xml")).find("m:sheets", n), 1):
            for c in ET.fromstring(z.read(f"xl/worksheets/sheet{i}.xml")).iter(f"{{{NS}}}c"):
                v = c.find("m:v", n)
                if v is None or v.text is None:
                    continue
                a, b = re.fullmatch(r"([A-Z]+)(\d+)", c.get("r")).groups()
                t = c.get("t")
                out[s.get("name"), col_number(a), int(b)] = strings[int(v.text)] if t == "s" else v.text if t in ("str", "e", "b") else float(v.text)
    return out
