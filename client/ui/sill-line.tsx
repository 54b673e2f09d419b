const paths = {
  flat: 'M0 22H300',
  sill: 'M0 22H110V6M170 6V16H300',
  broken: 'M0 22H110V12M170 10V16H300',
} as const;

/** The sill drawn wide and quiet over an empty page: flat when nothing is found, a step when one must sign in, parted on an error. */
export function SillLine({ shape }: { shape: keyof typeof paths }) {
  return (
    <svg className="sill-line" viewBox="0 0 300 28" width="300" height="28" aria-hidden="true">
      <path d={paths[shape]} fill="none" stroke="var(--color-rule)" strokeWidth="2" />
      {shape === 'sill' && <path d="M108.500 6H171.500" stroke="var(--color-lichen)" strokeWidth="3.500" fill="none" />}
      {shape === 'broken' && <path d="M108.500 12H133M147 10H171.500" stroke="var(--color-rust)" strokeWidth="3.500" fill="none" />}
    </svg>
  );
}
