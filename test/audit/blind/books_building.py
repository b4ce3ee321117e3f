"""Buildings, plant and machines on floors: schedules, calculation sheets, two languages more."""
from engine import Book

FC, NF, FR, DR, DC, CC = "frequency-conversion", "natural-frequency", "frequency-ratio", "damping-ratio", "damping-coefficient", "critical-damping"
SD, RSD, RNF, RK, MK, ML = "static-deflection", "required-static-deflection", "required-natural-frequency", "required-stiffness", "mount-stiffness", "mount-load"
TA, TR, IE, DB, PA, PR, PT = "absolute-transmissibility", "relative-transmissibility", "isolation-efficiency", "transmissibility-db", "absolute-phase", "relative-phase", "peak-transmissibility"
MC, PM, RD, MF, OR, RR, HE = "motion-conversion", "payload-motion", "relative-displacement", "mount-force", "overall-rms", "random-response-rms", "helper"


def rooftop_fans():
    b = Book("rooftop_fan_schedule", "fan schedule, SI, units in a row of their own, undamped, row slips", shared=True)
    s = b.sheet("Fan schedule")
    s.put("A1", "Vibration isolation schedule - roof level 9")
    s.put("A2", "Undamped steel springs throughout")
    s.row("A4", ["Tag", "Service", "Operating mass", "Mounts", "Fan speed", "Deflection", "Load per mount", "Natural frequency", "Forcing frequency", "f/fn", "TR", "Isolation", "Spring rate each",
                 "VFD minimum", "Frequency at minimum", "TR at minimum", "Air flow", "Pressure", "Shaft power", "Price each", "Price"])
    s.row("A5", ["", "", "kg", "no.", "rpm", "mm", "kg", "Hz", "Hz", "-", "-", "%", "N/mm", "%", "Hz", "-", "m³/h", "Pa", "kW", "EUR", "EUR"])
    s.style("A4:U5", "@bold")
    fans = [("EF-1", "toilets", 240, 4, 1150, 25, 70, 6200, 420, 38), ("EF-2", "kitchen", 410, 4, 960, 32, 65, 9800, 610, 38), ("EF-3", "car park", 980, 6, 720, 50, 75, 31000, 450, 61),
            ("EF-4", "plant", 315, 4, 1420, 25, 60, 7400, 380, 38), ("SF-1", "offices W", 1350, 6, 810, 50, 70, 36000, 900, 61), ("SF-2", "offices E", 1290, 6, 810, 50, 70, 35500, 880, 61),
            ("SF-3", "lobby", 620, 4, 1010, 32, 80, 14200, 560, 44), ("SF-4", "kitchen", 505, 4, 1100, 32, 80, 11000, 500, 44)]
    for i, f in enumerate(fans):
        r = 6 + i
        s.row(f"A{r}", f[:6])
        s.put(f"N{r}", f[6])
        s.row(f"Q{r}", f[7:9])
        s.put(f"T{r}", f[9])
    a = s.g("G6:G13", "=C6/D6", ML, "m/n", "kg", m="C|kg", n="D|1")
    s.slip(a, "G10", 250, "value-typed-over", "typed number, 225 by formula")
    s.g("H6:H13", "=15.76/SQRT(F6)", NF, "sqrt(G0/d)/2/pi", "Hz", d="F|mm")
    a = s.g("I6:I13", "=E6/60", FC, "f", "Hz", f="E|rpm")
    s.slip(a, "I12", "=E12/50", "fill-break", "50 for 60 in one row", also=("constant-wrong", "speed-unit"))
    s.g("J6:J13", "=I6/H6", FR, "f/fn", "1", f="I|Hz", fn="H|Hz")
    s.g("K6:K13", "=1/ABS(1-J6^2)", TA, "Tu(r)", "1", r="J|1")
    s.g("L6:L13", "=(1-K6)*100", IE, "1-T", "%", T="K|1")
    s.g("M6:M13", "=G6/F6", MK, "w*G0/d", "N/mm", "mass-weight-mixup", "kg over mm under a N/mm heading", w="G|kg", d="F|mm", alsoq=[RK])
    s.g("O6:O13", "=I6*N6/100", FC, "f*p", "Hz", f="I|Hz", p="N|%", alsoq=[HE])
    a = s.g("P6:P13", "=1/ABS(1-(O6/H6)^2)", TA, "Tu(f/fn)", "1", f="O|Hz", fn="H|Hz")
    s.slip(a, "P9", "=1/ABS(1-(O9/H8)^2)", "reference-slip", "natural frequency of the row above")
    s.other("S6:S13", "=Q6/3600*R6/0.62/1000")
    s.other("U6:U13", "=D6*T6")
    s.put("B14", "Totals")
    s.other("C14:D14", "=SUM(C6:C13)")
    s.other("U14", "=SUM(U6:U13)")
    return b


