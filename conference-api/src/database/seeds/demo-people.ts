import type { Discipline, Role } from '../../calc/vocabulary/people.js';

/** An invented network: no unit and no person of it exists. */
export const UNITS = {
  alder: { name: 'Alder Fell Hospital', contactEmail: 'letters.alder@kerfside.example' },
  wharf: { name: 'Wharf Road Hospital', contactEmail: 'letters.wharf@kerfside.example' },
  saltern: { name: 'Saltern Bay Hospital', contactEmail: 'letters.saltern@kerfside.example' },
} as const;
export type UnitKey = keyof typeof UNITS;

export type ConferenceKey = 'hip' | 'knee';

export interface DemoPerson {
  key: string;
  name: string;
  discipline: Discipline;
  unit: UnitKey;
  roles: Partial<Record<ConferenceKey, Role>>;
  isAdministrator?: boolean;
}

/** The key is the part of the e-mail address before the sign. */
export const PEOPLE: DemoPerson[] = [
  { key: 'surgeon', name: 'Imre Quillfeather', discipline: 'revision-surgery', unit: 'alder', roles: { hip: 'surgeon' } },
  { key: 'surgeon2', name: 'Odalys Brackwater', discipline: 'revision-surgery', unit: 'wharf', roles: { hip: 'surgeon', knee: 'panellist' } },
  { key: 'surgeon3', name: 'Teodor Lanthorne', discipline: 'revision-surgery', unit: 'saltern', roles: { hip: 'surgeon' } },
  { key: 'panellist', name: 'Wynne Hollowell', discipline: 'revision-surgery', unit: 'wharf', roles: { hip: 'panellist' } },
  { key: 'panellist2', name: 'Corvin Ashpole', discipline: 'revision-surgery', unit: 'saltern', roles: { hip: 'panellist', knee: 'chair' } },
  { key: 'microbiology', name: 'Bettina Orrery', discipline: 'infection-microbiology', unit: 'alder', roles: { hip: 'panellist', knee: 'panellist' } },
  { key: 'microbiology2', name: 'Jorun Pelisse', discipline: 'infection-microbiology', unit: 'saltern', roles: { hip: 'panellist' } },
  { key: 'radiology', name: 'Casimir Vantry', discipline: 'musculoskeletal-radiology', unit: 'alder', roles: { hip: 'panellist' } },
  { key: 'anaesthesia', name: 'Leocadia Thrupp', discipline: 'anaesthesia', unit: 'wharf', roles: { hip: 'panellist' } },
  { key: 'plastics', name: 'Ansel Mirrorby', discipline: 'plastic-surgery', unit: 'alder', roles: { hip: 'panellist' } },
  { key: 'vascular', name: 'Ottoline Graveney', discipline: 'vascular-surgery', unit: 'alder', roles: { hip: 'panellist' } },
  { key: 'theatre', name: 'Pim Sorrelway', discipline: 'theatre-nursing', unit: 'alder', roles: { hip: 'panellist' } },
  { key: 'physiotherapy', name: 'Hesper Dunnage', discipline: 'physiotherapy', unit: 'wharf', roles: { hip: 'panellist' } },
  { key: 'pharmacy', name: 'Rafe Inkersole', discipline: 'pharmacy', unit: 'saltern', roles: { hip: 'panellist' } },
  { key: 'chair', name: 'Philippa Stonecrop', discipline: 'revision-surgery', unit: 'alder', roles: { hip: 'chair' } },
  { key: 'coordinator', name: 'Marlo Fenwright', discipline: 'administration', unit: 'alder', roles: { hip: 'coordinator', knee: 'coordinator' } },
  { key: 'observer', name: 'Saskia Umberleigh', discipline: 'revision-surgery', unit: 'wharf', roles: { hip: 'observer' } },
  { key: 'observer2', name: 'Denholm Vire', discipline: 'musculoskeletal-radiology', unit: 'saltern', roles: { hip: 'observer' } },
  { key: 'outsider', name: 'Gideon Tarnbeck', discipline: 'revision-surgery', unit: 'saltern', roles: { knee: 'surgeon' } },
  { key: 'admin', name: 'Noor Caldecote', discipline: 'administration', unit: 'wharf', roles: {}, isAdministrator: true },
];
