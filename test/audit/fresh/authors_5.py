"""Piano crate (slugs, notes column), bottling line (long columns with broken rows), roof plant room (German names), recorder vault (bare abbreviations)."""
from book import Book
from exact import *


def piano():
    b = Book("piano_tour_crate", "US units with slugs and feet, wordy labels with numbers in them, value beside or below, notes")
    s = b.sheet("Crate")
    s.put("B1", "Concert grand in tour crate, floating pallet - worksheet 3 of 7")
    s.put("B3", [["Piano and inner crate, lb", 1190], ["Corner mounts (2 per side x 2 sides), qty", 4], ["Static rate of one mount at 70 F, lb/in", 520], ["Dynamic rate of one mount at 70 F, lb/in", 700], ["Loss factor of the rubber at 70 F", 0.22], ["Truck bed, worst tone, Hz", 14], ["Truck bed, acceleration, g peak", 0.35], ["Truck bed PSD near resonance, g^2/Hz", 0.012]])
    s.put("B12", [["Mass, slugs (lb / 32.2)"], ["Load on one of the 4 mounts, lb"], ["Sag under 1 g, in"], ["Natural frequency for shock and vibration (use dynamic rate), Hz"], ["Critical damping of the set, lb s/ft"], ["Damping ratio from loss factor"], ["Q"], ["Tuning ratio f/fn"], ["Transmissibility at 14 Hz"], ["Piano acceleration, g peak"], ["Bed displacement, in peak"], ["Mount travel, in peak"], ["Isolation at 14 Hz, %"], ["Random response by the half-pi rule, g rms"], ["Three-sigma response, g"], ["Three-sigma travel, in"], ["Dynamic rate of the set, lb/ft"], ["Peak spring force per mount at 14 Hz, lb"], ["Level difference, dB"]])
    s.ig("C12", "=C3/32.2")
    s.g("C13", "=C3/C4", "ML", None, "weight=C3 lb; mount_count=C4", lambda w, n: w / n, "lb")
    s.g("C14", "=C13/C5", "SD", None, "load=C13 lb; static_stiffness=C5 lb/in", lambda p, k: p / k, "in")
    s.g("C15", "=3.13/SQRT(C14)", "NF", "static-stiffness-for-dynamic", "mount_count=C4; mount_stiffness=C6 lb/in; weight=C3 lb", lambda n, k, w: fn(n * k * GIN, w), "Hz", "sag of the static rate, label asks for the dynamic rate")
    s.g("C16", "=2*SQRT(C4*C6*C12)", "CD", "length-unit", "mount_count=C4; mount_stiffness=C6 lb/in; mass=C12 slug", lambda n, k, m: 2 * sqrt(n * k * 12 * m), "lb·s/ft", "lb/in with slugs, 12 missing")
    s.g("C17", "=C7", "DR", "loss-factor-as-damping-ratio", "loss_factor=C7", lambda e: e / 2, "1")
    s.g("C18", "=1/C7", "DR", None, "loss_factor=C7", lambda e: 1 / e, "1", q=["PT"])
    s.g("C19", "=C8/C15", "FR", None, "frequency=C8 Hz; natural_frequency=C15 Hz", lambda f, g: f / g, "1")
    s.g("C20", "=SQRT(1+(2*C17*C19)^2)/ABS(1-C19^2)", "AT", "other", "frequency_ratio=C19; damping_ratio=C17", T, "1", "damping kept above and dropped below the line", m=["undamped-form"])
    s.g("C21", "=C9*C20", "PM", None, "base_motion=C9 g pk; transmissibility=C20", lambda a, t: a * t, "g pk")
    s.g("C22", "=C9*386/(2*PI()*C8)^2", "MC", None, "motion=C9 g pk; frequency=C8 Hz", lambda a, f: a * GIN / (W * f) ** 2, "in pk")
    s.g("C23", "=C22*C20", "RD", "absolute-used-for-relative", "base_motion=C22 in pk; frequency_ratio=C19; damping_ratio=C17", lambda y, r, z: y * R(r, z), "in pk", q=["PM"])
    s.g("C24", "=100*(1-C20)", "IE", None, "transmissibility=C20", lambda t: 100 * (1 - t), "%")
    s.g("C25", "=SQRT(C15*C18*C10)", "RR", "half-pi-missing", "natural_frequency=C15 Hz; q=C18; asd=C10 g²/Hz", lambda f, q, S: sqrt(PI / 2 * f * q * S), "g rms")
    s.g("C26", "=3*C25", "RR", None, "rms=C25 g rms", lambda g: 3 * g, "g")
    s.g("C27", "=C26*386.1/(2*PI()*C15)^2", "RR", None, "rms=C26 g; natural_frequency=C15 Hz", lambda g, f: g * GIN / (W * f) ** 2, "in", q=["RD", "MC"])
    s.g("C28", "=C4*C6*12", "MK", None, "mount_count=C4; mount_stiffness=C6 lb/in", lambda n, k: n * k * 12, "lb/ft")
    s.g("C29", "=C4*C6*C23", "MF", "total-for-per-mount", "mount_stiffness=C6 lb/in; relative_displacement=C23 in pk", lambda k, x: k * x, "lb pk", "all mounts, labelled per mount")
    s.g("C30", "=20*LOG10(C20)", "DB", None, "transmissibility=C20", lambda t: 20 * math.log10(t), "dB")
    s.put("D5", "vendor curve 3/8 deflection")
    s.put("D9", "logger, 2 trips")
    s.put("B33", [["Crate length, in", 96], ["Crate width, in", 66], ["Floor area, sq ft"], ["Freight at $0.42/lb"]])
    s.ig("C35", "=C33*C34/144")
    s.ig("C36", "=C3*0.42")
    return b


