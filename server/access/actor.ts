/** Who asks: the signed-in person. Rights in a survey come from the membership row, never from here. */
export interface Actor {
  readonly userId: string;
  readonly email: string;
  readonly name: string;
  readonly isAdmin: boolean;
  readonly sessionId: string;
}
