"""Laboratories: a shaker technician, a fab planner, one-cell formulas, a sheet without units, helper columns."""
from math import log, log10, pi, sqrt

from model import G, absolute, relative
from sheet import Book


def shaker():
    b = Book("shaker_room_worksheet", "Technician's blocks one below the other: sine levels, resonance search, random", "strings")
    s = b.sheet("shaker")
    s["A1"] = "Sine levels (table)"
    s.across("A2", "f / Hz", "disp mm pk-pk", "vel mm/s pk", "acc g pk", "acc g pk (short)", "acc g pk old sheet", "acc g rms", "vel mm/s rms", "disp mm pk-pk back from acc", "check")
    s.down("A3", 7, 12, 18, 25, 33, 46, 60)
    s.down("B3", 10, 10, 6.4, 3.1, 1.52, 0.88, 0.51)
    c = lambda x: f"{x}3:{x}9"
    s.f(c("C"), "=PI()*A3*B3", "motion-conversion", out="mm/s", f=c("A") + "|Hz", X=c("B") + "|mm", model=lambda a: a.w() * a.X / 2)
    g = s.f(c("D"), "=2*PI()^2*A3^2*B3/9810", "motion-conversion", out="g", f=c("A") + "|Hz", X=c("B") + "|mm", model=lambda a: a.w() ** 2 * a.X / 2)
    g.over("D7", 3.44, "value-typed-over")
    s.f(c("E"), "=0.00201*A3^2*B3", "motion-conversion", out="g", f=c("A") + "|Hz", X=c("B") + "|mm", model=lambda a: a.w() ** 2 * a.X / 2, tol=2e-3, note="0.0020129 to three digits")
    s.f(c("F"), "=0.0201*A3^2*B3", "motion-conversion", "constant-wrong", out="g", f=c("A") + "|Hz", X=c("B") + "|mm", model=lambda a: a.w() ** 2 * a.X / 2, note="0.0201 for 0.00201", alsoM=["length-unit"])
    s.f(c("G"), "=D3/SQRT(2)", "motion-conversion", out="g", A=c("D") + "|g", model=lambda a: a.A / sqrt(2))
    s.f(c("H"), "=PI()*A3*B3", "motion-conversion", "amplitude-kind", out="mm/s", f=c("A") + "|Hz", X=c("B") + "|mm", model=lambda a: a.w() * a.X / 2 / sqrt(2), note="peak under an rms heading")
    s.f(c("I"), "=D3*9810/(2*PI()*A3)^2", "motion-conversion", "amplitude-kind", out="mm", A=c("D") + "|g", f=c("A") + "|Hz", model=lambda a: 2 * a.A / a.w() ** 2, note="peak under a pk-pk heading")
    s.ignore(c("J"), '=IF(D3<50,"in range","over")')
    s["A12"] = "Resonance search"
    s.across("A13", "mount", "fn Hz", "f1 (-3 dB) Hz", "f2 (-3 dB) Hz", "Q", "zeta", "zeta", "loss factor", "T peak", "T at f = fn", "T peak (old)", "x1 mm", "x6 mm", "log dec", "zeta from log dec", "zeta approx log dec/2pi", "zeta (sheet 1998)")
    s.across("G14", "%")
    s.grid("A15", ["blue", 18.4, 17.1, 19.8], ["red", 22.7, 21.9, 23.6], ["grey", 11.2, 9.9, 12.7], ["cork", 34.5, 31.1, 38.3])
    s.down("L15", 8.2, 7.7, 9.1, 6.5)
    s.down("M15", 0.95, 2.9, 0.32, 0.41)
    c = lambda x: f"{x}15:{x}18"
    s.f(c("E"), "=B15/(D15-C15)", "damping-ratio", out="1", fn=c("B") + "|Hz", f1=c("C") + "|Hz", f2=c("D") + "|Hz", model=lambda a: a.fn / (a.f2 - a.f1), note="Q by half-power width")
    s.f(c("F"), "=1/(2*E15)", "damping-ratio", Q=c("E") + "|1")
    s.f(c("G"), "=100/E15", "damping-ratio", "loss-factor-as-damping-ratio", out="%", Q=c("E") + "|1", note="1/Q is the loss factor")
    s.f(c("H"), "=2*F15", "damping-ratio", z=c("F") + "|1", model=lambda a: 2 * a.z)
    s.f(c("I"), "=SQRT(8)*F15^2/SQRT(8*F15^4-4*F15^2-1+SQRT(1+8*F15^2))", "peak-transmissibility", z=c("F") + "|1", note="exact, closed form", tol=1e-3)
    s.f(c("J"), "=SQRT(1+E15^2)", "peak-transmissibility", Q=c("E") + "|1", model=lambda a: sqrt(1 + a.Q**2), alsoQ=["absolute-transmissibility"])
    s.f(c("K"), "=1/(2*G15)", "peak-transmissibility", "percent-as-ratio", z=c("G") + "|%", note="percent column used")
    s.f(c("N"), "=LN(L15/M15)/5", "damping-ratio", x1=c("L") + "|mm", xn=c("M") + "|mm", cyc="5|1", model=lambda a: log(a.x1 / a.xn) / a.cyc, note="log decrement over five cycles")
    s.f(c("O"), "=N15/SQRT(4*PI()^2+N15^2)", "damping-ratio", lam=c("N") + "|1")
    s.f(c("P"), "=N15/(2*PI())", "damping-ratio", lam=c("N") + "|1", model=lambda a: a.lam / (2 * pi), note="labelled approximation")
    s.f(c("Q"), "=N15/PI()", "damping-ratio", "loss-factor-as-damping-ratio", lam=c("N") + "|1", note="gives eta", alsoM=["angular-cyclic-mixup"])
    s["A21"] = "Random, flat at resonance"
    s.across("A22", "mount", "fn Hz", "Q", "ASD g2/Hz", "ASD (m/s2)2/Hz", "ASD (m/s2)2/Hz, print-out", "rms g (Miles)", "rms g", "rms g from f=fn*2pi", "3 sigma g", "rms m/s2", "defl. 3 sigma mm", "defl. rms mm")
    s.grid("A23", ["blue", 18.4, 7, 0.02], ["red", 22.7, 13, 0.02], ["grey", 11.2, 4.2, 0.04], ["cork", 34.5, 5, 0.1])
    c = lambda x: f"{x}23:{x}26"
    s.f(c("E"), "=D23*9.80665^2", "helper", out="(m/s2)2/Hz", S=c("D") + "|g2/Hz", model=lambda a: a.S)
    s.f(c("F"), "=D23*9.80665", "helper", "?", out="(m/s2)2/Hz", S=c("D") + "|g2/Hz", model=lambda a: a.S, note="g once, must be squared")
    s.f(c("G"), "=SQRT(PI()/2*B23*C23*D23)", "random-response-rms", out="g", fn=c("B") + "|Hz", Q=c("C") + "|1", S=c("D") + "|g2/Hz")
    s.f(c("H"), "=SQRT(B23*C23*D23)", "random-response-rms", "half-pi-missing", out="g", fn=c("B") + "|Hz", Q=c("C") + "|1", S=c("D") + "|g2/Hz")
    s.f(c("I"), "=SQRT(PI()/2*2*PI()*B23*C23*D23)", "random-response-rms", "angular-cyclic-mixup", out="g", fn=c("B") + "|Hz", Q=c("C") + "|1", S=c("D") + "|g2/Hz")
    s.f(c("J"), "=3*G23", "random-response-rms", out="g", sigma=c("G") + "|g", model=lambda a: 3 * a.sigma)
    s.f(c("K"), "=SQRT(1.571*B23*C23*E23)", "random-response-rms", out="m/s2", fn=c("B") + "|Hz", Q=c("C") + "|1", S=c("E") + "|(m/s2)2/Hz")
    s.f(c("L"), "=J23*9.81*1000/(2*PI()*B23)^2", "random-response-rms", out="mm", sigma=c("J") + "|g", fn=c("B") + "|Hz", model=lambda a: a.sigma / (2 * pi * a.fn) ** 2, alsoQ=["relative-displacement"])
    s.f(c("M"), "=G23*9.81*1000/B23^2", "random-response-rms", "angular-cyclic-mixup", out="mm", sigma=c("G") + "|g", fn=c("B") + "|Hz", model=lambda a: a.sigma / (2 * pi * a.fn) ** 2, alsoQ=["relative-displacement"])
    s["A29"], s["B29"], s["A30"], s["B30"], s["A31"], s["B31"] = "Band from, Hz", 20, "Band to, Hz", 500, "Flat ASD, g2/Hz", 0.015
    s["A32"] = "overall g rms"
    s.f("B32", "=SQRT(B31*(B30-B29))", "overall-rms", out="g", f1="B29|Hz", f2="B30|Hz", S="B31|g2/Hz", model=lambda a: sqrt(a.S * (a.f2 - a.f1)))
    s["A33"] = "overall g rms (printed report)"
    s.f("B33", "=B31*(B30-B29)", "overall-rms", "square-root-missing", out="g", f1="B29|Hz", f2="B30|Hz", S="B31|g2/Hz", model=lambda a: sqrt(a.S * (a.f2 - a.f1)))
    s["A34"] = "Shaker force kN (18 kg armature+item)"
    s.ignore("B34", "=18*9.81*6/1000")
    return b


