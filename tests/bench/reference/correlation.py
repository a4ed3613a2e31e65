"""
All circular correlations of all pairs of C/A codes in numpy: real transforms of the codes' own length in single precision,
one row of 32 products at a time, which stays in the cache, rounded into whole numbers in memory that is kept. One thread.
"""

import json
import os

import numpy as np
import scipy.fft

import twin
from ca_code import ca_code


def prepare(folder):
    with open(os.path.join(folder, "inputs.json")) as file:
        prns = json.load(file)["prns"]
    codes = np.stack([ca_code(prn) for prn in prns])
    count, length = codes.shape
    lags = np.empty((count, count, length), np.int16)

    def work():
        spectra = scipy.fft.rfft(codes, axis=1, workers=1)
        for row, spectrum in enumerate(spectra):
            values = scipy.fft.irfft(spectrum.conj() * spectra, length, axis=1, workers=1)
            np.rint(values, out=values)
            lags[row] = values
        return lags.reshape(-1)

    return work


if __name__ == "__main__":
    twin.serve(prepare)
