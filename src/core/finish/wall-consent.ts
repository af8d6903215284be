/** What somebody agrees to who hangs her piece on the shared wall. A change of the words is a change of the name. */
export const WALL_CONSENT = {
  version: 'wall-1',
  shown: 'Your photo, the drawing of your piece, the name and the words you write here, and which series it was made in. Everybody sees them, with or without an account, on the wall and on the page of the series.',
  notShown: 'Your hours, your note and your looms stay with you.',
  tick: 'I agree that my piece is shown so. I can take it down at any time, and it is gone at once.',
} as const;
