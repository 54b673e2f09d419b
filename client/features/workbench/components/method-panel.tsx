import type { Sheet } from '../sheet.ts';
import { Formula } from '#client/ui/formula.tsx';

/** The formula, where it holds and where it is published. */
export function MethodPanel({ sheet }: { sheet: Sheet }) {
  const { formulas, validity, references } = sheet.calculator;
  return (
    <section className="method" aria-labelledby="method">
      <h2 id="method">The formula and where it holds</h2>
      <div className="method-body">
        <ul className="method-formulas">{formulas.map((formula) => <li key={formula}><Formula text={formula} /></li>)}</ul>
        <p className="max-w-[68ch]"><Formula text={validity} prose /></p>
        <ul className="method-references" aria-label="Sources">{references.map((reference) => <li key={reference}>{reference}</li>)}</ul>
      </div>
    </section>
  );
}
