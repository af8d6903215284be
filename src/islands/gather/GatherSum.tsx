import { useEffect, useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';

export interface GatherSumProps {
  left: number;
  total: number;
  /** All yarn of the piece, warp and weft: `624 m, 318 g`. */
  yarn: string | null;
  /** The loom the amounts are reckoned for; null when nothing can be reckoned. */
  loom: string | null;
  /** Whose loom it is: the reader's or the pattern's. */
  isOwn: boolean;
  /** Where she says what her loom is like; null without a seat. */
  pieceHref: string | null;
  /** Where a seat is bought; null with one. */
  seriesHref: string | null;
}

/** What is still to get, how much yarn that is in all, and for which loom it is reckoned. */
export function GatherSum({ left, total, yarn, loom, isOwn, pieceHref, seriesHref }: GatherSumProps) {
  const [canPrint, setCanPrint] = useState(false);
  useEffect(() => setCanPrint(true), []);
  return (
    <aside className="gather-sum above" aria-label="The list in short">
      <div className="row between">
        <p>
          <b>{pieceHref === null ? `${total} things` : left === 0 ? 'Everything is there' : `Still to get: ${left}`}</b>
          {yarn !== null && <><br /><span className="small quiet">All yarn: <span className="num">{yarn}</span></span></>}
        </p>
        {canPrint && <Button kind="act" glyph="print" onClick={() => window.print()}><span>Print<span className="only-desk"> on one page</span></span></Button>}
        {seriesHref !== null && !canPrint && <a className="btn" href={seriesHref}>See the series</a>}
      </div>
      <div className="long stack stack-tight small">
        {loom !== null && <p>Amounts are for {isOwn ? <b>your</b> : 'the pattern’s'} loom: {loom}. They hold a margin for knots, tails and take-up.</p>}
        {pieceHref !== null && <p><a href={pieceHref}>{isOwn ? 'Change my loom and yarn' : 'Tell it my loom and yarn'}</a></p>}
        {seriesHref !== null && <p>With a seat every amount is reckoned for your own loom, and your ticks are kept. <a href={seriesHref}>See the series</a></p>}
      </div>
    </aside>
  );
}
