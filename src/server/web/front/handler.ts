/** The shape of every part of the front: it answers, or hands the request on. */
import type { IncomingMessage, ServerResponse } from 'node:http';

export type Next = (error?: unknown) => void;
export type Handler = (request: IncomingMessage, response: ServerResponse, next: Next) => void;

/** One handler that runs `handlers` in order until one of them answers. */
export function chain(handlers: readonly Handler[]): Handler {
  return (request, response, next) => {
    const step = (at: number): void => {
      const handler = handlers[at];
      if (handler === undefined) {
        next();
        return;
      }
      handler(request, response, (error) => {
        if (error === undefined) step(at + 1);
        else next(error);
      });
    };
    step(0);
  };
}

/** The path of a request as sent, without its query. */
export function pathOf(request: IncomingMessage): string {
  return (request.url ?? '/').split('?', 1)[0] ?? '/';
}
