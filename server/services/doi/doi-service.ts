import type { Csl } from '#shared/citations/csl.ts';
import type { SourceStanding } from '#shared/citations/notice.ts';

/** Why the DOI service gave no usable answer. */
export type DoiFailure =
  | 'switched-off' | 'busy' | 'timeout' | 'network' | 'refused-address' | 'too-many-redirects' | 'too-large' | 'server-error' | 'wrong-content' | 'no-record';

/** What a look-up came to. "Unavailable" is never the DOI's fault: the same question may be answered later. */
export type DoiAnswer =
  | { kind: 'found'; csl: Csl; notice: SourceStanding }
  | { kind: 'not-found' }
  | { kind: 'unavailable'; code: DoiFailure; reason: string };

/** The DOI service as the rest of the server sees it. */
export interface DoiService {
  /** Looks up a DOI in canonical form. Never throws; answers within the time limit whatever the other side does. */
  lookup(doi: string): Promise<DoiAnswer>;
}

/** The service where none is configured: it says so at once. */
export const switchedOffDoiService: DoiService = {
  lookup: () => Promise.resolve({ kind: 'unavailable', code: 'switched-off', reason: 'no DOI service is configured' }),
};
