import { IsString, Matches, MaxLength } from 'class-validator';
import { CHARLSON_CONDITION_NAMES } from '../../calc/vocabulary/comorbidities.js';
import { JOINTS, SIDES, URGENCIES } from '../../calc/vocabulary/case.js';
import * as words from '../../calc/vocabulary/case-content.js';
import {
  OptionalFlag,
  OptionalInteger,
  OptionalList,
  OptionalNames,
  OptionalNumber,
  OptionalOneOf,
  OptionalText,
  RequiredInteger,
  RequiredOneOf,
} from '../../common/validation/fields.js';

const SHORT = 200;
const LONG = 6000;

/** An item of a list that threads and versions can point at. */
class Identified {
  /** Made by the page; stays with the item. */
  @IsString()
  @Matches(/^[A-Za-z0-9_-]{1,40}$/)
  id: string;
}

export class HeadingDto implements words.Heading {
  @OptionalText(160) title?: string;
  @OptionalOneOf(SIDES) side?: words.Heading['side'];
  @OptionalOneOf(JOINTS) joint?: words.Heading['joint'];
  @OptionalText(LONG) question?: string;
  @OptionalOneOf(URGENCIES) urgency?: words.Heading['urgency'];
  @OptionalText(1000) urgencyReason?: string;
}

export class PatientDto implements words.Patient {
  /** Completed years; 90 and over is kept as 90. */
  @OptionalInteger(0, 130) ageYears?: number | null;
  @OptionalOneOf(words.SEX) sex?: words.Patient['sex'];
  @OptionalOneOf(words.BMI_BAND) bmiBand?: words.Patient['bmiBand'];
  @OptionalOneOf(words.ASA) asa?: words.Patient['asa'];
  @OptionalNames(CHARLSON_CONDITION_NAMES) comorbidities?: string[];
  @OptionalText(LONG) comorbidityNote?: string;
  @OptionalText(SHORT) metalAllergy?: string;
  @OptionalText(SHORT) cementAllergy?: string;
  @OptionalText(SHORT) antibioticAllergy?: string;
  @OptionalOneOf(words.ANTICOAGULATION) anticoagulation?: words.Patient['anticoagulation'];
  @OptionalText(SHORT) anticoagulationNote?: string;
  @OptionalText(LONG) function?: string;
}

export class EarlierOperationDto extends Identified implements words.EarlierOperation {
  @IsString() @MaxLength(SHORT) interval: string;
  @IsString() @MaxLength(1000) procedure: string;
}

export class HistoryDto implements words.History {
  @OptionalText(1000) indexDiagnosis?: string;
  @OptionalText(SHORT) indexInterval?: string;
  @OptionalList(() => EarlierOperationDto, 30) operations?: EarlierOperationDto[];
  @OptionalNames(words.REASON_FOR_REVISION) reasons?: words.History['reasons'];
  @OptionalText(LONG) course?: string;
}

export class ScrewDto extends Identified implements words.Screw {
  @OptionalInteger(1, 12) hour?: number | null;
  @OptionalOneOf(words.QUADRANT) quadrant?: words.Screw['quadrant'];
  @OptionalNumber(5, 120) lengthMm?: number | null;
  @OptionalOneOf(words.HEAD_DRIVE) headDrive?: words.Screw['headDrive'];
  @OptionalFlag() tipInsidePelvis?: boolean | null;
}

export class ImplantPartDto extends Identified implements words.ImplantPart {
  @RequiredOneOf(words.PART) part: words.ImplantPart['part'];
  @OptionalOneOf(words.FIXATION) fixation?: words.ImplantPart['fixation'];
  @OptionalOneOf(words.MATERIAL) material?: words.ImplantPart['material'];
  @OptionalText(SHORT) maker?: string;
  @OptionalText(SHORT) model?: string;
  @OptionalNumber(0, 400) sizeMm?: number | null;
  @OptionalOneOf(words.CERTAINTY) certainty?: words.ImplantPart['certainty'];
  @OptionalOneOf(words.KNOWN_FROM) knownFrom?: words.ImplantPart['knownFrom'];
  @OptionalNumber(20, 100) outerDiameterMm?: number | null;
  @OptionalNumber(10, 80) innerDiameterMm?: number | null;
  @OptionalNumber(0, 40) thicknessMm?: number | null;
  @OptionalOneOf(words.THICKNESS_CLASS) thicknessClass?: words.ImplantPart['thicknessClass'];
  @OptionalOneOf(words.SHELL_SHAPE) shape?: words.ImplantPart['shape'];
  @OptionalFlag() screwHoles?: boolean | null;
  @OptionalList(() => ScrewDto, 20) screws?: ScrewDto[];
  @OptionalOneOf(words.LINER_KIND) linerKind?: words.ImplantPart['linerKind'];
  @OptionalText(SHORT) locking?: string;
  @OptionalText(1000) note?: string;
}

export class ImplantsDto {
  @OptionalList(() => ImplantPartDto, 20) parts?: ImplantPartDto[];
}

