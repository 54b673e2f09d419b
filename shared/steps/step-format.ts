import { readStep, type ElementaryStep } from './parse-step.ts';
import { tokensOf, wordsOf, type StepToken } from './set-terms.ts';

export type { StepToken };

/**
 * Cuts an equation into pieces for a renderer: lowered counts, raised charges and isotopes, asterisks, plus signs and the arrow.
 *
 * @param step an elementary step, or its equation
 * @throws StepError when an equation can't be read
 * @example stepTokens('N2 + 2* -> 2N*').map((token) => token.kind).slice(0, 3) // ['text', 'sub', 'plus']
 */
export function stepTokens(step: Pick<ElementaryStep, 'reactants' | 'products'> | string): StepToken[] {
  return tokensOf(typeof step === 'string' ? readStep(step) : step);
}

/**
 * Says an equation in words, for a screen reader.
 *
 * @throws StepError when it can't be read
 * @example speakStep('2N* -> N2 + 2*') // 'two N adsorbed to N2 gas and two free sites'
 */
export function speakStep(step: Pick<ElementaryStep, 'reactants' | 'products'> | string): string {
  return wordsOf(typeof step === 'string' ? readStep(step) : step);
}
