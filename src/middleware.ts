/**
 * What every request passes before its page: who asks, from where, whether the route is theirs, the answer of a form.
 * The order is the meaning: nothing reads a form of a person who may not send it.
 */
import { randomUUID } from 'node:crypto';
import type { APIContext, MiddlewareNext } from 'astro';
import { getActionContext, type ActionError } from 'astro:actions';
import { defineMiddleware } from 'astro:middleware';
import { NOBODY, PAGE_OF_HEADER, SAID_ONCE_HEADER, TO_KEEP_HEADER } from '#contracts/kept-pages.ts';
import { actorOfToken, sessionCookie } from '#server/auth/sessions.ts';
import { config } from '#server/config.ts';
import { systemClock, type Actor } from '#server/context.ts';
import { AppError } from '#server/errors.ts';
import { presentSitePerson } from '#server/presenters/site-person.ts';
import { services } from '#server/services.ts';
import type { FormAnswer } from '#server/web/form.ts';
import { gate } from '#server/web/gate.ts';
import { comesFromOwnPages, ownOrigins } from '#server/web/origin.ts';
import { cacheRule, completePolicy } from '#server/web/page-headers.ts';
import { knownError, problem, wantsPage } from '#server/web/respond.ts';
import { ROUTE_RULES } from '#server/web/route-rules.ts';
import { saidCookie } from '#server/web/said.ts';

export const onRequest = defineMiddleware(async (context, next) => {
  if (context.isPrerendered) return next();
  const { request, locals } = context;
  // The page that says why a request was refused passes here a second time; all there is to know is in `locals`.
  if (locals.refusal !== undefined) return next();
  const requestId = randomUUID();
  const rule = ROUTE_RULES[context.routePattern];
  const isApi = context.routePattern.startsWith('/api/') && !wantsPage(request);
  try {
    if (rule !== 'machine' && !comesFromOwnPages(request.method, request.headers, ownOrigins(config().publicUrl, config().demo))) {
      throw new AppError('FORBIDDEN', { says: 'This form was sent from another site, so nothing was done. Open the page here and send it again.' });
    }
    const actor = rule === 'machine' ? null : await actorOfToken(context.cookies.get(sessionCookie().name)?.value);
    locals.ctx = { actor, requestId, ip: context.clientAddress, clock: systemClock, services: services() };
    locals.person = actor === null ? null : presentSitePerson(actor);
    locals.said = takeSaid(context);
    const answer = gate(rule, actor);
    if (answer === 'nothing-here') throw new AppError('NOT_FOUND');
    if (answer === 'sign-in-first') throw new AppError('UNAUTHENTICATED');
    if (answer === 'not-yours') throw new AppError('FORBIDDEN', { says: 'This page belongs to another workroom.' });
    const response = (await answerFormAction(context, next)) ?? (await next());
    return withHeaders(response, actor, locals.said !== null);
  } catch (error) {
    return isApi ? problem(error, requestId) : pageForError(context, error, requestId);
  }
});

/** A sentence left by the page before, shown once, and to a person: a page that is only kept leaves it for her. */
function takeSaid(context: APIContext): string | null {
  if (context.request.headers.has(TO_KEEP_HEADER)) return null;
  const { name } = saidCookie();
  const said = context.cookies.get(name)?.value ?? null;
  if (said !== null && context.request.method === 'GET') context.cookies.delete(name, { path: '/' });
  return said;
}

/**
 * Runs a form's action here, so that success is a redirect (a reload never sends it twice) and a refusal draws the same
 * page again. Returns null when the request is no form.
 */
