"""
Detection probability of a search plan in scipy: for each drawn satellite the mean signal-to-noise ratio of its K coherent
sums, then the noncentral chi-square law, all vectorised.
"""

import json
import os

import numpy as np
import scipy.stats

import twin


def prepare(folder):
    with open(os.path.join(folder, "inputs.json")) as file:
        plan = json.load(file)
    draws = np.fromfile(os.path.join(folder, "draws.f64")).reshape(-1, 4)
    coherent_s = plan["coherentMs"] / 1000
    sums = plan["sums"]
    snr = 10 ** (plan["cn0DbHz"] / 10) * coherent_s
    cells = (2 * np.ceil(plan["windowHz"] / plan["dopplerBinHz"]) + 1) * (1023 / plan["codeStepChips"])
    per_cell = -np.expm1(np.log1p(-plan["falseAlarmPerSearch"]) / cells)

    def power_left(turns, flip):
        """Power of a coherent sum whose phase gains so many turns and whose sign flips at a fraction of it."""
        end = np.exp(2j * np.pi * turns)
        middle = np.exp(2j * np.pi * turns * flip)
        return np.abs(2 * middle - 1 - end) ** 2 / (2 * np.pi * turns) ** 2

    def work():
        threshold = scipy.stats.chi2.isf(per_cell, 2 * sums)
        code, doppler, edge, coin = draws.T
        offset = (code - 0.5) * plan["codeStepChips"]
        turns = (doppler - 0.5) * plan["dopplerBinHz"] * coherent_s
        smooth = np.sinc(turns) ** 2
        place = edge * 20 / plan["coherentMs"]
        flipped = power_left(turns, place - np.floor(place))
        power = sums * smooth + np.where(coin < 0.5, 0, flipped - smooth)
        rho = snr * (1 - np.abs(offset)) ** 2 * power / sums
        return float(scipy.stats.ncx2.sf(threshold, 2 * sums, 2 * sums * rho).mean())

    return work


if __name__ == "__main__":
    twin.serve(prepare)
