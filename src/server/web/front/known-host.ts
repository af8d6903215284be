/** Answers only under the names of this house, so that no link or cookie is ever made for a name somebody else chose. */
import type { Handler } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

export interface HostRules {
  /** The address people use. */
  readonly publicUrl: string;
  /** Also answer on this machine's own names, on whatever port they were asked: demo and development. */
  readonly loopback: boolean;
}

const LOOPBACK = /^(?:localhost|127\.0\.0\.1|\[::1\])(?::\d{1,5})?$/;

/** True when `host` (a Host header) is one of ours. */
export function isKnownHost(host: string | undefined, rules: HostRules): boolean {
  if (host === undefined) return false;
  const asked = host.toLowerCase();
  if (rules.loopback && LOOPBACK.test(asked)) return true;
  const ours = new URL(rules.publicUrl);
  const standardPort = ours.protocol === 'https:' ? ':443' : ':80';
  return asked === ours.host || asked === ours.host + standardPort;
}

/** Answers 421 to requests for names that are not ours. */
export function knownHost(rules: HostRules): Handler {
  return (request, response, next) => {
    if (isKnownHost(request.headers.host, rules)) next();
    else refuse(request, response, 421, 'This server does not answer to that name.');
  };
}
