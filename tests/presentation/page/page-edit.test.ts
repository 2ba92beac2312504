import { describe, expect, it } from 'vitest';
import { pageDifference } from '../../../src/presentation/page/page-edit.js';
import { sampleReport } from '../../support/sample-report.js';
import { pageOf, sampleReview, sampleReviewed } from '../../support/sample-review.js';

const page = pageOf(sampleReview());
const several = pageOf(sampleReview({ stages: [sampleReviewed(), sampleReviewed(sampleReport(), 'TEAM-0031')] }));

function edited(from: string | RegExp, to: string, written = page): ReturnType<typeof pageDifference> {
  const changed = written.replace(from, to);
  expect(changed).not.toBe(written);
  return pageDifference(changed, written);
}

describe('a page that somebody edited', () => {
  it('is told by section, with the words before and after', () => {
    const found = edited('✓</span> pass', '✓</span> passes well');
    expect(found.subject).toMatch(/first in section "Margins", line \d+$/u);
    expect(found.was).toContain('✓ passes well');
    expect(found.is).toContain('✓ pass');
    expect(found.is).not.toContain('well');
  });

  it('names the stage too where there are several', () => {
    const at = several.indexOf('? cannot be decided', several.indexOf('id="s2-answer"'));
    const found = pageDifference(`${several.slice(0, at)}? perhaps${several.slice(at + 19)}`, several);
    expect(found.subject).toContain('in section "2. Soil-moisture probe, Answer"');
  });

  it('shows no markup, no entity and nothing that deceives', () => {
    const found = edited('<p class="soft">', '<p class="soft"><b onclick="x()">Rated &#60;100 %&#62; \u202egnp\u0007</b> ');
    expect(found.was).toContain('Rated <100 %> \\u{202e}gnp\\u{7}');
    expect(`${found.was}${found.is}`).not.toMatch(/onclick|class=|&#|<\/|[\u0000-\u001f\u202e]/u);
  });

  it('is cut where lines are long, a little before they part', () => {
    const found = edited(/<p class="soft">/u, `<p class="soft">${'long '.repeat(500)}`);
    expect(found.was.length).toBeLessThanOrEqual(102);
  });

  it.each([
    ['class="answer good"', 'class="answer bad"', /in section "Answer", in its markup, not its words/u],
    ['--good:#0072b2', '--good:#ff0000', /no reader sees \(the style sheet\)/u],
    ['<meta name="referrer" content="no-referrer">', '', /no reader sees \(the head of the file\)/u],
    ["addEventListener('beforeprint'", "addEventListener('print'", /no reader sees \(the embedded document or the script\)/u],
  ])('%s', (from, to, subject) => {
    const found = edited(from, to);
    expect(found.subject).toMatch(subject);
    expect([found.was, found.is]).toEqual(['another text', 'as this railfit writes it']);
  });

  it('says where a page ends too early, and where a line too many stands', () => {
    const cut = pageDifference(page.slice(0, page.indexOf('\n', page.indexOf('id="s1-method"'))), page);
    expect(cut.subject).toContain('"Method"');
    expect(cut.was).toBe('the file ends here');
    expect(edited('<h2 id="s1-shortlist-title">', '<p>Approved by all.</p>\n<h2 id="s1-shortlist-title">').was).toContain('Approved by all.');
  });
});
