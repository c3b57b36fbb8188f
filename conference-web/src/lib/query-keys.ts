/**
 * The key of everything that is asked of the API, in one place, since live events name what changed by these.
 * All of one case stands under `cases.all(id)`, so one invalidation reaches its remarks, images and ratings.
 */
export const keys = {
  me: ['me'] as const,
  sessions: ['sessions'] as const,
  unread: ['unread'] as const,
  cases: {
    lists: ['cases', 'list'] as const,
    list: (filter: object) => ['cases', 'list', filter] as const,
    everything: ['cases'] as const,
    all: (id: string) => ['cases', 'one', id] as const,
    one: (id: string) => ['cases', 'one', id, 'case'] as const,
    readiness: (id: string) => ['cases', 'one', id, 'readiness'] as const,
    identifiers: (id: string) => ['cases', 'one', id, 'identifiers'] as const,
    versions: (id: string) => ['cases', 'one', id, 'versions'] as const,
    differences: (id: string, version: number, since?: number) => ['cases', 'one', id, 'versions', version, since ?? null] as const,
    images: (id: string) => ['cases', 'one', id, 'images'] as const,
    threads: (id: string) => ['cases', 'one', id, 'threads'] as const,
    rounds: (id: string) => ['cases', 'one', id, 'rounds'] as const,
    decisions: (id: string) => ['cases', 'one', id, 'decisions'] as const,
    finalDecisions: (id: string) => ['cases', 'one', id, 'final-decisions'] as const,
    outcomes: (id: string) => ['cases', 'one', id, 'outcomes'] as const,
    audit: (id: string) => ['cases', 'one', id, 'audit'] as const,
  },
  remarkVersions: (id: string) => ['remarks', id, 'versions'] as const,
  meetings: {
    everything: ['meetings'] as const,
    list: (filter: object) => ['meetings', 'list', filter] as const,
    one: (id: string) => ['meetings', 'one', id] as const,
    listable: (id: string) => ['meetings', 'one', id, 'listable'] as const,
  },
  decisions: {
    everything: ['decisions'] as const,
    list: (conferenceId: string) => ['decisions', 'list', conferenceId] as const,
    one: (id: string) => ['decisions', 'one', id] as const,
    check: (id: string) => ['decisions', 'one', id, 'check'] as const,
  },
  conferences: {
    everything: ['conferences'] as const,
    list: ['conferences', 'list'] as const,
    one: (id: string) => ['conferences', 'one', id] as const,
    members: (id: string) => ['conferences', 'one', id, 'members'] as const,
  },
  people: {
    everything: ['people'] as const,
    list: (filter: object) => ['people', 'list', filter] as const,
    one: (id: string) => ['people', 'one', id] as const,
  },
  units: ['units'] as const,
  mails: ['mail'] as const,
  mail: (filter: object) => ['mail', filter] as const,
  audit: (filter: object) => ['audit', filter] as const,
  invitation: (token: string) => ['invitation', token] as const,
};
