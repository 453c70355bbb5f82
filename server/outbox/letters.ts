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
    };