def fab():
    b = Book("litho_bay_floor_bands", "Third-octave bands down, isolator data above the table, levels in dB re 1e-9 m/s", "resaved")
    s = b.sheet("Bay 7")
    s["A1"] = "Litho bay 7, floor survey and isolated tool"
    s.grid("A2", ["Isolator natural frequency", 2.6, "Hz"], ["Damping ratio", 0.12, ""], ["Limit, rms velocity", 6.3, "µm/s"], ["Tool mass", 1900, "kg"], ["Number of isolators", 4, ""])
    s.across("A8", "Band centre [Hz]", "Floor level [dB re 1e-9 m/s]", "Floor v rms [µm/s]", "Floor v rms [µm/s] ALT", "r", "T", "T [dB]", "T [dB] (before 2016)", "Tool level [dB re 1e-9 m/s]", "Tool v rms [µm/s]", "Tool v rms [µm/s], draft", "Floor disp. rms [nm]", "Floor acc. rms [mm/s²]", "Isolation [%]", "Level check [dB re 1e-9 m/s]", "Phase [deg]", "Margin", "OK?")
    s.down("A9", 4, 5, 6.3, 8, 10, 12.5, 16, 20, 25, 31.5, 40, 50, 63, 80)
    s.down("B9", 71.2, 72.8, 74.1, 77.5, 80.9, 83.6, 81.0, 78.8, 79.7, 76.4, 72.2, 70.9, 68.3, 64.6)
    c = lambda x: f"{x}9:{x}22"
    lev = lambda a: 1e-9 * 10 ** (a.L / 20)
    s.f(c("C"), "=10^(B9/20)*1E-9*1E6", "motion-conversion", out="µm/s", L=c("B") + "|dB", model=lev)
    s.f(c("D"), "=10^(B9/10)*1E-9*1E6", "motion-conversion", "decibel-factor", out="µm/s", L=c("B") + "|dB", model=lev)
    s.f(c("E"), "=A9/$B$2", "frequency-ratio", f=c("A") + "|Hz", fn="B2|Hz")
    g = s.f(c("F"), "=SQRT((1+(2*$B$3*E9)^2)/((1-E9^2)^2+(2*$B$3*E9)^2))", "absolute-transmissibility", r=c("E") + "|1", z="B3|1")
    g.over("F17", "=SQRT(1/((1-E17^2)^2+(2*$B$3*E17)^2))", "numerator-damping-missing", alsoM=["fill-break"])
    s.f(c("G"), "=20*LOG10(F9)", "transmissibility-db", out="dB", T=c("F") + "|1")
    s.f(c("H"), "=10*LOG10(F9)", "transmissibility-db", "decibel-factor", out="dB", T=c("F") + "|1", note="motion needs 20 log")
    s.f(c("I"), "=B9+G9", "motion-conversion", out="dB", L=c("B") + "|dB", T=c("G") + "|dB", model=lambda a: a.L + a.T, alsoQ=["payload-motion"])
    g = s.f(c("J"), "=C9*F9", "payload-motion", out="µm/s", V=c("C") + "|µm/s", T=c("F") + "|1")
    g.over("J12", "=C12*F11", "reference-slip", alsoM=["fill-break"])
    s.f(c("K"), "=C9*E9^2/SQRT((1-E9^2)^2+(2*$B$3*E9)^2)", "payload-motion", "relative-used-for-absolute", out="µm/s", V=c("C") + "|µm/s", r=c("E") + "|1", z="B3|1", model=lambda a: a.V * absolute(a))
    s.f(c("L"), "=C9/(2*PI()*A9)*1000", "motion-conversion", out="nm", V=c("C") + "|µm/s", f=c("A") + "|Hz", model=lambda a: a.V / a.w())
    s.f(c("M"), "=2*PI()*A9*C9/1000", "motion-conversion", out="mm/s2", V=c("C") + "|µm/s", f=c("A") + "|Hz", model=lambda a: a.V * a.w())
    s.f(c("N"), "=100*(1-F9)", "isolation-efficiency", out="%", T=c("F") + "|1")
    s.f(c("O"), "=20*LOG10(C9/1E-9)", "motion-conversion", "length-unit", out="dB", V=c("C") + "|µm/s", model=lambda a: 20 * log10(a.V / 1e-9), note="µm/s against a reference in m/s")
    s.f(c("P"), "=DEGREES(ATAN2(1-E9^2+(2*$B$3*E9)^2,2*$B$3*E9^3))", "absolute-phase", out="deg", r=c("E") + "|1", z="B3|1")
    s.ignore(c("Q"), "=$B$4/J9")
    s.ignore(c("R"), '=IF(Q9>=1,"OK","NOT OK")')
    s["A24"] = "Overall floor velocity rms [µm/s]"
    s.f("C24", "=SQRT(SUMSQ(C9:C22))", "overall-rms", out="µm/s", y="C9:C22[]|µm/s", model=lambda a: sqrt(sum(v * v for v in a.y)))
    s["A25"] = "Overall floor level [dB re 1e-9 m/s]"
    s.f("C25", "=10*LOG10(SUMPRODUCT(10^(B9:B22/10)))", "overall-rms", out="dB", bands="B9:B22[]|dB", model=lambda a: 10 * log10(sum(10 ** (v / 10) for v in a.bands)), alsoQ=["motion-conversion"])
    s["A26"] = "Overall floor level [dB re 1e-9 m/s], old"
    s.f("C26", "=20*LOG10(SUMPRODUCT(10^(B9:B22/20)))", "overall-rms", "decibel-factor", out="dB", bands="B9:B22[]|dB", model=lambda a: 10 * log10(sum(10 ** (v / 10) for v in a.bands)), alsoQ=["motion-conversion"], note="adds amplitudes, not squares")
    s["A27"] = "Overall tool velocity rms [µm/s]"
    s.f("C27", "=SUM(J9:J22)", "overall-rms", "?", out="µm/s", y="J9:J22[]|µm/s", model=lambda a: sqrt(sum(v * v for v in a.y)), note="plain sum of band values")
    s["A28"] = "Stiffness needed per isolator [N/mm]"
    s.f("C28", "=B5*(2*PI()*B2)^2/B6/1000", "required-stiffness", out="N/mm", m="B5|kg", fn="B2|Hz", n="B6|1", alsoQ=["mount-stiffness"])
    s["A29"] = "Stiffness needed per isolator [N/mm], 2nd offer"
    s.f("C29", "=B5*(2*PI()*B2)^2/1000", "required-stiffness", "total-for-per-mount", out="N/mm", m="B5|kg", fn="B2|Hz", n="B6|1", alsoQ=["mount-stiffness"], alsoM=["mount-count-missing"])
    s["A30"] = "Clean air flow m3/h"
    s.ignore("C30", "=0.45*36*3600")
    s["A31"] = "Isolated sag at 1 g [mm]"
    s.f("C31", "=(15.76/B2)^2", "static-deflection", out="mm", fn="B2|Hz", alsoQ=["required-static-deflection"])
    return b


