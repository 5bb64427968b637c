import type { Browser, BrowserContext } from '@playwright/test';

export interface ConsoleWatch {
  /** From now on lines that match are expected. */
  allow: (pattern: RegExp) => void;
  /** Errors, warnings, uncaught exceptions and unhandled rejections that nobody allowed. */
  unexpected: () => string[];
  stop: () => void;
}

/** Listens to every page of every context of the browser, those that the test opens itself included. */
export function watchConsole(browser: Browser): ConsoleWatch {
  const lines: string[] = [];
  const allowed: RegExp[] = [];
  const watch = (context: BrowserContext) => {
    context.on('console', (message) => {
      if (message.type() === 'error' || message.type() === 'warning') {
        lines.push(`${message.type()}: ${message.text()} (${message.location().url})`);
      }
    });
    context.on('weberror', (error) => lines.push(`uncaught: ${describe(error.error())}`));
  };
  browser.contexts().forEach(watch);
  browser.on('context', watch);
  return {
    allow: (pattern) => void allowed.push(pattern),
    unexpected: () => lines.filter((line) => !allowed.some((pattern) => pattern.test(line))),
    stop: () => void browser.off('context', watch),
  };
}

const describe = (error: unknown) =>
  error instanceof Error ? (error.stack ?? error.message) : String(error);
