import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterAll, afterEach, vi } from 'vitest';

// how long a page may take to come on a busy machine; nothing waits so long that goes right
configure({ asyncUtilTimeout: 10_000 });

afterEach(() => {
  cleanup();
  sessionStorage.clear();
  localStorage.clear();
});

// a page loads what it does not need at once: none of it may come when the file is done
afterAll(() => vi.dynamicImportSettled());

// jsdom draws nothing and has no modal dialogs: the least that the pages lean on
HTMLDialogElement.prototype.showModal ??= function showModal(this: HTMLDialogElement) {
  this.setAttribute('open', '');
};
HTMLDialogElement.prototype.close ??= function close(this: HTMLDialogElement) {
  this.removeAttribute('open');
};
/** Nothing has a size here, so nothing changes it. */
class SilentResizeObserver implements ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
globalThis.ResizeObserver ??= SilentResizeObserver;
Element.prototype.scrollIntoView ??= () => undefined;
window.scrollTo = () => undefined;
