// Photos being shown together, apart from any screen: what can be said of them and what can happen to them.
import { PHOTO_LIMITS, TOO_MANY_SHOTS } from '#core/photo/limits.ts';
import { photoFault } from './photo-rules.ts';

export interface Shot {
  /** Its own among the shots of this showing. */
  readonly key: number;
  /** As it is sent: as it was chosen, or cut out of that. */
  readonly file: File;
  /** Bytes the server has. */
  readonly sent: number;
  /** Public id, once the server has given one. */
  readonly shot: string | null;
  readonly isThere: boolean;
}

export interface Showing {
  /** `waiting`: the line dropped, it goes on by itself. `kept`: it waits on this device, the page may be closed. */
  readonly at: 'choosing' | 'sending' | 'waiting' | 'kept' | 'shown';
  readonly shots: readonly Shot[];
  /** Tries since the line dropped. */
  readonly tries: number;
  readonly fault: string | undefined;
}

export type ShowingEvent =
  | { readonly kind: 'add'; readonly files: readonly File[] }
  /** Cut or turned: another file in its place, of which nothing has been sent. */
  | { readonly kind: 'replace'; readonly key: number; readonly file: File }
  | { readonly kind: 'put-away'; readonly key: number }
  | { readonly kind: 'send' | 'dropped' | 'stop' | 'kept' | 'shown' }
  | { readonly kind: 'begun'; readonly key: number; readonly shot: string }
  | { readonly kind: 'progress'; readonly key: number; readonly sent: number }
  | { readonly kind: 'there'; readonly key: number; readonly shot: string }
  /** `key` is the shot that cannot be taken; null when it is the whole showing. */
  | { readonly kind: 'refused'; readonly says: string; readonly key: number | null };

export const emptyShowing = (fault?: string): Showing => ({ at: 'choosing', shots: [], tries: 0, fault });

/** The photo a name and a reason belong to, said in one sentence; with one photo its name is not needed. */
const faultOf = (name: string, says: string, alone: boolean): string => (alone ? says : `${name}: ${says}`);

function withMore(state: Showing, files: readonly File[]): Showing {
  const faults = files.map(photoFault);
  const fit = files.filter((_file, index) => faults[index] === null);
  const room = PHOTO_LIMITS.maxShots - state.shots.length;
  const next = Math.max(0, ...state.shots.map(({ key }) => key)) + 1;
  const shots = fit.slice(0, room).map((file, index) => ({ key: next + index, file, sent: 0, shot: null, isThere: false }));
  const bad = faults.findIndex((fault) => fault !== null);
  const fault = bad >= 0 ? faultOf(files[bad]?.name ?? '', faults[bad] ?? '', files.length === 1) : fit.length > room ? TOO_MANY_SHOTS : undefined;
  return { ...state, shots: [...state.shots, ...shots], fault };
}

export function showingAfter(state: Showing, event: ShowingEvent): Showing {
  const isMoving = state.at === 'sending' || state.at === 'waiting';
  const changed = (key: number, change: Partial<Shot>): readonly Shot[] => state.shots.map((shot) => (shot.key === key ? { ...shot, ...change } : shot));
  switch (event.kind) {
    case 'add':
      return isMoving ? state : withMore(state, event.files);
    case 'replace':
      return { ...state, fault: undefined, shots: changed(event.key, { file: event.file, sent: 0, shot: null, isThere: false }) };
    case 'put-away':
      return { ...state, fault: undefined, shots: state.shots.filter(({ key }) => key !== event.key) };
    case 'send':
      return state.shots.length === 0 ? state : { ...state, at: 'sending', tries: 0, fault: undefined };
    case 'begun':
      return { ...state, shots: changed(event.key, { shot: event.shot }) };
    case 'progress':
      return isMoving ? { ...state, at: 'sending', tries: 0, shots: changed(event.key, { sent: event.sent }) } : state;
    case 'there':
      return { ...state, shots: changed(event.key, { shot: event.shot, isThere: true }), ...(isMoving && { at: 'sending' as const, tries: 0 }) };
    case 'dropped':
      return isMoving ? { ...state, at: 'waiting', tries: state.tries + 1 } : state;
    case 'stop':
      return isMoving ? { ...state, at: 'choosing', tries: 0 } : state;
    case 'refused': {
      const bad = state.shots.find(({ key }) => key === event.key);
      return { at: 'choosing', tries: 0, shots: state.shots.filter((shot) => shot !== bad), fault: faultOf(bad?.file.name ?? '', event.says, bad === undefined || state.shots.length === 1) };
    }
    case 'kept':
      return { ...state, at: 'kept', shots: [], tries: 0 };
    case 'shown':
      return { ...state, at: 'shown', tries: 0 };
  }
}

/** Bytes of all shots: what has come, and what there is. */
export function bytesOf({ shots }: Showing): { readonly sent: number; readonly total: number } {
  return {
    sent: shots.reduce((sum, { sent, file, isThere }) => sum + (isThere ? file.size : Math.min(sent, file.size)), 0),
    total: shots.reduce((sum, { file }) => sum + file.size, 0),
  };
}
