/** The part of the untyped package that we use. Its constructor and its guessing reader are left undeclared: they may ask the network. */
declare module 'citation-js' {
  /** Names under which styles and locales are registered. */
  type Registry = { has(name: string): boolean };

  /** What the citation style plug-in takes and gives: pairs of the item's id and its HTML. */
  type BibliographyOptions = { template: string; lang: string; format: 'html'; nosort: true; asEntryArray: true };

  type Plugins = {
    config: { get(name: '@csl'): { templates: Registry; locales: Registry } };
    output: { format(name: 'bibliography', items: readonly object[], options: BibliographyOptions): [string, string][] };
    /** Only with a forced type, so that nothing is taken for an address. */
    input: { chain(text: string, options: { forceType: '@bibtex/text' | '@ris/file'; generateGraph: false }): Record<string, unknown>[] };
  };

  const Cite: { plugins: Plugins; version: { cite: string; citeproc: string } };
  export default Cite;
}
