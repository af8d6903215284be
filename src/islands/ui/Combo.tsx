import { useId, useMemo, useState, type KeyboardEvent } from 'react';
import { comboMatches, type ComboOption } from '#islands/ui/combo-matches.ts';
import { describedBy, fieldId } from '#islands/ui/field-id.ts';
import { Wrong } from '#islands/ui/Wrong.tsx';

interface ComboProps {
  name: string;
  label: string;
  options: readonly ComboOption[];
  value: string | undefined;
  onChoose: (value: string) => void;
  hint?: string | undefined;
  error?: string | undefined;
  form?: string | undefined;
}

/** One of many, found by typing: arrows move, Enter takes, Esc puts the list away. The chosen value goes with the form. */
export function Combo({ name, label, options, value, onChoose, hint, error, form }: ComboProps) {
  const id = fieldId(name, form);
  const listId = useId();
  const chosen = options.find((option) => option.value === value);
  const [typed, setTyped] = useState<string | null>(null);
  const [at, setAt] = useState(0);
  const matches = useMemo(() => comboMatches(options, typed ?? ''), [options, typed]);
  const open = typed !== null;
  const take = (option: ComboOption | undefined) => {
    if (option !== undefined) onChoose(option.value);
    setTyped(null);
  };
  const begin = () => { setTyped(''); setAt(0); };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      if (!open) { begin(); return; }
      const step = event.key === 'ArrowDown' ? 1 : -1;
      setAt((at + step + matches.length) % Math.max(1, matches.length));
    } else if (event.key === 'Enter' && open) {
      event.preventDefault();
      take(matches[at]);
    } else if (event.key === 'Escape' && open) {
      event.preventDefault();
      setTyped(null);
    }
  };
  return (
    <div className={error === undefined ? 'field combo' : 'field combo bad'}>
      <label htmlFor={id}>{label}</label>
      {hint !== undefined && <span className="hint" id={`${id}-hint`}>{hint}</span>}
      <div className="input">
        <input
          id={id} type="text" role="combobox" autoComplete="off" aria-autocomplete="list" aria-expanded={open} aria-controls={listId}
          aria-activedescendant={open && matches[at] ? `${listId}-${at}` : undefined}
          aria-invalid={error !== undefined || undefined} aria-describedby={describedBy(id, hint, error)}
          value={typed ?? chosen?.label ?? ''}
          onChange={(event) => { setTyped(event.currentTarget.value); setAt(0); }}
          onClick={() => { if (!open) begin(); }} onKeyDown={onKeyDown} onBlur={() => setTyped(null)}
        />
        <input type="hidden" name={name} value={value ?? ''} />
      </div>
      <div className="combo-list above" id={listId} role="listbox" aria-label={label} hidden={!open}>
        {matches.map((option, index) => (
          // The mouse must not take the focus away before it has chosen.
          <div key={option.value} id={`${listId}-${index}`} role="option" aria-selected={index === at} onMouseDown={(event) => event.preventDefault()} onClick={() => take(option)}>
            {option.label}
          </div>
        ))}
      </div>
      {open && matches.length === 0 && <p className="hint" role="status">Nothing here is called so.</p>}
      {error !== undefined && <Wrong id={`${id}-wrong`} says={error} />}
    </div>
  );
}
