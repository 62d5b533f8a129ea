/** Links that were mailed open an account to whoever holds them: their secret part stays out of logs. */
export const maskTokens = (address: string): string =>
  address.replace(/\/(invitations|password-resets|reset-password)\/[\w-]{20,}/g, '/$1/…');
