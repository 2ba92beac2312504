import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { asEmbedded, embeddedIn } from '../../../src/presentation/page/embedded.js';
import { SCRIPT, SCRIPT_HASH } from '../../../src/presentation/page/script.js';

it('the policy names the script by its hash; after a change of the script write the new one into script.ts', () => {
  expect(SCRIPT_HASH).toBe(`sha256-${createHash('sha256').update(SCRIPT).digest('base64')}`);
});

it('the script reaches for nothing outside the page', () => {
  expect(SCRIPT).not.toMatch(/fetch|XMLHttp|import|eval|innerHTML|https?:|localStorage|<\/|<!--/u);
});

it('a document is embedded so that nothing in it ends the element, and comes back as it was', () => {
  const value = { a: '</script><script>alert(1)</script>', b: '<!-- & \u2028\u2029', c: 'µ' };
  const text = asEmbedded(JSON.stringify(value));
  expect(text).not.toMatch(/[<>&\u2028\u2029]/u);
  const page = `<p></p><script type="application/json" id="railfit-report">${text}</script>`;
  expect(JSON.parse(embeddedIn(page) ?? '')).toEqual(value);
  expect(embeddedIn('<p>nothing</p>')).toBeNull();
});
