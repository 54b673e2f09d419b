import { useState } from 'react';
import type { SourceDetail } from '#shared/contracts/sources.ts';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';

/** The formatted citation and the records of bibliography programs, to be copied. */
export function CitationCard({ source }: { source: SourceDetail }) {
  const [copied, setCopied] = useState<string | null>(null);
  async function copy(what: string, text: string) {
    try {
      await navigator.clipboard.writeText(text);
      setCopied(`${what} copied.`);
      announce(`${what} copied.`);
    } catch {
      setCopied('The browser did not allow the copy; the text below can be selected by hand.');
    }
  }
  return (
    <section>
      <h2 className="pb-2">How to cite it</h2>
      <p className="max-w-[70ch]">{source.citation}</p>
      <p className="pt-1 text-second">Citation key in exported bibliographies: <code>{source.key}</code></p>
      <div className="flex flex-wrap items-center gap-3 pt-3 no-print">
        <Button onClick={() => void copy('Citation', source.citation)}>Copy citation</Button>
        <Button onClick={() => void copy('BibTeX', source.bibtex)}>Copy BibTeX</Button>
        <Button onClick={() => void copy('RIS', source.ris)}>Copy RIS</Button>
        {copied && <span className="text-second">{copied}</span>}
      </div>
      <details className="pt-3">
        <summary className="w-fit text-second">The BibTeX record</summary>
        <pre className="mt-2 overflow-x-auto border-l-4 border-ink bg-raised p-3 text-fine" tabIndex={0} role="region" aria-label="BibTeX record">{source.bibtex}</pre>
      </details>
    </section>
  );
}
