/** What is struck before a number that has moved since this person last read it. */
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { readingMarks } from '#src/features/report/editor/reading-marks.ts';
import { MovedMark } from '#src/features/report/views/moved-mark.ts';

let comeIntoView: (element: Element) => void = () => undefined;

beforeEach(() => {
  vi.stubGlobal(
    'IntersectionObserver',
    class {
      constructor(report: (entries: { isIntersecting: boolean; target: Element }[]) => void) {
        comeIntoView = (target) => report([{ isIntersecting: true, target }]);
      }
      observe() {}
      unobserve() {}
    },
  );
});
afterEach(() => {
  localStorage.clear();
  vi.unstubAllGlobals();
});

function number(reader = 'tern-rock/1 Kasimir Lund') {
  const dom = document.createElement('span');
  dom.setAttribute('aria-label', '46.4 centimetres');
  return { dom, mark: new MovedMark(dom, readingMarks(reader)) };
}

/** As if the report had been read while the number stood at `text`. */
function readBefore(text: string) {
  readingMarks('tern-rock/1 Kasimir Lund').read('mean', text);
}

describe('a number in the report', () => {
  test('read for the first time: nothing is struck, and it counts as read once it is in view', () => {
    const first = number();
    first.mark.show('mean', '46.4 cm');
    expect(readingMarks('tern-rock/1 Kasimir Lund').lastRead('mean')).toBeNull();

    comeIntoView(first.dom);

    expect(first.dom.dataset.before).toBeUndefined();
    expect(readingMarks('tern-rock/1 Kasimir Lund').lastRead('mean')).toBe('46.4 cm');
  });

  test('moved since: the old value stands before it, in its name too, until its line is visited', () => {
    readBefore('46.2 cm');
    const { dom, mark } = number();

    mark.show('mean', '46.4 cm');
    expect(dom.dataset.before).toBe('46.2 cm');
    expect(dom.getAttribute('aria-label')).toBe('46.4 centimetres, moved from 46.2 cm');

    mark.visit();
    expect(dom.dataset.before).toBeUndefined();
    expect(dom.getAttribute('aria-label')).toBe('46.4 centimetres');
    expect(readingMarks('tern-rock/1 Kasimir Lund').lastRead('mean')).toBe('46.4 cm');
  });

  test('moved twice before it is visited: what was last read stays struck', () => {
    readBefore('46.2 cm');
    const { dom, mark } = number();

    mark.show('mean', '46.4 cm');
    mark.show('mean', '46.8 cm');

    expect(dom.dataset.before).toBe('46.2 cm');
  });

  test('moved and moved back: nothing is struck', () => {
    readBefore('46.2 cm');
    const { dom, mark } = number();

    mark.show('mean', '46.4 cm');
    mark.show('mean', '46.2 cm');

    expect(dom.dataset.before).toBeUndefined();
  });

  test('read by somebody else at the same browser: is not read by this person', () => {
    readBefore('46.2 cm');
    const { dom, mark } = number('tern-rock/1 Maren Tove');

    mark.show('mean', '46.4 cm');

    expect(dom.dataset.before).toBeUndefined();
  });

  test('what is kept is spoilt: reads as if for the first time', () => {
    localStorage.setItem('holdwater:read:tern-rock/1 Kasimir Lund', '{"no":');

    expect(readingMarks('tern-rock/1 Kasimir Lund').lastRead('mean')).toBeNull();
  });
});
