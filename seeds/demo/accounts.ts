import type { AccountRole } from '../../shared/contract/vocabulary.js';

export interface DemoAccount {
  readonly key: string;
  readonly role: AccountRole;
  readonly email: string;
  readonly password: string;
  readonly displayName: string;
}

/** One account to sign in with for each kind of person; the passwords stand in the documents on purpose. */
export const demoAccounts: readonly DemoAccount[] = [
  {
    key: 'owner',
    role: 'member',
    email: 'owner@shimlore.example',
    password: 'caliper-and-coin',
    displayName: 'Odile Farrow',
  },
  {
    key: 'author',
    role: 'member',
    email: 'author@shimlore.example',
    password: 'scribe-and-square',
    displayName: 'Anselm Reeve',
  },
  {
    key: 'maker',
    role: 'maker',
    email: 'maker@shimlore.example',
    password: 'lathe-and-layout',
    displayName: 'Marit Tarn (Tarn Motion)',
  },
  {
    key: 'moderator',
    role: 'moderator',
    email: 'moderator@shimlore.example',
    password: 'goggles-before-gears',
    displayName: 'Ines Holloway',
  },
  {
    key: 'administrator',
    role: 'administrator',
    email: 'administrator@shimlore.example',
    password: 'keys-of-the-workshop',
    displayName: 'Piet Ashdown',
  },
];

const names = [
  'Bram Wetherley',
  'Calla Norring',
  'Dov Hasker',
  'Edda Lindqvarn',
  'Fenno Brake',
  'Greta Ostwick',
  'Hob Trelling',
  'Imke Sandoval-Ray',
  'Joss Kettlewell',
  'Kaja Munthe-Orr',
  'Lorcan Vane',
  'Mirela Dask',
  'Nils Overby',
  'Oona Parfitt',
  'Pavo Rindle',
  'Quill Thackery',
  'Runa Selwick',
  'Stellan Gorse',
  'Tamsin Ulbricht',
  'Ubo Marchetta',
  'Vesna Callow',
  'Wim Harrowgate',
  'Xenia Broom',
  'Yorick Plaice',
  'Zara Fennimore',
  'Abel Quist',
];

/** Members who wrote, tried and asked; nobody signs in as one of them, so all share a password that is told nowhere. */
export const demoMembers: readonly DemoAccount[] = names.map((displayName) => {
  const key = displayName.split(' ')[0]!.toLowerCase();
  return {
    key,
    role: 'member',
    email: `${key}@shimlore.example`,
    password: 'member-of-the-demo',
    displayName,
  };
});
