/** Where to go after signing in: the address of this site that was asked for, or the start. Addresses elsewhere are not followed. */
export function wayBack(asked: string | undefined): string {
  return asked !== undefined && /^\/(?![/\\])/.test(asked) && !asked.startsWith('/account/sign-in')
    ? asked
    : '/';
}
