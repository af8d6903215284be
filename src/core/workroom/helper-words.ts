/** What a helper may do in a teacher's workroom, as it is told to both. */
export const HELPERS_MAY = [
  'look at the photos that wait, with the student’s plan beside them, and say weave on or mend first',
  'answer questions, those to the teacher alone as well',
  'read every part of the series, drafts too',
] as const;

export const HELPERS_MAY_NOT = 'Who helps sees no money, publishes and changes nothing, and writes to students only in answer to a photo or a question. Each answer carries her own name.';
