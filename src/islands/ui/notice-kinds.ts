/** What a notice says by the colour of its edge, besides its words: news, mend first, weave on. */
export type NoticeKind = 'say' | 'mend' | 'on';

export const noticeKinds: Readonly<Record<NoticeKind, string>> = { say: 'notice', mend: 'notice notice-mend', on: 'notice notice-on' };
