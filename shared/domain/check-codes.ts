import { checkCodes as recordCheckCodes } from '../kinetics/plausibility.ts';

/** The checks that need the store to answer; the rest are raised by the computing core from the record alone. None of these blocks. */
const storeCheckCodes = ['same-source-same-value', 'quoted-elsewhere', 'source-retracted', 'source-corrected', 'free-sites-added'] as const;

/** Every check an entry may raise: a closed list. */
export const checkCodes = [...recordCheckCodes, ...storeCheckCodes] as const;
export type CheckCode = (typeof checkCodes)[number];
