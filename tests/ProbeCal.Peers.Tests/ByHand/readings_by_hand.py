"""Readings of calibrated probes with their uncertainty, worked out once more: no code of the library. Every uncertainty comes from moving an input and doing the whole chain again.

One JSON object a line in, one line of numbers out. What is asked for is named by 'ask'.
"""
import json
import math
import sys

import numpy as np

import by_hand

ROWS = by_hand.coefficients()
KELVIN = 273.15


def factor(form, c, d, reference):
    if form == 'exponential':
        return math.exp(c[0] * d)
    if form == 'compound':
        return (1 + c[0]) ** d
    if form == 'linear':
        return 1 + c[0] * d
    if form == 'arrhenius':
        return math.exp(-c[0] / 8.31446261815324 * (1 / (reference + d + KELVIN) - 1 / (reference + KELVIN)))
    return math.exp(sum(v * d ** (i + 1) for i, v in enumerate(c)))


def enns(gas, t, dbar):
    """exp(V·P/(R·T)), V in cm3/mol, P in dbar = 1e4 Pa."""
    return math.exp(by_hand.ENNS.get(gas, 0.0) * 1e-6 * dbar * 1e4 / (8.314462618 * (t + KELVIN)))


def film(m, phase, t, dbar):
    """(P0/Pc - 1)/Ksv, and what depth takes from it."""
    c = m['c']
    phase = phase + m['lost'] * dbar / 1000
    value = ((c[3] + c[4] * t) / (c[5] + c[6] * phase + c[7] * phase ** 2) - 1) / (c[0] + c[1] * t + c[2] * t * t)
    short = 0.032 if m['correction'] == 'uchida' else 0.0419 + 0.00022 * t
    return value * (1 + short * dbar / 1000) * enns('O2', t, dbar)


def response(m, signal, t, dbar):
    """What a model makes of its raw signal: the response and the gain of the slope."""
    kind, d = m['kind'], t - m['reference']
    coefficient = [m['coefficient']] + m.get('more', [])
    if kind == 'amperometric':
        r = (signal - m['residual'] * math.exp(m['residualPerKelvin'] * d)) / (1 + m['depth'] * dbar / 100)
        return r, factor(m['form'], coefficient, d, m['reference'])
    if kind == 'stern-volmer':
        quotient = 1 / math.tan(math.radians(signal)) if m['signal'] == 'phase' else 1 / signal
        tau = 1 + m['a'] * d + m['b'] * d * d
        return quotient * tau / (1 + m['depth'] * dbar / 100), factor(m['form'], coefficient, d, m['reference'])
    if kind == 'bittig':
        return film(m, signal, t, dbar), 1.0
    if kind == 'uchida':
        # The umol/L that fresh water under 1 atm of moist air holds, per hPa of its oxygen.
        row = ROWS['O2', m['equation']]
        per = by_hand.milligrams(row, t, 0.0, by_hand.ATM, 0.20946, 100.0) / by_hand.partial('O2', t, 0.0, by_hand.ATM, 0.20946, 100.0) / 31.9988 * 1000
        return film(m, signal, t, dbar) / per, 1.0
    if kind == 'severinghaus':
        return signal - m['perKelvin'] * d, (t + KELVIN) / (m['reference'] + KELVIN)
    return signal, 1 + m['coefficient'] * d


def on_curve(r, zero, slope, curvature, scale, logarithmic):
    """The root nearest to nothing of curvature·x² + slope·x = (r − zero)/scale."""
    roots = np.roots([curvature, slope, -(r - zero) / scale]) if curvature else np.array([(r - zero) / scale / slope])
    x = float(np.real(roots[np.argmin(np.abs(roots))]))
    return 10 ** x if logarithmic else x


def in_water(v, p, t, s, hpa, dbar):
    """mg/L of the same water at the surface."""
    surface = p / enns(v['gas'], t, dbar)
    row = ROWS[v['gas'], v['equation']]
    if not v.get('trace'):
        # In proportion to the partial pressure, as in air.
        return by_hand.milligrams(row, t, s, hpa, 0.2, 100.0) / by_hand.partial(v['gas'], t, s, hpa, 0.2, 100.0) * surface
    return by_hand.milligrams(row, t, s, hpa, surface / by_hand.partial(v['gas'], t, s, hpa, 1.0, 100.0), 100.0)


def spread(f, u):
    """Root of the sum of squares of what each input does, by central differences."""
    total = 0.0
    for name, uncertainty in u.items():
        if uncertainty:
            h = uncertainty * 1e-3
            total += ((f({name: h}) - f({name: -h})) / (2 * h) * uncertainty) ** 2
    return total


