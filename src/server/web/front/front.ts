/** The parts of the front in their order. The built server and the development server stand behind the same door. */
import { limitBody } from '#server/web/front/body-limits.ts';
import { canonicalPath } from '#server/web/front/canonical-path.ts';
import { ownForwarding } from '#server/web/front/client-address.ts';
import { compression } from '#server/web/front/compression.ts';
import type { Handler } from '#server/web/front/handler.ts';
import { chain } from '#server/web/front/handler.ts';
import { knownHost } from '#server/web/front/known-host.ts';
import { knownMethod } from '#server/web/front/methods.ts';
import { turnAwayOverload } from '#server/web/front/overload.ts';
import { privateFile } from '#server/web/front/private-file.ts';
import type { ReadinessCheck } from '#server/web/front/readiness.ts';
import { health } from '#server/web/front/readiness.ts';
import { securityHeaders } from '#server/web/front/security-headers.ts';
import { staticFiles } from '#server/web/front/static-files.ts';

export interface FrontSettings {
  readonly publicUrl: string;
  readonly uploadsFolder: string;
  readonly trustedProxies: readonly string[];
  /** Answer on this machine's own names too. */
  readonly loopback: boolean;
}

export interface ServingSettings extends FrontSettings {
  /** The build's files. */
  readonly clientFolder: string;
  readonly readiness: readonly ReadinessCheck[];
  readonly isStopping: () => boolean;
  /** Told of every request, before anything else. */
  readonly count: Handler;
}

/** The front of the development server, which serves its own files and needs its inline parts. */
export function developmentFront(settings: FrontSettings): Handler {
  return chain([
    securityHeaders(false),
    health([], () => false),
    knownMethod,
    canonicalPath,
    knownHost(settings),
    ownForwarding(settings),
    limitBody(),
    privateFile(settings.uploadsFolder),
  ]);
}

/** The front of the built server. */
export function servingFront(settings: ServingSettings): Handler {
  return chain([
    settings.count,
    securityHeaders(true),
    health(settings.readiness, settings.isStopping),
    knownMethod,
    canonicalPath,
    knownHost(settings),
    ownForwarding(settings),
    staticFiles(settings.clientFolder),
    limitBody(),
    turnAwayOverload(),
    privateFile(settings.uploadsFolder),
    compression,
  ]);
}