async function answerFormAction(context: APIContext, next: MiddlewareNext): Promise<Response | null> {
  const sent = getActionContext(context);
  const { action } = sent;
  if (action?.calledFrom !== 'form') return null;
  const result = await action.handler();
  const answer = result.data as FormAnswer | undefined;
  if (answer === undefined) throw appErrorOfAction(result.error);
  if (answer.ok === 'refused') throw new AppError(answer.code, { says: answer.says });
  if (answer.ok) {
    const said = saidCookie();
    if (answer.said !== undefined) context.cookies.set(said.name, answer.said, said.options);
    return context.redirect(answer.to, 303);
  }
  sent.setActionResult(action.name, sent.serializeActionResult(result));
  const page = await next();
  if (page.status !== 200) return page;
  if (answer.retryAfterSeconds !== undefined) page.headers.set('retry-after', String(answer.retryAfterSeconds));
  return new Response(page.body, { status: answer.status, headers: page.headers });
}

/** What Astro refuses before our own code sees a form: a name that no action has, a body that is no form or too long. */
function appErrorOfAction(error: ActionError | undefined): AppError {
  switch (error?.code) {
    case 'NOT_FOUND':
      return new AppError('NOT_FOUND');
    case 'UNSUPPORTED_MEDIA_TYPE':
      return new AppError('UNSUPPORTED');
    case 'CONTENT_TOO_LARGE':
      return new AppError('TOO_LARGE');
    default:
      return new AppError('BUG', { cause: error });
  }
}

function withHeaders(response: Response, actor: Actor | null, saysOnce: boolean): Response {
  const { payments, publicUrl } = config();
  const payOrigin = payments.url === undefined ? 'https://checkout.stripe.com' : new URL(payments.url, publicUrl).origin;
  const isPage = response.headers.get('content-type')?.startsWith('text/html') === true;
  const policy = isPage ? completePolicy(response.headers.get('content-security-policy'), payOrigin) : null;
  if (policy !== null) response.headers.set('content-security-policy', policy);
  if (isPage) response.headers.set(PAGE_OF_HEADER, actor?.publicId ?? NOBODY);
  if (saysOnce) response.headers.set(SAID_ONCE_HEADER, 'yes');
  if (!response.headers.has('cache-control')) response.headers.set('cache-control', cacheRule(actor !== null));
  return response;
}

/** The page a form stands on. One that is sent to an endpoint is told by its referrer; else she begins at her loom. */
function pageOfForm({ routePattern, url, request }: APIContext): string {
  if (!routePattern.startsWith('/api/')) return url.pathname;
  const referrer = request.headers.get('referer') ?? '';
  const from = URL.canParse(referrer) ? new URL(referrer) : null;
  return from?.host === url.host ? from.pathname : '/loom';
}

async function pageForError(context: APIContext, error: unknown, requestId: string): Promise<Response> {
  const known = knownError(error);
  const asked = context.request.method === 'GET' ? `${context.url.pathname}${context.url.search}` : null;
  if (known.code === 'UNAUTHENTICATED' || known.code === 'PROOF_NEEDED') {
    // A form's own page is where its action stands; the name of the action itself is not come back to.
    const back = asked ?? pageOfForm(context);
    return context.redirect(`${known.code === 'UNAUTHENTICATED' ? '/sign-in' : '/prove'}?to=${encodeURIComponent(back)}`, 303);
  }
  // An empty 404 makes Astro show its 404 page.
  if (known.code === 'NOT_FOUND' || known.code === 'GONE') return new Response(null, { status: 404 });
  context.locals.refusal = { status: known.status, says: known.says, requestId, again: asked };
  if (known.code === 'BUG') console.error(JSON.stringify({ level: 'error', requestId, path: context.routePattern, message: error instanceof Error ? error.stack : String(error) }));
  try {
    const page = await context.rewrite(new Request(new URL('/refused', context.url), { method: 'GET', headers: { accept: 'text/html' } }));
    if (known.retryAfterSeconds !== undefined) page.headers.set('retry-after', String(known.retryAfterSeconds));
    return withHeaders(new Response(page.body, { status: known.status, headers: page.headers }), 'ctx' in context.locals ? context.locals.ctx.actor : null, true);
  } catch {
    return new Response(null, { status: 500 });
  }
}
