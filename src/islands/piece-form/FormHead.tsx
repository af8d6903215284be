import type { Judgement } from '#core/craft/piece-form/judge-typed.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { Findings } from '#islands/ui/Findings.tsx';
import { useHands } from './hands.ts';
import { placeOfField } from './piece-form-state.ts';

export interface SaveState {
  /** `Saved 14:02`, or that nothing is yet. */
  readonly words: string;
}

interface FormHeadProps {
  readonly series: { readonly slug: string; readonly name: string };
  readonly saved: SaveState;
  readonly summary: string;
  readonly judged: Judgement;
  readonly isTried: boolean;
  readonly isChanged: boolean;
}

/** Name of the page, whether it is saved, the act that saves it, and what stands in its way. */
export function FormHead({ series, saved, summary, judged, isTried, isChanged }: FormHeadProps) {
  const problems = judged.ok || !isTried ? [] : judged.problems;
  return (
    <header className="head">
      <div className="row between">
        <h1>Pattern piece</h1>
        <p className="row">
          <span className="small quiet" role="status">{isChanged ? 'Not saved yet' : saved.words}</span>
          <a className="btn" href={`/workroom/series/${series.slug}#before`}>What is missing</a>
          <button type="submit" name="do" value="save" className="btn btn-act">Save the piece</button>
        </p>
      </div>
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

function ProblemLink({ field, says }: { readonly field: string; readonly says: string }) {
  const { typed } = useHands();
  const place = placeOfField(field, typed);
  const words = place === '' ? says : `${place}: ${says}`;
  if (field === '') return words;
  const open = () => { document.getElementById(fieldId(field))?.closest('details')?.setAttribute('open', ''); };
  return <a href={`#${fieldId(field)}`} onClick={open}>{words}</a>;
}
