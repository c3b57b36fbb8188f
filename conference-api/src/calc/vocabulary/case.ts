export const STAGES = ['draft', 'checking', 'open', 'listed', 'decided', 'final', 'reported', 'withdrawn'] as const;
export type Stage = (typeof STAGES)[number];

export const STAGE_WORDS: Record<Stage, string> = {
  draft: 'Draft',
  checking: 'Being checked',
  open: 'Open',
  listed: 'Listed',
  decided: 'Decided',
  final: 'Final',
  reported: 'Reported',
  withdrawn: 'Withdrawn',
};

export const JOINTS = ['hip', 'knee'] as const;
export type Joint = (typeof JOINTS)[number];
export const JOINT_WORDS: Record<Joint, string> = { hip: 'Hip', knee: 'Knee' };

export const SIDES = ['left', 'right'] as const;
export type Side = (typeof SIDES)[number];
export const SIDE_WORDS: Record<Side, string> = { left: 'Left', right: 'Right' };

export const URGENCIES = ['routine', 'soon', 'urgent'] as const;
export type Urgency = (typeof URGENCIES)[number];
export const URGENCY_WORDS: Record<Urgency, string> = { routine: 'Routine', soon: 'Soon', urgent: 'Urgent' };

/** The numbered sections of the sheet, in their order. */
export const SECTIONS = ['heading', 'patient', 'history', 'implants', 'infection', 'bone', 'images', 'plan', 'options'] as const;
export type Section = (typeof SECTIONS)[number];
export const SECTION_WORDS: Record<Section, string> = {
  heading: 'Question',
  patient: 'Patient',
  history: 'History',
  implants: 'Implants in place',
  infection: 'Infection work-up',
  bone: 'Bone and position',
  images: 'Images',
  plan: 'Removal plan',
  options: 'Options',
};
