/** The few real current functions by which one kind of wire answers at one frequency. */
export type OwnCurrents = { readonly count: number };