def fitted(v):
    m, fit, u = v['model'], v['fit'], v['u']

    def chain(by, dissolved):
        at_points = by.get('offset', 0.0) + by.get('offsetThen', 0.0)
        coefficient = by.get('coefficient', 0.0)
        moved = [fit['parameters'][i] + at_points * fit['perKelvin'][i] + coefficient * fit['perCoefficient'][i] + by.get(f'p{i}', 0.0) for i in range(3)]
        t = v['t'] + by.get('offset', 0.0) + by.get('t', 0.0)
        r, gain = response(dict(m, coefficient=m.get('coefficient', 0.0) + coefficient), v['signal'] + by.get('signal', 0.0), t, v['dbar'])
        p = on_curve(r, *moved, gain * v['flow'] * (1 + by.get('flow', 0.0)), m['kind'] == 'severinghaus')
        if not dissolved:
            return p
        return in_water(v, p, t, v['s'] + by.get('s', 0.0), v['hpa'] + by.get('hpa', 0.0), v['dbar']) * (1 + by.get('equation', 0.0))

    answers = []
    for dissolved in (False, True):
        def f(by):
            return chain(by, dissolved)
        steps = [max(abs(x), 1e-9) * 1e-5 for x in fit['parameters']]
        slopes = np.array([(f({f'p{i}': h}) - f({f'p{i}': -h})) / (2 * h) for i, h in enumerate(steps)])
        covariance = np.array(fit['covariance'])
        answers += [f({}), math.sqrt(spread(f, u) + slopes @ covariance @ slopes)]
    return answers


def two_points(v):
    m, u, point = v['model'], v['u'], v['point']

    def chain(by, dissolved):
        then = by.get('offset', 0.0) + by.get('offsetThen', 0.0)
        model = dict(m, coefficient=m['coefficient'] + by.get('coefficient', 0.0))
        t1 = point['t'] + then + by.get('t1', 0.0)
        r1, g1 = response(model, point['signal'] + by.get('signal1', 0.0), t1, 0.0)
        rz, _ = response(model, point['zero'] + by.get('zero', 0.0), point['tz'] + then, 0.0)
        truth = by_hand.partial('O2', t1, 0.0, point['hpa'] + by.get('hpa1', 0.0), 0.20946, 100.0) * (1 + by.get('ratio', 0.0)) * point['ratio'] * (1 + by.get('state', 0.0))
        slope = (r1 - rz) / (g1 * truth)
        t = v['t'] + by.get('offset', 0.0) + by.get('t', 0.0)
        r, gain = response(model, v['signal'] + by.get('signal', 0.0), t, v['dbar'])
        p = (r - rz) / (slope * gain * v['flow'] * (1 + by.get('flow', 0.0)))
        if not dissolved:
            return p
        return in_water(v, p, t, v['s'] + by.get('s', 0.0), v['hpa'] + by.get('hpa', 0.0), v['dbar']) * (1 + by.get('equation', 0.0))

    return [x for dissolved in (False, True) for x in (chain({}, dissolved), math.sqrt(spread(lambda by: chain(by, dissolved), u)))]


def titration(v):
    def chain(by):
        q = {k: v['q'][k] + by.get(k, 0.0) for k in v['q']}
        # Four thiosulfate an oxygen molecule; the aliquot stands for its share of the whole flask, of which the reagents pushed some out.
        titrant = q['standard'] * q['normality'] / (q['standardTitre'] - q['standardBlank'])
        moles = titrant * (q['titre'] - q['blank']) / 1000 / 4 * (q['flask'] / q['aliquot'] if v['part'] else 1)
        return (moles * 31998.8 - q['reagent']) / ((q['flask'] - q['displaced']) / 1000)
    return [chain({}), math.sqrt(spread(chain, v['u']))]


def from_concentration(v):
    def chain(by):
        t, s, hpa = v['t'] + by.get('t', 0.0), v['s'] + by.get('s', 0.0), v['hpa'] + by.get('hpa', 0.0)
        return (v['mg'] + by.get('mg', 0.0)) / in_water(v, 1.0, t, s, hpa, 0.0) / (1 + by.get('equation', 0.0))
    return [chain({}), math.sqrt(spread(chain, v['u']))]


def lag(v):
    """Noise and value by the weights that a parabola through three readings gives, each found by feeding in a one."""
    t = np.array([-v['before'], 0.0, v['after']])
    weights = [float(np.polyval(np.polyder(np.polyfit(t, e, 2)), 0.0)) * v['tau'] + e[1] for e in np.eye(3)]
    step = v['before']
    last = [-v['tau'] / step, 1 + v['tau'] / step]
    return [float(np.dot(weights, v['y'])), float(np.linalg.norm(weights)), float(np.dot(last, v['y'][:2])), float(np.linalg.norm(last))]


for line in sys.stdin:
    case = json.loads(line)
    print(*(repr(float(x)) for x in {'fitted': fitted, 'two-points': two_points, 'titration': titration, 'from-concentration': from_concentration, 'lag': lag}[case['ask']](case)))
