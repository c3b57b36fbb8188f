import { createContext, useContext } from 'react';
import type { Schemas } from '@/lib/api/types';
import { fieldPlace } from './binding';

type Finding = Schemas['IdentifierFindingDto'];

/** What looks like an identifier, by the place of its field: shown at the field while one writes. */
export const FindingsContext = createContext<ReadonlyMap<string, Finding[]>>(new Map());

export function findingsByPlace(findings: Finding[]): ReadonlyMap<string, Finding[]> {
  const places = new Map<string, Finding[]>();
  for (const finding of findings) {
    const place = fieldPlace(finding.section, finding.path);
    places.set(place, [...(places.get(place) ?? []), finding]);
  }
  return places;
}

export const useFindingsAt = (place: string): Finding[] => useContext(FindingsContext).get(place) ?? [];
