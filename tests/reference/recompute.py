#!/usr/bin/python3
"""Recomputes the outside values of this folder with numpy and scipy, apart from the project's own code.

    apt-get install python3-numpy python3-scipy
    /usr/bin/python3 tests/reference/recompute.py

Prints each stored value that differs by more than its digits allow, and what is stored but not recomputed here. Ends with 0 where
all agree, with 1 where one differs. The stored values are read from the .ts files through tsx, so run `npm ci` first.
The centred transform is K = fftshift(fft2(ifftshift(I))), its inverse the same with ifft2; index N//2 is the origin.
"""
import json
import pathlib
import subprocess
import sys
from math import acos, cos, degrees, exp, log, pi, radians, sin, sqrt, tan

import numpy as np
from scipy import constants, integrate, optimize, special, stats

here = pathlib.Path(__file__).resolve().parent
gamma_bar = 42.577478518  # MHz/T, CODATA 2018
fat_ppm = 3.5


def forward(image):
    return np.fft.fftshift(np.fft.fft2(np.fft.ifftshift(image)))


def inverse(kspace):
    return np.fft.fftshift(np.fft.ifft2(np.fft.ifftshift(kspace)))


def signed_fraction(cycles):
    """Where a ghost of so many cycles a line falls, part of the field of view from -1/2 to 1/2."""
    return cycles - round(cycles)


def box(size, rows, columns):
    image = np.zeros((size, size))
    image[slice(*rows), slice(*columns)] = 1
    return image


def complex_parts(value):
    return {'re': value.real, 'im': value.imag}


# ------------------------------------------------------------------ ghosts


def ghost_ratio(line_weight, shift):
    """Ghost `shift` rows below its parent over the parent: 20 x 20 of 128 x 128, each line weighted."""
    image = box(128, (40, 60), (50, 70))
    line = np.arange(128) - 64
    ghosted = abs(inverse(forward(image) * line_weight(line)[:, None]))
    return ghosted[(50 + shift) % 128, 60] / ghosted[50, 60]