def chiller_calc():
    b = Book("chiller_and_pump_calc", "inch-pound calculation sheet, value left of unit, two blocks side by side")
    s = b.sheet("Calc")
    s.row("A1", ["CHILLER CH-2", None, None, None, "CONDENSER PUMP CP-2"])
    s.col("A4", ["Operating weight", "Number of isolators", "Compressor speed", "Wanted isolation", "Damping ratio c/cc", None, "Load per isolator", "Disturbing frequency", "Allowable transmissibility",
                 "Required f/fn (undamped)", "Highest natural frequency", "Required static deflection", "Required spring rate", "Selected spring rate, each", "Deflection under load", "Natural frequency", "Natural frequency",
                 "Frequency ratio f/fn", "Transmissibility", "Isolation efficiency", "Transmissibility"])
    s.col("C4", ["lb", "", "rpm", "%", "", None, "lb", "Hz", "", "", "Hz", "in", "lb/in", "lb/in", "in", "Hz", "cpm", "", "", "%", "dB"])
    s.col("B4", [14200, 8, 1780, 95, 0.05])
    s.put("B17", 950)
    s.g("B10", "=B4/B5", ML, "W/n", "lbf", W="B4|lbf", n="B5|1")
    s.g("B11", "=B6/60", FC, "f", "Hz", f="B6|rpm")
    s.g("B12", "=1-B7/100", TA, "1-E", "1", E="B7|%")
    s.g("B13", "=SQRT(1+1/B12)", FR, "sqrt(1+1/T)", "1", T="B12|1")
    s.g("B14", "=B11/B13", RNF, "f/r", "Hz", f="B11|Hz", r="B13|1")
    s.g("B15", "=(3.31/B14)^2", RSD, "G0/(2*pi*fn)**2", "in", "constant-wrong", "3.13 with digits swapped", fn="B14|Hz", alsoq=[SD])
    s.g("B16", "=B10/B15", RK, "w/d", "lbf/in", w="B10|lbf", d="B15|in")
    s.g("B18", "=B10/B17", SD, "w/k", "in", w="B10|lbf", k="B17|lbf/in")
    s.g("B19", "=3.13*SQRT(1/B18)", NF, "sqrt(G0/d)/2/pi", "Hz", d="B18|in")
    s.g("B20", "=188/SQRT(B18)", NF, "sqrt(G0/d)/2/pi", "cpm", d="B18|in")
    s.g("B21", "=B11/B19", FR, "f/fn", "1", f="B11|Hz", fn="B19|Hz")
    s.g("B22", "=SQRT((1+(2*B8*B21)^2)/((1-B21^2)^2+(2*B8*B21)^2))", TA, "T_(r,z)", "1", z="B8|1", r="B21|1")
    s.g("B23", "=100*B22", IE, "1-T", "%", "efficiency-not-of-motion", "T in percent reported as efficiency", T="B22|1")
    s.g("B24", "=10*LOG10(B22)", DB, "20*log10(T)", "dB", "decibel-factor", "10 for 20", T="B22|1")
    s.col("E4", ["Weight incl. base", "Isolators", "Motor speed", "Spring rate of one isolator", "Water flow", "Static deflection", "Natural frequency", "Disturbing frequency", "Transmissibility, undamped", "Efficiency", "Head loss check"])
    s.col("G4", ["lb", "", "rpm", "lb/in", "gpm", "in", "Hz", "Hz", "", "%", "ft"])
    s.col("F4", [2150, 4, 1750, 610, 820])
    s.g("F9", "=F4/F7", SD, "W/n/k", "in", "mount-count-missing", "whole weight on one spring", also=["total-for-per-mount"], W="F4|lbf", n="F5|1", k="F7|lbf/in")
    s.g("F10", "=SQRT(386.1*F7*F5/F4)/(2*PI())", NF, "sqrt(G0*k*n/W)/2/pi", "Hz", W="F4|lbf", n="F5|1", k="F7|lbf/in")
    s.g("F11", "=F6/60", FC, "f", "Hz", f="F6|rpm")
    s.g("F12", "=1/(1-F11^2/F10^2)", TA, "Tu(f/fn)", "1", "absolute-value-missing", "negative above resonance", f="F11|Hz", fn="F10|Hz")
    s.g("F13", "=1-ABS(F12)", IE, "1-abs(T)", "1", T="F12|1", note="cell formatted as percent")
    s.style("F13", "0.0%")
    s.other("F14", "=0.0009*F8^1.85/10")
    return b


