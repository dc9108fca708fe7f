/** The invented problems of Team Tern Rock: what was asked, in whose hands, with what evidence. */
import type { Evidence, ProblemSettings } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { brakedMagnetEvidence } from './braked-magnet-evidence.ts';
import { brakedMagnetReport } from './braked-magnet-report.ts';
import { fallingCupsEvidence } from './falling-cups-evidence.ts';
import { fallingCupsReport } from './falling-cups-report.ts';
import { leaningSpoutEvidence } from './leaning-spout-evidence.ts';
import { leaningSpoutEditions, type DemoEdition } from './leaning-spout-past.ts';
import { leaningSpoutReport } from './leaning-spout-report.ts';

export interface DemoProblem {
  readonly number: number;
  readonly title: string;
  readonly statement: string;
  /** Verbs of the task, by id: claims of the evidence name them. */
  readonly tasks: readonly { readonly id: string; readonly text: string }[];
  /** Ids of people. */
  readonly owners: readonly string[];
  /** Evidence and report as they stand at the first start; null: nothing but the task so far. */
  readonly work: {
    readonly evidence: (firstStart: Date) => Evidence;
    readonly report: (evidence: Evidence) => ReportDocument;
    /** What was frozen before the first start, the oldest first. */
    readonly editions?: (firstStart: Date) => readonly DemoEdition[];
  } | null;
}

/** Settings of all of them. */
export const DEMO_SETTINGS: ProblemSettings = {
  k: 2,
  rounding: 'one or two digits',
  level: 0.95,
  paper: 'A4',
};

export const DEMO_PROBLEMS: readonly DemoProblem[] = [
  {
    number: 1,
    title: 'Leaning Spout',
    statement:
      'A tall can with a small hole in its side is filled with water and leaned. How far can its jet reach, and at which lean does it reach furthest?',
    tasks: [
      { id: 'task-reach', text: 'How far does the jet of a leaned can reach?' },
      { id: 'task-furthest', text: 'At which lean does it reach furthest?' },
      { id: 'task-limits', text: 'What sets the limits of the prediction?' },
    ],
    owners: ['demo-ines', 'demo-kasimir'],
    work: {
      evidence: leaningSpoutEvidence,
      report: leaningSpoutReport,
      editions: leaningSpoutEditions,
    },
  },
  {
    number: 4,
    title: 'Falling Cups',
    statement:
      'Light paper cups are nested and dropped with their mouths up. How does the steady speed depend on how many there are, and what does that say about the resistance of the air?',
    tasks: [
      { id: 'task-speed', text: 'How does the steady speed depend on the number of cups?' },
      { id: 'task-resistance', text: 'What does it say about the resistance of the air?' },
    ],
    owners: ['demo-maren', 'demo-petra'],
    work: { evidence: fallingCupsEvidence, report: fallingCupsReport },
  },
  {
    number: 6,
    title: 'Braked Magnet',
    statement:
      'A strong cylinder magnet falls slowly through a copper pipe. What sets its steady speed, and how well can it be foretold?',
    tasks: [
      { id: 'task-sets', text: 'What sets the steady speed?' },
      { id: 'task-foretold', text: 'How well can it be foretold?' },
    ],
    owners: ['demo-kasimir', 'demo-maren'],
    work: { evidence: brakedMagnetEvidence, report: brakedMagnetReport },
  },
  {
    number: 9,
    title: 'Stubborn Bubble',
    statement:
      'A bubble rises in a sealed tube of oil that is tilted. At which tilt does it rise fastest, and why?',
    tasks: [
      { id: 'task-tilt', text: 'At which tilt does the bubble rise fastest?' },
      { id: 'task-why', text: 'Why is that tilt the fastest?' },
    ],
    owners: ['demo-petra', 'demo-ines'],
    work: null,
  },
  {
    number: 12,
    title: 'Sand Roller',
    statement: 'A jar partly filled with sand is let go on a slope. It rolls, and may stop. Predict where.',
    tasks: [{ id: 'task-where', text: 'Where does the jar stop?' }],
    owners: ['demo-petra'],
    work: null,
  },
];
