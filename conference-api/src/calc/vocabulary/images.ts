export const PROJECTIONS = ['ap-pelvis', 'ap', 'lateral', 'oblique', 'ct', 'photograph', 'other'] as const;
export type Projection = (typeof PROJECTIONS)[number];
export const PROJECTION_WORDS: Record<Projection, string> = {
  'ap-pelvis': 'AP pelvis',
  ap: 'AP',
  lateral: 'Lateral',
  oblique: 'Oblique',
  ct: 'CT slice',
  photograph: 'Photograph',
  other: 'Other',
};
export type ImageState = 'storing' | 'ready' | 'removed';
export const IMAGE_SIZES = ['thumb', 'view', 'full'] as const;
export type ImageSize = (typeof IMAGE_SIZES)[number];
