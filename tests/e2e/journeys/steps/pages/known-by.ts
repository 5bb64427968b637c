import type { Page } from '@playwright/test';

/** By what a page is known to stand. */
export const heading = (name: string | RegExp) => (page: Page) =>
  page.getByRole('heading', { level: 1, name });
export const text = (words: string | RegExp) => (page: Page) => page.getByText(words).first();
export const clip = (page: Page) => page.locator('canvas[data-frame]');