def pruefstand():
    b = Book("pruefstand_isolierung", "German, units in brackets, c is stiffness and eta is the frequency ratio")
    s = b.sheet("Auslegung")
    s.put("A1", "Schwingungsisolierung Getriebeprüfstand 3")
    s.col("A3", ["Masse m [kg]", "Federsteifigkeit je Lager c [N/mm]", "Anzahl Lager [-]", "Dämpfungsgrad D [-]", "Einfederung gemessen s [cm]"])
    s.col("B3", [1850, 420, 6, 0.08, 0.74])
    s.col("D3", ["Gesamtsteifigkeit c_ges [N/mm]", "Eigenkreisfrequenz ω0 [1/s]", "Eigenfrequenz f0 [Hz]", "Einfederung statisch [mm]", "Eigenfrequenz aus Einfederung [Hz]", "Gedämpfte Eigenfrequenz fd [Hz]", "Dämpfungskonstante b [Ns/m]", "Belastung je Lager [N]", "Resonanzüberhöhung, näherungsweise 1/(2D)"])
    s.g("E3", "=B4*B5", MK, "k*n", "N/mm", k="B4|N/mm", n="B5|1")
    s.g("E4", "=SQRT(E3*1000/B3)", NF, "sqrt(K/m)/2/pi", "rad/s", K="E3|N/mm", m="B3|kg")
    s.g("E5", "=E4/2*PI()", NF, "w", "Hz", "sign-precedence", "brackets lost round 2π", w="E4|rad/s", also=["angular-cyclic-mixup"], alsoq=[FC])
    s.g("E6", "=B3*9.81/E3", SD, "m*G0/K", "mm", m="B3|kg", K="E3|N/mm")
    s.g("E7", "=5/SQRT(B7)", NF, "sqrt(G0/d)/2/pi", "Hz", d="B7|cm")
    s.g("E8", "=E7*SQRT(1-B6^2)", NF, "fn*sqrt(1-z*z)", "Hz", fn="E7|Hz", z="B6|1")
    s.g("E9", "=2*B6*SQRT(E3*B3)", DC, "2*z*sqrt(K*m)", "N.s/m", "length-unit", "N/mm taken as N/m", z="B6|1", K="E3|N/mm", m="B3|kg")
    s.g("E10", "=B3*9.81", ML, "m*G0/n", "N", "total-for-per-mount", "whole weight for one mount", m="B3|kg", n="B5|1", also=["mount-count-missing"])
    s.g("E11", "=1/(2*B6)", PT, "1/(2*z)", "1", z="B6|1", note="right against its label", alsoq=[DR])
    s.row("A15", ["Drehzahl [1/min]", "Erregerfrequenz [Hz]", "Abstimmungsverhältnis η = f/f0", "Durchlässigkeit V", "Isoliergrad [%]", "Pegel [dB]", "Relativweg / Fußpunktweg", "Phasenwinkel absolut [°]", "Phase relativ [°]", "Leistung [kW]", "Drehmoment [Nm]"])
    s.col("A16", [420, 600, 900, 1200, 1800, 2400, 3000])
    s.g("B16:B22", "=A16/60", FC, "f", "Hz", f="A|rpm")
    s.g("C16:C22", "=B16/$E$7", FR, "f/fn", "1", f="B|Hz", fn="$E$7|Hz")
    a = s.g("D16:D22", "=SQRT((1+4*$B$6^2*C16^2)/((1-C16^2)^2+4*$B$6^2*C16^2))", TA, "T_(r,z)", "1", r="C|1", z="$B$6|1")
    s.slip(a, "D19", "=SQRT((1+4*$B$6^2*C19^2)/((1-C19^2)^2+4*$B$7^2*C19^2))", "reference-slip", "deflection for damping in the denominator")
    s.g("E16:E22", "=100-D16", IE, "1-T", "%", "none", "T not turned into percent", T="D|1", also=["efficiency-not-of-motion", "percent-as-ratio"])
    s.g("F16:F22", "=20*LOG10(D16)", DB, "20*log10(T)", "dB", T="D|1")
    s.g("G16:G22", "=SQRT((1+(2*$B$6*C16)^2)/((1-C16^2)^2+(2*$B$6*C16)^2))", TR, "R_(r,z)", "1", "absolute-used-for-relative", "Durchlässigkeit repeated under a relative heading", r="C|1", z="$B$6|1")
    s.g("H16:H22", "=DEGREES(ATAN2(1-C16^2+(2*$B$6*C16)^2,2*$B$6*C16^3))", PA, "phase(r,z)", "deg", r="C|1", z="$B$6|1")
    s.g("I16:I22", "=180/PI()*ATAN2(1-C16^2,2*$B$6*C16)", PR, "relphase(r,z)", "deg", r="C|1", z="$B$6|1")
    s.col("J16", [4, 7, 13, 20, 31, 38, 45])
    s.other("K16:K22", "=J16*9550/A16")
    return b


def pompes():
    b = Book("pompes_surpresseur", "French, units after a comma, percent damping, tonnes", inline=True)
    s = b.sheet("Données")
    s.put("A1", "Station de surpression - plots élastiques")
    s.col("A3", ["Taux d'amortissement, %", "Accélération de la pesanteur, m/s²", "Nombre d'aubes", "Plots par groupe"])
    s.col("B3", [6, 9.81, 7, 4])
    c = b.sheet("Calcul")
    c.row("A2", ["Groupe", "Masse, t", "Vitesse, tr/min", "Raideur d'un plot, kN/m", "Raideur totale, kN/m", "Charge par plot, kN", "Flèche statique, mm", "Pulsation propre, rad/s", "Fréquence propre, Hz", "Fréquence d'excitation, Hz",
                 "Passage des aubes, Hz", "Rapport de fréquences", "Taux de transmission", "Taux de transmission aux aubes", "Efficacité, %", "Amortissement critique, kN·s/m", "Amortissement, kN·s/m", "Débit, m³/h", "Coût, €"])
    m = [0.62, 0.85, 1.1, 1.45, 2.05, 2.6]
    c.col("A3", [f"P{i}" for i in range(1, 7)])
    c.col("B3", m)
    c.col("C3", [1450, 1450, 980, 980, 735, 735])
    c.col("D3", [180, 240, 190, 250, 210, 260])
    c.col("R3", [42, 60, 95, 130, 210, 280])
    z, n = "Données!$B$3|%", "Données!$B$6|1"
    c.g("E3:E8", "=D3*Données!$B$6", MK, "k*n", "kN/m", k="D|kN/m", n=n)
    c.g("F3:F8", "=B3*Données!$B$4/Données!$B$6", ML, "m*G0/n", "kN", m="B|t", n=n)
    c.g("G3:G8", "=F3/D3*1000", SD, "w/k", "mm", w="F|kN", k="D|kN/m")
    c.g("H3:H8", "=SQRT(E3/B3)", NF, "sqrt(K/m)/2/pi", "rad/s", K="E|kN/m", m="B|t", note="kN/m over tonnes is coherent")
    c.g("I3:I8", "=H3", NF, "w", "Hz", "angular-cyclic-mixup", "rad/s under a Hz heading", w="H|rad/s", alsoq=[FC])
    c.g("J3:J8", "=C3/60", FC, "f", "Hz", f="C|rpm")
    c.g("K3:K8", "=C3*Données!$B$5", FC, "f*nb", "Hz", "speed-unit", "60 missing", f="C|rpm", nb="Données!$B$5|1")
    c.g("L3:L8", "=J3/(H3/(2*PI()))", FR, "f/fn", "1", f="J|Hz", fn="H|rad/s")
    c.g("M3:M8", "=SQRT((1+(2*Données!$B$3*L3)^2)/((1-L3^2)^2+(2*Données!$B$3*L3)^2))", TA, "T_(r,z)", "1", "percent-as-ratio", "6 for 6 %", r="L|1", z=z)
    c.g("N3:N8", "=SQRT((1+(2*Données!$B$3/100*L3*Données!$B$5)^2)/((1-(L3*Données!$B$5)^2)^2+(2*Données!$B$3/100*L3*Données!$B$5)^2))", TA, "T_(r*nb,z)", "1", r="L|1", nb="Données!$B$5|1", z=z)
    c.g("O3:O8", "=100*(1-N3)", IE, "1-T", "%", T="N|1")
    c.g("P3:P8", "=2*SQRT(E3*B3)", CC, "2*sqrt(K*m)", "kN.s/m", K="E|kN/m", m="B|t")
    c.g("Q3:Q8", "=P3/(Données!$B$3/100)", DC, "cc*z", "kN.s/m", "ratio-inverted", "divided by the ratio", cc="P|kN.s/m", z=z, also=[])
    c.other("S3:S8", "=1200+R3*14.5")
    c.other("S9", "=SUM(S3:S8)")
    return b


