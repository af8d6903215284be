/** One count turned into all the others while one types. The page draws it whole, and without script its form asks the page again. */
import { useState } from 'react';
import type { AnswerLine } from '#core/reckoner/answer-line.ts';
import { convertCount } from '#core/reckoner/convert-count.ts';
import { isPlainNumber, YARN_WAYS } from '#core/reckoner/read-fields.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';
import { Parts } from '#islands/ui/Parts.tsx';

interface CountConverterProps {
  /** What the address asks for, or an example. */
  readonly way: string;
  readonly typed: string;
}

export function CountConverter(asked: CountConverterProps) {
  const [{ way, typed }, ask] = useState(asked);
  const { wrong, lines, notes } = convertCount(way, typed);
  const plain = isPlainNumber(way);
  return (
    <form method="get" action="#converter" className="stack stack-tight">
      <div className="two items-end">
        <Select name="count" form="convert" label="The label says" value={way} options={YARN_WAYS} onChange={({ target }) => ask({ way: target.value, typed })} />
        <Field
          name="of" form="convert" label="The number" value={typed} error={wrong} maxLength={40} autoComplete="off" inputMode={plain ? 'decimal' : 'text'}
          hint={plain ? 'Such as 300 or 12.5.' : 'As it stands there, such as 16 or 8/2.'}
          onChange={({ target }) => ask({ way, typed: target.value })}
        />
      </div>
      <noscript><Button type="submit">Turn it into the others</Button></noscript>
      <div aria-live="polite">
        {lines.length > 0 && <Lines lines={lines} />}
        {notes.map((note) => <p key={note} className="small mt-2">{note}</p>)}
      </div>
    </form>
  );
}

function Lines({ lines }: { readonly lines: readonly AnswerLine[] }) {
  return (
    <div className="scrolls" role="region" aria-label="The same yarn in every count" tabIndex={0}>
      <table className="table dense w-full">
        <caption className="hide">The same yarn in every count</caption>
        <thead><tr><th scope="col">count, and how it is got</th><th scope="col" className="num">it is</th></tr></thead>
        <tbody>
          {lines.map(({ label, value, how }) => (
            <tr key={label}>
              <th scope="row" className="font-normal"><span className="block">{label}</span><span className="small quiet block">{how}</span></th>
              <td className="num">{value.kind === 'words' ? value.words : <Parts parts={formatAmount(value, 'cm')} />}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
