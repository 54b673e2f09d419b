import { createDoiClient } from './resolver-client.ts';
import type { DoiService } from './doi-service.ts';
import { startFakeDoiServer, type FakeDoiRecord } from './fake-doi-server.ts';

/**
 * The DOI service of demonstration mode: the real client, asking a local stand-in that speaks the real protocol.
 * The stand-in is started with the first look-up, so that it costs nothing until then.
 */
export function demonstrationDoiService(readRecords: () => Promise<readonly FakeDoiRecord[]>): DoiService & { close(): Promise<void> } {
  let started: Promise<{ service: DoiService; close(): Promise<void> }> | null = null;
  async function start() {
    const fake = await startFakeDoiServer({ records: await readRecords() });
    return { service: createDoiClient({ resolverUrl: fake.url }), close: () => fake.close() };
  }
  return {
    async lookup(doi) {
      started ??= start();
      return (await started).service.lookup(doi);
    },
    async close() {
      if (started) await (await started).close();
    },
  };
}
