"""Write a workbook as .xlsx, and read cached values back. Standard library only; the same input gives the same bytes."""
import io
import re
import xml.etree.ElementTree as ET
import zipfile
from xml.sax.saxutils import escape

from sheet import cells, key, name, shift

NS = "http://schemas.openxmlformats.org/spreadsheetml/2006/main"
REL = "http://schemas.openxmlformats.org/officeDocument/2006/relationships"
HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n'


def split_args(text):
    out, depth, quoted, cur = [], 0, False, ""
    for ch in text:
        if ch == '"':
            quoted = not quoted
        if not quoted and ch in "([{":
            depth += 1
        if not quoted and ch in ")]}":
            depth -= 1
        if ch == "," and not depth and not quoted:
            out.append(cur)
            cur = ""
        else:
            cur += ch
    return out + [cur]


def expand_let(f):
    """LET written out by substitution, for a calculator that lacks it."""
    while "LET(" in f:
        a = f.rindex("LET(")
        depth, i = 1, a + 4
        while depth:
            depth += {"(": 1, ")": -1}.get(f[i], 0)
            i += 1
        args = split_args(f[a + 4 : i - 1])
        body, known = args[-1], {}

        def put(t):
            for n, v in known.items():
                t = re.sub(rf"(?<![A-Za-z0-9_.$]){re.escape(n)}(?![A-Za-z0-9_(.])", lambda _: f"({v})", t)
            return t

        for n, v in zip(args[:-1:2], args[1::2]):
            known[n.strip()] = put(v)
        f = f"{f[:a]}({put(body)}){f[i:]}"
    return f


def filed_let(f):
    """LET as a file stores it, with its prefixes."""
    if "LET(" not in f:
        return f
    a = f.index("LET(")
    depth, i = 1, a + 4
    while depth:
        depth += {"(": 1, ")": -1}.get(f[i], 0)
        i += 1
    inner = f[a + 4 : i - 1]
    for n in [x.strip() for x in split_args(inner)[:-1:2]]:
        inner = re.sub(rf"(?<![A-Za-z0-9_.$]){re.escape(n)}(?![A-Za-z0-9_(.])", f"_xlpm.{n}", inner)
    return f"{f[:a]}_xlfn.LET({inner}){f[i:]}"


def cell_xml(sheet, k, v, style, values, strings, plain, master):
    r, s = name(k), f' s="{style}"' if style else ""
    if isinstance(v, str) and v.startswith("="):
        text = expand_let(v[1:]) if plain else filed_let(v[1:])
        kind = master.get(k)
        f = f"<f>{escape(text)}</f>"
        if kind:
            si, ref = kind
            f = f'<f t="shared" ref="{ref}" si="{si}">{escape(text)}</f>' if ref else f'<f t="shared" si="{si}"/>'
        got = None if values is None else values[(sheet.title, k)]
        if got is None:
            return f'<c r="{r}"{s}>{f}</c>'
        if isinstance(got, bool):
            return f'<c r="{r}"{s} t="b">{f}<v>{int(got)}</v></c>'
        if isinstance(got, str):
            return f'<c r="{r}"{s} t="str">{f}<v>{escape(got)}</v></c>'
        return f'<c r="{r}"{s}>{f}<v>{got!r}</v></c>'
    if isinstance(v, str):
        if strings is None:
            return f'<c r="{r}"{s} t="inlineStr"><is><t xml:space="preserve">{escape(v)}</t></is></c>'
        i = strings.setdefault(v, len(strings))
        return f'<c r="{r}"{s} t="s"><v>{i}</v></c>'
    return f'<c r="{r}"{s}><v>{v!r}</v></c>'


def shared_runs(sheet):
    """Columns whose every cell still reads as filled may be stored as one shared formula."""
    out, si = {}, 0
    for ref in sheet.filled:
        ks = cells(ref)
        first = sheet.cell[ks[0]]
        if "[" in first or "!" in first or any(sheet.cell[k] != shift(first, k[0] - ks[0][0], 0) for k in ks):
            continue
        for i, k in enumerate(ks):
            out[k] = (si, ref if i == 0 else None)
        si += 1
    return out


