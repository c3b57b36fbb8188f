import { type InvitationData, type PasswordResetData, invitation, passwordReset } from './account-mails.js';
import { type AgendaData, agenda } from './agenda-mail.js';
import { type CaseData, caseReleased, caseReturned, mention, questionAsked, ratingDue } from './case-mails.js';
import { decisionSigned, type DecisionSignedData, finalDecision, finalDecisionDue } from './decision-mails.js';
import type { FinalDecisionKind } from '../../calc/vocabulary/decisions.js';
import type { MailContent, Template } from './template.js';

/** Every kind of mail with what its outbox row must hold. */
export interface TemplateData {
  invitation: InvitationData;
  'password-reset': PasswordResetData;
  agenda: AgendaData;
  'case-returned': CaseData;
  'case-released': CaseData & { conference: string };
  'question-asked': CaseData & { asker: string };
  mention: CaseData & { author: string };
  'rating-due': CaseData;
  'decision-signed': DecisionSignedData;
  'final-decision-due': CaseData;
  'final-decision': CaseData & { kind: FinalDecisionKind };
}

export type TemplateName = keyof TemplateData;

const TEMPLATES: { [Name in TemplateName]: Template<TemplateData[Name]> } = {
  invitation,
  'password-reset': passwordReset,
  agenda,
  'case-returned': caseReturned,
  'case-released': caseReleased,
  'question-asked': questionAsked,
  mention,
  'rating-due': ratingDue,
  'decision-signed': decisionSigned,
  'final-decision-due': finalDecisionDue,
  'final-decision': finalDecision,
};

export const TEMPLATE_NAMES = Object.keys(TEMPLATES) as TemplateName[];

type AnyTemplate = Template<Record<string, unknown>>;

const templateOf = (name: string): AnyTemplate | undefined =>
  Object.hasOwn(TEMPLATES, name) ? (TEMPLATES[name as TemplateName] as unknown as AnyTemplate) : undefined;

/** Throws for an unknown template or missing data; the message holds names only, never what a field says. */
export function renderTemplate(name: string, data: Record<string, unknown>): MailContent {
  const template = templateOf(name);
  if (!template) throw new Error(`there is no mail template ${name}`);
  const missing = template.needs.filter((key) => data[key] === undefined || data[key] === null);
  if (missing.length) throw new Error(`the mail template ${name} lacks ${missing.join(', ')}`);
  const content = template.render(data);
  // a line break in a subject would begin another header
  return { ...content, subject: content.subject.replace(/[\s\p{Cc}]+/gu, ' ').trim().slice(0, 200) };
}

/** The data of a sent mail, without links that let somebody in. */
export function withoutSecrets(name: string, data: Record<string, unknown>): Record<string, unknown> {
  const secrets = templateOf(name)?.secrets ?? [];
  return Object.fromEntries(Object.entries(data).map(([key, value]) => [key, secrets.includes(key) ? null : value]));
}
