import { expect, it } from 'vitest';
import { mayShowBrowser } from '../../../app/browser/show';

it('a browser is opened by itself on the own screen only: not under CI, not over ssh, not without a display', () => {
  expect(mayShowBrowser(true, {})).toBe(true);
  expect(mayShowBrowser(true, { CI: '', SSH_CONNECTION: '' })).toBe(true);
  expect(mayShowBrowser(false, {})).toBe(false);
  expect(mayShowBrowser(true, { CI: 'true' })).toBe(false);
  expect(mayShowBrowser(true, { SSH_CONNECTION: '10.0.0.1 1 10.0.0.2 22' })).toBe(false);
});
