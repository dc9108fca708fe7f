/** The signed-in person a request or socket acts for. */
export interface Actor {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  /** The session it acts in: signing out elsewhere leaves it alone. */
  readonly sessionId: string;
}
