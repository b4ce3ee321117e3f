"""Vineyard sprayer (complex functions), scanner chiller (structured references), organ blower (cards), quarry cabins (kgf, cm, long formulas)."""
from book import Book
from exact import *
import cmath


def sprayer():
    b = Book("vineyard_sprayer_ecu", "complex-number functions, inputs on another sheet, viscous and hysteretic side by side")
    d = b.sheet("Data")
    d.put("A1", [["Control unit on four grommets", None], ["mass", 3.4, "kg"], ["grommets", 4, ""], ["k dyn, each", 215, "N/cm"], ["loss factor η", 0.24, ""], ["base acceleration", 1.8, "g peak"], ["ζ at resonance", None, ""], ["fn", None, "Hz"], ["cc", None, "N·s/m"], ["c per grommet", None, "N·s/m"], ["Q", None, ""]])
    d.g("B7", "=B5/2", "DR", None, "loss_factor=B5", lambda e: e / 2, "1")
    d.g("B8", "=SQRT(B3*B4*100/B2)/2*PI()", "NF", "sign-precedence", "mount_count=B3; mount_stiffness=B4 N/cm; mass=B2 kg", lambda n, k, m: fn(n * k * 100, m), "Hz", "brackets lost: multiplies by pi", m=["angular-cyclic-mixup"])
    d.g("B9", "=2*SQRT(B3*B4*100*B2)", "CD", None, "mount_count=B3; mount_stiffness=B4 N/cm; mass=B2 kg", lambda n, k, m: 2 * sqrt(n * k * 100 * m), "N·s/m")
    d.g("B10", "=B7*B9/B3", "DC", None, "damping_ratio=B7; critical_damping=B9 N·s/m; mount_count=B3", lambda z, c, n: z * c / n, "N·s/m")
    d.g("B11", "=1/B5", "DR", None, "loss_factor=B5", lambda e: 1 / e, "1", q=["PT"])
    s = b.sheet("Response")
    s.put("A1", "Payload response; fn, ζ and η from sheet Data")
    s.put("A2", ["f, Hz", "f/fn", "numerator", "denominator", "T viscous", "lag of payload, °", "z/y", "angle of relative motion, °", "T hysteretic, from η", "T viscous (for the chart)", "T viscous, direct from η", "payload, g peak", "T, dB", "payload, m/s² rms", "z, mm peak", "ω, rad/s"])
    s.down("A3", [25, 40, 63, 100, 160, 200, 250, 315, 400, 500, 630])
    r, z, e = "frequency_ratio=B3:B13", "damping_ratio=Data!B7", "loss_factor=Data!B5"
    s.g("B3:B13", "=A3/Data!$B$8", "FR", None, "frequency=A3:A13 Hz; natural_frequency=Data!B8 Hz", lambda f, g: f / g, "1")
    s.g("C3:C13", "=COMPLEX(1,2*Data!$B$7*B3)", "HE", None, f"{r}; {z}", None, "1", "complex text")
    s.g("D3:D13", "=COMPLEX(1-B3^2,2*Data!$B$7*B3)", "HE", None, f"{r}; {z}", None, "1", "complex text")
    s.g("E3:E13", "=IMABS(IMDIV(C3,D3))", "AT", None, f"{r}; {z}", T, "1")
    s.g("F3:F13", "=-DEGREES(IMARGUMENT(IMDIV(C3,D3)))", "AP", None, f"{r}; {z}", lag, "deg")
    s.g("G3:G13", "=B3^2/IMABS(D3)", "RT", None, f"{r}; {z}", R, "1")
    s.g("H3:H13", "=DEGREES(IMARGUMENT(IMDIV(COMPLEX(B3^2,0),D3)))", "RP", None, f"{r}; {z}", rlag, "deg")
    s.g("I3:I13", "=IMABS(IMDIV(COMPLEX(1,Data!$B$5),COMPLEX(1-B3^2,Data!$B$5)))", "AT", None, f"{r}; {e}", Th, "1", "hysteretic, η given")
    s.g("J3:J13", "=1/IMABS(D3)", "AT", "numerator-damping-missing", f"{r}; {z}", T, "1")
    s.g("K3:K13", "=IMABS(IMDIV(COMPLEX(1,2*Data!$B$5*B3),COMPLEX(1-B3^2,2*Data!$B$5*B3)))", "AT", "loss-factor-as-damping-ratio", f"{r}; {e}", lambda r, e: T(r, e / 2), "1", "η where ζ belongs")
    s.g("L3:L13", "=Data!$B$6*E3", "PM", None, "base_motion=Data!B6 g pk; transmissibility=E3:E13", lambda a, t: a * t, "g pk")
    s.g("M3:M13", "=10*LOG(E3)", "DB", "decibel-factor", "transmissibility=E3:E13", lambda t: 20 * math.log10(t), "dB")
    s.g("N3:N13", "=L3*9.81*SQRT(2)", "MC", "amplitude-kind", "motion=L3:L13 g pk", lambda a: a * G / sqrt(2), "m/s² rms")
    s.g("O3:O13", "=Data!$B$6*9.81*1000/(2*PI()*A3)^2*E3", "RD", "absolute-used-for-relative", f"base_acceleration=Data!B6 g pk; frequency=A3:A13 Hz; {r}; {z}", lambda a, f, r, z: a * G * 1000 / (W * f) ** 2 * R(r, z), "mm pk", "z is the relative motion (z/y in column G)", q=["PM"])
    s.g("P3:P13", "=2*PI()*A3", "FC", None, "frequency=A3:A13 Hz", lambda f: W * f, "rad/s")
    return b


