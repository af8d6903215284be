import type { Dispatch } from 'react';
import { isThisLoom, ownLoomWords, type NamedLoom } from '#core/craft/my-piece/own-loom.ts';
import type { TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { MineEvent } from './mine-after.ts';

interface LoomChoiceProps {
  slug: string;
  looms: readonly NamedLoom[];
  typed: TypedMine;
  change: Dispatch<MineEvent>;
}

/** One of her looms in one press. Without script the form comes back with that loom in its fields, and with all else she typed. */
export function LoomChoice({ slug, looms, typed, change }: LoomChoiceProps) {
  if (looms.length === 0) return null;
  return (
    <div role="group" aria-labelledby="own-looms">
      <span className="label" id="own-looms">One of your looms</span>
      <ul className="own-looms">
        {looms.map(({ publicId, name, loom }) => (
          <li key={publicId}>
            <button
              type="submit"
              formMethod="get"
              formAction={`/series/${slug}/piece`}
              name="loom"
              value={publicId}
              aria-pressed={isThisLoom(typed, loom)}
              onClick={(event) => { event.preventDefault(); change({ kind: 'loom', loom }); }}
            >
              <b>{name}</b><span className="small">{ownLoomWords(loom, typed.units)}</span>
            </button>
          </li>
        ))}
      </ul>
      <p className="small"><a href="/account/looms">Your looms</a></p>
    </div>
  );
}
