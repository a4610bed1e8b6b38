/** Why the server does not start: one line that names the variable, for people. */
export class StartRefusal extends Error {}
