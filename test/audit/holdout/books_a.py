"""Building services: a French consultant, an Ohio contractor, a table, defined names."""
from math import sqrt

from sheet import Book


def lyon():
    b = Book("lyon_toiture_pac", "French roof plant schedule, one row per machine, damping in percent, comma units")
    s = b.sheet("Plots")
    s["A1"] = "Affaire : résidence Les Tanneurs - désolidarisation des équipements en toiture"
    s["A2"] = "Ind. B - gravité 9,81 m/s²"
    s.merged.append("A1:H1")
    s.across("A4", "Repère", "Équipement", "Vitesse de rotation, tr/min", "Masse en service, kg", "Nb de plots", "Raideur d'un plot, N/mm", "Taux d'amortissement, %",
             "Fréquence excitatrice, Hz", "Charge par plot, daN", "Flèche statique, mm", "Fréquence propre, Hz", "Fréquence propre (contrôle k/m), Hz", "Raideur totale, N/mm",
             "Rapport f/f0", "Transmissibilité", "Transmissibilité (ancien calcul 2009)", "Taux d'isolation, %", "Atténuation, dB", "Flèche mini pour 90 % (non amorti), mm", "Prix HT plots, €")
    s.grid("A5", ["PAC1", "Pompe à chaleur", 1450, 820, 6, 42, 5], ["PAC2", "Pompe à chaleur", 1450, 640, 4, 42, 5], ["VE1", "Extracteur", 980, 310, 4, 12.5, 4],
           ["VE2", "Extracteur", 1120, 265, 4, 12.5, 4], ["CTA1", "Centrale", 890, 1240, 8, 26, 6], ["GF1", "Groupe froid", 1480, 2150, 8, 85, 5],
           ["GF2", "Groupe froid", 2960, 1720, 6, 85, 5], ["POM1", "Pompe", 1455, 145, 4, 18, 8], ["POM2", "Pompe", 2900, 96, 4, 18, 8])
    R = "5:{}13"
    c = lambda x: f"{x}5:{x}13"
    s.f(c("H"), "=C5/60", "frequency-conversion", out="Hz", f=c("C") + "|rpm")
    g = s.f(c("I"), "=D5*9.81/E5/10", "mount-load", out="daN", m=c("D") + "|kg", n=c("E") + "|1")
    g.over("I10", "=D10*9.81/$E$9/10+60", "fill-break", note="row patched by hand: another row's count and 60 added", alsoM=["reference-slip"], noerr=False)
    s.f(c("J"), "=I5*10/F5", "static-deflection", out="mm", W=c("I") + "|daN", k=c("F") + "|N/mm")
    s.f(c("K"), "=15.76/SQRT(J5)", "natural-frequency", out="Hz", d=c("J") + "|mm")
    s.f(c("L"), "=SQRT(F5*1000*E5/D5)/(2*PI())", "natural-frequency", out="Hz", k=c("F") + "|N/mm", n=c("E") + "|1", m=c("D") + "|kg")
    s.f(c("M"), "=F5", "mount-stiffness", "mount-count-missing", out="N/mm", k=c("F") + "|N/mm", n=c("E") + "|1", alsoM=["total-for-per-mount"], note="total headed, one mount's given")
    s.f(c("N"), "=H5/K5", "frequency-ratio", f=c("H") + "|Hz", fn=c("K") + "|Hz")
    g = s.f(c("O"), "=SQRT((1+(2*G5/100*N5)^2)/((1-N5^2)^2+(2*G5/100*N5)^2))", "absolute-transmissibility", r=c("N") + "|1", z=c("G") + "|%")
    g.over("O9", "=SQRT((1+(2*G9/100*N8)^2)/((1-N8^2)^2+(2*G9/100*N8)^2))", "reference-slip", note="ratio of the row above", alsoM=["fill-break"])
    s.f(c("P"), "=SQRT((1+(2*G5*N5)^2)/((1-N5^2)^2+(2*G5*N5)^2))", "absolute-transmissibility", "percent-as-ratio", r=c("N") + "|1", z=c("G") + "|%")
    g = s.f(c("Q"), "=(1-O5)*100", "isolation-efficiency", out="%", T=c("O") + "|1")
    g.over("Q11", 98.5, "value-typed-over")
    s.f(c("R"), "=10*LOG10(O5)", "transmissibility-db", "decibel-factor", out="dB", T=c("O") + "|1")
    s.f(c("S"), "=(15.76/H5)^2*(1+1/0.1)", "required-static-deflection", out="mm", f=c("H") + "|Hz", E="0.9|1")
    s.ignore(c("T"), "=E5*38.5*1.12")
    s["S15"] = "Total"
    s.ignore("T15", "=SUM(T5:T13)")
    s["A17"] = "Surface chape flottante, m²"
    s.ignore("D17", "=6.4*12.2")
    s["A18"] = "Débit total CTA, m³/h"
    s.ignore("D18", "=0.8*0.6*4.5*3600")
    return b


