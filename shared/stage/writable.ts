/** What holds figures that are written again for every sample. */
export type Writable<T> = { -readonly [K in keyof T]: T[K] };
