import type { Schemas } from '@/lib/api/types';
import { groupVersions } from './version-groups';

const person = (id: string): Schemas['PersonRefDto'] => ({ id, name: id, discipline: 'revision-surgery', unit: 'Unit' });
const version = (number: number, at: string, author: string, ...sections: Schemas['CaseVersionDto']['sections']) => ({
  version: number,
  at: `2026-12-07T${at}:00.000Z`,
  author: person(author),
  sections,
});

describe('versions in sittings', () => {
  const newestFirst = [
    version(6, '12:00', 'ada', 'plan'),
    version(5, '10:40', 'ben', 'options'),
    version(4, '10:35', 'ada', 'plan'),
    version(3, '10:10', 'ada', 'bone', 'plan'),
    version(2, '09:45', 'ada', 'patient'),
    version(1, '08:00', 'ada'),
  ];
  const groups = groupVersions(newestFirst);

  it('puts together what one person saved without a long pause', () => {
    expect(groups.map(({ author, first, last }) => [author.id, first, last])).toEqual([
      ['ada', 6, 6],
      ['ben', 5, 5],
      ['ada', 2, 4],
      ['ada', 1, 1],
    ]);
  });

  it('names all sections of a sitting once, and when it began and ended', () => {
    expect(groups[2]).toMatchObject({ startedAt: '2026-12-07T09:45:00.000Z', endedAt: '2026-12-07T10:35:00.000Z' });
    expect([...groups[2]!.sections].sort()).toEqual(['bone', 'patient', 'plan']);
  });

  it('makes nothing of nothing', () => expect(groupVersions([])).toEqual([]));
});
