/** A path inside a filter graph: once for the filter's own options, once for the graph. */
export const inGraph = (path: string): string =>
  `'${path.replace(/[\\':]/g, String.raw`\$&`).replaceAll("'", String.raw`'\''`)}'`;
