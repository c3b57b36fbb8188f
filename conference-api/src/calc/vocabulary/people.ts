/** Roles that a person can hold in a conference. */
export const ROLES = ['surgeon', 'panellist', 'chair', 'coordinator', 'observer'] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_WORDS: Record<Role, string> = {
  surgeon: 'Surgeon',
  panellist: 'Panellist',
  chair: 'Chair',
  coordinator: 'Coordinator',
  observer: 'Observer',
};

export const DISCIPLINES = [
  'revision-surgery',
  'infection-microbiology',
  'musculoskeletal-radiology',
  'anaesthesia',
  'plastic-surgery',
  'vascular-surgery',
  'theatre-nursing',
  'physiotherapy',
  'pharmacy',
  'administration',
] as const;
export type Discipline = (typeof DISCIPLINES)[number];

export const DISCIPLINE_WORDS: Record<Discipline, string> = {
  'revision-surgery': 'Revision surgery',
  'infection-microbiology': 'Infection and microbiology',
  'musculoskeletal-radiology': 'Musculoskeletal radiology',
  anaesthesia: 'Anaesthesia',
  'plastic-surgery': 'Plastic surgery',
  'vascular-surgery': 'Vascular surgery',
  'theatre-nursing': 'Theatre nursing',
  physiotherapy: 'Physiotherapy',
  pharmacy: 'Pharmacy',
  administration: 'Administration',
};

/** Roles whose ratings count. */
export const RATING_ROLES: readonly Role[] = ['surgeon', 'panellist', 'chair'];
