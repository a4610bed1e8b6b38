/** The signed-in person on whose behalf something is done. */
export interface Actor {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly administrator: boolean;
}

/** Who does something, when, and by which request. `actor` is null for the server itself. */
export interface Act<A extends Actor | null = Actor | null> {
  readonly actor: A;
  readonly requestId: string;
  readonly atMs: number;
}