def scanner():
    b = Book("scanner_chiller_mounts", "tables with structured references, static and dynamic stiffness, costs in a second table")
    s = b.sheet("Mounts")
    s.put("A1", "Chillers and pumps beside the scanner room")
    heads = ["Tag", "Mass (kg)", "Mounts", "k static (N/mm)", "Dynamic factor", "Damping ratio", "Speed (rpm)", "Base (µm/s rms)", "Load per mount (N)", "Deflection (mm)", "fn dynamic (Hz)", "f (Hz)", "f/fn", "Transmissibility", "Isolation", "Damped fn (Hz)", "c per mount (N·s/m)", "Machine (µm/s rms)", "Peak T", "Relative (µm pk)"]
    s.put("A3", heads)
    s.put("A4", [["CH1", 1900, 6, 210, 1.3, 0.06, 1470, 85], ["CH2", 2050, 6, 210, 1.3, 0.06, 1470, 85], ["P1", 340, 4, 60, 1.2, 0.05, 2930, 40], ["P2", 360, 4, 60, 1.2, 0.05, 2930, 40], ["AC1", 720, 4, 110, 1.4, 0.09, 980, 120], ["AC2", 760, 4, 110, 1.4, 0.09, 980, 120]])
    R_ = lambda role, c, u="": f"{role}={c}4:{c}9 {u}".strip()
    at = lambda h: f"Iso[[#This Row],[{h}]]"
    M, N, K, Q, Z = (at(h) for h in heads[1:6])
    m, n, k, q, z = R_("mass", "B", "kg"), R_("mount_count", "C"), R_("mount_stiffness", "D", "N/mm"), R_("dynamic_ratio", "E"), R_("damping_ratio", "F")
    s.g("I4:I9", f"={M}*9.81/{N}", "ML", None, f"{m}; {n}", lambda m, n: m * G / n, "N")
    s.g("J4:J9", f"={at(heads[8])}/({K}*1000)", "SD", "length-unit", f"{R_('load', 'I', 'N')}; {k}", lambda p, k: p / k, "mm", "metres under a header in mm")
    s.g("K4:K9", f"=SQRT({N}*{K}*{Q}*1000/{M})/(2*PI())", "NF", None, f"{n}; {k}; {q}; {m}", lambda n, k, q, m: fn(n * k * q * 1000, m), "Hz")
    s.g("L4:L9", f"={at('Speed (rpm)')}/60", "FC", None, R_("speed", "G", "rpm"), lambda n: n / 60, "Hz")
    s.g("M4:M9", f"={at('f (Hz)')}/{at('fn dynamic (Hz)')}", "FR", None, f"{R_('frequency', 'L', 'Hz')}; {R_('natural_frequency', 'K', 'Hz')}", lambda f, g: f / g, "1")
    s.g("N4:N9", f"=1/ABS(1-{at('f/fn')}^2)", "AT", "undamped-form", f"{R_('frequency_ratio', 'M')}; {z}", T, "1", "table has a damping ratio and uses it elsewhere")
    s.g("O4:O9", f"=1-{at('Transmissibility')}", "IE", None, R_("transmissibility", "N"), lambda t: 1 - t, "1", "shown as percent", fmt="0.0%")
    s.g("P4:P9", f"={at('fn dynamic (Hz)')}*SQRT(1-{Z}^2)", "NF", None, f"{R_('natural_frequency', 'K', 'Hz')}; {z}", lambda f, z: f * sqrt(1 - z * z), "Hz")
    s.g("Q4:Q9", f"=2*{Z}*SQRT({N}*{K}*{Q}*1000*{M})/{N}", "DC", None, f"{z}; {n}; {k}; {q}; {m}", lambda z, n, k, q, m: 2 * z * sqrt(n * k * q * 1000 * m) / n, "N·s/m")
    s.g("R4:R9", f"={at('Base (µm/s rms)')}*{at('Transmissibility')}", "PM", None, f"{R_('base_motion', 'H', 'µm/s rms')}; {R_('transmissibility', 'N')}", lambda v, t: v * t, "µm/s rms")
    s.g("S4:S9", f"=SQRT(1+1/(2*{Z}))", "PT", "damping-not-squared", z, lambda z: T(1, z), "1")
    s.g("T4:T9", f"={at('Base (µm/s rms)')}*SQRT(2)/(2*PI()*{at('f (Hz)')})*{at('f/fn')}^2/SQRT((1-{at('f/fn')}^2)^2+(2*{Z}*{at('f/fn')})^2)", "RD", None, f"{R_('base_velocity', 'H', 'µm/s rms')}; {R_('frequency', 'L', 'Hz')}; {R_('frequency_ratio', 'M')}; {z}", lambda v, f, r, z: v * sqrt(2) / (W * f) * R(r, z), "µm pk")
    s.table("Iso", "A3:T9")
    s.ig("B11", "=SUM(Iso[Mass (kg)])")
    s.ig("C11", "=SUM(Iso[Mounts])")
    s.put("A11", "Total")
    p = b.sheet("Order")
    p.put("A1", ["Tag", "Qty", "Unit price", "Line total", "Ordered", "Weeks", "Due"])
    p.put("A2", [["CH", 12, 96.5, None, 45210, 6], ["P", 8, 31.2, None, 45217, 4], ["AC", 8, 44.9, None, 45224, 5]])
    p.ig("D2:D4", "=Buy[[#This Row],[Qty]]*Buy[[#This Row],[Unit price]]")
    p.ig("G2:G4", "=Buy[[#This Row],[Ordered]]+7*Buy[[#This Row],[Weeks]]", fmt="yyyy\\-mm\\-dd")
    p.table("Buy", "A1:G4")
    s2 = b.sheet("Targets")
    s2.put("A1", ["Tag", "Speed (rpm)", "Mass (kg)", "Mounts", "Target T", "fn allowed (Hz), undamped", "k per mount (N/mm)", "Deflection needed (mm)"])
    s2.put("A2", [["CH1", 1470, 1900, 6, 0.05], ["P1", 2930, 340, 4, 0.1], ["AC1", 980, 720, 4, 0.1]])
    t = lambda h: f"Goal[[#This Row],[{h}]]"
    s2.g("F2:F4", f"={t('Speed (rpm)')}/60/(1+1/{t('Target T')})", "RNF", "square-root-missing", "speed=B2:B4 rpm; transmissibility=E2:E4", lambda n, x: n / 60 / r_for(x), "Hz")
    s2.g("G2:G4", f"=(2*PI()*{t('fn allowed (Hz), undamped')})^2*{t('Mass (kg)')}/{t('Mounts')}/1000", "RK", None, "natural_frequency=F2:F4 Hz; mass=C2:C4 kg; mount_count=D2:D4", lambda f, m, n: (W * f) ** 2 * m / n / 1000, "N/mm")
    s2.g("H2:H4", f"=(15.8/{t('fn allowed (Hz), undamped')})^2", "RSD", None, "natural_frequency=F2:F4 Hz", lambda f: 1000 * G / (W * f) ** 2, "mm", "handbook 15.8", q=["SD"], tol=6e-3)
    s2.table("Goal", "A1:H4")
    return b


