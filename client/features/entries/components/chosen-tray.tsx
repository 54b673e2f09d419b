import { useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { getSource } from '#shared/contracts/sources.ts';
import { announce } from '#client/lib/announce.ts';
import { call } from '#client/lib/api-client.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Button } from '#client/ui/button.tsx';
import { Tray } from '#client/ui/tray.tsx';
import { canExportChosen, exportAddress } from '../api.ts';
import { clearChosen, useChosen } from '../chosen.ts';

/** The bar at the foot while rows are chosen: their export and their citations, and what the page adds. */
export function ChosenTray({ children }: { children?: (accessions: readonly string[]) => ReactNode }) {
  const chosen = useChosen();
  const { temperatureK } = useInstrument();
  const accessions = [...chosen.keys()];
  const sources = [...new Set([...chosen.values()].flatMap(({ sourceId }) => (sourceId ? [sourceId] : [])))];
  return (
    <Tray count={chosen.size} onClear={clearChosen}>
      {canExportChosen(accessions)
        ? <a className="button" href={exportAddress('zip', temperatureK, { accession: accessions })} download>Export CSV + BibTeX</a>
        : <span>Too many for one file of chosen rows; export the whole search, or choose fewer.</span>}
      <CopyCitations sources={sources} />
      {children?.(accessions)}
    </Tray>
  );
}

/** Copies the formatted citations of the sources, one a line. */
function CopyCitations({ sources }: { sources: readonly string[] }) {
  const client = useQueryClient();
  const [state, setState] = useState<'idle' | 'busy' | 'done' | 'failed'>('idle');

  async function copy() {
    setState('busy');
    try {
      const details = await Promise.all(sources.map((id) => client.fetchQuery({
        queryKey: ['sources', 'one', id], queryFn: ({ signal }) => call(getSource, { params: { id }, signal }), staleTime: 600_000,
      })));
      await navigator.clipboard.writeText(details.map(({ citation }) => citation).sort().join('\n'));
      setState('done');
      announce(`${sources.length} ${sources.length === 1 ? 'citation' : 'citations'} copied.`);
    } catch {
      setState('failed');
      announce('The citations could not be copied.');
    }
  }

  return (
    <>
      <Button busy={state === 'busy'} onClick={() => void copy()}>Copy citations</Button>
      {state === 'done' && <span>{`${sources.length} copied`}</span>}
      {state === 'failed' && <span>Not copied: the sources could not be fetched, or the browser refuses the clipboard.</span>}
    </>
  );
}
