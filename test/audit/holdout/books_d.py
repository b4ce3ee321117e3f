"""Other forms: two-way charts, LET and complex functions, catalogue look-ups, percent formats and text."""
from math import log10, pi, sqrt

from model import G, absolute, absolute_hysteretic, relative
from sheet import Book


def charts():
    b = Book("wall_charts_two_way", "Design charts: one input along the top, one down the side", "shared")
    s = b.sheet("Charts")
    zs = [0.02, 0.05, 0.1, 0.2, 0.35]
    rs = [0.4, 0.8, 1.1, 1.5, 2.2, 3, 4.5, 7]
    cols = "BCDEF"

    def chart(top, title, head, xs, ys, formula, quantity, mistake=None, xrole="z", yrole="r", xu="1", yu="1", ref=None, **kw):
        s[f"A{top}"] = title
        s[f"A{top + 1}"] = head
        s.across(f"B{top + 1}", *xs)
        s.down(f"A{top + 2}", *ys)
        last = top + 1 + len(ys)
        body = f"B{top + 2}:{cols[len(xs) - 1]}{last}"
        f = formula.replace("X", f"B${top + 1}").replace("Y", f"$A{top + 2}")
        kw[xrole] = f"B{top + 1}:{cols[len(xs) - 1]}{top + 1}|{xu}"
        kw[yrole] = f"A{top + 2}:A{last}|{yu}"
        return s.f(body, f, quantity, mistake, **kw)

    g = chart(1, "Transmissibility of base motion", "r \\ damping ratio", zs, rs, "=SQRT((1+(2*X*Y)^2)/((1-Y^2)^2+(2*X*Y)^2))", "absolute-transmissibility")
    g.over("D8", 0.1, "value-typed-over", note="one point of the chart typed")
    s["A13"] = "Same in dB"
    s["A14"] = "r \\ damping ratio"
    s.across("B14", *zs)
    s.down("A15", *rs)
    s.f("B15:F22", "=20*LOG10(B3)", "transmissibility-db", out="dB", T="B3:F10|1")
    g = chart(25, "Relative transmissibility (stretch of mount over base motion)", "r \\ damping in %", [2, 5, 10, 20, 35], rs, "=Y^2/SQRT((1-Y^2)^2+(2*X*Y)^2)", "relative-transmissibility", "percent-as-ratio", xu="%")
    chart(37, "Relative transmissibility, reissued", "r \\ damping in %", [2, 5, 10, 20, 35], rs, "=Y^2/SQRT((1-Y^2)^2+(2*X/100*Y)^2)", "relative-transmissibility", xu="%")
    g = chart(49, "Transmissibility, copy for the workshop", "r \\ damping ratio", zs, rs, "=SQRT((1+(2*X*Y)^2)/((1-Y^2)^2+(2*X*Y)^2))", "absolute-transmissibility")
    s.fill("B51:F58", "=SQRT((1+(2*B50*$A51)^2)/((1-$A51^2)^2+(2*B50*$A51)^2))")
    g.over("B52:F58", None, "reference-slip", note="$ of the top row lost: from the second row on the damping is read from the chart")
    chart(61, "Natural frequency in Hz, four mounts", "mass kg \\ stiffness of one mount N/mm", [20, 40, 80, 160, 320], [120, 260, 430, 800, 1500], "=SQRT(4*X*1000/Y)/(2*PI())", "natural-frequency", out="Hz", xrole="k", xu="N/mm", yrole="m", yu="kg", n="4|1")
    chart(70, "Natural frequency in Hz, six mounts", "mass kg \\ stiffness of one mount N/mm", [20, 40, 80, 160, 320], [120, 260, 430, 800, 1500], "=SQRT(X*1000/Y)/(2*PI())", "natural-frequency", "mount-count-missing", out="Hz", xrole="k", xu="N/mm", yrole="m", yu="kg", n="6|1", alsoM=["total-for-per-mount"])
    chart(79, "Static deflection in mm needed, undamped", "speed rpm \\ efficiency %", [80, 85, 90, 95, 98], [480, 720, 980, 1450, 2950], "=(946/Y)^2*(1+1/(1-X/100))", "required-static-deflection", out="mm", xrole="E", xu="%", yrole="f", yu="rpm")
    chart(88, "Static deflection in mm needed, undamped (1994 issue)", "speed rpm \\ efficiency %", [80, 85, 90, 95, 98], [480, 720, 980, 1450, 2950], "=(964/Y)^2*(1+1/(1-X/100))", "required-static-deflection", "constant-wrong", out="mm", xrole="E", xu="%", yrole="f", yu="rpm")
    chart(97, "Phase of stretch against base, degrees", "r \\ damping ratio", zs, [0.3, 0.7, 1.2, 1.9, 3.3], "=DEGREES(ATAN2(1-Y^2,2*X*Y))", "relative-phase", out="deg")
    chart(106, "Isolation efficiency in %, undamped", "r across, mass ratio unused", [1.6, 2, 2.5, 3.2, 5], [1], "=100*(1-1/(X^2-1))", "isolation-efficiency", out="%", xrole="r", yrole="m", yu="kg")
    b.groups[-1].inputs.pop("m")
    s["A107"], s["A108"] = "r", "efficiency %"
    chart(111, "Isolation efficiency in %, undamped (reprint)", "", [1.6, 2, 2.5, 3.2, 5], [1], "=100*(1-1/(1-X^2))", "isolation-efficiency", "absolute-value-missing", out="%", xrole="r", yrole="m", yu="kg")
    b.groups[-1].inputs.pop("m")
    s["A112"], s["A113"] = "r", "efficiency %"
    s["A117"] = "Sheet price by length and width, EUR"
    s.across("B118", 0.5, 1, 1.5, 2)
    s.down("A119", 1, 2, 3)
    s.ignore("B119:E121", "=B$118*$A119*41.5")
    return b


