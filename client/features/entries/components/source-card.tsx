import { Link } from 'react-router-dom';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { saveFile } from '#client/lib/save-file.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import { CopyButton } from './copy-button.tsx';

/** The source of an entry: its formatted citation, to copy or to take along for a reference manager. */
export function SourceCard({ entry }: { entry: EntryDetail }) {
  const { source, sourceDetail } = entry;
  return (
    <section>
      <h2 className="pb-2">Source</h2>
      {!source ? <p className="text-second">No source is given yet.</p> : (
        <>
          <p>{withoutDoi(sourceDetail?.citation ?? `${source.authors} (${source.year ?? 'no year'}). ${source.title}. ${source.container ?? ''}`, source.doi)}</p>
          {source.doi && <p><a className="text-second" href={`https://doi.org/${encodeURI(source.doi)}`} rel="noreferrer">{`doi:${source.doi}`}</a></p>}
          <p className="pt-1"><Link to={`/sources/${source.id}`}>All entries from this source</Link></p>
        </>
      )}
      {source && sourceDetail && (
        <div className="flex flex-wrap gap-3 pt-3 no-print">
          <CopyButton label="Copy citation" copied="Citation copied." text={sourceDetail.citation} />
          <Button onClick={() => saveFile(`${source.key}.bib`, sourceDetail.bibtex, 'application/x-bibtex')}>BibTeX</Button>
          <Button onClick={() => saveFile(`${source.key}.ris`, sourceDetail.ris, 'application/x-research-info-systems')}>RIS</Button>
        </div>
      )}
    </section>
  );
}

/** The citation without the DOI at its end, which stands on a line of its own as a link. */
function withoutDoi(citation: string, doi: string | null): string {
  return doi ? citation.replace(new RegExp(`\\s*(?:doi:\\s*|https?://(?:dx\\.)?doi\\.org/)${doi.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}\\.?\\s*$`, 'i'), '') : citation;
}

/** What may be done with this revision, as links to the screens where it is done. */
export function EntryLinks({ entry }: { entry: EntryDetail }) {
  const { actions, accession, submission } = entry;
  return (
    <>
      {actions.includes('edit') && <LinkButton look="primary" to={`/contribute/${accession}`}>Edit the draft</LinkButton>}
      {(actions.includes('decide') || actions.includes('claim')) && submission && <LinkButton look="primary" to={`/review/${submission}`}>Review</LinkButton>}
    </>
  );
}
