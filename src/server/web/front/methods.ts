/** The verbs this house knows; others would only trip up what lies behind. */
import type { Handler } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

const KNOWN = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];

export const knownMethod: Handler = (request, response, next) => {
  if (KNOWN.includes(request.method ?? '')) next();
  else refuse(request, response, 405, 'This cannot be done here.', { Allow: KNOWN.join(', ') });
};
