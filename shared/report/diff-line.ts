/** One line of a comparison, ready to show; null where the side has no such value. */
export interface DiffLine {
  readonly id: string;
  readonly quantity: string;
  readonly before: string | null;
  readonly after: string | null;
  /** How it moved, in words: `−8.8 %`, `+10 K`, `added`, `none`. */
  readonly change: string;
  readonly kind: 'changed' | 'added' | 'removed' | 'same';
}
