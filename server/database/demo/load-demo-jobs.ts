import type { DemoContext } from './demo-context';

/** Loads the demo's jobs, platforms, layouts and parts. */
export async function loadDemoJobs(_context: DemoContext): Promise<void> {}
