import { BlockList, isIP } from 'node:net';

/** Address blocks that are not public, after the IANA special-purpose address registries (RFC 6890 and its updates; list from memory). */
const special = new BlockList();
for (const [network, prefix] of [
  ['0.0.0.0', 8], ['10.0.0.0', 8], ['100.64.0.0', 10], ['127.0.0.0', 8], ['169.254.0.0', 16], ['172.16.0.0', 12], ['192.0.0.0', 24], ['192.0.2.0', 24], ['192.88.99.0', 24],
  ['192.168.0.0', 16], ['198.18.0.0', 15], ['198.51.100.0', 24], ['203.0.113.0', 24], ['224.0.0.0', 4], ['240.0.0.0', 4],
] as const) special.addSubnet(network, prefix, 'ipv4');
for (const [network, prefix] of [
  ['::', 96], ['64:ff9b:1::', 48], ['100::', 64], ['2001::', 23], ['2001:db8::', 32], ['2002::', 16], ['3fff::', 20], ['5f00::', 16], ['fc00::', 7], ['fe80::', 10], ['fec0::', 10], ['ff00::', 8],
] as const) special.addSubnet(network, prefix, 'ipv6');

/** The IPv4 address inside an IPv6 one that maps or translates to it, or null. */
function embeddedV4(address: string): string | null {
  const dotted = /^(?:::ffff:|64:ff9b::)(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (dotted !== null) return dotted[1] ?? null;
  const hex = /^(?:::ffff:|64:ff9b::)([0-9a-f]{1,4}):([0-9a-f]{1,4})$/i.exec(address);
  if (hex === null) return null;
  const high = Number.parseInt(hex[1] ?? '0', 16);
  const low = Number.parseInt(hex[2] ?? '0', 16);
  return [high >> 8, high & 255, low >> 8, low & 255].join('.');
}

/** Whether an IP address is one on the public internet; anything that is not an address is not. */
export function isPublicAddress(address: string): boolean {
  const bare = address.replace(/^\[|\]$/g, '').replace(/%.*$/, '');
  const family = isIP(bare);
  if (family === 4) return !special.check(bare, 'ipv4');
  if (family !== 6) return false;
  const normal = new URL(`http://[${bare}]/`).hostname.slice(1, -1);
  const v4 = embeddedV4(normal);
  return v4 === null ? !special.check(normal, 'ipv6') : !special.check(v4, 'ipv4');
}

/** Whether a host name in an address means this machine. */
export function isLoopbackHost(hostname: string): boolean {
  const bare = hostname.replace(/^\[|\]$/g, '').toLowerCase();
  return bare === 'localhost' || bare === '::1' || (isIP(bare) === 4 && bare.startsWith('127.'));
}
