/** Inviting people to help in a workroom, and ending it. */
import { z } from 'astro/zod';
import { mailAddress } from '#contracts/people.ts';

/** Hidden fields: what is not one of ours finds nothing. */
const publicId = z.string().max(26).catch('');

export const InviteHelperForm = z.object({ email: mailAddress });
export type InviteHelperInput = z.output<typeof InviteHelperForm>;

export const InvitationForm = z.object({ invitation: publicId });

export const AcceptInvitationForm = z.object({ token: z.string().max(100).catch('') });

/** Who no longer helps, and in which workroom. */
export const EndHelpForm = z.object({ workroom: publicId, person: publicId });
export type EndHelpInput = z.output<typeof EndHelpForm>;
