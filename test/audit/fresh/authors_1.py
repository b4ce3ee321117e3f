"""Ice rink (inch-pound schedule), router table (label-left form), satellite box (defined names), folding machines (German columns)."""
from book import Book
from exact import *


def ice_rink():
    b = Book("ice_rink_chillers", "inch-pound schedule, title rows and units row, undamped heading; second sheet a small form", shared_formulas=True)
    s = b.sheet("Schedule")
    s.put("A1", "Ice rink refrigeration plant - spring isolator schedule")
    s.put("A2", "Bare steel springs: undamped formulas throughout")
    s.put("A4", ["Equipment", None, "Operating", "Compressor", "Springs", None, "Load", "Static", "Natural", "Natural", "Speed ratio", "Transmissi-", "Isolation", "Deflection for", "Combined", "Nat. freq. from", "Motor", "List price"])
    s.put("A5", ["Tag", "Location", "weight", "speed", "qty", "rate each", "per spring", "deflection", "frequency", "frequency", "f/fn", "bility", "efficiency", "95 % isolation", "spring rate", "combined rate", "input", "of springs"])
    s.put("A6", [None, None, "lb", "rpm", "no.", "lb/in", "lb", "in", "cpm", "Hz", "-", "-", "%", "in", "lb/in", "cpm", "kW", "$"])
    s.put("A7", [["CH-1", "Pad A", 8400, 1180, 6, 900], ["CH-2", "Pad A", 9150, 1180, 6, 1000], ["CH-3", "Pad B", 11800, 1775, 8, 1400], ["PU-1", "Pit", 1350, 1760, 4, 420],
                 ["PU-2", "Pit", 1420, 1760, 4, 420], ["CT-1", "Roof", 5600, 520, 4, 700], ["CT-2", "Roof", 6100, 520, 6, 520], ["DH-1", "Roof", 2250, 890, 4, 380]])
    s.g("G7:G14", "=C7/E7", "ML", None, "weight=C7:C14 lb; mount_count=E7:E14", lambda w, n: w / n, "lb")
    s.g("H7:H14", "=G7/F7", "SD", None, "load=G7:G14 lb; mount_stiffness=F7:F14 lb/in", lambda p, k: p / k, "in")
    s.g("I7:I14", "=188/SQRT(H7)", "NF", None, "static_deflection=H7:H14 in", lambda d: 60 * sqrt(GIN / d) / W, "cpm", "handbook 188")
    s.g("J7:J14", "=I7/60", "FC", None, "frequency=I7:I14 cpm", lambda f: f / 60, "Hz", q=["NF"])
    s.g("K7:K14", "=D7/J7", "FR", "speed-unit", "speed=D7:D14 rpm; natural_frequency=J7:J14 Hz", lambda n, f: n / 60 / f, "1", "rpm over Hz")
    s.g("L7:L14", "=1/((D7/I7)^2-1)", "AT", None, "speed=D7:D14 rpm; natural_frequency=I7:I14 cpm", lambda n, f: T(n / f), "1", "undamped heading, all above resonance")
    s.g("M7:M10,M12:M14", "=100*(1-L7)", "IE", None, "transmissibility=L7:L14", lambda t: 100 * (1 - t), "%")
    s.g("M11", 95, "IE", "value-typed-over", "transmissibility=L11", lambda t: 100 * (1 - t), "%", "number in a formula column")
    s.g("N7:N14", "=(1+1/0.05)*(178/D7)^2", "RSD", "constant-wrong", "speed=D7:D14 rpm", lambda n: 21 * GIN / (W * n / 60) ** 2, "in", "178 for 188")
    s.g("O7:O14", "=E7*F7", "MK", None, "mount_count=E7:E14; mount_stiffness=F7:F14 lb/in", lambda n, k: n * k, "lb/in")
    s.g("P7:P14", "=60*SQRT(O7/C7)/(2*PI())", "NF", "mass-weight-mixup", "stiffness=O7:O14 lb/in; weight=C7:C14 lb", lambda k, w: 60 * fn(k * GIN, w), "cpm", "lb as mass, 386 missing")
    s.put("Q7", [[75, 640], [75, 640], [110, 980], [20, 260], [20, 260], [15, 410], [15, 480], [7.5, 300]])
    s.ig("Q15", "=SUM(Q7:Q14)")
    s.ig("R15", "=SUM(R7:R14)")
    s.put("A15", "Totals")
    s.ig("C15", "=SUM(C7:C14)")
    s.put("A17", "Motor efficiency 0.93; brake horsepower of CH-1:")
    s.ig("G17", "=Q7*0.93/0.7457")

    s = b.sheet("Inertia base")
    s.put("A1", "CH-3 on a concrete inertia base (springs only, no damping)")
    s.put("A3", [["Machine weight, lb", 11800], ["Base weight, lb", 15200], ["Total weight, lb", None], ["Mass, slugs", None], ["Springs", 8], ["Rate per spring, lb/in", 2600], ["Running speed, rpm", 1775]])
    s.ig("B5", "=B3+B4")
    s.ig("B6", "=B5/32.174")
    s.put("A11", [["Natural frequency, Hz"], ["Static deflection from that frequency, in"], ["Frequency ratio"], ["Isolation efficiency, %"], ["Running speed, rad/s"], ["Rate for a 4 Hz system, lb/in per spring"]])
    s.g("B11", "=SQRT(12*B7*B8/B6)/(2*PI())", "NF", None, "mount_count=B7; mount_stiffness=B8 lb/in; mass=B6 slug", lambda n, k, m: fn(12 * n * k, m), "Hz")
    s.g("B12", "=(3.13/B11)^2", "SD", None, "natural_frequency=B11 Hz", lambda f: GIN / (W * f) ** 2, "in", "handbook 3.13")
    s.g("B13", "=B9/60/B11", "FR", None, "speed=B9 rpm; natural_frequency=B11 Hz", lambda n, f: n / 60 / f, "1")
    s.g("B14", "=100*(1-1/(1-B13^2))", "IE", "absolute-value-missing", "frequency_ratio=B13", lambda r: 100 * (1 - T(r)), "%", "above 100 %")
    s.g("B15", "=B9*PI()/30", "FC", None, "speed=B9 rpm", lambda n: n * PI / 30, "rad/s")
    s.g("B16", "=(2*PI()*4)^2*B6/12", "RK", "mount-count-missing", "mass=B6 slug; mount_count=B7", lambda m, n: (W * 4) ** 2 * m / 12 / n, "lb/in", "total, labelled per spring", m=["total-for-per-mount"])
    return b