def organ():
    b = Book("opera_organ_blower", "cards: symbols above their values, Greek letters, three blocks of the same layout", shared_strings=False)
    s = b.sheet("Karten")
    s.put("A1", "Orgelgebläse - Lagerung auf Federn / organ blower on springs")
    blocks = [(3, "Blower", 410, 46, 6, 0.05, 1440, 30), (10, "Motor", 165, 38, 4, 0.06, 1440, 30), (17, "Silencer", 95, 12, 4, 0.04, 1440, 18)]
    for i, (r, name, m, k, n, z, N, y) in enumerate(blocks):
        a, o, c = r + 2, r + 3, r + 4
        s.put(f"A{r}", name)
        s.put(f"A{r + 1}", ["m (kg)", "k per spring (kN/m)", "n", "ζ", "N (rpm)", "ŷ (µm)"])
        s.put(f"A{a}", [m, k, n, z, N, y])
        s.put(f"A{o}", ["ω₀ (rad/s)", "f₀ (Hz)", "δst (mm)", "Ω (rad/s)", "Ω/ω₀", "T", "x̂ = T·ŷ (µm)", "ẑ relative (µm)", "1 − T (%)", "c_crit (N·s/m)"])
        M, K, n_, Z, S, Y = f"mass=A{a} kg", f"mount_stiffness=B{a} kN/m", f"mount_count=C{a}", f"damping_ratio=D{a}", f"speed=E{a} rpm", f"base_motion=F{a} µm pk"
        s.g(f"A{c}", f"=SQRT(C{a}*B{a}*1000/A{a})", "NF", None, f"{n_}; {K}; {M}", lambda n, k, m: sqrt(n * k * 1000 / m), "rad/s") if i != 1 else \
            s.g(f"A{c}", f"=C{a}*B{a}*1000/A{a}", "NF", "square-root-missing", f"{n_}; {K}; {M}", lambda n, k, m: sqrt(n * k * 1000 / m), "rad/s")
        s.g(f"B{c}", f"=A{c}/(2*PI())", "FC", None, f"angular_frequency=A{c} rad/s", lambda w: w / W, "Hz", q=["NF"]) if i != 2 else \
            s.g(f"B{c}", f"=SQRT(C{a}*B{a}*1000/A{a})", "NF", "angular-cyclic-mixup", f"{n_}; {K}; {M}", lambda n, k, m: fn(n * k * 1000, m), "Hz", "rad/s under Hz", q=["FC"])
        s.g(f"C{c}", f"=9.81/A{c}^2*1000", "SD", None, f"natural_frequency=A{c} rad/s", lambda w: 1000 * G / w ** 2, "mm") if i != 1 else \
            s.g(f"C{c}", f"=A{a}*9.81/(C{a}*B{a})", "SD", None, f"{M}; {n_}; {K}", lambda m, n, k: m * G / (n * k), "mm", "kg·9.81/(kN/m) is mm")
        s.g(f"D{c}", f"=2*PI()*E{a}", "FC", "speed-unit", S, lambda n: W * n / 60, "rad/s", "60 missing") if i == 0 else \
            s.g(f"D{c}", f"=2*PI()*E{a}/60", "FC", None, S, lambda n: W * n / 60, "rad/s")
        s.g(f"E{c}", f"=2*PI()*E{a}/60/B{c}", "FR", "angular-cyclic-mixup", f"{S}; natural_frequency=B{c} Hz", lambda n, f: n / 60 / f, "1", "rad/s over Hz") if i == 0 else \
            s.g(f"E{c}", f"=D{c}/A{c}", "FR", None, f"frequency=D{c} rad/s; natural_frequency=A{c} rad/s", lambda f, g: f / g, "1")
        if i == 1:
            s.g(f"F{c}", f"=SQRT((1+(2*D{a}*E{c})^2)/((1-E{c})^2+(2*D{a}*E{c})^2))", "AT", "ratio-not-squared", f"frequency_ratio=E{c}; {Z}", T, "1")
        elif i == 2:
            s.g(f"F{c}", f"=1/SQRT((1-E{c}^2)^2+(2*D{a}*E{c})^2)", "AT", "numerator-damping-missing", f"frequency_ratio=E{c}; {Z}", T, "1")
        else:
            s.g(f"F{c}", f"=SQRT((1+(2*D{a}*E{c})^2)/((1-E{c}^2)^2+(2*D{a}*E{c})^2))", "AT", None, f"frequency_ratio=E{c}; {Z}", T, "1")
        s.g(f"G{c}", f"=F{c}*F{a}", "PM", None, f"transmissibility=F{c}; {Y}", lambda t, y: t * y, "µm pk")
        s.g(f"H{c}", f"=F{a}*E{c}^2/SQRT((1-E{c}^2)^2+(2*D{a}*E{c})^2)", "RD", None, f"{Y}; frequency_ratio=E{c}; {Z}", lambda y, r, z: y * R(r, z), "µm pk") if i != 2 else \
            s.g(f"H{c}", f"=F{a}*SQRT((1+(2*D{a}*E{c})^2)/((1-E{c}^2)^2+(2*D{a}*E{c})^2))", "RD", "absolute-used-for-relative", f"{Y}; frequency_ratio=E{c}; {Z}", lambda y, r, z: y * R(r, z), "µm pk", q=["PM"])
        s.g(f"I{c}", f"=100*(1-F{c})", "IE", None, f"transmissibility=F{c}", lambda t: 100 * (1 - t), "%") if i != 2 else \
            s.g(f"I{c}", f"=100/F{c}", "IE", "efficiency-not-of-motion", f"transmissibility=F{c}", lambda t: 100 * (1 - t), "%", "1/T as efficiency")
        s.g(f"J{c}", f"=2*A{a}*A{c}", "CD", None, f"{M}; natural_frequency=A{c} rad/s", lambda m, w: 2 * m * w, "N·s/m") if i else \
            s.g(f"J{c}", f"=2*A{a}*B{c}", "CD", "angular-cyclic-mixup", f"{M}; natural_frequency=B{c} Hz", lambda m, f: 2 * m * W * f, "N·s/m", "Hz where rad/s belongs")
    s.put("A24", ["Q̇ (m³/min)", "Δp (Pa)", "P (W)"])
    s.put("A25", [18, 850])
    s.ig("C25", "=A25/60*B25/0.62")
    return b


