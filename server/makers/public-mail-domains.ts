/** Domains at which anybody can have an address: mail from there proves nothing about a maker. */
const publicMailDomains: ReadonlySet<string> = new Set([
  'aol.com',
  'duck.com',
  'fastmail.com',
  'free.fr',
  'gmail.com',
  'gmx.at',
  'gmx.ch',
  'gmx.com',
  'gmx.de',
  'gmx.net',
  'googlemail.com',
  'hey.com',
  'hotmail.co.uk',
  'hotmail.com',
  'hotmail.de',
  'hotmail.fr',
  'icloud.com',
  'laposte.net',
  'libero.it',
  'live.com',
  'mac.com',
  'mail.com',
  'mail.ru',
  'mailbox.org',
  'me.com',
  'msn.com',
  'naver.com',
  'orange.fr',
  'outlook.com',
  'outlook.de',
  'pm.me',
  'posteo.de',
  'proton.me',
  'protonmail.com',
  'qq.com',
  't-online.de',
  'tuta.com',
  'tutanota.com',
  'web.de',
  'yahoo.co.jp',
  'yahoo.co.uk',
  'yahoo.com',
  'yahoo.de',
  'yandex.ru',
  'ymail.com',
  'zoho.com',
  '126.com',
  '163.com',
]);

export function isPublicMailDomain(domain: string): boolean {
  return publicMailDomains.has(domain.toLowerCase());
}

/** What stands behind the last @ of an address, in lower case. */
export function domainOf(address: string): string {
  return address.slice(address.lastIndexOf('@') + 1).toLowerCase();
}