def bottling():
    b = Book("bottling_line_weighers", "long columns filled down, with rows typed over or broken; percent-formatted damping", shared_formulas=True)
    s = b.sheet("Line 2")
    s.put("A1", "Check weighers and fillers, line 2 - all mounts steel spring with damper")
    s.put("A3", ["Position", "Mass kg", "Mounts", "k N/mm", "Damping", "rpm", "Floor µm 0-p", "Load kN", "Sag mm", "fn Hz", "f Hz", "r", "T", "Isolation", "Machine µm 0-p", "Mount travel µm 0-p", "dB", "cc N·s/m", "c N·s/m per mount", "omega_n rad/s", "Floor m/s² rms", "Floor mm/s 0-p", "k total N/mm", "Bearing L10h"])
    mass = [410, 420, 395, 510, 640, 655, 280, 300, 315, 720, 745, 810, 190, 205, 220, 460, 470, 530, 350, 360]
    for i, m in enumerate(mass):
        n = 6 if m > 600 else 4
        s.put(f"A{4 + i}", [f"W{i + 1:02d}", m, n, [48, 62, 95][(m > 400) + (m > 600)]])
        s.put(f"E{4 + i}", [0.05 + 0.01 * (i % 4)], fmt="0%")
        s.put(f"F{4 + i}", [[720, 900, 1440, 960][i % 4], [15, 12, 6, 20][i % 4]])
    rg = lambda role, c, u="": f"{role}={c}4:{c}23 {u}".strip()
    one = lambda role, c, r, u="": f"{role}={c}{r} {u}".strip()
    cut = lambda c, *rows: ",".join(f"{c}{a}:{c}{z}" if a != z else f"{c}{a}" for a, z in zip([4, *(r + 1 for r in rows)], [*(r - 1 for r in rows), 23]) if a <= z)

    def column(c, formula, what_for, roles, model, out, breaks=(), note="", **kw):
        spec = lambda f: "; ".join(f(*r) for r in roles)
        s.g(cut(c, *(r for r, *_ in breaks)), formula, what_for, None, spec(rg), model, out, note, **kw)
        for r, what, mistake, why, also in breaks:
            s.g(f"{c}{r}", what, what_for, mistake, spec(lambda role, col, u="": one(role, col, r, u)), model, out, why, m=also, **kw)

    M, N, K, Z, S, Y = ("mass", "B", "kg"), ("mount_count", "C"), ("mount_stiffness", "D", "N/mm"), ("damping_ratio", "E"), ("speed", "F", "rpm"), ("base_motion", "G", "µm pk")
    FN, F, RR_, TT = ("natural_frequency", "J", "Hz"), ("frequency", "K", "Hz"), ("frequency_ratio", "L"), ("transmissibility", "M")
    column("H", "=B4*9.81/C4/1000", "ML", [M, N], lambda m, n: m * G / n / 1000, "kN")
    column("I", "=B4*9.81/(C4*D4)", "SD", [M, N, K], lambda m, n, k: m * G / (n * k), "mm", [(13, 8.5, "value-typed-over", "typed number", []), (19, "=B18*9.81/(C19*D19)", "reference-slip", "mass of the row above", ["fill-break"])])
    column("J", "=SQRT(C4*D4*1000/B4)/(2*PI())", "NF", [N, K, M], lambda n, k, m: fn(n * k * 1000, m), "Hz", [(8, "=SQRT(D8*1000/B8)/(2*PI())", "mount-count-missing", "mounts left out in this row", ["fill-break"])])
    column("K", "=F4/60", "FC", [S], lambda n: n / 60, "Hz", [(17, "=F17/50", "fill-break", "divisor differs in this row", ["speed-unit", "constant-wrong"])])
    column("L", "=K4/J4", "FR", [F, FN], lambda f, g: f / g, "1", [(11, "=J11/K11", "ratio-inverted", "turned round in this row", ["fill-break"])])
    column("M", "=SQRT((1+(2*E4*L4)^2)/((1-L4^2)^2+(2*E4*L4)^2))", "AT", [RR_, Z], T, "1", [(21, 0.15, "value-typed-over", "typed number", [])])
    column("N", "=1-M4", "IE", [TT], lambda t: 1 - t, "1", [(9, "=1-M8", "reference-slip", "row above", ["fill-break"])], fmt="0.0%")
    column("O", "=G4*M4", "PM", [Y, TT], lambda y, t: y * t, "µm pk")
    column("P", "=G4*L4^2/SQRT((1-L4^2)^2+(2*E4*L4)^2)", "RD", [Y, RR_, Z], lambda y, r, z: y * R(r, z), "µm pk", [(15, 14, "value-typed-over", "typed number", [])])
    column("Q", "=20*LOG10(M4)", "DB", [TT], lambda t: 20 * math.log10(t), "dB", [(18, "=10*LOG10(M18)", "decibel-factor", "10 in one row", ["fill-break"])])
    column("R", "=2*SQRT(C4*D4*1000*B4)", "CD", [N, K, M], lambda n, k, m: 2 * sqrt(n * k * 1000 * m), "N·s/m")
    column("S", "=E4*R4/C4", "DC", [Z, ("critical_damping", "R", "N·s/m"), N], lambda z, c, n: z * c / n, "N·s/m", [(12, "=E$11*R12/C12", "reference-slip", "damping of another row", ["fill-break"])])
    column("T", "=2*PI()*J4", "NF", [FN], lambda f: W * f, "rad/s", q=["FC"])
    s.g("U4:U23", "=G4*10^-6*(2*PI()*K4)^2", "MC", "amplitude-kind", "; ".join([rg(*Y), rg(*F)]), lambda y, f: y * 1e-6 * (W * f) ** 2 / sqrt(2), "m/s² rms", "peak under rms")
    column("V", "=G4*2*PI()*K4/1000", "MC", [Y, F], lambda y, f: y * W * f / 1000, "mm/s pk", [(22, "=G22*PI()*K22/1000", "fill-break", "factor 2 lost in one row", ["amplitude-kind", "angular-cyclic-mixup"])])
    column("W", "=C4*D4", "MK", [N, K], lambda n, k: n * k, "N/mm", [(20, "=D20", "mount-count-missing", "mounts left out in this row", ["fill-break", "total-for-per-mount"])])
    s.ig("X4:X23", "=10^6/(60*F4)*(21/(1+H4))^3")
    s.put("A25", "Sum / mean")
    s.ig("B25", "=SUM(B4:B23)")
    s.ig("C25", "=SUM(C4:C23)")
    s.ig("N25", "=AVERAGE(N4:N23)", fmt="0.0%")
    s.ig("M25", "=MAX(M4:M23)")
    return b


