import { pathToFileURL } from 'node:url';
import { readStep, StepError } from '#shared/steps/parse-step.ts';

/** One way to write an elementary step, and what it becomes: the equation in the one spelling kept with its class, or why it is refused. */
export type Notation = readonly [typed: string, becomes: string, stepClass: string];

/** How papers, solvers' mechanisms and people write elementary steps (common practice), spelled as they type or paste them. */
export const notations: readonly Notation[] = [
  // Marks of adsorption
  ['CO* + * -> C* + O*', 'CO* + * -> C* + O*', 'dissociation'],
  ['CO(ads) + * = C(ads) + O(ads)', 'CO* + * -> C* + O*', 'dissociation'],
  ['CO_ads + * -> C_ads + O_ads', 'CO* + * -> C* + O*', 'dissociation'],
  ['CO(a) + * ⇌ C(a) + O(a)', 'CO* + * -> C* + O*', 'dissociation'],
  ['CO,ads + * -> C,ads + O,ads', 'CO* + * -> C* + O*', 'dissociation'],
  ['COads + * → Cads + Oads', 'CO* + * -> C* + O*', 'dissociation'],
  ['COa + Oa -> CO2 + 2*', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  ['*CO + *H -> *CHO + *', 'CO* + H* -> CHO* + *', 'hydrogenation'],
  ['*-CO + *-H -> *-CHO + *', 'CO* + H* -> CHO* + *', 'hydrogenation'],
  ['CO-* + * -> C-* + O-*', 'CO* + * -> C* + O*', 'dissociation'],
  ['CO·* + O·* -> CO2 + 2*', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  ['N≡* + N≡* -> N2 + 2*', 'N* + N* -> N2 + 2*', 'associative-desorption'],
  ['[NO]* + * -> N* + O*', 'NO* + * -> N* + O*', 'dissociation'],
  ['CO*(ads) + O*ads -> CO2(g) + 2*', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  // Gases, free sites, arrows, coefficients
  ['N2(g) + 2* <-> 2N*', 'N2 + 2* -> 2N*', 'dissociative-adsorption'],
  ['H2 + 2 * ⇌ 2 H*', 'H2 + 2* -> 2H*', 'dissociative-adsorption'],
  ['N2g + 2* -> 2Nads', 'N2 + 2* -> 2N*', 'dissociative-adsorption'],
  ['CO* + O* --> CO2↑ + 2*', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  ['NH2* + H* <- NH3* + *', 'NH3* + * -> NH2* + H*', 'dehydrogenation'],
  ['CH2=CH2 + * = C2H4*', 'C2H4 + * -> C2H4*', 'adsorption'],
  ['½N2 + * -> N*', '1/2 N2 + * -> N*', 'dissociative-adsorption'],
  ['0,5 N2 + * -> N*', '1/2 N2 + * -> N*', 'dissociative-adsorption'],
  ['2×H* → H2 + 2×*', '2H* -> H2 + 2*', 'associative-desorption'],
  ['2(H*) -> H2 + 2(*)', '2H* -> H2 + 2*', 'associative-desorption'],
  ['(R12) N2 + 2* -> 2N*.', 'N2 + 2* -> 2N*', 'dissociative-adsorption'],
  ['O2 + □ → O2*', 'O2 + * -> O2*', 'adsorption'],
  ['O2 + [ ] -> O2*', 'O2 + * -> O2*', 'adsorption'],
  ['H2 + 2θ -> 2H·θ', 'H2 + 2* -> 2H*', 'dissociative-adsorption'],
  ['H2 + 2S -> 2H·S', 'H2 + 2* -> 2H*', 'dissociative-adsorption'],
  ['H3O+ + e- + M -> MH + H2O', 'H3O^+ + e^- + * -> H* + H2O', 'overall'],
  ['HX + OX -> OHX + X', 'H* + O* -> OH* + *', 'hydrogenation'],
  ['CO(S) + O(S) => CO2 + 2PT(S)', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  ['CO + Pt(s) -> CO(s)', 'CO + * -> CO*', 'adsorption'],
  ['Pt-CO + Pt -> Pt-C + Pt-O', 'CO* + * -> C* + O*', 'dissociation'],
  // Markup
  ['$\\mathrm{N_2} + 2\\theta \\xrightarrow{k_1} 2\\mathrm{N}\\theta$', 'N2 + 2* -> 2N*', 'dissociative-adsorption'],
  ['\\ce{CO^{*} + O^{*} ->[k1] CO2 + 2^{*}}', 'CO* + O* -> CO2 + 2*', 'associative-desorption'],
  ['\\mathrm{CO}_{\\mathrm{ads}} + \\ast \\rightleftharpoons \\mathrm{C}_{\\mathrm{ads}} + \\mathrm{O}_{\\mathrm{ads}}', 'CO* + * -> C* + O*', 'dissociation'],
  ['\\tfrac{1}{2} N_2 + * \\to N^*', '1/2 N2 + * -> N*', 'dissociative-adsorption'],
  ['NH<sub>3</sub><sup>*</sup> + * &rarr; NH<sub>2</sub><sup>*</sup> + H<sup>*</sup>', 'NH3* + * -> NH2* + H*', 'dehydrogenation'],
  ['N^*_2 + * -> 2N^*', 'N2* + * -> 2N*', 'dissociation'],
  // Isotopes
  ['2D* -> D2 + 2*', '2D* -> D2 + 2*', 'associative-desorption'],
  ['[13C]O* + * -> [13C]* + O*', '[13C]O* + * -> [13C]* + O*', 'dissociation'],
  ['¹³CO* + * → ¹³C* + O*', '[13C]O* + * -> [13C]* + O*', 'dissociation'],
  ['13CO* + * -> 13C* + O*', '[13C]O* + * -> [13C]* + O*', 'dissociation'],
  ['15N* + 15N* -> 15N2 + 2*', '[15N]* + [15N]* -> [15N]2 + 2*', 'associative-desorption'],
  ['2 15N* -> 15N2 + 2*', '2[15N]* -> [15N]2 + 2*', 'associative-desorption'],
  ['¹⁵NH3* + * -> ¹⁵NH2* + H*', '[15N]H3* + * -> [15N]H2* + H*', 'dehydrogenation'],
  ['C18O + * -> C18O*', 'C[18O] + * -> C[18O]*', 'adsorption'],
  // Kinds of site
  ['H*_fcc -> H*_hcp', 'H*_fcc -> H*_hcp', 'diffusion'],
  ['CO(atop) -> CO(bridge)', 'CO*_top -> CO*_bridge', 'diffusion'],
  ['CO(ads, top) -> CO(ads, fcc hollow)', 'CO*_top -> CO*_fcc', 'diffusion'],
  ['N2 + 2*B5 -> 2N*B5', 'N2 + 2*_B5 -> 2N*_B5', 'dissociative-adsorption'],
  ['N*@step + * -> N* + *@step', 'N*_step + * -> N* + *_step', 'diffusion'],
  ['H*1 + *2 -> H*2 + *1', 'H*_site1 + *_site2 -> H*_site2 + *_site1', 'diffusion'],
  // Charges
  ['H+ + e- + * -> H*', 'H^+ + e^- + * -> H*', 'overall'],
  ['OH-* -> OH* + e-', 'OH^-* -> OH* + e^-', 'overall'],
  ['O2^{2-}* -> O2* + 2e-', 'O2^2-* -> O2* + 2e^-', 'overall'],
  ['O2* + e- -> O2-*', 'O2* + e^- -> O2^-*', 'overall'],
  ['O* + 2e- -> O2-*', 'O* + 2e^- -> O^2-*', 'overall'],
  // Several sites
  ['C2H4 + 2* -> C2H4**', 'C2H4 + 2* -> C2H4**', 'adsorption'],
  ['C2H4 + 2* -> C2H4*2', 'C2H4 + 2* -> C2H4**', 'adsorption'],
  ['C2H4 + 2* -> η2-C2H4', 'C2H4 + 2* -> C2H4**', 'adsorption'],
  ['C2H4 + 2* -> *CH2CH2*', 'C2H4 + 2* -> C2H4**', 'adsorption'],
  // Refused, with what to do
  ['NH3* -> NH2* + H*', 'unbalanced, and * on the left offered', ''],
  ['Co* + * -> C* + O*', 'ambiguous: CO* or [Co]*', ''],
  ['co* + * -> c* + o*', 'unreadable: in capitals it is CO or Co', ''],
  ['PT* -> PT + *', 'unreadable: the element is Pt', ''],
  ['O2-* -> O2- + *', 'ambiguous: O2^-* -> O2^- + * or O^2-* -> O^2- + *', ''],
  ['H-* + * -> * + H-*', 'ambiguous: H^-* + * -> * + H^-* or H* + * -> * + H*', ''],
  ['N2 + 2*2 -> 2N*2', 'ambiguous: N2 + 4* -> 2N** or N2 + 2*_site2 -> 2N*_site2', ''],
  ['H2 + 2S -> 2HS', 'ambiguous: H2 + 2S -> 2SH or H2 + 2* -> 2H*', ''],
  ['θ_CO + * -> C* + O*', 'unreadable: a coverage', ''],
];

/** What the reader makes of a notation, in the words of the table. */
export function readNotation(typed: string): [becomes: string, stepClass: string] {
  try {
    const step = readStep(typed);
    return [step.equation, step.class];
  } catch (error) {
    if (!(error instanceof StepError)) throw error;
    if (error.readings) return [`ambiguous: ${error.readings.join(' or ')}`, ''];
    const side = /add (\S+) on the (left|right)/.exec(error.message);
    if (side) return [`unbalanced, and ${side[1]} on the ${side[2]} offered`, ''];
    return [`${error.code}: ${/in capitals it is .*|the element is .*|a coverage/.exec(error.message)?.[0] ?? error.message}`, ''];
  }
}

/** The table in Markdown: `npx tsx tests/unit/steps/notations.ts` prints it. */
export function notationsInMarkdown(): string {
  const cell = (text: string) => (text ? `\`${text.replaceAll('|', '\\|')}\`` : '');
  return ['| typed | read as | class |', '| --- | --- | --- |', ...notations.map(([typed, becomes, stepClass]) => `| ${cell(typed)} | ${stepClass ? cell(becomes) : becomes} | ${stepClass} |`)].join('\n');
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) process.stdout.write(`${notationsInMarkdown()}\n`);
