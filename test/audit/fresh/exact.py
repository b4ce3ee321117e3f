"""Exact single-degree-of-freedom relations, coherent units, written from the equation of motion (no sheet formula is reused here)."""
import cmath
import math

G = 9.80665
LB = 0.45359237
IN = 0.0254
LBF = LB * G
GIN = G / IN  # in/s2
PI = math.pi
W = 2 * math.pi
sqrt = math.sqrt


def H(r, z):
    """Complex ratio of payload motion to base motion."""
    return (1 + 2j * z * r) / (1 - r * r + 2j * z * r)


def T(r, z=0.0):
    return abs(H(r, z))


def Th(r, eta):
    """Absolute transmissibility with a loss factor."""
    return abs((1 + 1j * eta) / (1 - r * r + 1j * eta))


def R(r, z=0.0):
    return abs(r * r / (1 - r * r + 2j * z * r))


def lag(r, z):
    """Lag of the payload behind the base, degrees."""
    return -math.degrees(cmath.phase(H(r, z))) % 360


def rlag(r, z):
    """Lag of the relative motion behind the base, degrees."""
    return math.degrees(cmath.phase(1 - r * r + 2j * z * r))


def Tmax(z):
    """Highest transmissibility over all speeds."""
    r2 = (sqrt(1 + 8 * z * z) - 1) / (4 * z * z)
    return T(sqrt(r2), z)


def r_for(t, z=0.0):
    """Frequency ratio above resonance at which T = t."""
    a, b, c = t * t, t * t * (4 * z * z - 2) - 4 * z * z, t * t - 1
    return sqrt((-b + sqrt(b * b - 4 * a * c)) / (2 * a))


def fn(k, m):
    return sqrt(k / m) / W


def rss(v):
    return sqrt(sum(x * x for x in v))
