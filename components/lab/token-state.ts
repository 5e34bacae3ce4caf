/** What the form for a new token shows after it was sent. */
export interface CreateTokenState {
  /** counts the answers, so that the fields start anew with each */
  answer: number;
  /** the token, shown this once */
  token: string | null;
  message: string | null;
  /** what would be right, at its field */
  errors: { name?: string; scopes?: string; days?: string };
  /** what was typed, where it has to be corrected */
  typed: { name: string; scopes: string[]; days: string };
}

export const FIRST_TOKEN_STATE: CreateTokenState = {
  answer: 0,
  token: null,
  message: null,
  errors: {},
  typed: { name: '', scopes: ['read-drafts', 'write-drafts'], days: '90' },
};