def write(book, values=None, plain=False):
    strings = None if book.stored == "inline" else {}
    files = {}
    fmts = sorted({c for s in book.sheets for c in s.fmt.values()})
    style = {c: i + 1 for i, c in enumerate(fmts)}
    sheets, rels, types, defined = "", "", "", ""
    for i, s in enumerate(book.sheets, 1):
        master = shared_runs(s) if book.stored == "shared" and not plain else {}
        rows = {}
        for k in sorted(s.cell):
            rows.setdefault(k[0], []).append(cell_xml(s, k, s.cell[k], style.get(s.fmt.get(k)), values, strings, plain, master))
        data = "".join(f'<row r="{r}">{"".join(x)}</row>' for r, x in rows.items())
        cols = "".join(f'<col min="{c}" max="{c}" width="{w}" customWidth="1"/>' for c, w in sorted(s.widths.items()))
        merged = "".join(f'<mergeCell ref="{m}"/>' for m in s.merged)
        part = f"xl/worksheets/sheet{i}.xml"
        tail = ""
        if s.table:
            tail = '<tableParts count="1"><tablePart r:id="rId1"/></tableParts>'
            tname, ref = s.table
            a, b = ref.split(":")
            (r0, c0), (_, c1) = key(a), key(b)
            heads = [s.cell[(r0, c)] for c in range(c0, c1 + 1)]
            tc = "".join(f'<tableColumn id="{j}" name="{escape(h)}"/>' for j, h in enumerate(heads, 1))
            files[f"xl/tables/table{i}.xml"] = (
                f'{HEAD}<table xmlns="{NS}" id="{i}" name="{tname}" displayName="{tname}" ref="{ref}" totalsRowShown="0">'
                f'<autoFilter ref="{ref}"/><tableColumns count="{len(heads)}">{tc}</tableColumns></table>'
            )
            files[f"xl/worksheets/_rels/sheet{i}.xml.rels"] = (
                f'{HEAD}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">'
                f'<Relationship Id="rId1" Type="{REL}/table" Target="../tables/table{i}.xml"/></Relationships>'
            )
            types += f'<Override PartName="/xl/tables/table{i}.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.table+xml"/>'
        files[part] = (
            f'{HEAD}<worksheet xmlns="{NS}" xmlns:r="{REL}">{f"<cols>{cols}</cols>" if cols else ""}<sheetData>{data}</sheetData>'
            f'{f"<mergeCells>{merged}</mergeCells>" if merged else ""}{tail}</worksheet>'
        )
        sheets += f'<sheet name="{escape(s.title)}" sheetId="{i}" r:id="rId{i}"/>'
        rels += f'<Relationship Id="rId{i}" Type="{REL}/worksheet" Target="worksheets/sheet{i}.xml"/>'
        types += f'<Override PartName="/{part}" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"/>'
    n = len(book.sheets) + 1
    rels += f'<Relationship Id="rId{n}" Type="{REL}/styles" Target="styles.xml"/>'
    types += '<Override PartName="/xl/styles.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"/>'
    if strings is not None:
        rels += f'<Relationship Id="rId{n + 1}" Type="{REL}/sharedStrings" Target="sharedStrings.xml"/>'
        types += '<Override PartName="/xl/sharedStrings.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sharedStrings+xml"/>'
        si = "".join(f'<si><t xml:space="preserve">{escape(t)}</t></si>' for t in strings)
        files["xl/sharedStrings.xml"] = f'{HEAD}<sst xmlns="{NS}" uniqueCount="{len(strings)}">{si}</sst>'
    for dn, target in book.names.items():
        defined += f'<definedName name="{dn}">{escape(target)}</definedName>'
    files["xl/workbook.xml"] = (
        f'{HEAD}<workbook xmlns="{NS}" xmlns:r="{REL}"><sheets>{sheets}</sheets>'
        f'{f"<definedNames>{defined}</definedNames>" if defined else ""}</workbook>'
    )
    nf = "".join(f'<numFmt numFmtId="{164 + i}" formatCode="{escape(c, {chr(34): "&quot;"})}"/>' for i, c in enumerate(fmts))
    xf = "".join(f'<xf numFmtId="{164 + i}" fontId="0" fillId="0" borderId="0" xfId="0" applyNumberFormat="1"/>' for i in range(len(fmts)))
    files["xl/styles.xml"] = (
        f'{HEAD}<styleSheet xmlns="{NS}">{f"<numFmts count={chr(34)}{len(fmts)}{chr(34)}>{nf}</numFmts>" if fmts else ""}'
        '<fonts count="1"><font><sz val="11"/><name val="Calibri"/></font></fonts><fills count="2"><fill><patternFill patternType="none"/></fill>'
        '<fill><patternFill patternType="gray125"/></fill></fills><borders count="1"><border><left/><right/><top/><bottom/><diagonal/></border></borders>'
        f'<cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs><cellXfs count="{len(fmts) + 1}">'
        f'<xf numFmtId="0" fontId="0" fillId="0" borderId="0" xfId="0"/>{xf}</cellXfs></styleSheet>'
    )
    pkg = "http://schemas.openxmlformats.org/package/2006"
    files["xl/_rels/workbook.xml.rels"] = f'{HEAD}<Relationships xmlns="{pkg}/relationships">{rels}</Relationships>'
    files["_rels/.rels"] = f'{HEAD}<Relationships xmlns="{pkg}/relationships"><Relationship Id="rId1" Type="{REL}/officeDocument" Target="xl/workbook.xml"/></Relationships>'
    files["[Content_Types].xml"] = (
        f'{HEAD}<Types xmlns="{pkg}/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>'
        '<Default Extension="xml" ContentType="application/xml"/><Override PartName="/xl/workbook.xml" '
        f'ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml"/>{types}</Types>'
    )
    return pack(files)