def compressors_table():
    b = Book("compressor_house_table", "Excel table with structured references, names for constants")
    s = b.sheet("Machines")
    p = b.sheet("Constants")
    p.col("A1", ["g (m/s²)", "Loss factor of the rubber", "Dynamic / static stiffness"])
    p.col("B1", [9.80665, 0.16, 1.35])
    b.define("grav", "Constants!$B$1")
    b.define("eta_rubber", "Constants!$B$2")
    b.define("dyn_ratio", "Constants!$B$3")
    heads = ["Machine", "Mass (kg)", "Mounts", "Speed (rpm)", "k static (N/mm)", "Load per mount (N)", "Sag (mm)", "k dynamic (N/mm)", "fn (Hz)", "fn check (Hz)", "r", "zeta", "TR", "Isolation (%)", "TR hysteretic", "Lubricant (l)", "Lubricant cost"]
    s.row("A3", heads)
    rows = [("C1", 900, 4, 1480, 310, 18), ("C2", 1250, 4, 1480, 420, 22), ("C3", 2100, 6, 985, 380, 34), ("C4", 2400, 6, 985, 450, 34), ("C5", 760, 4, 2960, 260, 12), ("C6", 3300, 8, 740, 400, 51), ("C7", 1500, 4, 1480, 510, 24)]
    for i, x in enumerate(rows):
        s.row(f"A{4+i}", x[:5])
        s.put(f"P{4+i}", x[5])
    s.table("Comp", "A3:Q10")
    t = lambda x: f"Comp[[#This Row],[{x}]]"
    R = "4:{0}10"
    rg = lambda c: f"{c}4:{c}10"
    s.g(rg("F"), f"={t('Mass (kg)')}*grav/{t('Mounts')}", ML, "m*G0/n", "N", m="B|kg", n="C|1")
    s.g(rg("G"), f"={t('Load per mount (N)')}/{t('k static (N/mm)')}", SD, "w/k", "mm", w="F|N", k="E|N/mm")
    s.g(rg("H"), f"={t('k static (N/mm)')}*dyn_ratio", MK, "k*u", "N/mm", k="E|N/mm", u="Constants!$B$3|1")
    s.g(rg("I"), f"=SQRT({t('k dynamic (N/mm)')}*1000*{t('Mounts')}/{t('Mass (kg)')})/(2*PI())", NF, "sqrt(k*n/m)/2/pi", "Hz", k="H|N/mm", n="C|1", m="B|kg")
    a = s.g(rg("J"), f"=15.76*SQRT(dyn_ratio/{t('Sag (mm)')})", NF, "sqrt(G0*u/d)/2/pi", "Hz", d="G|mm", u="Constants!$B$3|1")
    s.slip(a, "J8", f"=15.67*SQRT(dyn_ratio/{t('Sag (mm)')})", "constant-wrong", "digits swapped in one row")
    s.g(rg("K"), f"={t('Speed (rpm)')}/{t('fn (Hz)')}", FR, "f/fn", "1", "speed-unit", "rpm over Hz", f="D|rpm", fn="I|Hz")
    s.g(rg("L"), "=eta_rubber", DR, "eta/2", "1", "loss-factor-as-damping-ratio", "η passed on as ζ", eta="Constants!$B$2|1")
    s.g(rg("M"), f"=SQRT((1+(2*{t('zeta')}*{t('r')})^2)/((1-{t('r')}^2)^2+(2*{t('zeta')}*{t('r')})^2))", TA, "T_(r,z)", "1", r="K|1", z="L|1")
    s.g(rg("N"), f"=100*(1-{t('TR')})", IE, "1-T", "%", T="M|1")
    s.g(rg("O"), f"=SQRT((1+eta_rubber^2)/((1-({t('Speed (rpm)')}/60/{t('fn (Hz)')})^2)^2+eta_rubber^2))", TA, "Th(f/fn,eta)", "1", f="D|rpm", fn="I|Hz", eta="Constants!$B$2|1")
    s.other(rg("Q"), f"={t('Lubricant (l)')}*11.4")
    s.put("A12", "Heaviest load on one mount (N)")
    s.other("F12", "=MAX(Comp[Load per mount (N)])")
    return b


