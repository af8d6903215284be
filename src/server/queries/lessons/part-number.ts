/** SQL for the number of a part, 1 for the first, where its row of `lessons` is called `l`: how many parts stand up to it. */
export const PART_NUMBER = '(SELECT COUNT(*) FROM lessons b WHERE b.series_id = l.series_id AND b.taken_out_at IS NULL AND (b.position, b.id) <= (l.position, l.id))';
