import type { ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { Schemas } from '@/lib/api/types';

type Version = Schemas['CaseVersionDto'];

/** Versions that one person saved in one go: with saving as one types there are many to a sitting. */
export interface VersionGroup {
  author: Version['author'];
  first: number;
  last: number;
  startedAt: string;
  endedAt: string;
  sections: ContentSection[];
}

/** A longer pause begins a new sitting. */
const PAUSE_MS = 30 * 60 * 1000;

/** Newest first, as the API gives them. */
export function groupVersions(versions: Version[]): VersionGroup[] {
  const groups: VersionGroup[] = [];
  for (const { version, at, author, sections } of versions) {
    const group = groups.at(-1);
    if (group && group.author.id === author.id && Date.parse(group.startedAt) - Date.parse(at) <= PAUSE_MS) {
      group.first = version;
      group.startedAt = at;
      group.sections = [...new Set([...sections, ...group.sections])];
    } else {
      groups.push({ author, first: version, last: version, startedAt: at, endedAt: at, sections: [...sections] });
    }
  }
  return groups;
}
