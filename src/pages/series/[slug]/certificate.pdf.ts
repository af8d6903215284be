import type { APIRoute } from 'astro';
import { CertificateForm } from '#contracts/certificate.ts';
import { AppError } from '#server/errors.ts';
import { makeCertificate } from '#server/use-cases/finish/make-certificate.ts';
import { answering } from '#server/web/respond.ts';
import { fieldSentences } from '#server/web/form.ts';

/** The asker's certificate of a series she finished, with what she wants on it in the address. */
export const GET: APIRoute = ({ params: { slug = '' }, url, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    const asked = CertificateForm.safeParse(Object.fromEntries(url.searchParams));
    if (!asked.success) throw new AppError('VALIDATION', { fields: fieldSentences(asked.error) });
    const bytes = await makeCertificate(ctx, slug, asked.data);
    return new Response(new Uint8Array(bytes), {
      headers: {
        'Content-Type': 'application/pdf',
        'Content-Disposition': `inline; filename="${slug.replace(/[^a-z0-9-]/g, '')}-certificate.pdf"`,
        'Cache-Control': 'private, no-store',
        'X-Robots-Tag': 'noindex',
        Vary: 'Cookie',
      },
    });
  });