def transposed_cooling():
    b = Book("cooling_tower_cases", "transposed: one case per column, quantities as rows, units in column B", shared=True)
    s = b.sheet("Cases")
    s.put("A1", "Cooling tower cell 4 - isolator cases")
    s.row("A3", ["Case", "", "A", "B", "C", "D", "E", "F"])
    lab = [("Total weight", "kN", [62, 62, 62, 78, 78, 78]), ("Number of springs", "", [6, 8, 8, 8, 10, 10]), ("Spring constant (one)", "N/mm", [240, 180, 140, 220, 160, 120]), ("Fan speed, high", "rpm", [410] * 3 + [365] * 3),
           ("Fan speed, low", "rpm", [300] * 3 + [275] * 3), ("Damping", "% critical", [2, 2, 5, 2, 5, 5])]
    for i, (a, u, v) in enumerate(lab):
        s.row(f"A{4+i}", [a, u] + v)
    more = [("Load on one spring", "kN"), ("Static deflection", "mm"), ("Total spring constant", "kN/mm"), ("Moving mass", "kg"), ("Natural frequency", "Hz"), ("High speed", "Hz"), ("Low speed", "Hz"), ("r high", ""), ("r low", ""),
            ("T high", ""), ("T low", ""), ("Isolation high", "%"), ("T high", "dB"), ("T at resonance", ""), ("Damper c, total", "N·s/m"), ("Rent of crane", "EUR"), ("Water hold-up", "m³")]
    for i, (a, u) in enumerate(more):
        s.row(f"A{11+i}", [a, u])
    rg = lambda r: f"C{r}:H{r}"
    s.g(rg(11), "=C4/C5", ML, "W/n", "kN", W="4|kN", n="5|1")
    a = s.g(rg(12), "=C11*1000/C6", SD, "w/k", "mm", w="11|kN", k="6|N/mm")
    s.slip(a, "F12", "=F11*1000/E6", "reference-slip", "spring of the case to the left")
    s.g(rg(13), "=C6*C5/1000", MK, "k*n", "kN/mm", k="6|N/mm", n="5|1")
    s.g(rg(14), "=C4*1000", HE, "W/G0", "kg", "mass-weight-mixup", "newtons called kilograms", W="4|kN", alsoq=[ML])
    s.g(rg(15), "=SQRT(9.81*1000/C12)/(2*PI())", NF, "sqrt(G0/d)/2/pi", "Hz", d="12|mm")
    s.g(rg(16), "=C7/60", FC, "f", "Hz", f="7|rpm")
    a = s.g(rg(17), "=C8/60", FC, "f", "Hz", f="8|rpm")
    s.slip(a, "E17", 4.8, "value-typed-over", "typed number, 5.0 by formula")
    s.g(rg(18), "=C16/C15", FR, "f/fn", "1", f="16|Hz", fn="15|Hz")
    s.g(rg(19), "=C15/C17", FR, "f/fn", "1", "ratio-inverted", "fn over f", f="17|Hz", fn="15|Hz")
    s.g(rg(20), "=SQRT(1+(2*C9/100*C18)^2)/SQRT((1-C18^2)^2+(2*C9/100*C18)^2)", TA, "T_(r,z)", "1", r="18|1", z="9|%")
    s.g(rg(21), "=SQRT(1+(2*C9/100*C17/C15)^2)/SQRT((1-C17/C15^2)^2+(2*C9/100*C17/C15)^2)", TA, "T_(f/fn,z)", "1", "sign-precedence", "brackets lost: f/fn^2", f="17|Hz", fn="15|Hz", z="9|%", also=["ratio-not-squared"])
    s.g(rg(22), "=(1-C20)*100", IE, "1-T", "%", T="20|1")
    s.g(rg(23), "=20*LOG10(1/ABS(1-C18^2))", DB, "20*log10(T_(r,z))", "dB", "undamped-form", "damping dropped", r="18|1", z="9|%")
    s.g(rg(24), "=SQRT(1+1/(2*C9/100)^2)", PT, "sqrt(1+1/(2*z)**2)", "1", z="9|%")
    s.g(rg(25), "=2*C9/100*SQRT(C13*1000000*C4*1000/9.81)", DC, "2*z*sqrt(K*W/G0)", "N.s/m", z="9|%", K="13|kN/mm", W="4|kN")
    s.other(rg(26), "=1800+C4*12")
    s.other(rg(27), "=C4/9.81*0.4")
    return b


def rubber_pads():
    b = Book("rubber_pad_bearings", "pads by geometry: shape factor, compression and shear, dynamic stiffness, N and mm")
    s = b.sheet("Pads")
    s.put("A1", "Laminated rubber pads under a paper store - one pad per row")
    s.row("A2", ["G (N/mm²)", 0.9, "E0 (N/mm²)", 3.0, "k' factor", 0.75, "dynamic factor", 1.45, "loss factor", 0.2])
    s.row("A4", ["Pad", "Length (mm)", "Width (mm)", "Thickness (mm)", "Load (kN)", "Area (mm²)", "Shape factor", "Ec (N/mm²)", "Compression stiffness kc (kN/mm)", "Shear stiffness ks (kN/mm)", "Static deflection (mm)", "Dynamic stiffness (kN/mm)",
                 "Vertical fn, dynamic (Hz)", "Vertical fn with dynamic stiffness, from deflection (Hz)", "Horizontal fn, static (Hz)", "Damping ratio", "T at 25 Hz, hysteretic", "Two pads stacked (kN/mm)", "Mean pressure (N/mm²)"])
    for i, x in enumerate([(150, 100, 25, 9), (150, 150, 25, 15), (200, 150, 30, 21), (200, 200, 30, 30), (250, 200, 40, 36), (250, 250, 40, 48)]):
        s.row(f"A{5+i}", [f"L{i+1}", *x])
    rg = lambda c: f"{c}5:{c}10"
    s.other(rg("F"), "=B5*C5")
    s.other(rg("G"), "=B5*C5/(2*D5*(B5+C5))")
    s.other(rg("H"), "=$D$2*(1+2*$F$2*G5^2)")
    s.g(rg("I"), "=H5*F5/D5/1000", MK, "E*a/t", "kN/mm", E="H|N/mm2", a="F|mm2", t="D|mm")
    s.g(rg("J"), "=$B$2*F5/D5", MK, "G*a/t", "kN/mm", "length-unit", "N/mm under a kN/mm heading", G="$B$2|N/mm2", a="F|mm2", t="D|mm")
    s.g(rg("K"), "=E5/I5", SD, "w/k", "mm", w="E|kN", k="I|kN/mm")
    s.g(rg("L"), "=I5*$H$2", MK, "k*u", "kN/mm", k="I|kN/mm", u="$H$2|1")
    a = s.g(rg("M"), "=SQRT(L5*10^6/(E5*1000/9.81))/2/PI()", NF, "sqrt(k*G0/w)/2/pi", "Hz", k="L|kN/mm", w="E|kN")
    s.slip(a, "M7", "=SQRT(I7*10^6/(E7*1000/9.81))/2/PI()", "fill-break", "static stiffness in one row", also=("static-stiffness-for-dynamic", "reference-slip"))
    s.g(rg("N"), "=15.76/SQRT(K5)", NF, "sqrt(G0*u/d)/2/pi", "Hz", "static-stiffness-for-dynamic", "static sag under a dynamic heading", d="K|mm", u="$H$2|1")
    s.g(rg("O"), "=SQRT($B$2*F5/D5*1000/(E5*1000/9.81))/(2*PI())", NF, "sqrt(G*a/t*G0/w)/2/pi", "Hz", G="$B$2|N/mm2", a="F|mm2", t="D|mm", w="E|kN")
    s.g(rg("P"), "=$J$2/2", DR, "eta/2", "1", eta="$J$2|1")
    a = s.g(rg("Q"), "=SQRT((1+$J$2^2)/((1-(25/M5)^2)^2+$J$2^2))", TA, "Th(25/fn,eta)", "1", fn="M|Hz", eta="$J$2|1")
    s.slip(a, "Q8", "=SQRT((1+$J$2^2)/((1-(25/M7)^2)^2+$J$2^2))", "reference-slip", "natural frequency of the row above")
    s.g(rg("R"), "=2*I5", MK, "k/2", "kN/mm", "none", "series taken as parallel", k="I|kN/mm")
    s.other(rg("S"), "=E5*1000/F5")
    return b


