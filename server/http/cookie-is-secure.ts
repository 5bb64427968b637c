const LOOPBACK = /^(localhost|127(\.\d+){3}|\[::1\])$/;

/** Whether an address leads to the machine itself and nowhere else. */
export const isLoopback = (publicUrl: string): boolean =>
  LOOPBACK.test(new URL(publicUrl).hostname);

/** A cookie over plain http is bearable on the machine itself and nowhere else. */
export const cookieIsSecure = (publicUrl: string): boolean =>
  new URL(publicUrl).protocol === 'https:' || !isLoopback(publicUrl);
