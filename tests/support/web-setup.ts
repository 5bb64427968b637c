import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterEach } from 'vitest';

// how long a page may take to come on a busy machine; nothing waits so long that goes right
configure({ asyncUtilTimeout: 10_000 });

afterEach(() => {
  cleanup();
  sessionStorage.clear();
  localStorage.clear();
});

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
