/** Codes of an elementary step that can't be taken. */
export const stepErrorCodes = ['unreadable', 'no-arrow', 'empty-side', 'ambiguous', 'unbalanced', 'no-change'] as const;

/** One of `stepErrorCodes`. */
export type StepErrorCode = (typeof stepErrorCodes)[number];

/** One thing that differs between the sides. */
export interface Imbalance {
  /** Element symbol, isotope (`2H`), `site` or `charge`. */
  what: string;
  /** Products minus reactants. */
  by: number;
}

/** An equation that is not an elementary step: where or what is wrong, and what to write instead where that is known. */
export class StepError extends Error {
  readonly code: StepErrorCode;
  /** Position in the text as typed, counted from 0. */
  readonly position?: number;
  readonly imbalance?: Imbalance[];
  /** The equation with the missing free sites. */
  readonly suggestion?: string;
  /** What an ambiguous text can mean, each in a spelling that means it alone. */
  readonly readings?: string[];

  constructor(code: StepErrorCode, message: string, detail: { position?: number; imbalance?: Imbalance[]; suggestion?: string; readings?: string[] } = {}) {
    super(message);
    this.name = 'StepError';
    this.code = code;
    this.position = detail.position;
    this.imbalance = detail.imbalance;
    this.suggestion = detail.suggestion;
    this.readings = detail.readings;
  }
}
