/** One measured figure of `npm run bench`; names and units as in the list of figures of DEVELOPERS.md. */
export type Figure = {
  readonly name: string;
  readonly unit: string;
  readonly group: 'em' | 'radio' | 'canvas' | 'web' | 'live' | 'start';
  measure(): Promise<number>;
};
