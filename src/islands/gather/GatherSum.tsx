import { useEffect, useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';

export interface GatherSumProps {
  left: number;
  total: number;
  /** What is bought by length or weight, as the craft heads it: `Yarn`, `Cord`. */
  material: string;
  /** All of it: `624 m, 318 g`. */
  amount: string | null;
  /** What the amounts are reckoned for: a loom where the craft has one, else the piece; null when nothing can be reckoned. */
  made: string | null;
  /** For what of the piece they are, once some of it is woven; empty before. */
  rest: string;
  hasLoom: boolean;
  /** Whose it is: the reader's or the pattern's. */
  isOwn: boolean;
  /** Where she says what her loom is like; null without a seat. */
  pieceHref: string | null;
  /** Where a seat is bought; null with one. */
  seriesHref: string | null;
}

/** What is still to get, how much yarn that is in all, and for which loom it is reckoned. */
export function GatherSum({ left, total, material, amount, made, rest, hasLoom, isOwn, pieceHref, seriesHref }: GatherSumProps) {
  const [canPrint, setCanPrint] = useState(false);
  useEffect(() => setCanPrint(true), []);
  return (
    <aside className="gather-sum above" aria-label="The list in short">
      <div className="row between">
        <p>
          <b>{pieceHref === null ? `${total} things` : left === 0 ? 'Everything is there' : `Still to get: ${left}`}</b>
          {amount !== null && <><br /><span className="small quiet">{material} in all: <span className="num">{amount}</span></span></>}
        </p>
        {canPrint && <Button kind="act" glyph="print" onClick={() => window.print()}><span>Print<span className="only-desk"> on one page</span></span></Button>}
        {seriesHref !== null && !canPrint && <a className="btn" href={seriesHref}>See the series</a>}
      </div>
      <div className="long stack stack-tight small">
        {made !== null && <p>Amounts are for {isOwn ? <><b>your</b> {hasLoom ? 'loom' : 'piece'}</> : hasLoom ? 'the pattern’s loom' : 'the pattern'}: {made}. They hold a margin{hasLoom && ' for knots, tails and take-up'}.</p>}
        {rest !== '' && <p>{rest}</p>}
        {pieceHref !== null && <p><a href={pieceHref}>{isOwn ? 'Change' : 'Tell it'} my {hasLoom ? 'loom and yarn' : 'piece'}</a></p>}
        {seriesHref !== null && <p>With a seat every amount is reckoned for your own {hasLoom ? 'loom' : 'piece'}, and your ticks are kept. <a href={seriesHref}>See the series</a></p>}
      </div>
    </aside>
  );
}