def press_foundation():
    b = Book("forging_press_foundation", "cross-sheet inputs, tonnes and MN/m, damper constants, labels to the right")
    i = b.sheet("Input")
    i.grid("A1", [[None, "FORGING PRESS 8 - SPRING FOUNDATION"], [None, None], [46, "t  mass of press"], [118, "t  mass of concrete block"], [24, "spring units"], [3.2, "kN/mm per spring unit (vertical)"], [8, "viscous dampers"],
                   [65, "kN·s/m per damper"], [70, "strokes per minute"], [11, "mm/s ground velocity near the hammer shop, peak"], [9, "Hz ground vibration"], [4, "m pit depth"]])
    c = b.sheet("Check")
    c.put("B1", "Vertical direction")
    c.col("B2", ["t  total mass", "MN/m  total stiffness", "rad/s  circular natural frequency", "Hz  natural frequency", "Hz  natural frequency from g/deflection", "mm  static deflection", "kN  load per spring unit",
                 "kN·s/m  total damping", "kN·s/m  critical damping", "-  damping ratio", "Hz  damped natural frequency", "Hz  stroke frequency", "-  frequency ratio for ground vibration", "-  transmissibility, ground to block",
                 "mm/s  block velocity, peak", "mm  ground displacement, peak", "mm  spring deflection, peak (relative)", "mm/s²  ground acceleration, peak", "mm/s  ground velocity, rms", "kN  dynamic force, springs and dampers together", "m³ concrete", "t  steel"])
    c.g("A2", "=Input!A3+Input!A4", HE, "m1+m2", "t", m1="Input!A3|t", m2="Input!A4|t", alsoq=[ML])
    c.g("A3", "=Input!A5*Input!A6", MK, "n*k", "MN/m", n="Input!A5|1", k="Input!A6|kN/mm")
    c.g("A4", "=SQRT(A3*1000/A2)", NF, "sqrt(K/m)/2/pi", "rad/s", K="A3|MN/m", m="A2|t")
    c.g("A5", "=SQRT(A3/A2)/(2*PI())", NF, "sqrt(K/m)/2/pi", "Hz", "length-unit", "MN/m over tonnes needs a thousand", K="A3|MN/m", m="A2|t", also=["mass-weight-mixup"])
    c.g("A6", "=SQRT(9.81/(A7/1000))/(2*PI())", NF, "sqrt(G0/d)/2/pi", "Hz", d="A7|mm")
    c.g("A7", "=A2*9.81/A3", SD, "m*G0/K", "mm", m="A2|t", K="A3|MN/m")
    c.g("A8", "=A2*9.81/Input!A7", ML, "m*G0/n", "kN", "reference-slip", "number of dampers for number of springs", m="A2|t", n="Input!A5|1")
    c.g("A9", "=Input!A7*Input!A8", DC, "nd*c", "kN.s/m", nd="Input!A7|1", c="Input!A8|kN.s/m")
    c.g("A10", "=2*SQRT(A3*1000*A2)", CC, "2*sqrt(K*m)", "kN.s/m", K="A3|MN/m", m="A2|t")
    c.g("A11", "=A10/A9", DR, "c/cc", "1", "ratio-inverted", "cc over c", c="A9|kN.s/m", cc="A10|kN.s/m")
    c.g("A12", "=A6*SQRT(1-(A9/A10)^2)", NF, "fn*sqrt(1-(c/cc)**2)", "Hz", fn="A6|Hz", c="A9|kN.s/m", cc="A10|kN.s/m")
    c.g("A13", "=Input!A9/60", FC, "f", "Hz", f="Input!A9|cpm")
    c.g("A14", "=Input!A11/A6", FR, "f/fn", "1", f="Input!A11|Hz", fn="A6|Hz")
    c.g("A15", "=SQRT((1+(2*A9/A10*A14)^2)/((1-A14^2)^2+(2*A9/A10*A14)^2))", TA, "T_(r,c/cc)", "1", r="A14|1", c="A9|kN.s/m", cc="A10|kN.s/m")
    c.g("A16", "=A15*Input!A10", PM, "T*V", "mm/s", T="A15|1", V="Input!A10|mm/s")
    c.g("A17", "=Input!A10/(2*PI()*Input!A11)", MC, "V/(2*pi*f)", "mm", V="Input!A10|mm/s", f="Input!A11|Hz")
    c.g("A18", "=A17*A15", RD, "Y*R_(r,c/cc)", "mm", "absolute-used-for-relative", "T for the relative motion", Y="A17|mm", r="A14|1", c="A9|kN.s/m", cc="A10|kN.s/m")
    c.g("A19", "=Input!A10*Input!A11", MC, "V*2*pi*f", "mm/s2", "angular-cyclic-mixup", "2π missing", V="Input!A10|mm/s", f="Input!A11|Hz")
    c.g("A20", "=Input!A10*SQRT(2)", MC, "V/sqrt(2)", "mm/s", "amplitude-kind", "multiplied by root two", V="Input!A10|mm/s")
    c.g("A21", "=(A3*1000+A9*2*PI()*Input!A11)*A18/1000", MF, "hypot(K,c*2*pi*f)*z", "kN", "none", "spring and damper added arithmetically", K="A3|MN/m", c="A9|kN.s/m", f="Input!A11|Hz", z="A18|mm", also=["square-root-missing", "damping-not-squared"])
    c.other("A22", "=Input!A4/2.4")
    c.other("A23", "=0.12*A22")
    return b


