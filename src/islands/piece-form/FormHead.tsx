import type { OtherPiece } from '#contracts/piece.ts';
import type { Judgement } from '#core/craft/piece-form/judge-typed.ts';
import { isUnsaved, statusWords, type Keeping } from '#islands/keeping/keeping.ts';
import { IconButton } from '#islands/ui/Button.tsx';
import { fieldId } from '#islands/ui/field-id.ts';
import { Findings } from '#islands/ui/Findings.tsx';
import { useShown } from './hands.ts';
import { placeOfField } from './piece-form-state.ts';

/** What is kept of the piece, in words. */
export interface SaveState {
  /** `Saved today 14:02`, `Draft saved 14:02`, or that nothing is yet. */
  readonly words: string;
  /** What stands in the form is not the piece that students have. */
  readonly isDraft: boolean;
  /** When the piece was saved that students have; null for none. */
  readonly pieceWords: string | null;
  /** When the texts were written that were set aside; null for none. */
  readonly asideWords: string | null;
}

interface FormHeadProps {
  readonly series: { readonly slug: string; readonly name: string };
  readonly saved: SaveState;
  readonly keeping: Keeping<OtherPiece>;
  readonly summary: string;
  readonly judged: Judgement;
  readonly isTried: boolean;
  readonly undo: (() => void) | null;
  readonly redo: (() => void) | null;
}

/** Name of the page, whether it is saved, the acts that save it and take steps back, and what stands in the way. */
export function FormHead({ series, saved, keeping, summary, judged, isTried, undo, redo }: FormHeadProps) {
  const problems = judged.ok || !isTried ? [] : judged.problems;
  const isDraft = saved.isDraft || keeping.edits > 0;
  return (
    <header className="head">
      <div className="row between">
        <h1>Pattern piece</h1>
        <div className="row head-acts">
          <span className={keeping.trouble === null || keeping.away ? 'small quiet' : 'small wrong'} role="status">{wordsOf(keeping, saved)}</span>
          <span className="row needs-script">
            <IconButton glyph="undo" label={undo === null ? 'Undo: nothing yet' : 'Undo'} aria-keyshortcuts="Control+Z" off={undo === null} onClick={undo ?? undefined} />
            <IconButton glyph="undo" label={redo === null ? 'Redo: nothing yet' : 'Redo'} className="mirrored" aria-keyshortcuts="Control+Y" off={redo === null} onClick={redo ?? undefined} />
          </span>
          <a className="btn" href={`/workroom/series/${series.slug}#before`}>What is missing</a>
          <button type="submit" name="do" value="save" className="btn btn-act">Save the piece</button>
        </div>
      </div>
      {(isDraft || saved.asideWords !== null) && <Drafts isDraft={isDraft} saved={saved} />}
      {(problems.length > 0 || summary !== '') && (
        <div className="notice notice-mend" role="alert" tabIndex={-1} id="piece-errors">
          <p className="h4">{problems.length === 0 ? summary : problems.length === 1 ? 'One thing does not work yet. Nothing typed is lost.' : `${String(problems.length)} things do not work yet. Nothing typed is lost.`}</p>
          {problems.length > 0 && summary !== '' && <p>{summary}</p>}
          <Findings found={problems.map((problem) => ({ code: problem.code, says: <ProblemLink {...problem} /> }))} />
        </div>
      )}
    </header>
  );
}

function wordsOf(keeping: Keeping<OtherPiece>, saved: SaveState): string {
  const isQuiet = !isUnsaved(keeping) && keeping.behind === null && keeping.trouble === null && !keeping.saving;
  if (!isQuiet) return statusWords(keeping);
  return keeping.savedAt === null ? saved.words : `Draft saved ${keeping.savedAt}`;
}

/** What students have meanwhile, and the ways back. They send the form, so they work without script. */
function Drafts({ isDraft, saved: { pieceWords, asideWords } }: { readonly isDraft: boolean; readonly saved: SaveState }) {
  return (
    <div className="row small drafts">
      {isDraft && <span className="quiet">{pieceWords === null ? 'A draft. Students see it when you save the piece.' : `A draft. Until you save it, students have the piece of ${pieceWords}.`}</span>}
      {isDraft && pieceWords !== null && <button type="submit" name="do" value="as-saved" formNoValidate className="btn btn-sm btn-quiet">Back to the saved piece</button>}
      {asideWords !== null && <button type="submit" name="do" value="set-aside" formNoValidate className="btn btn-sm btn-quiet">Take up what was set aside {asideWords}</button>}
    </div>
  );
}

function ProblemLink({ field, says }: { readonly field: string; readonly says: string }) {
  const { yarns } = useShown();
  const place = placeOfField(field, { yarns });
  const words = place === '' ? says : `${place}: ${says}`;
  if (field === '') return words;
  const open = () => { document.getElementById(fieldId(field))?.closest('details')?.setAttribute('open', ''); };
  return <a href={`#${fieldId(field)}`} onClick={open}>{words}</a>;
}
