import type { Role } from '#shared/access/matrix.ts';

export interface Letter {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

interface Addressee {
  readonly name: string;
  readonly email: string;
}

/** The words of every mail there is. Plain text; each link stands on a line of its own. */
export function confirmMail(publicUrl: string, to: Addressee, token: string): Letter {
  return {
    to: to.email,
    subject: 'Confirm your e-mail address for Ampwright',
    text: paragraphs(
      `Hello ${to.name},`,
      'Someone, we hope you, signed up for Ampwright with this address. To confirm that it is yours and open your shop, follow this link within 24 hours:',
      `${publicUrl}/confirm?token=${encodeURIComponent(token)}`,
      'If it was not you, do nothing: without this step the account can not be used.',
    ),
  };
}

export function alreadyKnownMail(publicUrl: string, to: Addressee): Letter {
  return {
    to: to.email,
    subject: 'You have an Ampwright account already',
    text: paragraphs(
      `Hello ${to.name},`,
      'Someone, perhaps you, tried to sign up for Ampwright with this address. There is an account with it already, so nothing was changed. Sign in here:',
      `${publicUrl}/sign-in`,
      'If you do not know the password any more, you can set a new one from there. If it was not you, do nothing.',
    ),
  };
}

export function resetMail(publicUrl: string, to: Addressee, token: string): Letter {
  return {
    to: to.email,
    subject: 'Set a new password for Ampwright',
    text: paragraphs(
      `Hello ${to.name},`,
      'To set a new password for Ampwright, follow this link within an hour. It works once, and ends every session that is open:',
      `${publicUrl}/reset?token=${encodeURIComponent(token)}`,
      'If you did not ask for this, do nothing: your password stays as it is.',
    ),
  };
}

export function invitationMail(
  publicUrl: string,
  invitation: {
    readonly email: string;
    readonly token: string;
    readonly role: Role;
    readonly vesselName: string;
    readonly shopName: string;
    readonly invitedBy: string;
  },
): Letter {
  const { email, token, role, vesselName, shopName, invitedBy } = invitation;
  return {
    to: email,
    subject: oneLine(`${invitedBy} invites you to ${vesselName} on Ampwright`),
    text: paragraphs(
      'Hello,',
      `${invitedBy} of ${shopName} invites you to the electrical drawings of ${vesselName} as ${role}: you will ${WHAT_A_ROLE_DOES[role]}. To join, follow this link within 14 days:`,
      `${publicUrl}/invitations/${token}`,
      'If you do not know what this is about, do nothing.',
    ),
  };
}

const WHAT_A_ROLE_DOES: Readonly<Record<Role, string>> = {
  designer: 'draw the system and issue it',
  installer: 'work from the drawings on board',
  reviewer: 'read the drawings and what the check finds',
  owner: 'see what has been issued for your boat',
};

function paragraphs(...parts: readonly string[]): string {
  return `${[...parts, 'Ampwright'].join('\n\n')}\n`;
}

/** A subject is one line, whatever a name holds. */
function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ').slice(0, 200);
}
