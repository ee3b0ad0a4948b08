/** What the global set-up left in the environment. */
export function fromSetUp(
  name:
    | 'TEST_DATABASE_URL'
    | 'TEST_MEILI_HOST'
    | 'TEST_MEILI_KEY'
    | 'TEST_SMTP_URL'
    | 'TEST_MAILBOX_URL'
    | 'TEST_APP_ADDRESS',
): string {
  const value = process.env[name];
  if (!value)
    throw new Error(
      `${name} is missing: run this spec through vitest with its project (--project api or browser).`,
    );
  return value;
}

/** Apart for each vitest worker, so that files can run side by side. */
export const workerNumber = process.env['VITEST_POOL_ID'] ?? '1';
