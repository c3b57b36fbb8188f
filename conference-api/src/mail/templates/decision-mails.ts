import { FINAL_DECISION_WORDS, type FinalDecisionKind } from '../../calc/vocabulary/decisions.js';
import { type Block, heading, link, note, paragraph } from './blocks.js';
import type { CaseData } from './case-mails.js';
import type { Template } from './template.js';

const CAUTION: Block = note(
  'The panel advises. The treating team decides, with the patient, the makers’ instructions and local policy. Act on the signed record itself, never on this mail.',
);

export interface DecisionSignedData extends CaseData {
  number: number;
  version: number;
  conference: string;
  kind: 'decision' | 'advice';
  amended: boolean;
}

export const decisionSigned: Template<DecisionSignedData> = {
  needs: ['name', 'code', 'number', 'version', 'conference', 'kind', 'url', 'amended'],
  render: ({ name, code, number, version, conference, kind, url, amended }) => {
    const what = kind === 'advice' ? 'Advice' : 'Decision';
    return {
      subject: `${code}: ${what.toLowerCase()} ${number} signed`,
      blocks: [
        heading(`${what} ${number} on ${code}`),
        paragraph(
          amended
            ? `${name}, the chair of ${conference} has signed version ${version}, which replaces the one before it and says why.`
            : `${name}, the chair of ${conference} has signed what the panel agreed.`,
        ),
        ...(kind === 'advice' ? [paragraph('There was no quorum: it is advice, not a decision of the conference.')] : []),
        link('Read the signed record', url),
        CAUTION,
      ],
    };
  },
};

export const finalDecisionDue: Template<CaseData> = {
  needs: ['name', 'code', 'url'],
  render: ({ name, code, url }) => ({
    subject: `${code}: your final decision is due`,
    blocks: [
      heading(`What will you do in ${code}?`),
      paragraph(`${name}, the conference has signed its decision. As the treating surgeon, record what you will do: as agreed, with variation, or not proceeding.`),
      link('Record the final decision', url),
      CAUTION,
    ],
  }),
};

export const finalDecision: Template<CaseData & { kind: FinalDecisionKind }> = {
  needs: ['name', 'code', 'kind', 'url'],
  render: ({ name, code, kind, url }) => ({
    subject: `${code}: final decision recorded`,
    blocks: [
      heading(`Final decision on ${code}`),
      paragraph(`${name}, the treating surgeon has recorded the final decision: ${FINAL_DECISION_WORDS[kind].toLowerCase()}.`),
      link('Open the case', url),
      CAUTION,
    ],
  }),
};
