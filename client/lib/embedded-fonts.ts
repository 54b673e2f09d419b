/** Faces read so far, by address: a second export does not fetch them again. */
const read = new Map<string, Promise<string | null>>();

async function asDataAddress(address: string): Promise<string | null> {
  const answer = await fetch(address);
  if (!answer.ok) return null;
  const bytes = new Uint8Array(await answer.arrayBuffer());
  let binary = '';
  for (const byte of bytes) binary += String.fromCharCode(byte);
  return `data:font/woff2;base64,${btoa(binary)}`;
}

/** The rules of upright faces of the page that have basic Latin letters. */
function latinFaces(): CSSFontFaceRule[] {
  return [...document.styleSheets].flatMap((sheet) => {
    try {
      return allRules(sheet.cssRules);
    } catch {
      return []; // a sheet of another origin does not show its rules
    }
  });
}

function allRules(rules: CSSRuleList): CSSFontFaceRule[] {
  return [...rules].flatMap((rule) => {
    if (rule instanceof CSSFontFaceRule) return /normal|^$/.test(rule.style.getPropertyValue('font-style')) && /U\+0+-0*FF\b/i.test(rule.style.getPropertyValue('unicode-range')) ? [rule] : [];
    return rule instanceof CSSGroupingRule ? allRules(rule.cssRules) : [];
  });
}

/**
 * The style rules that carry the used families inside a drawing, so that it looks the same where they are not
 * installed; empty where a face cannot be read: the drawing then falls back to the next family.
 */
export async function embeddedFonts(families: ReadonlySet<string>): Promise<string> {
  if (typeof CSSFontFaceRule === 'undefined') return '';
  const faces = latinFaces().map((rule) => ({
    rule, family: rule.style.getPropertyValue('font-family').replace(/["']/g, ''),
    address: /url\(["']?([^"')]+)["']?\)/.exec(rule.style.getPropertyValue('src'))?.[1],
  }));
  const rules = await Promise.all(faces.map(async ({ rule, family, address }) => {
    if (!families.has(family) || !address) return '';
    const full = new URL(address, rule.parentStyleSheet?.href ?? document.baseURI).href;
    const reading = read.get(full) ?? asDataAddress(full).catch(() => null);
    read.set(full, reading);
    const data = await reading;
    if (data === null) read.delete(full);
    return data === null ? '' : `@font-face{font-family:'${family}';font-weight:200 900;src:url(${data}) format('woff2');}`;
  }));
  return rules.join('');
}
