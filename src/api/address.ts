/** Fills `/api/athletes/:id` from its parameters. A missing one is a mistake of the caller. */
export function fillPath(path: string, params: Readonly<Record<string, unknown>> = {}): string {
  return path.replace(/:([A-Za-z]+)/g, (_, name: string) => {
    const value = params[name];
    if (typeof value !== 'string' && typeof value !== 'number')
      throw new TypeError(`${path} needs "${name}"`);
    return encodeURIComponent(value);
  });
}

/** A query string with its question mark; left out, undefined and null values are not sent. */
export function queryString(query: Readonly<Record<string, unknown>> = {}): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value === undefined || value === null) continue;
    if (typeof value !== 'string' && typeof value !== 'number' && typeof value !== 'boolean')
      throw new TypeError(`the query field "${name}" is not text, a number or a boolean`);
    search.set(name, String(value));
  }
  return search.size === 0 ? '' : `?${search}`;
}
