import { SHAPE, SHAPE_HINT, shapeFields } from '#core/craft/piece-form/asked-of-band.ts';
import { textOf, type TypedBand, type TypedRow } from '#core/craft/piece-form/typed-piece.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { ActButton, LookButton } from './ActButton.tsx';
import { AskedField } from './AskedField.tsx';
import { HiddenTexts } from './HiddenTexts.tsx';

interface ShapesProps {
  readonly band: TypedBand;
  /** Of the band. */
  readonly index: number;
}

/** Figures in other colours, woven into the ground of a tabby. */
export function ShapeRows({ band, index }: ShapesProps) {
  return (
    <div className="whole shapes">
      {band.shapes.map((shape, at) => <ShapeRow key={shape.id} shape={shape} band={index} at={at} />)}
      <ActButton act={{ do: 'add-shape', band: index }} to={`shape-${String(index)}-${String(band.shapes.length)}`} className="btn btn-sm"><Glyph name="plus" />Put a shape into this band</ActButton>
    </div>
  );
}

function ShapeRow({ shape: { texts }, band, at }: { readonly shape: TypedRow; readonly band: number; readonly at: number }) {
  const prefix = `bands.${String(band)}.shapes.${String(at)}.`;
  const asked = shapeFields(textOf(texts, 'shape'));
  return (
    <fieldset className="shape" id={`shape-${String(band)}-${String(at)}`}>
      <legend className="label">Shape {at + 1}</legend>
      <div className="edit">
        {[SHAPE, ...asked].map((one) => <AskedField key={one.key} asked={one} texts={texts} prefix={prefix} className={one.kind === 'points' ? 'whole' : one.kind === 'choice' || one.kind === 'role' ? 'half' : 'third'} />)}
        <p className="whole small quiet">{SHAPE_HINT}</p>
        <HiddenTexts texts={texts} prefix={prefix} shown={new Set(['shape', ...asked.map(({ key }) => key)])} />
        <p className="whole row between">
          <LookButton to={`shape-${String(band)}-${String(at)}`}>Show what this shape asks</LookButton>
          <ActButton act={{ do: 'take-out-shape', band, shape: at }} to={`band-${String(band)}`} className="btn btn-sm btn-quiet"><Glyph name="takeOut" />Take shape {at + 1} out</ActButton>
        </p>
      </div>
    </fieldset>
  );
}

/** Shapes of a band that is no tabby for now: kept, in case it becomes one again. */
export function HiddenShapes({ band, index }: ShapesProps) {
  return band.shapes.map((shape, at) => <HiddenTexts key={shape.id} texts={shape.texts} prefix={`bands.${String(index)}.shapes.${String(at)}.`} shown={NOTHING} />);
}

const NOTHING: ReadonlySet<string> = new Set();
