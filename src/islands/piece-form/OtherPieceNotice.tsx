import { useMemo } from 'react';
import type { OtherPiece } from '#contracts/piece.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { typedOfTexts } from '#core/craft/piece-form/field-names.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { Button } from '#islands/ui/Button.tsx';
import { Notice } from '#islands/ui/Notice.tsx';

interface OtherPieceNoticeProps {
  readonly other: OtherPiece;
  readonly title: string;
  readonly onKeep: () => void;
  readonly onTake: (other: OtherPiece) => void;
}

const VIEW: ClothView = { id: 'other-piece', as: 'hanging', width: 180 };

/** Two windows described the same piece: both are here, and the weaver says which goes on. */
export function OtherPieceNotice({ other, title, onKeep, onTake }: OtherPieceNoticeProps) {
  const { by, at } = other;
  const cloth = useMemo(() => {
    const judged = judgeTyped(typedOfTexts(other.texts));
    return judged.ok ? clothPieceOf(judged.piece, judged.plan, title) : null;
  }, [other, title]);
  return (
    <Notice kind="mend" title={by === null ? `You changed this piece in another window at ${at}` : `${by} changed this piece at ${at}`} urgent>
      <p>{by === null ? 'Keep this one, or take the other.' : 'Keep yours, or take theirs.'} Nothing is lost: the one you leave is set aside.</p>
      {cloth === null ? <p className="small quiet">The other one cannot be woven yet.</p> : <details className="mt-2"><summary>Look at the other one</summary><Cloth piece={cloth} view={VIEW} className="other-piece" /></details>}
      <p className="row mt-3"><Button onClick={onKeep}>{by === null ? 'Keep this one' : 'Keep mine'}</Button><Button onClick={() => { onTake(other); }}>{by === null ? 'Take the other' : 'Take theirs'}</Button></p>
    </Notice>
  );
}
