import { link, note, paragraph, heading } from './blocks.js';
import { momentIn } from './dates.js';
import type { Template } from './template.js';

const until = (expires: string) => momentIn(new Date(expires), 'UTC');

export interface InvitationData {
  name: string;
  unit: string;
  conferences: string[];
  url: string;
  expires: string;
}

export const invitation: Template<InvitationData> = {
  needs: ['name', 'unit', 'conferences', 'url', 'expires'],
  secrets: ['url'],
  render: ({ name, unit, conferences, url, expires }) => ({
    subject: 'Invitation to Kerfside',
    blocks: [
      heading('You are invited'),
      paragraph(`${name}, an administrator has made an account for you at ${unit}.`),
      ...(conferences.length ? [paragraph(`You are a member of: ${conferences.join(', ')}.`)] : []),
      paragraph('Accept the invitation by choosing a password.'),
      link('Accept the invitation', url),
      paragraph(`The link works once, until ${until(expires)}.`),
      note('If you do not expect this invitation, do nothing: without a password nobody can sign in.'),
    ],
  }),
};

export interface PasswordResetData {
  name: string;
  url: string;
  expires: string;
}

export const passwordReset: Template<PasswordResetData> = {
  needs: ['name', 'url', 'expires'],
  secrets: ['url'],
  render: ({ name, url, expires }) => ({
    subject: 'Set a new password',
    blocks: [
      heading('Set a new password'),
      paragraph(`${name}, somebody has asked for a new password for your account.`),
      link('Set a new password', url),
      paragraph(`The link works once, until ${until(expires)}.`),
      note('If it was not you, do nothing: the password stays as it is. If it happens again, tell the administrator.'),
    ],
  }),
};
