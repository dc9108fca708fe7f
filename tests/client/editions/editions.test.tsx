import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Edition } from '#shared/contracts/editions.ts';
import type { Role } from '#shared/contracts/session.ts';
import type { EditionComparison } from '#shared/editions/edition-comparison.ts';
import { fakeServer, json, refusal, type FakeServer } from '../support/fake-server.ts';
import { emptyEvidence, problem, session, summary, team, TODAY } from '../support/invented.ts';
import { renderAt } from '../support/render-at.tsx';

const P = '/api/teams/tern-rock/problems/1';
const LIST = '/team/tern-rock/problem/1/editions';

function edition(n: number, changes: Partial<Edition> = {}): Edition {
  return {
    n,
    at: `2026-02-${10 + n}T17:40:00`,
    by: 'Ines Farrow',
    note: `note of ${n}`,
    seal: 'b7e241c09d3a'.padEnd(64, '0'),
    trials: 12 * n,
    tiedNumbers: 5 * n,
    pages: null,
    pdfSha: null,
    ...changes,
  };
}

const MOVED: EditionComparison = {
  values: [
    {
      key: 'mean',
      name: 'range on the tray at 38°',
      hue: 'measured',
      before: '46.2 ± 0.3 cm',
      after: '46.4 ± 0.3 cm',
      why: 'B13 added',
      section: 4,
    },
  ],
  newlyTied: 2,
  noLongerTied: 0,
  verdicts: [
    { n: 3, text: 'It is 47.9 cm.', before: 'Undecided', after: 'Leaks', short: '1.5 cm less, 2.3 u' },
  ],
  trials: ['7 trials logged: B13 to B19.'],
  definitions: ['Model 3 added.'],
  passages: [
    {
      section: 4,
      change: 'changed',
      pieces: [
        { change: 'same', kind: 'text', text: 'It lands' },
        { change: 'removed', kind: 'text', text: ' close.' },
        { change: 'added', kind: 'text', text: ' short by' },
        { change: 'added', kind: 'value', text: ' 1.5 ± 0.7 cm' },
      ],
    },
  ],
};

const NOTHING: EditionComparison = {
  values: [],
  newlyTied: 0,
  noLongerTied: 0,
  verdicts: [],
  trials: [],
  definitions: [],
  passages: [],
};

const DOCUMENT = {
  type: 'doc',
  content: [
    {
      type: 'sectionPhenomenon',
      content: [{ type: 'paragraph', content: [{ type: 'text', text: 'A jet.' }] }],
    },
    {
      type: 'sectionModel',
      content: [{ type: 'paragraph', content: [{ type: 'text', text: 'It is 9.81 m.' }] }],
    },
    {
      type: 'sectionExperiment',
      content: [{ type: 'paragraph', content: [{ type: 'text', text: 'Words.' }] }],
    },
    {
      type: 'sectionComparison',
      content: [{ type: 'paragraph', content: [{ type: 'text', text: 'Words.' }] }],
    },
    { type: 'sectionConclusion' },
  ],
};

let server: FakeServer;

// Each screen's file is read once, before the clock of the first test runs.
beforeAll(async () => {
  await import('#src/app/frames/problem-frame.tsx');
  await import('#src/app/screens/editions-screen.tsx');
  await import('#src/app/screens/edition-screen.tsx');
}, 90_000);

beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
  server = fakeServer();
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  server.on(`GET ${P}`, problem());
  server.on(`GET ${P}/evidence`, { evidence: emptyEvidence(), rowVersions: {} });
  server.on(`GET ${P}/report`, { schemaVersion: 1, lineage: 'l', document: DOCUMENT });
  server.on(`GET ${P}/editions`, [edition(2), edition(1)]);
  server.on(`GET ${P}/editions/2/compare/draft`, MOVED);
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

function open(address: string, role: Role = 'captain') {
  server.on('GET /api/session', session(role));
  return renderAt(address);
}

describe('the list', () => {
  test('editions, when some are frozen: stand after the draft, the newest first, each with its seal, note and PDF', async () => {
    open(LIST);

    await screen.findByRole('heading', { level: 1, name: 'Editions' });
    expect(screen.getAllByRole('heading', { level: 2 }).map((heading) => heading.textContent)).toEqual([
      'Draft',
      'Edition 2',
      'Edition 1',
    ]);
    const second = within(screen.getByRole('listitem', { name: 'Edition 2' }));
    expect(second.getByRole('img', { name: 'Seal of edition 2' })).toBeTruthy();
    expect(second.getByText('note of 2')).toBeTruthy();
    expect(second.getByText(/12 Feb, 17:40, by Ines Farrow/)).toBeTruthy();
    expect(second.getByRole('link', { name: 'Print or save PDF of edition 2' }).getAttribute('href')).toBe(
      `${P}/editions/2/report.pdf`,
    );
    expect((await screen.findAllByText('2 frozen')).length).toBeGreaterThan(0);
  });

  test('the draft, when numbers, verdicts and words moved since the last edition: says what and why', async () => {
    open(LIST);

    const draft = within(await screen.findByRole('region', { name: 'Draft' }));
    expect(await draft.findByText('46.2 ± 0.3 cm')).toBeTruthy();
    expect(draft.getByRole('link', { name: '46.4 ± 0.3 cm' }).getAttribute('href')).toBe(
      '/team/tern-rock/problem/1/report#4',
    );
    expect(draft.getByText('range on the tray at 38°, B13 added')).toBeTruthy();
    expect(draft.getByText('Undecided')).toBeTruthy();
    expect(draft.getByText('Leaks')).toBeTruthy();
    expect(draft.getByText('7 trials logged: B13 to B19.')).toBeTruthy();
    expect(draft.getByText(/Words moved in section 4\./)).toBeTruthy();
  });

  test('the draft, when things are worth doing: each is a link in its own words', async () => {
    open(LIST);

    const tie = await screen.findByRole('link', { name: 'Tie one number' });
    expect(tie.getAttribute('href')).toBe('/team/tern-rock/problem/1/report#2');
    expect(tie.closest('p')?.textContent).toBe('Tie one number in section 2, and write section 5.');
  });

  test('the draft, when nothing moved: says so', async () => {
    server.on(`GET ${P}/editions/2/compare/draft`, NOTHING);
    open(LIST);

    expect(await screen.findByText('Nothing has moved since then.')).toBeTruthy();
  });

  test('editions, when none is frozen: the draft says what the first one would keep', async () => {
    server.on(`GET ${P}/editions`, []);
    open(LIST);

    expect(await screen.findByText(/Nothing is frozen yet/)).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Freeze edition 1' })).toBeTruthy();
  });

  test('editions, when they do not come: say so and can be asked for again', async () => {
    server.on(`GET ${P}/editions`, () => refusal(500, 'internal', 'Something went wrong here. Try again.'));
    const { user } = open(LIST);
    const again = await screen.findByRole('button', { name: 'Try again' });

    server.on(`GET ${P}/editions`, [edition(1)]);
    server.on(`GET ${P}/editions/1/compare/draft`, NOTHING);
    await user.click(again);

    expect(await screen.findByRole('heading', { name: 'Edition 1' })).toBeTruthy();
  });
});

