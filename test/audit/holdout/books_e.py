"""More hands: a French list with a unit column, a Swiss balance room, a random-vibration sheet, rubber pads, a sound studio."""
from math import log, log10, pi, sqrt

from model import G, miles
from sheet import Book


def jacquard():
    b = Book("atelier_metiers_jacquard", "French calculation note of one column: designation, symbol, value, unit", "resaved")
    s = b.sheet("Note de calcul")
    s["A1"] = "NOTE DE CALCUL - suspension de métiers à tisser sur plancher bois"
    s.across("A3", "Désignation", "Symbole", "Valeur", "Unité")
    for i, x in enumerate([("Masse d'un métier", "M", 1640, "kg"), ("Nombre d'appuis", "n", 6, "-"), ("Cadence", "N", 620, "coups/min"), ("Raideur statique d'un appui", "ks", 34, "daN/mm"), ("Coefficient dynamique", "Kd", 1.3, "-"),
                           ("Amortissement réduit", "ξ", 7, "%"), ("Amplitude du plancher (crête)", "a0", 120, "µm"), ("Efficacité demandée", "E", 80, "%"), ("Accélération de la pesanteur", "g", 9.81, "m/s²")], 4):
        s.across(f"A{i}", *x)
    s["A14"] = "1. Fréquences"
    s.merged.append("A14:D14")

    def line(at, label, sym, unit, formula, quantity=None, mistake=None, **kw):
        s.across(f"A{at}", label, sym, None, unit)
        if quantity:
            s.f(f"C{at}", formula, quantity, mistake, **kw)
        else:
            s.ignore(f"C{at}", formula)

    line(15, "Fréquence d'excitation", "fe", "Hz", "=C6/60", "frequency-conversion", out="Hz", f="C6|cpm")
    line(16, "Pulsation d'excitation", "ω", "rad/s", "=2*PI()*C15", "frequency-conversion", out="rad/s", f="C15|Hz")
    line(17, "Raideur dynamique totale", "Kt", "N/m", "=C7*C8*C5*10000", "mount-stiffness", out="N/m", k="C7|daN/mm", kappa="C8|1", n="C5|1")
    line(18, "Pulsation propre", "ω0", "rad/s", "=SQRT(C17/C4)", "natural-frequency", out="rad/s", k="C17|N/m", m="C4|kg")
    line(19, "Fréquence propre", "f0", "Hz", "=C18/2/PI()", "natural-frequency", out="Hz", fn="C18|rad/s", alsoQ=["frequency-conversion"])
    line(20, "Fréquence propre (note 2003)", "f0", "Hz", "=SQRT(C17/C4)", "natural-frequency", "angular-cyclic-mixup", out="Hz", k="C17|N/m", m="C4|kg")
    line(21, "Fréquence propre amortie", "fa", "Hz", "=C19*SQRT(1-(C9/100)^2)", "natural-frequency", out="Hz", fn="C19|Hz", z="C9|%", model=lambda a: a.fn * sqrt(1 - a.z**2))
    line(22, "Rapport des fréquences", "r", "-", "=C15/C19", "frequency-ratio", f="C15|Hz", fn="C19|Hz")
    line(23, "Rapport des fréquences (note 2003)", "r", "-", "=C6/C19", "frequency-ratio", "speed-unit", f="C6|cpm", fn="C19|Hz")
    s["A25"] = "2. Amortissement"
    line(26, "Amortissement critique", "cc", "N.s/m", "=2*C4*C18", "critical-damping", out="N.s/m", m="C4|kg", fn="C18|rad/s", model=lambda a: 2 * a.m * 2 * pi * a.fn)
    line(27, "Amortissement critique (note 2003)", "cc", "N.s/m", "=2*C4*C19", "critical-damping", "angular-cyclic-mixup", out="N.s/m", m="C4|kg", fn="C19|Hz", model=lambda a: 2 * a.m * 2 * pi * a.fn)
    line(28, "Coefficient d'amortissement total", "c", "N.s/m", "=C9/100*C26", "damping-coefficient", out="N.s/m", z="C9|%", cc="C26|N.s/m", model=lambda a: a.z * a.cc)
    line(29, "Facteur de perte", "η", "-", "=C9/100", "damping-ratio", "loss-factor-as-damping-ratio", z="C9|%", model=lambda a: 2 * a.z, note="zeta under a loss-factor label")
    line(30, "Facteur de qualité", "Q", "-", "=100/(2*C9)", "damping-ratio", z="C9|%", model=lambda a: 1 / (2 * a.z))
    s["A32"] = "3. Réponse"
    line(33, "Transmissibilité", "T", "-", "=((1+(2*C9/100*C22)^2)/((1-C22^2)^2+(2*C9/100*C22)^2))^0.5", "absolute-transmissibility", z="C9|%", r="C22|1")
    line(34, "Transmissibilité (note 2003)", "T", "-", "=((1-C22^2)^2+(2*C9/100*C22)^2)^0.5/(1+(2*C9/100*C22)^2)^0.5", "absolute-transmissibility", "?", z="C9|%", r="C22|1", note="fraction upside down")
    line(35, "Transmissibilité relative", "R", "-", "=C22^2/((1-C22^2)^2+(2*C9/100*C22)^2)^0.5", "relative-transmissibility", z="C9|%", r="C22|1")
    line(36, "Amplitude du métier (crête)", "am", "µm", "=C33*C10", "payload-motion", out="µm", X="C10|µm", T="C33|1")
    line(37, "Course des appuis (crête)", "z", "mm", "=C35*C10/1000", "relative-displacement", out="mm", X="C10|µm", R="C35|1", model=lambda a: a.X * a.R)
    line(38, "Course des appuis (crête à crête)", "zcc", "mm", "=C35*C10/1000", "relative-displacement", "amplitude-kind", out="mm", X="C10|µm", R="C35|1", model=lambda a: 2 * a.X * a.R)
    line(39, "Force d'un appui, ressort seul (crête)", "F", "N", "=C37/1000*C17/C5", "mount-force", out="N", Z="C37|mm", k="C17|N/m", n="C5|1", model=lambda a: a.Z * a.k / a.n)
    line(40, "Force d'un appui, ressort et amortisseur (crête)", "F", "N", "=C37/1000*SQRT(C17^2+(C16*C28)^2)", "mount-force", "total-for-per-mount", out="N", Z="C37|mm", k="C17|N/m", n="C5|1", c="C28|N.s/m", f="C16|rad/s", model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)) / a.n, alsoM=["mount-count-missing"])
    line(41, "Accélération du métier (crête)", "γ", "m/s²", "=C16^2*C36/10^6", "motion-conversion", out="m/s2", X="C36|µm", f="C16|rad/s", model=lambda a: a.w() ** 2 * a.X, alsoQ=["payload-motion"])
    line(42, "Accélération du métier (crête), note 2003", "γ", "m/s²", "=C16^2*C36/1000", "motion-conversion", "length-unit", out="m/s2", X="C36|µm", f="C16|rad/s", model=lambda a: a.w() ** 2 * a.X, alsoQ=["payload-motion"])
    line(43, "Efficacité d'isolation", "E", "%", "=100-100*C33", "isolation-efficiency", out="%", T="C33|1")
    s["A45"] = "4. Dimensionnement non amorti"
    line(46, "Fréquence propre maximale pour l'efficacité demandée", "f0max", "Hz", "=C15/SQRT(1+1/(1-C11/100))", "required-natural-frequency", out="Hz", f="C15|Hz", E="C11|%")
    line(47, "Fréquence propre maximale (note 2003)", "f0max", "Hz", "=C15/(1+1/(1-C11/100))", "required-natural-frequency", "square-root-missing", out="Hz", f="C15|Hz", E="C11|%")
    line(48, "Fréquence propre maximale (note 1997)", "f0max", "Hz", "=C15/SQRT(1+1/(1-C11))", "required-natural-frequency", "percent-as-ratio", out="Hz", f="C15|Hz", E="C11|%")
    line(49, "Raideur requise par appui", "k", "daN/mm", "=C4*(2*PI()*C46)^2/C5/10000", "required-stiffness", out="daN/mm", m="C4|kg", fn="C46|Hz", n="C5|1", alsoQ=["mount-stiffness"])
    line(50, "Raideur requise par appui (note 2003)", "k", "daN/mm", "=C4*C46^2/C5/10000", "required-stiffness", "angular-cyclic-mixup", out="daN/mm", m="C4|kg", fn="C46|Hz", n="C5|1", alsoQ=["mount-stiffness"])
    line(51, "Écrasement statique requis", "δ", "mm", "=C12*1000/(2*PI()*C46)^2", "required-static-deflection", out="mm", fn="C46|Hz", alsoQ=["static-deflection"])
    line(53, "Charge d'exploitation plancher", "q", "kN/m²", "=C4*9.81/1000/(2.4*1.9)")
    line(54, "Énergie par poste", "W", "kWh", "=7.5*0.8*8")
    return b


