/** A mail as it was received; `headers` by lower-case name, as they stood. */
export interface Mail {
  readonly id: number;
  readonly from: string;
  readonly to: readonly string[];
  readonly subject: string;
  readonly text: string;
  readonly html: string | null;
  readonly headers: Readonly<Record<string, string>>;
  readonly receivedAt: string;
}

export interface Mailbox {
  add(mail: Omit<Mail, 'id'>): void;
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
      lastId += 1;
      mails = [{ id: lastId, ...mail }, ...mails].slice(0, capacity);
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
