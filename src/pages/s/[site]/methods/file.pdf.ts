/* The method file as PDF: all of it, or the topic that is asked for. */
import { type APIRoute } from 'astro';
import { CAUTION } from '@components/page/caution';
import { methodFile } from '@services/views/methods';
import { refuse, siteActor } from '@/http';
import { methodFilePdf } from '@/papers/method-file';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const file = methodFile({ topic: context.url.searchParams.get('topic') ?? '' });
  const bytes = await methodFilePdf(file, CAUTION);
  return new Response(new Uint8Array(bytes), {
    headers: {
      'Content-Type': 'application/pdf',
      'Content-Disposition': 'inline; filename="method-file.pdf"',
      'Cache-Control': 'no-store',
    },
  });
};
