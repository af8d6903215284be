import { memo, useState } from 'react';
import { ashenhurstOf, BALL, BY, COLOUR, FIBRE, FREE_DIAMETER, gristAsked, LABEL, ROLE, STRANDS, WRAPS } from '#core/craft/piece-form/asked-of-yarn.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { Field } from '#islands/ui/Field.tsx';
import { fieldId } from '#islands/ui/field-id.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';
import { ActButton } from './ActButton.tsx';
import { AskedField, AskedFields } from './AskedField.tsx';
import { useHands, useShown } from './hands.ts';
import { yarnWords } from './yarn-choices.ts';

interface YarnRowProps {
  readonly texts: Texts;
  /** `warp.yarn.` or `yarns.2.` */
  readonly prefix: string;
  /** Place and id among the yarns; the warp's yarn stands apart and has no role. */
  readonly index?: number;
  readonly id?: number;
  readonly isUsed?: boolean;
  readonly isOpen: boolean;
}

const WRAPS_ALONE = 'Wraps tell the weight only roughly, and rather too heavy. Metres and grams of a label are better.';

/** A yarn: one line closed, all that is known of it open. */
export const YarnRow = memo(function YarnRow({ texts, prefix, index, id, isUsed = false, isOpen }: YarnRowProps) {
  const { wrong, yarns } = useShown();
  const [beginsOpen] = useState(isOpen || [...wrong.keys()].some((field) => field.startsWith(prefix)));
  const by = textOf(texts, 'by');
  const grist = textOf(texts, 'grist');
  const weight = by === 'wraps' ? `${textOf(texts, 'wrapsPerInch')} wraps` : by === 'class' ? `class ${grist}` : grist === '' ? '' : `${grist} ${WAYS[by] ?? by}`;
  return (
    <details className="yarn-row" open={beginsOpen} id={index === undefined ? 'warp-yarn' : `yarn-${String(index)}`}>
      <summary>
        <YarnDot colour={textOf(texts, 'colour')} />
        <b>{index === undefined ? (textOf(texts, 'label') === '' ? 'Warp yarn' : textOf(texts, 'label')) : yarnWords(texts, index)}</b>
        <span className="num small">{weight}</span>
      </summary>
      <div className="edit">
        {id !== undefined && <input type="hidden" name={`${prefix}id`} value={id} />}
        {index !== undefined && <AskedField asked={ROLE} texts={texts} prefix={prefix} className="half" />}
        <DyeField texts={texts} prefix={prefix} />
        <AskedField asked={LABEL} texts={texts} prefix={prefix} className="whole" />
        <AskedField asked={BY} texts={texts} prefix={prefix} className="half" />
        {by === 'wraps' ? <p className="half small quiet self-end">{WRAPS_ALONE}</p> : <AskedField asked={gristAsked(by)} texts={texts} prefix={prefix} className="half" />}
        {by === 'wraps' && <input type="hidden" name={`${prefix}grist`} value={grist} />}
        <AskedFields asked={[WRAPS, FREE_DIAMETER]} texts={texts} prefix={prefix} className="half" />
        <AskedFields asked={[STRANDS, ...BALL]} texts={texts} prefix={prefix} className="third" />
        <AskedFields asked={[FIBRE, ashenhurstOf(index === undefined ? 'warp' : 'weft')]} texts={texts} prefix={prefix} className="half" />
        {index !== undefined && (
          <p className="whole row between">
            <span className="small quiet">{isUsed ? 'Bands are woven with it.' : 'No band is woven with it yet.'}</span>
            {yarns.length > 1 && <ActButton act={{ do: 'take-out-yarn', yarn: index }} to="yarns" className="btn btn-sm btn-quiet"><Glyph name="takeOut" />Take this yarn out</ActButton>}
          </p>
        )}
      </div>
    </details>
  );
});

const WAYS: Readonly<Record<string, string>> = { metresPer100g: 'm in 100 g', tex: 'tex', nm: 'Nm', 'ne-cotton': 'cotton count', 'spun-silk': 'silk count', 'ne-worsted': 'worsted count', lea: 'lea', run: 'run', yorkshire: 'skein', denier: 'denier', dtex: 'dtex', jute: 'jute', grain: 'grain' };

/** The colour as text, which every browser can send, with the browser's own picker in the box. */
function DyeField({ texts, prefix }: { readonly texts: Texts; readonly prefix: string }) {
  const { type } = useHands();
  const { wrong } = useShown();
  const name = `${prefix}${COLOUR.key}`;
  const text = textOf(texts, COLOUR.key);
  const picker = <input className="dye" type="color" aria-label="Pick the colour" value={/^#[0-9a-f]{6}$/i.test(text) ? text.toLowerCase() : '#d8d2c1'} onChange={(event) => type(name, event.currentTarget.value)} id={`${fieldId(name)}-picker`} />;
  return (
    <div className="half">
      <Field name={name} label={COLOUR.label} value={text} error={wrong.get(name)} placeholder={COLOUR.otherwise} maxLength={7} autoComplete="off" spellCheck={false} onChange={(event) => type(name, event.currentTarget.value)} inBox={picker} />
    </div>
  );
}
