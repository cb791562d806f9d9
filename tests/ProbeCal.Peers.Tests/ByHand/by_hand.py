"""What water in equilibrium with a gas phase holds, worked out once more from the papers' formulas: no code of the library, no package.

Lines in:  gas equation celsius salinity hectopascal moleFraction humidityPercent uCelsius uSalinity uHectopascal uEquation
Lines out: vapour (hPa), partial pressure (hPa), mg/L, umol/L, umol/kg, mL/L, and the standard uncertainty of the partial pressure and of mg/L by difference quotients.
"""
import csv
import math
import os
import re
import sys

ATM = 1013.25
R = 82.05746  # cm3 atm / (mol K), the value of Weiss 1974

# Atomic weights (IUPAC 2007, from memory): molar masses are added up here.
WEIGHT = {'H': 1.00794, 'He': 4.002602, 'C': 12.0107, 'N': 14.0067, 'O': 15.9994, 'F': 18.9984032, 'Ne': 20.1797, 'S': 32.065,
          'Cl': 35.453, 'Ar': 39.948, 'Kr': 83.798, 'Xe': 131.293}
FORMULA = {'O2': 'O2', 'N2': 'N2', 'Ar': 'Ar', 'Ne': 'Ne', 'He': 'He', 'Kr': 'Kr', 'Xe': 'Xe', 'CO2': 'CO2', 'N2O': 'N2O', 'CH4': 'CH4',
           'CO': 'CO', 'H2': 'H2', 'SF6': 'SF6', 'CFC-11': 'CCl3F', 'CFC-12': 'CCl2F2', 'H2S': 'H2S', 'O3': 'O3', 'NH3': 'NH3', 'C2H6': 'C2H6'}
# Litres of gas (0 degC, 1 atm) per mole where the real gas is used; 22.414 elsewhere.
VOLUME = {'O2': 31.9988 / 1.42905, 'N2': 22.403, 'Ar': 22.390, 'CO2': 22.263, 'He': 22.4258, 'Kr': 22.3511}
# Dry mole fraction that a moist-air equation is tied to (Glueckauf 1951).
TIED = {'O2': 0.20946, 'N2': 0.78084, 'Ar': 0.00934, 'Ne': 1.818e-5, 'He': 5.24e-6, 'Kr': 1.14e-6, 'Xe': 8.7e-8}
# Partial molar volumes, cm3/mol (Enns 1965), and critical temperature K, pressure atm, acentric factor (from memory) for pressures above 1.1 atm.
ENNS = {'O2': 31.7, 'N2': 33.1, 'Ar': 31.7, 'He': 29.7, 'CO2': 31.2}
CRITICAL = {'N2': (126.2, 33.5, 0.038), 'Ar': (150.9, 48.3, 0.0), 'He': (10.3, 6.43, 0.0)}


def molar_mass(gas):
    return sum(WEIGHT[e] * int(n or 1) for e, n in re.findall('([A-Z][a-z]?)([0-9]*)', FORMULA[gas]))


def density(t90, s):
    """EOS-80 at the surface, kg/m3, as sums of powers."""
    t = 1.00024 * t90
    pure = (999.842594, 6.793952e-2, -9.095290e-3, 1.001685e-4, -1.120083e-6, 6.536332e-9)
    a = (8.24493e-1, -4.0899e-3, 7.6438e-5, -8.2467e-7, 5.3875e-9)
    b = (-5.72466e-3, 1.0227e-4, -1.6546e-6)
    total = math.fsum(c * t ** i for i, c in enumerate(pure))
    if s == 0:
        return total
    return total + s * math.fsum(c * t ** i for i, c in enumerate(a)) + s * math.sqrt(s) * math.fsum(c * t ** i for i, c in enumerate(b)) + 4.8314e-4 * s * s


def saturation(gas, t90, s):
    """Vapour pressure, atm: Benson and Krause 1980 over fresh water for oxygen, Weiss and Price 1980 for the rest."""
    if gas == 'O2':
        k = t90 + 273.15
        return math.exp(11.8571 - 3840.70 / k - 216961 / k ** 2)
    k = 1.00024 * t90 + 273.15
    return math.exp(24.4543 - 67.4509 * 100 / k - 4.8489 * math.log(k / 100) - 0.000544 * s)


def fugacity(gas, t, atm, x):
    k = t + 273.15
    excess = max(0.0, atm - 1.1)
    if gas == 'O2':
        theta = 9.75e-4 - 1.426e-5 * t + 6.436e-8 * t * t
        return (1 - theta * min(atm, 1.1)) * math.exp(-theta * excess)
    if gas == 'CO2':
        b = -1636.75 + 12.0408 * k - 3.27957e-2 * k ** 2 + 3.16528e-5 * k ** 3
        return math.exp((b + 2 * (1 - x) ** 2 * (57.7 - 0.118 * k)) * atm / (R * k))
    if gas == 'N2O':
        b = -905.95 + 4.1685 * k - 0.0052734 * k ** 2
        return math.exp((b + 2 * (1 - x) ** 2 * (65.0 - 0.1338 * k)) * atm / (R * k))
    if gas in CRITICAL:
        tc, pc, omega = CRITICAL[gas]
        b = R * tc / pc * (0.083 - 0.422 * (k / tc) ** -1.6 + omega * (0.139 - 0.172 * (k / tc) ** -4.2))
        return math.exp(b * excess / (R * k))
    return 1.0


