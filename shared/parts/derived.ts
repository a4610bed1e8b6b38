/** What a record gives a stage, or in one sentence why it gives nothing. */
export type Derived<T> =
  | {
      readonly ok: true;
      readonly data: T;
      /** What the record does not print and was assumed, or had to stay behind; to be shown. */
      readonly remarks: readonly string[];
    }
  | { readonly ok: false; readonly reason: string };

/** A refusal to derive. */
export const refused = (reason: string): { readonly ok: false; readonly reason: string } => ({
  ok: false,
  reason,
});

/** A product of printed figures without the dust of binary fractions: 0.7·24 is 16.8. */
export const clean = (value: number): number => Number(value.toPrecision(12));