describe('freezing', () => {
  test('freeze, when the captain says yes: sends the note and the newest edition on screen', async () => {
    const { user } = open(LIST);
    await user.click(await screen.findByRole('button', { name: 'Freeze edition 3' }));
    const dialog = within(await screen.findByRole('dialog', { name: 'Freeze edition 3?' }));
    server.on(`POST ${P}/editions`, () => {
      server.on(`GET ${P}/editions`, [edition(3), edition(2), edition(1)]);
      server.on(`GET ${P}/editions/3/compare/draft`, NOTHING);
      return json(edition(3), 201);
    });

    await user.type(dialog.getByLabelText('Note'), 'For the second fight');
    await user.click(dialog.getByRole('button', { name: 'Freeze edition 3' }));

    expect(await screen.findByRole('heading', { name: 'Edition 3' })).toBeTruthy();
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(server.asked(`POST ${P}/editions`)[0]?.body).toEqual({ note: 'For the second fight', after: 2 });
    expect(screen.getAllByText('Edition 3 is frozen and sealed.').length).toBeGreaterThan(0);
  });

  test('freeze, when somebody was first: says who, and shows their edition behind the question', async () => {
    const { user } = open(LIST);
    await user.click(await screen.findByRole('button', { name: 'Freeze edition 3' }));
    const dialog = within(await screen.findByRole('dialog'));
    const sentence = 'Kasimir Lund froze edition 3 while you were here. Look at it first.';
    server.on(`POST ${P}/editions`, () => {
      server.on(`GET ${P}/editions`, [edition(3, { by: 'Kasimir Lund' }), edition(2), edition(1)]);
      server.on(`GET ${P}/editions/3/compare/draft`, NOTHING);
      return refusal(409, 'frozen-meanwhile', sentence);
    });

    await user.click(dialog.getByRole('button', { name: 'Freeze edition 3' }));

    expect((await dialog.findByRole('alert')).textContent).toContain(sentence);
    await user.click(dialog.getByRole('button', { name: 'Keep writing' }));
    expect(await screen.findByRole('button', { name: 'Freeze edition 4' })).toBeTruthy();
    expect(screen.getByRole('heading', { name: 'Edition 3' })).toBeTruthy();
  });

  test.each<Role>(['member', 'advisor'])('freeze, as %s: is told who may', async (role) => {
    open(LIST, role);

    expect(await screen.findByText('Ines Farrow freezes editions, as captain.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: /Freeze/ })).toBeNull();
  });
});

describe('laying beside', () => {
  test('an edition, when opened: lies beside the draft, in numbers and in words', async () => {
    open(`${LIST}/2`);

    const beside = await screen.findByRole('region', { name: 'What moved from edition 2 to the draft' });
    expect(await within(beside).findByText('close.')).toBeTruthy();
    expect([...beside.querySelectorAll('p del')].map((node) => node.textContent)).toEqual([' close.']);
    expect([...beside.querySelectorAll('p ins')].map((node) => node.textContent)).toEqual([
      ' short by',
      ' 1.5 ± 0.7 cm',
    ]);
    expect(within(beside).getByText('Two tied numbers came.')).toBeTruthy();
  });

  test('an edition, when another one is chosen: is told from the earlier to the later, at an address of its own', async () => {
    server.on(`GET ${P}/editions/1/compare/2`, NOTHING);
    const { user, router } = open(`${LIST}/2`);
    await user.selectOptions(await screen.findByLabelText('Edition 2 laid beside'), 'edition 1');

    expect(await screen.findByText('The text is the same.')).toBeTruthy();
    expect(screen.getByText('No number, verdict, trial or definition moved.')).toBeTruthy();
    expect(screen.getByRole('region', { name: 'What moved from edition 1 to edition 2' })).toBeTruthy();
    expect(router.state.location.search).toBe('?beside=1');
  });

  test('an edition, when there is none of that number: says so and leads back', async () => {
    open(`${LIST}/9`);

    expect(await screen.findByRole('heading', { name: 'There is no edition 9' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'All editions' }).getAttribute('href')).toBe(LIST);
  });
});
