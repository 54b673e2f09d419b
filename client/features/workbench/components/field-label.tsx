import { UnitText } from '#client/ui/unit-text.tsx';
import { Formula } from '#client/ui/formula.tsx';

interface FieldLabelProps {
  label: string;
  symbol?: string;
  unit?: string;
}

/** The name of a field: trade term, letter, unit. */
export function FieldLabel({ label, symbol, unit }: FieldLabelProps) {
  return (
    <>
      {label}
      {symbol && <>{' '}<span className="formula-letter"><Formula text={symbol} silent /></span></>}
      {unit && <>{', '}<UnitText unit={unit} /></>}
    </>
  );
}
