import { Link } from 'react-router-dom';
import { purposes } from '../purposes.ts';
import { Formula } from '#client/ui/formula.tsx';

/** The calculators by purpose: what each answers, in a line, and its first formula. */
export function CalculatorList() {
  return (
    <div className="calculator-list">
      {purposes.filter((purpose) => purpose.sheets.length > 0).map((purpose) => (
        <section key={purpose.id} className="section-line calculator-group" aria-labelledby={`purpose-${purpose.id}`}>
          <div>
            <h2 id={`purpose-${purpose.id}`}>{purpose.title}</h2>
            <p className="text-second">{purpose.line}</p>
          </div>
          <ul>
            {purpose.sheets.map(({ calculator }) => (
              <li key={calculator.name} className="calculator-line">
                <div>
                  <h3><Link className="quiet-link" to={`/workbench/${calculator.name}`}>{calculator.title}</Link></h3>
                  <p className="text-second"><Formula text={calculator.summary.replace(/_([a-z]{2,})/g, '_{$1}')} prose /></p>
                </div>
                <p className="calculator-line-formula"><Formula text={calculator.formulas[0] ?? ''} /></p>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}