def undersampled(factor):
    image = box(64, (28, 36), (20, 44))
    kept = (np.arange(64) - 32) % factor == 0
    folded = abs(inverse(forward(image) * kept[:, None]))
    return [folded[(30 + 64 // factor * j) % 64, 30] for j in range(factor)]


# ------------------------------------------------------------------ ellipses


def ellipse(kx, ky, density, a, b, x, y, turn):
    turn = radians(turn)
    u = a * (kx * cos(turn) + ky * sin(turn))
    v = b * (ky * cos(turn) - kx * sin(turn))
    q = np.hypot(u, v)
    size = density * a * b * (pi if q == 0 else special.j1(2 * pi * q) / q)
    return complex(size * np.exp(-2j * pi * (kx * x + ky * y)))


# ------------------------------------------------------------------ partial Fourier


def two_ellipses(with_phase):
    y, x = np.mgrid[-64:64, -64:64]
    image = ((x / 40) ** 2 + (y / 50) ** 2 < 1) + 0.7 * ((x - 10) ** 2 + (y + 12) ** 2 < 90)
    theta = 0.6 * np.cos(2 * pi * x / 128) + 0.5 * np.sin(2 * pi * y / 128)
    return image * np.exp(1j * theta * with_phase)


def partial_fourier(with_phase, fraction=5 / 8):
    """NRMSE of the magnitude: zero-filled, homodyne with a ramp, 50 rounds of projection onto the phase."""
    image = two_ellipses(with_phase)
    n = 128
    k = np.arange(n) - n // 2
    taken = np.arange(n) >= n - round(n * fraction)
    half_band = round(n * fraction) - n // 2
    kspace = forward(image)
    sampled = kspace * taken[:, None]
    phase = np.exp(1j * np.angle(inverse(kspace * (taken & (abs(k) < half_band))[:, None])))
    weight = np.where(abs(k) < half_band, 1 + k / half_band, np.where(k >= half_band, 2, 0))
    homodyne = np.real(inverse(sampled * weight[:, None]) * phase.conj())
    estimate = inverse(sampled)
    for _ in range(50):
        estimate = inverse(np.where(taken[:, None], kspace, forward(abs(estimate) * phase)))
    reference = abs(image)
    error = lambda found: np.linalg.norm(abs(found) - reference) / np.linalg.norm(reference)
    return error(inverse(sampled)), error(homodyne), error(estimate)


# ------------------------------------------------------------------ truncation


def overshoot(samples, window=np.ones_like, per_pixel=32):
    """Highest value above 1 of a box of half the field of view, from its Fourier series on a fine grid."""
    k = np.arange(samples) - samples // 2
    coefficients = 0.5 * np.sinc(k / 2) * window(abs(k) / (samples / 2))
    x = np.linspace(0.15, 0.35, samples * per_pixel + 1)
    return (np.exp(2j * pi * np.outer(x, k)) @ coefficients).real.max() - 1


hamming = lambda part: 0.54 + 0.46 * np.cos(pi * part)
hann = lambda part: 0.5 + 0.5 * np.cos(pi * part)


def point_width(window):
    spread = lambda x: integrate.quad(lambda part: window(part) * cos(pi * part * x), 0, 1)[0]
    return 2 * optimize.brentq(lambda x: spread(x) / spread(0) - 0.5, 0.3, 1.9)


def point_width_decay(duration=160, t2=80):
    k = np.linspace(-0.5, 0.5, 4001)
    x = np.linspace(-2, 2, 4001)
    spread = abs(np.exp(2j * pi * np.outer(x, k)) @ np.exp(-(k + 0.5) * duration / t2))
    above = x[spread >= spread.max() / 2]
    return above[-1] - above[0]


# ------------------------------------------------------------------ noise, slices, receivers


def rician(signal):
    moments = stats.rice(signal).stats('mv')
    return {'mean': float(moments[0]), 'standardDeviation': sqrt(moments[1])}


def central_chi(coils):
    mean, variance = stats.chi(2 * coils).stats('mv')
    return {'mean': float(mean), 'standardDeviation': sqrt(variance)}


def slice_overlap(gap):
    sigma = 1 / (2 * sqrt(2 * log(2)))
    profile = lambda z: exp(-z * z / (2 * sigma * sigma))
    shared = integrate.quad(lambda z: min(profile(z), profile(z - 1 - gap)), -6, 8, limit=400)[0]
    return 2 * shared / integrate.quad(profile, -6, 6)[0]


def quadrature(gain, angle):
    turn = np.exp(1j * radians(angle))
    return abs((1 - gain * turn.conjugate()) / (1 + gain * turn))


def geometry_factor(sensitivities):
    maps = np.array([[complex(*place) for place in element] for element in sensitivities])
    normal = maps.conj().T @ maps
    factors = np.sqrt(np.real(np.diag(np.linalg.inv(normal)) * np.diag(normal)))
    assert np.allclose(factors, factors[0])
    return factors[0]


def fat_water(field):
    hertz = fat_ppm * gamma_bar * field
    return {'hertz': hertz, 'opposedMs': 500 / hertz, 'inPhaseMs': 1000 / hertz}


# ------------------------------------------------------------------ what each file holds


def recomputed(stored):
    """The values anew, in the shape in which they are stored; what is a definition or a table of inputs is left out."""
    shepp_logan = stored['values']['reference']['sheppLogan']
    head = lambda kx, ky: complex_parts(sum(ellipse(kx, ky, *row) for row in shepp_logan))
    real, smooth = partial_fourier(False), partial_fourier(True)
    saturation = (1 - exp(-250 / 800)) / (1 - exp(-500 / 800))
    larmor = lambda field: gamma_bar * field
    fat = fat_water(1.5)
    values = {
        'gyromagneticRatio': gamma_bar,
        'ghostShift256': 256 * signed_fraction(0.5 * 0.25),
        'ghostShift192': 192 * signed_fraction(2.3 * 1.2),
        'ghostShiftHeart': 256 * signed_fraction(0.03 * 1.1),
        'bessel': {a: [special.jv(order, float(a)) for order in range(4)] for a in ('0.25', '0.5', '1', '2')},
        'phaseGhostRatio': ghost_ratio(lambda n: np.exp(0.5j * np.sin(2 * pi * 16 * n / 128)), 16),
        'undersampled': {'2': undersampled(2), '4': undersampled(4)},
        'symmetricBand': {f: 2 * float(f) - 1 for f in ('0.625', '0.75', '0.875')},
        'partialFourier': {
            'real': {'zeroFilled': real[0], 'homodyne': real[1]},
            'smoothPhase': {'zeroFilled': smooth[0], 'homodyne': smooth[1]},
        },
        'ellipse': complex_parts(ellipse(0.8, -1.3, 1, 0.3, 0.5, 0.1, -0.2, 25)),
        'discFirstZero': special.jn_zeros(1, 1)[0] / (2 * pi * 0.25),
        'sheppLoganSignal': {'zero': head(0, 0), 'away': head(1.5, 2.25)},
        'fatShift': {'at1T5': fat_ppm * larmor(1.5) / 130, 'at3T': fat_ppm * larmor(3) / 440},
        'fatShiftHertz': fat_ppm * 123.25,
        'rician': {a: rician(float(a)) for a in ('0', '1', '2', '3', '5', '10')},
        'centralChi': {n: central_chi(int(n)) for n in ('1', '2', '4', '8', '16', '32')},
        'spikePeriod': 256 / np.hypot(30, 40),
        'quadratureGhost': [[g, a, quadrature(g, a)] for g, a in ((1.1, 0), (1, 5), (1.05, 3), (1.1, 5))],
        'interferencePlace': {'inside': 3200 / 200, 'folded': (40000 / 200 + 128) % 256 - 128},
        'spinEchoAt80Percent': sin(0.8 * pi / 2) ** 3,
        'wavelength': {
            'tissueAt3T': constants.c / (larmor(3) * 1e6 * sqrt(58)),
            'waterAt1T5': constants.c / (larmor(1.5) * 1e6 * sqrt(80)),
        },
        'integralUniformity': 100 * (1 - (950 - 850) / (950 + 850)),
        'fatWater': {'1.5': fat_water(1.5), '3': fat_water(3)},
        'saturationRatio': saturation,
        'ernstAngleDegrees': {
            'tr20t1800': degrees(acos(exp(-20 / 800))),
            'tr500t1350': degrees(acos(exp(-500 / 350))),
        },
    }
    encoding = {
        'gibbsLobes': [special.sici(n * pi)[0] / pi - 0.5 for n in (1, 2, 3)],
        'gibbsOvershoot': {n: overshoot(int(n)) for n in ('32', '64', '128', '256')},
        'gibbsOvershootWindowed': {'hamming': overshoot(128, hamming), 'hann': overshoot(128, hann)},
        'pointWidth': {
            'sinc': 2 * optimize.brentq(lambda x: np.sinc(x) - 0.5, 0.3, 0.9),
            'hamming': point_width(hamming),
            'hann': point_width(hann),
        },
        'pointSideLobe': min(np.sinc(np.linspace(1, 2, 20001))),
        'halfFieldStrong': {'parent': cos(pi / 6), 'ratio': tan(pi / 6)},
        'pointWidthDecay': point_width_decay(),
        'sixteenEchoes': exp(-16 * 10 / 80),
        'halfField': {
            phi: {'parent': cos(float(phi)), 'ghost': sin(float(phi)), 'ratio': tan(float(phi))} for phi in ('0.05', '0.1', '0.2')
        },
        'halfFieldSimulated': ghost_ratio(lambda n: np.exp(0.1j * (-1.0) ** n), 64),
        'mainsGhost': signed_fraction(60 * 0.033),
        'lineEnergy': 1 / 64,
        'pocs': {'real': real[2], 'smoothPhase': smooth[2]},
    }
    inner = pi * 0.25 * 0.5
    objects = {
        'echoPlanarFatShift': {
            'full': fat_ppm * larmor(3) * 0.5e-3 * 64,
            'halved': fat_ppm * larmor(3) * 0.5e-3 * 64 / 2,
        },
        'fatShift125': fat['hertz'] / 125,
        'fatShiftHertz': {'at1T5': fat['hertz'], 'at3T': fat_water(3)['hertz']},
        'firstOpposed': fat['opposedMs'],
        'firstInPhase': fat['inPhaseMs'],
        'displacement': {'readout': 100 / 200, 'echoPlanar': 50 * 0.59e-3 * 90},
        'halfCycle': np.sinc(0.5),
        'sliceOverlap': [[gap, slice_overlap(gap)] for gap in (0, 0.1, 0.25, 0.5, 1)],
        'saturationRatio': saturation,
        'innerLoopAttenuation': abs(sin(4 * inner) / (4 * sin(inner))),
        'magicAngleDegrees': degrees(acos(1 / sqrt(3))),
        'brightnessGhost': ghost_ratio(lambda n: 1 + 0.2 * np.cos(2 * pi * 16 * n / 128), 16),
    }
    sensitivities = stored['unfolding']['unfoldingReference']['sensitivities']
    unfolding = {'geometryFactor': {name: geometry_factor(maps) for name, maps in sensitivities.items()}}
    return {
        'unfolding': {'unfoldingReference': unfolding},
        'values': {'reference': values},
        'encoding-values': {'encodingReference': encoding},
        'object': {'objectReference': objects},
    }


# ------------------------------------------------------------------ comparison


def stored_values():
    """Every export of every .ts file beside this script, as {file: {name: value}}."""
    files = sorted(here.glob('*.ts'))
    script = 'const all = {};\n' + ''.join(
        f'all[{json.dumps(file.stem)}] = {{ ...require({json.dumps(str(file))}) }};\n' for file in files
    )
    tsx = here.parent.parent / 'node_modules' / '.bin' / 'tsx'
    printed = subprocess.run([tsx, '-e', script + 'console.log(JSON.stringify(all));'], capture_output=True, text=True, check=True)
    return json.loads(printed.stdout)


def leaves(value, path=()):
    """Each number of a nested value with its path."""
    if isinstance(value, dict):
        for key, inner in value.items():
            yield from leaves(inner, (*path, str(key)))
    elif isinstance(value, list):
        for index, inner in enumerate(value):
            yield from leaves(inner, (*path, str(index)))
    else:
        yield path, value


def rounding_of(value):
    """What the digits of a stored number leave open: a little over half of the last one."""
    _, _, decimals = repr(value).partition('.')
    return 0.51 * 10.0 ** -max(len(decimals), 3) if isinstance(value, float) else 1e-9


# Values whose comments allow more than their last digit, by the start of their path.
looser = {
    ('encoding-values', 'encodingReference', 'gibbsOvershoot'): 5e-4,
    ('encoding-values', 'encodingReference', 'gibbsOvershootWindowed'): 5e-4,
    ('encoding-values', 'encodingReference', 'pointWidthDecay'): 0.02,
    ('object', 'objectReference', 'sliceOverlap'): 1e-4,
}


def main():
    stored = stored_values()
    expected = dict(leaves(recomputed(stored)))
    differing, missing, agreeing = [], set(), 0
    for path, value in leaves(stored):
        if path not in expected:
            missing.add('.'.join(path[:3]))
            continue
        tolerance = looser.get(path[:3], rounding_of(value))
        if abs(value - expected[path]) <= tolerance:
            agreeing += 1
        else:
            differing.append(f'{".".join(path)}: stored {value!r}, recomputed {float(expected[path])!r}, tolerance {tolerance:.1e}')
    gone = sorted('.'.join(path) for path in set(expected) - {path for path, _ in leaves(stored)})
    for line in differing:
        print('DIFFERS ', line)
    for name in gone:
        print('GONE    ', name, 'is recomputed here and no longer stored')
    for name in sorted(missing):
        print('NOT HERE', name, 'is stored and not recomputed')
    print(f'{agreeing} values agree, {len(differing)} differ, {len(missing)} groups are not recomputed')
    return 1 if differing or gone else 0


if __name__ == '__main__':
    sys.exit(main())
