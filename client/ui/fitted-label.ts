/** Width of a character of the plot's text [px], taken rather too wide than too narrow. */
export const characterPx = 6.4;

/** Room that a text of a plot takes [px], by the count of its characters. */
export function textWidth(text: string): number {
  return [...text].length * characterPx;
}

/** A text that fits into so much room; one that is too long loses its end. */
export function fittedLabel(text: string, room: number): string {
  const most = Math.max(2, Math.floor(room / characterPx));
  const characters = [...text];
  return characters.length <= most ? text : `${characters.slice(0, most - 1).join('').trimEnd()}…`;
}
