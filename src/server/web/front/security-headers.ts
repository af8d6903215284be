/** Headers that every answer carries, whoever wrote it: pages, files, refusals, 304 and 500 alike. */
import type { Handler } from '#server/web/front/handler.ts';
import { gateOf } from '#server/web/front/response-gate.ts';
import { SEND_HEADER } from '#server/web/send-file.ts';

export const SECURITY_HEADERS: Readonly<Record<string, string>> = {
  // Browsers heed it over https only; a proxy may reach us by plain http, so it is always there.
  'Strict-Transport-Security': 'max-age=31536000; includeSubDomains',
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Permissions-Policy': 'camera=(self), microphone=(), geolocation=()',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
};

/** A page made at build time carries its policy inside; two things only a header can say. */
const PAGE_POLICY = "base-uri 'none'; object-src 'none'; frame-ancestors 'none'";
/** Anything else, opened by itself, may draw itself and do nothing. */
const FILE_POLICY = "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'";

/** @param fallbackPolicy whether answers without a policy get one; the development server's own inline parts need none */
export function securityHeaders(fallbackPolicy: boolean): Handler {
  return (_request, response, next) => {
    for (const [name, value] of Object.entries(SECURITY_HEADERS)) response.setHeader(name, value);
    gateOf(response).beforeHead((head) => {
      head.removeHeader('X-Powered-By');
      if (head.statusCode >= 400 && !head.hasHeader('cache-control')) head.setHeader('Cache-Control', 'no-store');
      const type = String(head.getHeader('content-type') ?? '');
      const isPage = /^text\/html\b/i.test(type);
      if (isPage && !/charset=/i.test(type)) head.setHeader('Content-Type', 'text/html; charset=utf-8');
      // A file of a person brings a stricter policy when it is sent.
      if (head.hasHeader(SEND_HEADER)) return undefined;
      if (fallbackPolicy && !head.hasHeader('content-security-policy')) head.setHeader('Content-Security-Policy', isPage ? PAGE_POLICY : FILE_POLICY);
      return undefined;
    });
    next();
  };
}
