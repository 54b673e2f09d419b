/**
 * The characters we write as TeX commands, and the commands we read as characters.
 *
 * Commands are those of the LaTeX kernel and of its text companion symbols (LaTeX2e reference manual, from memory).
 */

/** Combining marks by accent command; the letters need braces around their argument, the signs do not. */
export const accents: readonly (readonly [command: string, mark: string])[] = [
  ['`', '\u0300'], ["'", '\u0301'], ['^', '\u0302'], ['~', '\u0303'], ['"', '\u0308'], ['=', '\u0304'], ['.', '\u0307'],
  ['u', '\u0306'], ['v', '\u030C'], ['H', '\u030B'], ['r', '\u030A'], ['c', '\u0327'], ['k', '\u0328'], ['d', '\u0323'], ['b', '\u0331'],
];

/** Characters written by a command in running text. The first command for a character is the one we write. */
export const textSymbols: readonly (readonly [command: string, character: string])[] = [
  ['AA', 'Å'], ['aa', 'å'], ['AE', 'Æ'], ['ae', 'æ'], ['OE', 'Œ'], ['oe', 'œ'], ['O', 'Ø'], ['o', 'ø'], ['L', 'Ł'], ['l', 'ł'],
  ['DJ', 'Đ'], ['dj', 'đ'], ['TH', 'Þ'], ['th', 'þ'], ['DH', 'Ð'], ['dh', 'ð'], ['NG', 'Ŋ'], ['ng', 'ŋ'], ['ss', 'ß'], ['i', 'ı'], ['j', 'ȷ'],
  ['textbackslash', '\\'], ['textasciicircum', '^'], ['textasciitilde', '~'], ['textasciigrave', '`'],
  ['textquoteleft', '‘'], ['textquoteright', '’'], ['textdegree', '°'], ['textdagger', '†'], ['textdaggerdbl', '‡'],
  ['textexclamdown', '¡'], ['textquestiondown', '¿'], ['guillemotleft', '«'], ['guillemotright', '»'], ['quotesinglbase', '‚'], ['quotedblbase', '„'],
  ['textregistered', '®'], ['texttrademark', '™'], ['textcopyright', '©'], ['textsection', '§'], ['S', '§'], ['textparagraph', '¶'], ['P', '¶'],
  ['textbullet', '•'], ['ldots', '…'], ['dots', '…'], ['textellipsis', '…'], ['pounds', '£'], ['texteuro', '€'], ['euro', '€'],
  ['textendash', '–'], ['textemdash', '—'], ['textquotedblleft', '“'], ['textquotedblright', '”'], ['textquotesingle', "'"], ['textquotedbl', '"'],
  ['textless', '<'], ['textgreater', '>'], ['textbar', '|'], ['textunderscore', '_'], ['textdollar', '$'], ['textbraceleft', '{'], ['textbraceright', '}'],
  ['textmu', 'μ'], ['textperiodcentered', '·'], ['texttimes', '×'], ['textpm', '±'], ['textminus', '−'], ['textonehalf', '½'], ['dag', '†'], ['ddag', '‡'],
  ['textrightarrow', '→'], ['textleftarrow', '←'],
];

