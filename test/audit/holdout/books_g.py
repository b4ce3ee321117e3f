"""Two more sheets with few right neighbours: an operator's cab, a panel under random vibration."""
from math import pi, sqrt

from sheet import Book


def cab():
    b = Book("quarry_screen_cab_variants", "Variants across, kgf/mm, percent damping, dynamic factor; most wrong lines stand alone", "shared")
    s = b.sheet("Cab")
    s["A1"] = "Operator cab beside the vibrating screen - four offers"
    s.across("B2", "Offer 1", "Offer 2", "Offer 3", "Offer 4")
    c = lambda at: f"B{at}:E{at}"

    def line(at, label, *what, mistake=None, **kw):
        s[f"A{at}"] = label
        if isinstance(what[0], str) and len(what) > 1:
            s.f(c(at), what[0], what[1], mistake, **kw)
        elif isinstance(what[0], str):
            s.ignore(c(at), what[0])
        else:
            s.across(f"B{at}", *what)

    line(3, "Cab with operator, kg", 690, 690, 740, 740)
    line(4, "Mounts", 4, 6, 4, 6)
    line(5, "Static stiffness of a mount, kgf/mm", 9.5, 6.8, 8.2, 5.1)
    line(6, "Dynamic/static", 1.35, 1.35, 1.2, 1.5)
    line(7, "Damping, % of critical", 8, 8, 6, 11)
    line(8, "Screen speed, rpm", 930, 930, 930, 930)
    line(9, "Platform motion, mm p-p", 0.46, 0.46, 0.46, 0.46)
    m, n, ks, kap, z, sp, X = (c(3) + "|kg", c(4) + "|1", c(5) + "|kgf/mm", c(6) + "|1", c(7) + "|%", c(8) + "|rpm", c(9) + "|mm")
    rr, f = c(15) + "|1", c(14) + "|Hz"
    line(11, "Weight per mount, kgf", "=B3*9.81/B4", "mount-load", mistake="mass-weight-mixup", out="kgf", m=m, n=n, note="newtons under kgf")
    line(12, "Dynamic stiffness of all mounts, N/mm", "=B5*9.81*B4", "mount-stiffness", mistake="static-stiffness-for-dynamic", out="N/mm", k=ks, n=n, kappa=kap)
    line(13, "Natural frequency (dynamic), Hz", "=SQRT(B5*B6*B4*9810/B3)/(2*PI())", "natural-frequency", out="Hz", k=ks, n=n, kappa=kap, m=m)
    line(14, "Screen frequency, Hz", "=B8/60", "frequency-conversion", out="Hz", f=sp)
    line(15, "f/fn", "=B14/B13", "frequency-ratio", f=f, fn=c(13) + "|Hz")
    line(16, "Transmissibility", "=1/(B15^2-1)", "absolute-transmissibility", mistake="undamped-form", r=rr, z=z)
    line(17, "Undamped transmissibility at twice the speed", "=1/(1-(2*B15)^2)", "absolute-transmissibility", mistake="absolute-value-missing", r=rr, model=lambda a: 1 / abs(1 - 4 * a.r**2))
    line(18, "Undamped isolation, %", "=100*(1-1/(1-B15^2))", "isolation-efficiency", mistake="absolute-value-missing", out="%", r=rr)
    line(19, "Stretch ratio of mounts", "=B15^2/SQRT((1-B15^2)^2+(B7/50*B15)^2)", "relative-transmissibility", r=rr, z=z)
    line(20, "Stretch of mounts, mm p-p", "=B9*B15^2/((1-B15^2)^2+(B7/50*B15)^2)", "relative-displacement", mistake="square-root-missing", out="mm", X=X, r=rr, z=z)
    line(21, "Lag of stretch, deg", "=DEGREES(ATAN2(1-B15^2,2*B7*B15))", "relative-phase", mistake="percent-as-ratio", out="deg", r=rr, z=z)
    line(22, "Platform acceleration, m/s² peak", "=(2*PI()*B14)^2*B9/2", "motion-conversion", mistake="length-unit", out="m/s2", X=X, f=f, model=lambda a: a.w() ** 2 * a.X / 2, note="mm/s2 under m/s2")
    line(23, "Platform acceleration, g rms", "=(2*PI()*B14)^2*B9/2/9810", "motion-conversion", mistake="amplitude-kind", out="g", X=X, f=f, model=lambda a: a.w() ** 2 * a.X / 2 / sqrt(2))
    line(24, "Platform velocity, mm/s rms", "=2*PI()*B14*B9/2/SQRT(2)", "motion-conversion", out="mm/s", X=X, f=f, model=lambda a: a.w() * a.X / 2 / sqrt(2))
    line(25, "Peak transmissibility at run-up", "=SQRT(1+1/(2*B7)^2)", "peak-transmissibility", mistake="percent-as-ratio", z=z, model=lambda a: sqrt(1 + 1 / (2 * a.z) ** 2))
    line(26, "Highest fn for 85 % (undamped), Hz", "=B14/(1+1/0.15)", "required-natural-frequency", mistake="square-root-missing", out="Hz", f=f, E="0.85|1")
    line(27, "Least static deflection for 85 % (undamped), mm", "=(15.76/B8)^2*(1+1/0.15)", "required-static-deflection", mistake="speed-unit", out="mm", f=sp, E="0.85|1")
    line(28, "Dynamic stiffness per mount for fn 5 Hz, kgf/mm", "=B3*(2*PI()*5)^2/B4/1000", "required-stiffness", mistake="mass-weight-mixup", out="kgf/mm", m=m, n=n, fn="5|Hz", alsoQ=["mount-stiffness"], note="N/mm under kgf/mm")
    line(29, "Critical damping, kN s/m", "=2*SQRT(B5*B6*B4*1000*B3)/1000", "critical-damping", mistake="mass-weight-mixup", out="kN.s/m", k=ks, kappa=kap, n=n, m=m, note="kgf/mm as N/mm")
    line(30, "Damper constant of all mounts, kN s/m", "=2*B7/100*B3*2*PI()*B13/1000", "damping-coefficient", out="kN.s/m", z=z, m=m, fn=c(13) + "|Hz", model=lambda a: 2 * a.z * a.m * 2 * pi * a.fn)
    line(31, "Damper constant of one mount, kN s/m", "=2*B7/100*B3*B13/1000/B4", "damping-coefficient", mistake="angular-cyclic-mixup", out="kN.s/m", z=z, m=m, n=n, fn=c(13) + "|Hz", model=lambda a: 2 * a.z * a.m * 2 * pi * a.fn / a.n)
    line(32, "Cab motion, mm p-p", "=B9*SQRT((1+(B7/50*B15)^2)/((1-B15^2)^2+(B7/50*B15)^2))", "payload-motion", out="mm", X=X, r=rr, z=z)
    line(33, "Force in one mount, spring and damper, N peak", "=B9/2*B19*SQRT((B5*B6*B4*9.81)^2+(2*PI()*B14*B30)^2)", "mount-force", mistake="total-for-per-mount", out="N", X=X, R=c(19) + "|1", k=ks, kappa=kap, n=n, f=f, c=c(30) + "|kN.s/m",
         model=lambda a: a.X / 2 * a.R * abs(complex(a.k * a.kappa * a.n, a.w() * a.c)) / a.n, alsoM=["mount-count-missing"])
    line(34, "Static sag, mm", "=B3/(B5*B4)", "static-deflection", out="mm", m=m, k=ks, n=n, note="kg over kgf/mm: right")
    line(36, "Glass area, m²", "=2*1.4*0.9+0.8*0.9")
    line(37, "Heat load, W", "=B36*5.7*22")
    line(38, "Offer with VAT, EUR", "=B4*61*1.2")
    return b


