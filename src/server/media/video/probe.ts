/** What a video's container says of itself. Nothing of it is decoded. */
import { open } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'astro/zod';
import { containerOfHead, type ProbedFile } from '#core/video/judge-probe.ts';
import { CAREFULLY, runTool } from './run-tool.ts';

const number = z.coerce.number().catch(0);

const Answer = z.object({
  format: z.object({ duration: z.coerce.number().positive().nullish().catch(null) }).default({}),
  streams: z.array(z.object({
    index: z.number().int(),
    codec_type: z.string().default(''),
    codec_name: z.string().default(''),
    width: number.default(0),
    height: number.default(0),
    avg_frame_rate: z.string().default('0/0'),
    disposition: z.object({ attached_pic: number.default(0) }).default({}),
  })).default([]),
});

const ENTRIES = 'format=duration:stream=index,codec_type,codec_name,width,height,avg_frame_rate:stream_disposition=attached_pic';

/** @returns null when it is no container that we open, or one that is broken. */
export async function probeVideo(folder: string, name: string, signal?: AbortSignal): Promise<ProbedFile | null> {
  if (containerOfHead(await headOf(join(folder, name))) === null) return null;
  const end = await runTool('ffprobe', [...CAREFULLY, '-show_entries', ENTRIES, '-of', 'json', `file:${name}`], { folder, seconds: 60, maxFileBytes: 0, ...(signal && { signal }) });
  if (end.ended !== 'well') return null;
  const answer = Answer.safeParse(JSON.parse(end.output));
  if (!answer.success) return null;
  return {
    seconds: answer.data.format.duration ?? null,
    streams: answer.data.streams.map((stream) => ({
      index: stream.index,
      kind: stream.codec_type,
      codec: stream.codec_name,
      width: stream.width,
      height: stream.height,
      framesPerSecond: quotient(stream.avg_frame_rate),
      isStill: stream.disposition.attached_pic === 1,
    })),
  };
}

async function headOf(path: string): Promise<Uint8Array> {
  const file = await open(path);
  try {
    const head = new Uint8Array(16);
    await file.read(head, 0, 16, 0);
    return head;
  } finally {
    await file.close();
  }
}

function quotient(text: string): number {
  const [over = 0, under = 0] = text.split('/').map(Number);
  return under > 0 ? over / under : 0;
}