/** Characters written by a command in mathematics. The first command for a character is the one we write. */
export const mathSymbols: readonly (readonly [command: string, character: string])[] = [
  ['alpha', 'α'], ['beta', 'β'], ['gamma', 'γ'], ['delta', 'δ'], ['epsilon', 'ϵ'], ['varepsilon', 'ε'], ['zeta', 'ζ'], ['eta', 'η'], ['theta', 'θ'], ['vartheta', 'ϑ'],
  ['iota', 'ι'], ['kappa', 'κ'], ['lambda', 'λ'], ['mu', 'μ'], ['nu', 'ν'], ['xi', 'ξ'], ['pi', 'π'], ['rho', 'ρ'], ['sigma', 'σ'], ['varsigma', 'ς'], ['tau', 'τ'], ['upsilon', 'υ'],
  ['varphi', 'φ'], ['phi', 'ϕ'], ['chi', 'χ'], ['psi', 'ψ'], ['omega', 'ω'],
  ['Gamma', 'Γ'], ['Delta', 'Δ'], ['Theta', 'Θ'], ['Lambda', 'Λ'], ['Xi', 'Ξ'], ['Pi', 'Π'], ['Sigma', 'Σ'], ['Upsilon', 'Υ'], ['Phi', 'Φ'], ['Psi', 'Ψ'], ['Omega', 'Ω'],
  ['rightarrow', '→'], ['to', '→'], ['longrightarrow', '→'], ['leftarrow', '←'], ['gets', '←'], ['leftrightarrow', '↔'], ['longleftrightarrow', '↔'], ['Rightarrow', '⇒'], ['Leftrightarrow', '⇔'],
  ['rightleftharpoons', '⇌'], ['uparrow', '↑'], ['downarrow', '↓'],
  ['times', '×'], ['cdot', '·'], ['pm', '±'], ['mp', '∓'], ['div', '÷'], ['leq', '≤'], ['le', '≤'], ['leqslant', '≤'], ['geq', '≥'], ['ge', '≥'], ['geqslant', '≥'], ['neq', '≠'], ['ne', '≠'],
  ['approx', '≈'], ['sim', '∼'], ['simeq', '≃'], ['cong', '≅'], ['equiv', '≡'], ['propto', '∝'], ['ll', '≪'], ['gg', '≫'], ['infty', '∞'], ['partial', '∂'], ['nabla', '∇'],
  ['sqrt', '√'], ['surd', '√'], ['sum', '∑'], ['prod', '∏'], ['int', '∫'], ['in', '∈'], ['cup', '∪'], ['cap', '∩'], ['ast', '∗'], ['star', '⋆'], ['circ', '∘'], ['bullet', '•'],
  ['perp', '⊥'], ['parallel', '∥'], ['angle', '∠'], ['prime', '′'], ['hbar', 'ℏ'], ['ell', 'ℓ'], ['degree', '°'], ['dagger', '†'], ['ddagger', '‡'],
  ['langle', '⟨'], ['rangle', '⟩'], ['square', '□'], ['Box', '□'], ['colon', ':'], ['lbrace', '{'], ['rbrace', '}'], ['cdots', '⋯'], ['mid', '∣'], ['vert', '|'],
];

/** Commands that only switch a font or a spacing: they disappear. */
export const silentCommands: ReadonlySet<string> = new Set([
  'relax', 'protect', 'rm', 'sf', 'tt', 'sc', 'sl', 'up', 'md', 'mathstrut', 'displaystyle', 'textstyle', 'scriptstyle', 'limits', 'nolimits', 'left', 'right', 'big', 'Big', 'bigl', 'bigr',
  'nobreak', 'allowbreak', 'noindent', 'small', 'footnotesize', 'normalsize', 'cyr', 'boldmath', 'unboldmath', 'sloppy', 'upshape', 'mdseries', 'normalfont', 'rmfamily', '/', '!', '-',
]);

/** Commands that stand for a space. */
export const spaceCommands: ReadonlySet<string> = new Set([' ', ',', ';', ':', '>', 'quad', 'qquad', 'space', 'thinspace', 'enspace', 'newline', '\\', 'par', 'linebreak']);

/** Commands that give their one argument unchanged. */
export const plainCommands: ReadonlySet<string> = new Set([
  'mathrm', 'mathsf', 'mathtt', 'mathit', 'mathnormal', 'mathcal', 'mathbb', 'mathfrak', 'mathop', 'mathbin', 'mathrel', 'mathord', 'operatorname', 'ensuremath',
  'textrm', 'textsf', 'texttt', 'textup', 'textmd', 'textnormal', 'textsc', 'textlf', 'lowercase', 'MakeLowercase', 'MakeTextLowercase', 'uppercase', 'MakeUppercase', 'mbox', 'hbox', 'text', 'textnormal',
  'bibinfo', 'url', 'path', 'nolinkurl', 'enquote', 'underline', 'overline', 'bar', 'hat', 'tilde', 'vec', 'dot', 'smash', 'phantom', 'nocase', 'si', 'unit', 'num', 'texorpdfstring', 'emdash', 'mathstrut',
]);

/** Commands whose argument is in italics or bold. */
export const markCommands: ReadonlyMap<string, 'i' | 'b' | 'sub' | 'sup'> = new Map([
  ['emph', 'i'], ['textit', 'i'], ['textsl', 'i'], ['mkbibemph', 'i'], ['textbf', 'b'], ['mathbf', 'b'], ['boldsymbol', 'b'], ['bm', 'b'], ['mkbibbold', 'b'],
  ['textsubscript', 'sub'], ['textsuperscript', 'sup'], ['mkbibsuperscript', 'sup'], ['mkbibsubscript', 'sub'],
]);
