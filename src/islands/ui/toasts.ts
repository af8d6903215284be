// What is said at the foot of the screen, and for how long: a list with what can happen to it, apart from any screen.

export interface Toast {
  readonly id: number;
  readonly says: string;
  /** The word of the one act it offers. */
  readonly act?: string | undefined;
  /** How long it stays, in milliseconds. */
  readonly lastsMs: number;
}

export type ToastEvent = { readonly kind: 'say'; readonly toast: Toast } | { readonly kind: 'gone'; readonly id: number };

/** How long a toast stays when nothing else is said. */
export const usualMs = 8000;
const most = 3;

/** The newest last; more than three push the oldest out. */
export function toastsAfter(toasts: readonly Toast[], event: ToastEvent): readonly Toast[] {
  if (event.kind === 'gone') return toasts.filter(({ id }) => id !== event.id);
  return [...toasts.filter(({ id }) => id !== event.toast.id), event.toast].slice(-most);
}
