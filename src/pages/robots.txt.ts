import type { APIRoute } from 'astro';
import { robotsText } from '#server/web/robots.ts';
import { sendDocument } from '#server/web/xml.ts';

export const GET: APIRoute = ({ request }) => sendDocument(request, robotsText(), 'text/plain; charset=utf-8');
