// A video on its way from this device, apart from any screen: what can be said of it and what can happen to it.

export type VideoUploadState =
  | { readonly at: 'choosing'; readonly fault?: string | undefined }
  | { readonly at: 'sending'; readonly file: File; readonly sent: number }
  | { readonly at: 'paused'; readonly file: File; readonly sent: number }
  /** The line dropped; it goes on by itself. */
  | { readonly at: 'waiting'; readonly file: File; readonly sent: number; readonly tries: number }
  /** All of it is there. `video` is its public id. */
  | { readonly at: 'sent'; readonly file: File; readonly video: string };

export type VideoUploadEvent =
  | { readonly kind: 'begin'; readonly file: File; readonly sent: number }
  | { readonly kind: 'unfit' | 'refused'; readonly says: string }
  | { readonly kind: 'progress'; readonly sent: number }
  | { readonly kind: 'dropped' | 'pause' | 'go-on' | 'stop' }
  | { readonly kind: 'done'; readonly video: string };

export function videoUploadAfter(state: VideoUploadState, event: VideoUploadEvent): VideoUploadState {
  const onItsWay = 'sent' in state ? state : undefined;
  switch (event.kind) {
    case 'begin':
      return { at: 'sending', file: event.file, sent: event.sent };
    case 'unfit':
    case 'refused':
      return { at: 'choosing', fault: event.says };
    case 'stop':
      return { at: 'choosing' };
    case 'progress':
      // A last word of progress may come after she paused.
      return onItsWay === undefined || onItsWay.at === 'paused' ? state : { at: 'sending', file: onItsWay.file, sent: event.sent };
    case 'dropped':
      return onItsWay === undefined || onItsWay.at === 'paused' ? state : { at: 'waiting', file: onItsWay.file, sent: onItsWay.sent, tries: onItsWay.at === 'waiting' ? onItsWay.tries + 1 : 1 };
    case 'pause':
      return onItsWay === undefined ? state : { at: 'paused', file: onItsWay.file, sent: onItsWay.sent };
    case 'go-on':
      return onItsWay === undefined ? state : { at: 'sending', file: onItsWay.file, sent: onItsWay.sent };
    case 'done':
      return onItsWay === undefined ? state : { at: 'sent', file: onItsWay.file, video: event.video };
  }
}