def cold_store():
    b = Book("cold_store_evaporators", "three sheets, defined names with Greek-like words, helpers and heirs")
    d = b.sheet("Site")
    d.grid("A1", [["Cold store 2", None], ["zeta", 0.07], ["Mount stiffness kN/m", 46], ["Mounts per unit", 4], ["Supply frequency Hz", 50], ["Electricity price", 0.21]])
    b.define("zeta", "Site!$B$2")
    b.define("k_mount", "Site!$B$3")
    b.define("n_mount", "Site!$B$4")
    s = b.sheet("Units")
    s.row("A1", ["Unit", "Mass kg", "Fan rpm", "Motor kW", "fn Hz", "r", "r²", "1-r²", "(2ζr)²", "T", "Efficiency %", "Running h/a", "Energy cost"])
    s.grid("A2", [["E1", 210, 1340, 1.5, ], ["E2", 255, 1340, 2.2], ["E3", 255, 900, 1.1], ["E4", 330, 900, 1.5], ["E5", 330, 1340, 3.0]])
    rg = lambda c: f"{c}2:{c}6"
    s.col("L2", [6000, 6000, 7500, 7500, 4200])
    s.g(rg("E"), "=SQRT(k_mount*1000*n_mount/B2)/(2*PI())", NF, "sqrt(k*n/m)/2/pi", "Hz", k="Site!$B$3|kN/m", n="Site!$B$4|1", m="B|kg")
    s.g(rg("F"), "=C2/60/E2", FR, "f/fn", "1", f="C|rpm", fn="E|Hz")
    s.g(rg("G"), "=F2^2", HE, "r*r", "1", r="F|1")
    s.g(rg("H"), "=1-G2", HE, "1-r*r", "1", r="F|1")
    h = s.g(rg("I"), "=2*zeta*F2", HE, "(2*z*r)**2", "1", "damping-not-squared", "square left out", z="Site!$B$2|1", r="F|1")
    s.g(rg("J"), "=SQRT((1+I2)/(H2^2+I2))", TA, "T_(r,z)", "1", r="F|1", z="Site!$B$2|1", inh=[h], note="fed by the unsquared term")
    s.g(rg("K"), "=100*(1-J2)", IE, "1-T", "%", T="J|1")
    s.other(rg("M"), "=D2*L2*Site!$B$6")
    q = b.sheet("Summary")
    q.row("A1", ["Unit", "Worst T, undamped estimate", "T dB", "Damped fn (Hz)", "Sag mm", "Load N/mount", "c per mount (N·s/m)"])
    q.col("A2", ["E1", "E2", "E3", "E4", "E5"])
    q.g(rg("B"), "=1/Units!H2", TA, "Tu(r)", "1", "absolute-value-missing", "negative above resonance", r="Units!F|1")
    q.g(rg("C"), "=20*LOG(Units!J2)", DB, "20*log10(T)", "dB", T="Units!J|1")
    q.g(rg("D"), "=Units!E2*SQRT(1-zeta^2)", NF, "fn*sqrt(1-z*z)", "Hz", fn="Units!E|Hz", z="Site!$B$2|1", tol=1e-6)
    q.g(rg("E"), "=Units!B2*9.81/k_mount", SD, "m*G0/n/k", "mm", "mount-count-missing", "n left out", m="Units!B|kg", n="Site!$B$4|1", k="Site!$B$3|kN/m", also=["total-for-per-mount"])
    q.g(rg("F"), "=Units!B2/n_mount", ML, "m*G0/n", "N", "mass-weight-mixup", "kilograms under a newton heading", m="Units!B|kg", n="Site!$B$4|1")
    q.g(rg("G"), "=2*zeta*SQRT(k_mount*1000*Units!B2/n_mount)", DC, "2*z*sqrt(k*m/n)", "N.s/m", z="Site!$B$2|1", k="Site!$B$3|kN/m", m="Units!B|kg", n="Site!$B$4|1")
    return b