def router():
    b = Book("violin_router_table", "label, symbol, value, unit, remark: one case", resave=True)
    s = b.sheet("Router")
    s.put("A1", "Isolation of the carving router, rev. C")
    s.put("A2", ["Item", "Symbol", "Value", "Unit", "Remark"])
    s.put("A3", [["Mass of table and router", "m", 640, "kg", "weighed"], ["Number of pads", "n", 6, "-"], ["Static stiffness of one pad", "k_s", 180, "N/mm", "catalogue"], ["Dynamic/static ratio", "κ", 1.35, "-"],
                 ["Damping ratio", "ζ", 0.08, "-"], ["Spindle speed", "N", 3000, "1/min", "slowest used"], ["Floor vibration velocity", "v", 0.35, "mm/s rms", "measured at N"]])
    s.put("A11", [["Load on one pad", "F", None, "N"], ["Static sag", "δ", None, "mm"], ["Dynamic stiffness of all pads", "k_dyn", None, "N/mm"], ["Natural frequency (dynamic stiffness)", "fn", None, "Hz"],
                  ["Disturbing frequency", "f", None, "Hz"], ["Ratio f/fn", "r", None, "-"], ["Transmissibility", "T", None, "-"], ["Isolation", "I", None, "%"], ["Level change", "ΔL", None, "dB"], ["Table velocity", "v_t", None, "mm/s rms"],
                  ["Floor displacement, zero to peak", "s", None, "µm"], ["Pad compression, zero to peak", "z", None, "µm"], ["Critical damping", "c_c", None, "N·s/m"], ["Damping of all pads", "c", None, "N·s/m"], ["Transmissibility at resonance", "T_res", None, "-"],
                  ["Undamped fn for T = 0.05", "f_5", None, "Hz"], ["Stiffness per pad for f_5", "k_5", None, "N/mm"], ["Dynamic spring force, one pad", "F_d", None, "N"]])
    s.g("C11", "=C3*9.81/C4", "ML", None, "mass=C3 kg; mount_count=C4", lambda m, n: m * G / n, "N")
    s.g("C12", "=C11/C5", "SD", None, "load=C11 N; mount_stiffness=C5 N/mm", lambda p, k: p / k, "mm")
    s.g("C13", "=C4*C5*C6", "MK", None, "mount_count=C4; mount_stiffness=C5 N/mm; dynamic_ratio=C6", lambda n, k, q: n * k * q, "N/mm")
    s.g("C14", "=SQRT(C4*C5*1000/C3)/(2*PI())", "NF", "static-stiffness-for-dynamic", "mount_count=C4; mount_stiffness=C5 N/mm; dynamic_ratio=C6; mass=C3 kg", lambda n, k, q, m: fn(n * k * q * 1000, m), "Hz", "label says dynamic")
    s.g("C15", "=C8/60", "FC", None, "speed=C8 rpm", lambda n: n / 60, "Hz")
    s.g("C16", "=C15/C14", "FR", None, "frequency=C15 Hz; natural_frequency=C14 Hz", lambda f, g: f / g, "1")
    s.g("C17", "=SQRT((1+(2*C7*C16)^2)/((1-C16^2)^2+(2*C7*C16)^2))", "AT", None, "frequency_ratio=C16; damping_ratio=C7", T, "1")
    s.g("C18", "=(1-C17)*100", "IE", None, "transmissibility=C17", lambda t: 100 * (1 - t), "%")
    s.g("C19", "=10*LOG10(C17)", "DB", "decibel-factor", "transmissibility=C17", lambda t: 20 * math.log10(t), "dB", "level of a motion ratio")
    s.g("C20", "=C9*C17", "PM", None, "base_motion=C9 mm/s rms; transmissibility=C17", lambda v, t: v * t, "mm/s rms")
    s.g("C21", "=C9/(2*PI()*C15)*1000", "MC", "amplitude-kind", "motion=C9 mm/s rms; frequency=C15 Hz", lambda v, f: v * sqrt(2) / (W * f) * 1000, "µm pk", "rms velocity, peak displacement")
    s.g("C22", "=C21*C16^2/SQRT((1-C16^2)^2+(2*C7*C16)^2)", "RD", None, "base_motion=C21 µm pk; frequency_ratio=C16; damping_ratio=C7", lambda y, r, z: y * R(r, z), "µm pk")
    s.g("C23", "=2*SQRT(C13*C3)", "CD", "length-unit", "stiffness=C13 N/mm; mass=C3 kg", lambda k, m: 2 * sqrt(k * 1000 * m), "N·s/m", "N/mm without 1000")
    s.g("C24", "=C7*C23", "DC", None, "damping_ratio=C7; critical_damping=C23 N·s/m", lambda z, c: z * c, "N·s/m")
    s.g("C25", "=SQRT(1+1/(2*C7)^2)", "PT", None, "damping_ratio=C7", lambda z: T(1, z), "1", "at f = fn")
    s.g("C26", "=C15/SQRT(1+1/0.05)", "RNF", None, "frequency=C15 Hz", lambda f: f / r_for(0.05), "Hz", "labelled undamped")
    s.g("C27", "=(2*PI()*C26)^2*C3/1000", "RK", "total-for-per-mount", "natural_frequency=C26 Hz; mass=C3 kg; mount_count=C4", lambda f, m, n: (W * f) ** 2 * m / n / 1000, "N/mm", "labelled per pad", m=["mount-count-missing"])
    s.g("C28", "=C5*C6*C22/1000", "MF", None, "mount_stiffness=C5 N/mm; dynamic_ratio=C6; relative_displacement=C22 µm pk", lambda k, q, z: k * q * z / 1000, "N pk", "spring part, so labelled")
    s.put("A31", [["Spindle torque", "M", 4.2, "N·m"], ["Spindle power", "P", None, "W"], ["Cutting speed, 6 mm tool", "v_c", None, "m/min"], ["Pads, total price", "", None, "EUR", "38.50 each"]])
    s.ig("C32", "=2*PI()*C8/60*C31")
    s.ig("C33", "=PI()*6*C8/1000")
    s.ig("C34", "=C4*38.5")
    return b


