/** What a page says of itself to those who read it without running it: search services and citation managers. */
export interface PageHead {
  title: string;
  description: string;
  /** The one address of what is shown; null where there is none to name. */
  canonical: string | null;
  /** The same as data. */
  alternate: string | null;
  /** Whether a search service may list the page. */
  indexed: boolean;
  /** A schema.org description, or null. */
  data: object | null;
}

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' };

/** A text for an attribute or an element; control characters, which no page may hold, become spaces. */
export function escapeHtml(text: string): string {
  return text.replace(/\p{Cc}+/gu, ' ').replace(/[&<>"']/g, (sign) => entities[sign] ?? sign);
}

/** JSON for a data block: no sign in it can end the block or open a comment. The policy on content does not concern it, since nothing in it is run. */
export function dataBlock(data: object): string {
  const json = JSON.stringify(data).replace(/[<>&\u2028\u2029]/g, (sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`);
  return `<script type="application/ld+json">${json}</script>`;
}

/** The page with its head filled in: its own title and description in the place of the usual ones, the rest before the end of the head. */
export function withHead(html: string, head: PageHead): string {
  const lines = [
    `<title>${escapeHtml(head.title)}</title>`,
    `<meta name="description" content="${escapeHtml(head.description)}" />`,
    ...(head.indexed ? [] : ['<meta name="robots" content="noindex" />']),
    ...(head.canonical ? [`<link rel="canonical" href="${escapeHtml(head.canonical)}" />`] : []),
    ...(head.alternate ? [`<link rel="alternate" type="application/json" href="${escapeHtml(head.alternate)}" />`] : []),
    ...(head.data ? [dataBlock(head.data)] : []),
  ];
  // A function gives the replacement, since "$&" in a title would otherwise be taken for a command.
  return html.replace(/<title>[^<]*<\/title>\s*/, '').replace(/<meta name="description"[^>]*>\s*/, '').replace('</head>', () => `  ${lines.join('\n    ')}\n  </head>`);
}

/** The page as it is, kept out of search services. */
export function withoutIndex(html: string): string {
  return html.replace('</head>', '  <meta name="robots" content="noindex" />\n  </head>');
}
