import type { LayoutDocument } from '../document';
import { demoDocument } from './demo-layout';
import { DEMO_ROOF } from './demo-roof';
import { DEMO_TRACKER } from './demo-tracker';
import { DEMO_VAN } from './demo-van';

/** A job of the demo scenario with all that the server's loader needs. Everything in it is invented. */
export type DemoJob = {
  readonly name: string;
  readonly customer: string;
  readonly platforms: readonly {
    readonly name: string;
    readonly layouts: readonly { readonly name: string; readonly document: LayoutDocument }[];
  }[];
};

const CUSTOMER = 'Corrin Bay Harbour Authority';

/** The three jobs of the demo scenario; the shelf beside them is `STARTER_PARTS`. */
export const DEMO_JOBS: readonly DemoJob[] = [
  {
    name: 'Patrol van',
    customer: CUSTOMER,
    platforms: [{ name: 'Roof', layouts: [{ name: 'Layout 1', document: demoDocument(DEMO_VAN) }] }],
  },
  {
    name: 'Harbour office',
    customer: CUSTOMER,
    platforms: [{ name: 'Office roof', layouts: [{ name: 'Layout 1', document: demoDocument(DEMO_ROOF) }] }],
  },
  {
    name: "Pilot's tracker",
    customer: CUSTOMER,
    platforms: [{ name: 'Board', layouts: [{ name: 'Layout 1', document: demoDocument(DEMO_TRACKER) }] }],
  },
];
