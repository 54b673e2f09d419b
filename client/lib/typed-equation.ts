import { StepError } from '#shared/steps/step-error.ts';
import { speakStep, stepTokens, type StepToken } from '#shared/steps/step-format.ts';
import { setAsTyped, spacedCount, type EquationToken, type SetEquation } from './equation-tokens.ts';

const kindOf: Readonly<Record<Exclude<StepToken['kind'], 'sup' | 'coefficient'>, EquationToken['kind']>> = {
  'text': 'text', 'sub': 'index', 'site': 'star', 'site-type': 'site', 'plus': 'plus', 'arrow': 'arrow',
};

function fromStepToken({ kind, text }: StepToken, index: number, all: readonly StepToken[]): EquationToken {
  if (kind === 'coefficient') return { kind: 'count', text: spacedCount(text, all[index + 1]?.text ?? '') };
  if (kind === 'sup') return /^\d+$/.test(text) ? { kind: 'isotope', text } : { kind: 'charge', text: `^${text}` };
  return { kind: kindOf[kind], text: kind === 'site-type' ? `_${text}` : text };
}

/** Only the symbol right after an isotope's number belongs to it: the letters that follow are cut off. */
function afterIsotope(token: EquationToken, index: number, all: readonly EquationToken[]): EquationToken[] {
  const [, symbol, rest] = /^([A-Z][a-z]?)(.+)$/.exec(token.text) ?? [];
  if (all[index - 1]?.kind !== 'isotope' || !symbol || !rest) return [token];
  return [{ kind: 'text', text: symbol }, { kind: 'text', text: rest }];
}

/** An equation in any notation, read by the whole reader and set in the spelling kept; what can't be read is set as typed. */
export function setTyped(equation: string): SetEquation {
  try {
    return { tokens: stepTokens(equation).map(fromStepToken).flatMap(afterIsotope), spoken: speakStep(equation) };
  } catch (error) {
    if (error instanceof StepError) return setAsTyped(equation);
    throw error;
  }
}
