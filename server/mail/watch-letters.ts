import type { Letter, LetterSection } from './letter.js';

export interface ToldHappening {
  readonly title: string;
  readonly text: string;
  /** Address within the site. */
  readonly path: string;
}

/** Why somebody is told: what they watch or have; `about` is null where it concerns them or is no longer there. */
export interface ToldBecause {
  readonly because: 'watch' | 'bench' | 'person';
  readonly about: { readonly key: string; readonly name: string } | null;
}

export interface DigestSection {
  readonly heading: string;
  readonly lines: readonly { readonly text: string; readonly path: string }[];
}

const longestText = 600;
const turnOffLabel = 'End this watch, have such mail less often, or not at all';

/** The letters on what somebody watches. Addresses are made from the public address. */
export function createWatchLetters(publicAddress: string) {
  const page = (path: string, query: Record<string, string> = {}): string => {
    const url = new URL(path, publicAddress);
    for (const [name, value] of Object.entries(query)) url.searchParams.set(name, value);
    return url.href;
  };

  return {
    notice(to: { displayName: string; token: string }, happening: ToldHappening, why: ToldBecause): Letter {
      return {
        subject: happening.title,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [happening.title, ...shortened(happening.text)],
        action: { label: 'See it', url: page(happening.path) },
        why: whyOf(why),
        turnOffUrl: page('/mail/unsubscribe', { token: to.token, ...sourceOf(why) }),
        turnOffLabel,
      };
    },

    safety(to: { displayName: string }, happening: ToldHappening): Letter {
      return {
        subject: happening.title,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          'the desk has placed or changed a caution on a fix that you reported a trial of:',
          happening.title,
          ...shortened(happening.text),
          'Read it before you go on using or repeating the fix. No page can say that a job is safe: follow the maker’s instructions and local rules.',
        ],
        action: { label: 'Read the caution where it stands', url: page(happening.path) },
        why: `You get this at once, whatever rhythm you chose, because you tried the fix. Only the choice “Safety notices” in your account stops it: ${page('/account/profile')}`,
      };
    },

    digest(
      to: { displayName: string; token: string },
      digest: { rhythm: 'daily' | 'weekly'; count: number; left: number; sections: readonly DigestSection[] },
    ): Letter {
      const { rhythm, count, left, sections } = digest;
      const span = rhythm === 'daily' ? 'Today' : 'This week';
      return {
        subject: `${span} on what you watch: ${count === 1 ? 'one thing' : `${count} things`} happened`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [`this is what happened ${rhythm === 'daily' ? 'since yesterday' : 'in the last week'}:`],
        sections: sections.map(({ heading, lines }): LetterSection => ({
          heading,
          lines: lines.map(({ text, path }) => ({ text, url: page(path) })),
        })),
        action: {
          label: left > 0 ? `See these and ${left} more` : 'See them together',
          url: page('/notices'),
        },
        why: 'You get this because you watch these, have them on your bench, or they answer something of yours.',
        turnOffUrl: page('/mail/unsubscribe', { token: to.token }),
        turnOffLabel: 'Have such mail less often, or not at all',
      };
    },
  };
}

function shortened(text: string): string[] {
  const whole = text.trim();
  if (whole === '') return [];
  return [whole.length <= longestText ? whole : `${whole.slice(0, longestText - 1).trimEnd()}…`];
}

function whyOf({ because, about }: ToldBecause): string {
  if (because === 'watch') return `You get this because you watch ${about?.name ?? 'it'}.`;
  if (because === 'bench')
    return `You get this because ${about?.name ?? 'the part'} is on your bench and you asked to be told.`;
  return 'You get this because it answers or concerns something of yours.';
}

function sourceOf({ because, about }: ToldBecause): Record<string, string> {
  if (because === 'bench') return { watch: 'bench' };
  return because === 'watch' && about ? { watch: about.key } : {};
}
