type Placed = { path: string; message: string };
export type Refusal = {
  /** Said at the top; null where every fault has a field. */
  general: string | null;
  atFields: Placed[];
};

const isPlaced = (value: unknown): value is Placed =>
  typeof value === 'object' &&
  value !== null &&
  typeof Reflect.get(value, 'path') === 'string' &&
  typeof Reflect.get(value, 'message') === 'string';

/**
 * Sorts what a server refused into faults of fields that this form has, and the rest. `fields` are the names
 * at the top of the form's values; the server's paths start with `body.`.
 */
export function refusalOf(error: unknown, fields: readonly string[]): Refusal {
  if (!(error instanceof Error))
    return { general: 'Something went wrong on this page.', atFields: [] };
  const faults: unknown = Reflect.get(error, 'faults');
  const placed = (Array.isArray(faults) ? faults : []).filter(isPlaced);
  const atFields: Placed[] = [];
  const rest: string[] = [];
  for (const { path, message } of placed) {
    const own = path.replace(/^body\./, '');
    if (fields.includes(own.split('.')[0] ?? '')) atFields.push({ path: own, message });
    else rest.push(message);
  }
  if (rest.length > 0) return { general: rest.join(' '), atFields };
  return { general: atFields.length > 0 ? null : error.message, atFields };
}
