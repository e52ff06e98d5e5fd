import axe from 'axe-core';

/** What needs a real layout and real colours; the journeys look at those in a browser. */
const NEEDS_A_BROWSER = [
  'color-contrast',
  'target-size',
  'scrollable-region-focusable',
  'label-content-name-mismatch',
];

/** Rules about whole pages, which a component alone is not. */
const NEEDS_A_PAGE = [
  'region',
  'landmark-one-main',
  'page-has-heading-one',
  'document-title',
  'html-has-lang',
];

// axe asks for the style of every element, which takes jsdom seconds on a machine with other things to do.
jest.setTimeout(60_000);

/** What axe finds wrong with the page as it stands: one line per rule and element. */
export async function accessibilityProblems(root: Element = document.body): Promise<string[]> {
  const off = [...NEEDS_A_BROWSER, ...NEEDS_A_PAGE];
  const { violations } = await axe.run(root, {
    resultTypes: ['violations'],
    rules: Object.fromEntries(off.map((rule) => [rule, { enabled: false }])),
  });
  return violations.flatMap(({ id, help, nodes }) =>
    nodes.map(({ html }) => `${id}: ${help}: ${html.slice(0, 200)}`),
  );
}
