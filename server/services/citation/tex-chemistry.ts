const arrows: readonly (readonly [form: string, tex: string])[] = [
  ['<=>>', '\\rightleftharpoons'], ['<<=>', '\\rightleftharpoons'], ['<=>', '\\rightleftharpoons'], ['<-->', '\\rightleftharpoons'], ['<->', '\\leftrightarrow'], ['->', '\\rightarrow'], ['<-', '\\leftarrow'],
];

/**
 * Turns the argument of `\ce{…}` into ordinary TeX: digits after an element or a bracket become subscripts, charges superscripts,
 * arrows arrows (mhchem manual, from memory).
 */
export function chemistryToTex(formula: string): string {
  let out = '';
  let at = 0;
  while (at < formula.length) {
    const rest = formula.slice(at, at + 40);
    const arrow = arrows.find(([form]) => rest.startsWith(form));
    if (arrow !== undefined) {
      out += `$${arrow[1]}$`;
      at += arrow[0].length;
      continue;
    }
    const before = formula[at - 1] ?? '';
    const digits = /^\d+(?:\.\d+)?/.exec(rest);
    if (digits !== null && /[A-Za-z)\]]/.test(before)) {
      out += `$_{${digits[0]}}$`;
      at += digits[0].length;
      continue;
    }
    const braced = /^([\^_])\{([^{}]{0,30})\}/.exec(rest);
    if (braced !== null) {
      out += `$${braced[1] ?? ''}{${braced[2] ?? ''}}$`;
      at += braced[0].length;
      continue;
    }
    const script = /^([\^_])([0-9]*[+-]?|[a-z])/.exec(rest);
    if (script !== null && (script[2] ?? '') !== '') {
      out += `$${script[1] ?? ''}{${script[2] ?? ''}}$`;
      at += script[0].length;
      continue;
    }
    const charge = /^[+-](?=\s|$|[)\]}])/.exec(rest);
    if (charge !== null && /[A-Za-z0-9)\]]/.test(before)) {
      out += `$^{${charge[0]}}$`;
      at += 1;
      continue;
    }
    out += formula[at] ?? '';
    at += 1;
  }
  return out;
}