def complex_let():
    b = Book("rotor_bunker_let_complex", "LET formulas and complex-number functions, hysteretic mounts", "strings")
    s = b.sheet("Response")
    s["A1"] = "Spin bunker lid on elastomer ring"
    s.grid("A2", ["loss factor", 0.22], ["viscous damping ratio", 0.06], ["k dyn total, N/m", 5.4e6], ["m, kg", 610], ["c, Ns/m", 6900])
    s.across("A9", "speed rpm", "floor µm rms", "f Hz", "fn Hz", "r", "T hysteretic", "T viscous", "T (k, c, m)", "T LET", "T LET from loss factor", "T complex, 1st print", "R", "R LET", "phase deg", "T dB", "lid µm rms", "stretch µm rms", "ring force N rms", "ring force N peak", "eff. %", "eff. % LET", "T hysteretic, 1st print")
    s.down("A10", 420, 780, 1150, 1620, 2300, 3100, 4700)
    s.down("B10", 14, 9.5, 7.1, 5.2, 3.3, 2.6, 1.1)
    c = lambda x: f"{x}10:{x}16"
    E, Z, rr = "B2|1", "B3|1", c("E") + "|1"
    s.f(c("C"), "=A10/60", "frequency-conversion", out="Hz", f=c("A") + "|rpm")
    s.f(c("D"), "=LET(w,SQRT($B$4/$B$5),w/(2*PI()))", "natural-frequency", out="Hz", k="B4|N/m", m="B5|kg")
    s.f(c("E"), "=LET(f,A10/60,f/D10)", "frequency-ratio", f=c("A") + "|rpm", fn=c("D") + "|Hz")
    s.f(c("F"), "=IMABS(IMDIV(COMPLEX(1,$B$2),COMPLEX(1-E10^2,$B$2)))", "absolute-transmissibility", r=rr, eta=E, model=absolute_hysteretic)
    s.f(c("G"), "=IMABS(IMDIV(COMPLEX(1,2*$B$3*E10),COMPLEX(1-E10^2,2*$B$3*E10)))", "absolute-transmissibility", r=rr, z=Z)
    s.f(c("H"), "=IMABS(IMDIV(COMPLEX($B$4,2*PI()*C10*$B$6),COMPLEX($B$4-$B$5*(2*PI()*C10)^2,2*PI()*C10*$B$6)))", "absolute-transmissibility", k="B4|N/m", m="B5|kg", c="B6|N.s/m", f=c("C") + "|Hz")
    s.f(c("I"), "=LET(r,E10,z,$B$3,SQRT((1+(2*z*r)^2)/((1-r^2)^2+(2*z*r)^2)))", "absolute-transmissibility", r=rr, z=Z)
    s.f(c("J"), "=LET(r,E10,z,$B$2,SQRT((1+(2*z*r)^2)/((1-r^2)^2+(2*z*r)^2)))", "absolute-transmissibility", "loss-factor-as-damping-ratio", r=rr, eta=E)
    s.f(c("K"), "=IMABS(IMDIV(1,COMPLEX(1-E10^2,2*$B$3*E10)))", "absolute-transmissibility", "numerator-damping-missing", r=rr, z=Z)
    s.f(c("L"), "=IMABS(IMDIV(E10^2,COMPLEX(1-E10^2,2*$B$3*E10)))", "relative-transmissibility", r=rr, z=Z)
    s.f(c("M"), "=LET(r,E10,d,2*$B$3*r,SQRT(1+d^2)/SQRT((1-r^2)^2+d^2))", "relative-transmissibility", "absolute-used-for-relative", r=rr, z=Z)
    s.f(c("N"), "=DEGREES(IMARGUMENT(IMDIV(COMPLEX(1,2*$B$3*E10),COMPLEX(1-E10^2,2*$B$3*E10))))", "absolute-phase", out="deg", r=rr, z=Z)
    s.f(c("O"), "=LET(t,G10,10*LOG10(t^2))", "transmissibility-db", out="dB", T=c("G") + "|1")
    s.f(c("P"), "=B10*G10", "payload-motion", out="µm", X=c("B") + "|µm", T=c("G") + "|1")
    s.f(c("Q"), "=B10*L10", "relative-displacement", out="µm", X=c("B") + "|µm", R=c("L") + "|1", model=lambda a: a.X * a.R)
    s.f(c("R"), "=IMABS(COMPLEX($B$4,2*PI()*C10*$B$6))*Q10*1E-6", "mount-force", out="N", k="B4|N/m", c="B6|N.s/m", f=c("C") + "|Hz", Z=c("Q") + "|µm", model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)))
    s.f(c("S"), "=R10", "mount-force", "amplitude-kind", out="N", F=c("R") + "|N", model=lambda a: a.F * sqrt(2), note="rms carried over under a peak heading")
    s.f(c("T"), "=100*(1-G10)", "isolation-efficiency", out="%", T=c("G") + "|1")
    s.f(c("U"), "=LET(r,E10,100*(1-1/ABS(1-r^2)))", "isolation-efficiency", "undamped-form", out="%", r=rr, z=Z, model=lambda a: 1 - absolute(a))
    s.f(c("V"), "=SQRT((1+$B$2)/((1-E10^2)^2+$B$2))", "absolute-transmissibility", "damping-not-squared", r=rr, eta=E, model=absolute_hysteretic)
    s["A18"] = "peak T (viscous), at resonance peak"
    s.f("B18", "=LET(z,$B$3,p,(SQRT(1+8*z^2)-1)/(4*z^2),SQRT((1+4*z^2*p)/((1-p)^2+4*z^2*p)))", "peak-transmissibility", z=Z, note="exact: p is the square of the peak ratio")
    s["A19"] = "peak T (viscous), first print"
    s.f("B19", "=1/$B$3", "peak-transmissibility", "?", z=Z, note="2 left out")
    s["A20"] = "Rim speed m/s"
    s.ignore("B20", "=LET(n,A16/60,d,0.62,PI()*d*n)")
    s["A21"] = "Kinetic energy kWh"
    s.ignore("B21", "=0.5*14.2*(2*PI()*A16/60)^2/3600000")
    return b


