export type SignText = '≥' | '>' | '≤' | '<' | '≈' | '->' | '<->' | '=';

interface Drawing {
  width: number;
  paths: string;
}

/** Drawn, since the fonts that ship here lack these signs and a bare machine has no others. */
const drawings: Readonly<Record<SignText, Drawing>> = {
  '≥': { width: 12, paths: 'M2 3L10 7L2 11M2 14H10' },
  '>': { width: 12, paths: 'M2 4L10 8.500L2 13' },
  '≤': { width: 12, paths: 'M10 3L2 7L10 11M2 14H10' },
  '<': { width: 12, paths: 'M10 4L2 8.500L10 13' },
  '≈': { width: 12, paths: 'M2 7.500C4 5 5.500 5.500 6.500 6.500S9 8 10.500 5.500M2 12C4 9.500 5.500 10 6.500 11S9 12.500 10.500 10' },
  '=': { width: 12, paths: 'M2 6.500H10M2 10.500H10' },
  '->': { width: 20, paths: 'M2 8.500H17.500M13 4.500L17.500 8.500L13 12.500' },
  '<->': { width: 20, paths: 'M2 6.500H18L14 2.800M18 10.500H2L6 14.200' },
};

/** A sign drawn in the line of text; a copy of the text has its plain spelling. */
export function Sign({ of, className = '' }: { of: SignText; className?: string }) {
  const { width, paths } = drawings[of];
  return (
    <span className={`sign ${className}`}>
      <span className="plain-spelling">{of}</span>
      <svg viewBox={`0 0 ${width} 17`} style={{ width: `${width / 17}em` }} className="sign-drawing" aria-hidden="true">
        <path d={paths} fill="none" stroke="currentColor" strokeWidth="1.350" />
      </svg>
    </span>
  );
}
