// What the frame of a page needs to know of the person who asks for it.

export type Role = 'student' | 'teacher' | 'helper' | 'steward';

export interface SitePerson {
  name: string;
  /** Of whom things are kept on this device; absent where nothing is. */
  publicId?: string;
  roles: readonly Role[];
  /** Her own choice of day or evening; absent or null: the system's wish. */
  scheme?: 'light' | 'dark' | null;
  units?: 'cm' | 'in';
  /** False until she has opened the link in our first letter. */
  addressConfirmed?: boolean;
  /** True while her mail server takes no letters. */
  addressRefused?: boolean;
  /** Notices she has not marked as read. */
  unread?: number;
  /** Name of the workroom she works in, shown beside the mark inside the workroom. */
  workroom?: string | null;
}
