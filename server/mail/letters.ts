import type { Letter } from './letter.js';

/** The letters Shimlore writes. Addresses are made from the public address, never from a request. */
export function createLetters(publicAddress: string) {
  const page = (path: string, query: Record<string, string> = {}): string => {
    const url = new URL(path, publicAddress);
    for (const [name, value] of Object.entries(query)) url.searchParams.set(name, value);
    return url.href;
  };

  return {
    /** Address of a page as it stands to the outside. */
    page,

    emailConfirmation(to: { displayName: string; token: string }): Letter {
      return {
        subject: 'Confirm your e-mail address',
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          'somebody asked for a Shimlore account under this address. If it was you, follow the link within 24 hours; your account is ready after that.',
        ],
        action: { label: 'Confirm this address', url: page('/account/confirm', { token: to.token }) },
        closing: 'If it was not you, leave the link alone and nothing happens.',
      };
    },

    addressCheck(to: { displayName: string; token: string }): Letter {
      return {
        subject: 'Does mail reach you here again?',
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          'mail from Shimlore to this address came back, so no more was sent. You asked to try it again: follow the link within 24 hours, and what you watch is mailed to you as before.',
        ],
        action: { label: 'Mail reaches me here', url: page('/account/confirm', { token: to.token }) },
        closing: 'If it was not you, leave the link alone and nothing happens.',
      };
    },

    passwordReset(to: { displayName: string; token: string }): Letter {
      return {
        subject: 'Set a new password',
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          'somebody asked for a new password for your Shimlore account. The link works once, within one hour. When the new password is set, you are signed out everywhere.',
        ],
        action: { label: 'Set a new password', url: page('/account/reset', { token: to.token }) },
        closing: 'If it was not you, leave the link alone; your password stays as it is.',
      };
    },

    alreadyHasAccount(to: { displayName: string }): Letter {
      return {
        subject: 'You already have an account',
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          'somebody tried to sign up under this address, which already has a Shimlore account. If it was you, sign in; if the password is lost, have a link mailed to set a new one.',
        ],
        action: { label: 'Sign in', url: page('/account/sign-in') },
        closing: 'If it was not you, there is nothing to do. Nobody was told that the account exists.',
      };
    },

    editionPublished(to: {
      displayName: string;
      title: string;
      slug: string;
      number: number;
      turnOffUrl: string;
    }): Letter {
      return {
        subject: `Published: ${to.title}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          to.number === 1
            ? `the desk has published your write-up “${to.title}”. Owners of these parts can find it now.`
            : `the desk has published edition ${to.number} of “${to.title}”. It takes the place of the edition before, which stays in the history.`,
        ],
        action: { label: 'Read it as others see it', url: page(`/write-ups/${to.slug}`) },
        turnOffUrl: to.turnOffUrl,
      };
    },

    editionReturned(to: {
      displayName: string;
      title: string;
      number: number;
      editionId: number;
      reason: string;
      turnOffUrl: string;
    }): Letter {
      return {
        subject: `Returned with a reason: ${to.title || 'your write-up'}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `the desk has read edition ${to.number} of “${to.title}” and gives it back to you. Nothing you wrote is lost. The reason:`,
          to.reason,
          'When you have mended it, hand it to the desk again.',
        ],
        action: { label: 'Open the edition', url: page(`/drafts/${to.editionId}`) },
        turnOffUrl: to.turnOffUrl,
      };
    },

    proposalDecided(to: {
      displayName: string;
      /** What was proposed, in words: "revision Rev E of M1". */
      what: string;
      /** Page of the part it is on now; null where it was declined. */
      slug: string | null;
      reason: string | null;
      turnOffUrl: string;
    }): Letter {
      if (to.slug !== null) {
        return {
          subject: `Taken into the catalogue: ${to.what}`,
          greeting: `Hello ${to.displayName},`,
          paragraphs: [`the desk has taken your proposal into the catalogue: ${to.what}.`],
          action: { label: 'See it there', url: page(`/parts/${to.slug}`) },
          turnOffUrl: to.turnOffUrl,
        };
      }
      return {
        subject: `Not taken into the catalogue: ${to.what}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `the desk has read your proposal, ${to.what}, and does not take it. The reason:`,
          to.reason ?? '',
        ],
        action: { label: 'See what you proposed', url: page('/my/proposals') },
        turnOffUrl: to.turnOffUrl,
      };
    },

    /** Page that asks before it turns notices off. */
    turnOffPage: (token: string): string => page('/mail/unsubscribe', { token }),
    /** Address of the one-click unsubscribe (RFC 8058). */
    turnOffAddress: (token: string): string => page('/api/mail/unsubscribe', { token }),
  };
}

export type Letters = ReturnType<typeof createLetters>;
