/** What the sign-in form shows after it was sent: nothing of the password. */
export interface SignInState {
  email: string;
  /** what went wrong as a whole */
  message: string | null;
  /** what would be right, at its field */
  errors: { email?: string; password?: string };
}
