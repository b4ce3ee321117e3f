"""Vehicles and ships: a German transposed sheet, inputs on another sheet, a units row, an English transposed sheet."""
from math import pi, sqrt

from model import absolute_hysteretic, relative
from sheet import Book


def graz():
    b = Book("graz_stromrichter_lagerung", "German, quantities down and variants across, loss factor, kN/mm beside N/mm, symbols and units in columns of their own", "resaved")
    s = b.sheet("Auslegung")
    s["A1"] = "Stromrichter unter Wagenboden – elastische Lagerung"
    s.across("A3", "Größe", "Zeichen", "Einheit", "Var. 1", "Var. 2", "Var. 3", "Var. 4", "Var. 5", "Var. 6")
    c = lambda r: f"D{r}:I{r}"

    def line(at, label, sym, unit, *vals):
        s.across(f"A{at}", label, sym, unit, *vals)

    line(4, "Masse", "m", "t", 1.15, 1.15, 1.32, 1.32, 0.86, 0.86)
    line(5, "Anzahl Lager", "n", "-", 4, 6, 4, 6, 4, 4)
    line(6, "Federsteifigkeit je Lager, statisch", "c_stat", "kN/mm", 0.38, 0.27, 0.42, 0.31, 0.29, 0.22)
    line(7, "Dynamikfaktor", "kappa", "-", 1.35, 1.35, 1.45, 1.45, 1.25, 1.25)
    line(8, "Verlustfaktor", "eta", "-", 0.16, 0.16, 0.2, 0.2, 0.12, 0.12)
    line(9, "Erregerfrequenz", "f", "Hz", 33.3, 33.3, 50, 50, 41.7, 41.7)
    line(10, "Amplitude Wagenkasten (Spitze)", "u", "µm", 42, 42, 18, 18, 25, 25)
    line(12, "Federsteifigkeit je Lager, dynamisch", "c_dyn", "kN/mm")
    s.f(c(12), "=D6*D7", "mount-stiffness", out="kN/mm", k=c(6) + "|kN/mm", kappa=c(7) + "|1")
    line(13, "Gesamtsteifigkeit, dynamisch", "c_ges", "N/m")
    s.f(c(13), "=D12*D5*1E6", "mount-stiffness", out="N/m", k=c(12) + "|kN/mm", n=c(5) + "|1")
    line(14, "Eigenkreisfrequenz", "ω0", "1/s")
    s.f(c(14), "=SQRT(D13/(D4*1000))", "natural-frequency", out="rad/s", k=c(13) + "|N/m", m=c(4) + "|t")
    line(15, "Eigenfrequenz", "f0", "Hz")
    g = s.f(c(15), "=D14/2/PI()", "natural-frequency", out="Hz", fn=c(14) + "|rad/s", alsoQ=["frequency-conversion"])
    g.over("G15", "=G14/2*PI()", "sign-precedence", alsoM=["fill-break", "angular-cyclic-mixup"], note="bracket lost in one variant")
    line(16, "Eigenfrequenz mit dyn. Steifigkeit (Ausdruck 2014)", "f0'", "Hz")
    s.f(c(16), "=SQRT(D6*D5*1000/D4)/(2*PI())", "natural-frequency", "static-stiffness-for-dynamic", out="Hz", k=c(6) + "|kN/mm", n=c(5) + "|1", kappa=c(7) + "|1", m=c(4) + "|t", note="static stiffness under a dynamic heading")
    line(17, "Dämpfungsgrad", "D", "-")
    s.f(c(17), "=D8/2", "damping-ratio", eta=c(8) + "|1")
    line(18, "Abstimmungsverhältnis", "r", "-")
    s.f(c(18), "=D9/D15", "frequency-ratio", f=c(9) + "|Hz", fn=c(15) + "|Hz")
    line(19, "Übertragungsfaktor (viskos)", "T", "-")
    s.f(c(19), "=SQRT((1+4*D17^2*D18^2)/((1-D18^2)^2+4*D17^2*D18^2))", "absolute-transmissibility", z=c(17) + "|1", r=c(18) + "|1")
    line(20, "Übertragungsfaktor (Strukturdämpfung)", "T_h", "-")
    s.f(c(20), "=SQRT((1+D8^2)/((1-D18^2)^2+D8^2))", "absolute-transmissibility", eta=c(8) + "|1", r=c(18) + "|1", model=absolute_hysteretic, note="hysteretic form, loss factor given")
    line(21, "Übertragungsfaktor, alte Tabelle", "T_alt", "-")
    s.f(c(21), "=SQRT((1+(2*D8*D18)^2)/((1-D18^2)^2+(2*D8*D18)^2))", "absolute-transmissibility", "loss-factor-as-damping-ratio", eta=c(8) + "|1", r=c(18) + "|1")
    line(22, "Schwingweg Gerät (Spitze)", "x", "µm")
    s.f(c(22), "=D10*D19", "payload-motion", out="µm", X=c(10) + "|µm", T=c(19) + "|1")
    line(23, "Relativweg im Lager (Spitze)", "z", "µm")
    s.f(c(23), "=D10*D19", "relative-displacement", "absolute-used-for-relative", out="µm", X=c(10) + "|µm", r=c(18) + "|1", z=c(17) + "|1", note="room for the mount from the absolute motion")
    line(24, "Schwingbeschleunigung Gerät (eff.)", "a_eff", "m/s²")
    s.f(c(24), "=(2*PI()*D9)^2*D22*1E-6", "motion-conversion", "amplitude-kind", out="m/s2", f=c(9) + "|Hz", X=c(22) + "|µm", model=lambda a: a.w() ** 2 * a.X / sqrt(2), note="peak headed rms")
    line(25, "Isolierwirkungsgrad", "I", "%")
    s.f(c(25), "=(1-D19)*100", "isolation-efficiency", out="%", T=c(19) + "|1")
    line(26, "Statische Last je Lager", "F", "kN")
    s.f(c(26), "=D4*9.81/D5", "mount-load", out="kN", m=c(4) + "|t", n=c(5) + "|1")
    line(27, "Statische Einfederung", "s", "mm")
    s.f(c(27), "=D26/D6", "static-deflection", out="mm", W=c(26) + "|kN", k=c(6) + "|kN/mm")
    line(28, "Phase", "phi", "Grad")
    s.f(c(28), "=-DEGREES(ATAN2(1-D18^2+(2*D17*D18)^2,2*D17*D18^3))", "absolute-phase", out="deg", r=c(18) + "|1", z=c(17) + "|1")
    line(30, "Gewicht Rahmen", "G", "kg")
    s.ignore(c(30), "=0.08*0.008*7850*4.2*D5")
    line(31, "Schraubenvorspannung", "p", "N/mm²")
    s.ignore(c(31), "=56000/157")
    line(32, "Kosten", "", "EUR")
    s.ignore(c(32), "=D5*118")
    return b


