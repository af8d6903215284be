/** What every use-case is handed first: who asks, when, through which services. */
import type { Services } from '#server/services.ts';

/** A signed-in person, with all that policies need to know. */
export interface Actor {
  readonly userId: number;
  readonly publicId: string;
  readonly name: string;
  readonly email: string;
  readonly addressConfirmed: boolean;
  /** Its mail server said that it takes no letters. */
  readonly addressRefused: boolean;
  readonly isSteward: boolean;
  /** The workroom this person teaches in, or null. */
  readonly workroomId: number | null;
  /** Name of the workroom this person works in: her own, else the only one she helps in; null where that tells nothing. */
  readonly workroomName: string | null;
  /** Workrooms this person helps in. */
  readonly helpsInWorkroomIds: readonly number[];
  readonly units: 'cm' | 'in';
  readonly timeZone: string;
  readonly scheme: 'system' | 'light' | 'dark';
  /** Notices in her page that she has not marked as read. */
  readonly unreadNotices: number;
  /** Hash of the session in use, so that "end all others" can spare it. */
  readonly sessionId: string;
  /** When the password was last typed in this session. */
  readonly provedAt: Date;
}

export interface Clock {
  now(): Date;
}

export interface Context {
  readonly actor: Actor | null;
  readonly requestId: string;
  readonly ip: string;
  readonly clock: Clock;
  readonly services: Services;
}

export const systemClock: Clock = { now: () => new Date() };
