import { letter, type Letter } from './letter';
import { appAddress } from './mailServer';

const NOT_YOU = 'If this was not meant for you, leave it: nothing happens.';

interface Invitation {
  readonly plantName: string;
  readonly invitedBy: string;
  /** 'planner and quality lead' */
  readonly roles: string;
  readonly token: string;
}

/** Somebody is asked to join a plant. */
export function invitationLetter({ plantName, invitedBy, roles, token }: Invitation): Letter {
  return letter({
    subject: `${invitedBy} invites you to ${plantName} in Steadmain`,
    title: `Work at ${plantName} in Steadmain`,
    paragraphs: [
      `${invitedBy} invites you as ${roles}. Steadmain plans the week of plants that cook with steam.`,
      'The link below works once, within seven days.',
    ],
    action: { label: 'Accept the invitation', href: `${appAddress()}/invitation/${token}` },
    foot: NOT_YOU,
  });
}

/** A forgotten password. */
export function resetLetter(name: string, token: string): Letter {
  return letter({
    subject: 'Set a new password for Steadmain',
    title: 'Set a new password',
    paragraphs: [
      `Hello ${name}, somebody asked for a new password for your account.`,
      'The link below works once, within an hour. Until you use it your password stays as it is.',
    ],
    action: { label: 'Set a new password', href: `${appAddress()}/reset/${token}` },
    foot: 'If you did not ask for this, leave it: your password stays as it is.',
  });
}

/** Said to the owner whenever a password was changed. */
export function passwordChangedLetter(name: string): Letter {
  return letter({
    subject: 'Your password for Steadmain was changed',
    title: 'Your password was changed',
    paragraphs: [
      `Hello ${name}, the password of your account was changed just now, and you were signed out everywhere else.`,
      'Was it not you? Set a new one at once, and tell the administrator of your plant.',
    ],
    action: { label: 'Set a new password', href: `${appAddress()}/reset` },
    foot: 'You get this whenever the password of your account changes.',
  });
}

interface IssuePut {
  readonly number: number;
  readonly plantName: string;
  /** 2026-11-30 */
  readonly weekStart: string;
  readonly by: string;
  readonly comment: string;
}

/** A plan was put on the floor. */
export function issueLetter({ number, plantName, weekStart, by, comment }: IssuePut): Letter {
  return letter({
    subject: `Issue ${number} of the week of ${weekStart} is on the floor`,
    title: `Issue ${number} is on the floor`,
    paragraphs: [
      `${by} put issue ${number} of the week of ${weekStart} on the floor at ${plantName}.`,
      ...(comment.trim() ? [`“${comment.trim()}”`] : []),
      'Your shift sheet shows it now.',
    ],
    action: { label: 'Open the shift sheet', href: `${appAddress()}/shift/${weekStart}` },
    foot: 'You get this as a line supervisor. Switch it off under your name, Your account.',
  });
}
