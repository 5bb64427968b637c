const LOOPBACK = /^(localhost|127(\.\d+){3}|\[::1\])$/;

/** A cookie over plain http is bearable on the machine itself and nowhere else. */
export const cookieIsSecure = (publicUrl: string): boolean => {
  const { protocol, hostname } = new URL(publicUrl);
  return protocol === 'https:' || !LOOPBACK.test(hostname);
};