def lookup():
    b = Book("mount_selection_catalogue", "INDEX/MATCH and VLOOKUP from a catalogue, IFERROR and IF guards, ROUND", "strings")
    p = b.sheet("Catalogue")
    p.across("A3", "Type", "k stat N/mm", "kdyn/kstat", "zeta %", "max load daN", "price")
    p.grid("A4", ["RB-40", 38, 1.25, 5, 40, 11.2], ["RB-60", 55, 1.3, 6, 60, 13.9], ["RB-90", 82, 1.35, 7, 95, 17.5], ["RB-150", 140, 1.4, 8, 160, 24], ["SP-80", 24, 1, 1.5, 80, 42])
    s = b.sheet("Selection")
    s["A1"] = "Mount selection, fans and compressors (dynamic stiffness and damping from catalogue)"
    s.across("A4", "Item", "Mass kg", "Mounts", "Type", "Speed rpm", "k stat N/mm", "factor", "zeta %", "Load/mount daN", "max daN", "use", "fn Hz", "fn Hz (INDEX)", "fn Hz dyn. (2015)", "r", "T", "T guarded", "T 2015", "Isolation %", "Isolation % (2015)", "fn limit for 85 % undamped Hz", "fn limit for 85 % undamped Hz (2015)", "k dyn limit per mount N/mm", "order")
    s.grid("A5", ["F1", 118, 4, "RB-40", 1420], ["F2", 205, 4, "RB-60", 1420], ["F3", 290, 4, "RB-90", 960], ["C1", 520, 4, "RB-150", 2940], ["C2", 760, 6, "RB-150", 1470], ["F4", 240, 4, "SP-80", 720], ["F5", 142, 4, "RB-40", 2850], ["C3", 330, 4, "RB-90", 1180])
    row = dict(zip(["RB-40", "RB-60", "RB-90", "RB-150", "SP-80"], range(4, 9)))
    used = ["RB-40", "RB-60", "RB-90", "RB-150", "RB-150", "SP-80", "RB-40", "RB-90"]
    cat = lambda x: "Catalogue!" + ",".join(f"{x}{row[u]}" for u in used)
    c = lambda x: f"{x}5:{x}12"
    s.ignore(c("F"), "=VLOOKUP(D5,Catalogue!$A$4:$F$8,2,FALSE)")
    s.ignore(c("G"), "=VLOOKUP(D5,Catalogue!$A$4:$F$8,3,FALSE)")
    s.ignore(c("H"), "=INDEX(Catalogue!$D$4:$D$8,MATCH(D5,Catalogue!$A$4:$A$8,0))")
    s.f(c("I"), "=ROUND(B5*9.81/C5/10,1)", "mount-load", out="daN", m=c("B") + "|kg", n=c("C") + "|1", tol=3e-3)
    s.ignore(c("J"), "=VLOOKUP(D5,Catalogue!$A$4:$F$8,5,FALSE)")
    s.ignore(c("K"), '=IF(I5<=J5,"OK","OVERLOAD")')
    kd = dict(k=c("F") + "|N/mm", kappa=c("G") + "|1", n=c("C") + "|1", m=c("B") + "|kg")
    g = s.f(c("L"), '=IFERROR(SQRT(F5*G5*C5*1000/B5)/(2*PI()),"-")', "natural-frequency", out="Hz", **kd)
    g.over("L9", '=IFERROR(SQRT(F9*G9*C8*1000/B9)/(2*PI()),"-")', "reference-slip", alsoM=["fill-break"], note="mount count of the row above")
    s.f(c("M"), '=IF(B5>0,SQRT(INDEX(Catalogue!$B$4:$B$8,MATCH(D5,Catalogue!$A$4:$A$8,0))*INDEX(Catalogue!$C$4:$C$8,MATCH(D5,Catalogue!$A$4:$A$8,0))*1000*C5/B5)/2/PI(),0)', "natural-frequency", out="Hz", k=cat("B") + "|N/mm", kappa=cat("C") + "|1", n=c("C") + "|1", m=c("B") + "|kg")
    s.f("N5:N9,N11:N12", None, "natural-frequency", "static-stiffness-for-dynamic", out="Hz", k="F5:F9,F11:F12|N/mm", kappa="G5:G9,G11:G12|1", n="C5:C9,C11:C12|1", m="B5:B9,B11:B12|kg")
    s.fill("N5:N9", "=IFERROR(SQRT(F5*C5*1000/B5)/(2*PI()),0)")
    s.fill("N11:N12", "=IFERROR(SQRT(F11*C11*1000/B11)/(2*PI()),0)")
    s.f(c("O"), "=E5/60/L5", "frequency-ratio", f=c("E") + "|rpm", fn=c("L") + "|Hz")
    zz, rr = c("H") + "|%", c("O") + "|1"
    s.f(c("P"), "=SQRT((1+(2*H5%*O5)^2)/((1-O5^2)^2+(2*H5%*O5)^2))", "absolute-transmissibility", z=zz, r=rr, note="percent operator")
    s.f(c("Q"), '=IF(O5=1,"res",ROUND(SQRT((1+POWER(2*H5/100*O5,2))/(POWER(1-POWER(O5,2),2)+POWER(2*H5/100*O5,2))),4))', "absolute-transmissibility", z=zz, r=rr, tol=5e-3)
    s.f(c("R"), "=IFERROR(SQRT((1+POWER(2*H5/100*O5,2))/(POWER(1-O5,2)+POWER(2*H5/100*O5,2))),0)", "absolute-transmissibility", "ratio-not-squared", z=zz, r=rr, note="(1-r)^2 for (1-r^2)^2")
    g = s.f(c("S"), "=IF(O5>SQRT(2),ROUND(100*(1-P5),1),0)", "isolation-efficiency", out="%", T=c("P") + "|1", tol=2e-3)
    g.over("S7", "=IF(O7>SQRT(2),ROUND(100*(1-P7),1),0)+2.5", "fill-break", note="2.5 points added by hand")
    s.f(c("T"), "=ROUND(100/P5,1)", "isolation-efficiency", "efficiency-not-of-motion", out="%", T=c("P") + "|1", note="1/T in percent")
    s.f(c("U"), "=E5/60/SQRT(1+1/0.15)", "required-natural-frequency", out="Hz", f=c("E") + "|rpm", E="0.85|1", note="headed undamped")
    s.f(c("V"), "=E5/SQRT(1+1/0.15)", "required-natural-frequency", "speed-unit", out="Hz", f=c("E") + "|rpm", E="0.85|1")
    s.f(c("W"), "=B5*(2*PI()*U5)^2/C5/1000", "required-stiffness", out="N/mm", m=c("B") + "|kg", fn=c("U") + "|Hz", n=c("C") + "|1", alsoQ=["mount-stiffness"])
    s.ignore(c("X"), '=C5&" x "&D5')
    s["A14"] = "Order value"
    s.ignore("B14", "=SUMPRODUCT(C5:C12,F5:F12)")
    s["A15"] = "Duct velocity, m/s"
    s.ignore("B15", "=2.4/(0.5*0.6)")
    return b


