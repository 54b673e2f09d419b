import type { ReactNode } from 'react';
import { Sign } from './signs.tsx';

interface PrintedConvertedProps {
  /** The value string exactly as the source gives it. */
  printed: ReactNode;
  /** Where in the source: "Table 2, page 113". */
  locator?: ReactNode;
  /** The converted value (a large `Value`), or what is missing for it. */
  converted: ReactNode;
  /** What the converted value is: "activation energy, measured, elementary". */
  meaning?: ReactNode;
  convertedLabel?: ReactNode;
  /** The result stands (lichen), or it could not be reached or is doubtful (ochre). */
  state?: 'result' | 'doubt';
}

/** The pair at the head of an entry: as printed, and what it became. */
export function PrintedConverted({ printed, locator, converted, meaning, convertedLabel = 'Converted', state = 'result' }: PrintedConvertedProps) {
  return (
    <div className="printed-converted">
      <div className="printed-converted-side">
        <p className="field-label">As printed{locator && <>, {locator}</>}</p>
        <div className="notice notice-quotation printed-converted-body"><samp className="printed-value">{printed}</samp></div>
      </div>
      <Sign of="->" className="printed-converted-arrow" />
      <div className="printed-converted-side">
        <p className="field-label">{convertedLabel}</p>
        <div className={`notice ${state === 'result' ? 'notice-result' : 'notice-doubt'} printed-converted-body`}>
          <div>{converted}</div>
          {meaning && <div className="text-second">{meaning}</div>}
        </div>
      </div>
    </div>
  );
}