def balance():
    b = Book("waegeraum_abstimmung", "German, one row per excitation, damping per row as Lehr's D in percent, required tuning", "strings")
    s = b.sheet("Wägeraum 2")
    s["A1"] = "Mikrowaagen auf Schwingfundament – Tiefabstimmung"
    s["A2"], s["C2"] = "Masse Fundamentblock mit Tisch [kg]", 2350
    s["A3"], s["C3"] = "Anzahl Federelemente", 6
    s["A4"] = "Amplitude Boden: Effektivwerte"
    heads = ["Quelle", "Drehzahl [1/min]", "Bodenschnelle eff. [µm/s]", "D [%]", "Zul. Übertragungsfaktor", "Erregerfrequenz [Hz]", "Erf. Abstimmung r", "Erf. Eigenfrequenz [Hz]", "Erf. Eigenfrequenz ungedämpft [Hz]", "Erf. Eigenfrequenz [Hz] Vorlage", "Erf. Federsteifigkeit je Element [N/mm]",
             "Erf. Federsteifigkeit je Element [N/mm] Vorlage", "Erf. Einfederung [mm]", "Erf. Einfederung [mm] Vorlage", "Erf. Einfederung [cm] 25/f²", "Überhöhung im Durchfahren", "Überhöhung Vorlage", "Bodenausschlag eff. [µm]", "Bodenausschlag Spitze [µm]", "Bodenausschlag Spitze-Spitze [µm]", "Erf. Eigenfrequenz [1/min]", "Wirkungsgrad [%]", "Wirkungsgrad Vorlage [%]"]
    s.across("A6", *heads)
    s.grid("A7", ["Lüftung", 1450, 18, 5, 0.1], ["Kompressor", 985, 42, 5, 0.15], ["Kreiselpumpe", 2900, 11, 8, 0.05], ["Aufzug", 720, 65, 8, 0.25], ["Notstrom", 1500, 27, 3, 0.1], ["Zentrifuge", 3900, 8, 10, 0.08])
    c = lambda x: f"{x}7:{x}12"
    T, D, f = c("E") + "|1", c("D") + "|%", c("F") + "|Hz"
    s.f(c("F"), "=B7/60", "frequency-conversion", out="Hz", f=c("B") + "|rpm")
    s.f(c("G"), "=SQRT((-(E7^2*(4*(D7/100)^2-2)-4*(D7/100)^2)+SQRT((E7^2*(4*(D7/100)^2-2)-4*(D7/100)^2)^2-4*E7^2*(E7^2-1)))/(2*E7^2))", "frequency-ratio", T=T, z=D, model=lambda a: 1 / fwant1(a), note="ratio needed for T, with damping", alsoQ=["required-natural-frequency", "helper"])
    s.f(c("H"), "=F7/G7", "required-natural-frequency", out="Hz", f=f, r=c("G") + "|1", model=lambda a: a.f / a.r, alsoQ=["natural-frequency"])
    s.f(c("I"), "=F7/SQRT((1+E7)/E7)", "required-natural-frequency", out="Hz", f=f, T=T, note="headed undamped")
    g = s.f(c("J"), "=F7/SQRT(1+1/E7)", "required-natural-frequency", "undamped-form", out="Hz", f=f, T=T, z=D)
    s.f(c("K"), "=$C$2*(2*PI()*H7)^2/$C$3/1000", "required-stiffness", out="N/mm", m="C2|kg", n="C3|1", fn=c("H") + "|Hz", alsoQ=["mount-stiffness"])
    s.f(c("L"), "=$C$2*(2*PI()*H7)^2/1000", "required-stiffness", "mount-count-missing", out="N/mm", m="C2|kg", n="C3|1", fn=c("H") + "|Hz", alsoQ=["mount-stiffness"], alsoM=["total-for-per-mount"])
    g = s.f(c("M"), "=248.4/H7^2", "required-static-deflection", out="mm", fn=c("H") + "|Hz", alsoQ=["static-deflection"])
    g.over("M10", "=248.4/H9^2", "reference-slip", alsoM=["fill-break"])
    s.f(c("N"), "=248.4/H7", "required-static-deflection", "?", out="mm", fn=c("H") + "|Hz", alsoQ=["static-deflection"], note="f for f^2")
    s.f(c("O"), "=25/H7^2", "required-static-deflection", out="cm", fn=c("H") + "|Hz", alsoQ=["static-deflection"], tol=8e-3, note="(5/f)^2 rule in the heading")
    s.f(c("P"), "=SQRT(1+(100/(2*D7))^2)", "peak-transmissibility", z=D, model=lambda a: sqrt(1 + 1 / (2 * a.z) ** 2), tol=1e-3, alsoQ=["absolute-transmissibility"], note="at resonance, hardly below the exact peak")
    s.f(c("Q"), "=SQRT(1+(1/(2*D7))^2)", "peak-transmissibility", "percent-as-ratio", z=D, model=lambda a: sqrt(1 + 1 / (2 * a.z) ** 2), alsoQ=["absolute-transmissibility"])
    s.f(c("R"), "=C7/(2*PI()*F7)", "motion-conversion", out="µm", V=c("C") + "|µm/s", f=f, model=lambda a: a.V / a.w())
    s.f(c("S"), "=R7*1.414", "motion-conversion", out="µm", x=c("R") + "|µm", model=lambda a: a.x * sqrt(2))
    s.f(c("T"), "=R7*2", "motion-conversion", "amplitude-kind", out="µm", x=c("R") + "|µm", model=lambda a: a.x * 2 * sqrt(2), note="rms doubled is not peak-to-peak")
    s.f(c("U"), "=H7*60", "required-natural-frequency", out="cpm", fn=c("H") + "|Hz", alsoQ=["frequency-conversion", "natural-frequency"])
    s.f(c("V"), "=(1-E7)*100", "isolation-efficiency", out="%", T=T)
    s.f(c("W"), "=(1/E7-1)*100", "isolation-efficiency", "efficiency-not-of-motion", out="%", T=T)
    s["A14"] = "Einbau KW"
    s["C14"] = "=DATE(2019,5,6)+7*3"
    s.ignore("C14")
    s.number("C14", "dd.mm.yyyy")
    s["A15"] = "Beton [m³]"
    s.ignore("C15", "=C2/2400")
    s["A16"] = "Honorar [CHF]"
    s.ignore("C16", "=14*165*1.077")
    return b