def panel():
    b = Book("antenna_panel_random_modes", "Random vibration by mode and by band: loss factors, response spectra, band sums", "strings")
    s = b.sheet("Modes")
    s["B1"] = "Antenna panel on isolators, flat base spectrum around each mode"
    s.across("B3", "Mode", "f_n (Hz)", "eta", "S_base (g²/Hz)", "Q", "Q (report)", "Grms", "Grms = 1.25·sqrt(fn·Q·S)", "Grms upper deck", "S_base ((m/s²)²/Hz)", "a_rms (m/s²)", "a_rms (m/s²) deck B", "z_rms (mm)", "z 3σ (mm)", "z 3σ (mm) deck B", "G 3σ", "Grms deck C", "T at fn", "peak T")
    rows = [(1, 58, 0.09, 0.03), (2, 96, 0.11, 0.05), (3, 141, 0.08, 0.05), (4, 187, 0.13, 0.05), (5, 263, 0.1, 0.04), (6, 390, 0.15, 0.02)]
    s.grid("B4", *[list(x) for x in rows])
    c = lambda x: f"{x}4:{x}9"
    fn, eta, S, Q = c("C") + "|Hz", c("D") + "|1", c("E") + "|g2/Hz", c("F") + "|1"
    sz = lambda a: a.sigma / (2 * pi * a.fn) ** 2
    s.f(c("F"), "=1/D4", "damping-ratio", eta=eta, model=lambda a: 1 / a.eta)
    s.f(c("G"), "=1/(2*D4)", "damping-ratio", "loss-factor-as-damping-ratio", eta=eta, model=lambda a: 1 / a.eta)
    g = s.f(c("H"), "=(PI()/2*C4*F4*E4)^0.5", "random-response-rms", out="g", fn=fn, Q=Q, S=S)
    g.over("H7", "=(PI()/2*C6*F7*E7)^0.5", "reference-slip", alsoM=["fill-break"])
    s.f(c("I"), "=1.25*SQRT(C4*F4*E4)", "random-response-rms", out="g", fn=fn, Q=Q, S=S, tol=4e-3, note="sqrt(pi/2) = 1.2533")
    s.f(c("J"), "=SQRT(C4*F4*E4)", "random-response-rms", "half-pi-missing", out="g", fn=fn, Q=Q, S=S)
    s.f(c("K"), "=E4*96.17", "helper", out="(m/s2)2/Hz", S=S, model=lambda a: a.S)
    Sm = c("K") + "|(m/s2)2/Hz"
    s.f(c("L"), "=SQRT(PI()/2*C4*F4*K4)", "random-response-rms", out="m/s2", fn=fn, Q=Q, S=Sm)
    s.f(c("M"), "=SQRT(C4*F4*K4)", "random-response-rms", "half-pi-missing", out="m/s2", fn=fn, Q=Q, S=Sm)
    s.f(c("N"), "=1000*L4/(2*PI()*C4)^2", "random-response-rms", out="mm", sigma=c("L") + "|m/s2", fn=fn, model=sz, alsoQ=["relative-displacement"])
    s.f(c("O"), "=N4", "random-response-rms", "amplitude-kind", out="mm", sigma=c("N") + "|mm", model=lambda a: 3 * a.sigma, alsoQ=["relative-displacement"], note="rms carried over as 3 sigma")
    s.f(c("P"), "=3*H4/(2*PI()*C4)^2", "random-response-rms", "?", out="mm", sigma=c("H") + "|g", fn=fn, model=lambda a: 3 * sz(a), alsoQ=["relative-displacement"], note="g not brought to mm/s2")
    g = s.f(c("Q"), "=H4*3", "random-response-rms", out="g", sigma=c("H") + "|g", model=lambda a: 3 * a.sigma)
    g.over("Q5", 10.1, "value-typed-over")
    s.f(c("R"), "=PI()/2*C4*F4*E4", "random-response-rms", "square-root-missing", out="g", fn=fn, Q=Q, S=S)
    s.f(c("S"), "=SQRT(1+F4^2)", "absolute-transmissibility", Q=Q, model=lambda a: sqrt(1 + a.Q**2), alsoQ=["peak-transmissibility"])
    s.f(c("T"), "=F4^2", "peak-transmissibility", "?", Q=Q, model=lambda a: sqrt(1 + a.Q**2), note="Q squared")
    p = b.sheet("Bands")
    p["A1"] = "Box on its own isolators, response by band"
    p.grid("A2", ["fn", 44, "Hz"], ["damping ratio", 0.07, "-"])
    p.across("A5", "band Hz", "width Hz", "S in g²/Hz", "T", "S out g²/Hz", "S out g²/Hz draft", "g rms in band, base", "g rms in band, box", "g rms in band, box draft", "T²", "T dB")
    p.down("A6", 20, 31.5, 50, 80, 125, 200, 315, 500)
    p.down("B6", 4.6, 7.3, 11.5, 18.3, 29, 46, 73, 116)
    p.down("C6", 0.004, 0.01, 0.02, 0.04, 0.04, 0.04, 0.025, 0.012)
    c = lambda x: f"{x}6:{x}13"
    T, S, B = c("D") + "|1", c("C") + "|g2/Hz", c("B") + "|Hz"
    p.f(c("D"), "=SQRT((1+(2*$B$3*A6/$B$2)^2)/((1-(A6/$B$2)^2)^2+(2*$B$3*A6/$B$2)^2))", "absolute-transmissibility", f=c("A") + "|Hz", fn="B2|Hz", z="B3|1")
    p.f(c("E"), "=C6*D6^2", "helper", out="g2/Hz", S=S, T=T, model=lambda a: a.S * a.T**2)
    p.f(c("F"), "=C6*D6", "helper", "?", out="g2/Hz", S=S, T=T, model=lambda a: a.S * a.T**2, note="a spectrum takes the square of T")
    p.f(c("G"), "=SQRT(C6*B6)", "overall-rms", out="g", S=S, f2=B, model=lambda a: sqrt(a.S * a.f2), alsoQ=["random-response-rms", "helper"])
    p.f(c("H"), "=G6*D6", "payload-motion", out="g", A=c("G") + "|g", T=T, alsoQ=["random-response-rms", "overall-rms"])
    p.f(c("I"), "=G6*D6^2", "payload-motion", "?", out="g", A=c("G") + "|g", T=T, alsoQ=["random-response-rms", "overall-rms"], note="T squared on an rms")
    p.f(c("J"), "=D6^2", "helper", T=T, model=lambda a: a.T**2)
    p.f(c("K"), "=20*LOG10(J6)", "transmissibility-db", "decibel-factor", out="dB", T=T, note="20 log on the squared T")
    ys = lambda x: x + "6:" + x + "13[]|g"
    rss = lambda a: sqrt(sum(v * v for v in a.y))
    for at, label, formula, col, mistake, note in (
        (15, "base overall g rms", "=SQRT(SUMSQ(G6:G13))", "G", None, ""),
        (16, "box overall g rms", "=SQRT(SUMPRODUCT(H6:H13,H6:H13))", "H", None, ""),
        (17, "box overall g rms, slide 7", "=SUMSQ(H6:H13)", "H", "square-root-missing", ""),
        (18, "box overall g rms, slide 8", "=SQRT(SUMSQ(H6:H8))", "H", "reference-slip", "sum stops after three bands"),
        (19, "box overall g rms, slide 9", "=SQRT(SUMSQ(G6:G13))", "G", "reference-slip", "base column summed"),
    ):
        p[f"A{at}"] = label
        src = "H" if at == 19 else col
        p.f(f"D{at}", formula, "overall-rms", mistake, out="g", y=ys(src), model=rss, note=note, alsoM=["fill-break"] if mistake == "reference-slip" else [])
    p["A20"] = "box overall m/s² rms"
    p.f("D20", "=D16/9.81", "overall-rms", "mass-weight-mixup", out="m/s2", sigma="D16|g", model=lambda a: a.sigma, alsoQ=["motion-conversion"], note="divided by g")
    p["A21"] = "box peak, 3 sigma, g"
    p.f("D21", "=3*D16", "random-response-rms", out="g", sigma="D16|g", model=lambda a: 3 * a.sigma, alsoQ=["overall-rms"])
    p["A23"] = "panel area m²"
    p.ignore("D23", "=1.2*0.8")
    p["A24"] = "panel mass per area kg/m²"
    p.ignore("D24", "=8.4/D23")
    p["A25"] = "test hours"
    p.ignore("D25", "=3*120/3600")
    return b


BOOKS = [cab, panel]
