/**
 * Physical constants, CODATA 2022: exact SI values except the hartree energy.
 * Source: CODATA recommended values 2022 (NIST); SI Brochure, 9th edition; NIST SP 811 for calorie, atmosphere, torr, Btu, pound.
 */

/** Name of the set of constants, written into every derivation and export. */
export const CONSTANTS_VERSION = 'CODATA 2022';

/** Version of the computing core, written beside every stored conversion. */
export const CORE_VERSION = '1.1.0';

/** Avogadro constant [mol-1], exact. */
export const N_A = 6.02214076e23;

/** Boltzmann constant [J K-1], exact. */
export const k_B = 1.380649e-23;

/** Molar gas constant [J mol-1 K-1], exact: N_A k_B. */
export const R = 8.31446261815324;

/** Planck constant [J s], exact. */
export const h = 6.62607015e-34;

/** Speed of light in vacuum [m s-1], exact. */
export const c = 299792458;

/** Elementary charge [C], exact. */
export const e = 1.602176634e-19;

/** Hartree energy [J], standard uncertainty 4.8e-30 J. */
export const E_h = 4.359744722206e-18;

/** Thermochemical calorie [J], exact. */
export const calorie = 4.184;

/** Standard atmosphere [Pa], exact. */
export const atm = 101325;

/** Torr [Pa], exact as the fraction 101325/760. */
export const Torr = 101325 / 760;

/** International Table British thermal unit [J], exact. */
export const btuInternationalTable = 1055.05585262;

/** Avoirdupois pound [kg], exact. */
export const pound = 0.45359237;

/** Thermochemical British thermal unit [J]: 1 cal per gram and kelvin on the pound and degree Fahrenheit, 4184 × 0.45359237 × 5/9. */
export const btuThermochemical = 1054.3502644888888;
