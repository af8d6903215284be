/** Forms of helping in a workroom. */
import { AcceptInvitationForm, EndHelpForm, InvitationForm, InviteHelperForm } from '#contracts/helpers.ts';
import { acceptInvitation } from '#server/use-cases/helpers/accept-invitation.ts';
import { endHelp } from '#server/use-cases/helpers/end-help.ts';
import { inviteHelper } from '#server/use-cases/helpers/invite-helper.ts';
import { takeBackInvitation } from '#server/use-cases/helpers/take-back-invitation.ts';
import { formAction } from './form-action.ts';
import { agentOf, giveSession } from './session-cookie.ts';

export const helpers = {
  invite: formAction(InviteHelperForm, async (input, ctx) => {
    const address = await inviteHelper(ctx, input);
    return { to: '/workroom/helpers#invited', said: `An invitation is on its way to ${address}. It works for seven days, once.` };
  }),
  takeBackInvitation: formAction(InvitationForm, async (input, ctx) => {
    const address = await takeBackInvitation(ctx, input);
    return { to: '/workroom/helpers#invited', said: `The invitation to ${address} is taken back. Its link works no more.` };
  }),
  accept: formAction(AcceptInvitationForm, async (input, ctx, api) => {
    const { workroomName, session } = await acceptInvitation(ctx, input, agentOf(api));
    giveSession(api, session, true);
    return { to: '/workroom', said: `You help in ${workroomName} from now on.` };
  }),
  end: formAction(EndHelpForm, async (input, ctx) => {
    const name = await endHelp(ctx, input);
    const herself = input.person === ctx.actor?.publicId;
    return herself ? { to: '/loom', said: 'You help there no longer. What you answered stays.' } : { to: '/workroom/helpers#helpers', said: `${name} helps no longer. What she answered stays.` };
  }),
};
