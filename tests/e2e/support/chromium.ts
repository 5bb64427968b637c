/**
 * Debian's Chromium, quiet and without a GPU, so that a run sees the same pixels everywhere. Its build
 * without a window: the other one draws its own toolbar anew with each page, also where nobody sees it.
 */
export const chromium = {
  executablePath: '/usr/bin/chromium-headless-shell',
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-dev-shm-usage',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
  ],
};