def roof():
    b = Book("dachzentrale_lueftung", "German form with defined names, abbreviations, guards, a small table below", resave=True)
    s = b.sheet("Zentrale")
    s.put("A1", "Lüftungszentrale Dach - Körperschallentkopplung")
    data = [("Gerätemasse", "Masse", 1850, "kg"), ("Anz. Federelemente", "Anz", 6, "Stk."), ("Federsteife c_F je Element", "cF", 0.14, "kN/mm"), ("Lehrsches Dämpfungsmaß", "Lehr", 0.04, "-"), ("Ventilatordrehzahl min.", "n_min", 780, "U/min"), ("Deckenschwingung eff.", "v_D", 0.8, "mm/s"), ("Soll-Isoliergrad", "Soll", 0.9, "-"), ("Schaufelzahl", "zS", 9, "-")]
    for i, (label, name, v, u) in enumerate(data):
        s.put(f"A{3 + i}", [label, None, v, u])
        b.name_cell(name, f"Zentrale!$C${3 + i}")
    M, N, K, Z, S, V, E = "mass=C3 kg", "mount_count=C4", "mount_stiffness=C5 kN/mm", "damping_ratio=C6", "speed=C7 rpm", "base_motion=C8 mm/s rms", "efficiency=C9"
    s.put("A13", [["Last je Element", None, None, "kN"], ["stat. Einfederung", None, None, "mm"], ["Eigenfreq. f0", None, None, "Hz"], ["Eigenkreisfreq.", None, None, "1/s"], ["Erregerfreq.", None, None, "Hz"], ["Schaufelfreq.", None, None, "Hz"], ["Frequenzverh. λ = f/f0", None, None, "-"], ["Vergrößerungsfkt. Fußpunkterregung", None, None, "-"], ["Isoliergrad", None, None, "%"], ["Pegelminderung", None, None, "dB"],
                  ["Geräteschwingung eff.", None, None, "mm/s"], ["Deckenausschlag Spitze", None, None, "mm"], ["Relativweg Spitze", None, None, "mm"], ["erf. f0 (ungedämpft gerechnet)", None, None, "Hz"], ["erf. Federsteife je Element", None, None, "N/mm"], ["erf. Einfederung", None, None, "mm"], ["krit. Dämpfungskonst.", None, None, "kg/s"], ["Dämpfungskonst. je Element", None, None, "kg/s"], ["Überhöhung bei f = f0", None, None, "-"], ["Phasennacheilung Gerät", None, None, "°"], ["Federkraft je Element, Spitze", None, None, "N"], ["Verlustfaktor", None, None, "-"]])
    b.name_cell("f_0", "Zentrale!$C$15")
    b.name_cell("fe", "Zentrale!$C$17")
    b.name_cell("lam", "Zentrale!$C$19")
    b.name_cell("VF", "Zentrale!$C$20")
    s.g("C13", "=Masse*9.81/Anz", "ML", "length-unit", f"{M}; {N}", lambda m, n: m * G / n / 1000, "kN", "newtons under kN", m=["mass-weight-mixup"])
    s.g("C14", "=Masse*9.81/1000/(Anz*cF)", "SD", None, f"{M}; {N}; {K}", lambda m, n, k: m * G / (n * k * 1000), "mm")
    s.g("C15", "=5/SQRT(C14/10)", "NF", None, "static_deflection=C14 mm", lambda d: sqrt(G / (d / 1000)) / W, "Hz")
    s.g("C16", "=SQRT(Anz*cF*10^6/Masse)", "NF", None, f"{N}; {K}; {M}", lambda n, k, m: sqrt(n * k * 1e6 / m), "rad/s")
    s.g("C17", "=n_min/60", "FC", None, S, lambda n: n / 60, "Hz")
    s.g("C18", "=n_min*zS", "FC", "speed-unit", f"{S}; blades=C10", lambda n, z: n * z / 60, "Hz", "60 missing")
    s.g("C19", "=IF(f_0>0,fe/f_0,0)", "FR", None, "frequency=C17 Hz; natural_frequency=C15 Hz", lambda f, g: f / g, "1")
    s.g("C20", "=1/SQRT((1-lam^2)^2+4*Lehr^2*lam^2)", "AT", "numerator-damping-missing", f"frequency_ratio=C19; {Z}", T, "1", "magnification of a driven mass, label says base motion")
    s.g("C21", "=(1-VF)*100", "IE", None, "transmissibility=C20", lambda t: 100 * (1 - t), "%")
    s.g("C22", "=-20*LOG10(VF)", "DB", None, "transmissibility=C20", lambda t: -20 * math.log10(t), "dB")
    s.g("C23", "=v_D*VF", "PM", None, f"{V}; transmissibility=C20", lambda v, t: v * t, "mm/s rms")
    s.g("C24", "=v_D*SQRT(2)/fe", "MC", "angular-cyclic-mixup", f"{V}; frequency=C17 Hz", lambda v, f: v * sqrt(2) / (W * f), "mm pk", "2 pi missing")
    s.g("C25", "=C24*lam^2/SQRT((1-lam^2)^2+4*Lehr^2*lam^2)", "RD", None, f"base_motion=C24 mm pk; frequency_ratio=C19; {Z}", lambda y, r, z: y * R(r, z), "mm pk")
    s.g("C26", "=fe/SQRT(1+1/(1-Soll))", "RNF", None, f"frequency=C17 Hz; {E}", lambda f, e: f / r_for(1 - e), "Hz", "labelled undamped")
    s.g("C27", "=(2*PI()*C26)^2*Masse/Anz", "RK", "length-unit", f"natural_frequency=C26 Hz; {M}; {N}", lambda f, m, n: (W * f) ** 2 * m / n / 1000, "N/mm", "N/m under N/mm")
    s.g("C28", "=(15.67/C26)^2", "RSD", "constant-wrong", "natural_frequency=C26 Hz", lambda f: 1000 * G / (W * f) ** 2, "mm", "15.67 for 15.76", q=["SD"])
    s.g("C29", "=2*Masse*C16", "CD", None, f"{M}; natural_frequency=C16 rad/s", lambda m, w: 2 * m * w, "kg/s")
    s.g("C30", "=Lehr*C29/Anz", "DC", None, f"{Z}; critical_damping=C29 kg/s; {N}", lambda z, c, n: z * c / n, "kg/s")
    s.g("C31", "=SQRT(1+4*Lehr)/(2*Lehr)", "PT", "damping-not-squared", Z, lambda z: T(1, z), "1")
    s.g("C32", "=DEGREES(ATAN2(1-lam^2,2*Lehr*lam))", "AP", "relative-used-for-absolute", f"frequency_ratio=C19; {Z}", lag, "deg", "phase of the relative motion", q=["RP"])
    s.g("C33", "=cF*1000*C25", "MF", None, f"{K}; relative_displacement=C25 mm pk", lambda k, x: k * x * 1000, "N pk")
    s.g("C34", "=2*Lehr", "DR", None, Z, lambda z: 2 * z, "1", "loss factor")
    s.put("A37", ["Drehzahlstufe", "U/min", "λ", "Isoliergrad, ungedämpft (%)", "V mit Dämpfung", "Luftmenge (m³/h)"])
    s.put("A38", [["Stufe 1", 780], ["Stufe 2", 1050], ["Stufe 3", 1400]])
    s.g("C38:C40", "=B38/60/f_0", "FR", None, "speed=B38:B40 rpm; natural_frequency=C15 Hz", lambda n, f: n / 60 / f, "1")
    s.g("D38:D40", "=100*(1-1/(1-C38^2))", "IE", "absolute-value-missing", "frequency_ratio=C38:C40", lambda r: 100 * (1 - T(r)), "%", "above 100 %")
    s.g("E38:E40", "=SQRT((1+(2*Lehr*C38)^2)/((1-C38^2)+(2*Lehr*C38)^2)^2)", "AT", "ratio-not-squared", f"frequency_ratio=C38:C40; {Z}", T, "1", "square outside the sum", m=["sign-precedence"])
    s.ig("F38:F40", "=14000*B38/1400")
    s.ig("F41", "=SUM(F38:F40)/3")
    return b