def bench():
    b = Book("optics_bench_percent_cells", "Damping and efficiency in percent-formatted cells, text results, mixed blocks", "inline")
    s = b.sheet("Bench")
    s["A1"] = "Optical bench on four air-spring legs"
    s.grid("A3", ["Bench mass (kg)", 780], ["Legs", 4], ["Damping ratio", 0.08], ["Leg stiffness (N/mm)", 31], ["Top plate (m2)", 3.6])
    s.number("B5", "0%")
    s["A9"] = "Leg load (N)"
    s.f("B9", "=B3*9.81/B4", "mount-load", out="N", m="B3|kg", n="B4|1")
    s["A10"] = "Leg load (lbf)"
    s.f("B10", "=B9/4.448", "mount-load", out="lbf", F="B9|N", model=lambda a: a.F, alsoQ=["helper"])
    s["A11"] = "fn (Hz)"
    s.f("B11", "=SQRT(B6*1000*B4/B3)/(2*PI())", "natural-frequency", out="Hz", k="B6|N/mm", n="B4|1", m="B3|kg")
    s["A12"] = "fn (Hz) from leg load"
    s.f("B12", "=SQRT(B6*1000/B9)/(2*PI())", "natural-frequency", "mass-weight-mixup", out="Hz", k="B6|N/mm", W="B9|N", model=lambda a: sqrt(a.k / (a.W / G)) / 2 / pi, note="newtons as kilograms")
    s["A13"] = "Damping of one leg (Ns/m)"
    s.f("B13", "=2*B5*SQRT(B6*1000*B3/B4)", "damping-coefficient", out="N.s/m", z="B5|1", k="B6|N/mm", m="B3|kg", n="B4|1", model=lambda a: 2 * a.z * sqrt(a.k * a.m / a.n))
    s["A14"] = "Damping of one leg (Ns/m), supplier"
    s.f("B14", "=2*B5*SQRT(B6*1000*B3)", "damping-coefficient", "mount-count-missing", out="N.s/m", z="B5|1", k="B6|N/mm", m="B3|kg", n="B4|1", model=lambda a: 2 * a.z * sqrt(a.k * a.m / a.n), alsoM=["total-for-per-mount"])
    s["A15"] = "Loss factor"
    s.f("B15", "=2*B5", "damping-ratio", z="B5|1", model=lambda a: 2 * a.z)
    s["A16"] = "Q"
    s.f("B16", "=1/B5", "damping-ratio", "loss-factor-as-damping-ratio", z="B5|1", model=lambda a: 1 / (2 * a.z))
    s["A17"] = "T at fn, sqrt(1+1/(2 zeta)^2)"
    s.f("B17", "=SQRT(1+1/(2*B5)^2)", "peak-transmissibility", z="B5|1", model=lambda a: sqrt(1 + 1 / (2 * a.z) ** 2), alsoQ=["absolute-transmissibility"])
    s["A18"] = "Critical damping, whole bench (Ns/m)"
    s.f("B18", "=2*SQRT(B6*B4*1000*B3)", "critical-damping", out="N.s/m", k="B6|N/mm", n="B4|1", m="B3|kg")
    s["A19"] = "Critical damping, whole bench (Ns/m), check 2*k/wn"
    s.f("B19", "=2*B6*B4*1000/B11", "critical-damping", "angular-cyclic-mixup", out="N.s/m", k="B6|N/mm", n="B4|1", fn="B11|Hz", model=lambda a: 2 * a.k * a.n / (2 * pi * a.fn))
    s.across("D3", "Tone", "Floor", "r", "T", "T", "Isolation", "Isolation", "Attenuation", "Bench", "Leg stretch", "Verdict", "Phase lag", "Phase lag")
    s.across("D4", "Hz", "µm pk", "", "", "old", "", "old", "dB", "µm pk", "µm pk", "", "deg", "rad")
    s.down("D5", 9.8, 12.5, 16.7, 24.3, 29.5, 49.5, 99)
    s.down("E5", 1.9, 1.2, 0.66, 0.71, 0.3, 0.22, 0.04)
    c = lambda x: f"{x}5:{x}11"
    rr, zz = c("F") + "|1", "B5|1"
    s.f(c("F"), "=D5/$B$11", "frequency-ratio", f=c("D") + "|Hz", fn="B11|Hz")
    s.f(c("G"), "=SQRT(1+(2*$B$5*F5)^2)/SQRT((F5^2-1)^2+(2*$B$5*F5)^2)", "absolute-transmissibility", r=rr, z=zz)
    s.f(c("H"), "=SQRT(1+(2*$B$5/100*F5)^2)/SQRT((F5^2-1)^2+(2*$B$5/100*F5)^2)", "absolute-transmissibility", "percent-as-ratio", r=rr, z=zz, note="the cell shows 8 % and holds 0.08: divided by 100 once more")
    g = s.f(c("I"), "=1-G5", "isolation-efficiency", T=c("G") + "|1")
    s.f(c("J"), "=G5", "isolation-efficiency", "efficiency-not-of-motion", T=c("G") + "|1", note="T in percent under isolation")
    s.number("I5:J11", "0.0%")
    s.f(c("K"), "=-20*LOG10(G5)", "transmissibility-db", out="dB", T=c("G") + "|1", model=lambda a: -20 * log10(a.T))
    g = s.f(c("L"), "=E5*G5", "payload-motion", out="µm", X=c("E") + "|µm", T=c("G") + "|1")
    g.over("L9", 0.019, "value-typed-over")
    s.f(c("M"), "=E5*F5^2*G5/SQRT(1+(2*$B$5*F5)^2)", "relative-displacement", out="µm", X=c("E") + "|µm", r=rr, T=c("G") + "|1", z=zz, model=lambda a: a.X * a.T * a.r**2 / sqrt(1 + (2 * a.z * a.r) ** 2))
    s.ignore(c("N"), '=IF(L5<0.1,"pass","review")&" at "&D5&" Hz"')
    s.f(c("O"), "=DEGREES(ATAN2(1-F5^2+(2*$B$5*F5)^2,2*$B$5*F5^3))", "absolute-phase", out="deg", r=rr, z=zz)
    s.f(c("P"), "=ATAN2(1-F5^2+(2*$B$5*F5)^2,2*$B$5*F5^2)", "absolute-phase", "?", out="rad", r=rr, z=zz, note="r^2 where r^3 stands")
    s["A21"] = "Plate pressure (Pa)"
    s.ignore("B21", "=B3*9.81/B7")
    s["A22"] = "Compressed air per day (Nl)"
    s.ignore("B22", "=4*1.8*60*24")
    return b


BOOKS = [charts, complex_let, lookup, bench]
