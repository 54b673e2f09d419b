/** The valid range as typed [K]; an end that is not given is null. */
export function validRange(own: Readonly<Record<string, string>>): { from: number | null; to: number | null } {
  const end = (text: string | undefined) => (text ? Number(text) : null);
  return { from: end(own.validFromK), to: end(own.validToK) };
}