def vault():
    b = Book("seismic_recorder_vault", "bare abbreviations, no units on most heads, Q and decrement, drifting column order", shared_strings=False)
    s = b.sheet("Tbl")
    s.put("A1", ["st", "fn/Hz", "Q", "zeta", "eta", "f/Hz", "r", "TR", "TRrel", "TR dB", "phi_abs/°", "phi_rel/°", "y/nm", "x/nm", "z/nm", "IE/%", "TRmax", "fd/Hz", "wn/(rad/s)", "TR (undamped)", "delta_log", "zeta (decr.)", "asd/(g²/Hz)", "grms", "grms, Q=1/(2 zeta)", "d_rms/µm", "v/(nm/s)", "no"])
    s.put("A2", [["BRK", 1.2, 5], ["LEN", 0.9, 4], ["OST", 2.4, 12.5], ["VAL", 3.1, 10], ["NOR", 4.5, 8], ["SUD", 6, 20], ["TAR", 0.7, 3.5]])
    for i, (f, y, s_) in enumerate([(3, 420, 2e-9), (1.1, 800, 3e-9), (4, 150, 1e-9), (9, 80, 2e-9), (5.2, 60, 5e-9), (22, 12, 8e-9), (2, 900, 2e-9)]):
        s.put(f"F{2 + i}", f)
        s.put(f"M{2 + i}", y)
        s.put(f"W{2 + i}", s_, fmt="0.00E+00")
    rg = lambda role, c, u="": f"{role}={c}2:{c}8 {u}".strip()
    F0, Q, Z, F, r, y = rg("natural_frequency", "B", "Hz"), rg("q", "C"), rg("damping_ratio", "D"), rg("frequency", "F", "Hz"), rg("frequency_ratio", "G"), rg("base_motion", "M", "nm")
    s.g("D2:D8", "=1/2/C2", "DR", None, Q, lambda q: 1 / (2 * q), "1")
    s.g("E2:E8", "=1/C2", "DR", None, Q, lambda q: 1 / q, "1", "loss factor")
    s.g("G2:G8", "=F2/B2", "FR", None, f"{F}; {F0}", lambda f, g: f / g, "1")
    s.g("H2:H8", "=(1+(2*D2*G2)^2)/((1-G2^2)^2+(2*D2*G2)^2)", "AT", "square-root-missing", f"{r}; {Z}", T, "1")
    s.g("I2:I8", "=G2/SQRT((1-G2^2)^2+(2*D2*G2)^2)", "RT", "ratio-not-squared", f"{r}; {Z}", R, "1", "r for r^2 above the line")
    s.g("J2:J8", "=20*LOG10(H2)", "DB", None, rg("transmissibility", "H"), lambda t: 20 * math.log10(t), "dB")
    s.g("K2:K8", "=DEGREES(ATAN2(1-G2^2+(2*D2*G2)^2,2*D2*G2^3))", "AP", None, f"{r}; {Z}", lag, "deg")
    s.g("L2:L8", "=DEGREES(ATAN2(1-G2^2+(2*D2*G2)^2,2*D2*G2^3))", "RP", "absolute-used-for-relative", f"{r}; {Z}", rlag, "deg", q=["AP"])
    s.g("N2:N8", "=M2*G2^2/SQRT((1-G2^2)^2+(2*D2*G2)^2)", "PM", "relative-used-for-absolute", f"{y}; {r}; {Z}", lambda y, r, z: y * T(r, z), "nm", "x is the payload, z the relative motion", q=["RD"])
    s.g("O2:O8", "=M2*G2^2/SQRT((1-G2^2)^2+(2*D2*G2)^2)", "RD", None, f"{y}; {r}; {Z}", lambda y, r, z: y * R(r, z), "nm")
    s.g("P2:P8", "=(1-H2)*100", "IE", None, rg("transmissibility", "H"), lambda t: 100 * (1 - t), "%")
    s.g("Q2:Q8", "=SQRT(1+(2*D2*SQRT((SQRT(1+8*D2^2)-1)/(4*D2^2)))^2)/SQRT((1-(SQRT(1+8*D2^2)-1)/(4*D2^2))^2+(2*D2)^2*(SQRT(1+8*D2^2)-1)/(4*D2^2))", "PT", None, Z, Tmax, "1", "exact peak in one cell")
    s.g("R2:R8", "=B2*SQRT(1-D2^2)", "NF", None, f"{F0}; {Z}", lambda f, z: f * sqrt(1 - z * z), "Hz")
    s.g("S2:S8", "=B2", "NF", "angular-cyclic-mixup", F0, lambda f: W * f, "rad/s", "Hz under rad/s", q=["FC"])
    s.g("T2:T8", "=1/ABS(G2^2-1)", "AT", None, r, lambda r: T(r), "1", "headed undamped")
    s.g("U2:U8", "=2*PI()*D2/SQRT(1-D2^2)", "DR", None, Z, lambda z: W * z / sqrt(1 - z * z), "1", "log decrement")
    s.g("V2:V8", "=U2/SQRT(4*PI()+U2^2)", "DR", "other", rg("log_decrement", "U"), lambda d: d / sqrt(W * W + d * d), "1", "pi not squared", m=["damping-not-squared", "ratio-not-squared", "constant-wrong"])
    s.g("X2:X8", "=SQRT(PI()/2*B2*C2*W2)", "RR", None, f"{F0}; {Q}; {rg('asd', 'W', 'g²/Hz')}", lambda f, q, S: sqrt(PI / 2 * f * q * S), "g rms")
    s.g("Y2:Y8", "=SQRT(B2*W2/(2*D2))", "RR", "half-pi-missing", f"{F0}; {rg('asd', 'W', 'g²/Hz')}; {Z}", lambda f, S, z: sqrt(PI / 2 * f * S / (2 * z)), "g rms", "flat-spectrum response as in the column before")
    s.g("Z2:Z8", "=X2*9.81*10^6/(2*PI()*B2)^2", "RR", None, f"{rg('rms', 'X', 'g rms')}; {F0}", lambda g, f: g * G * 1e6 / (W * f) ** 2, "µm rms", q=["RD", "MC"])
    s.g("AA2:AA8", "=M2*F2", "MC", "angular-cyclic-mixup", f"{y}; {F}", lambda y, f: y * W * f, "nm/s", "2 pi missing")
    s.ig("AB2:AB8", "=ROW()-1")
    s.ig("AB9", "=COUNTA(A2:A8)")
    return b


def books():
    return [piano(), bottling(), roof(), vault()]