def ohio():
    b = Book("ohio_penthouse_fans", "Inch-pound spring schedule, rpm against cpm, percent format, no damping", "shared")
    s = b.sheet("VIB SCHED")
    s["A1"] = "VIBRATION ISOLATION SCHEDULE - PENTHOUSE MECH RM"
    s["A2"] = "Springs only, damping ignored"
    s.across("A4", "TAG", "RPM", "OPER WT", "QTY ISOL", "SPRING RATE", "WT / ISOL", "DEFL", "Fn", "Fn", "Fn", "RATIO", "RATIO (Hz)", "TRANS", "TRANS", "EFFIC", "EFFIC", "REQ'D DEFL 95%", "Fn CHECK", "CFM", "TIP SPEED")
    s.across("B5", "rpm", "lb", "ea", "lb/in", "lb", "in", "cpm", "Hz", "Hz", "f/fn", "f/fn", "", "2019 form", "%", "%", "in", "Hz", "", "fpm")
    s.grid("A6", ["AHU-1", 1140, 3850, 6, 640], ["AHU-2", 1080, 4200, 6, 700], ["SF-1", 870, 1925, 4, 480], ["SF-2", 790, 2240, 4, 560], ["EF-1", 1265, 880, 4, 250],
           ["EF-2", 1310, 760, 4, 250], ["EF-3", 960, 1150, 4, 290], ["CH-1", 1770, 9800, 8, 1400], ["CH-2", 1770, 10400, 8, 1400], ["P-1", 1755, 1320, 4, 400], ["P-2", 1755, 1290, 4, 400], ["CT-1", 540, 6900, 6, 450])
    c = lambda x: f"{x}6:{x}17"
    g = s.f(c("F"), "=C6/D6", "mount-load", out="lbf", W=c("C") + "|lbf", n=c("D") + "|1")
    g.over("F13", "=C13", "mount-count-missing", alsoM=["fill-break", "total-for-per-mount"], note="one row keeps the total")
    s.f("G6:G12,G14:G17", None, "static-deflection", out="in", W="F6:F12,F14:F17|lbf", k="E6:E12,E14:E17|lbf/in")
    s.fill(c("G"), "=F6/E6")
    s.f("G13", None, "static-deflection", out="in", W="C13|lbf", k="E13|lbf/in", n="D13|1", inherits="F13", note="right text, fed by the patched load")
    s.f(c("H"), "=188/SQRT(G6)", "natural-frequency", out="cpm", d=c("G") + "|in", tol=3e-3)
    s.f(c("I"), "=H6/60", "natural-frequency", out="Hz", fn=c("H") + "|cpm", alsoQ=["frequency-conversion"])
    s.f(c("J"), "=3.31/SQRT(G6)", "natural-frequency", "constant-wrong", out="Hz", d=c("G") + "|in", note="3.13 with digits swapped")
    s.f(c("K"), "=B6/H6", "frequency-ratio", f=c("B") + "|rpm", fn=c("H") + "|cpm")
    s.f(c("L"), "=B6/I6", "frequency-ratio", "speed-unit", f=c("B") + "|rpm", fn=c("I") + "|Hz")
    s.f(c("M"), "=1/(K6^2-1)", "absolute-transmissibility", r=c("K") + "|1", note="undamped, all rows above resonance")
    s.f(c("N"), "=1/(1-K6^2)", "absolute-transmissibility", "absolute-value-missing", r=c("K") + "|1")
    s.f(c("O"), "=1-M6", "isolation-efficiency", T=c("M") + "|1")
    s.f(c("P"), "=1-1/K6", "isolation-efficiency", "efficiency-not-of-motion", r=c("K") + "|1", note="1 - fn/f called efficiency", alsoM=["ratio-not-squared"])
    s.number("O6:P17", "0.0%")
    s.f(c("Q"), "=(188/B6)^2*(1+1/0.05)", "required-static-deflection", out="in", f=c("B") + "|rpm", E="0.95|1", tol=6e-3)
    s.f(c("R"), "=SQRT(E6*D6/C6)/(2*PI())", "natural-frequency", "mass-weight-mixup", out="Hz", k=c("E") + "|lbf/in", n=c("D") + "|1", W=c("C") + "|lbf", note="386 left out")
    s.down("S6", 12400, 13100, 6200, 7400, 2100, 1850, 2900, 0, 0, 0, 0, 0)
    s.down("U6", 27, 27, 22, 24, 15, 15, 18, 40, 40, 8, 8, 60)
    s["U4"], s["U5"] = "WHEEL DIA", "in"
    s.ignore(c("T"), "=PI()*U6/12*B6")
    s["A19"] = "CH-1 motor power check (hp)"
    s.ignore("E19", "=410*1770/5252")
    s["A20"] = "Total operating weight (lb)"
    s.ignore("E20", "=SUM(C6:C17)")
    s["A21"] = "Unit check CH-1: fn w/ g=386"
    s.f("E21", "=SQRT(E13*D13*386/C13)/(2*PI())", "natural-frequency", out="Hz", k="E13|lbf/in", n="D13|1", W="C13|lbf")
    s["A22"] = "EF-1 total spring rate (lb/in)"
    s.f("E22", "=E10*D10", "mount-stiffness", out="lbf/in", k="E10|lbf/in", n="D10|1")
    s["A23"] = "CT-1 min spring fn for 90% eff. (cpm)"
    s.f("E23", "=B17/SQRT(1+1/0.1)", "required-natural-frequency", out="cpm", f="B17|rpm", E="0.9|1")
    return b


