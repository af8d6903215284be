/** Said on the document when a draft that can be read was kept, so that its preview is drawn anew. */
export const DRAFT_KEPT = 'fellmark:draft-kept';

export interface DraftKeptDetail {
  /** Id of the drawn heading or step in which the caret stands; null above the first. */
  readonly anchor: string | null;
}