def laundry():
    b = Book("laundry_extractors", "sheet names with blanks, units in number formats only, look-ups, unit switch by IF, IFERROR, labels right of values")
    d = b.sheet("Input data")
    d.put("A1", "Hospital laundry, washer-extractors on the second floor")
    d.grid("A3", [[640, "machine"], [160, "wet linen"], [6, "springs"], [735, "spin speed"], [0.04, "damping ratio"], [62, "type of spring"], [9.80665, "gravity"], [45000, "date of visit"]])
    for r, f in ((3, '0" kg"'), (4, '0" kg"'), (5, '0" pcs"'), (6, '0" rpm"'), (9, '0.000" m/s²"'), (10, "yyyy-mm-dd")):
        d.style(f"A{r}", f)
    d.row("E2", ["Type", "Rate N/mm", "Rated load N", "Price"])
    d.grid("E3", [[58, 22, 900, 31], [62, 36, 1400, 35], [66, 58, 2100, 39], [70, 90, 3200, 46]])
    s = b.sheet("Pass 2")
    s.put("A1", "Results (value, what it is)")
    I = "'Input data'!"
    lab = ["spring rate from the list", "total mass", "load per spring", "total spring rate", "sag under load", "natural frequency", "natural frequency, from sag", "spin frequency", "frequency ratio", "transmissibility with damping", "transmissibility without damping", "isolation", "damping coefficient, all springs", "force ratio in decibels",
           "transmissibility, guarded", "relative transmissibility", "sag used of the free travel", "springs, price", "highest natural frequency for 95 % isolation (undamped)", "spring rate for that, per spring", "largest transmissibility while spinning up", "phase behind the floor"]
    s.col("B3", lab)
    fm = ['0.0" N/mm"', '0" kg"', '0" N"', '0" N/mm"', '0.0" mm"', '0.00" Hz"', '0.00" Hz"', '0.00" Hz"', "0.00", "0.000", "0.000", "0.0%", '0" N·s/m"', '0.0" dB"', "0.000", "0.000", "0%", '0" EUR"', '0.00" Hz"', '0.0" N/mm"', "0.00", '0.0"°"']
    for i, f in enumerate(fm):
        s.style(f"A{3+i}", f)
    s.other("A3", f"=VLOOKUP({I}A8,{I}E3:H6,2,FALSE)")
    m, n = dict(m1=f"{I}A3|kg", m2=f"{I}A4|kg"), dict(n=f"{I}A5|1")
    z = dict(r="A11|1", z=f"{I}A7|1")
    s.g("A4", f"={I}A3+{I}A4", HE, "m1+m2", "kg", **m, alsoq=[ML])
    s.g("A5", f"=A4*{I}A9/{I}A5", ML, "m*G0/n", "N", m="A4|kg", **n)
    s.g("A6", f"=A3*{I}A5", MK, "k*n", "N/mm", k="A3|N/mm", **n)
    s.g("A7", f"=A4*{I}A9/A6", SD, "m*G0/K", "mm", m="A4|kg", K="A6|N/mm")
    s.g("A8", "=SQRT(A6*1000/A4)/(2*PI())", NF, "sqrt(K/m)/2/pi", "Hz", m="A4|kg", K="A6|N/mm")
    s.g("A9", f"=SQRT({I}A9/A7)/(2*PI())", NF, "sqrt(G0/d)/2/pi", "Hz", "length-unit", "mm taken as m", d="A7|mm")
    s.g("A10", f"=IF({I}A6>200,{I}A6/60,{I}A6)", FC, "f", "Hz", f=f"{I}A6|rpm", note="speeds below 200 are taken as Hz")
    s.g("A11", "=IFERROR(A10/A8,0)", FR, "f/fn", "1", f="A10|Hz", fn="A8|Hz")
    s.g("A12", f"=SQRT(1+(2*{I}A7*A11)^2)/SQRT((1-A11^2)^2+(2*{I}A7*A11)^2)", TA, "T_(r,z)", "1", **z)
    s.g("A13", "=ABS(1/(-A11^2+1))", TA, "Tu(r)", "1", "sign-precedence", "a spreadsheet reads -x^2 as (-x)^2", r="A11|1")
    s.g("A14", "=1-A12", IE, "1-T", "1", T="A12|1", note="cell formatted as percent")
    s.g("A15", f"=2*{I}A7*SQRT(A6*1000*A4*{I}A9)", DC, "2*z*sqrt(K*m)", "N.s/m", "mass-weight-mixup", "weight for mass", z=f"{I}A7|1", m="A4|kg", K="A6|N/mm")
    s.g("A16", "=20*LN(A12)/LN(10)", DB, "20*log10(T)", "dB", T="A12|1")
    s.g("A17", f"=MIN(99,1/SQRT(MAX(0.000001,(1-A11^2)^2+(2*{I}A7*A11)^2)))", TA, "T_(r,z)", "1", "numerator-damping-missing", "magnification of a driven mass", **z)
    s.g("A18", f"=1/SQRT((1-A11^2)^2+(2*{I}A7*A11)^2)", TR, "R_(r,z)", "1", "none", "r² left out of the numerator", **z, also=["numerator-damping-missing", "ratio-not-squared"])
    s.other("A19", "=A7/60")
    s.other("A20", f"={I}A5*VLOOKUP({I}A8,{I}E3:H6,4,FALSE)")
    s.g("A21", "=A10/SQRT(1+1/0.05)", RNF, "f/sqrt(1+1/0.05)", "Hz", f="A10|Hz")
    s.g("A22", f"=A4*A21^2/{I}A5/1000", RK, "m*(2*pi*fn)**2/n", "N/mm", "angular-cyclic-mixup", "2π left out", m="A4|kg", fn="A21|Hz", **n, alsoq=[MK])
    s.g("A23", f"=SQRT(1+1/(2*{I}A7)^2)", PT, "sqrt(1+1/(2*z)**2)", "1", z=f"{I}A7|1")
    s.g("A24", f"=DEGREES(ATAN2(1-A11^2+(2*{I}A7*A11)^2,2*{I}A7*A11^3))", PA, "phase(r,z)", "deg", **z)
    return b


BOOKS = [laundry, rooftop_fans, chiller_calc, pruefstand, pompes, compressors_table, transposed_cooling, rubber_pads, press_foundation, cold_store]
