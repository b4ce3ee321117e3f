"""Sheets whose only column is the wrong one, a sheet of single-row slips, a sheet with nothing wrong."""
from math import log10, pi, sqrt

from model import absolute, relative
from sheet import Book


def row_slips():
    b = Book("spinning_mill_row_slips", "Long table, nearly every column broken in one row, two rows written differently but rightly", "strings")
    s = b.sheet("Ring frames")
    s["A1"] = "Ring frames hall 4 - isolators under drive heads"
    s.across("A3", "Frame", "Spindle drive, rpm", "Head mass, kg", "Mounts", "Mount stiffness, N/mm", "Damping ratio", "Drive frequency, Hz", "Load per mount, N", "Sag, mm", "Natural frequency, Hz", "Frequency ratio", "Transmissibility",
             "Relative transmissibility", "Isolation, %", "Transmissibility, dB", "Floor amplitude, µm", "Head amplitude, µm", "Mount stretch, µm", "Spring force per mount, N", "Mount damping, Ns/m", "Phase, deg")
    for i in range(16):
        s.across(f"A{4 + i}", f"RF{i + 1:02d}", [910, 1080, 1240, 1410, 1530, 980, 1160, 1320][i % 8] + 10 * i, [420, 455, 390, 515, 610, 345, 480, 560][i % 8] + 3 * i, [4, 4, 4, 6, 6, 4, 6, 6][i % 8], [52, 52, 41, 41, 66, 41, 52, 66][i % 8], [0.05, 0.05, 0.07, 0.07, 0.06, 0.07, 0.05, 0.06][i % 8])
        s[f"P{4 + i}"] = [31, 24.5, 18, 14, 11.5, 27, 21, 16.5][i % 8]
    c = lambda x: f"{x}4:{x}19"
    fb = ["fill-break"]
    z, rr = c("F") + "|1", c("K") + "|1"
    g = s.f(c("G"), "=B4/60", "frequency-conversion", out="Hz", f=c("B") + "|rpm")
    g.over("G9", "=B9/6.0", "speed-unit", alsoM=fb + ["constant-wrong"], note="6.0 for 60")
    g = s.f(c("H"), "=C4*9.81/D4", "mount-load", out="N", m=c("C") + "|kg", n=c("D") + "|1")
    g.over("H14", 1180, "value-typed-over")
    g.over("H6", "=C6/D6", "mass-weight-mixup", alsoM=fb)
    g = s.f(c("I"), "=H4/E4", "static-deflection", out="mm", W=c("H") + "|N", k=c("E") + "|N/mm")
    g.over("I11", "=H11/E10", "reference-slip", alsoM=fb)
    g = s.f(c("J"), "=SQRT(E4*D4*1000/C4)/(2*PI())", "natural-frequency", out="Hz", k=c("E") + "|N/mm", n=c("D") + "|1", m=c("C") + "|kg")
    g.over("J16", "=SQRT(E16*D16/C16)/(2*PI())", "length-unit", alsoM=fb)
    g.over("J8", "=SQRT(E8*1000/C8)/(2*PI())", "mount-count-missing", alsoM=fb + ["total-for-per-mount"])
    s["J12"] = "=1/(2*PI())*(E12*1000*D12/C12)^0.5"
    g = s.f(c("K"), "=G4/J4", "frequency-ratio", f=c("G") + "|Hz", fn=c("J") + "|Hz")
    g.over("K18", "=J18/G18", "ratio-inverted", alsoM=fb)
    g = s.f(c("L"), "=SQRT((1+(2*F4*K4)^2)/((1-K4^2)^2+(2*F4*K4)^2))", "absolute-transmissibility", z=z, r=rr)
    g.over("L13", "=1/ABS(1-K13^2)", "undamped-form", alsoM=fb)
    g.over("L7", "=SQRT((1+(2*F7*K7)^2)/((1-K7^2)^2+2*F7*K7^2))", "?", alsoM=fb + ["damping-not-squared", "sign-precedence"], note="bracket and square slipped in one row")
    s["L10"] = "=SQRT(1+(2*F10*K10)^2)/SQRT((K10^2-1)^2+4*F10^2*K10^2)"
    g = s.f(c("M"), "=K4^2/SQRT((1-K4^2)^2+(2*F4*K4)^2)", "relative-transmissibility", z=z, r=rr)
    g.over("M15", "=SQRT((1+(2*F15*K15)^2)/((1-K15^2)^2+(2*F15*K15)^2))", "absolute-used-for-relative", alsoM=fb)
    g = s.f(c("N"), "=100*(1-L4)", "isolation-efficiency", out="%", T=c("L") + "|1")
    g.over("N17", "=100*L17", "efficiency-not-of-motion", alsoM=fb)
    g.over("N5", 93, "value-typed-over")
    g = s.f(c("O"), "=20*LOG10(L4)", "transmissibility-db", out="dB", T=c("L") + "|1")
    g.over("O12", "=10*LOG10(L12)", "decibel-factor", alsoM=fb)
    g = s.f(c("Q"), "=P4*L4", "payload-motion", out="µm", X=c("P") + "|µm", T=c("L") + "|1")
    g.over("Q19", "=P19*L18", "reference-slip", alsoM=fb)
    g.over("Q6", "=P6*M6", "relative-used-for-absolute", alsoM=fb)
    g = s.f(c("R"), "=P4*M4", "relative-displacement", out="µm", X=c("P") + "|µm", R=c("M") + "|1", model=lambda a: a.X * a.R)
    g.over("R4", 29.9, "value-typed-over")
    g = s.f(c("S"), "=R4/1000*E4", "mount-force", out="N", Z=c("R") + "|µm", k=c("E") + "|N/mm", model=lambda a: a.Z * a.k)
    g.over("S10", "=R10/1000*E10*D10", "total-for-per-mount", alsoM=fb, model=lambda a: a.Z * a.k)
    g = s.f(c("T"), "=2*F4*SQRT(E4*1000*C4/D4)", "damping-coefficient", out="N.s/m", z=z, k=c("E") + "|N/mm", m=c("C") + "|kg", n=c("D") + "|1", model=lambda a: 2 * a.z * sqrt(a.k * a.m / a.n))
    g.over("T17", "=2*F17*SQRT(E17*1000*C17/D17)+15", "fill-break", note="15 added")
    g = s.f(c("U"), "=DEGREES(ATAN2(1-K4^2+(2*F4*K4)^2,2*F4*K4^3))", "absolute-phase", out="deg", z=z, r=rr)
    g.over("U9", "=DEGREES(ATAN2(1-K9^2,2*F9*K9))", "relative-used-for-absolute", alsoM=fb)
    s["A21"] = "Mean"
    s.ignore("C21", "=AVERAGE(C4:C19)")
    s["A22"] = "Sum of mounts"
    s.ignore("D22", "=SUM(D4:D19)")
    s["A23"] = "Order value"
    s.ignore("D23", "=D22*27.4")
    return b


