"""
Makes captures for the search to be tried on, as SigMF recordings with their truth: hard chips sampled as they come, code
Doppler, data bits, white noise, jammers; every sample format, odd rates, intermediate frequencies. Shares nothing with the
engine. Called with a folder and a number of captures; prints one line of JSON per capture.
"""

import json
import os
import sys

import numpy as np

from ca_code import ca_code

CARRIER = 1575.42e6
FORMATS = ["ci8", "cu8", "ci16_le", "cf32_le", "ri8", "ri16_le"]
COMPLEX_TUNINGS = [(rate, shift) for rate in (2.048e6, 4.092e6, 5.456e6, 16.368e6) for shift in (0.0, 1.25e6, 4.092e6)]
REAL_TUNINGS = [(5.456e6, 1.25e6), (16.368e6, 1.25e6), (16.368e6, 4.092e6), (4.092e6, 1.25e6), (5.456e6, 4.092e6)]
KINDS = ["open sky", "near-far", "tone", "narrow FM", "noise alone"]
SECONDS = 0.020


def satellites_of(kind, random):
    if kind == "noise alone":
        return []
    prns = random.permutation(np.arange(1, 33))[: random.integers(4, 9)]
    levels = random.uniform(38, 46, prns.size)
    if kind == "near-far":
        levels = np.full(prns.size, 38.0)
        levels[0] = 58.0
    return [
        {
            "prn": int(prn),
            "codePhaseChips": float(random.uniform(0, 1023)),
            "dopplerHz": float(random.uniform(-6500, 6500)),
            "cn0DbHz": float(level),
        }
        for prn, level in zip(prns, levels)
    ]


def signal_of(satellite, rate, shift, seconds, random):
    doppler = satellite["dopplerHz"]
    chips = satellite["codePhaseChips"] + 1.023e6 * (1 + doppler / CARRIER) * seconds
    bits = random.choice([-1.0, 1.0], 8)
    level = bits[np.floor(seconds * 50 + random.uniform()).astype(int)]
    phase = random.uniform() + (shift + doppler) * seconds
    amplitude = np.sqrt(10 ** (satellite["cn0DbHz"] / 10) / rate)
    return amplitude * level * ca_code(satellite["prn"])[np.floor(chips).astype(int) % 1023] * np.exp(2j * np.pi * phase)


def jammer_of(kind, satellites, rate, shift, seconds, random):
    if kind not in ("tone", "narrow FM"):
        return 0
    strongest = max(satellite["cn0DbHz"] for satellite in satellites)
    amplitude = np.sqrt(10 ** ((strongest + 30) / 10) / rate)
    phase = (shift + random.uniform(-0.8e6, 0.8e6)) * seconds + random.uniform()
    if kind == "narrow FM":
        phase = phase + 30.0 * np.sin(2 * np.pi * 400 * seconds)  # 12 kHz of deviation
    return amplitude * np.exp(2j * np.pi * phase)


def make(folder, number):
    random = np.random.default_rng(number)
    datatype = FORMATS[number % len(FORMATS)]
    kind = KINDS[(number // len(FORMATS)) % len(KINDS)]
    tunings = COMPLEX_TUNINGS if datatype[0] == "c" else REAL_TUNINGS
    rate, shift = tunings[random.integers(len(tunings))]
    seconds = np.arange(int(rate * SECONDS)) / rate
    satellites = satellites_of(kind, random)
    clean = sum(signal_of(one, rate, shift, seconds, random) for one in satellites)
    clean = clean + jammer_of(kind, satellites, rate, shift, seconds, random)
    noise = (random.standard_normal(seconds.size) + 1j * random.standard_normal(seconds.size)) * np.sqrt(0.5)
    if datatype[0] == "c":
        values = np.empty(2 * seconds.size)
        values[0::2], values[1::2] = (clean + noise).real, (clean + noise).imag
    else:
        values = (np.sqrt(2) * clean + noise).real
    name = os.path.join(folder, f"capture-{number}")
    stored(values, datatype).tofile(name + ".sigmf-data")
    meta = {
        "global": {"core:datatype": datatype, "core:version": "1.2.5", "core:sample_rate": rate},
        "captures": [{"core:sample_start": 0, "core:frequency": CARRIER - shift}],
        "annotations": [],
    }
    with open(name + ".sigmf-meta", "w") as file:
        json.dump(meta, file)
    truth = {"file": name + ".sigmf-meta", "datatype": datatype, "rateHz": rate, "ifHz": shift, "kind": kind}
    return {**truth, "satellites": satellites}


def stored(values, datatype):
    """The gain is set so that the converter of eight bits clips at 4 sigma of all that comes in."""
    unit = values / np.sqrt(np.mean(values**2))
    match datatype[1:]:
        case "i8":
            return np.clip(np.round(32 * unit), -128, 127).astype(np.int8)
        case "u8":
            return np.clip(np.round(32 * unit + 127.5), 0, 255).astype(np.uint8)
        case "i16_le":
            return np.clip(np.round(4000 * unit), -32768, 32767).astype("<i2")
        case "f32_le":
            return values.astype("<f4")
    raise ValueError(datatype)


if __name__ == "__main__":
    for number in range(int(sys.argv[2]), int(sys.argv[3])):
        print(json.dumps(make(sys.argv[1], number)), flush=True)
