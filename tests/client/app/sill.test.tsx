import { act, cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { PassingSill, SillSentence, SillVoice } from '#src/components/sill.tsx';
import { say, sillStore } from '#src/lib/sill-store.ts';

const LOGGED = 'B20 logged. Mean at 45° is now 44.8 cm.';

beforeEach(() => {
  vi.useFakeTimers({ shouldAdvanceTime: true });
});

afterEach(() => {
  cleanup();
  sillStore.set(null);
  vi.useRealTimers();
});

function pass(milliseconds: number) {
  act(() => {
    vi.advanceTimersByTime(milliseconds);
  });
}

test('sill, when something has happened: the sentence stands for eight seconds', () => {
  render(<PassingSill />);

  act(() => say(LOGGED));
  pass(7_900);
  expect(screen.getByText(LOGGED)).toBeTruthy();
  pass(200);

  expect(screen.queryByText(LOGGED)).toBeNull();
});

test('sill, while its action has the focus: the sentence stays, and goes eight seconds after', () => {
  render(<PassingSill />);
  act(() => say(LOGGED, { words: 'Undo', run: () => undefined }));

  act(() => screen.getByRole('button', { name: 'Undo' }).focus());
  pass(20_000);
  expect(screen.getByText(LOGGED)).toBeTruthy();
  act(() => screen.getByRole('button', { name: 'Undo' }).blur());
  pass(8_100);

  expect(screen.queryByText(LOGGED)).toBeNull();
});

test('sill, when its action is pressed: it is done once and the sentence goes', async () => {
  const run = vi.fn();
  render(<PassingSill />);
  act(() => say(LOGGED, { words: 'Undo', run }));

  await userEvent
    .setup({ advanceTimers: vi.advanceTimersByTime })
    .click(screen.getByRole('button', { name: 'Undo' }));

  expect(run).toHaveBeenCalledTimes(1);
  expect(screen.queryByText(LOGGED)).toBeNull();
});

test('sill, when a screen says the sentence itself: the usual bar stays away', () => {
  render(
    <>
      <SillSentence />
      <PassingSill />
    </>,
  );

  act(() => say(LOGGED));

  expect(screen.getAllByText(LOGGED)).toHaveLength(1);
  expect(screen.queryByRole('region', { name: 'What has happened' })).toBeNull();
});

test('sill, for who does not see it: the sentence is said politely, once', () => {
  render(<SillVoice />);

  act(() => say(LOGGED));

  const voice = screen.getByRole('status');
  expect(voice.getAttribute('aria-live')).toBe('polite');
  expect(voice.textContent).toBe(LOGGED);
});
