/** The kinds of energy that may be chained, in words. */
export const profileQuantityWords = { gibbs: 'Gibbs energy', enthalpy: 'Enthalpy', electronic: 'Electronic energy' } as const;
