/**
 * Who may import whom. The linter asks this for every import; the reason it gives is the sentence below.
 */
import path from 'node:path';

/**
 * @typedef {{ from: RegExp, to: RegExp, unless?: RegExp, fromUnless?: RegExp, reason: string }} Zone
 *   `from` and `to` are paths in the checkout; packages are written `package:express`, Node's own modules `node:fs`.
 *   `$1` in `to` or `unless` is what the first group of `from` matched.
 */

const database = /^(package:drizzle-orm|server\/db\/schema\/)/;

/** @type {Zone[]} */
const zones = [
  {
    from: /^shared\//,
    to: /./,
    unless: /^(shared\/|package:zod(\/|$)|package:@stdlib\/)/,
    reason: 'shared is used by client and server alike: it imports only shared, zod and pure numerics.',
  },
  {
    from: /^shared\/(?:kinetics|steps)\//,
    to: /^shared\/(contracts|domain)\//,
    reason: 'shared/kinetics and shared/steps are pure science: they know nothing of contracts and states.',
  },
  { from: /^client\//, to: /^(server|seeds|tests)\//, reason: 'The client knows the server by its contracts only (shared/contracts).' },
  { from: /^client\//, to: /^(node:|package:(express|pg|drizzle-orm)(\/|$))/, reason: 'This does not exist in a browser.' },
  {
    from: /^client\/(?:ui|lib)\//,
    to: /^client\/(features|routes|app)\//,
    reason: 'The design kit and the library serve every feature, so they know none.',
  },
  { from: /^client\/ui\//, to: /^package:@tanstack\/react-query/, reason: 'The design kit fetches no data: give it what it shows.' },
  {
    from: /^client\/features\/([^/]+)\//,
    to: /^client\/features\//,
    unless: /^client\/features\/$1\//,
    reason: 'Features do not import each other: compose them in client/routes.',
  },
  { from: /^client\/features\//, to: /^client\/(routes|app)\//, reason: 'Pages and the shell are made of features, not the other way round.' },
  { from: /^client\/routes\//, to: /^client\/app\/(app|router)\./, reason: 'The router imports the pages; a page that imports it back makes a circle.' },
  { from: /^server\//, to: /^(client|tests)\//, reason: 'The server stands without client and tests.' },
  { from: /^server\/(?!commands\/|index\.ts$)/, to: /^seeds\//, reason: 'Seeds are loaded by a command and handed to the fakes at boot; nothing else of the server knows them.' },
  {
    from: /^server\/features\/([^/]+)\//,
    to: /^server\/features\//,
    unless: /^server\/features\/($1\/|[^/]+\/[^/]+\.service\.ts$)/,
    reason: "Another feature's door is its service: import its *.service.ts.",
  },
  {
    from: /^server\//,
    fromUnless: /^server\/(db\/|.*\.repository\.ts$)/,
    to: database,
    reason: 'Tables and queries are the business of *.repository.ts and server/db.',
  },
  { from: /^(client|shared)\//, to: database, reason: 'Tables and queries are the business of *.repository.ts and server/db.' },
  {
    from: /^(server|seeds)\//,
    fromUnless: /^server\/(http\/|app\.ts$|.*\.routes\.ts$)/,
    to: /^package:express$/,
    reason: 'Requests and responses end in *.routes.ts, server/http and server/app.ts.',
  },
  { from: /^(client|shared|seeds)\//, to: /^server\/(bootstrap|commands)\//, reason: 'Commands use the product; nothing uses the commands.' },
  { from: /^server\/(?!bootstrap\/)/, to: /^server\/bootstrap\//, reason: 'The start-up programs stand around the server; the server does not know them.' },
  { from: /^server\/bootstrap\//, to: /^(?!server\/bootstrap\/|node:|package:(esbuild|vite)$)/, reason: 'Start-up programs use Node.js alone: no package is there yet.' },
  { from: /^seeds\//, to: /^(client|tests)\//, reason: 'Seeds know the server and what is shared.' },
];

/**
 * What an import names, as the zones write it.
 * @param {string} importer path in the checkout
 * @param {string} specifier as written in the import
 */
export function importTarget(importer, specifier) {
  if (specifier.startsWith('#')) return specifier.slice(1);
  if (specifier.startsWith('.')) return path.posix.normalize(path.posix.join(path.posix.dirname(importer), specifier));
  return specifier.startsWith('node:') ? specifier : `package:${specifier}`;
}

/**
 * Why a file may not import another, or null when it may.
 * @param {string} importer path in the checkout, with forward slashes
 * @param {string} specifier as written in the import
 * @returns {string | null}
 */
export function reasonAgainst(importer, specifier) {
  const target = importTarget(importer, specifier);
  for (const { from, fromUnless, to, unless, reason } of zones) {
    const match = from.exec(importer);
    if (!match || fromUnless?.test(importer) || !to.test(target)) continue;
    const allowed = unless && new RegExp(unless.source.replaceAll('$1', (match[1] ?? '').replaceAll('.', '\\.')));
    if (!allowed?.test(target)) return reason;
  }
  return null;
}