export class CultureDto extends Identified implements words.Culture {
  @IsString() @MaxLength(SHORT) specimen: string;
  @IsString() @MaxLength(SHORT) result: string;
  @OptionalText(SHORT) organism?: string;
  @OptionalText(1000) sensitivities?: string;
}

export class InfectionWorkUpDto implements words.InfectionWorkUp {
  @OptionalOneOf(words.SUSPICION) suspicion?: words.InfectionWorkUp['suspicion'];
  @OptionalOneOf(words.TIMING) timing?: words.InfectionWorkUp['timing'];
  /** When the samples were taken, as an interval. */
  @OptionalText(SHORT) sampling?: string;
  @OptionalFlag() sinusTract?: boolean | null;
  @OptionalInteger(0, 50) sameOrganismCultures?: number | null;
  @OptionalNumber(0, 1000) crpMgL?: number | null;
  @OptionalNumber(0, 200000) dDimerUgL?: number | null;
  @OptionalNumber(0, 200) esrMmH?: number | null;
  @OptionalNumber(0, 1000000) synovialWbcPerUl?: number | null;
  @OptionalOneOf(words.LEUKOCYTE_ESTERASE) leukocyteEsterase?: words.InfectionWorkUp['leukocyteEsterase'];
  @OptionalFlag() alphaDefensin?: boolean | null;
  @OptionalNumber(0, 100) pmnPercent?: number | null;
  @OptionalNumber(0, 1000) synovialCrpMgL?: number | null;
  @OptionalFlag() histologyPositive?: boolean | null;
  @OptionalFlag() purulence?: boolean | null;
  @OptionalFlag() singlePositiveCulture?: boolean | null;
  @OptionalList(() => CultureDto, 30) cultures?: CultureDto[];
  @OptionalText(LONG) histology?: string;
}

export class BoneAndPositionDto implements words.BoneAndPosition {
  @OptionalNumber(0, 200) migrationMm?: number | null;
  @OptionalOneOf(words.DIRECTION) direction?: words.BoneAndPosition['direction'];
  @OptionalOneOf(words.ISCHIAL_LYSIS) ischialLysis?: words.BoneAndPosition['ischialLysis'];
  @OptionalOneOf(words.TEARDROP) teardrop?: words.BoneAndPosition['teardrop'];
  @OptionalOneOf(words.KOHLER) kohler?: words.BoneAndPosition['kohler'];
  @OptionalOneOf(words.SUPERIOR_RIM) superiorRim?: words.BoneAndPosition['superiorRim'];
  @OptionalFlag() transverseLine?: boolean | null;
  @OptionalText(1000) column?: string;
  @OptionalOneOf(words.DEFECT_CLASS) readersClass?: words.BoneAndPosition['readersClass'];
  @OptionalNumber(0, 90) inclinationDeg?: number | null;
  @OptionalNumber(-90, 90) versionDeg?: number | null;
  @OptionalNumber(-100, 200) hipCentreHeightMm?: number | null;
  @OptionalNumber(-150, 150) legLengthMm?: number | null;
  @OptionalText(LONG) note?: string;
}

export class PlanStepDto extends Identified implements words.PlanStep {
  @RequiredOneOf(words.STEP_KIND) kind: words.PlanStep['kind'];
  @IsString() @MaxLength(2000) method: string;
  @OptionalText(500) tool?: string;
  @OptionalText(1000) fallback?: string;
  @OptionalText(1000) hazard?: string;
  @OptionalText(SHORT) who?: string;
}

export class RimSectorDto implements words.RimSector {
  @RequiredInteger(1, 12) hour: number;
  @OptionalOneOf(words.SECTOR_STATE) state?: words.RimSector['state'];
  @OptionalInteger(1, 12) order?: number | null;
  @OptionalText(SHORT) note?: string;
}

export class KitItemDto extends Identified implements words.KitItem {
  @IsString() @MaxLength(300) item: string;
  @OptionalText(100) size?: string;
  @OptionalText(40) stepId?: string | null;
  @OptionalOneOf(words.KIT_SOURCE) source?: words.KitItem['source'];
  @OptionalFlag() confirmed?: boolean;
}

export class RemovalPlanDto implements words.RemovalPlan {
  @OptionalList(() => PlanStepDto, 40) steps?: PlanStepDto[];
  @OptionalList(() => RimSectorDto, 12) rim?: RimSectorDto[];
  @OptionalList(() => KitItemDto, 80) kit?: KitItemDto[];
  @OptionalText(LONG) reconstruction?: string;
  @OptionalNumber(20, 100) expectedNextShellMm?: number | null;
  @OptionalText(1000) expectedBoneLoss?: string;
}

export class CaseOptionDto extends Identified implements words.CaseOption {
  @IsString() @MaxLength(SHORT) title: string;
  @OptionalText(2000) description?: string;
  @OptionalFlag() isProposal?: boolean;
}

export class OptionsDto {
  @OptionalList(() => CaseOptionDto, 6) options?: CaseOptionDto[];
}
