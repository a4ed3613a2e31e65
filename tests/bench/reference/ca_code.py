"""C/A codes from the two registers of IS-GPS-200, 3.3.2.3, and the selector stages of its Table 3-Ia."""

import numpy as np

# fmt: off
STAGES = {
    1: (2, 6), 2: (3, 7), 3: (4, 8), 4: (5, 9), 5: (1, 9), 6: (2, 10), 7: (1, 8), 8: (2, 9), 9: (3, 10), 10: (2, 3),
    11: (3, 4), 12: (5, 6), 13: (6, 7), 14: (7, 8), 15: (8, 9), 16: (9, 10), 17: (1, 4), 18: (2, 5), 19: (3, 6),
    20: (4, 7), 21: (5, 8), 22: (6, 9), 23: (1, 3), 24: (4, 6), 25: (5, 7), 26: (6, 8), 27: (7, 9), 28: (8, 10),
    29: (1, 6), 30: (2, 7), 31: (3, 8), 32: (4, 9),
}
# fmt: on


def ca_code(prn):
    """1023 chips of +1 (logic 0) or -1 (logic 1), float32."""
    first, second = STAGES[prn]
    g1 = np.ones(10, np.uint8)
    g2 = np.ones(10, np.uint8)
    levels = np.empty(1023, np.uint8)
    for n in range(1023):
        levels[n] = g1[9] ^ g2[first - 1] ^ g2[second - 1]
        feed1 = g1[2] ^ g1[9]
        feed2 = g2[1] ^ g2[2] ^ g2[5] ^ g2[7] ^ g2[8] ^ g2[9]
        g1[1:], g2[1:] = g1[:-1].copy(), g2[:-1].copy()
        g1[0], g2[0] = feed1, feed2
    return (1 - 2 * levels.astype(np.float32)).astype(np.float32)
