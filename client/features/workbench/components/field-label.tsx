import { UnitText } from '#client/ui/unit-text.tsx';
import { Formula } from './formula.tsx';

interface FieldLabelProps {
  label: string;
  symbol?: string;
  unit?: string;
  optional?: boolean;
}

/** The name of a field: trade term, letter, unit. */
export function FieldLabel({ label, symbol, unit, optional = false }: FieldLabelProps) {
  return (
    <>
      {label}
      {symbol && <>{' '}<span className="formula-letter"><Formula text={symbol} /></span></>}
      {unit && <>{', '}<UnitText unit={unit} /></>}
      {optional && <span className="field-required"> (optional)</span>}
    </>
  );
}
