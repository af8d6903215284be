import { parse as parseYaml } from 'yaml';
import { planPiece } from '#core/craft/plan.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { instantOfWall, type OpeningRule } from '#core/timetable/opening.ts';
import { SeriesFile } from '#contracts/series-folder.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize } from '#server/errors.ts';
import { GatheringItem, Lesson, PatternPiece, Series } from '#server/models/index.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import type { ParseResult } from '#server/lesson-text/serve-parses.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** Reads one file of the folder as text; null when there is none. */
export type ReadFile = (name: string) => Promise<string | null>;

interface Checked {
  readonly file: SeriesFile;
  readonly piece: Piece | null;
  readonly texts: readonly { readonly source: string; readonly reading: ParseResult }[];
}

/**
 * Makes a draft series from a folder of plain files. Everything is checked before anything is written; the list of
 * what does not fit names file and place.
 * @throws VALIDATION with one sentence for each file; NOT_FOUND for another teacher's workroom.
 */
export async function importSeries(ctx: Context, input: { workroomId: number; slug: string; read: ReadFile }): Promise<Series> {
  authorize(mayTeachIn(ctx.actor, input.workroomId));
  const checked = await check(input.read);
  return withTransaction(async () => {
    const { file } = checked;
    const series = await Series.create({
      workroomId: input.workroomId,
      slug: input.slug,
      title: file.title,
      craft: file.craft,
      level: file.level,
      summary: file.summary,
      story: file.story,
      techniques: file.techniques,
      priceMinor: file.price?.amountMinor ?? null,
      currency: file.price?.currency ?? 'EUR',
    });
    if (checked.piece !== null) await PatternPiece.create({ seriesId: series.id, data: checked.piece });
    await writeLessons(series.id, checked);
    return series;
  });
}

async function writeLessons(seriesId: number, { file, texts }: Checked): Promise<void> {
  const publicIds = file.lessons.map(() => newPublicId());
  for (const [index, entry] of file.lessons.entries()) {
    const opens: OpeningRule = entry.opens.rule === 'after-verdict' ? { rule: 'after-verdict', lesson: publicIds[entry.opens.part - 1] ?? '' } : entry.opens;
    const lesson = await Lesson.create({
      publicId: publicIds[index] ?? newPublicId(),
      seriesId,
      position: index + 1,
      title: entry.title,
      minutes: entry.minutes,
      isPreview: entry.preview,
      opens,
      opensAt: opens.rule === 'on-date' ? instantOfWall(opens.wall, opens.zone) : null,
      checkpoint: entry.checkpoint ?? null,
      draftSource: texts[index]?.source ?? '',
      ...(texts[index] === undefined ? {} : { draftReading: texts[index].reading }),
    });
    await GatheringItem.bulkCreate(entry.gathering.map((item, position) => ({
      lessonId: lesson.id,
      position: position + 1,
      kind: item.kind,
      name: item.name,
      amountKey: item.amount ?? null,
      amountText: item.amountText ?? null,
      standIn: item.standIn ?? null,
      untilPart: item.untilPart ?? null,
      note: item.note ?? null,
    })));
  }
}

async function check(read: ReadFile): Promise<Checked> {
  const fields: Record<string, string> = {};
  const file = await readSeriesFile(read);
  const piece = await readPiece(read, fields);
  if (piece !== null && piece.craft !== file.craft) fields['piece.json'] = 'This piece is of another craft than series.yaml says.';
  const texts: { source: string; reading: ParseResult }[] = [];
  for (const [index, { file: name, opens }] of file.lessons.entries()) {
    const source = await read(name);
    if (source === null) {
      fields[name] = 'This file is named in series.yaml but is not in the folder.';
      continue;
    }
    const reading = await readLessonText(source);
    if (!reading.ok) fields[name] = reading.problems.map(({ line, reason }) => `Line ${line}: ${reason}`).join(' ');
    if (opens.rule === 'after-verdict' && (opens.part > index || file.lessons[opens.part - 1]?.checkpoint === undefined)) {
      fields[`${name} opens`] = `Part ${opens.part} is not an earlier part with a checkpoint.`;
    }
    texts.push({ source, reading });
  }
  if (Object.keys(fields).length > 0) throw new AppError('VALIDATION', { says: 'This folder does not fit yet.', fields });
  return { file, piece, texts };
}

async function readSeriesFile(read: ReadFile): Promise<SeriesFile> {
  const source = await read('series.yaml');
  if (source === null) throw new AppError('VALIDATION', { fields: { 'series.yaml': 'There is no series.yaml in this folder.' } });
  let data: unknown;
  try {
    data = parseYaml(source, { maxAliasCount: 0 });
  } catch (error) {
    throw new AppError('VALIDATION', { fields: { 'series.yaml': error instanceof Error ? error.message : 'This is no YAML.' } });
  }
  const parsed = SeriesFile.safeParse(data);
  if (!parsed.success) throw new AppError('VALIDATION', { fields: { 'series.yaml': parsed.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`).join('; ') } });
  return parsed.data;
}

async function readPiece(read: ReadFile, fields: Record<string, string>): Promise<Piece | null> {
  const source = await read('piece.json');
  if (source === null) return null;
  let data: unknown;
  try {
    data = JSON.parse(source);
  } catch {
    fields['piece.json'] = 'This is no JSON.';
    return null;
  }
  const plan = planPiece(data);
  if (!plan.ok) {
    fields['piece.json'] = plan.problems.map(({ path, message }) => `${path}: ${message}`).join(' ');
    return null;
  }
  // Reckoned without a problem, so it has the shape of a piece.
  return data as Piece;
}
