import type { TextRemarks } from '#contracts/workroom.ts';
import type { LessonProblem } from '#core/lesson-text/problem.ts';
import { Flag } from '#islands/ui/Flag.tsx';
import { Glyph } from '#islands/ui/Glyph.tsx';

interface RemarksProps {
  remarks: TextRemarks;
  isEmpty: boolean;
  /** The words of a line, to find it by. */
  wordsOf: (line: number) => string;
  /** Id of the text field, for those who come without script. */
  fieldId: string;
  onGo: (remark: LessonProblem) => void;
}

/** What does not work yet in a text, line by line, and what is worth a look. Each leads to its line. */
export function Remarks({ remarks: { problems, warnings }, isEmpty, wordsOf, fieldId, onGo }: RemarksProps) {
  return (
    <section className="remarks" aria-labelledby="remarks-title">
      <h2 className="h4" id="remarks-title">Line by line</h2>
      <div role="status">
        {problems.length === 0 && <p className="small">{isEmpty ? 'Nothing is written yet.' : 'It can be read as it stands.'}</p>}
        {problems.length > 0 && <p><Flag kind="mend">{problems.length === 1 ? 'One thing cannot be read' : `${problems.length} things cannot be read`}</Flag></p>}
      </div>
      <RemarkList remarks={problems} wordsOf={wordsOf} fieldId={fieldId} onGo={onGo} />
      {warnings.length > 0 && <p className="mt-3"><span className="flag"><i><Glyph name="info" /></i><span>Worth a look</span></span></p>}
      <RemarkList remarks={warnings} wordsOf={wordsOf} fieldId={fieldId} onGo={onGo} />
    </section>
  );
}

function RemarkList({ remarks, wordsOf, fieldId, onGo }: Omit<RemarksProps, 'remarks' | 'isEmpty'> & { remarks: readonly LessonProblem[] }) {
  if (remarks.length === 0) return null;
  return (
    <ol role="list">
      {remarks.map((remark) => (
        <li key={`${remark.line}.${remark.column}.${remark.code}`}>
          <a href={`#${fieldId}`} onClick={(event) => { event.preventDefault(); onGo(remark); }}>Line {remark.line}</a>
          <div>
            {wordsOf(remark.line) !== '' && <code>{wordsOf(remark.line)}</code>}
            <p>{remark.reason}</p>
          </div>
        </li>
      ))}
    </ol>
  );
}
