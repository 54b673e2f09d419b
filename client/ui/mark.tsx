/** The mark: a low line, a step up, a flat top in lichen, a step down to a middle line. */
export function Mark({ size = 30 }: { size?: number }) {
  return (
    <svg width={size} height={size * 0.8} viewBox="0 0 30 24" aria-hidden="true">
      <path d="M1 20.500H9V5M20 5V14.500H29" fill="none" stroke="currentColor" strokeWidth="2.200" />
      <path d="M7.900 4.400H21.100" fill="none" stroke="var(--color-lichen)" strokeWidth="3.600" />
    </svg>
  );
}
