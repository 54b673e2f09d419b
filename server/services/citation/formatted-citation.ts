import { authorsText, containerText, titleText, yearOf } from '#shared/citations/citation-text.ts';
import type { Csl } from '#shared/citations/csl.ts';
import { doiUrl } from '#shared/citations/doi.ts';
import { richText, richTextSource, unicodeText } from '#shared/citations/rich-text.ts';

/** A citation in words: plain, and with the marks of `richText` (italics, scripts) for screens that show them. */
export type FormattedCitation = { text: string; rich: string };

/** Prints citations in one fixed style. */
export type CitationFormatter = { style: string; format(csl: Csl): FormattedCitation };

const style = 'apa';
const locale = 'en-US';

const entities: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'", nbsp: ' ', '#38': '&', '#60': '<', '#62': '>', '#34': '"', '#39': "'", '#160': ' ' };

/** Takes the style engine's HTML apart: our four marks stay, every other tag goes, entities become characters. */
function fromHtml(html: string): FormattedCitation {
  const bare = html.replace(/<\/?(?:div|span|a)(?:\s[^<>]*)?>/gi, '').replace(/<(\/?)(i|b|sub|sup)\s[^<>]*>/gi, '<$1$2>');
  const text = bare.replace(/&([a-z]+|#\d+);/gi, (whole, name: string) => entities[name.toLowerCase()] ?? whole).replace(/\s+/g, ' ').trim();
  const rich = richTextSource(richText(text));
  return { text: unicodeText(rich), rich };
}

/** What is printed when the style engine can't print an item: less well set, and never nothing. */
function plainly(csl: Csl): FormattedCitation {
  const place = [containerText(csl), csl.volume, csl.page ?? csl.number].filter((part) => part !== null && part !== undefined).join(', ');
  const end = csl.DOI === undefined ? csl.URL ?? '' : doiUrl(csl.DOI);
  const text = [`${authorsText(csl)} (${yearOf(csl) ?? csl.issued?.literal ?? 'n.d.'}).`, `${titleText(csl)}.`, place === '' ? '' : `${place}.`, end].filter((part) => part !== '').join(' ');
  return { text, rich: text };
}

let loading: Promise<CitationFormatter> | null = null;

async function load(): Promise<CitationFormatter> {
  const { default: cite } = await import('citation-js');
  const { templates, locales } = cite.plugins.config.get('@csl');
  // The package falls back to another style or locale without a word.
  if (!templates.has(style) || !locales.has(locale)) throw new Error(`The citation style "${style}" or the locale "${locale}" is not in the installed citation library.`);
  return {
    style,
    format(csl) {
      try {
        const item = { ...csl, id: 'item' };
        const entry = cite.plugins.output.format('bibliography', [item], { template: style, lang: locale, format: 'html', nosort: true, asEntryArray: true })[0];
        const formatted = entry === undefined ? null : fromHtml(entry[1]);
        return formatted === null || formatted.text === '' ? plainly(csl) : formatted;
      } catch {
        // The engine throws on some rare items; a citation printed plainly is better than none.
        return plainly(csl);
      }
    },
  };
}

/**
 * Loads the style engine once, on first use (0.3 to 1 s and 40 to 80 MB), and checks that style and locale are there.
 *
 * Call it after the server listens to find a broken installation early; it throws when the style is missing.
 */
export function citationFormatter(): Promise<CitationFormatter> {
  loading ??= load().catch((error: unknown) => {
    loading = null;
    throw error;
  });
  return loading;
}
