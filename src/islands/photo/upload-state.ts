// A photo on its way, apart from any screen: what can be said of it and what can happen to it.

export type UploadState =
  | { readonly at: 'choosing'; readonly fault?: string | undefined }
  | { readonly at: 'chosen'; readonly file: File }
  | { readonly at: 'sending'; readonly file: File; readonly sent: number }
  /** The line dropped; it is sent again by itself. */
  | { readonly at: 'waiting'; readonly file: File; readonly sent: number; readonly tries: number }
  | { readonly at: 'sent'; readonly file: File };

export type UploadEvent =
  | { readonly kind: 'choose'; readonly file: File }
  | { readonly kind: 'unfit' | 'refused'; readonly says: string }
  | { readonly kind: 'send' | 'dropped' | 'done' | 'stop' | 'put-away' }
  | { readonly kind: 'progress'; readonly sent: number };

/** Between tries while there is no signal: 4 s, 8 s, 16 s, then every 30 s. */
export const waitMs = (tries: number): number => Math.min(30_000, 2_000 * 2 ** tries);

export function uploadAfter(state: UploadState, event: UploadEvent): UploadState {
  switch (event.kind) {
    case 'choose':
      return { at: 'chosen', file: event.file };
    case 'unfit':
    case 'refused':
      return { at: 'choosing', fault: event.says };
    case 'put-away':
      return { at: 'choosing' };
    case 'send':
      return 'file' in state ? { at: 'sending', file: state.file, sent: 0 } : state;
    case 'progress':
      return state.at === 'sending' || state.at === 'waiting' ? { at: 'sending', file: state.file, sent: event.sent } : state;
    case 'dropped':
      return state.at === 'sending' || state.at === 'waiting' ? { at: 'waiting', file: state.file, sent: state.sent, tries: state.at === 'waiting' ? state.tries + 1 : 1 } : state;
    case 'stop':
      return 'file' in state ? { at: 'chosen', file: state.file } : state;
    case 'done':
      return 'file' in state ? { at: 'sent', file: state.file } : state;
  }
}