def fwant1(a):
    """The natural frequency wanted for excitation at 1 Hz."""
    a.f = 1.0
    return a.fwant()


def random_sheet():
    b = Book("payload_random_levels", "Random vibration of a boxed payload: break points, slopes, areas, response", "shared")
    s = b.sheet("PSD")
    s["A1"] = "Qualification spectrum and box response"
    s.across("A3", "Freq", "ASD", "slope n", "area", None, "ASD metric", "dB re 1 g2/Hz")
    s.across("A4", "Hz", "g^2/Hz", "-", "g^2", None, "(m/s2)^2/Hz", "dB")
    s.down("A5", 10, 40, 150, 600, 1200, 2000)
    s.down("B5", 0.003, 0.02, 0.08, 0.08, 0.03, 0.012)
    seg = dict(f1="A5:A9|Hz", f2="A6:A10|Hz", x1="B5:B9|g2/Hz", xn="B6:B10|g2/Hz")

    def slope(a):
        return log(a.xn / a.x1) / log(a.f2 / a.f1)

    def area(a):
        n = slope(a)
        return a.x1 * a.f1 / (n + 1) * ((a.f2 / a.f1) ** (n + 1) - 1) / G**2

    s.f("C5:C9", "=LN(B6/B5)/LN(A6/A5)", "helper", model=slope, noerr=True, note="a flat stretch has slope 0", **seg)
    s.f("D5:D9", "=B5*A5/(C5+1)*((A6/A5)^(C5+1)-1)", "helper", model=area, **seg)
    s.f("F5:F10", "=B5*9.81^2", "helper", out="(m/s2)2/Hz", S="B5:B10|g2/Hz", model=lambda a: a.S)
    s.f("G5:G10", "=10*LOG10(B5)", "motion-conversion", out="dB", S="B5:B10|g2/Hz", model=lambda a: 10 * log10(a.S / G**2), alsoQ=["helper", "transmissibility-db"], note="a power quantity: 10 log is right")
    ys = "D5:D9[]|1"
    s["A12"] = "Overall level, g rms"
    s.f("D12", "=SQRT(SUM(D5:D9))", "overall-rms", y=ys, model=lambda a: sqrt(sum(a.y)))
    s["A13"] = "Overall level, g rms (macro)"
    s.f("D13", "=SUM(D5:D9)", "overall-rms", "square-root-missing", y=ys, model=lambda a: sqrt(sum(a.y)))
    s["A14"] = "Overall level, g rms (test plan)"
    s.f("D14", "=3*SQRT(SUM(D5:D9))", "overall-rms", "amplitude-kind", y=ys, model=lambda a: sqrt(sum(a.y)), note="three sigma under an rms label")
    s["A15"] = "Overall level, m/s2 rms"
    s.f("D15", "=D12*9.81", "overall-rms", out="m/s2", sigma="D12|g", model=lambda a: a.sigma, alsoQ=["motion-conversion"])
    s["A16"] = "Flat part 150-600 Hz only, g rms"
    s.f("D16", "=SQRT(B7*(A8-A7))", "overall-rms", out="g", S="B7|g2/Hz", f1="A7|Hz", f2="A8|Hz", model=lambda a: sqrt(a.S * (a.f2 - a.f1)))
    s.across("I4", "", "Hz", "% crit", "g2/Hz", "", "g", "g", "g", "g", "g pk", "g pk", "mm", "mil", "mm", "mm", "", "m/s2", "m/s2")
    s.grid("I5", ["X", 168, 4, 0.08], ["Y", 212, 5, 0.08], ["Z", 310, 3, 0.08], ["X light", 240, 6, 0.08], ["Z light", 455, 8, 0.08])
    c = lambda x: f"{x}5:{x}9"
    fn, z, S, Q = c("J") + "|Hz", c("K") + "|%", c("L") + "|g2/Hz", c("M") + "|1"
    s.across("I3", "Axis", "fn", "zeta", "ASD at fn", "Q", "resp. rms", "resp. rms exact", "resp. rms memo 9", "resp. rms memo 12", "peak 3 sigma", "peak 3 sigma memo", "stretch rms", "stretch rms", "stretch 3 sigma", "stretch 3 sigma memo", "T at fn", "resp. rms", "resp. rms memo")
    s.f(c("M"), "=50/K5", "damping-ratio", z=z, model=lambda a: 1 / (2 * a.z))
    s.f(c("N"), "=SQRT(PI()*J5*M5*L5/2)", "random-response-rms", out="g", fn=fn, Q=Q, S=S)
    s.f(c("O"), "=SQRT(PI()/2*J5*M5*L5*(1+4*(K5/100)^2))", "random-response-rms", out="g", fn=fn, Q=Q, z=z, S=S, model=lambda a: miles(a) * sqrt(1 + 4 * a.z**2))
    s.f(c("P"), "=SQRT(J5*M5*L5)", "random-response-rms", "half-pi-missing", out="g", fn=fn, Q=Q, S=S)
    s.f(c("Q"), "=SQRT(PI()/2*J5*K5*L5)", "random-response-rms", "?", out="g", fn=fn, z=z, S=S, model=lambda a: miles(a), note="damping in percent where Q stands")
    s.f(c("R"), "=3*N5", "random-response-rms", out="g", sigma=c("N") + "|g", model=lambda a: 3 * a.sigma)
    s.f(c("S"), "=SQRT(2)*N5", "random-response-rms", "amplitude-kind", out="g", sigma=c("N") + "|g", model=lambda a: 3 * a.sigma, note="sine crest factor under 3 sigma")
    s.f(c("T"), "=9810*N5/(2*PI()*J5)^2", "random-response-rms", out="mm", sigma=c("N") + "|g", fn=fn, model=lambda a: a.sigma / (2 * pi * a.fn) ** 2, alsoQ=["relative-displacement"])
    s.f(c("U"), "=T5/0.0254", "random-response-rms", out="mil", sigma=c("T") + "|mm", model=lambda a: a.sigma, alsoQ=["relative-displacement", "motion-conversion"])
    s.f(c("V"), "=3*9806.65*SQRT(L5/(8*K5/100*(2*PI()*J5)^3))", "random-response-rms", out="mm", fn=fn, z=z, S=S, model=lambda a: 3 * sqrt(a.S / (8 * a.z * (2 * pi * a.fn) ** 3)), alsoQ=["relative-displacement"])
    s.f(c("W"), "=3*9806.65*SQRT(L5/(8*K5*(2*PI()*J5)^3))", "random-response-rms", "percent-as-ratio", out="mm", fn=fn, z=z, S=S, model=lambda a: 3 * sqrt(a.S / (8 * a.z * (2 * pi * a.fn) ** 3)), alsoQ=["relative-displacement"])
    s.f(c("X"), "=SQRT(1+M5^2)", "absolute-transmissibility", Q=Q, model=lambda a: sqrt(1 + a.Q**2), alsoQ=["peak-transmissibility"])
    s.f(c("Y"), "=SQRT(PI()/2*J5*M5*L5*9.81^2)", "random-response-rms", out="m/s2", fn=fn, Q=Q, S=S)
    s.f(c("Z"), "=SQRT(PI()/2*J5*M5*L5*9.81)", "random-response-rms", "?", out="m/s2", fn=fn, Q=Q, S=S, note="g once under the root", alsoM=["mass-weight-mixup"])
    s["I12"] = "Test time h"
    s.ignore("L12", "=3*90/60")
    s["I13"] = "Screw preload N"
    s.ignore("L13", "=2.9/(0.2*0.004)")
    s["I14"] = "Highest"
    s.ignore("L14", "=MAX(N5:N9)")
    return b


