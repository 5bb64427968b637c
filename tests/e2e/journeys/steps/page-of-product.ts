import type { Locator, Page } from '@playwright/test';
import type { Shown } from './shown.ts';

/** A page in one of its states, and what it says once it stands. */
export interface PageOfProduct {
  readonly name: string;
  /** Who opens it; null: nobody is signed in. */
  readonly who: string | null;
  readonly address: (shown: Shown) => string;
  readonly stands: (page: Page) => Locator;
  /** What is pressed once it is open, where no address leads to this state. */
  readonly then?: (page: Page) => Promise<void>;
  /** Lines of the browser's console that belong to it. */
  readonly says?: RegExp;
}