def table():
    b = Book("skid_table_columns", "One table with [@column] references, units in the column names")
    s = b.sheet("Skids")
    heads = ["Skid", "Speed (rpm)", "Mass (kg)", "Mounts", "k static (N/mm)", "Dyn factor", "zeta (-)", "f (Hz)", "k dyn (N/mm)", "fn (Hz)", "fn 2 (Hz)", "r", "T", "T base", "T dB", "Isolation", "Load per mount (N)", "c per mount (Ns/m)", "Price (EUR)"]
    s.across("B3", *heads)
    rows = [["S-01", 1480, 1850, 6, 310, 1.25, 0.05], ["S-02", 1480, 2240, 6, 310, 1.25, 0.05], ["S-03", 990, 960, 4, 95, 1.15, 0.04], ["S-04", 2950, 420, 4, 260, 1.4, 0.08],
            ["S-05", 2950, 515, 4, 260, 1.4, 0.08], ["S-06", 1750, 1330, 8, 180, 1.3, 0.06], ["S-07", 740, 3100, 8, 70, 1.1, 0.03], ["S-08", 1185, 705, 4, 88, 1.15, 0.04]]
    s.grid("B4", *rows)
    s.table = ("Skids", "B3:T11")
    c = lambda x: f"{x}4:{x}11"
    at = lambda h: f"Skids[[#This Row],[{h}]]"
    s["B1"] = "Pump skids - dynamic stiffness factor from mount data sheet; damping is viscous"
    s.f(c("I"), f"={at('Speed (rpm)')}/60", "frequency-conversion", out="Hz", f=c("C") + "|rpm")
    s.f(c("J"), f"={at('k static (N/mm)')}*{at('Dyn factor')}", "mount-stiffness", out="N/mm", k=c("F") + "|N/mm", kappa=c("G") + "|1")
    s.f(c("K"), f"=SQRT({at('k dyn (N/mm)')}*1000*{at('Mounts')}/{at('Mass (kg)')})/2/PI()", "natural-frequency", out="Hz", k=c("J") + "|N/mm", n=c("E") + "|1", m=c("D") + "|kg")
    s.f(c("L"), f"=SQRT({at('k static (N/mm)')}*1000*{at('Mounts')}/{at('Mass (kg)')})/2/PI()", "natural-frequency", "static-stiffness-for-dynamic", out="Hz", k=c("F") + "|N/mm", kappa=c("G") + "|1", n=c("E") + "|1", m=c("D") + "|kg")
    g = s.f(c("M"), f"={at('f (Hz)')}/{at('fn (Hz)')}", "frequency-ratio", f=c("I") + "|Hz", fn=c("K") + "|Hz")
    g.over("M8", 4.9, "value-typed-over")
    s.f(c("N"), f"=SQRT(1+(2*{at('zeta (-)')}*{at('r')})^2)/SQRT((1-{at('r')}^2)^2+(2*{at('zeta (-)')}*{at('r')})^2)", "absolute-transmissibility", r=c("M") + "|1", z=c("H") + "|1")
    s.f(c("O"), f"=1/SQRT((1-{at('r')}^2)^2+(2*{at('zeta (-)')}*{at('r')})^2)", "absolute-transmissibility", "numerator-damping-missing", r=c("M") + "|1", z=c("H") + "|1")
    s.f(c("P"), f"=20*LOG10({at('T')})", "transmissibility-db", out="dB", T=c("N") + "|1")
    s.f(c("Q"), f"=1-{at('T')}^2", "isolation-efficiency", "efficiency-not-of-motion", T=c("N") + "|1", note="energy, not motion")
    s.number(c("Q"), "0.00%")
    g = s.f(c("R"), f"={at('Mass (kg)')}*9.81/{at('Mounts')}", "mount-load", out="N", m=c("D") + "|kg", n=c("E") + "|1")
    g.over("R6", f"={at('Mass (kg)')}*9.18/{at('Mounts')}", "constant-wrong", alsoM=["fill-break"], note="9.18 in one row")
    s.f(c("S"), f"=2*{at('zeta (-)')}*SQRT({at('k dyn (N/mm)')}*1000*{at('Mass (kg)')}/{at('Mounts')})", "damping-coefficient", out="N.s/m", z=c("H") + "|1", k=c("J") + "|N/mm", m=c("D") + "|kg", n=c("E") + "|1",
        model=lambda a: 2 * a.z * sqrt(a.k * a.m / a.n))
    s.ignore(c("T"), f"={at('Mounts')}*64.9")
    s["B13"] = "Average mass (kg)"
    s.ignore("D13", "=AVERAGE(D4:D11)")
    s["B14"] = "Worst T"
    s.ignore("D14", "=MAX(N4:N11)")
    return b