def mega():
    b = Book("one_cell_monsters", "Everything in one cell from raw inputs; two machines side by side; no helpers", "strings")
    s = b.sheet("Sheet1")
    s.across("B1", "Mill 1", "Mill 2", "Mill 3")
    rows = [("Rotor speed, rpm", 742, 985, 1190), ("Mass, t", 7.4, 5.15, 3.6), ("Mounts", 12, 8, 6), ("k per mount, MN/m", 1.35, 1.1, 0.92), ("c per mount, kNs/m", 4.2, 3.1, 2.6), ("Floor amplitude, µm peak", 55, 38, 26), ("Blades", 6, 8, 4)]
    s.grid("A2", *rows)
    c = lambda r: f"B{r}:D{r}"
    given = dict(f=c(2) + "|rpm", m=c(3) + "|t", k=c(5) + "|MN/m", c=c(6) + "|kN.s/m", n=c(4) + "|1")
    tot = lambda a: complex(a.k * a.n, a.w() * a.c * a.n)
    tr = lambda a: abs(tot(a) / (tot(a) - a.m * a.w() ** 2))
    rel = lambda a: abs(a.m * a.w() ** 2 / (tot(a) - a.m * a.w() ** 2))

    def line(at, label, formula, quantity=None, mistake=None, **kw):
        s[f"A{at}"] = label
        if quantity:
            s.f(c(at), formula, quantity, mistake, **kw)
        else:
            s.ignore(c(at), formula)

    def some(*roles):
        return {r: given[r] for r in roles}

    line(11, "fn, Hz", "=SQRT(B5*1000000*B4/(B3*1000))/(2*PI())", "natural-frequency", out="Hz", **some("k", "n", "m"))
    line(12, "zeta, %", "=100*B6*1000*B4/(2*SQRT(B5*1000000*B4*B3*1000))", "damping-ratio", out="%", model=lambda a: a.c * a.n / (2 * sqrt(a.k * a.n * a.m)), **some("c", "n", "k", "m"))
    line(13, "zeta, % (v1)", "=100*(2*SQRT(B5*1000000*B4*B3*1000))/(B6*1000*B4)", "damping-ratio", "ratio-inverted", out="%", model=lambda a: a.c * a.n / (2 * sqrt(a.k * a.n * a.m)), **some("c", "n", "k", "m"))
    line(14, "Transmissibility", "=SQRT(((B5*1000000*B4)^2+(2*PI()*B2/60*B6*1000*B4)^2)/((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2))", "absolute-transmissibility", model=tr, **given)
    line(15, "Transmissibility (v1)", "=SQRT(((B5*1000000*B4)^2+(2*PI()*B2*B6*1000*B4)^2)/((B5*1000000*B4-B3*1000*(2*PI()*B2)^2)^2+(2*PI()*B2*B6*1000*B4)^2))", "absolute-transmissibility", "speed-unit", model=tr, **given)
    line(16, "Transmissibility (v2)", "=SQRT((B5*1000000*B4)^2/((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2))", "absolute-transmissibility", "numerator-damping-missing", model=tr, **given)
    line(17, "Isolation, %", "=100-100*SQRT(((B5*1000000*B4)^2+(2*PI()*B2/60*B6*1000*B4)^2)/((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2))", "isolation-efficiency", out="%", model=lambda a: 1 - tr(a), **given)
    line(18, "Transmissibility, dB", "=10*LOG10(((B5*1000000*B4)^2+(2*PI()*B2/60*B6*1000*B4)^2)/((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2))", "transmissibility-db", out="dB", model=lambda a: 20 * log10(tr(a)), note="10 log of the square: right", **given)
    line(19, "Mount travel, µm peak", "=B7*B3*1000*(2*PI()*B2/60)^2/SQRT((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2)", "relative-displacement", out="µm", X=c(7) + "|µm", model=lambda a: a.X * rel(a), **given)
    line(20, "Mill motion, µm peak", "=B7*B3*1000*(2*PI()*B2/60)^2/SQRT((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2)", "payload-motion", "relative-used-for-absolute", out="µm", X=c(7) + "|µm", model=lambda a: a.X * tr(a), **given)
    line(21, "Relative transmissibility", "=1/SQRT((B5*1000000*B4/(B3*1000*(2*PI()*B2/60)^2)-1)^2+(B6*1000*B4/(B3*1000*2*PI()*B2/60))^2)", "relative-transmissibility", model=rel, **given)
    line(22, "Relative transmissibility (v1)", "=SQRT(((B5*1000000*B4)^2+(2*PI()*B2/60*B6*1000*B4)^2)/((B5*1000000*B4-B3*1000*(2*PI()*B2/60)^2)^2+(2*PI()*B2/60*B6*1000*B4)^2))", "relative-transmissibility", "absolute-used-for-relative", model=rel, **given)
    line(23, "Load per mount, kN", "=B3*9.81/B4", "mount-load", out="kN", **some("m", "n"))
    line(24, "Load per mount, kN (v1)", "=B3*1000*9.81/B4", "mount-load", "mass-weight-mixup", out="kN", note="newtons under kN", alsoM=["length-unit"], **some("m", "n"))
    line(25, "Sag, mm", "=B3*1000*9.81/(B5*1000*B4)", "static-deflection", out="mm", **some("m", "n", "k"))
    line(26, "Sag, mm (v1)", "=B3*1000/(B5*1000*B4)", "static-deflection", "mass-weight-mixup", out="mm", **some("m", "n", "k"))
    line(27, "Blade passing, Hz", "=B8*B2/60", "frequency-conversion", out="Hz", f=c(2) + "|rpm", teeth=c(8) + "|1")
    line(28, "Blade passing, Hz (v1)", "=B8*B2", "frequency-conversion", "speed-unit", out="Hz", f=c(2) + "|rpm", teeth=c(8) + "|1")
    line(29, "Critical damping of all mounts, kNs/m", "=2*SQRT(B5*1000*B4*B3)", "critical-damping", out="kN.s/m", **some("k", "n", "m"))
    b.groups[-1].note = "MN/m x t: sqrt(1e6 x 1e3 / 1e6) = sqrt(1000) in kN s/m"
    line(30, "Motor power, kW", "=9.5*2*PI()*B2/60")
    line(31, "Grinding cost per shift, EUR", "=9.5*2*PI()*B2/60*8*0.17")
    line(32, "Bearing L10h", "=(420/61)^3*10^6/(60*B2)")
    return b


