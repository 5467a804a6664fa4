import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterEach } from 'vitest';
import { pendingActions } from '../shared/actions/pending.store.js';
import { clearStrip } from '../shared/actions/strip.store.js';

configure({ asyncUtilTimeout: 8_000 });

// What jsdom leaves out and the widgets ask for.
window.scrollTo = () => undefined;
Element.prototype.scrollTo = () => undefined;

afterEach(() => {
  cleanup();
  localStorage.clear();
  pendingActions.set(() => []);
  clearStrip();
});