def only_wrong():
    b = Book("brickworks_fan_only_column", "Wrong columns without a right twin; notes say old where the formula is right", "shared")
    s = b.sheet("Fans")
    s["A1"] = "Kiln exhaust fans on elastomer buffers. Loss factor from supplier (eta), buffers n per fan."
    s.across("A3", "Fan", "n_rot", "M", "n", "k_dyn", "eta", "v_floor rms", "f", "omega", "F per buffer", "fn", "f/fn", "zeta", "TR", "TR old", "IE", "TL", "RR", "v_fan rms", "x_floor p-p", "x_floor pk old", "z pk", "k for IE 90 % undamped", "fn for IE 90 % undamped", "sag", "c_crit", "c", "F_dyn per buffer pk, spring", "phase")
    s.across("B4", "1/min", "kg", "", "kN/m", "", "mm/s", "Hz", "rad/s", "N", "Hz", "", "", "", "", "%", "dB", "", "mm/s", "µm", "µm", "µm", "kN/m per buffer", "Hz", "mm", "Ns/m", "Ns/m per buffer", "N", "deg")
    s.grid("A5", ["KF1", 985, 1120, 6, 310, 0.14, 2.1], ["KF2", 985, 1185, 6, 310, 0.14, 1.8], ["KF3", 1240, 860, 4, 420, 0.18, 3.3], ["KF4", 1480, 640, 4, 380, 0.18, 2.6], ["KF5", 735, 1730, 8, 260, 0.12, 1.2], ["KF6", 1460, 905, 6, 295, 0.14, 2.9])
    c = lambda x: f"{x}5:{x}10"
    m, n, k, eta, rr, z = c("C") + "|kg", c("D") + "|1", c("E") + "|kN/m", c("F") + "|1", c("L") + "|1", c("M") + "|1"
    f, w = c("H") + "|Hz", c("I") + "|rad/s"
    s.f(c("H"), "=B5/60", "frequency-conversion", out="Hz", f=c("B") + "|rpm")
    s.f(c("I"), "=2*PI()*B5", "frequency-conversion", "speed-unit", out="rad/s", f=c("B") + "|rpm")
    s.f(c("J"), "=C5*9.81", "mount-load", "mount-count-missing", out="N", m=m, n=n, alsoM=["total-for-per-mount"])
    s.f(c("K"), "=SQRT(E5*1000*D5/C5)", "natural-frequency", "angular-cyclic-mixup", out="Hz", k=k, n=n, m=m)
    s.f(c("L"), "=H5/K5", "frequency-ratio", f=f, fn=c("K") + "|Hz")
    s.f(c("M"), "=F5", "damping-ratio", "loss-factor-as-damping-ratio", eta=eta)
    s.f(c("N"), "=SQRT((1+2*M5*L5)/((1-L5^2)^2+2*M5*L5))", "absolute-transmissibility", "damping-not-squared", r=rr, z=z)
    s.f(c("O"), "=SQRT((1+(2*M5*L5)^2)/((1-L5^2)^2+(2*M5*L5)^2))", "absolute-transmissibility", r=rr, z=z, note="called old, and right")
    s.f(c("P"), "=100/O5", "isolation-efficiency", "efficiency-not-of-motion", out="%", T=c("O") + "|1")
    s.f(c("Q"), "=10*LOG10(O5)", "transmissibility-db", "decibel-factor", out="dB", T=c("O") + "|1")
    s.f(c("R"), "=L5/SQRT((1-L5^2)^2+(2*M5*L5)^2)", "relative-transmissibility", "ratio-not-squared", r=rr, z=z)
    s.f(c("S"), "=G5*R5", "payload-motion", "relative-used-for-absolute", out="mm/s", V=c("G") + "|mm/s", r=rr, z=z, model=lambda a: a.V * absolute(a))
    s.f(c("T"), "=G5*1000/(2*PI()*H5)*SQRT(2)", "motion-conversion", "amplitude-kind", out="µm", V=c("G") + "|mm/s", f=f, model=lambda a: 2 * sqrt(2) * a.V / a.w(), note="peak under p-p")
    s.f(c("U"), "=G5*1000/(2*PI()*H5)*SQRT(2)", "motion-conversion", out="µm", V=c("G") + "|mm/s", f=f, model=lambda a: sqrt(2) * a.V / a.w(), note="same text, headed pk: right")
    s.f(c("V"), "=U5*O5", "relative-displacement", "absolute-used-for-relative", out="µm", X=c("U") + "|µm", r=rr, z=z)
    s.f(c("W"), "=C5*(2*PI()*X5)^2/1000", "required-stiffness", "total-for-per-mount", out="kN/m", m=m, n=n, fn=c("X") + "|Hz", alsoQ=["mount-stiffness"], alsoM=["mount-count-missing"])
    s.f(c("X"), "=B5/SQRT(1+1/0.1)", "required-natural-frequency", "speed-unit", out="Hz", f=c("B") + "|rpm", E="0.9|1")
    s.f(c("Y"), "=C5/(E5*D5)", "static-deflection", "mass-weight-mixup", out="mm", m=m, k=k, n=n, note="g left out")
    s.f(c("Z"), "=2*SQRT(E5*D5*C5)", "critical-damping", "length-unit", out="N.s/m", k=k, n=n, m=m, note="kN/m taken as N/m")
    s.f(c("AA"), "=F5/2*2*SQRT(E5*1000*C5/D5)", "damping-coefficient", out="N.s/m", eta=eta, k=k, m=m, n=n, model=lambda a: a.eta * sqrt(a.k * a.m / a.n))
    s.f(c("AB"), "=V5/1000*E5", "mount-force", out="N", Z=c("V") + "|µm", k=k, model=lambda a: a.Z * a.k, note="µm/1000 x kN/m = N")
    s.f(c("AC"), "=ATAN2(1-L5^2+(2*M5*L5)^2,2*M5*L5^3)", "absolute-phase", "?", out="deg", r=rr, z=z, note="radians under deg")
    s["A13"] = "Annual energy KF1, kWh"
    s.ignore("D13", "=37*0.82*7800")
    s["A14"] = "Gas flow velocity, m/s"
    s.ignore("D14", "=14.5/(PI()*0.9^2/4)")
    s["A15"] = "V-belt length, mm"
    s.ignore("D15", "=2*840+PI()/2*(315+224)+(315-224)^2/(4*840)")
    return b