def ship():
    b = Book("ferry_genset_two_sheets", "Inputs on a sheet of their own, kgf/mm and daN/mm, orders of the engine", "shared")
    p = b.sheet("Input data")
    p["A1"] = "MV Skarvoy - auxiliary engines, resilient mounting"
    p.grid("A3", ["Item", "Aux 1", "Aux 2", "Aux 3", "Unit"], ["Set mass, wet", 6200, 6200, 4850, "kg"], ["No. of mounts", 10, 10, 8, "pcs"], ["Mount stiffness vertical", 92, 118, 84, "kgf/mm"],
           ["Mount stiffness transverse", 31, 40, 29, "daN/mm"], ["Dyn. stiffness factor", 1.3, 1.3, 1.4, "-"], ["Nominal speed", 1200, 900, 1500, "rpm"], ["Mount damping, % critical", 5, 5, 7, "%"],
           ["Seating velocity rms", 3.2, 2.6, 4.1, "mm/s"], ["Cylinders", 6, 8, 6, "-"])
    s = b.sheet("Calc")
    s["A1"] = "Vertical mode"
    s.across("A2", "", "Aux 1", "Aux 2", "Aux 3", "Unit")
    q = "'Input data'!"
    i = lambda r: f"Input data!B{r}:D{r}"
    c = lambda r: f"B{r}:D{r}"

    def line(at, label, unit, formula, quantity, mistake=None, **kw):
        s[f"A{at}"], s[f"E{at}"] = label, unit
        return s.f(c(at), formula.replace("@", q), quantity, mistake, **kw)

    line(3, "Stiffness of all mounts, static", "N/mm", "=@B6*9.81*@B5", "mount-stiffness", out="N/mm", k=i(6) + "|kgf/mm", n=i(5) + "|1")
    line(4, "Stiffness of all mounts, dynamic", "N/mm", "=B3*@B8", "mount-stiffness", out="N/mm", k=c(3) + "|N/mm", kappa=i(8) + "|1")
    line(5, "Weight on one mount", "kN", "=@B4*9.81/@B5/1000", "mount-load", out="kN", m=i(4) + "|kg", n=i(5) + "|1")
    line(6, "Static compression", "mm", "=@B4*9.81/B3", "static-deflection", out="mm", m=i(4) + "|kg", k=c(3) + "|N/mm")
    g = line(7, "Natural frequency", "Hz", "=1/(2*PI())*SQRT(B4*1000/@B4)", "natural-frequency", out="Hz", k=c(4) + "|N/mm", m=i(4) + "|kg")
    g.over("C7", "=1/(2*PI())*SQRT(C4*1000/'Input data'!C4)*1.1", "fill-break", note="10 % put on in one column")
    line(8, "Natural frequency by sag (approx.)", "cpm", "=946/SQRT(B6)", "natural-frequency", out="cpm", d=c(6) + "|mm")
    line(9, "Transverse stiffness of all mounts", "N/mm", "=@B7*10*@B5", "mount-stiffness", out="N/mm", k=i(7) + "|daN/mm", n=i(5) + "|1")
    line(10, "Transverse natural frequency", "Hz", "=SQRT(@B7*@B5/@B4)/(2*PI())", "natural-frequency", "length-unit", out="Hz", k=i(7) + "|daN/mm", n=i(5) + "|1", m=i(4) + "|kg", note="daN/mm not brought to N/m", alsoM=["mass-weight-mixup"])
    line(11, "Shaft frequency", "Hz", "=@B9/60", "frequency-conversion", out="Hz", f=i(9) + "|rpm")
    line(12, "Firing frequency, 4-stroke", "Hz", "=B11*@B12/2", "frequency-conversion", out="Hz", f=c(11) + "|Hz", teeth=i(12) + "|1", model=lambda a: a.f * a.teeth / 2)
    line(13, "Frequency ratio, order 1", "-", "=B11/B7", "frequency-ratio", f=c(11) + "|Hz", fn=c(7) + "|Hz")
    line(14, "Frequency ratio, order 1 (check)", "-", "=B7/B11", "frequency-ratio", "ratio-inverted", f=c(11) + "|Hz", fn=c(7) + "|Hz")
    line(15, "Critical damping", "Ns/m", "=2*SQRT(B4*1000*@B4)", "critical-damping", out="N.s/m", k=c(4) + "|N/mm", m=i(4) + "|kg")
    line(16, "Damping constant", "Ns/m", "=B15*@B10/100", "damping-coefficient", out="N.s/m", z=i(10) + "|%", cc=c(15) + "|N.s/m", model=lambda a: a.z * a.cc)
    line(17, "Critical damping (first issue)", "Ns/m", "=2*SQRT(B4*@B4)", "critical-damping", "length-unit", out="N.s/m", k=c(4) + "|N/mm", m=i(4) + "|kg")
    line(18, "Transmissibility order 1", "-", "=SQRT((1+(2*@B10/100*B13)^2)/((1-B13^2)^2+(2*@B10/100*B13)^2))", "absolute-transmissibility", z=i(10) + "|%", r=c(13) + "|1")
    line(19, "Transmissibility order 1, from c and k", "-", "=SQRT(((B4*1000)^2+(2*PI()*B11*B16)^2)/((B4*1000-@B4*(2*PI()*B11)^2)^2+(2*PI()*B11*B16)^2))", "absolute-transmissibility", k=c(4) + "|N/mm", f=c(11) + "|Hz", c=c(16) + "|N.s/m", m=i(4) + "|kg",
         note="the impedance form")
    line(20, "Transmissibility order 1 without damper", "-", "=1/ABS(1-B13^2)", "absolute-transmissibility", r=c(13) + "|1", note="headed without damper")
    line(21, "Transmissibility at firing", "-", "=1/((B12/B7)^2-1)", "absolute-transmissibility", "undamped-form", f=c(12) + "|Hz", fn=c(7) + "|Hz", z=i(10) + "|%")
    line(22, "Seating displacement, rms", "µm", "=@B11/(2*PI()*B11)*1000", "motion-conversion", out="µm", V=i(11) + "|mm/s", f=c(11) + "|Hz", model=lambda a: a.V / a.w())
    line(23, "Seating displacement, peak-peak", "µm", "=B22*SQRT(2)", "motion-conversion", "amplitude-kind", out="µm", x=c(22) + "|µm", model=lambda a: a.x * 2 * sqrt(2), note="factor for peak only")
    line(24, "Relative displacement in mounts, rms", "µm", "=B22*B13^2/SQRT((1-B13^2)^2+(2*@B10/100*B13)^2)", "relative-displacement", out="µm", X=c(22) + "|µm", r=c(13) + "|1", z=i(10) + "|%")
    line(25, "Force per mount, spring only, rms", "N", "=B24/1000*B4/@B5", "mount-force", out="N", Z=c(24) + "|µm", k=c(4) + "|N/mm", n=i(5) + "|1", model=lambda a: a.Z * a.k / a.n)
    line(26, "Force per mount, spring and damper, rms", "N", "=B24/1E6*SQRT((B4*1000)^2+(B11*B16)^2)/@B5", "mount-force", "angular-cyclic-mixup", out="N", Z=c(24) + "|µm", k=c(4) + "|N/mm", n=i(5) + "|1", f=c(11) + "|Hz", c=c(16) + "|N.s/m", model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)) / a.n)
    line(27, "Set velocity, rms", "mm/s", "=@B11*B18", "payload-motion", out="mm/s", V=i(11) + "|mm/s", T=c(18) + "|1")
    s["A30"] = "Exhaust gas velocity, m/s"
    s.ignore("B30:D30", "=1.9/(PI()/4*0.35^2)")
    s["A31"] = "Fuel per day, t"
    s.ignore("B31:D31", "=24*'Input data'!B12*0.0215")
    s["A32"] = "Holding-down bolt stress, N/mm²"
    s.ignore("B32:D32", "=B5*1000*2/157")
    s["A33"] = "Compression within 5-12 mm"
    s.ignore("B33:D33", '=IF(AND(B6>=5,B6<=12),"OK","NOT OK")')
    return b


