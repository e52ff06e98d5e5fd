import type { Role } from '@/shared/api/fields';

/** The demo team; invented, like all that comes with the demo. */
export const DEMO_TEAM = 'Corrin Bay Harbour Authority, radio workshop';

/** Somebody of the demo. */
export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly roles: readonly Role[];
}

/** One invented person for each role, and one who holds several. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: 'Ilka Ferrow', email: 'integrator@example.com', roles: ['integrator'] },
  { name: 'Bram Oskell', email: 'reviewer@example.com', roles: ['reviewer'] },
  { name: 'Nesta Quill', email: 'approver@example.com', roles: ['approver'] },
  { name: 'Tarn Wexley', email: 'installer@example.com', roles: ['installer'] },
  { name: 'Maud Ardlan', email: 'administrator@example.com', roles: ['administrator'] },
  { name: 'Joss Penhale', email: 'workshop@example.com', roles: ['integrator', 'approver', 'installer'] },
];