def names():
    b = Book("named_generator_cell", "Calculation sheet of one column, every input a defined name", "inline")
    s = b.sheet("Calc")
    s["A1"] = "Emergency generator - anti-vibration calculation"
    s.grid("A3", ["Generator mass with fuel", 3450, "kg"], ["Number of mounts", 8, "-"], ["Stiffness of one mount, static", 0.62, "kN/mm"], ["Dynamic / static stiffness", 1.2, "-"],
           ["Engine speed", 1500, "rpm"], ["Firing order", 3, "per rev"], ["Damping, % of critical", 4.5, "%"], ["Base plate amplitude, peak", 0.15, "mm"], ["Gravity", 9.80665, "m/s2"])
    for n, r in dict(m_gen=3, n_mnt=4, k_stat=5, k_ratio=6, rpm=7, n_fire=8, zeta_pct=9, X_base=10, g_0=11).items():
        b.names[n] = f"Calc!$B${r}"
    line = iter(range(14, 60))

    def put(label, formula, unit, q, mis=None, nm=None, **kw):
        r = next(line)
        s[f"A{r}"], s[f"C{r}"] = label, unit
        if nm:
            b.names[nm] = f"Calc!$B${r}"
        return s.f(f"B{r}", formula, q, mis, **kw)

    s["A13"] = "RESULTS"
    put("Rotation frequency", "=rpm/60", "Hz", "frequency-conversion", nm="f_rot", out="Hz", f="B7|rpm")
    put("Firing frequency", "=f_rot*n_fire", "Hz", "frequency-conversion", nm="f_fire", out="Hz", f="B14|Hz", teeth="B8|1")
    put("Rotation, angular", "=2*PI()*rpm", "rad/s", "frequency-conversion", "speed-unit", out="rad/s", f="B7|rpm", note="60 left out")
    put("Dynamic stiffness, all mounts", "=k_stat*k_ratio*n_mnt", "kN/mm", "mount-stiffness", nm="k_tot", out="kN/mm", k="B5|kN/mm", kappa="B6|1", n="B4|1")
    put("Natural angular frequency", "=SQRT(k_tot*10^6/m_gen)", "rad/s", "natural-frequency", nm="w_n", out="rad/s", k="B17|kN/mm", m="B3|kg")
    put("Natural frequency", "=w_n/(2*PI())", "Hz", "natural-frequency", nm="f_n", out="Hz", fn="B18|rad/s", alsoQ=["frequency-conversion"])
    put("Natural frequency, static stiffness (old)", "=SQRT(k_stat*n_mnt*1000/m_gen)/(2*PI())", "Hz", "natural-frequency", "length-unit", out="Hz", k="B5|kN/mm", n="B4|1", m="B3|kg", note="kN/mm taken as N/mm", alsoM=["static-stiffness-for-dynamic"])
    put("Critical damping, all mounts", "=2*SQRT(k_tot*1E6*m_gen)", "N.s/m", "critical-damping", nm="c_crit", out="N.s/m", k="B17|kN/mm", m="B3|kg")
    put("Damping coefficient, all mounts", "=zeta_pct/100*c_crit", "N.s/m", "damping-coefficient", nm="c_tot", out="N.s/m", z="B9|%", cc="B21|N.s/m", model=lambda a: a.z * a.cc)
    put("Damping coefficient, one mount", "=zeta_pct*c_crit/n_mnt", "N.s/m", "damping-coefficient", "percent-as-ratio", out="N.s/m", z="B9|%", cc="B21|N.s/m", n="B4|1", model=lambda a: a.z * a.cc / a.n)
    put("Static load per mount", "=m_gen*g_0/n_mnt", "N", "mount-load", nm="F_stat", out="N", m="B3|kg", n="B4|1")
    put("Static sag", "=F_stat/(k_stat*1000)", "mm", "static-deflection", out="mm", W="B24|N", k="B5|kN/mm", model=lambda a: a.W / a.k)
    put("Frequency ratio, firing", "=f_fire/f_n", "-", "frequency-ratio", nm="r_f", f="B15|Hz", fn="B19|Hz")
    put("Transmissibility at firing", "=SQRT((1+(2*zeta_pct/100*r_f)^2)/((1-r_f^2)^2+(2*zeta_pct/100*r_f)^2))", "-", "absolute-transmissibility", nm="T_f", r="B26|1", z="B9|%")
    put("Transmissibility at rotation", "=SQRT((1+(2*zeta_pct/100*f_rot/f_n)^2)/(1-(f_rot/f_n)^2)^2+(2*zeta_pct/100*f_rot/f_n)^2)", "-", "absolute-transmissibility", "sign-precedence", nm="T_rot", f="B14|Hz", fn="B19|Hz", z="B9|%", note="bracket of the denominator lost")
    put("Generator motion at firing, peak", "=T_f*X_base", "mm", "payload-motion", out="mm", T="B27|1", X="B10|mm")
    put("Relative motion in mount at firing, peak", "=X_base*r_f^2/SQRT((1-r_f^2)^2+(2*zeta_pct/100*r_f)^2)", "mm", "relative-displacement", nm="Z_f", out="mm", X="B10|mm", r="B26|1", z="B9|%")
    put("Force in one mount at firing, spring and damper", "=Z_f/1000*SQRT((k_tot*1E6)^2+(2*PI()*f_fire*c_tot)^2)/n_mnt", "N", "mount-force", out="N", Z="B30|mm", k="B17|kN/mm", f="B15|Hz", c="B22|N.s/m", n="B4|1",
        model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)) / a.n)
    put("Isolation at firing", "=100*(1-T_f)", "%", "isolation-efficiency", out="%", T="B27|1")
    put("Amplification Q at resonance (approx.)", "=1/(2*zeta_pct/100)", "-", "peak-transmissibility", z="B9|%", model=lambda a: 1 / (2 * a.z), alsoQ=["damping-ratio"], note="Q itself, so headed")
    s["A35"] = "Fuel for 8 h (l)"
    s.ignore("B35", "=118*8")
    s["A36"] = "Shaft torque (Nm)"
    s.ignore("B36", "=480000/(2*PI()*rpm/60)")
    s["A37"] = "Date of next service"
    s["B37"] = "=DATE(2024,3,11)+180"
    s.ignore("B37")
    s.number("B37", "yyyy\\-mm\\-dd")
    s["A38"] = "Summary"
    s["B38"] = '="fn = "&TEXT(f_n,"0.0")&" Hz, T = "&TEXT(T_f,"0.000")'
    s.ignore("B38")
    return b


BOOKS = [lyon, ohio, table, names]
