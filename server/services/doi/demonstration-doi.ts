import type { DoiService } from './doi-service.ts';
import type { FakeDoiRecord } from './fake-doi-server.ts';

/**
 * The DOI service of demonstration mode: the real client, asking a local stand-in that speaks the real protocol.
 * The stand-in is loaded and started with the first look-up, so that it costs nothing until then and is no part of a real deployment.
 */
export function demonstrationDoiService(readRecords: () => Promise<readonly FakeDoiRecord[]>): DoiService & { close(): Promise<void> } {
  let started: Promise<{ service: DoiService; close(): Promise<void> }> | null = null;
  async function start() {
    const [{ startFakeDoiServer }, { createDoiClient }] = await Promise.all([import('./fake-doi-server.ts'), import('./resolver-client.ts')]);
    const fake = await startFakeDoiServer({ records: await readRecords() });
    return { service: createDoiClient({ resolverUrl: fake.url }), close: () => fake.close() };
  }
  return {
    async lookup(doi) {
      try {
        started ??= start();
        return await (await started).service.lookup(doi);
      } catch {
        // Unreadable records or no free port: the next look-up tries again.
        started = null;
        return { kind: 'unavailable', code: 'network', reason: 'the local stand-in could not be started' };
      }
    },
    async close() {
      const running = await started?.catch(() => null);
      started = null;
      await running?.close();
    },
  };
}
