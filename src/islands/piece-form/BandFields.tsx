import { BAND_NAME, bandFields, FILL_KEY, TECHNIQUE } from '#core/craft/piece-form/asked-of-band.ts';
import type { Asked } from '#core/craft/piece-form/asked.ts';
import { textOf, type TypedBand } from '#core/craft/piece-form/typed-piece.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { ActButton, LookButton } from './ActButton.tsx';
import { AskedField } from './AskedField.tsx';
import { useHands, useShown } from './hands.ts';
import { HiddenTexts } from './HiddenTexts.tsx';
import { HiddenShapes, ShapeRows } from './ShapeRows.tsx';

interface BandFieldsProps {
  readonly band: TypedBand;
  readonly index: number;
  readonly count: number;
  readonly laterIsUp: boolean;
}

const widthOf = ({ kind }: Asked): string => (kind === 'role' ? 'half' : 'third');

/** Everything a band is asked, and what can be done with it. */
export function BandFields({ band, index, count, laterIsUp }: BandFieldsProps) {
  const { texts } = band;
  const prefix = `bands.${String(index)}.`;
  const technique = textOf(texts, 'technique');
  const fills = technique === 'tabby' && textOf(texts, FILL_KEY) !== '';
  const asked = bandFields(technique).filter(({ key }) => !(fills && key === 'heightMm'));
  const [yarn, ...more] = asked;
  return (
    <div className="edit">
      <AskedField asked={TECHNIQUE} texts={texts} prefix={prefix} className="half" />
      {yarn !== undefined && <AskedField asked={yarn} texts={texts} prefix={prefix} className="half" />}
      <LookButton to={`band-${String(index)}`}>Show what this technique asks</LookButton>
      {more.map((one) => <AskedField key={one.key} asked={one} texts={texts} prefix={prefix} className={widthOf(one)} />)}
      {technique === 'tabby' && <FillTick {...{ prefix, fills }} />}
      <AskedField asked={BAND_NAME} texts={texts} prefix={prefix} className="whole" />
      <HiddenTexts texts={texts} prefix={prefix} shown={new Set(['technique', 'name', ...(technique === 'tabby' ? [FILL_KEY] : []), ...asked.map(({ key }) => key)])} />
      {technique === 'tabby' ? <ShapeRows band={band} index={index} /> : <HiddenShapes band={band} index={index} />}
      <BandActs {...{ index, count, laterIsUp }} />
    </div>
  );
}

function FillTick({ prefix, fills }: { readonly prefix: string; readonly fills: boolean }) {
  const { type } = useHands();
  const { wrong } = useShown();
  const name = `${prefix}${FILL_KEY}`;
  // While it fills, its height has no box of its own: what is wrong with it is told here, and found under that id.
  const says = fills ? wrong.get(`${prefix}heightMm`) : undefined;
  const id = fieldId(fills ? `${prefix}heightMm` : name);
  return (
    <div className={fills ? 'whole' : 'two-thirds'}>
      <label className="check-row"><input className="check" type="checkbox" id={id} name={name} value="yes" checked={fills} aria-invalid={says !== undefined || undefined} aria-describedby={says === undefined ? undefined : `${id}-wrong`} onChange={(event) => type(name, event.currentTarget.checked ? 'yes' : '')} /><span>{fills ? 'Fills what the other bands leave of the height' : 'Fills what others leave'}</span></label>
      {says !== undefined && <Wrong id={`${id}-wrong`} says={says} />}
    </div>
  );
}

/** The list runs as the picture does, so what is woven later may stand above. */
function BandActs({ index, count, laterIsUp }: Omit<BandFieldsProps, 'band'>) {
  const number = String(index + 1);
  const later = { act: { do: 'later', band: index } as const, to: `band-${String(index + 1)}`, off: index === count - 1, label: `Weave band ${number} later` };
  const sooner = { act: { do: 'sooner', band: index } as const, to: `band-${String(Math.max(0, index - 1))}`, off: index === 0, label: `Weave band ${number} sooner` };
  const [up, down] = laterIsUp ? [later, sooner] : [sooner, later];
  return (
    <div className="whole row between band-acts">
      <span className="icons">
        <ActButton {...up}><Glyph name="up" /></ActButton>
        <ActButton {...down}><Glyph name="down" /></ActButton>
        <ActButton act={{ do: 'copy-band', band: index }} to={`band-${String(index + 1)}`} label={`Copy band ${number}`}><Glyph name="copy" /></ActButton>
        <ActButton act={{ do: 'split-band', band: index }} to={`band-${String(index)}`} label={`Split band ${number} in two`}><Glyph name="scissors" /></ActButton>
      </span>
      <ActButton act={{ do: 'add-band', after: index }} to={`band-${String(index + 1)}`} className="btn btn-sm"><Glyph name="plus" />Add a band after this</ActButton>
      <ActButton act={{ do: 'take-out-band', band: index }} to="bands" className="btn btn-sm btn-quiet"><Glyph name="takeOut" />Take this band out</ActButton>
    </div>
  );
}
