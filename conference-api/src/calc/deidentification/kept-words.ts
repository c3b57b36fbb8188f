/**
 * The words that may stay in attributes whose values are otherwise free. What is not listed is left out;
 * nothing that the room or a measurement needs depends on it.
 */

/** PS3.3 C.7.3.1.1.1, those that make pictures. */
export const MODALITIES = ['CR', 'CT', 'DX', 'ES', 'GM', 'IO', 'MG', 'MR', 'NM', 'OP', 'OT', 'PT', 'PX', 'RF', 'RG', 'SC', 'US', 'XA', 'XC'];

/** PS3.16 annex L, those of the musculoskeletal system and of what lies around it (from memory). */
export const BODY_PARTS = [
  ...['ABDOMEN', 'ABDOMENPELVIS', 'ACETABULUM', 'ANKLE', 'ARM', 'CALCANEUS', 'CHEST', 'CLAVICLE', 'COCCYX', 'CSPINE', 'CTSPINE', 'ELBOW'],
  ...['EXTREMITY', 'FEMUR', 'FIBULA', 'FINGER', 'FOOT', 'FOREARM', 'HAND', 'HEAD', 'HIP', 'HUMERUS', 'ILIUM', 'ISCHIUM', 'KNEE', 'LEG'],
  ...['LOWERLEG', 'LSPINE', 'LSSPINE', 'PATELLA', 'PELVIS', 'PUBIS', 'RADIUS', 'RADIUSULNA', 'RIB', 'SACRUM', 'SCAPULA', 'SHOULDER', 'SIJOINT'],
  ...['SKULL', 'SPINE', 'SSPINE', 'STERNUM', 'THIGH', 'THUMB', 'TIBIA', 'TIBIAFIBULA', 'TLSPINE', 'TOE', 'TSPINE', 'ULNA', 'UPRLIMB', 'WHOLEBODY'],
  'WRIST',
];

/** PS3.3 C.8.1.1 (AP to RLO); the others are common practice, no source. */
export const VIEW_POSITIONS = [
  ...['AP', 'PA', 'LL', 'RL', 'RLD', 'LLD', 'RLO', 'LLO'],
  ...['LAT', 'LATERAL', 'OBL', 'OBLIQUE', 'AXIAL', 'FROG', 'INLET', 'OUTLET', 'JUDET', 'SKYLINE'],
];

/** PS3.3 C.7.3.1.1.2. */
export const PATIENT_POSITIONS = [
  'HFP',
  'HFS',
  'HFDR',
  'HFDL',
  'FFDR',
  'FFDL',
  'FFP',
  'FFS',
  'LFP',
  'LFS',
  'RFP',
  'RFS',
  'AFDR',
  'AFDL',
  'PFDR',
  'PFDL',
];

/** Third and later values of Image Type: PS3.3 C.8.2.1, C.8.3.1, C.8.16.1 and the like. */
export const IMAGE_TYPES = [
  ...['AXIAL', 'LOCALIZER', 'SCOUT', 'MPR', 'REFORMATTED', 'PROJECTION IMAGE', 'RESAMPLED', 'VOLUME', 'MIN_IP', 'MAX_IP', 'AVERAGE', 'NONE'],
  ...[
    'M_SE',
    'M_FFE',
    'MPR',
    'OTHER',
    'SINGLE PLANE',
    'BIPLANE A',
    'BIPLANE B',
    'SINGLE A',
    'SINGLE B',
    'MIXED',
    'T1',
    'T2',
    'STIR',
    'PROTON_DENSITY',
  ],
];

/** PS3.3 C.11.1.1.2 and C.7.6.16.2.9. */
export const RESCALE_TYPES = ['OD', 'HU', 'US', 'MGML', 'Z_EFF', 'ED', 'EDW', 'HU_MOD', 'PCT'];

/** PS3.3 C.7.6.1.1.5.1. */
export const LOSSY_METHODS = ['ISO_10918_1', 'ISO_14495_1', 'ISO_15444_1', 'ISO_15444_15'];

/** PS3.3 C.7.6.3.1.2, those of pictures that are read here. */
export const PHOTOMETRIC = ['MONOCHROME1', 'MONOCHROME2', 'PALETTE COLOR', 'RGB', 'YBR_FULL', 'YBR_FULL_422', 'YBR_ICT', 'YBR_RCT'];

/** PS3.3 C.8.6.1. */
export const CONVERSIONS = ['DV', 'DI', 'DF', 'WSD', 'SD', 'SI', 'DRW', 'SYN'];
