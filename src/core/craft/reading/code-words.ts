/**
 * What each code of a problem means to a weaver and what she can do, in one place. The message of a problem tells the
 * single case with its numbers; these words stand beside it where there is room to explain.
 */
import type { ErrorCode, WarningCode } from '#core/craft/reading/findings.ts';

export interface CodeWords {
  readonly title: string;
  readonly means: string;
  readonly toDo: string;
}

export const CODE_WORDS = {
  E_NUM: { title: 'A number is missing', means: 'Where a number is needed there is none, or something that cannot be read as one.', toDo: 'Type a plain number, such as 12.5.' },
  E_RANGE: { title: 'A measure that does not work', means: 'The number is so small or so large that nothing could be woven with it.', toDo: 'Check the number and its unit. The sentence beside it says between what it works.' },
  E_ENUM: { title: 'Not one of the choices', means: 'Something is named that the piece does not have, or that is not one of the choices there are.', toDo: 'Choose one of those that are named.' },
  E_JAM: { title: 'The yarn is too thick', means: 'Warp and weft together are thicker than the room between two ends, so that the rows cannot close.', toDo: 'Take thinner yarn or fewer strands together, or set the ends further apart.' },
  E_FIT: { title: 'It does not fit', means: 'Something is larger than what it must go into: the piece for the loom, a shape for its band, the bands for the piece.', toDo: 'Make the one smaller or the other larger. The sentence beside it says by how much.' },
  E_PARITY: { title: 'The number of ends does not suit', means: 'The pattern needs an even or an odd number of ends, or ends in pairs, and the number was fixed otherwise.', toDo: 'Take the number that is named, or let it be reckoned from the width.' },
  E_COUNT: { title: 'Only whole numbers work', means: 'Ends, rows, knots and strands are counted, and there is no half of them.', toDo: 'Type a whole number.' },
  W_AMBIGUOUS: { title: 'A count that reads two ways', means: 'Some sellers write the plies first and some write them last.', toDo: 'Compare with the metres and grams on the label, or type those instead.' },
  W_SILK: { title: 'Spun silk is counted by two rules', means: 'One rule counts the single yarn and the other counts it as it is plied.', toDo: 'Compare with the metres and grams on the label, or type those instead.' },
  W_LOFT: { title: 'The wraps and the label disagree', means: 'Yarn of this weight is hardly ever so thick or so thin when it is wrapped.', toDo: 'Wind it round a ruler again, snugly but not stretched, over 5 cm.' },
  W_LABEL: { title: 'The label disagrees with itself', means: 'Metres and grams of the ball come to another yarn than the one that was typed.', toDo: 'Read the label again, and correct whichever is wrong.' },
  W_CLASS: { title: 'The yarn is a guess', means: 'A yarn class covers yarns of very different thickness, so every amount is rough.', toDo: 'Read metres and grams off the label, or wrap the yarn round a ruler.' },
  W_PARITY: { title: 'The ends were made to suit', means: 'The pattern needs an even or an odd number of ends, so one or a few were added.', toDo: 'Nothing. The cloth comes out a little wider.' },
  W_WIDTH: { title: 'Another width than was asked', means: 'The number of ends was fixed, and it does not come out at the width of the piece.', toDo: 'Change the width, or let the ends be reckoned from it.' },
  W_CLAMPED: { title: 'Warp and weft bend unlike', means: 'In cloth so close there is no room for both to bend alike; the nearest that is possible is reckoned.', toDo: 'Beat less, or set the ends further apart, if the cloth shall be balanced.' },
  W_TAKE_UP: { title: 'A take-up nobody measured', means: 'How much longer the weft is than its cloth was to be measured, but no number is given, so what is usual is reckoned with.', toDo: 'Draw a pick out of a swatch, measure it straight, and give what it is longer than the swatch is wide.' },
  W_WARP_SHOWS: { title: 'The warp will show', means: 'The yarn is as thick as the room between two ends, so that it will not beat down over them.', toDo: 'Take thinner yarn or set the ends further apart, unless you like the warp to show.' },
  W_THICK: { title: 'Thick yarn for ends so close', means: 'The rows close, but it is hard work to beat them down.', toDo: 'Take thinner yarn, or set the ends further apart.' },
  W_LOOSE: { title: 'Thin yarn for ends so far apart', means: 'The rows have little to hold on to and may slip.', toDo: 'Take more strands together, or set the ends closer.' },
  W_THIN: { title: 'A band that will not show', means: 'It is lower than a single row.', toDo: 'Make it higher, or leave it out.' },
  W_PLAIN_END: { title: 'An end without a knot', means: 'The number of ends does not divide into knots, so one or a few stay plain.', toDo: 'Share the plain ends between both selvedges, or ask for an even number of ends.' },
  W_SHORT_STITCH: { title: 'A short last stitch', means: 'The number of ends does not divide into stitches, so the last one of a row is shorter.', toDo: 'Nothing, or change the width by a few ends.' },
  W_SLIT: { title: 'A long slit', means: 'Two colours meet without crossing for so long that the cloth gapes there.', toDo: 'Sew it when the piece is off the loom, or let the colours share an end.' },
  W_TIGHT: { title: 'The yarn suffices only just', means: 'So little would be left over that a tight hand or a short ball uses it up.', toDo: 'Have one ball more of the same dye lot.' },
  W_SHORT: { title: 'The yarn does not suffice', means: 'What is left is less than the rest of the piece takes.', toDo: 'Get more of the same dye lot if you can, or weave a band to come with another yarn.' },
  W_ROOM: { title: 'The cloth grows too high', means: 'Woven on like this it reaches into the warp that must stay open at the top.', toDo: 'Beat the rest closer, or leave out rows of the last bands.' },
  W_FRINGE: { title: 'The ends below need more room', means: 'Knots, twists or a fringe take more warp below the cloth than was asked for.', toDo: 'Nothing: what they need is left. Ask for more if you want it longer.' },
  W_UNUSED: { title: 'A yarn nothing is woven with', means: 'The piece has a yarn that none of its bands names.', toDo: 'Take it out, or weave a band with it.' },
  W_DOWEL: { title: 'The dowel does not suit', means: 'It is too thin for the weight of the piece or too short for its width.', toDo: 'Take the thickness or the length that is named.' },
  W_RULE: { title: 'Knots and the old rule disagree', means: 'Knot by knot the cords come to another length than four times what they hang.', toDo: 'Knot ten of your own knots, measure what they took, and say so.' },
  W_TANNIN: { title: 'No tannin for cotton or linen', means: 'Aluminium acetate holds better on these fibres after a bath of tannin.', toDo: 'Add a bath of tannin, or expect a paler colour.' },
  W_FIBRE: { title: 'Not meant for this fibre', means: 'Tannin and aluminium acetate are for cotton and linen; wool and silk take alum.', toDo: 'Choose the fibre you dye, or take alum.' },
  W_HIGH: { title: 'More than the fibre holds', means: 'What the fibre cannot hold stays in the bath, or makes the wool sticky.', toDo: 'Take less. Do away with what is left as your local rules say.' },
  W_FIBRE_DAMAGE: { title: 'So much iron harms the fibre', means: 'Iron darkens colours, and too much of it makes fibre harsh and brittle.', toDo: 'Take the share of iron that is named, and rinse well.' },
} as const satisfies Readonly<Record<ErrorCode, CodeWords>> & Readonly<Record<WarningCode, CodeWords>>;

export type Code = keyof typeof CODE_WORDS;