def patrol():
    b = Book("patrol_boat_radio_rack", "Inch-pound vehicle electronics, rules of thumb with constants, parameters above a table without dollar signs", "inline")
    s = b.sheet("RACK")
    s["A1"] = "RADIO RACK, 6 WIRE ROPE ISOLATORS"
    s.grid("A2", ["Isolator fn, Hz", 9.4], ["Damping, fraction of critical", 0.11], ["Rack weight, lb", 186], ["Isolators", 6], ["k each, lb/in", 281], ["Deck level, g pk", 0.62], ["Clearance, in", 0.75], ["Shelf width, in", 19], ["Shelf depth, in", 24])
    s.across("D2", "f, Hz", "f/fn", "f/fn (2)", "T", "T (copied)", "g in", "g rack", "DA in, deck", "DA in, rack", "vel in/s pk, deck", "x in pk, deck", "vel in/s pk, deck (slide rule)", "DA in, deck (slide rule)", "travel in pk", "dB", "T no damping", "T (vendor)")
    s.down("D3", 5, 7, 12, 16, 22, 30, 45)
    s.down("I3", 0.3, 0.4, 0.6, 0.8, 1, 1, 1)
    c = lambda x: f"{x}3:{x}9"
    f, rr = c("D") + "|Hz", c("E") + "|1"
    s.f(c("E"), "=D3/$B$2", "frequency-ratio", f=f, fn="B2|Hz")
    g = s.f(c("F"), "=D3/B2", "frequency-ratio", f=f, fn="B2|Hz")
    g.over("F4:F9", None, "reference-slip", note="$ missing: the row below the first reads the damping, the weight ...")
    s.f(c("G"), "=SQRT((1+(2*B$3*E3)^2)/((1-E3^2)^2+(2*B$3*E3)^2))", "absolute-transmissibility", r=rr, z="B3|1", note="row locked only: enough down a column")
    s.f(c("H"), "=SQRT((1+(2*$B$3*E3)^2)/((-E3^2+1)^2+(2*$B$3*E3)^2))", "absolute-transmissibility", "sign-precedence", r=rr, z="B3|1")
    s.f(c("J"), "=I3*G3", "payload-motion", out="g", A=c("I") + "|g", T=c("G") + "|1")
    s.f(c("K"), "=19.57*I3/D3^2", "motion-conversion", out="in", A=c("I") + "|g", f=f, model=lambda a: 2 * a.A / a.w() ** 2)
    s.f(c("L"), "=9.78*J3/D3^2", "motion-conversion", "amplitude-kind", out="in", A=c("J") + "|g", f=f, model=lambda a: 2 * a.A / a.w() ** 2, note="single amplitude under double amplitude")
    s.f(c("M"), "=61.44*I3/D3", "motion-conversion", out="in/s", A=c("I") + "|g", f=f, model=lambda a: a.A / a.w())
    s.f(c("N"), "=M3/(2*PI()*D3)", "motion-conversion", out="in", V=c("M") + "|in/s", f=f, model=lambda a: a.V / a.w())
    s.f(c("O"), "=64.1*I3/D3", "motion-conversion", "constant-wrong", out="in/s", A=c("I") + "|g", f=f, model=lambda a: a.A / a.w(), note="61.4 with digits swapped")
    s.f(c("P"), "=N3*2", "motion-conversion", out="in", x=c("N") + "|in", model=lambda a: 2 * a.x)
    s.f(c("Q"), "=N3*E3^2/SQRT((1-E3^2)^2+(2*$B$3*E3)^2)", "relative-displacement", out="in", X=c("N") + "|in", r=rr, z="B3|1")
    s.f(c("R"), "=20*LOG10(G3)", "transmissibility-db", out="dB", T=c("G") + "|1")
    s.f(c("S"), "=1/ABS(E3^2-1)", "absolute-transmissibility", r=rr, note="headed no damping")
    s.f(c("T"), "=1/SQRT((1-E3^2)^2+(2*$B$3*E3)^2)", "absolute-transmissibility", "numerator-damping-missing", r=rr, z="B3|1")
    n, W, k = "B5|1", "B4|lbf", "B6|lbf/in"
    line = iter(range(13, 60))

    def put(label, formula, quantity=None, mistake=None, **kw):
        at = next(line)
        s[f"A{at}"] = label
        if quantity:
            s.f(f"B{at}", formula, quantity, mistake, **kw)
        else:
            s.ignore(f"B{at}", formula)

    put("weight on each, lb", "=B4/B5", "mount-load", out="lbf", W=W, n=n)
    put("static sag, in", "=B13/B6", "static-deflection", out="in", W="B13|lbf", k=k)
    put("fn, Hz = 3.13 / root sag", "=3.13/SQRT(B14)", "natural-frequency", out="Hz", d="B14|in")
    put("fn, Hz = 3.13 root k/W", "=3.13*SQRT(B6*B5/B4)", "natural-frequency", out="Hz", k=k, n=n, W=W)
    put("fn, Hz = root kg/W", "=SQRT(B6*B5*386/B4)", "natural-frequency", "angular-cyclic-mixup", out="Hz", k=k, n=n, W=W)
    put("critical damping, lb s/in, rack", "=2*SQRT(B6*B5*B4/386.1)", "critical-damping", out="lbf.s/in", k=k, n=n, W=W)
    put("critical damping, lb s/in, rack, 1st issue", "=2*SQRT(B6*B5*B4)", "critical-damping", "mass-weight-mixup", out="lbf.s/in", k=k, n=n, W=W)
    put("c each, lb s/in", "=B3*B18/B5", "damping-coefficient", out="lbf.s/in", z="B3|1", cc="B18|lbf.s/in", n=n, model=lambda a: a.z * a.cc / a.n)
    put("c each, lb s/in, 1st issue", "=B3*B18", "damping-coefficient", "total-for-per-mount", out="lbf.s/in", z="B3|1", cc="B18|lbf.s/in", n=n, model=lambda a: a.z * a.cc / a.n, alsoM=["mount-count-missing"])
    put("Q", "=1/(2*B3)", "damping-ratio", z="B3|1", model=lambda a: 1 / (2 * a.z))
    put("log decrement", "=2*PI()*B3/SQRT(1-B3^2)", "damping-ratio", z="B3|1", model=lambda a: 2 * pi * a.z / sqrt(1 - a.z**2))
    put("log decrement, 1st issue", "=B3/SQRT(1-B3^2)", "damping-ratio", "angular-cyclic-mixup", z="B3|1", model=lambda a: 2 * pi * a.z / sqrt(1 - a.z**2))
    put("stiffness for fn 9.4 Hz, each, lb/in", "=B4/386.1*(2*PI()*B2)^2/B5", "required-stiffness", out="lbf/in", W=W, fn="B2|Hz", n=n, alsoQ=["mount-stiffness"])
    put("stiffness for fn 9.4 Hz, each, lb/in, 1st issue", "=B4*(2*PI()*B2)^2/B5", "required-stiffness", "mass-weight-mixup", out="lbf/in", W=W, fn="B2|Hz", n=n, alsoQ=["mount-stiffness"])
    put("sag for fn 9.4 Hz, in", "=9.8/B2^2", "required-static-deflection", out="in", fn="B2|Hz", alsoQ=["static-deflection"], tol=4e-3, note="9.78 to two digits")
    put("sag for fn 9.4 Hz, in, 1st issue", "=9.8/B2", "required-static-deflection", "?", out="in", fn="B2|Hz", alsoQ=["static-deflection"])
    s["A30"], s["B30"], s["A31"], s["B31"] = "deck random, g2/Hz flat", 0.004, "band, Hz", 95
    s["A33"] = "rack response, g rms"
    s.f("B33", "=SQRT(1.57*B2*B22*B30)", "random-response-rms", out="g", fn="B2|Hz", Q="B22|1", S="B30|g2/Hz")
    s["A34"] = "rack response, g rms (viewgraph)"
    s.f("B34", "=SQRT(1.57*B2/B22*B30)", "random-response-rms", "?", out="g", fn="B2|Hz", Q="B22|1", S="B30|g2/Hz", note="divided by Q")
    s["A35"] = "isolator stretch, in, 3 sigma"
    s.f("B35", "=3*386.1*B33/(2*PI()*B2)^2", "random-response-rms", out="in", sigma="B33|g", fn="B2|Hz", model=lambda a: 3 * a.sigma / (2 * pi * a.fn) ** 2, alsoQ=["relative-displacement"])
    s["A36"] = "deck overall, g rms"
    s.f("B36", "=SQRT(B30*B31)", "overall-rms", out="g", S="B30|g2/Hz", f2="B31|Hz", model=lambda a: sqrt(a.S * a.f2))
    s["A38"] = "shelf area, ft2"
    s.ignore("B38", "=B9*B10/144")
    s["A39"] = "battery hours"
    s.ignore("B39", "=110/6.5*0.8")
    s["A40"] = "clearance check"
    s.ignore("B40", '=IF(B35<B8,"CLEAR","HITS")')
    return b


