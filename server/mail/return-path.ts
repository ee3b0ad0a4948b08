import { createHmac, timingSafeEqual } from 'node:crypto';

/** Makes and reads the addresses to which mail comes back (VERP): each names its mail and is signed, so that nobody can make one up. */
export interface ReturnPath {
  /** `bounce+<mail>.<signature>@<host>`; its local part has at most 64 characters (RFC 5321, 4.5.3.1.1). */
  addressFor(mailId: number): string;
  /** The mail an address was made for; undefined where it was not made here. Upper and lower case are alike. */
  mailOf(address: string): number | undefined;
}

/** `from`: the sender of the mails, `Name <desk@host>` or `desk@host`, whose host the addresses get. */
export function createReturnPath(options: { secret: string; from: string }): ReturnPath {
  const host = /@([^>\s]+)>?\s*$/.exec(options.from)?.[1] ?? 'localhost';
  // 128 bits in hexadecimal: letter case may be lost on the way.
  const signatureOf = (mailId: number): Buffer =>
    createHmac('sha256', options.secret).update(`return-path:${mailId}`).digest().subarray(0, 16);
  return {
    addressFor: (mailId) => `bounce+${mailId}.${signatureOf(mailId).toString('hex')}@${host}`,
    mailOf(address) {
      const match = /^bounce\+([1-9]\d{0,15})\.([0-9a-f]{32})@/i.exec(address.trim());
      if (!match) return undefined;
      const mailId = Number(match[1]);
      return timingSafeEqual(Buffer.from(match[2] ?? '', 'hex'), signatureOf(mailId)) ? mailId : undefined;
    },
  };
}
