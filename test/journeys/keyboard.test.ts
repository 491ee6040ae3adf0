import { describe, it } from 'vitest';
import { openBrowserStage } from '../helpers/browser.ts';
import { keyboard } from './flows/keyboard.ts';

describe('Without a mouse', () => {
  it('a claim is reached, recomputed and marked, and the mark taken back', () => keyboard(openBrowserStage));
});