def student():
    b = Book("messy_no_units", "No units, short names, notes between, SI throughout", "inline")
    s = b.sheet("Tabelle1")
    s["B2"] = "beam table on springs - lab notes"
    s.grid("B4", ["m", 23.5], ["k", 41000], ["c", 185], ["w", 71], ["y0", 0.0012], ["g", 9.81])
    s["B11"] = "wn"
    s.f("C11", "=(C5/C4)^0.5", "natural-frequency", out="rad/s", k="C5|N/m", m="C4|kg")
    s["B12"] = "fn"
    s.f("C12", "=C11/6.2832", "natural-frequency", out="Hz", fn="C11|rad/s", alsoQ=["frequency-conversion"])
    s["B13"] = "c crit"
    s.f("C13", "=2*C4*C11", "critical-damping", out="N.s/m", m="C4|kg", fn="C11|rad/s", model=lambda a: 2 * a.m * 2 * pi * a.fn)
    s["B14"] = "zeta"
    s.f("C14", "=C6/C13", "damping-ratio", c="C6|N.s/m", cc="C13|N.s/m")
    s["B15"] = "r"
    s.f("C15", "=C7/C11", "frequency-ratio", f="C7|rad/s", fn="C11|rad/s")
    s["B16"] = "T"
    s.f("C16", "=((1+(2*C14*C15)^2)/((1-C15^2)^2+(2*C14*C15)^2))^(1/2)", "absolute-transmissibility", z="C14|1", r="C15|1")
    s["B17"] = "T (group 2)"
    s.f("C17", "=((1+2*C14*C15^2)/((1-C15^2)^2+2*C14*C15^2))^(1/2)", "absolute-transmissibility", "sign-precedence", z="C14|1", r="C15|1", note="2*zeta*r^2 for (2*zeta*r)^2", alsoM=["damping-not-squared"])
    s["B18"] = "T (group 3)"
    s.f("C18", "=((1+(2*C14*C15)^2)/((-C15^2+1)^2+(2*C14*C15)^2))^(1/2)", "absolute-transmissibility", "sign-precedence", z="C14|1", r="C15|1", note="-r^2+1 is 1+r^2 in a spreadsheet")
    s["B19"] = "T (group 4)"
    s.f("C19", "=(1+(2*C14*C15)^2)/((1-C15^2)^2+(2*C14*C15)^2)^(1/2)", "absolute-transmissibility", "sign-precedence", z="C14|1", r="C15|1", note="root over the denominator only", alsoM=["square-root-missing"])
    s["E4"] = "rel. displacement z0"
    s.f("F4", "=C8*C15^2/SQRT((1-C15^2)^2+(2*C14*C15)^2)", "relative-displacement", out="m", X="C8|m", r="C15|1", z="C14|1")
    s["E5"] = "x0"
    s.f("F5", "=C8*C16", "payload-motion", out="m", X="C8|m", T="C16|1")
    s["E6"] = "phase z/y"
    s.f("F6", "=ATAN2(1-C15^2,2*C14*C15)", "relative-phase", out="rad", r="C15|1", z="C14|1")
    s["E7"] = "phase x/y"
    s.f("F7", "=ATAN2(1-C15^2,2*C14*C15)", "absolute-phase", "relative-used-for-absolute", out="rad", r="C15|1", z="C14|1")
    s["E8"] = "static sag"
    s.f("F8", "=C4*C9/C5", "static-deflection", out="m", m="C4|kg", k="C5|N/m")
    s["E9"] = "fn from sag"
    s.f("F9", "=SQRT(C9/F8)/(2*PI())", "natural-frequency", out="Hz", d="F8|m")
    s["E10"] = "fn from sag (book)"
    s.f("F10", "=SQRT(F8/C9)/(2*PI())", "natural-frequency", "?", out="Hz", d="F8|m", note="fraction upside down under the root")
    s["E11"] = "force on spring"
    s.f("F11", "=F4*C5", "mount-force", out="N", Z="F4|m", k="C5|N/m", model=lambda a: a.Z * a.k)
    s["E12"] = "force spring + damper"
    s.f("F12", "=F4*(C5+C6*C7)", "mount-force", "?", out="N", Z="F4|m", k="C5|N/m", c="C6|N.s/m", f="C7|rad/s", model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)), note="added without squares")
    s["E13"] = "1-r^2"
    s.f("F13", "=1-C15^2", "helper", r="C15|1", model=lambda a: 1 - a.r**2)
    s["E14"] = "acc of mass"
    s.f("F14", "=C7^2*F5", "motion-conversion", out="m/s2", X="F5|m", f="C7|rad/s", model=lambda a: a.w() ** 2 * a.X, alsoQ=["payload-motion"])
    s["H4"], s["I4"] = "beam length", 1.8
    s["H5"], s["I5"] = "width", 0.06
    s["H6"] = "I"
    s.ignore("I6", "=I5*0.012^3/12")
    s["H7"] = "EI"
    s.ignore("I7", "=2.1E11*I6")
    s["H8"] = "mean of readings"
    s["H9"], s["I9"], s["J9"], s["K9"] = "readings", 3.1, 3.3, 2.9
    s.ignore("I8", "=AVERAGE(I9:K9)")
    return b


