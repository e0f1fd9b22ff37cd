#!/usr/bin/python3
"""The peer of `pipeline.ts`: the same six steps in numpy, double precision, measured in the same run.

    pipeline.py SIDE CALLS OBJECT RESULT

OBJECT holds SIDE x SIDE float64, row by row; the picture is written to RESULT in the same form, so that the caller can see that it is the
same. Prints the median milliseconds of a call. Lines of k-space are rows; every step works on whole arrays, as numpy is meant to be used.
"""
import sys
import time

import numpy as np

repetition_time, frequency, swing = 0.5, 0.3, 0.6
ghost_phase, echo_shift = 0.15, 0.5
gain, angle = 1.15, np.deg2rad(3)
level = 0.8


def forward(plane, axes=(0, 1)):
    return np.fft.fftshift(np.fft.fftn(np.fft.ifftshift(plane, axes), axes=axes, norm='ortho'), axes)


def inverse(plane, axes=(0, 1)):
    return np.fft.fftshift(np.fft.ifftn(np.fft.ifftshift(plane, axes), axes=axes, norm='ortho'), axes)


def pipeline(image):
    n = image.shape[0]
    k = np.arange(n) - n // 2
    kspace = forward(image)
    # Skipped lines: one of two, and 32 about the middle.
    taken = (k % 2 == 0) | ((k >= -16) & (k < 16))
    kspace = kspace * taken[:, None]
    # Elliptical coverage.
    covered = ((k / (n / 2)) ** 2)[:, None] + ((k / (n / 2)) ** 2)[None, :] <= 1
    kspace = kspace * covered
    # Periodic motion, in the order in which lines are taken.
    sampled = taken & covered.any(axis=1)
    order = np.cumsum(sampled) - 1
    kspace = kspace * np.exp(1j * swing * np.sin(2 * np.pi * frequency * repetition_time * order))[:, None]
    # Half-field ghost: odd and even echoes, in phase and in place.
    polarity = (-1.0) ** order
    kspace = kspace * np.exp(1j * ghost_phase * polarity)[:, None]
    hybrid = inverse(kspace, (1,))
    hybrid = hybrid * np.exp(2j * np.pi * echo_shift / n * polarity[:, None] * k[None, :])
    kspace = forward(hybrid, (1,)) * (taken[:, None] & covered)
    # Quadrature imbalance.
    kspace = kspace.real + 1j * gain * (kspace.imag * np.cos(angle) + kspace.real * np.sin(angle))
    # Clipping of both channels.
    limit = level * np.abs(kspace).max()
    kspace = np.clip(kspace.real, -limit, limit) + 1j * np.clip(kspace.imag, -limit, limit)
    return np.abs(inverse(kspace))


def main():
    side, calls = int(sys.argv[1]), int(sys.argv[2])
    image = np.fromfile(sys.argv[3]).reshape(side, side).astype(complex)
    times = []
    for call in range(-3, calls):
        before = time.perf_counter()
        picture = pipeline(image)
        if call >= 0:
            times.append(1000 * (time.perf_counter() - before))
    picture.tofile(sys.argv[4])
    print(float(np.median(times)))


if __name__ == '__main__':
    main()