def pads():
    b = Book("press_pads_geometry", "Punch presses on rubber pads: pad geometry, series and parallel springs, two tables on one sheet", "inline")
    s = b.sheet("Pads")
    s["A1"] = "Stamping line 3, foundation pads (Jan '97, revised by hand since)"
    s.across("A3", "Press", "Weight kN", "Pads", "Pad area cm²", "Pad height mm", "E modulus N/mm²", "Pad stiffness N/mm", "Pad stiffness N/mm rev A", "All pads kN/mm", "Sag mm", "Sag mm rev A", "fn Hz", "fn Hz rev A", "fn Hz rev B", "Pressure N/cm²", "Load/pad kN", "Load/pad kgf", "Load/pad t", "strokes/min", "r", "r rev A", "Reduction %", "Reduction % rev A")
    s.grid("A4", ["P1", 82, 6, 225, 50, 4.2], ["P2", 118, 8, 225, 50, 4.2], ["P3", 61, 4, 196, 40, 3.6], ["P4", 205, 8, 400, 60, 4.8], ["P5", 47, 4, 144, 40, 3.6], ["P6", 149, 6, 400, 75, 4.2])
    s.down("S4", 1480, 1300, 1600, 1150, 1800, 1250)
    c = lambda x: f"{x}4:{x}9"
    s["A2"] = "dyn. = static for these pads, damping not considered"
    A = lambda a: a.mod * a.area / a.t
    geo = dict(mod=c("F") + "|MPa", area=c("D") + "|cm2", t=c("E") + "|mm", model=A)
    s.f(c("G"), "=F4*D4*100/E4", "mount-stiffness", out="N/mm", **geo)
    s.f(c("H"), "=F4*D4*10/E4", "mount-stiffness", "length-unit", out="N/mm", note="cm² to mm² by 10", **geo)
    s.f(c("I"), "=G4*C4/1000", "mount-stiffness", out="kN/mm", k=c("G") + "|N/mm", n=c("C") + "|1")
    s.f(c("J"), "=B4/I4", "static-deflection", out="mm", W=c("B") + "|kN", k=c("I") + "|kN/mm")
    g = s.f(c("K"), "=B4*1000/G4", "static-deflection", "mount-count-missing", out="mm", W=c("B") + "|kN", k=c("G") + "|N/mm", n=c("C") + "|1", alsoM=["total-for-per-mount"])
    g = s.f(c("L"), "=SQRT(I4*9.81*1E6/(B4*1000))/(2*PI())", "natural-frequency", out="Hz", k=c("I") + "|kN/mm", W=c("B") + "|kN")
    g.over("L7", 5.4, "value-typed-over")
    s.f(c("M"), "=15.67/SQRT(J4)", "natural-frequency", "constant-wrong", out="Hz", d=c("J") + "|mm", note="15.76 with digits swapped")
    s.f(c("N"), "=15.76*SQRT(J4)", "natural-frequency", "?", out="Hz", d=c("J") + "|mm", note="times the root for over the root")
    s.ignore(c("O"), "=B4*1000/(C4*D4)")
    s.f(c("P"), "=B4/C4", "mount-load", out="kN", W=c("B") + "|kN", n=c("C") + "|1")
    s.f(c("Q"), "=P4*1000/9.81", "mount-load", out="kgf", F=c("P") + "|kN", model=lambda a: a.F, alsoQ=["helper"])
    s.f(c("R"), "=P4*9.81/1000", "mount-load", "mass-weight-mixup", out="t", F=c("P") + "|kN", model=lambda a: a.F / G, alsoQ=["helper"], note="kN to t: g multiplied", alsoM=["length-unit"])
    s.f(c("T"), "=S4/60/L4", "frequency-ratio", f=c("S") + "|cpm", fn=c("L") + "|Hz")
    s.f(c("U"), "=S4/60/(2*PI()*L4)", "frequency-ratio", "angular-cyclic-mixup", f=c("S") + "|cpm", fn=c("L") + "|Hz")
    s.f(c("V"), "=(T4^2-2)/(T4^2-1)*100", "isolation-efficiency", out="%", r=c("T") + "|1", note="1 - 1/(r2 - 1) in one fraction")
    s.f(c("W"), "=(T4-2)/(T4-1)*100", "isolation-efficiency", "ratio-not-squared", out="%", r=c("T") + "|1")
    s["A12"] = "Pad on spring element"
    s.across("A13", "Set", "k spring kN/mm", "k pad kN/mm", "pairs", "in series kN/mm", "in series kN/mm (sketch)", "side by side kN/mm", "all pairs kN/mm", "mass t", "fn Hz", "k needed per pair for 4 Hz, kN/mm", "k needed per pair for 4 Hz, kN/mm (sketch)", "max. fn for 80 % at 1250/min, Hz", "max. fn for 80 % at 1250/min, Hz (sketch)", "min. sag for 80 % at 1250/min, mm", "min. sag for 80 % at 1250/min, mm (sketch)")
    s.grid("A14", ["a", 0.9, 2.4, 6], ["b", 1.3, 2.4, 6], ["c", 1.8, 4.1, 8], ["d", 0.45, 1.1, 4], ["e", 2.6, 5.2, 8])
    s.down("I14", 8.4, 9.9, 17.5, 3.1, 21)
    c = lambda x: f"{x}14:{x}18"
    two = dict(k1=c("B") + "|kN/mm", k2=c("C") + "|kN/mm")
    s.f(c("E"), "=1/(1/B14+1/C14)", "mount-stiffness", out="kN/mm", model=lambda a: a.k1 * a.k2 / (a.k1 + a.k2), **two)
    s.f(c("F"), "=B14+C14", "mount-stiffness", "?", out="kN/mm", model=lambda a: a.k1 * a.k2 / (a.k1 + a.k2), note="added although headed series", **two)
    s.f(c("G"), "=B14+C14", "mount-stiffness", out="kN/mm", model=lambda a: a.k1 + a.k2, **two)
    s.f(c("H"), "=E14*D14", "mount-stiffness", out="kN/mm", k=c("E") + "|kN/mm", n=c("D") + "|1")
    s.f(c("J"), "=SQRT(H14*1000/I14)/6.28", "natural-frequency", out="Hz", k=c("H") + "|kN/mm", m=c("I") + "|t")
    s.f(c("K"), "=I14*(2*PI()*4)^2/1000/D14", "required-stiffness", out="kN/mm", m=c("I") + "|t", fn="4|Hz", n=c("D") + "|1", alsoQ=["mount-stiffness"])
    s.f(c("L"), "=I14*(2*PI()*4)/1000/D14", "required-stiffness", "?", out="kN/mm", m=c("I") + "|t", fn="4|Hz", n=c("D") + "|1", alsoQ=["mount-stiffness"], note="omega for omega squared")
    s.f("M14:M14", "=1250/60/SQRT(1+1/0.2)", "required-natural-frequency", out="Hz", f="1250|rpm", E="0.8|1")
    s.f("N14:N14", "=1250/60/SQRT(1+1/0.8)", "required-natural-frequency", "?", out="Hz", f="1250|rpm", E="0.8|1", note="efficiency put where transmissibility stands")
    s.f("O14:O14", "=(15.76/M14)^2", "required-static-deflection", out="mm", fn="M14|Hz", alsoQ=["static-deflection"])
    s.f("P14:P14", "=(15.76/(1250/60))^2", "required-static-deflection", "?", out="mm", f="1250|rpm", E="0.8|1", note="sag for tuning on the excitation itself")
    s["A21"] = "Press force at 6 mm stroke, kN"
    s.ignore("D21", "=320*1.2*110*0.8/1000")
    s["A22"] = "Flywheel energy, kJ"
    s.ignore("D22", "=0.5*46*(2*PI()*310/60)^2/1000")
    return b


