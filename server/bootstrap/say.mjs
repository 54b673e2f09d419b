/**
 * What the programs of this folder print. They speak in plain sentences on standard output and keep going when
 * nobody listens any more: a closed terminal must not stop a database from being shut down in order.
 */
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

/**
 * Prints one sentence of progress.
 * @param {string} sentence
 */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`);
}

/** A failure the person at the keyboard can act on: printed without a stack trace. */
export class SetupError extends Error {}

/**
 * Runs a program of this folder and turns its outcome into an exit code.
 * @param {() => Promise<number | void>} program
 */
export async function main(program) {
  try {
    process.exitCode = (await program()) ?? 0;
  } catch (error) {
    const text = error instanceof SetupError ? error.message : error instanceof Error ? error.stack : String(error);
    process.stderr.write(`${text}\n`);
    process.exitCode = 1;
  }
}
