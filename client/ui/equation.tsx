import { memo, useEffect, useState, type ReactNode } from 'react';
import { setAsTyped, setPrinted, type EquationToken, type SetEquation } from '#client/lib/equation-tokens.ts';
import { Sign } from './signs.tsx';

interface EquationProps {
  /** An equation in plain spelling: `N* + N* -> N2 + 2*`. */
  equation: string;
  /** In the slab face, for group rows and headings. */
  display?: boolean;
}

/** A charge is set with a true minus sign and copied with the one that is typed. */
function setCharge(charge: string): ReactNode {
  return <><span className="plain-spelling">{charge}</span><sup className="equation-charge" data-set={charge.slice(1).replace('-', '\u2212')} /></>;
}

function setToken(token: EquationToken, before: EquationToken | undefined): ReactNode {
  switch (token.kind) {
    case 'index': return <sub>{token.text}</sub>;
    case 'isotope': return <><span className="plain-spelling">[</span><sup>{token.text}</sup></>;
    case 'charge': return setCharge(token.text.replace('\u2212', '-'));
    case 'site': return <><span className="plain-spelling">_</span><sub className="equation-site">{token.text.slice(1)}</sub></>;
    case 'star': return <span className="equation-star">{token.text}</span>;
    case 'phase': return <span className="equation-phase">{token.text}</span>;
    case 'plus': return <span className="equation-plus">{' + '}</span>;
    case 'arrow': return <>{' '}<Sign of="->" className="equation-arrow" />{' '}</>;
    case 'equilibrium': return <>{' '}<Sign of="<->" className="equation-arrow" />{' '}</>;
    // The bracket of a nuclide ends with its symbol.
    case 'text': return before?.kind === 'isotope' ? <>{token.text}<span className="plain-spelling">]</span></> : token.text;
    default: return token.text;
  }
}

type SetTyped = (equation: string) => SetEquation;
let wholeReader: SetTyped | null = null;

/** An equation cut into pieces. The whole reader is fetched for the first one that is not in the spelling kept; until it is there, and without it, what was typed is set. */
function useSetEquation(equation: string): SetEquation {
  const [reader, setReader] = useState<SetTyped | null>(() => wholeReader);
  const printed = setPrinted(equation);
  const wanted = printed === null && reader === null && equation.trim() !== '';
  useEffect(() => {
    if (!wanted) return;
    let shown = true;
    void import('#client/lib/typed-equation.ts').then(({ setTyped }) => {
      wholeReader = setTyped;
      if (shown) setReader(() => setTyped);
    }, () => undefined);
    return () => {
      shown = false;
    };
  }, [wanted]);
  return printed ?? (reader ?? setAsTyped)(equation);
}

/** An equation set with true indices and quiet raised asterisks; read aloud in words, copied in plain spelling. */
export const Equation = memo(function Equation({ equation, display = false }: EquationProps) {
  const { tokens, spoken } = useSetEquation(equation);
  return (
    <span className={display ? 'equation equation-display' : 'equation'} role="img" aria-label={spoken}>
      {tokens.map((token, index) => {
        const before = tokens[index - 1];
        // A hair of room after a count of species, so that "2 N*" is not read as "2N".
        const gap = before?.kind === 'count' && token.kind !== 'star' && !before.text.endsWith(' ') ? <span className="equation-gap" /> : null;
        return <span key={index}>{gap}{setToken(token, before)}</span>;
      })}
    </span>
  );
});