def studio():
    b = Book("dubbing_stage_room_in_room", "Room in room: damping as Q, log decrement and c per row; dB of motion; row of constants above", "shared")
    s = b.sheet("Isolators")
    s["A1"] = "Room-in-room isolators. Train passes at 12.5 to 63 Hz. g = 9.81"
    s.across("A3", "Pos", "Load per isolator (kgf)", "k (kgf/mm)", "Q", "Log decr.", "c (N s/mm)", "Tone (Hz)", "Floor (mm/s peak)", "Sag (mm)", "fn (Hz)", "fn (Hz) hand calc", "zeta from Q", "zeta from log decr.", "zeta from c", "zeta from c (hand)", "f/fn", "Tr (Q)", "Tr (Q) hand", "Tr (c)", "Gain dB", "Gain dB hand", "Room (mm/s peak)", "Room (mm/s rms)", "Room (mm/s rms) hand", "Rel Tr", "Rel Tr hand", "Stretch (mm peak)", "Stretch (mm peak) hand", "Spring force (N peak)", "Spring + damper (N peak)", "Lag of room (deg)", "Lag of stretch (deg)", "Lag of stretch (deg) hand", "Isolation", "Cost")
    rows = [("1", 410, 42, 8, 0.39, 2.4, 12.5, 0.9), ("2", 410, 42, 8, 0.39, 2.4, 25, 1.4), ("3", 620, 58, 6, 0.52, 4.1, 31.5, 1.1), ("4", 620, 58, 6, 0.52, 4.1, 50, 0.7), ("5", 285, 33, 10, 0.31, 1.5, 40, 0.8), ("6", 350, 37, 5, 0.62, 3.2, 16, 0.6), ("7", 350, 37, 5, 0.62, 3.2, 63, 0.5)]
    s.grid("A4", *[list(x) for x in rows])
    c = lambda x: f"{x}4:{x}10"
    q, f, fn, rr = c("D") + "|1", c("G") + "|Hz", c("J") + "|Hz", c("P") + "|1"
    s.f(c("I"), "=B4/C4", "static-deflection", out="mm", W=c("B") + "|kgf", k=c("C") + "|kgf/mm")
    s.f(c("J"), "=5/SQRT(I4/10)", "natural-frequency", out="Hz", d=c("I") + "|mm", tol=4e-3, note="5/sqrt(cm)")
    s.f(c("K"), "=SQRT(C4*1000/B4)/(2*PI())", "natural-frequency", "mass-weight-mixup", out="Hz", k=c("C") + "|kgf/mm", m=c("B") + "|kg", note="kgf over kg without g")
    s.f(c("L"), "=0.5/D4", "damping-ratio", Q=q)
    s.f(c("M"), "=E4/SQRT((2*PI())^2+E4^2)", "damping-ratio", lam=c("E") + "|1")
    s.f(c("N"), "=F4*1000/(2*SQRT(C4*9.81*1000*B4))", "damping-ratio", c=c("F") + "|N.s/mm", k=c("C") + "|kgf/mm", m=c("B") + "|kg")
    s.f(c("O"), "=F4/(2*SQRT(C4*9.81*1000*B4))", "damping-ratio", "length-unit", c=c("F") + "|N.s/mm", k=c("C") + "|kgf/mm", m=c("B") + "|kg")
    g = s.f(c("P"), "=G4/J4", "frequency-ratio", f=f, fn=fn)
    g.over("P9", "=G9/K9", "reference-slip", note="the wrong fn column in one row", alsoM=["fill-break"])
    s.f(c("Q"), "=SQRT((1+(P4/D4)^2)/((1-P4^2)^2+(P4/D4)^2))", "absolute-transmissibility", r=rr, Q=q)
    s.f(c("R"), "=SQRT((1+P4/D4)/((1-P4^2)^2+P4/D4))", "absolute-transmissibility", "damping-not-squared", r=rr, Q=q)
    s.f(c("S"), "=SQRT((1+(2*N4*P4)^2)/((1-P4^2)^2+(2*N4*P4)^2))", "absolute-transmissibility", r=rr, z=c("N") + "|1")
    s.f(c("T"), "=20*LOG(Q4)", "transmissibility-db", out="dB", T=c("Q") + "|1")
    s.f(c("U"), "=20*LN(Q4)", "transmissibility-db", "?", out="dB", T=c("Q") + "|1", note="natural logarithm")
    s.f(c("V"), "=H4*Q4", "payload-motion", out="mm/s", V=c("H") + "|mm/s", T=c("Q") + "|1")
    s.f(c("W"), "=V4*0.7071", "payload-motion", out="mm/s", V=c("V") + "|mm/s", model=lambda a: a.V / sqrt(2), alsoQ=["motion-conversion"])
    s.f(c("X"), "=V4*1.414", "payload-motion", "amplitude-kind", out="mm/s", V=c("V") + "|mm/s", model=lambda a: a.V / sqrt(2), alsoQ=["motion-conversion"], note="multiplied where it must be divided")
    s.f(c("Y"), "=P4^2/SQRT((1-P4^2)^2+(P4/D4)^2)", "relative-transmissibility", r=rr, Q=q)
    s.f(c("Z"), "=P4^2/ABS(1-P4^2)", "relative-transmissibility", "undamped-form", r=rr, Q=q)
    s.f(c("AA"), "=H4/(2*PI()*G4)*Y4", "relative-displacement", out="mm", V=c("H") + "|mm/s", f=f, R=c("Y") + "|1", model=lambda a: a.V / a.w() * a.R)
    s.f(c("AB"), "=H4/G4*Y4", "relative-displacement", "angular-cyclic-mixup", out="mm", V=c("H") + "|mm/s", f=f, R=c("Y") + "|1", model=lambda a: a.V / a.w() * a.R)
    s.f(c("AC"), "=AA4*C4*9.81", "mount-force", out="N", Z=c("AA") + "|mm", k=c("C") + "|kgf/mm", model=lambda a: a.Z * a.k)
    s.f(c("AD"), "=AA4*SQRT((C4*9.81)^2+(F4*2*PI()*G4)^2)", "mount-force", out="N", Z=c("AA") + "|mm", k=c("C") + "|kgf/mm", c=c("F") + "|N.s/mm", f=f, model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)))
    s.f(c("AE"), "=-180/PI()*ATAN2(1-P4^2+(P4/D4)^2,P4^3/D4)", "absolute-phase", out="deg", r=rr, Q=q)
    s.f(c("AF"), "=180/PI()*ATAN2(1-P4^2,P4/D4)", "relative-phase", out="deg", r=rr, Q=q)
    s.f(c("AG"), "=180/PI()*ATAN((P4/D4)/(1-P4^2))", "relative-phase", "?", out="deg", r=rr, Q=q, note="ATAN loses the quadrant")
    s.f(c("AH"), "=1-Q4", "isolation-efficiency", T=c("Q") + "|1")
    s.number(c("AH"), "0%")
    s.ignore(c("AI"), "=IF(B4>500,64,47)*1.2")
    s["A13"] = "Reverberation time s"
    s.ignore("D13", "=0.161*640/92")
    s["A14"] = "Floor area m2"
    s.ignore("D14", "=11.2*8.4")
    return b


BOOKS = [jacquard, balance, random_sheet, pads, studio]