def clean():
    b = Book("carillon_tower_all_right", "Nothing wrong: many right twins of the same formulas, words such as old and check all over", "resaved")
    s = b.sheet("Bells")
    s["A1"] = "Clock room electronics under the bells: isolator check, old and new formulas side by side for training"
    s.across("A3", "Unit", "m [kg]", "mounts", "k [N/mm]", "zeta [%]", "f [Hz]", "floor a [m/s²] peak", "fn [Hz]", "fn old [Hz]", "fn via sag [Hz]", "sag [mm]", "sag old [mm]", "r", "r squared check [-]", "T", "T old", "T logs", "T split", "R", "R old", "isolation", "isolation old [%]", "T [dB]", "T old [dB]", "box a [m/s²] peak", "floor x [µm] peak", "floor x [µm] p-p", "floor v [mm/s] rms", "stretch [µm] peak", "stretch old [µm] peak", "force/mount [N] peak", "zeta from c [-]", "c/mount [Ns/m]", "Q", "eta", "T peak", "lag [deg]")
    s.grid("A4", ["amp", 12.5, 4, 9.2, 6, 22, 1.8], ["clock", 31, 4, 17, 5, 14.5, 0.9], ["router", 6.8, 4, 4.1, 8, 31, 2.4], ["UPS", 84, 6, 28, 4, 18, 1.3], ["dimmer", 22, 4, 11.5, 7, 26.5, 1.6])
    c = lambda x: f"{x}4:{x}8"
    m, n, k, z, f, rr, fn = c("B") + "|kg", c("C") + "|1", c("D") + "|N/mm", c("E") + "|%", c("F") + "|Hz", c("M") + "|1", c("H") + "|Hz"
    s.f(c("H"), "=SQRT(1000*D4*C4/B4)/2/PI()", "natural-frequency", out="Hz", k=k, n=n, m=m)
    s.f(c("I"), "=5.033*SQRT(D4*C4/B4)", "natural-frequency", out="Hz", k=k, n=n, m=m, note="sqrt(1000)/2pi = 5.0329")
    s.f(c("J"), "=0.5/SQRT(K4/1000)", "natural-frequency", out="Hz", d=c("K") + "|mm", tol=4e-3, note="0.5/sqrt(m)")
    s.f(c("K"), "=9.81*B4/C4/D4", "static-deflection", out="mm", m=m, n=n, k=k)
    s.f(c("L"), "=248.4/H4^2", "static-deflection", out="mm", fn=fn, alsoQ=["required-static-deflection"])
    s.f(c("M"), "=F4/H4", "frequency-ratio", f=f, fn=fn)
    s.f(c("N"), "=M4*M4", "helper", r=rr, model=lambda a: a.r**2)
    s.f(c("O"), "=SQRT((1+(2*E4/100*M4)^2)/((1-M4^2)^2+(2*E4/100*M4)^2))", "absolute-transmissibility", r=rr, z=z)
    s.f(c("P"), "=SQRT((1+(E4*M4/50)^2)/((M4*M4-1)*(M4*M4-1)+(E4*M4/50)^2))", "absolute-transmissibility", r=rr, z=z)
    s.f(c("Q"), "=EXP(0.5*(LN(1+POWER(0.02*E4*M4,2))-LN(POWER(1-POWER(M4,2),2)+POWER(0.02*E4*M4,2))))", "absolute-transmissibility", r=rr, z=z)
    s.f(c("R"), "=SQRT(H4^4+(0.02*E4*F4*H4)^2)/SQRT((H4^2-F4^2)^2+(0.02*E4*F4*H4)^2)", "absolute-transmissibility", f=f, fn=fn, z=z)
    s.f(c("S"), "=M4^2/SQRT((1-M4^2)^2+(0.02*E4*M4)^2)", "relative-transmissibility", r=rr, z=z)
    s.f(c("T"), "=1/SQRT((1-1/M4^2)^2+(0.02*E4/M4)^2)", "relative-transmissibility", r=rr, z=z, note="divided through by r^2")
    s.f(c("U"), "=1-O4", "isolation-efficiency", T=c("O") + "|1")
    s.number(c("U"), "0.0%")
    s.f(c("V"), "=100-100*O4", "isolation-efficiency", out="%", T=c("O") + "|1")
    s.f(c("W"), "=20*LOG10(O4)", "transmissibility-db", out="dB", T=c("O") + "|1")
    s.f(c("X"), "=10*LOG10((1+(0.02*E4*M4)^2)/((1-M4^2)^2+(0.02*E4*M4)^2))", "transmissibility-db", out="dB", r=rr, z=z, model=lambda a: 20 * log10(absolute(a)))
    s.f(c("Y"), "=G4*O4", "payload-motion", out="m/s2", A=c("G") + "|m/s2", T=c("O") + "|1")
    s.f(c("Z"), "=G4/(2*PI()*F4)^2*10^6", "motion-conversion", out="µm", A=c("G") + "|m/s2", f=f, model=lambda a: a.A / a.w() ** 2)
    s.f(c("AA"), "=2*Z4", "motion-conversion", out="µm", x=c("Z") + "|µm", model=lambda a: 2 * a.x)
    s.f(c("AB"), "=G4/(2*PI()*F4)*1000/2^0.5", "motion-conversion", out="mm/s", A=c("G") + "|m/s2", f=f, model=lambda a: a.A / a.w() / sqrt(2))
    s.f(c("AC"), "=Z4*S4", "relative-displacement", out="µm", X=c("Z") + "|µm", R=c("S") + "|1", model=lambda a: a.X * a.R)
    s.f(c("AD"), "=G4*1E6/(2*PI()*H4)^2/SQRT((1-M4^2)^2+(0.02*E4*M4)^2)", "relative-displacement", out="µm", A=c("G") + "|m/s2", fn=fn, r=rr, z=z, model=lambda a: a.A / (2 * pi * a.fn) ** 2 * relative(a) / a.r**2)
    s.f(c("AE"), "=AC4*1E-6*SQRT((D4*1000)^2+(2*PI()*F4*AG4)^2)", "mount-force", out="N", Z=c("AC") + "|µm", k=k, c=c("AG") + "|N.s/m", f=f, model=lambda a: a.Z * abs(complex(a.k, a.w() * a.c)))
    s.f(c("AF"), "=AG4*C4/(2*B4*2*PI()*H4)", "damping-ratio", c=c("AG") + "|N.s/m", n=n, m=m, fn=fn, model=lambda a: a.c * a.n / (2 * a.m * 2 * pi * a.fn))
    s.f(c("AG"), "=0.02*E4*SQRT(1000*D4*B4/C4)", "damping-coefficient", out="N.s/m", z=z, k=k, m=m, n=n, model=lambda a: 2 * a.z * sqrt(a.k * a.m / a.n))
    s.f(c("AH"), "=50/E4", "damping-ratio", z=z, model=lambda a: 1 / (2 * a.z))
    s.f(c("AI"), "=E4/50", "damping-ratio", z=z, model=lambda a: 2 * a.z)
    s.f(c("AJ"), "=SQRT((1+(0.02*E4)^2*(SQRT(1+8*(E4/100)^2)-1)/(4*(E4/100)^2))/((1-(SQRT(1+8*(E4/100)^2)-1)/(4*(E4/100)^2))^2+(0.02*E4)^2*(SQRT(1+8*(E4/100)^2)-1)/(4*(E4/100)^2)))", "peak-transmissibility", z=z)
    s.f(c("AK"), "=DEGREES(ATAN2(1-M4^2,0.02*E4*M4)-ATAN(0.02*E4*M4))", "absolute-phase", out="deg", r=rr, z=z, note="difference of two angles")
    s["A11"] = "Strike energy J"
    s.ignore("C11", "=0.5*6.2*2.4^2")
    s["A12"] = "Rope force N"
    s.ignore("C12", "=6.2*9.81*0.35/0.12")
    s["A13"] = "Sound level at door dB"
    s.ignore("C13", "=104-20*LOG10(18)-11")
    s["A14"] = "Visitors per year"
    s.ignore("C14", "=52*6*35")
    return b


BOOKS = [row_slips, only_wrong, patrol, clean]