def pack(files):
    buf = io.BytesIO()
    with zipfile.ZipFile(buf, "w", zipfile.ZIP_DEFLATED) as z:
        for f in sorted(files):
            info = zipfile.ZipInfo(f, (2024, 1, 1, 0, 0, 0))
            info.compress_type = zipfile.ZIP_DEFLATED
            z.writestr(info, files[f])
    return buf.getvalue()


def repack(data):
    """Another program's file with its clock times taken out."""
    files = {}
    with zipfile.ZipFile(io.BytesIO(data)) as z:
        for f in z.namelist():
            files[f] = re.sub(rb"\d{4}-\d\d-\d\dT[\d:.]+Z", b"2024-01-01T00:00:00Z", z.read(f)) if f.startswith("docProps") else z.read(f)
    return pack(files)


def read_values(data):
    out = {}
    with zipfile.ZipFile(io.BytesIO(data)) as z:
        strings = []
        if "xl/sharedStrings.xml" in z.namelist():
            for si in ET.fromstring(z.read("xl/sharedStrings.xml")):
                strings.append("".join(t.text or "" for t in si.iter(f"{{{NS}}}t")))
        rel = {r.get("Id"): r.get("Target") for r in ET.fromstring(z.read("xl/_rels/workbook.xml.rels"))}
        for sh in ET.fromstring(z.read("xl/workbook.xml")).iter(f"{{{NS}}}sheet"):
            root = ET.fromstring(z.read("xl/" + rel[sh.get(f"{{{REL}}}id")]))
            for c in root.iter(f"{{{NS}}}c"):
                v, t = c.find(f"{{{NS}}}v"), c.get("t", "n")
                if v is None or v.text is None:
                    continue
                at = (sh.get("name"), key(c.get("r")))
                if t == "e":
                    raise ValueError(f"{at[0]}!{c.get('r')} is {v.text}")
                out[at] = strings[int(v.text)] if t == "s" else v.text if t == "str" else bool(int(v.text)) if t == "b" else float(v.text)
    return out
