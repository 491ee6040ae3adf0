export const appScheme = 'footing';
export const appOrigin = `${appScheme}://app`;

/** Whether an address is one of our own pages or a piece of one. */
export function isAppAddress(address: string): boolean {
  return address.startsWith(`${appOrigin}/`);
}

/** Whether a window may load from an address at all: our own pages, and what they made themselves. */
export function isLoadable(address: string, isDevelopment: boolean): boolean {
  if (isAppAddress(address) || address.startsWith(`blob:${appOrigin}/`) || address.startsWith('data:')) return true;
  return isDevelopment && address.startsWith('devtools://');
}
