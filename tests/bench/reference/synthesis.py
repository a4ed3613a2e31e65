"""
Synthesis of complex 8-bit samples in numpy: satellites with data bits and code Doppler in white noise, satellite by satellite
over the whole length, complex64 where it suffices (phases need double), noise from single-precision normal draws.
Whole arrays are how this is usually written; cut into blocks that stay in the cache, the same lines take much less time.
"""

import json
import os

import numpy as np

import twin
from ca_code import ca_code

CARRIER = 1575.42e6
COUNTS_PER_SIGMA = 24


def prepare(folder):
    with open(os.path.join(folder, "inputs.json")) as file:
        given = json.load(file)
    rate = given["rateHz"]
    count = rate * given["durationMs"] // 1000
    codes = [ca_code(one["prn"]) for one in given["satellites"]]
    index = np.arange(count, dtype=np.float64)

    def signal(one, code):
        doppler = one["dopplerHz"]
        chips = one["codePhaseChips"] + index * (1.023e6 * (1 + doppler / CARRIER) / rate)
        whole = chips.astype(np.int64)
        bits = np.asarray(one["dataBits"], np.float32)
        level = bits[(whole // 1023 + 20 - one["bitEdgeMs"]) // 20 % bits.size]
        carrier = np.exp(2j * np.pi * (one["carrierPhaseCycles"] + index * (doppler / rate))).astype(np.complex64)
        amplitude = np.float32(COUNTS_PER_SIGMA * np.sqrt(2 * 10 ** (one["cn0DbHz"] / 10) / rate))
        return amplitude * level * code[whole % 1023] * carrier

    def work():
        random = np.random.default_rng(1)
        counts = COUNTS_PER_SIGMA * random.standard_normal(2 * count, dtype=np.float32)
        for one, code in zip(given["satellites"], codes):
            counts += signal(one, code).view(np.float32)
        samples = np.clip(np.rint(counts), -127, 127).astype(np.int8)
        return {"power": float(np.square(samples[::97].astype(np.float32)).mean())}

    return work


if __name__ == "__main__":
    twin.serve(prepare)
