/** A lay in words, as short as it can be said: what the hand does, without what it repeats. */
import { endsIn, type Lay } from '#core/craft/interlacement/lay.ts';

/** The movements of one repeat: `over 1, under 1`; `over 4, back under 2`; `under 2, back over 2, under 2`. */
export function repeatWords(lay: Lay): string {
  const begin = lay[0]?.way;
  const moves = lay.map((pass) => `${pass.way === begin ? '' : 'back '}${pass.face === 'front' ? 'over' : 'under'} ${String(endsIn(pass))}`);
  return shortest(moves).join(', ');
}

/** The fewest movements that, said again and again, come to the whole. What is left at the far side may be cut short. */
function shortest(moves: readonly string[]): readonly string[] {
  for (let length = 1; length <= moves.length / 2; length++) {
    const whole = moves.slice(0, moves.length - length);
    if (whole.length >= length && whole.every((move, index) => move === moves[index % length])) return moves.slice(0, length);
  }
  return moves;
}