def helpers():
    b = Book("sorter_frame_helper_columns", "Ten helper columns; two blocks, one helper wrong in the second", "shared")
    s = b.sheet("block A")
    t = b.sheet("block B")
    rows = [(9.5, 4.2), (14, 4.2), (21, 5.1), (28, 5.1), (36, 6.6), (47, 6.6), (6.4, 4.8), (58, 7.3)]
    for sh, bad in ((s, False), (t, True)):
        sh["A1"] = "Parcel sorter frame on rubber blocks, damping ratio 0.09 for all rows"
        sh["A2"], sh["B2"] = "zeta", 0.09
        sh.across("A4", "f", "fn", "r", "r^2", "1-r^2", "(1-r^2)^2", "2*zeta*r", "(2*zeta*r)^2", "numerator", "denominator", "T", "lost, dB", "base mm pk", "frame mm pk", "buffer travel mm pk", "R")
        sh.across("A5", "Hz", "Hz", "-", "-", "-", "-", "-", "-", "-", "-", "-", "dB", "mm", "mm", "mm", "-")
        sh.grid("A6", *[list(x) for x in rows])
        sh.down("M6", 0.8, 0.42, 0.25, 0.16, 0.11, 0.07, 1.1, 0.05)
        c = lambda x: f"{x}6:{x}13"
        sh.f(c("C"), "=A6/B6", "frequency-ratio", f=c("A") + "|Hz", fn=c("B") + "|Hz")
        sh.f(c("D"), "=C6^2", "helper", r=c("C") + "|1", model=lambda a: a.r**2)
        sh.f(c("E"), "=1-D6", "helper", y=c("D") + "|1", model=lambda a: 1 - a.y)
        sh.f(c("F"), "=E6^2", "helper", y=c("E") + "|1", model=lambda a: a.y**2)
        sh.f(c("G"), "=2*$B$2*C6", "helper", r=c("C") + "|1", z="B2|1", model=lambda a: 2 * a.z * a.r)
        if bad:
            sh.f(c("H"), "=G6", "helper", "damping-not-squared", y=c("G") + "|1", model=lambda a: a.y**2, note="square left out")
        else:
            sh.f(c("H"), "=G6^2", "helper", y=c("G") + "|1", model=lambda a: a.y**2)
        sh.f(c("I"), "=1+H6", "helper", y=c("H") + "|1", model=lambda a: 1 + a.y)
        sh.f(c("J"), "=F6+H6", "helper", x1=c("F") + "|1", xn=c("H") + "|1", model=lambda a: a.x1 + a.xn)
        kw = dict(inherits="H6:H13") if bad else {}
        g = sh.f(c("K"), "=SQRT(I6/J6)", "absolute-transmissibility", r=c("C") + "|1", z="B2|1", **kw)
        if not bad:
            g.over("K10", "=SQRT(I10/J9)", "reference-slip", alsoM=["fill-break"])
        sh.f(c("L"), "=-20*LOG10(K6)" if not bad else "=-10*LOG10(K6)", "transmissibility-db", "decibel-factor" if bad else None, out="dB", T=c("K") + "|1", model=lambda a: -20 * log10(a.T), note="sign turned: loss")
        sh.f(c("N"), "=M6*K6", "payload-motion", out="mm", X=c("M") + "|mm", T=c("K") + "|1")
        sh.f(c("P"), "=D6/SQRT(J6)" if not bad else "=C6/SQRT(F6+G6^2)", "relative-transmissibility", "ratio-not-squared" if bad else None, r=c("C") + "|1", z="B2|1", note="r for r2 on top" if bad else "")
        if bad:
            sh.f(c("O"), "=M6*K6", "relative-displacement", "absolute-used-for-relative", out="mm", X=c("M") + "|mm", r=c("C") + "|1", z="B2|1")
        else:
            sh.f(c("O"), "=M6*P6", "relative-displacement", out="mm", X=c("M") + "|mm", R=c("P") + "|1", model=lambda a: a.X * a.R)
        sh["A15"] = "Belt speed m/s"
        sh.ignore("C15", "=PI()*0.22*180/60")
        sh["A16"] = "Parcels per hour"
        sh.ignore("C16", "=3600*C15/0.75")
    return b


BOOKS = [shaker, fab, mega, student, helpers]
