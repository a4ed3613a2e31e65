"""
Parallel code-phase search in numpy: GPS L1 C/A, 1 ms coherent sums added as powers, transforms of one code period at the
capture's own rate, spectra of the samples shared by all codes, spectra of the codes and carriers made
beforehand. Single precision throughout, one thread.
"""

import json
import os

import numpy as np
import scipy.fft
import scipy.stats

import twin
from ca_code import ca_code


def prepare(folder):
    with open(os.path.join(folder, "inputs.json")) as file:
        given = json.load(file)
    rate = given["rateHz"]
    per_ms = rate // 1000
    sums = given["sums"]
    raw = np.fromfile(os.path.join(folder, "capture.ci8"), dtype=np.int8)
    dopplers = np.arange(-given["halfWidthHz"], given["halfWidthHz"] + 1, given["stepHz"], dtype=np.float64)
    cells = dopplers.size * per_ms
    per_cell = -np.expm1(np.log1p(-given["falseAlarmPerSearch"]) / cells)
    threshold = scipy.stats.chi2.isf(per_cell, 2 * sums) / (2 * sums)
    seconds = np.arange(per_ms * sums) / rate
    chip_index = (np.arange(per_ms) * 1023) // per_ms
    codes = {prn: ca_code(prn)[chip_index] for prn in given["prns"]}
    replicas = {prn: np.conj(scipy.fft.fft(code.astype(np.complex64), workers=1)) for prn, code in codes.items()}
    carriers = [np.exp(-2j * np.pi * doppler * seconds).astype(np.complex64) for doppler in dopplers]

    def work():
        samples = raw[: 2 * per_ms * sums].astype(np.float32).view(np.complex64)
        spectra = []
        for carrier in carriers:
            spectra.append(scipy.fft.fft((samples * carrier).reshape(sums, per_ms), axis=1, workers=1))
        found = []
        for prn in given["prns"]:
            grid = np.empty((dopplers.size, per_ms), np.float32)
            for row, spectrum in enumerate(spectra):
                lags = scipy.fft.ifft(spectrum * replicas[prn], axis=1, workers=1)
                grid[row] = (lags.real**2 + lags.imag**2).sum(axis=0)
            noise = np.median(grid.mean(axis=1))
            row, lag = np.unravel_index(np.argmax(grid), grid.shape)
            if grid[row, lag] > threshold * noise:
                found.append(refine(samples, prn, lag, grid, row, noise))
        return found

    def refine(samples, prn, lag, grid, row, noise):
        """Code phase by a parabola through three lags, Doppler by the turn from sum to sum, C/N0 from the prompt power."""
        before, top, after = grid[row, lag - 1], grid[row, lag], grid[row, (lag + 1) % per_ms]
        shift = 0.5 * (before - after) / (before - 2 * top + after)
        prompt = (samples * carriers[row]).reshape(sums, per_ms) @ np.roll(codes[prn], lag)
        squares = prompt**2  # data bits fall away
        offset = np.angle(np.sum(squares[1:] * np.conj(squares[:-1]))) / (4 * np.pi * 1e-3)
        loss = np.sinc(offset * 1e-3) ** 2
        snr = (top / noise - 1) / loss
        return {
            "prn": prn,
            "codePhaseChips": float(-(lag + shift) * 1023 / per_ms % 1023),
            "dopplerHz": float(dopplers[row] + offset),
            "cn0DbHz": float(10 * np.log10(snr * 1000)),
        }

    return work


if __name__ == "__main__":
    twin.serve(prepare)
