/** Letters the product sends, one outbox row for each recipient. Tokens are in the link and nowhere else. */
export type Letter =
  | { letter: 'password-reset'; to: string; displayName: string; token: string }
  | { letter: 'shop-invitation'; to: string; invitedBy: string; shopName: string; role: string; token: string }
  | {
      letter: 'commission-invitation';
      to: string;
      invitedBy: string;
      commissionTitle: string;
      roles: string[];
      token: string;
    }
  /** Nothing is sent: the row that takes the place of a letter, so that an answer takes as long without an account. */
  | { letter: 'none'; to: string };