def satellite():
    b = Book("cubesat_dispenser_random", "random vibration, defined names, break-point table, three axes, units in brackets", shared_strings=False)
    i = b.sheet("Inputs")
    i.put("A1", "Dispenser box on wire-rope isolators - inputs")
    i.put("A3", [["Box mass [kg]", 24], ["Isolators", 8], ["Dynamic stiffness of one isolator [N/m]", 61000], ["Damping ratio", 0.12], ["ASD near resonance [g²/Hz]", 0.04], ["Duration [s]", 120]])
    for n, c in (("m_box", "B3"), ("n_iso", "B4"), ("k_iso", "B5"), ("zeta_iso", "B6"), ("S_asd", "B7"), ("t_dur", "B8")):
        b.name_cell(n, f"Inputs!${c[0]}${c[1]}")
    s = b.sheet("Random")
    s.put("A1", "Response of the box, vertical axis")
    s.put("A3", [["Natural frequency [Hz]"], ["Quality factor Q"], ["Response [g rms], Miles"], ["Response [g rms], with the damper term"], ["3-sigma response [g]"], ["Isolator deflection, 1 sigma [mm]"], ["Isolator deflection, 3 sigma [mm]"], ["Positive-going crossings in the test"], ["Damping coefficient of one isolator [N·s/m]"], ["3-sigma load on one isolator, spring [N]"]])
    s.g("B3", "=SQRT(n_iso*k_iso/m_box)/(2*PI())", "NF", None, "mount_count=Inputs!B4; mount_stiffness=Inputs!B5 N/m; mass=Inputs!B3 kg", lambda n, k, m: fn(n * k, m), "Hz")
    s.g("B4", "=1/(2*zeta_iso)", "DR", None, "damping_ratio=Inputs!B6", lambda z: 1 / (2 * z), "1")
    s.g("B5", "=SQRT(PI()/2*B3*B4*S_asd)", "RR", None, "natural_frequency=B3 Hz; q=B4; asd=Inputs!B7 g²/Hz", lambda f, q, S: sqrt(PI / 2 * f * q * S), "g rms")
    s.g("B6", "=SQRT(B3*S_asd*(1+4*zeta_iso^2)/(2*zeta_iso))", "RR", "half-pi-missing", "natural_frequency=B3 Hz; asd=Inputs!B7 g²/Hz; damping_ratio=Inputs!B6", lambda f, S, z: sqrt(PI * f * S * (1 + 4 * z * z) / (4 * z)), "g rms", "flat spectrum with the damper term")
    s.g("B7", "=3*B6", "RR", None, "rms=B6 g rms", lambda g: 3 * g, "g")
    s.g("B8", "=SQRT(S_asd*9.80665^2/(8*zeta_iso*(2*PI()*B3)^3))*1000", "RR", None, "asd=Inputs!B7 g²/Hz; damping_ratio=Inputs!B6; natural_frequency=B3 Hz", lambda S, z, f: 1000 * sqrt(S * G * G / (8 * z * (W * f) ** 3)), "mm rms", q=["RD"])
    s.g("B9", "=3*B8", "RR", None, "rms=B8 mm rms", lambda d: 3 * d, "mm", q=["RD"])
    s.ig("B10", "=B3*t_dur")
    s.g("B11", "=2*zeta_iso*SQRT(n_iso*k_iso*m_box)", "DC", "total-for-per-mount", "damping_ratio=Inputs!B6; mount_count=Inputs!B4; mount_stiffness=Inputs!B5 N/m; mass=Inputs!B3 kg", lambda z, n, k, m: 2 * z * sqrt(n * k * m) / n, "N·s/m", "all isolators, labelled one", m=["mount-count-missing"])
    s.g("B12", "=k_iso*B9/1000", "MF", None, "mount_stiffness=Inputs!B5 N/m; relative_displacement=B9 mm", lambda k, z: k * z / 1000, "N")

    s = b.sheet("Axes")
    s.put("A1", "Quick look at all axes of the heritage unit")
    s.put("A3", ["Axis", "fn [Hz]", "Q", "ASD [g²/Hz]", "Response (Miles, π/2 form) [g rms]", "Deflection, 3 sigma [mm]", "Damping ratio", "ASD [(m/s²)²/Hz]", "Peak, 3 sigma [g]", "Margin on 25 g"])
    s.put("A4", [["X", 31.5, 6.2, 0.02], ["Y", 28.0, 5.4, 0.025], ["Z", 22.7, 4.8, 0.04]])
    s.g("E4:E6", "=SQRT(B4*C4*D4)", "RR", "half-pi-missing", "natural_frequency=B4:B6 Hz; q=C4:C6; asd=D4:D6 g²/Hz", lambda f, q, S: sqrt(PI / 2 * f * q * S), "g rms")
    s.g("F4:F6", "=3*E4/(2*PI()*B4)^2*1000", "RR", "mass-weight-mixup", "rms=E4:E6 g rms; natural_frequency=B4:B6 Hz", lambda g, f: 3 * g * G / (W * f) ** 2 * 1000, "mm", "g not turned into m/s²", q=["RD"])
    s.g("G4:G6", "=1/C4", "DR", "loss-factor-as-damping-ratio", "q=C4:C6", lambda q: 1 / (2 * q), "1", "1/Q is the loss factor")
    s.g("H4:H6", "=D4*9.81", "HE", "mass-weight-mixup", "asd=D4:D6 g²/Hz", lambda S: S * G * G, "(m/s²)²/Hz", "g instead of g squared", q=["MC"], m=["ratio-not-squared"])
    s.g("I4:I6", "=3*E4", "RR", None, "rms=E4:E6 g rms", lambda g: 3 * g, "g")
    s.ig("J4:J6", "=25/I4-1", fmt="0.00")

    s = b.sheet("Profile")
    s.put("A1", "Input spectrum, break points")
    s.put("A3", ["f1 [Hz]", "ASD1 [g²/Hz]", "f2 [Hz]", "ASD2 [g²/Hz]", "Slope exponent", "Area [g²]"])
    s.put("A4", [[20, 0.01, 80, 0.04], [80, 0.04, 350, 0.04], [350, 0.04, 2000, 0.005]])
    s.g("E4:E6", "=LOG10(D4/B4)/LOG10(C4/A4)", "HE", None, "f1=A4:A6 Hz; s1=B4:B6 g²/Hz; f2=C4:C6 Hz; s2=D4:D6 g²/Hz", lambda a, p, c, q: math.log(q / p) / math.log(c / a), "1")
    s.g("F4:F6", "=B4*A4/(E4+1)*((C4/A4)^(E4+1)-1)", "HE", None, "f1=A4:A6 Hz; s1=B4:B6 g²/Hz; f2=C4:C6 Hz; exponent=E4:E6", lambda a, p, c, n: p * a / (n + 1) * ((c / a) ** (n + 1) - 1), "g²")
    s.put("A8", [["Overall input [g rms]"], ["Overall input, first two segments [g rms]"]])
    s.g("F8", "=SUM(F4:F6)", "OR", "square-root-missing", "areas=@F4:F6 g²", lambda v: sqrt(sum(v)), "g rms", "sum of areas given as rms")
    s.g("F9", "=SQRT(SUM(F4:F5))", "OR", None, "areas=@F4:F5 g²", lambda v: sqrt(sum(v)), "g rms")
    return b