def poynting(gas, t, atm):
    return math.exp(-ENNS.get(gas, 0.0) * max(0.0, atm - 1.1) / (R * (t + 273.15)))


def wagner_pruss(t90):
    """Pa."""
    k = t90 + 273.15
    v = 1 - k / 647.096
    a = ((-7.85951783, 1), (1.84408259, 1.5), (-11.7866497, 3), (22.6807411, 3.5), (-15.9618719, 4), (1.80122502, 7.5))
    return 22.064e6 * math.exp(647.096 / k * math.fsum(c * v ** p for c, p in a))


def value(row, t90, s):
    c = [float(v) for v in row['coefficients'].split()]
    t = 1.00024 * t90 if row['scale'] == 'ipts68' else t90
    k = t + 273.15
    if row['form'] == 'hundred':
        q = k / 100
        return math.exp(c[0] + c[1] / q + c[2] * math.log(q) + c[3] * q ** c[4] + s * (c[5] + c[6] * q + c[7] * q * q) + c[8] * s * s)
    if row['form'] == 'scaled':
        z = math.log((298.15 - t) / k)
        return math.exp(sum(a * z ** i for i, a in enumerate(c[:6])) + s * sum(b * z ** i for i, b in enumerate(c[6:10])) + c[10] * s * s)
    if row['form'] == 'inverse':
        return math.exp(sum(a / k ** i for i, a in enumerate(c[:5])) - s * sum(b / k ** i for i, b in enumerate(c[5:8])))
    if row['form'] == 'guideline':
        r = k / 647.096
        return wagner_pruss(t90) * math.exp(c[0] / r + c[1] * (1 - r) ** 0.355 / r + c[2] * r ** -0.41 * math.exp(1 - r))
    return c[0] * math.exp(c[1] * (1 / k - 1 / 298.15))


def moles_per_litre(row, t90, s):
    """mol/L, or mol/L per atm for kind gas."""
    gas, v, unit = row['gas'], value(row, t90, s), row['unit']
    kg = density(t90, s) / 1000  # kg per litre
    volume = VOLUME.get(gas, 22.414)
    return {
        'mg/L': lambda: v / 1000 / molar_mass(gas), 'umol/kg': lambda: v * 1e-6 * kg, 'nmol/kg': lambda: v * 1e-9 * kg, 'mol/kg': lambda: v * kg,
        'mL/L': lambda: v / 1000 / volume, 'mL/kg': lambda: v / 1000 / volume * kg, 'bunsen': lambda: v / volume, 'mol/(kg atm)': lambda: v * kg,
        'mol/(L atm)': lambda: v, 'mol/(m3 Pa)': lambda: v / 1000 * 101325, 'Pa': lambda: 101325 / v * 1000 * kg / 18.015268,
    }[unit]()


def partial(gas, t90, s, hpa, x, humidity):
    return x * (hpa - humidity / 100 * saturation(gas, t90, s) * ATM)


def milligrams(row, t90, s, hpa, x, humidity):
    gas, atm = row['gas'], hpa / ATM
    u = saturation(gas, t90, s)
    p = partial(gas, t90, s, hpa, x, humidity) / ATM
    real = fugacity(gas, t90, atm, p / atm) * poynting(gas, t90, atm)
    c = moles_per_litre(row, t90, s)
    if row['kind'] == 'gas':
        moles = c * p * real
    else:
        # Where fugacity depends on the fraction of the gas, the equation is one for traces.
        tied = 1.0 if row['kind'] == 'air1' else TIED[gas]
        moles = c * p / (tied * (1 - u)) * real / fugacity(gas, t90, 1.0, 0.0)
    return moles * molar_mass(gas) * 1000


def coefficients():
    here = os.path.dirname(os.path.abspath(__file__))
    with open(os.path.join(here, 'coefficients.csv'), encoding='utf-8') as f:
        return {(r['gas'], r['equation']): r for r in csv.DictReader(line for line in f if not line.startswith('#'))}


def main():
    rows = coefficients()
    for line in sys.stdin:
        words = line.split()
        row = rows[words[0], words[1]]
        gas = words[0]
        t, s, p, x, h, ut, us, up, ue = (float(w) for w in words[2:])
        mg = milligrams(row, t, s, p, x, h)
        pp = partial(gas, t, s, p, x, h)
        micromoles = mg * 1000 / molar_mass(gas)

        def spread(f):
            parts = [(f(t + 1e-3, s, p) - f(t - 1e-3, s, p)) / 2e-3 * ut, (f(t, s, p + 1e-2) - f(t, s, p - 1e-2)) / 2e-2 * up]
            if us:
                step = min(1e-3, s)
                parts.append((f(t, s + 1e-3, p) - f(t, s - step, p)) / (1e-3 + step) * us)
            return parts

        u_mg = math.sqrt(sum(v * v for v in spread(lambda *a: milligrams(row, *a, x, h))) + (ue * mg) ** 2)
        u_pp = math.sqrt(sum(v * v for v in spread(lambda *a: partial(gas, *a, x, h))))
        print(*(repr(v) for v in (saturation(gas, t, s) * ATM, pp, mg, micromoles, micromoles * 1000 / density(t, s), micromoles * VOLUME.get(gas, 22.414) / 1000, u_pp, u_mg)))


if __name__ == "__main__":
    main()
