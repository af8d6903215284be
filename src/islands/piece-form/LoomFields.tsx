import { memo } from 'react';
import { ALLOWANCES, askedOfMode, BEAT_BY, ENDS_TOGETHER, FINISH, FIXING, FRINGE, fringeAsked, HANGING, HANGS, hasTwoRows, LOOM, LOOM_KIND, MODE, NAIL_ROWS, OF_MODE, OWN_BEAT, PARITY, SEED, SIZE, SWATCH_BEAT, WARP, WARPING } from '#core/craft/piece-form/asked-of-piece.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { LookButton } from './ActButton.tsx';
import { AskedField, AskedFields } from './AskedField.tsx';
import { useShown } from './hands.ts';
import { HiddenTexts } from './HiddenTexts.tsx';
import { YarnRow } from './YarnRow.tsx';

/** The finished size and the loom it is woven on. */
export const SizeAndLoom = memo(function SizeAndLoom() {
  const { texts } = useShown();
  const twoRows = hasTwoRows(texts);
  return (
    <section aria-labelledby="size-title">
      <h2 className="h3" id="size-title">Size and loom</h2>
      <div className="edit">
        <AskedFields asked={SIZE} texts={texts} className="half" />
        <p className="whole small quiet">Of the finished cloth, without fringe.</p>
        <AskedField asked={LOOM_KIND} texts={texts} className="whole" />
        {twoRows && <AskedField asked={NAIL_ROWS} texts={texts} className="whole" />}
        <LookButton to="size-title">Show what this loom asks</LookButton>
        <HiddenTexts texts={{ [NAIL_ROWS.key]: textOf(texts, NAIL_ROWS.key) }} prefix="" shown={new Set(twoRows ? [NAIL_ROWS.key] : [])} />
        <AskedFields asked={LOOM.slice(0, 2)} texts={texts} className="half" />
        <AskedFields asked={LOOM.slice(2)} texts={texts} className="third" />
        <AskedField asked={WARPING} texts={texts} className="whole" />
      </div>
    </section>
  );
});

/** The warp: its yarn, how ends are worked, how many there are. */
export const WarpFields = memo(function WarpFields({ warpYarn }: { readonly warpYarn: Texts }) {
  const { texts } = useShown();
  return (
    <section aria-labelledby="warp-title">
      <h2 className="h3" id="warp-title">Warp</h2>
      <div className="lined-rows"><YarnRow texts={warpYarn} prefix="warp.yarn." isOpen={textOf(warpYarn, 'grist') === ''} /></div>
      <div className="edit">
        <AskedField asked={ENDS_TOGETHER} texts={texts} bar className="half" />
        <AskedField asked={PARITY} texts={texts} className="half" />
        <AskedFields asked={WARP} texts={texts} className="half" />
      </div>
    </section>
  );
});

/** How closely rows lie. Of the two numbers only the one that counts has a field. */
export const BeatFields = memo(function BeatFields() {
  const { texts } = useShown();
  const by = textOf(texts, BEAT_BY.key);
  const number = by === 'swatch' ? SWATCH_BEAT : by === 'own' ? OWN_BEAT : null;
  const ofMode = askedOfMode(texts);
  const others = Object.fromEntries([SWATCH_BEAT, OWN_BEAT, ...OF_MODE].map(({ key }) => [key, textOf(texts, key)]));
  return (
    <section aria-labelledby="beat-title">
      <h2 className="h3" id="beat-title">Beat</h2>
      <div className="edit">
        <AskedField asked={BEAT_BY} texts={texts} className="whole" />
        {number !== null && <AskedField asked={number} texts={texts} className="whole" />}
        <LookButton to="beat-title">Show the numbers it asks</LookButton>
        <AskedField asked={MODE} texts={texts} className="whole" />
        <AskedFields asked={ofMode} texts={texts} className="half" />
        <HiddenTexts texts={others} prefix="" shown={new Set([...(number === null ? [] : [number]), ...ofMode].map(({ key }) => key))} />
      </div>
    </section>
  );
});

export const HangingFields = memo(function HangingFields() {
  const { texts } = useShown();
  const fringe = fringeAsked(texts);
  return (
    <section aria-labelledby="hanging-title">
      <h2 className="h3" id="hanging-title">Edges and hanging</h2>
      <div className="edit">
        <AskedFields asked={HANGING} texts={texts} className="half" />
        <AskedField asked={FIXING} texts={texts} className="whole" />
        <AskedField asked={FINISH} texts={texts} className="whole" />
        <LookButton to="hanging-title">Show what this finish asks</LookButton>
        <AskedFields asked={fringe} texts={texts} className="half" />
        <HiddenTexts texts={Object.fromEntries(FRINGE.map(({ key }) => [key, textOf(texts, key)]))} prefix="" shown={new Set(fringe.map(({ key }) => key))} />
        <AskedField asked={HANGS} texts={texts} className="whole" />
      </div>
    </section>
  );
});

/** Folded, because the standards do for most pieces; each says what it means. */
export const AllowanceFields = memo(function AllowanceFields() {
  const { texts, wrong } = useShown();
  const isOpen = ALLOWANCES.some(({ key }) => wrong.has(key));
  return (
    <details className="fold" open={isOpen || undefined}>
      <summary><h2 className="h3">Allowances</h2></summary>
      <p className="small quiet">What stands there in grey is reckoned with. Type over it where you know better.</p>
      <div className="edit">
        <AskedFields asked={ALLOWANCES} texts={texts} className="half" />
        <AskedField asked={SEED} texts={texts} className="whole" />
      </div>
    </details>
  );
});
