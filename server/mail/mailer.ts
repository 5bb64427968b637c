export interface Mail {
  readonly to: string;
  readonly subject: string;
  /** Plain text; the product sends no HTML. */
  readonly text: string;
}

/** Sends letters. Resolves once the next server has taken the letter. */
export interface Mailer {
  send(mail: Mail): Promise<void>;
  close(): void;
}