def units_row():
    b = Book("refinery_pump_survey", "A header row and a units row; mils, in/s, cpm, lbf/in", "strings")
    s = b.sheet("Survey 2018")
    s["B1"] = "PUMP SKID VIBRATION SURVEY / ISOLATION STUDY"
    s.across("B3", "Pump", "Speed", "Skid weight", "No. springs", "Spring k", "Damp.", "Deck motion", "Freq", "Omega", "Sag", "Nat freq", "Nat freq (g)", "Ratio", "Abs TR", "Abs TR rev0", "Rel TR", "Pump motion", "Spring travel", "Deck vel", "Deck vel rms", "Deck acc", "Deck acc (old)", "Motor kW")
    s.across("B4", "", "cpm", "lbf", "", "lbf/in", "% crit", "mils p-p", "Hz", "rad/s", "in", "cpm", "Hz", "", "", "", "", "mils p-p", "mils p-p", "in/s pk", "in/s rms", "g pk", "g pk", "kW")
    s.grid("B5", ["P-101A", 1780, 2600, 4, 720, 6, 2.4], ["P-101B", 1780, 2600, 4, 720, 6, 3.1], ["P-204", 3560, 1150, 4, 890, 8, 0.9], ["P-205", 3560, 1240, 4, 890, 8, 1.1], ["P-310A", 1185, 4400, 6, 610, 5, 4.6],
           ["P-310B", 1185, 4400, 6, 610, 5, 3.8], ["P-415", 885, 5200, 8, 430, 4, 6.2], ["K-501", 2380, 7900, 8, 1320, 7, 1.7])
    c = lambda x: f"{x}5:{x}12"
    s.f(c("I"), "=C5/60", "frequency-conversion", out="Hz", f=c("C") + "|cpm")
    s.f(c("J"), "=C5*0.10472", "frequency-conversion", out="rad/s", f=c("C") + "|cpm")
    s.f(c("K"), "=D5/(E5*F5)", "static-deflection", out="in", W=c("D") + "|lbf", n=c("E") + "|1", k=c("F") + "|lbf/in")
    s.f(c("L"), "=187.7/SQRT(K5)", "natural-frequency", out="cpm", d=c("K") + "|in")
    s.f(c("M"), "=(1/6.2832)*SQRT(F5*E5*386.1/D5)", "natural-frequency", out="Hz", k=c("F") + "|lbf/in", n=c("E") + "|1", W=c("D") + "|lbf")
    g = s.f(c("N"), "=C5/L5", "frequency-ratio", f=c("C") + "|cpm", fn=c("L") + "|cpm")
    g.over("N9", "=C9/L8", "reference-slip", alsoM=["fill-break"])
    s.f(c("O"), "=((1+(2*G5/100*N5)^2)/((1-N5^2)^2+(2*G5/100*N5)^2))^0.5", "absolute-transmissibility", r=c("N") + "|1", z=c("G") + "|%")
    s.f(c("P"), "=((1+(2*G5/100*N5)^2)/((1-N5^2)^2+(2*G5/100*N5)^2))", "absolute-transmissibility", "square-root-missing", r=c("N") + "|1", z=c("G") + "|%")
    s.f(c("Q"), "=N5^2/((1-N5^2)^2+(2*G5/100*N5)^2)^0.5", "relative-transmissibility", r=c("N") + "|1", z=c("G") + "|%")
    s.f(c("R"), "=H5*O5", "payload-motion", out="mil", X=c("H") + "|mil", T=c("O") + "|1")
    s.f(c("S"), "=H5*Q5", "relative-displacement", out="mil", X=c("H") + "|mil", R=c("Q") + "|1", model=lambda a: a.X * a.R)
    s.f(c("T"), "=PI()*I5*H5/1000", "motion-conversion", out="in/s", f=c("I") + "|Hz", X=c("H") + "|mil", model=lambda a: a.w() * a.X / 2, note="p-p to peak velocity")
    s.f(c("U"), "=0.0707*T5", "motion-conversion", "constant-wrong", out="in/s", V=c("T") + "|in/s", model=lambda a: a.V / sqrt(2), note="0.0707 for 0.707", alsoM=["amplitude-kind"])
    s.f(c("V"), "=(2*PI()*I5)^2*H5/1000/2/386.1", "motion-conversion", out="g", f=c("I") + "|Hz", X=c("H") + "|mil", model=lambda a: a.w() ** 2 * a.X / 2)
    s.f(c("W"), "=(2*PI()*I5)^2*H5/1000/386.1", "motion-conversion", "amplitude-kind", out="g", f=c("I") + "|Hz", X=c("H") + "|mil", model=lambda a: a.w() ** 2 * a.X / 2, note="peak-to-peak taken as peak")
    s.ignore(c("X"), "=D5*0.0045*C5/1780")
    s["B14"] = "Max deck motion"
    s.ignore("H14", "=MAX(H5:H12)")
    s["B15"] = "Discharge pressure drop psi"
    s.ignore("H15", "=0.433*0.95*46")
    return b


