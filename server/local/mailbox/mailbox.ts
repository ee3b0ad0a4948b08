/** A mail as it was received; `headers` by lower-case name, as they stood. */
export interface Mail {
  readonly id: number;
  readonly from: string;
  /** Where it is given back to when it cannot be delivered. */
  readonly envelopeFrom: string;
  readonly to: readonly string[];
  readonly subject: string;
  readonly text: string;
  readonly html: string | null;
  readonly headers: Readonly<Record<string, string>>;
  /** Files that came with it, as base64. */
  readonly attachments?: readonly { name: string; mediaType: string; base64: string }[];
  readonly receivedAt: string;
  /** How often it came: mails of one Message-ID to the same people are one mail (RFC 5322, 3.6.4). */
  readonly copies: number;
}

export interface Mailbox {
  add(mail: Omit<Mail, 'id' | 'copies'>): void;
  /** Newest first; only those to `address` where one is given, upper and lower case alike. */
  list(address?: string): Mail[];
  find(id: number): Mail | undefined;
  empty(): void;
  /** From now on (or no longer) mail to this address is refused for good, as a server does that does not know it. */
  setRefused(address: string, refused: boolean): void;
  refuses(address: string): boolean;
}

/** Keeps the last `capacity` mails in memory. */
export function createMailbox(capacity = 500): Mailbox {
  let mails: Mail[] = [];
  let lastId = 0;
  const refused = new Set<string>();
  return {
    add(mail) {
      const known = mails.find((kept) => isSame(kept, mail));
      if (known) {
        mails = mails.map((kept) => (kept === known ? { ...kept, copies: kept.copies + 1 } : kept));
        return;
      }
      lastId += 1;
      mails = [{ id: lastId, ...mail, copies: 1 }, ...mails].slice(0, capacity);
    },
    list(address) {
      const wanted = address?.trim().toLowerCase();
      return wanted === undefined ? [...mails] : mails.filter((mail) => mail.to.includes(wanted));
    },
    find: (id) => mails.find((mail) => mail.id === id),
    empty() {
      mails = [];
    },
    setRefused(address, is) {
      if (is) refused.add(address.trim().toLowerCase());
      else refused.delete(address.trim().toLowerCase());
    },
    refuses: (address) => refused.has(address.trim().toLowerCase()),
  };
}

function isSame(kept: Mail, mail: Omit<Mail, 'id' | 'copies'>): boolean {
  const id = mail.headers['message-id'];
  return id !== undefined && kept.headers['message-id'] === id && kept.to.join() === mail.to.join();
}