def falz():
    b = Book("falzmaschinen_druckerei", "German columns, unit after a comma, damping in percent, one slipped row", resave=True)
    s = b.sheet("Aufstellung")
    s.put("A1", "Elastische Aufstellung der Falzmaschinen")
    s.put("A3", ["Maschine", "Masse, kg", "Drehzahl, 1/min", "Federn, Stk", "Federrate je Feder, N/mm", "Dämpfungsgrad D, %", "Einfederung, mm", "Eigenfrequenz f0, Hz", "Erregerfrequenz f, Hz", "Abstimmung f/f0", "Durchlässigkeit V", "Isoliergrad, %",
                 "Dämmung 20·lg(1/V), dB", "krit. Dämpfung, kNs/m", "Dämpfungskonstante, kNs/m", "Resonanzüberhöhung 1/(2D)", "Kennkreisfrequenz ω0, rad/s", "Bodenweg, µm", "Relativweg Maschine-Boden, µm", "gedämpfte Eigenfrequenz fd, Hz",
                 "erf. Einfederung für 90 % (ungedämpft), mm", "Federweg gesamt, mm", "Kosten, EUR"])
    s.put("A4", [["F1", 1450, 900, 4, 260, 6], ["F2", 1620, 900, 4, 260, 6], ["F3", 2100, 750, 6, 240, 8], ["F4", 880, 1200, 4, 140, 5], ["F5", 960, 1200, 4, 140, 5], ["F6", 3150, 620, 8, 190, 10]])
    s.down("R4", [42, 38, 55, 21, 24, 60])
    s.g("G4:G7,G9", "=B4*9.81/(D4*E4)", "SD", None, "mass=B4:B9 kg; mount_count=D4:D9; mount_stiffness=E4:E9 N/mm", lambda m, n, k: m * G / (n * k), "mm")
    s.g("G8", "=B7*9.81/(D8*E8)", "SD", "reference-slip", "mass=B8 kg; mount_count=D8; mount_stiffness=E8 N/mm", lambda m, n, k: m * G / (n * k), "mm", "mass of the row above", m=["fill-break"])
    s.g("H4:H9", "=15.76/SQRT(G4)", "NF", None, "static_deflection=G4:G9 mm", lambda d: sqrt(G / (d / 1000)) / W, "Hz")
    s.g("I4:I9", "=C4/60", "FC", None, "speed=C4:C9 rpm", lambda n: n / 60, "Hz")
    s.g("J4:J9", "=H4/I4", "FR", "ratio-inverted", "frequency=I4:I9 Hz; natural_frequency=H4:H9 Hz", lambda f, g: f / g, "1", "header f/f0")
    s.g("K4:K9", "=SQRT((1+(2*F4*I4/H4)^2)/((1-(I4/H4)^2)^2+(2*F4*I4/H4)^2))", "AT", "percent-as-ratio", "damping_ratio=F4:F9 %; frequency=I4:I9 Hz; natural_frequency=H4:H9 Hz", lambda z, f, g: T(f / g, z / 100), "1")
    s.g("L4:L9", "=100*(1-K4)", "IE", None, "transmissibility=K4:K9", lambda t: 100 * (1 - t), "%")
    s.g("M4:M9", "=20*LOG10(1/K4)", "DB", None, "transmissibility=K4:K9", lambda t: -20 * math.log10(t), "dB", tol=1e-6)
    s.g("N4:N9", "=2*SQRT(D4*E4*1000*B4)/1000", "CD", None, "mount_count=D4:D9; mount_stiffness=E4:E9 N/mm; mass=B4:B9 kg", lambda n, k, m: 2 * sqrt(n * k * 1000 * m) / 1000, "kN·s/m")
    s.g("O4:O9", "=F4*N4", "DC", "percent-as-ratio", "damping_ratio=F4:F9 %; critical_damping=N4:N9 kN·s/m", lambda z, c: z / 100 * c, "kN·s/m")
    s.g("P4:P9", "=1/(2*F4/100)", "PT", None, "damping_ratio=F4:F9 %", lambda z: 100 / (2 * z), "1", "labelled 1/(2D)", q=["DR"])
    s.g("Q4:Q9", "=2*PI()*H4", "NF", None, "natural_frequency=H4:H9 Hz", lambda f: W * f, "rad/s", q=["FC"])
    s.g("S4:S9", "=R4*K4", "RD", "absolute-used-for-relative", "base_motion=R4:R9 µm; frequency=I4:I9 Hz; natural_frequency=H4:H9 Hz; damping_ratio=F4:F9 %", lambda y, f, g, z: y * R(f / g, z / 100), "µm", "transmissibility used for the relative path", q=["PM"])
    s.g("T4:T9", "=H4*SQRT(1-F4/100)", "NF", "damping-not-squared", "natural_frequency=H4:H9 Hz; damping_ratio=F4:F9 %", lambda f, z: f * sqrt(1 - (z / 100) ** 2), "Hz")
    s.g("U4:U9", "=(15.76/I4)^2*(1+1/0.1)", "RSD", None, "frequency=I4:I9 Hz", lambda f: 11 * 1000 * G / (W * f) ** 2, "mm")
    s.ig("V4:V9", "=G4+15")
    s.ig("W4:W9", "=D4*68.4")
    s.put("A11", "Summe")
    s.ig("W11", "=SUM(W4:W9)")
    s.ig("B11", "=SUM(B4:B9)/1000")
    return b


def books():
    return [ice_rink(), router(), satellite(), falz()]
