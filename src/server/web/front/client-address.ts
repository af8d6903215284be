/**
 * Who is asking. The site believes the first X-Forwarded-For value and any X-Forwarded-Proto; so what a client says
 * of itself is dropped here, and one address and one scheme that can be relied on are put in its place.
 */
import { BlockList, isIP } from 'node:net';
import type { IncomingMessage } from 'node:http';
import type { Handler } from '#server/web/front/handler.ts';

export interface ForwardingRules {
  /** Addresses or networks (`10.0.0.0/8`) of our own proxies. */
  readonly trustedProxies: readonly string[];
  /** The address people use; its scheme is the one they came by. */
  readonly publicUrl: string;
}

/**
 * The client's address: the right-most hop that is not one of our proxies.
 * @param peer the other end of the connection
 * @param forwardedFor the X-Forwarded-For header as received
 */
export function clientAddress(peer: string, forwardedFor: string | undefined, trusted: BlockList): string {
  let address = plainAddress(peer);
  const hops = (forwardedFor ?? '').split(',').map((hop) => plainAddress(hop.trim()));
  while (isTrusted(address, trusted)) {
    const nearer = hops.pop();
    if (nearer === undefined || isIP(nearer) === 0) break;
    address = nearer;
  }
  return address;
}

/** A block list of `entries`: single addresses and networks in CIDR notation. */
export function addressList(entries: readonly string[]): BlockList {
  const list = new BlockList();
  for (const entry of entries) {
    const [address = '', bits] = entry.split('/');
    const family = isIP(address) === 6 ? 'ipv6' : 'ipv4';
    if (bits === undefined) list.addAddress(address, family);
    else list.addSubnet(address, Number(bits), family);
  }
  return list;
}

/** Replaces every forwarding header by our own word. */
export function ownForwarding(rules: ForwardingRules): Handler {
  const trusted = addressList(rules.trustedProxies);
  const ours = new URL(rules.publicUrl);
  return (request, _response, next) => {
    const address = clientAddress(request.socket.remoteAddress ?? '', headerText(request, 'x-forwarded-for'), trusted);
    for (const name of Object.keys(request.headers)) {
      if (name === 'forwarded' || name === 'x-real-ip' || name.startsWith('x-forwarded-')) Reflect.deleteProperty(request.headers, name);
    }
    if (address !== '') request.headers['x-forwarded-for'] = address;
    const host = request.headers.host?.toLowerCase().replace(/:(?:443|80)$/, '');
    request.headers['x-forwarded-proto'] = host === ours.host && ours.protocol === 'https:' ? 'https' : 'http';
    next();
  };
}

function headerText(request: IncomingMessage, name: string): string | undefined {
  const value = request.headers[name];
  return Array.isArray(value) ? value.join(',') : value;
}

/** `::ffff:192.0.2.1` is the IPv4 address it carries. */
function plainAddress(address: string): string {
  return address.replace(/^::ffff:(?=\d+\.)/i, '');
}

function isTrusted(address: string, trusted: BlockList): boolean {
  const version = isIP(address);
  return version !== 0 && trusted.check(address, version === 6 ? 'ipv6' : 'ipv4');
}
