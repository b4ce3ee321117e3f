"""The exact model: base excitation of one mass on a spring and damper, in SI, written apart from every sheet formula."""
from math import atan2, log10, pi, sqrt

G, LB, IN = 9.80665, 0.45359237, 0.0254
LBF = LB * G
UNIT = {
    "1": 1, "%": 0.01, "dB": 1, "": 1, "s": 1, "ms": 1e-3, "deg": pi / 180, "rad": 1,
    "Hz": 1, "kHz": 1e3, "rpm": 1 / 60, "cpm": 1 / 60, "rad/s": 1 / (2 * pi), "krpm": 1000 / 60,
    "m": 1, "cm": 0.01, "mm": 1e-3, "µm": 1e-6, "nm": 1e-9, "in": IN, "mil": IN / 1000,
    "m/s": 1, "cm/s": 0.01, "mm/s": 1e-3, "µm/s": 1e-6, "in/s": IN,
    "m/s2": 1, "mm/s2": 1e-3, "g": G, "mg": G / 1000, "in/s2": IN, "cm/s2": 0.01,
    "kg": 1, "t": 1000, "lb": LB, "N": 1, "kN": 1000, "daN": 10, "kgf": G, "lbf": LBF,
    "N/m": 1, "N/mm": 1e3, "kN/m": 1e3, "kN/mm": 1e6, "MN/m": 1e6, "daN/mm": 1e4, "kgf/mm": G * 1e3, "lbf/in": LBF / IN,
    "N.s/m": 1, "kN.s/m": 1e3, "N.s/mm": 1e3, "lbf.s/in": LBF / IN,
    "g2/Hz": G * G, "(m/s2)2/Hz": 1, "cm2": 1e-4, "mm2": 1e-6, "MPa": 1e6, "N/mm2": 1e6,
}
ROLE = dict(
    f="frequency", fn="natural_frequency", r="frequency_ratio", z="damping_ratio", eta="loss_factor", Q="quality_factor",
    lam="logarithmic_decrement", c="damping_coefficient", k="stiffness", m="mass", W="weight", n="mount_count",
    kappa="dynamic_factor", d="static_deflection", T="transmissibility", E="isolation_efficiency", R="relative_transmissibility",
    X="base_displacement", V="velocity", A="acceleration", x="displacement", Z="relative_displacement", S="spectral_density",
    L="level", F="mount_load", teeth="events_per_turn", k1="stiffness_1", k2="stiffness_2", area="loaded_area", t="thickness",
    mod="modulus", sigma="rms", mult="multiple", f1="lower_frequency", f2="upper_frequency", y="values", fr="frequencies",
    x1="first_amplitude", xn="later_amplitude", cyc="cycles", bands="third_octave_levels", cc="critical_damping", order="order",
)


class Case:
    """What one cell is given, in SI, and what follows from it."""

    def __init__(self, given):
        self.__dict__.update(given)

    def has(self, *roles):
        return all(r in self.__dict__ for r in roles)

    def mass(self):
        return self.m if self.has("m") else self.W / G

    def weight(self):
        return self.W if self.has("W") else self.m * G

    def stiffness(self):
        return self.k * getattr(self, "n", 1) * getattr(self, "kappa", 1)

    def fnat(self):
        if self.has("fn"):
            return self.fn
        if self.has("d"):
            return sqrt(G / self.d) / (2 * pi)
        return sqrt(self.stiffness() / self.mass()) / (2 * pi)

    def ratio(self):
        return self.r if self.has("r") else self.f / self.fnat()

    def zeta(self):
        if self.has("z"):
            return self.z
        if self.has("eta"):
            return self.eta / 2
        if self.has("Q"):
            return 1 / (2 * self.Q)
        if self.has("lam"):
            return self.lam / sqrt(4 * pi**2 + self.lam**2)
        if self.has("c"):
            return self.c / (self.cc if self.has("cc") else critical(self))
        return 0.0

    def trans(self):
        return self.T if self.has("T") else absolute(self)

    def wanted(self):
        return self.T if self.has("T") else 1 - self.E

    def fwant(self):
        """The highest natural frequency that keeps T."""
        if self.has("fn"):
            return self.fn
        t, z = self.wanted(), self.zeta()
        b, c = t * t * (4 * z * z - 2) - 4 * z * z, t * t - 1
        return self.f / sqrt((-b + sqrt(b * b - 4 * t * t * c)) / (2 * t * t))

    def w(self):
        return 2 * pi * self.f


def absolute(a):
    r, z = a.ratio(), a.zeta()
    return abs(complex(1, 2 * z * r) / complex(1 - r * r, 2 * z * r))


def absolute_hysteretic(a):
    eta = a.eta if a.has("eta") else 2 * a.zeta()
    return abs(complex(1, eta) / complex(1 - a.ratio() ** 2, eta))


def relative(a):
    r, z = a.ratio(), a.zeta()
    return r * r / abs(complex(1 - r * r, 2 * z * r))


def critical(a):
    return 2 * sqrt(a.stiffness() * a.mass())


def peak(a):
    z = a.zeta()
    r = sqrt((sqrt(1 + 8 * z * z) - 1) / (4 * z * z))
    return abs(complex(1, 2 * z * r) / complex(1 - r * r, 2 * z * r))


def deflection(a):
    return G / (2 * pi * a.fn) ** 2 if a.has("fn") else a.weight() / a.stiffness()


def miles(a):
    return sqrt(pi / 2 * a.fnat() / (2 * a.zeta()) * a.S)


def sway(a):
    """Relative displacement from the base's displacement or acceleration."""
    return relative(a) * (a.X if a.has("X") else a.A / a.w() ** 2)


MODEL = {
    "frequency-conversion": lambda a: a.f * getattr(a, "teeth", 1),
    "natural-frequency": Case.fnat,
    "frequency-ratio": Case.ratio,
    "damping-ratio": Case.zeta,
    "damping-coefficient": lambda a: a.zeta() * critical(a),
    "critical-damping": critical,
    "static-deflection": deflection,
    "required-static-deflection": lambda a: G / (2 * pi * a.fwant()) ** 2,
    "required-natural-frequency": Case.fwant,
    "required-stiffness": lambda a: a.mass() * (2 * pi * a.fwant()) ** 2 / getattr(a, "n", 1),
    "mount-stiffness": Case.stiffness,
    "mount-load": lambda a: a.weight() / getattr(a, "n", 1),
    "absolute-transmissibility": absolute,
    "relative-transmissibility": relative,
    "isolation-efficiency": lambda a: 1 - a.trans(),
    "transmissibility-db": lambda a: 20 * log10(a.trans()),
    "absolute-phase": lambda a: atan2(2 * a.zeta() * a.ratio() ** 3, 1 - a.ratio() ** 2 + (2 * a.zeta() * a.ratio()) ** 2),
    "relative-phase": lambda a: atan2(2 * a.zeta() * a.ratio(), 1 - a.ratio() ** 2),
    "peak-transmissibility": peak,
    "payload-motion": lambda a: a.trans() * (a.X if a.has("X") else a.A if a.has("A") else a.V),
    "relative-displacement": sway,
    "random-response-rms": miles,
}
