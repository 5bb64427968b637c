/**
 * Does node_modules hold what package-lock.json asks for? Exit status 0 yes, 1 no.
 * npm writes node_modules/.package-lock.json as the last act of an install, so an install that was cut off
 * counts as none. Packages for other platforms may be absent, but no package may have another version.
 */
import { readFileSync } from 'node:fs';

function packagesOf(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages ?? {};
  } catch {
    return null;
  }
}

const wanted = packagesOf('package-lock.json');
const installed = packagesOf('node_modules/.package-lock.json');

const isInstalled = ([path, entry]) => {
  const found = installed[path];
  if (found === undefined) return entry.optional === true || entry.link === true;
  return found.version === entry.version && found.integrity === entry.integrity;
};

const complete =
  wanted !== null &&
  installed !== null &&
  Object.entries(wanted).every(([path, entry]) => path === '' || isInstalled([path, entry]));
process.exitCode = complete ? 0 : 1;
