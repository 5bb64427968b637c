/** A text of the archive, or a stored file by its key. */
export type HeldFile =
  | { readonly name: string; readonly text: string }
  | { readonly name: string; readonly key: string };
