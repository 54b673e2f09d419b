/**
 * The page to return to after signing in: only a path of this application, never another site.
 * @example readNext('/review?state=mine') // '/review?state=mine'
 * @example readNext('//elsewhere.example') // '/search'
 */
export function readNext(next: string | null): string {
  if (!next || !next.startsWith('/') || next.startsWith('/sign-in')) return '/search';
  // "//host" and "/\host" are addresses of another site to a browser.
  if (/^\/[/\\]/.test(next) || hasControlCharacter(next)) return '/search';
  return next;
}

function hasControlCharacter(text: string): boolean {
  return [...text].some((character) => character.charCodeAt(0) < 32);
}
