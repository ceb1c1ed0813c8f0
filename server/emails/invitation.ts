export type Letter = { to: string; subject: string; text: string };

/** The one-time link, in plain text: shop mail is read on phones and through filters. */
export function invitationMail(details: {
  to: string;
  name: string;
  shopName: string;
  inviter: string;
  link: string;
  days: number;
}): Letter {
  return {
    to: details.to,
    subject: `Your sign-in for ${details.shopName}`,
    text: `${details.name},

${details.inviter} has given you a sign-in for ${details.shopName}.

Open this link and choose a password. It works once and for ${details.days} days:

${details.link}

If you did not expect this, do nothing.
`,
  };
}
