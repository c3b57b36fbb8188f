import { heading, link, paragraph } from './blocks.js';
import type { Template } from './template.js';

export interface CaseData {
  name: string;
  code: string;
  url: string;
}

export const caseReturned: Template<CaseData> = {
  needs: ['name', 'code', 'url'],
  render: ({ name, code, url }) => ({
    subject: `${code}: returned to you`,
    blocks: [
      heading(`${code} came back`),
      paragraph(`${name}, the coordinator has looked at the case and returned it to you with a remark. It is a draft again; mend it and post it once more.`),
      link('Read the remark', url),
    ],
  }),
};

export const caseReleased: Template<CaseData & { conference: string }> = {
  needs: ['name', 'code', 'conference', 'url'],
  render: ({ name, code, conference, url }) => ({
    subject: `${code}: open to the panel`,
    blocks: [
      heading(`${code} is open`),
      paragraph(`${name}, the case has been checked. The members of ${conference} can read it, comment and give their first ratings.`),
      link('Open the case', url),
    ],
  }),
};

export const questionAsked: Template<CaseData & { asker: string }> = {
  needs: ['name', 'code', 'asker', 'url'],
  render: ({ name, code, asker, url }) => ({
    subject: `${code}: a question to you`,
    blocks: [
      heading(`A question about ${code}`),
      paragraph(`${name}, ${asker} has put a question to you. It stays open until it is answered.`),
      link('Answer the question', url),
    ],
  }),
};

export const mention: Template<CaseData & { author: string }> = {
  needs: ['name', 'code', 'author', 'url'],
  render: ({ name, code, author, url }) => ({
    subject: `${code}: you are mentioned`,
    blocks: [heading(`A remark on ${code} names you`), paragraph(`${name}, ${author} has mentioned you in a remark.`), link('Read the remark', url)],
  }),
};

export const ratingDue: Template<CaseData> = {
  needs: ['name', 'code', 'url'],
  render: ({ name, code, url }) => ({
    subject: `${code}: your rating is due`,
    blocks: [
      heading(`Rate the options of ${code}`),
      paragraph(`${name}, the first round of ratings is open. What others gave is shown once your own rating is in.`),
      link('Rate the options', url),
    ],
  }),
};
