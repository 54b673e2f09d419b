import type { Choices } from './readings.ts';

/** A formula without its charge. */
export interface Charged {
  core: string;
  charge: number;
}

function signed(sign: string, count: number): number {
  return sign.startsWith('+') ? count : -count;
}

/**
 * Takes the charge off a formula: `^2-`, `^{2-}`, `^{-2}`, `+`, `--`, `(2-)`.
 *
 * A number before a sign that is not raised may count atoms or charges (`O2-`): both are tried. A partial charge (`^{δ-}`) is no charge of the balance.
 */
export function takeCharge(text: string, choices: Choices): Charged {
  const raised = /^(.*?)\^\{?\s?(?:(\d*)([+-]+)|([+-])(\d+))\s?\}?$/.exec(text);
  if (raised) {
    const sign = (raised[3] ?? raised[4]) as string;
    const count = raised[2] || raised[5];
    return { core: raised[1] as string, charge: signed(sign, count ? Number(count) : sign.length) };
  }
  const partial = /^(.*?)\^\{?\s?\d?δ[+-]?\s?\}?$/.exec(text);
  if (partial) return { core: partial[1] as string, charge: 0 };
  const bracketed = /^(.*[A-Za-z0-9)\]])(?:\((\d?)([+-])\)|\](\d)([+-]))$/.exec(text);
  if (bracketed) return { core: `${bracketed[1]}${bracketed[4] ? ']' : ''}`, charge: signed((bracketed[3] ?? bracketed[5]) as string, Number(bracketed[2] || bracketed[4] || 1)) };
  const bare = /^(.*[A-Za-z0-9)\]])(\++|-+)$/.exec(text);
  if (!bare) return { core: text, charge: 0 };
  const core = bare[1] as string;
  const sign = bare[2] as string;
  const digit = sign.length === 1 ? /^(.*[A-Za-z)\d])([2-4])$/.exec(core) : null;
  if (digit) {
    // SO42- has a count and a charge; O2- can be either.
    const way = /\d$/.test(digit[1] as string) ? 'charge' : choices.pick(`number-before-sign:${text}`, ['atoms', 'charge']);
    if (way === 'charge') return { core: digit[1] as string, charge: signed(sign, Number(digit[2])) };
  }
  return { core, charge: signed(sign, sign.length) };
}
