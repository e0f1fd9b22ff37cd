/** The code that Node.js and the database's driver put on their errors, whatever realm the error comes from. */
export function errorCode(error: unknown): string | undefined {
  const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : undefined;
  return typeof code === 'string' ? code : undefined;
}
