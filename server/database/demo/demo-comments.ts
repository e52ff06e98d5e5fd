import type { CommentTarget } from '@/shared/api/comments';

/** A comment of the demo with its thread; people by their addresses, antennas by their marks. */
export interface DemoComment {
  /** The job whose first layout it is on. */
  readonly job: string;
  readonly target:
    Extract<CommentTarget, { kind: 'spot' }> | { readonly kind: 'antenna'; readonly label: string };
  readonly by: string;
  readonly text: string;
  readonly replies: readonly { readonly by: string; readonly text: string }[];
  /** Who resolved it; null while it is open. */
  readonly resolvedBy: string | null;
}

const INTEGRATOR = 'integrator@example.com';
const REVIEWER = 'reviewer@example.com';
const APPROVER = 'approver@example.com';
const WORKSHOP = 'workshop@example.com';

/** What the people of the demo have said so far; numbered per layout in this order. */
export const DEMO_COMMENTS: readonly DemoComment[] = [
  {
    job: 'Patrol van',
    target: { kind: 'antenna', label: 'A2' },
    by: REVIEWER,
    text: 'This one went into the old hole right beside A3. Is there room for it over the cab?',
    replies: [
      {
        by: INTEGRATOR,
        text: 'There should be. The old hole can take a blind grommet. I will try it further forward.',
      },
    ],
    resolvedBy: null,
  },
  {
    job: 'Patrol van',
    target: { kind: 'spot', x: 0.9, y: 0.1 },
    by: WORKSHOP,
    text: 'Is there a cross member under here?',
    replies: [
      { by: INTEGRATOR, text: 'Looked from inside: it runs a hand further back, the panel is free here.' },
    ],
    resolvedBy: WORKSHOP,
  },
  {
    job: 'Harbour office',
    target: { kind: 'antenna', label: 'A1' },
    by: APPROVER,
    text: 'Who keeps people away from this one while it transmits? The roof door is not locked during the day.',
    replies: [{ by: INTEGRATOR, text: 'The caretaker is asked about a lock and a sign at the door.' }],
    resolvedBy: null,
  },
];
