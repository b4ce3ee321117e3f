"""Bell tower: one engineer's comparison of the many ways to write the same transmissibility."""
from book import Book
from exact import *


def tower():
    b = Book("bell_tower_clock_drive", "one table of transmissibility spelled many ways, data block beside it, efficiency in three forms")
    s = b.sheet("Compare")
    s.put("A1", "Clock drive in the bell tower: checking the old sheets against each other")
    s.put("P1", [["Mass", 145, "kg"], ["Spring set", 118, "kN/m"], ["Damper set c", 410, "N s/m"], ["Damping ratio", None, ""], ["Loss factor of pad (other mount)", 0.18, ""], ["omega_n", None, "rad/s"]])
    s.g("Q4", "=Q3/(2*SQRT(Q2*1000*Q1))", "DR", None, "damping_coefficient=Q3 N·s/m; stiffness=Q2 kN/m; mass=Q1 kg", lambda c, k, m: c / (2 * sqrt(k * 1000 * m)), "1")
    s.g("Q6", "=(Q2*1000/Q1)^(1/2)", "NF", None, "stiffness=Q2 kN/m; mass=Q1 kg", lambda k, m: sqrt(k * 1000 / m), "rad/s")
    s.put("A3", ["Motor", "Frequency", "Ratio", "T, standard", "T with SUMSQ", "T from c, k, m", "T undamped", "T of the pad (loss factor)", "T quick rule (fn/f)^2", "T from relative phase", "Isolation", "Isolation", "Old sheet A: T", "Old sheet B: T of the pad", "Old sheet C: isolation"])
    s.put("A4", ["rpm", "Hz", "f/fn", "-", "-", "-", "-", "-", "-", "-", "fraction", "% undamped", "-", "-", "%"])
    s.down("A5", [420, 560, 710, 940, 1180, 1420, 2850])
    r, z = "frequency_ratio=C5:C11", "damping_ratio=Q4"
    s.g("B5:B11", "=A5/60", "FC", None, "speed=A5:A11 rpm", lambda n: n / 60, "Hz")
    s.g("C5:C11", "=2*PI()*B5/$Q$6", "FR", None, "frequency=B5:B11 Hz; natural_frequency=Q6 rad/s", lambda f, w: W * f / w, "1")
    s.g("D5:D11", "=SQRT(1+(2*$Q$4*C5)^2)/SQRT((1-C5^2)^2+(2*$Q$4*C5)^2)", "AT", None, f"{r}; {z}", T, "1")
    s.g("E5:E11", "=SQRT(SUMSQ(1,2*$Q$4*C5)/SUMSQ(1-C5^2,2*$Q$4*C5))", "AT", None, f"{r}; {z}", T, "1")
    s.g("F5:F11", "=SQRT(($Q$2^2*10^6+($Q$3*2*PI()*B5)^2)/(($Q$2*1000-$Q$1*(2*PI()*B5)^2)^2+($Q$3*2*PI()*B5)^2))", "AT", None, "stiffness=Q2 kN/m; damping_coefficient=Q3 N·s/m; frequency=B5:B11 Hz; mass=Q1 kg", lambda k, c, f, m: abs((k * 1000 + 1j * c * W * f) / (k * 1000 - m * (W * f) ** 2 + 1j * c * W * f)), "1")
    s.g("G5:G11", "=ABS(1/(1-C5*C5))", "AT", None, r, T, "1", "headed undamped")
    s.g("H5:H11", "=POWER((1+$Q$5^2)/(POWER(1-C5^2,2)+$Q$5^2),1/2)", "AT", None, f"{r}; loss_factor=Q5", Th, "1", "headed loss factor")
    s.g("I5:I11", "=1/C5^2", "AT", None, r, lambda r: 1 / r ** 2, "1", "labelled quick rule")
    s.g("J5:J11", "=IMABS(IMSUM(1,IMDIV(C5^2,COMPLEX(1-C5^2,2*$Q$4*C5))))", "AT", None, f"{r}; {z}", T, "1", "payload = base + relative motion")
    s.g("K5:K11", "=1-D5", "IE", None, "transmissibility=D5:D11", lambda t: 1 - t, "1")
    s.g("L5:L11", "=(C5^2-2)/(C5^2-1)*100", "IE", None, r, lambda r: 100 * (1 - T(r)), "%", "closed form above resonance, headed undamped")
    s.g("M5:M11", "=SQRT((1+(2*$Q$4*C5)^2)/((1-C5^2)^2+2*$Q$4*C5^2))", "AT", "damping-not-squared", f"{r}; {z}", T, "1", "brackets lost in the denominator", m=["sign-precedence"])
    s.g("N5:N11", "=SQRT((1+(2*$Q$5*C5)^2)/((1-C5^2)^2+(2*$Q$5*C5)^2))", "AT", "loss-factor-as-damping-ratio", f"{r}; loss_factor=Q5", lambda r, e: T(r, e / 2), "1", "cell of the loss factor taken as damping ratio")
    s.g("O5:O11", "=100*(1-D5^2)", "IE", "other", "transmissibility=D5:D11", lambda t: 100 * (1 - t), "%", "energy, not motion", m=["efficiency-not-of-motion"])
    s.put("P9", [["Bells rung per year", 8760], ["Seconds per strike", 1.5], ["Motor hours"]])
    s.ig("Q11", "=Q9*Q10/3600")
    s.ig("A12", "=AVERAGE(A5:A11)")
    return b


def books():
    return [tower()]
