import type { APIRoute } from 'astro';
import { RECKON_DOCUMENT } from '#contracts/reckon-api/document.ts';

const BODY = JSON.stringify(RECKON_DOCUMENT);

/** How programs ask the reckoner, in a form they can read. */
export const GET: APIRoute = () =>
  new Response(BODY, { headers: { 'Content-Type': 'application/json; charset=utf-8', 'Cache-Control': 'public, max-age=3600', 'Access-Control-Allow-Origin': '*' } });
