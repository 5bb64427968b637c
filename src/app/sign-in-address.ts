import { paths } from '#src/ui/paths.ts';

/** The sign-in page that leads back to `place` (a path of this site). */
export function signInAddress(place: string): string {
  if (place === paths.today() || place.startsWith(paths.signIn())) return paths.signIn();
  return `${paths.signIn()}?${new URLSearchParams({ to: place })}`;
}
