/** A mail as it was received; `headers` by lower-case name, as they stood. */
export interface Mail {
  readonly id: number;
  readonly from: string;
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
}

/** Keeps the last `capacity` mails in memory. */
export function createMailbox(capacity = 500): Mailbox {
  let mails: Mail[] = [];
  let lastId = 0;
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
  };
}

function isSame(kept: Mail, mail: Omit<Mail, 'id' | 'copies'>): boolean {
  const id = mail.headers['message-id'];
  return id !== undefined && kept.headers['message-id'] === id && kept.to.join() === mail.to.join();
}
