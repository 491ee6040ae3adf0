import { describe, it } from 'vitest';
import { openBrowserStage } from '../helpers/browser.ts';
import { workedExample } from './flows/worked-example.ts';

describe('The worked example', () => {
  it('is one button away from an empty start, and its figures can be kept', () => workedExample(openBrowserStage));
});