def transposed():
    b = Book("avionics_tray_cases_across", "English, cases across; base acceleration in g; c in N s/m; two blocks", "inline")
    s = b.sheet("Tray")
    s["A2"] = "Equipment tray on four wire-rope mounts"
    s.across("C3", "Case A", "Case B", "Case C", "Case D")
    c = lambda r: f"C{r}:F{r}"

    def line(at, label, unit, vals=None, formula=None, quantity=None, mistake=None, **kw):
        s[f"A{at}"], s[f"B{at}"] = label, unit
        if vals:
            s.across(f"C{at}", *vals)
        elif quantity:
            s.f(c(at), formula, quantity, mistake, **kw)
        else:
            s.ignore(c(at), formula)

    line(4, "mass of tray with box", "kg", [14.2, 14.2, 18.5, 9.6])
    line(5, "mounts", "", [4, 4, 4, 4])
    line(6, "stiffness of one mount", "N/mm", [21, 34, 34, 15])
    line(7, "damper constant of one mount", "N s/m", [62, 85, 85, 40])
    line(8, "sine frequency", "Hz", [40, 55, 31, 62])
    line(9, "table acceleration (peak)", "g", [1.5, 2, 1, 2.5])
    line(11, "omega", "rad/s", None, "=2*PI()*C8", "frequency-conversion", out="rad/s", f=c(8) + "|Hz")
    line(12, "omega_n", "rad/s", None, "=SQRT(C6*C5*1000/C4)", "natural-frequency", out="rad/s", k=c(6) + "|N/mm", n=c(5) + "|1", m=c(4) + "|kg")
    line(13, "fn", "Hz", None, "=SQRT(C6*1000/C4)/(2*PI())", "natural-frequency", "mount-count-missing", out="Hz", k=c(6) + "|N/mm", n=c(5) + "|1", m=c(4) + "|kg", alsoM=["total-for-per-mount"])
    line(14, "zeta", "-", None, "=C7*C5/(2*SQRT(C6*C5*1000*C4))", "damping-ratio", c=c(7) + "|N.s/m", n=c(5) + "|1", k=c(6) + "|N/mm", m=c(4) + "|kg", model=lambda a: a.c * a.n / (2 * sqrt(a.k * a.n * a.m)))
    line(15, "zeta (first draft)", "-", None, "=C7*C5/SQRT(C6*C5*1000*C4)", "damping-ratio", "?", c=c(7) + "|N.s/m", n=c(5) + "|1", k=c(6) + "|N/mm", m=c(4) + "|kg", model=lambda a: a.c * a.n / (2 * sqrt(a.k * a.n * a.m)), note="2 of 2 sqrt(km) left out")
    line(16, "r", "-", None, "=C11/C12", "frequency-ratio", f=c(11) + "|rad/s", fn=c(12) + "|rad/s")
    line(17, "r (Hz)", "-", None, "=C8/C12", "frequency-ratio", "angular-cyclic-mixup", f=c(8) + "|Hz", fn=c(12) + "|rad/s")
    line(18, "transmissibility", "-", None, "=SQRT((1+(2*C14*C16)^2)/(SUMSQ(1-C16^2,2*C14*C16)))", "absolute-transmissibility", z=c(14) + "|1", r=c(16) + "|1")
    line(19, "transmissibility, draft", "-", None, "=SQRT((1+(2*C14*C16)^2)/(ABS(1-C16^2)+(2*C14*C16)^2))", "absolute-transmissibility", "ratio-not-squared", z=c(14) + "|1", r=c(16) + "|1", note="1-r2 not squared")
    line(20, "box acceleration (peak)", "g", None, "=C9*C18", "payload-motion", out="g", A=c(9) + "|g", T=c(18) + "|1")
    line(21, "table displacement (peak)", "mm", None, "=C9*9810/C11^2", "motion-conversion", out="mm", A=c(9) + "|g", f=c(11) + "|rad/s", model=lambda a: a.A / a.w() ** 2)
    line(22, "table displacement (peak), draft", "mm", None, "=C9*9810/C8^2", "motion-conversion", "angular-cyclic-mixup", out="mm", A=c(9) + "|g", f=c(8) + "|Hz", model=lambda a: a.A / a.w() ** 2)
    line(23, "mount travel (peak)", "mm", None, "=C21*C16^2/SQRT((1-C16^2)^2+(2*C14*C16)^2)", "relative-displacement", out="mm", X=c(21) + "|mm", r=c(16) + "|1", z=c(14) + "|1")
    line(24, "mount travel (peak), by acceleration", "mm", None, "=C9*9.81*1000/C12^2/SQRT((1-C16^2)^2+(2*C14*C16)^2)", "relative-displacement", out="mm", A=c(9) + "|g", fn=c(12) + "|rad/s", r=c(16) + "|1", z=c(14) + "|1", model=lambda a: a.A / (2 * pi * a.fn) ** 2 * relative(a) / a.r**2)
    line(25, "force through one mount (peak)", "N", None, "=C23/1000*SQRT((C6*1000)^2+(C7*C11)^2)", "mount-force", out="N", Z=c(23) + "|mm", k=c(6) + "|N/mm", c=c(7) + "|N.s/m", f=c(11) + "|rad/s", model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)))
    line(26, "force through all mounts (peak)", "N", None, "=C4*C20*9.81", "mount-force", out="N", m=c(4) + "|kg", A=c(20) + "|g", model=lambda a: a.m * a.A, note="inertia of the box equals the mounts' force", alsoQ=["mount-load"])
    line(27, "damped natural frequency", "Hz", None, "=C12*SQRT(1-C14^2)/(2*PI())", "natural-frequency", out="Hz", fn=c(12) + "|rad/s", z=c(14) + "|1", model=lambda a: a.fn * sqrt(1 - a.z**2))
    line(28, "damped natural frequency, draft", "Hz", None, "=C12*SQRT(1-C14)/(2*PI())", "natural-frequency", "damping-not-squared", out="Hz", fn=c(12) + "|rad/s", z=c(14) + "|1", model=lambda a: a.fn * sqrt(1 - a.z**2))
    line(29, "phase of box", "deg", None, "=ATAN(2*C14*C16^3/(1-C16^2+(2*C14*C16)^2))*180/PI()", "absolute-phase", "?", out="deg", r=c(16) + "|1", z=c(14) + "|1", note="ATAN loses the quadrant above resonance")
    line(31, "box surface", "m2", None, "=0.38*0.32*2+0.38*0.19*2")
    line(32, "heat to shed", "W", None, "=C31*5.5*18")
    return b


BOOKS = [graz, ship, units_row, transposed]
