import { useEffect, useMemo, useState } from 'react';
import type { ThingKept } from '#contracts/workroom.ts';
import { Combo } from '#islands/ui/Combo.tsx';

interface ThingChoiceProps {
  things: readonly ThingKept[];
  /** The form whose fields take the words of the chosen thing. */
  formId: string;
  /** Public id of what the page has filled in already. */
  chosen: string | null;
}

const KIND_WORDS = { tool: 'tool', yarn: 'yarn', material: 'material' } as const;

/** A kept thing for a new line: found by typing, it fills the form at once; without script a plain choice that comes back with the page. */
export function ThingChoice({ things, formId, chosen }: ThingChoiceProps) {
  const [isAwake, setAwake] = useState(false);
  const [taken, setTaken] = useState(chosen ?? undefined);
  useEffect(() => setAwake(true), []);
  const options = useMemo(() => things.map(({ publicId, kind, name }) => ({ value: publicId, label: `${name} (${KIND_WORDS[kind]})` })), [things]);
  const name = things.find(({ publicId }) => publicId === taken)?.name;
  const choose = (publicId: string) => {
    const thing = things.find((one) => one.publicId === publicId);
    const form = document.getElementById(formId);
    if (thing === undefined || !(form instanceof HTMLFormElement)) return;
    fillIn(form, thing);
    setTaken(publicId);
  };
  if (!isAwake) {
    return (
      <form method="get" action="#add-title" className="row items-end">
        <div className="field">
          <label htmlFor="f-thing">One of your things</label>
          <div className="input">
            <select id="f-thing" name="thing" defaultValue={chosen ?? undefined}>{options.map(({ value, label }) => <option key={value} value={value}>{label}</option>)}</select>
          </div>
        </div>
        <button className="btn" type="submit">Fill it in</button>
      </form>
    );
  }
  return (
    <>
      <Combo name="thing" label="One of your things" hint="Type a few letters; its words fill the fields below." options={options} value={taken} onChoose={choose} />
      <p className="small quiet" role="status">{name === undefined ? '' : `“${name}” is filled in below. Say how much of it, and put it on the list.`}</p>
    </>
  );
}

/** Writes the words as if they were typed, so that whoever looks after the form notices. */
function fillIn(form: HTMLFormElement, thing: ThingKept): void {
  for (const name of ['name', 'standIn', 'getFrom', 'lookOut'] as const) {
    const field = form.elements.namedItem(name);
    if (field instanceof HTMLInputElement) field.value = thing[name] ?? '';
  }
  const kind = form.elements.namedItem('kind');
  if (kind instanceof RadioNodeList) kind.value = thing.kind;
  form.dispatchEvent(new Event('input', { bubbles: true }));
}
