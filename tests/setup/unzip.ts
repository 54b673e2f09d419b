import { buffer } from 'node:stream/consumers';
import { fromBufferPromise } from 'yauzl';

/** The files of a ZIP, by an independent reader that checks sizes and sums. */
export async function unzip(archive: Buffer): Promise<Map<string, Buffer>> {
  const zip = await fromBufferPromise(archive, { lazyEntries: true });
  const files = new Map<string, Buffer>();
  for await (const entry of zip.eachEntry()) files.set(entry.fileName, await buffer(await zip.openReadStreamPromise(entry)));
  return files;
}
