/** The eight points a reviewer holds against the paper before accepting. */
export const checklistPoints = ['source', 'value', 'unit', 'step', 'surface', 'uncertainty', 'range', 'primary'] as const;
export type ChecklistPoint = (typeof checklistPoints)[number];

/** The points in words, as the review page shows them. */
export const checklistWords: Readonly<Record<ChecklistPoint, string>> = {
  source: 'The DOI is this paper',
  value: 'Value and digits as printed',
  unit: 'Unit as printed',
  step: 'Elementary step and its direction',
  surface: 'Surface and site',
  uncertainty: 'Uncertainty and its kind',
  range: 'Valid range or model conditions',
  primary: 'Not a value quoted from elsewhere',
};

export const checklistAnswers = ['yes', 'no', 'not-applicable'] as const;
export type ChecklistAnswer = (typeof checklistAnswers)[number];

export const decisions = ['accept', 'return', 'reject'] as const;
export type DecisionKind = (typeof decisions)[number];

/** Why a submission is returned or rejected: a closed list, so that it can be counted. */
export const decisionReasons = [
  'value-differs-from-source', 'unit-differs-from-source', 'step-or-direction', 'surface-or-site', 'uncertainty-kind', 'conditions-missing',
  'locator-missing', 'quoted-from-elsewhere', 'duplicate', 'source-retracted', 'out-of-scope', 'other',
] as const;
export type DecisionReason = (typeof decisionReasons)[number];
export const decisionReasonWords: Readonly<Record<DecisionReason, string>> = {
  'value-differs-from-source': 'The value differs from the source',
  'unit-differs-from-source': 'The unit differs from the source',
  'step-or-direction': 'Elementary step or direction is not right',
  'surface-or-site': 'Surface or site is not right',
  'uncertainty-kind': 'The kind of uncertainty is not what the source says',
  'conditions-missing': 'Conditions are missing',
  'locator-missing': 'The place in the source is missing',
  'quoted-from-elsewhere': 'Quoted from elsewhere: enter the primary source',
  'duplicate': 'Already in the store',
  'source-retracted': 'The source is retracted',
  'out-of-scope': 'Not a kinetic parameter of a step on a metal surface',
  'other': 'Another reason, given in the comment',
};

/** How long a claim holds without activity [h]. */
export const claimHours = 72;
