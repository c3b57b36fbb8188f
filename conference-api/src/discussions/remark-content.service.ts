import { Injectable } from '@nestjs/common';
import { type EntityManager, In } from 'typeorm';
import { type FindingKind, screenIdentifiers } from '../calc/identifiers/identifier-screen.js';
import { readRichText } from '../calc/rich-text/rich-text.js';
import { mentionedIds, richTextPlain, withMentionNames } from '../calc/rich-text/rich-text-words.js';
import type { RichText } from '../calc/vocabulary/discussions.js';
import type { Case } from '../cases/entities/case.entity.js';
import { invalid, Problem } from '../common/problems/problem.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import type { Person } from '../people/entities/person.entity.js';

/** What was sent, as it may be kept. */
export interface RemarkContent {
  content: RichText;
  plainText: string;
  mentioned: Person[];
}

@Injectable()
export class RemarkContentService {
  /** Checks against the editor's schema, names the mentioned, and refuses what surely identifies a patient. */
  async read(manager: EntityManager, found: Case, sent: unknown): Promise<RemarkContent> {
    const checked = readRichText(sent);
    refuseIdentifiers(richTextPlain(checked, { mentions: false }));
    const mentioned = await this.findMentioned(manager, found, mentionedIds(checked));
    const content = withMentionNames(checked, new Map(mentioned.map((person) => [person.id, person.name])));
    return { content, plainText: richTextPlain(content), mentioned };
  }

  // every member may see a case that can be commented on, so membership is the whole question
  private async findMentioned(manager: EntityManager, found: Case, ids: string[]): Promise<Person[]> {
    if (!ids.length) return [];
    const members = await manager.find(Membership, {
      where: { conferenceId: found.conferenceId, personId: In(ids), person: { isActive: true } },
      relations: { person: true },
    });
    if (members.length < ids.length)
      throw invalid('content', 'mention', 'Only members of the case’s conference can be mentioned: take the other mentions out.');
    return members.map(({ person }) => person);
  }
}

// an address on the web is named to point at a paper, not at a patient
const NO_PATIENTS: readonly FindingKind[] = ['url', 'ip-address'];

function refuseIdentifiers(text: string): void {
  const certain = screenIdentifiers({ text }).findings.filter(({ kind, strength }) => strength === 'certain' && !NO_PATIENTS.includes(kind));
  if (!certain.length) return;
  const errors = certain.map((finding) => ({
    field: 'content',
    code: 'identifier',
    message: `'${finding.text}' looks like an identifier (${finding.kind}). Take it out; say a date as an interval.`,
  }));
  throw new Problem('invalid', errors[0]!.message, errors);
}
