import { NavLink } from 'react-router-dom';
import { purposes } from '../purposes.ts';

/** The other calculators by purpose; a link carries nothing of what is typed here. */
export function CalculatorNav() {
  return (
    <nav className="calculator-nav no-print" aria-label="Calculators">
      {purposes.map((purpose) => (
        <div key={purpose.id}>
          <p className="calculator-nav-purpose" id={`nav-${purpose.id}`}>{purpose.title}</p>
          <ul aria-labelledby={`nav-${purpose.id}`}>
            {purpose.sheets.map(({ calculator }) => <li key={calculator.name}><NavLink to={`/workbench/${calculator.name}`}>{calculator.title}</NavLink></li>)}
          </ul>
        </div>
      ))}
    </nav>
  );
}
