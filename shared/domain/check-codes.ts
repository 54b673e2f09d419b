/**
 * The checks that need the store to answer (the rest are raised by the computing core from the record alone). Each is a closed code, shown
 * with its reason and figures; none of these blocks a submission.
 */
export const storeCheckCodes = [
  'outlier', 'slip-hint', 'same-source-same-value', 'quoted-elsewhere', 'source-retracted', 'source-corrected', 'source-unconfirmed', 'below-reaction-energy',
] as const;
export type StoreCheckCode = (typeof storeCheckCodes)[number];