def quarry():
    b = Book("quarry_screen_cabins", "technical units (kgf, cm), no helper columns, one long formula per result", resave=True)
    s = b.sheet("Cabins")
    s.put("A1", "Operator cabins at the screening plant. Technical units: kgf, cm. Rubber-steel mounts.")
    s.put("A3", ["No.", "Weight", "Mounts", "Rate of a mount", "zeta", "Screen speed", "Floor amplitude", "Sag", "Natural speed 300/√sag", "f0", "n/n0", "Transmissibility", "Transmissibility (all in one)", "Efficiency", "Cabin amplitude", "Floor acceleration", "Critical damping", "Sag for T=0.1 at zeta=0", "Rate for 4 Hz", "Mount load", "Sag for T=0.1 at zeta=0"])
    s.put("A4", [None, "kgf", "pcs", "kgf/cm", "-", "1/min", "mm", "cm", "1/min", "Hz", "-", "-", "-", "%", "mm", "m/s²", "kgf·s/cm", "cm", "kgf/cm each", "kgf", "mm"])
    s.put("A5", [[1, 1850, 4, 420, 0.07, 870, 0.35], [2, 2100, 6, 340, 0.07, 870, 0.35], [3, 950, 4, 205, 0.06, 960, 0.2], [4, 1200, 4, 260, 0.06, 960, 0.2], [5, 3300, 8, 390, 0.09, 740, 0.5], [6, 760, 4, 150, 0.05, 1450, 0.1]])
    w, n, k, z, N, y = "weight=B5:B10 kgf", "mount_count=C5:C10", "mount_stiffness=D5:D10 kgf/cm", "damping_ratio=E5:E10", "speed=F5:F10 rpm", "base_motion=G5:G10 mm pk"
    f0 = lambda n, k, w: fn(n * k * G * 100, w)
    s.g("H8", 0.95, "SD", "value-typed-over", "weight=B8 kgf; mount_count=C8; mount_stiffness=D8 kgf/cm", lambda w, n, k: w / (n * k), "cm", "number in a formula column")
    s.g("H5:H7,H9:H10", "=B5/(C5*D5)", "SD", None, f"{w}; {n}; {k}", lambda w, n, k: w / (n * k), "cm")
    s.g("I5:I10", "=300/SQRT(H5)", "NF", None, "static_deflection=H5:H10 cm", lambda d: 60 * sqrt(G / (d / 100)) / W, "1/min", "handbook 300/√cm")
    s.g("J5:J10", "=SQRT(C5*D5/B5)/(2*PI())", "NF", "mass-weight-mixup", f"{n}; {k}; {w}", f0, "Hz", "kgf as mass: 981 missing")
    s.g("K5:K10", "=F5/I5", "FR", None, f"{N}; natural_frequency=I5:I10 rpm", lambda f, g: f / g, "1")
    s.g("L5:L10", "=SQRT(1+(2*E5*K5)^2)/SQRT((K5^2-1)^2+(2*E5*K5)^2)", "AT", None, f"frequency_ratio=K5:K10; {z}", T, "1")
    s.g("M5:M10", "=SQRT((1+(2*E5*F5/60/(SQRT(C5*D5*981/B5)/(2*PI())))^2)/((1-(F5/60/(SQRT(C5*D5*981/B5)/(2*PI())))^2)^2+(2*E5*F5/60/(SQRT(C5*D5*981/B5)/(2*PI())))^2))", "AT", None, f"{w}; {n}; {k}; {z}; {N}", lambda w, n, k, z, N: T(N / 60 / f0(n, k, w), z), "1")
    s.g("N5:N10", "=100*(1-1/SQRT((1-(F5/60/(SQRT(C5*D5*981/B5)/(2*PI())))^2)^2))", "IE", "undamped-form", f"{w}; {n}; {k}; {z}; {N}", lambda w, n, k, z, N: 100 * (1 - T(N / 60 / f0(n, k, w), z)), "%", "damping in the row, left out")
    s.g("O5:O10", "=G5*K5^2/SQRT((K5^2-1)^2+(2*E5*K5)^2)", "PM", "relative-used-for-absolute", f"{y}; frequency_ratio=K5:K10; {z}", lambda y, r, z: y * T(r, z), "mm pk", q=["RD"])
    s.g("P5:P10", "=G5/1000*(2*PI()*F5)^2", "MC", "speed-unit", f"{y}; {N}", lambda y, n: y / 1000 * (W * n / 60) ** 2, "m/s² pk", "rpm as Hz")
    s.g("Q5:Q10", "=2*SQRT(C5*D5*B5)", "CD", "mass-weight-mixup", f"{n}; {k}; {w}", lambda n, k, w: 2 * sqrt(n * k * w / (100 * G)), "kgf·s/cm", "weight as mass")
    s.g("R5:R10", "=(300/F5)^2*(1+1/0.1)", "RSD", None, N, lambda n: 11 * 100 * G / (W * n / 60) ** 2, "cm", tol=8e-3)
    s.g("S5:S10", "=(2*PI()*4)^2*B5/981", "RK", "mount-count-missing", f"{w}; {n}", lambda w, n: (W * 4) ** 2 * w / (100 * G) / n, "kgf/cm", "labelled each", m=["total-for-per-mount"])
    s.g("T5:T10", "=B5/C5", "ML", None, f"{w}; {n}", lambda w, n: w / n, "kgf")
    s.g("U5:U10", "=(300/F5)^2*(1+1/0.1)", "RSD", "length-unit", N, lambda n: 11 * 1000 * G / (W * n / 60) ** 2, "mm", "cm under mm")
    s.put("A12", "Cabin floor, m²")
    s.put("B12", [2.4, 1.8])
    s.ig("D12", "=B12*C12")
    s.put("A13", "Heater, kcal/h")
    s.ig("D13", "=D12*2.3*35")
    return b


def books():
    return [sprayer(), scanner(), organ(), quarry()]
