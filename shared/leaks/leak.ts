/** A place where an opponent may press. Everything here is computed; nobody sets a leak by hand. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';

/** What leaks are found in. */
export interface LeakGround {
  readonly evidence: Evidence;
  /** Of that evidence. */
  readonly findings: Findings;
  readonly document: ReportDocument;
}

/** The plain name of a leak, said at the head of its evidence. */
export type LeakName =
  | 'Left unexplained'
  | 'A claim without trials'
  | 'Named, not measured'
  | 'Outside trust'
  | 'Excluded trial'
  | 'Taken, not measured'
  | 'Not tied'
  | 'A condition not checked'
  | 'Few repeats';

/** How hard an opponent can press: below 4, below 7, from 7 on. */
export type LeakForce = 'trickle' | 'jet' | 'burst';

/** Where a leak is looked at and mended. */
export type LeakPlace =
  | { readonly kind: 'comparison'; readonly id: string }
  | { readonly kind: 'claim'; readonly id: string }
  | { readonly kind: 'quantity'; readonly id: string }
  | { readonly kind: 'model'; readonly id: string }
  | { readonly kind: 'trial'; readonly id: string }
  | { readonly kind: 'series'; readonly id: string }
  | { readonly kind: 'section'; readonly section: SectionName };

/** What a rule finds, before it is named and ordered. */
export interface FoundLeak {
  /** Ids of the rows it is about, without numbers: with the name they are the leak's identity. */
  readonly about: readonly string[];
  /** Where the vessel has its hole. */
  readonly section: SectionName;
  /** In the opponent's words, with the numbers. */
  readonly question: string;
  /** What the question rests on, in one sentence. */
  readonly evidence: string;
  /** What would mend it, in one sentence. */
  readonly mend: string;
  readonly place: LeakPlace;
  readonly pressure: number;
}

export interface Leak extends Omit<FoundLeak, 'about'> {
  /** Stays the same while the numbers move. */
  readonly id: string;
  readonly name: LeakName;
  readonly force: LeakForce;
  /** The numbers it rests on: when they change, a prepared answer is to be looked at again. */
  readonly basis: string;
}

/** One kind of leak. */
export interface LeakRule {
  readonly name: LeakName;
  /** Stable part of the identity; never shown. */
  readonly code: string;
  readonly find: (ground: LeakGround) => readonly FoundLeak[];
}
