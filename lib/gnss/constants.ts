export const SPEED_OF_LIGHT_M_S = 299_792_458; // exact, SI definition
export const BOLTZMANN_J_K = 1.380649e-23; // exact, SI 2019
export const L1_HZ = 1575.42e6; // IS-GPS-200, 3.3.1.1
export const CA_CHIP_RATE_HZ = 1.023e6; // IS-GPS-200, 3.3.2.1
export const CA_LENGTH_CHIPS = 1023; // IS-GPS-200, 3.2.1.3
export const DATA_BIT_MS = 20; // 50 bit/s, IS-GPS-200, 3.2.2

/** Length of C/A chips along the signal's path, 293.05 m each. */
export const chipsToMetres = (chips: number): number => (chips * SPEED_OF_LIGHT_M_S) / CA_CHIP_RATE_HZ;

/** Duration of C/A chips, 0.97752 us each. */
export const chipsToSeconds = (chips: number): number => chips / CA_CHIP_RATE_HZ;
